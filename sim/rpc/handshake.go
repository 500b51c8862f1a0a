package rpc

import (
	"context"
	"errors"
	"runtime"

	"github.com/hashicorp/go-plugin"
	"google.golang.org/grpc"
)

// What both sides must agree on before the first message. The protocol version
// changes when the wire breaks; what is only added is a feature.
const (
	cookieKey       = "WANE_LAW"
	cookieValue     = "a law answers, the engine decides"
	protocolVersion = 1
	pluginName      = "law"

	serviceName    = "wane.law.v1.Law"
	describeMethod = "/" + serviceName + "/Describe"
	answerMethod   = "/" + serviceName + "/Answer"
)

// Contract is the newest contract of cards and answers that this program
// speaks.
const Contract = 1

// Features lists what this program offers beyond the contract.
func Features() []string {
	if runtime.GOOS == "windows" {
		return nil
	}
	return []string{direct}
}

func handshake() plugin.HandshakeConfig {
	return plugin.HandshakeConfig{ProtocolVersion: protocolVersion, MagicCookieKey: cookieKey, MagicCookieValue: cookieValue}
}

// bridge is what go-plugin wants to know: how to serve a law, and what to hand
// to the host, which is the bare connection.
type bridge struct {
	plugin.NetRPCUnsupportedPlugin
	serve func(*grpc.Server)
}

func (b bridge) GRPCServer(_ *plugin.GRPCBroker, s *grpc.Server) error {
	if b.serve == nil {
		return errors.New("rpc: a host serves no law")
	}
	b.serve(s)
	return nil
}

func (bridge) GRPCClient(_ context.Context, _ *plugin.GRPCBroker, c *grpc.ClientConn) (any, error) {
	return c, nil
}

func plugins(serve func(*grpc.Server)) map[int]plugin.PluginSet {
	return map[int]plugin.PluginSet{protocolVersion: {pluginName: bridge{serve: serve}}}
}
