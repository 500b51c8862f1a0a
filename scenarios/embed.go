// Package scenarios holds the scenarios that come with the program.
package scenarios

import "embed"

// FS holds them, each as name.toml.
//
//go:embed *.toml
var FS embed.FS
