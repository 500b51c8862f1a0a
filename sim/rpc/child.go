package rpc

import (
	"context"
	"errors"
	"fmt"
	"os/exec"
	"time"

	"github.com/hashicorp/go-hclog"
	"github.com/hashicorp/go-plugin"
	"github.com/hashicorp/go-plugin/runner"
	"google.golang.org/grpc"
	"wane/sim/rpc/wire"
)

// child is one process of a law with the connection to it. It is started once
// and ended once; for another start there is another child.
type child struct {
	client  *plugin.Client
	process *process
	conn    *grpc.ClientConn

	direct string      // its own socket, if it has one
	idle   chan *frame // connections to that
}

// startChild returns a child that is ready for questions, or the reason why
// there is none; then nothing is left running.
func startChild(ctx context.Context, s Start, folder string, log *logger, errs *tail) (*child, error) {
	c := &child{}
	made := make(chan *process, 1)
	c.client = plugin.NewClient(&plugin.ClientConfig{
		HandshakeConfig:  handshake(),
		VersionedPlugins: plugins(nil),
		AllowedProtocols: []plugin.Protocol{plugin.ProtocolGRPC},
		RunnerFunc: func(_ hclog.Logger, cmd *exec.Cmd, _ string) (runner.Runner, error) {
			p, err := newProcess(s, cmd.Env, errs)
			if err != nil {
				return nil, err
			}
			made <- p
			return p, nil
		},
		SkipHostEnv:      true,
		UnixSocketConfig: &plugin.UnixSocketConfig{TempDir: folder},
		StartTimeout:     s.Starting,
		Stderr:           errs,
		SyncStdout:       errs,
		SyncStderr:       errs,
		Logger:           log,
		GRPCDialOptions: []grpc.DialOption{
			grpc.WithDefaultCallOptions(
				grpc.ForceCodecV2(newCodec()), grpc.MaxCallRecvMsgSize(largestMessage), grpc.MaxCallSendMsgSize(largestMessage)),
			grpc.WithInitialWindowSize(window), grpc.WithInitialConnWindowSize(2 * window),
		},
	})
	done := make(chan error, 1)
	go func() { done <- c.connect() }()
	var err error
	settled := false
	late := time.NewTimer(s.Starting + time.Second)
	defer late.Stop()
	select {
	case err = <-done:
		settled = true
	case <-ctx.Done():
		err = ctx.Err()
	case <-late.C:
		err = errors.New("timeout while waiting for plugin to start")
	}
	if !settled { // it may not even have got as far as a process
		select {
		case c.process = <-made:
		case <-done:
		}
	}
	if c.process == nil {
		select {
		case c.process = <-made:
		default:
			return nil, startFault(err, s, "")
		}
	}
	if err == nil {
		return c, nil
	}
	state := ""
	if c.process.number() != 0 && ctx.Err() == nil {
		state = c.process.state(time.Second) // it may be ending by itself just now
	}
	_ = c.end(s.Ending, true)
	return nil, startFault(err, s, state)
}

func (c *child) connect() error {
	protocol, err := c.client.Client()
	if err != nil {
		return err
	}
	conn, err := protocol.Dispense(pluginName)
	if err != nil {
		return err
	}
	c.conn = conn.(*grpc.ClientConn)
	return nil
}

// describe asks for the card.
func (c *child) describe(ctx context.Context, within time.Duration, features []string) (*wire.Card, error) {
	ctx, cancel := context.WithTimeout(ctx, within)
	defer cancel()
	card := new(wire.Card)
	return card, c.conn.Invoke(ctx, describeMethod, describeRequest(features), card)
}

// answer sends a batch and gives its answer to read.
func (c *child) answer(ctx context.Context, within time.Duration, batch *encoded, read func([]byte) error) error {
	if c.direct != "" {
		return c.answerDirect(ctx, within, batch, read)
	}
	ctx, cancel := context.WithTimeout(ctx, within)
	defer cancel()
	var m received
	err := c.conn.Invoke(ctx, answerMethod, batch, &m)
	if m.buffer != nil {
		defer m.buffer.Free()
	}
	if err != nil {
		return err
	}
	if m.buffer == nil {
		return fmt.Errorf("rpc: no answer")
	}
	return read(m.buffer.ReadOnlyData())
}

// end ends the child: of its own accord within the time given, else by force;
// at once by force when there is nothing to hope for. It never blocks for
// long.
func (c *child) end(within time.Duration, force bool) error {
	if force {
		_ = c.process.Kill(context.Background())
	}
	gone := make(chan struct{})
	go func() {
		c.hangUp()
		c.client.Kill()
		close(gone)
	}()
	select {
	case <-gone:
		return nil
	case <-time.After(within):
	}
	_ = c.process.Kill(context.Background())
	select {
	case <-gone:
		return nil
	case <-time.After(time.Second):
		return fmt.Errorf("process %s does not end", c.process.ID())
	}
}
