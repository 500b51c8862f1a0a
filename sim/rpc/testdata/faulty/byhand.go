package main

import (
	"context"
	"fmt"
	"net"
	"os"
	"path/filepath"
	"time"

	"google.golang.org/grpc"
	"google.golang.org/protobuf/types/known/emptypb"
	"wane/sim/law"
	"wane/sim/rpc/wire"
)

// handmade is what a law does that was made without a kit.
type handmade struct {
	hello  string // the line of the handshake; %s: where it listens
	deaf   bool   // does not end when told to
	hangs  bool   // over every answer
	card   func(*wire.Card)
	result func(*wire.Result)
	direct func(net.Conn)                     // at a socket of its own
	socket string                             // which may lie elsewhere
	answer func(*wire.Result) ([]byte, error) // instead of the message
}

const greeting = "1|1|unix|%s|grpc"

// byHand are faults that no kit would let happen.
var byHand = map[string]handmade{
	"none":            {hello: greeting},
	"protocol-99":     {hello: "1|99|unix|%s|grpc"},
	"core-protocol-7": {hello: "7|1|unix|%s|grpc"},
	"netrpc":          {hello: "1|1|unix|%s|netrpc"},
	"deaf":            {hello: greeting, deaf: true},
	"deaf-hang":       {hello: greeting, deaf: true, hangs: true},
	"newer": {hello: greeting, card: func(c *wire.Card) {
		c.Contract, c.Features = 2, []string{"shared-columns", "tides"}
	}},
	"no-contract": {hello: greeting, card: func(c *wire.Card) { c.Contract = 0 }},
	"no-card":     {hello: greeting, card: func(c *wire.Card) { *c = wire.Card{} }},
	"all-wrong": {hello: greeting, card: func(c *wire.Card) {
		c.Questions[0].Inputs[0].Unit = "kg"
		c.Questions[0].Inputs = append(c.Questions[0].Inputs, &wire.Column{Name: "colour"})
		c.Kinds = append(c.Kinds, &wire.Kind{Name: "ember", Composition: "cheese"})
		c.Thresholds[0].Outcome = "Tea Time"
		c.Accepts.Low = &wire.Limit{Parameter: "evaporating.k"}
		c.Accepts.Column = "mass"
		c.Parameters = append(c.Parameters, &wire.Parameter{Name: "k", High: 3, Preset: 4})
		c.Features = []string{"tides"}
	}},
	"seq":     {hello: greeting, result: func(r *wire.Result) { r.Seq += 7 }},
	"rows":    {hello: greeting, result: func(r *wire.Result) { r.Rows++ }},
	"short":   {hello: greeting, result: func(r *wire.Result) { r.Columns[0] = r.Columns[0][:len(r.Columns[0])-8] }},
	"long":    {hello: greeting, result: func(r *wire.Result) { r.Columns[0] = append(r.Columns[0], make([]byte, 8)...) }},
	"ragged":  {hello: greeting, result: func(r *wire.Result) { r.Columns[1] = r.Columns[1][:len(r.Columns[1])-3] }},
	"empty":   {hello: greeting, result: func(r *wire.Result) { r.Columns[0] = nil }},
	"nothing": {hello: greeting, result: func(r *wire.Result) { r.Names, r.Columns = nil, nil }},
	"unnamed": {hello: greeting, result: func(r *wire.Result) { r.Names = r.Names[1:] }},
	"unknown": {hello: greeting, result: func(r *wire.Result) { r.Names[0] = "colour" }},
	"twice":   {hello: greeting, result: func(r *wire.Result) { r.Names[0] = r.Names[1] }},
	"swapped": {hello: greeting, result: func(r *wire.Result) { // no fault: columns go by name
		r.Names[0], r.Names[1] = r.Names[1], r.Names[0]
		r.Columns[0], r.Columns[1] = r.Columns[1], r.Columns[0]
	}},
	"garbage": {hello: greeting, answer: func(*wire.Result) ([]byte, error) { return []byte{0xff, 0xff, 0xff, 0x01, 0x02}, nil }},
	"huge":    {hello: greeting, answer: func(*wire.Result) ([]byte, error) { return make([]byte, 80<<20), nil }},
}

// reply is a message that is bytes already.
type reply struct{ bytes []byte }

func serveByHand(f *faulty, h handmade) {
	dir := os.Getenv("PLUGIN_UNIX_SOCKET_DIR")
	if dir == "" {
		fmt.Fprintln(os.Stderr, "no folder for the socket")
		os.Exit(1)
	}
	path := filepath.Join(dir, fmt.Sprintf("hand-%d.sock", os.Getpid()))
	listener, err := net.Listen("unix", path)
	if err != nil {
		panic(err)
	}
	server := grpc.NewServer(grpc.ForceServerCodecV2(newCodec()))
	server.RegisterService(&grpc.ServiceDesc{ServiceName: "wane.law.v1.Law", HandlerType: (*any)(nil), Methods: []grpc.MethodDesc{
		{MethodName: "Describe", Handler: handler(func(*wire.DescribeRequest) (any, error) {
			card := f.wireCard(h)
			card.Direct = h.listen(dir)
			return card, nil
		})},
		{MethodName: "Answer", Handler: handler(func(b *wire.Batch) (any, error) {
			if h.hangs {
				f.begins()
				time.Sleep(forever)
			}
			result, err := f.wireAnswer(b)
			if err != nil {
				return nil, err
			}
			if h.result != nil {
				h.result(result)
			}
			if h.answer != nil {
				bytes, err := h.answer(result)
				return &reply{bytes}, err
			}
			return result, nil
		})},
	}}, nil)
	if !h.deaf {
		server.RegisterService(&grpc.ServiceDesc{ServiceName: "plugin.GRPCController", HandlerType: (*any)(nil), Methods: []grpc.MethodDesc{
			{MethodName: "Shutdown", Handler: handler(func(*emptypb.Empty) (any, error) {
				time.AfterFunc(10*time.Millisecond, func() { os.Remove(path); os.Exit(0) })
				return new(emptypb.Empty), nil
			})},
		}}, nil)
	}
	fmt.Fprintln(os.Stderr, "made by hand")
	fmt.Printf(h.hello+"\n", path)
	_ = server.Serve(listener)
	time.Sleep(forever)
}

// handler is a method that takes a message of one type.
func handler[M any](answer func(*M) (any, error)) func(any, context.Context, func(any) error, grpc.UnaryServerInterceptor) (any, error) {
	return func(_ any, _ context.Context, read func(any) error, _ grpc.UnaryServerInterceptor) (any, error) {
		m := new(M)
		if err := read(m); err != nil {
			return nil, err
		}
		return answer(m)
	}
}

func (f *faulty) wireAnswer(b *wire.Batch) (*wire.Result, error) {
	card := f.Law.Describe()
	in := law.Batch{Rows: int(b.Rows), Parameters: b.Parameters, Kinds: b.Kinds}
	if len(in.Kinds) == 0 {
		in.Kinds = law.KindWords
	}
	for _, q := range card.Questions {
		if q.Name != b.Question {
			continue
		}
		for i, name := range q.Inputs {
			in.Columns = append(in.Columns, column(b.Question, name, b.Columns[i]))
		}
	}
	out, err := f.Law.Answer(b.Question, in)
	if err != nil {
		return nil, err
	}
	r := &wire.Result{Seq: b.Seq, Rows: b.Rows}
	for _, c := range out.Columns {
		r.Names = append(r.Names, c.Name)
		r.Columns = append(r.Columns, bytesOf(c))
	}
	return r, nil
}
