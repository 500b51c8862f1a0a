// Package rpc carries the contract of a law to another process and back: an
// outside law is a [law.Law] like any other, whose answers come from an
// executable that is started here. [Serve] is the other side of it, for laws
// in Go.
//
// A law is a pure function of its batch. So a process that dies or hangs is
// started again and gets the same batch once more, and no answer can depend on
// where it was computed. What an outside law sends is never trusted: its card
// is judged before the first question, the shape of every answer here, and
// every value in [law.Use.Ask].
//
// This package is the only importer of go-plugin, grpc and hclog.
package rpc
