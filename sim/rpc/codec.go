package rpc

import (
	"encoding/binary"
	"fmt"
	"math"
	"slices"

	"google.golang.org/grpc/encoding"
	"google.golang.org/grpc/mem"
	"google.golang.org/protobuf/encoding/protowire"
	"wane/sim/law"
)

// The numbers of the fields in law.proto that are written and read by hand.
const (
	batchSeq        protowire.Number = 1
	batchQuestion   protowire.Number = 2
	batchRows       protowire.Number = 3
	batchColumns    protowire.Number = 4
	batchParameters protowire.Number = 5
	batchKinds      protowire.Number = 6

	resultSeq     protowire.Number = 1
	resultRows    protowire.Number = 2
	resultNames   protowire.Number = 3
	resultColumns protowire.Number = 4
	resultError   protowire.Number = 5
)

// codec is the ordinary codec, but for batches and results: their columns go
// straight between the bytes of the wire and the columns of the caller, one
// copy each way. The bytes are those of the messages in law.proto, so that the
// other side may use any codec.
type codec struct{ encoding.CodecV2 }

func newCodec() codec { return codec{encoding.GetCodecV2("proto")} }

// encoded is a message that is ready for the wire. One that is kept to be sent
// again belongs to its sender, who frees it; another goes with being sent.
type encoded struct {
	buffer mem.Buffer
	kept   bool
}

// received is a message as it came. Whoever asked for it reads it, then frees
// the buffer.
type received struct{ buffer mem.Buffer }

func (c codec) Marshal(v any) (mem.BufferSlice, error) {
	if m, ok := v.(*encoded); ok {
		if m.kept {
			m.buffer.Ref() // grpc frees one
		}
		return mem.BufferSlice{m.buffer}, nil
	}
	return c.CodecV2.Marshal(v)
}

func (c codec) Unmarshal(data mem.BufferSlice, v any) error {
	if m, ok := v.(*received); ok {
		m.buffer = data.MaterializeToBuffer(mem.DefaultBufferPool())
		return nil
	}
	return c.CodecV2.Unmarshal(data, v)
}

// message starts a message of at most size bytes in borrowed memory.
func message(from mem.BufferPool, size int) *[]byte {
	b := from.Get(size)
	*b = (*b)[:0]
	return b
}

func finished(from mem.BufferPool, b *[]byte, text []byte) *encoded {
	*b = text
	return &encoded{buffer: mem.NewBuffer(b, from)}
}

// columnsSize bounds the bytes of columns on the wire.
func columnsSize(columns []law.Column) int {
	n := 0
	for i := range columns {
		n += 16 + len(columns[i].Name) + 8*len(columns[i].Values) + len(columns[i].Words)
	}
	return n
}

// encodeBatch writes rows from .. to of a batch. No kinds stand for the
// standard list.
func encodeBatch(memory mem.BufferPool, seq uint64, question string, in law.Batch, from, to int, kinds []string) *encoded {
	size := 64 + len(question) + columnsSize(in.Columns)*(to-from)/max(in.Rows, 1) + 16*len(in.Columns)*2 + 8*len(in.Parameters)
	for i := range in.Columns {
		size += len(in.Columns[i].Name)
	}
	for _, k := range kinds {
		size += 8 + len(k)
	}
	buffer := message(memory, size)
	b := appendUint(*buffer, batchSeq, seq)
	b = appendString(b, batchQuestion, question)
	b = appendUint(b, batchRows, uint64(to-from))
	for i := range in.Columns {
		b = appendColumn(b, batchColumns, &in.Columns[i], from, to)
	}
	if len(in.Parameters) > 0 {
		b = appendNumbers(b, batchParameters, in.Parameters)
	}
	for _, k := range kinds {
		b = appendString(b, batchKinds, k)
	}
	return finished(memory, buffer, b)
}

func encodeResult(memory mem.BufferPool, seq uint64, out law.Batch) *encoded {
	buffer := message(memory, 64+columnsSize(out.Columns)+16*len(out.Columns))
	b := appendUint(*buffer, resultSeq, seq)
	b = appendUint(b, resultRows, uint64(out.Rows))
	for i := range out.Columns {
		b = appendString(b, resultNames, out.Columns[i].Name)
	}
	for i := range out.Columns {
		c := &out.Columns[i]
		b = appendColumn(b, resultColumns, c, 0, max(len(c.Values), len(c.Words)))
	}
	return finished(memory, buffer, b)
}

