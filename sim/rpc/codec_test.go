package rpc

import (
	"bytes"
	"encoding/binary"
	"math"
	"strings"
	"testing"

	"google.golang.org/protobuf/proto"
	"pgregory.net/rapid"
	"wane/sim/law"
	"wane/sim/rpc/wire"
)

// raw is a column as law.proto describes it, written the slow way.
func raw(values []float64) []byte {
	var b []byte
	for _, v := range values {
		b = binary.LittleEndian.AppendUint64(b, math.Float64bits(v))
	}
	return b
}

// anyBits draws numbers of all bit patterns, NaN with payloads included.
func anyBits(n int) *rapid.Generator[[]float64] {
	return rapid.SliceOfN(rapid.Map(rapid.Uint64(), math.Float64frombits), n, n)
}

// TestBatchBytes holds the batches written by hand to what the ordinary
// library writes, and reads them back.
func TestBatchBytes(t *testing.T) {
	card := law.Card{
		Questions:  []law.Question{{Name: "heat", Inputs: []string{"mass", "kind", "radius"}}},
		Parameters: make([]law.Parameter, 2),
	}
	rapid.Check(t, func(t *rapid.T) {
		rows := rapid.IntRange(0, 40).Draw(t, "rows")
		from := rapid.IntRange(0, rows).Draw(t, "from")
		to := rapid.IntRange(from, rows).Draw(t, "to")
		mass, radius := anyBits(rows).Draw(t, "mass"), anyBits(rows).Draw(t, "radius")
		kind := rapid.SliceOfN(rapid.Byte(), rows, rows).Draw(t, "kind")
		parameters := anyBits(2).Draw(t, "parameters")
		kinds := rapid.SliceOfN(rapid.String(), 0, 3).Draw(t, "kinds")
		seq := rapid.Uint64().Draw(t, "seq")
		in := law.Batch{Rows: rows, Parameters: parameters, Columns: []law.Column{
			law.Numbers("mass", mass), law.Codes("kind", kind), law.Numbers("radius", radius),
		}}
		got := encodeBatch(new(shelf), seq, "heat", in, from, to, kinds)
		defer got.buffer.Free()
		want, err := proto.MarshalOptions{Deterministic: true}.Marshal(&wire.Batch{
			Seq: seq, Question: "heat", Rows: uint64(to - from), Parameters: parameters, Kinds: kinds,
			Columns: [][]byte{raw(mass[from:to]), kind[from:to], raw(radius[from:to])},
		})
		if err != nil {
			t.Fatal(err)
		}
		if !bytes.Equal(got.buffer.ReadOnlyData(), want) {
			t.Fatalf("got  %x\nwant %x", got.buffer.ReadOnlyData(), want)
		}
		var arena law.Arena
		gotSeq, question, read, err := readBatch(want, &card, &arena)
		if err != nil {
			t.Fatal(err)
		}
		if gotSeq != seq || question != "heat" || read.Rows != to-from {
			t.Fatalf("read seq %d, question %s, %d rows", gotSeq, question, read.Rows)
		}
		if !bytes.Equal(raw(read.Values("mass")), raw(mass[from:to])) || !bytes.Equal(read.Words("kind"), kind[from:to]) ||
			!bytes.Equal(raw(read.Values("radius")), raw(radius[from:to])) || !bytes.Equal(raw(read.Parameters), raw(parameters)) {
			t.Fatal("the columns that were read are not those that were written")
		}
	})
}

// TestResultBytes does the same for results, whatever the order of columns.
func TestResultBytes(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		rows := rapid.IntRange(0, 40).Draw(t, "rows")
		mass := anyBits(rows).Draw(t, "mass")
		composition := rapid.SliceOfN(rapid.Byte(), rows, rows).Draw(t, "composition")
		got := encodeResult(new(shelf), 7, law.Batch{Rows: rows, Columns: []law.Column{law.Codes("composition", composition), law.Numbers("mass", mass)}})
		defer got.buffer.Free()
		want, err := proto.MarshalOptions{Deterministic: true}.Marshal(&wire.Result{
			Seq: 7, Rows: uint64(rows), Names: []string{"composition", "mass"}, Columns: [][]byte{composition, raw(mass)},
		})
		if err != nil {
			t.Fatal(err)
		}
		if !bytes.Equal(got.buffer.ReadOnlyData(), want) {
			t.Fatalf("got  %x\nwant %x", got.buffer.ReadOnlyData(), want)
		}
		out := []law.Column{law.Numbers("mass", make([]float64, rows+3)), law.Codes("composition", make([]uint8, rows+3))}
		if reason, err := readResult(want, 7, out, 2, 2+rows); reason != "" || err != nil {
			t.Fatal(reason, err)
		}
		if !bytes.Equal(raw(out[0].Values[2:2+rows]), raw(mass)) || !bytes.Equal(out[1].Words[2:2+rows], composition) {
			t.Fatal("the columns that were read are not those that were written")
		}
	})
}

