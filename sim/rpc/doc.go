// Package rpc carries the contract of a law to another process and back. It is
// the only importer of go-plugin, grpc and hclog.
package rpc

import (
	_ "github.com/hashicorp/go-hclog"
	_ "github.com/hashicorp/go-plugin"
	_ "github.com/rs/zerolog"
	_ "google.golang.org/grpc"
	_ "google.golang.org/protobuf/proto"
)