func encodeError(memory mem.BufferPool, seq uint64, reason string) *encoded {
	buffer := message(memory, 64+len(reason))
	b := appendUint(*buffer, resultSeq, seq)
	b = appendString(b, resultError, reason)
	return finished(memory, buffer, b)
}

func appendUint(b []byte, field protowire.Number, v uint64) []byte {
	if v == 0 {
		return b // as all writers of this format do
	}
	return protowire.AppendVarint(protowire.AppendTag(b, field, protowire.VarintType), v)
}

func appendString(b []byte, field protowire.Number, s string) []byte {
	return protowire.AppendString(protowire.AppendTag(b, field, protowire.BytesType), s)
}

func appendNumbers(b []byte, field protowire.Number, values []float64) []byte {
	b = protowire.AppendVarint(protowire.AppendTag(b, field, protowire.BytesType), uint64(8*len(values)))
	n := len(b)
	b = slices.Grow(b, 8*len(values))[:n+8*len(values)]
	putNumbers(b[n:], values)
	return b
}

// appendColumn writes rows from .. to of a column, cut to what there is of it.
func appendColumn(b []byte, field protowire.Number, c *law.Column, from, to int) []byte {
	if c.Words != nil {
		w := c.Words[min(from, len(c.Words)):min(to, len(c.Words))]
		return protowire.AppendBytes(protowire.AppendTag(b, field, protowire.BytesType), w)
	}
	return appendNumbers(b, field, c.Values[min(from, len(c.Values)):min(to, len(c.Values))])
}

func putNumbers(b []byte, values []float64) {
	b = b[:8*len(values)]
	for len(values) >= 4 && len(b) >= 32 { // four at a time: one check of bounds for all
		binary.LittleEndian.PutUint64(b[0:8], math.Float64bits(values[0]))
		binary.LittleEndian.PutUint64(b[8:16], math.Float64bits(values[1]))
		binary.LittleEndian.PutUint64(b[16:24], math.Float64bits(values[2]))
		binary.LittleEndian.PutUint64(b[24:32], math.Float64bits(values[3]))
		values, b = values[4:], b[32:]
	}
	for i, v := range values {
		binary.LittleEndian.PutUint64(b[8*i:], math.Float64bits(v))
	}
}

// getNumbers reads len(values) numbers.
func getNumbers(values []float64, b []byte) {
	b = b[:8*len(values)]
	for len(values) >= 4 && len(b) >= 32 {
		values[0] = math.Float64frombits(binary.LittleEndian.Uint64(b[0:8]))
		values[1] = math.Float64frombits(binary.LittleEndian.Uint64(b[8:16]))
		values[2] = math.Float64frombits(binary.LittleEndian.Uint64(b[16:24]))
		values[3] = math.Float64frombits(binary.LittleEndian.Uint64(b[24:32]))
		values, b = values[4:], b[32:]
	}
	for i := range values {
		values[i] = math.Float64frombits(binary.LittleEndian.Uint64(b[8*i:]))
	}
}

// fields walks through the fields of a message. Strings, columns and packed
// numbers come as bytes, numbers as v.
func fields(b []byte, see func(field protowire.Number, v uint64, bytes []byte) error) error {
	for len(b) > 0 {
		field, kind, n := protowire.ConsumeTag(b)
		if n < 0 {
			return fmt.Errorf("rpc: a message that cannot be read: %w", protowire.ParseError(n))
		}
		b = b[n:]
		var v uint64
		var bytes []byte
		switch kind {
		case protowire.VarintType:
			v, n = protowire.ConsumeVarint(b)
		case protowire.Fixed64Type:
			v, n = protowire.ConsumeFixed64(b)
		case protowire.BytesType:
			bytes, n = protowire.ConsumeBytes(b)
		default:
			n = protowire.ConsumeFieldValue(field, kind, b)
		}
		if n < 0 {
			return fmt.Errorf("rpc: a message that cannot be read: %w", protowire.ParseError(n))
		}
		if err := see(field, v, bytes); err != nil {
			return err
		}
		b = b[n:]
	}
	return nil
}
