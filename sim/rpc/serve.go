package rpc

import (
	"context"
	"fmt"
	"os"
	"runtime"
	"runtime/debug"
	"slices"
	"strings"
	"sync"

	"github.com/hashicorp/go-hclog"
	"github.com/hashicorp/go-plugin"
	"google.golang.org/grpc"
	"google.golang.org/grpc/codes"
	"google.golang.org/grpc/status"
	"wane/sim/law"
	"wane/sim/rpc/wire"
)

// largestMessage bounds what either side accepts, in bytes: 65536 rows of the
// widest question with room to spare.
const largestMessage = 64 << 20

// window is how many bytes may be under way before the other side has taken
// them. A window of fixed size needs no probing for a better one, which would
// be a round trip of its own beside each small call.
const window = 16 << 20

// Serve is the main of an outside law in Go: it answers the host's questions
// until the host ends the process. Started by hand it says what it is, on
// standard error, and exits with 1. Standard output belongs to the protocol
// until then; what a law prints to either goes to the law's log.
func Serve(l law.Law) {
	card := l.Describe()
	if os.Getenv(cookieKey) != cookieValue {
		fmt.Fprintf(os.Stderr, "%s/%s is a law that wane starts when it needs it, not by hand. Try:\n"+
			"  wane law check PATH\n  wane run SCENARIO --law %s=PATH\n", card.Process, card.Name, card.Process)
		os.Exit(1)
	}
	go endWithParent()
	s := &server{law: l, card: card, stderr: os.Stderr, ballast: make([]byte, ballast)}
	plugin.Serve(&plugin.ServeConfig{
		HandshakeConfig:  handshake(),
		VersionedPlugins: plugins(func(g *grpc.Server) { g.RegisterService(s.service(), s) }),
		GRPCServer: func(o []grpc.ServerOption) *grpc.Server {
			return grpc.NewServer(append(o,
				grpc.ForceServerCodecV2(newCodec()), grpc.MaxRecvMsgSize(largestMessage), grpc.MaxSendMsgSize(largestMessage),
				grpc.InitialWindowSize(window), grpc.InitialConnWindowSize(2*window))...)
		},
		Logger: hclog.New(&hclog.LoggerOptions{Level: hclog.Warn, Output: os.Stderr, JSONFormat: true}),
	})
}

// ballast is memory that is never touched, and so takes none. The collector
// sets out when memory has doubled: in a process that holds next to nothing,
// that would be every few batches.
const ballast = 64 << 20

// server answers for one law.
type server struct {
	ballast []byte
	law     law.Law
	card    law.Card
	stderr  *os.File
	log     sync.Once
	open    sync.Once
	socket  string
	arenas  sync.Pool
	memory  shelf
}

// service is what protoc would generate for law.proto, but that the messages
// of Answer stay bytes until they are columns.
func (s *server) service() *grpc.ServiceDesc {
	return &grpc.ServiceDesc{ServiceName: serviceName, HandlerType: (*any)(nil), Metadata: "law.proto", Methods: []grpc.MethodDesc{
		{MethodName: "Describe", Handler: func(_ any, _ context.Context, read func(any) error, _ grpc.UnaryServerInterceptor) (any, error) {
			request := new(wire.DescribeRequest)
			if err := read(request); err != nil {
				return nil, err
			}
			return s.describe(slices.Contains(request.Features, direct)), nil
		}},
		{MethodName: "Answer", Handler: func(_ any, _ context.Context, read func(any) error, _ grpc.UnaryServerInterceptor) (any, error) {
			var m received
			if err := read(&m); err != nil {
				return nil, err
			}
			defer m.buffer.Free()
			_, result, err := s.answer(m.buffer.ReadOnlyData())
			if err != nil {
				return nil, status.Error(codes.InvalidArgument, err.Error())
			}
			return result, nil
		}},
	}}
}

func (s *server) describe(offered bool) *wire.Card {
	// go-plugin has put pipes of its own into their places by now, and what is
	// in a pipe is lost when the process dies: the log is where it matters.
	s.log.Do(func() { os.Stdout, os.Stderr = s.stderr, s.stderr })
	card := cardToWire(s.law.Describe(), ownRuntime())
	if offered {
		s.open.Do(func() { s.socket = s.serveDirect() })
		card.Direct = s.socket
	}
	return card
}

// answer reads a batch and encodes its answer. An error means that the batch is
// not one for this law.
func (s *server) answer(message []byte) (uint64, *encoded, error) {
	arena, _ := s.arenas.Get().(*law.Arena)
	if arena == nil {
		arena = new(law.Arena)
	}
	defer s.arenas.Put(arena)
	defer arena.Reset()
	seq, question, in, err := readBatch(message, &s.card, arena)
	if err != nil {
		return seq, nil, err
	}
	out, err := s.ask(question, in)
	if err != nil {
		return seq, encodeError(&s.memory, seq, err.Error()), nil
	}
	return seq, encodeResult(&s.memory, seq, out), nil
}

// ask makes an error of a panic: a law that stumbles over one batch is not
// lost for the next.
func (s *server) ask(question string, in law.Batch) (out law.Batch, err error) {
	defer func() {
		if p := recover(); p != nil {
			stack := string(debug.Stack())
			fmt.Fprintf(s.stderr, "panic: %v\n\n%s\n", p, stack)
			err = fmt.Errorf("panic: %v%s", p, origin(stack))
		}
	}()
	return s.law.Answer(question, in)
}

// origin is the first line of the law itself in the stack of a panic.
func origin(stack string) string {
	lines := strings.Split(stack, "\n")
	raised := false
	for i := 0; i+1 < len(lines); i++ {
		if strings.HasPrefix(lines[i], "panic(") {
			raised = true
			continue
		}
		if place := strings.TrimSpace(lines[i]); raised && strings.HasPrefix(lines[i], "\t") && !strings.Contains(place, "/runtime/") {
			place, _, _ = strings.Cut(place, " +0x")
			return " at " + place[strings.LastIndexByte(place, '/')+1:]
		}
	}
	return ""
}

// ownRuntime says what answers are computed on, for the record of a run.
func ownRuntime() string {
	out := runtime.Version() + " " + runtime.GOARCH
	if info, ok := debug.ReadBuildInfo(); ok {
		for _, s := range info.Settings {
			if s.Key == "GOAMD64" || s.Key == "GOARM64" {
				out += " " + s.Value
			}
		}
	}
	return out
}
