// Package wire is the form in which a card, a batch and an answer cross from
// one process to another. law.pb.go is made from law.proto by go generate.
package wire

//go:generate sh -c "GOBIN=$(pwd)/.bin go install google.golang.org/protobuf/cmd/protoc-gen-go && PATH=$(pwd)/.bin:$PATH protoc --go_out=. --go_opt=paths=source_relative law.proto && rm -r .bin"
