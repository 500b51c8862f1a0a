package main

import (
	"encoding/binary"
	"math"

	"google.golang.org/grpc/encoding"
	_ "google.golang.org/grpc/encoding/proto" // the codec that this one stands before
	"google.golang.org/grpc/mem"
	"wane/sim/law"
	"wane/sim/rpc/wire"
)

type codec struct{ encoding.CodecV2 }

func newCodec() codec { return codec{encoding.GetCodecV2("proto")} }

func (c codec) Marshal(v any) (mem.BufferSlice, error) {
	if r, ok := v.(*reply); ok {
		return mem.BufferSlice{mem.SliceBuffer(r.bytes)}, nil
	}
	return c.CodecV2.Marshal(v)
}

func column(question, name string, b []byte) law.Column {
	if info, _ := law.ColumnNamed(question, name); info.Words != "" {
		return law.Codes(name, b)
	}
	values := make([]float64, len(b)/8)
	for i := range values {
		values[i] = math.Float64frombits(binary.LittleEndian.Uint64(b[8*i:]))
	}
	return law.Numbers(name, values)
}

func bytesOf(c law.Column) []byte {
	if c.Words != nil {
		return c.Words
	}
	var b []byte
	for _, v := range c.Values {
		b = binary.LittleEndian.AppendUint64(b, math.Float64bits(v))
	}
	return b
}

// wireCard is the card of a wearing law, as far as such laws need it.
func (f *faulty) wireCard(h handmade) *wire.Card {
	c := f.Law.Describe()
	w := &wire.Card{Contract: 1, Process: c.Process, Name: c.Name, Version: c.Version, Summary: c.Summary, Formula: c.Formula,
		Domain: c.Domain, Sources: c.Sources, Wears: c.Wears, Accepts: &wire.Accepts{Kinds: c.Accepts.Kinds}, Runtime: "by hand"}
	for _, q := range c.Questions {
		asked := &wire.Question{Name: q.Name, Words: q.Words}
		for _, in := range q.Inputs {
			asked.Inputs = append(asked.Inputs, &wire.Column{Name: in})
		}
		w.Questions = append(w.Questions, asked)
	}
	for _, p := range c.Parameters {
		w.Parameters = append(w.Parameters, &wire.Parameter{Name: p.Name, Unit: p.Unit, Doc: p.Doc, Low: p.Low, High: p.High,
			Preset: p.Preset, Log10: p.Log10, Citation: p.Citation, Words: p.Words})
	}
	for _, t := range c.Thresholds {
		w.Thresholds = append(w.Thresholds, &wire.Threshold{Kind: t.Kind, Mass: t.Mass, Parameter: t.Parameter, ByWord: t.ByWord,
			Becomes: t.Becomes, Outcome: t.Outcome})
	}
	if h.card != nil {
		h.card(w)
	}
	return w
}