// TestWrongResults names the column and the lengths of every answer that does
// not have the shape it must have.
func TestWrongResults(t *testing.T) {
	two, words := raw([]float64{1, 2}), []byte{1, 2}
	names := []string{"mass", "composition"}
	for name, x := range map[string]struct {
		result *wire.Result
		want   string
	}{
		"seq":         {&wire.Result{Seq: 8, Rows: 2, Names: names, Columns: [][]byte{two, words}}, "an answer to batch 8, want one to batch 7"},
		"rows":        {&wire.Result{Seq: 7, Rows: 3, Names: names, Columns: [][]byte{two, words}}, "an answer of 3 rows, want 2"},
		"nameless":    {&wire.Result{Seq: 7, Rows: 2, Columns: [][]byte{two, words}}, "0 names for 2 columns"},
		"unknown":     {&wire.Result{Seq: 7, Rows: 2, Names: []string{"weight", "composition"}, Columns: [][]byte{two, words}}, `unknown column "weight" in the answer, want [mass composition]`},
		"missing":     {&wire.Result{Seq: 7, Rows: 2, Names: names[1:], Columns: [][]byte{words}}, `no column "mass" in the answer`},
		"twice":       {&wire.Result{Seq: 7, Rows: 2, Names: []string{"mass", "mass"}, Columns: [][]byte{two, two}}, `column "mass" is in the answer twice`},
		"short":       {&wire.Result{Seq: 7, Rows: 2, Names: names, Columns: [][]byte{two[:8], words}}, "column mass: 1 rows, want 2 rows of 8 bytes"},
		"long":        {&wire.Result{Seq: 7, Rows: 2, Names: names, Columns: [][]byte{raw([]float64{1, 2, 3}), words}}, "column mass: 3 rows, want 2"},
		"ragged":      {&wire.Result{Seq: 7, Rows: 2, Names: names, Columns: [][]byte{two[:11], words}}, "column mass: 11 bytes, want 2 rows of 8 bytes"},
		"short words": {&wire.Result{Seq: 7, Rows: 2, Names: names, Columns: [][]byte{two, words[:1]}}, "column composition: 1 rows, want 2 rows of 1 bytes"},
	} {
		message, err := proto.Marshal(x.result)
		if err != nil {
			t.Fatal(err)
		}
		out := []law.Column{law.Numbers("mass", make([]float64, 2)), law.Codes("composition", make([]uint8, 2))}
		if _, err := readResult(message, 7, out, 0, 2); err == nil || !strings.Contains(err.Error(), x.want) {
			t.Errorf("%s: %v, want %s", name, err, x.want)
		}
	}
	message, _ := proto.Marshal(&wire.Result{Seq: 7, Error: "bad physics"})
	if reason, err := readResult(message, 7, nil, 0, 2); reason != "bad physics" || err != nil {
		t.Errorf("reason %q, error %v", reason, err)
	}
}

// TestReadAnything feeds the readers with bytes that no host or law sends.
func TestReadAnything(t *testing.T) {
	card := law.Card{Questions: []law.Question{{Name: "heat", Inputs: []string{"mass"}}}}
	rapid.Check(t, func(t *rapid.T) {
		b := rapid.SliceOf(rapid.Byte()).Draw(t, "bytes")
		var arena law.Arena
		if _, question, in, err := readBatch(b, &card, &arena); err == nil && (question != "heat" || len(in.Columns) != 1 || len(in.Columns[0].Values) != in.Rows) {
			t.Fatalf("question %q, %d rows, %d columns", question, in.Rows, len(in.Columns))
		}
		out := []law.Column{law.Numbers("mass", make([]float64, 1))}
		if reason, err := readResult(b, 0, out, 0, 1); err == nil && reason == "" && len(b) < 8 {
			t.Fatal("an answer without a column was taken for one")
		}
	})
}

// TestCodec: what is no batch and no result goes the ordinary way, and a batch
// that is kept can be sent twice.
func TestCodec(t *testing.T) {
	c := newCodec()
	data, err := c.Marshal(&wire.Card{Name: "page"})
	if err != nil {
		t.Fatal(err)
	}
	var card wire.Card
	if err := c.Unmarshal(data, &card); err != nil || card.Name != "page" {
		t.Fatal(card.Name, err)
	}
	batch := encodeBatch(new(shelf), 1, "mass", law.Batch{Rows: 2000, Columns: []law.Column{law.Numbers("u", make([]float64, 2000))}}, 0, 2000, nil)
	batch.kept = true
	var first []byte
	for range 2 {
		data, err := c.Marshal(batch)
		if err != nil {
			t.Fatal(err)
		}
		var m received
		if err := c.Unmarshal(data, &m); err != nil {
			t.Fatal(err)
		}
		if first == nil {
			first = bytes.Clone(m.buffer.ReadOnlyData())
		} else if !bytes.Equal(first, m.buffer.ReadOnlyData()) {
			t.Fatal("sent again, the batch is another")
		}
		m.buffer.Free()
		data.Free()
	}
	batch.buffer.Free()
}
