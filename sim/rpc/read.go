package rpc

import (
	"fmt"
	"slices"

	"google.golang.org/protobuf/encoding/protowire"
	"wane/sim/law"
)

// readBatch reads a batch into columns lent by the arena. It returns an error
// for a batch that does not fit the card, which no host sends.
func readBatch(message []byte, card *law.Card, arena *law.Arena) (seq uint64, question string, in law.Batch, err error) {
	var columns [][]byte
	err = fields(message, func(field protowire.Number, v uint64, bytes []byte) error {
		switch field {
		case batchSeq:
			seq = v
		case batchQuestion:
			question = string(bytes)
		case batchRows:
			in.Rows = int(v)
		case batchColumns:
			columns = append(columns, bytes)
		case batchParameters:
			if len(bytes)%8 != 0 || bytes == nil {
				return fmt.Errorf("rpc: parameters of %d bytes", len(bytes))
			}
			in.Parameters = make([]float64, len(bytes)/8)
			getNumbers(in.Parameters, bytes)
		case batchKinds:
			in.Kinds = append(in.Kinds, string(bytes))
		}
		return nil
	})
	if err != nil {
		return seq, question, in, err
	}
	if in.Kinds == nil {
		in.Kinds = law.KindWords
	}
	in = in.With(arena)
	at := slices.IndexFunc(card.Questions, func(q law.Question) bool { return q.Name == question })
	if at < 0 {
		return seq, question, in, fmt.Errorf("rpc: question %q is not on the card", question)
	}
	inputs := card.Questions[at].Inputs
	if len(columns) != len(inputs) {
		return seq, question, in, fmt.Errorf("rpc: question %s: a batch of %d columns, want %d", question, len(columns), len(inputs))
	}
	if len(in.Parameters) != len(card.Parameters) {
		return seq, question, in, fmt.Errorf("rpc: question %s: a batch of %d parameters, want %d", question, len(in.Parameters), len(card.Parameters))
	}
	in.Columns = make([]law.Column, len(inputs))
	for i, name := range inputs {
		info, _ := law.ColumnNamed(question, name)
		c, wrong := readColumn(name, info.Words != "", columns[i], in)
		if wrong {
			return seq, question, in, fmt.Errorf("rpc: question %s: column %s: %d bytes for %d rows", question, name, len(columns[i]), in.Rows)
		}
		in.Columns[i] = c
	}
	return seq, question, in, nil
}

func readColumn(name string, words bool, bytes []byte, in law.Batch) (c law.Column, wrong bool) {
	if words {
		if len(bytes) != in.Rows {
			return c, true
		}
		c = law.Codes(name, in.NewWords())
		copy(c.Words, bytes)
		return c, false
	}
	if len(bytes)%8 != 0 || len(bytes)/8 != in.Rows {
		return c, true
	}
	c = law.Numbers(name, in.NewValues())
	getNumbers(c.Values, bytes)
	return c, false
}

// readResult reads a result into rows from .. to of the answer's columns,
// which have the names and the order that the card gives them. It returns the
// law's own reason if the law cannot answer, and an error for a result of the
// wrong shape.
func readResult(message []byte, seq uint64, out []law.Column, from, to int) (reason string, err error) {
	var gotSeq, gotRows uint64
	var names []string
	var columns [][]byte
	err = fields(message, func(field protowire.Number, v uint64, bytes []byte) error {
		switch field {
		case resultSeq:
			gotSeq = v
		case resultRows:
			gotRows = v
		case resultNames:
			names = append(names, string(bytes))
		case resultColumns:
			columns = append(columns, bytes)
		case resultError:
			reason = string(bytes)
		}
		return nil
	})
	switch {
	case err != nil:
		return "", err
	case gotSeq != seq:
		return "", fmt.Errorf("an answer to batch %d, want one to batch %d", gotSeq, seq)
	case reason != "":
		return reason, nil
	case gotRows != uint64(to-from):
		return "", fmt.Errorf("an answer of %d rows, want %d", gotRows, to-from)
	case len(names) != len(columns):
		return "", fmt.Errorf("an answer with %d names for %d columns", len(names), len(columns))
	}
	seen := make([]bool, len(out))
	for i, name := range names {
		at := slices.IndexFunc(out, func(c law.Column) bool { return c.Name == name })
		if at < 0 {
			return "", fmt.Errorf("unknown column %q in the answer, want %v", name, namesOf(out))
		}
		if seen[at] {
			return "", fmt.Errorf("column %q is in the answer twice", name)
		}
		seen[at] = true
		if err := fillColumn(&out[at], columns[i], from, to); err != nil {
			return "", err
		}
	}
	if at := slices.Index(seen, false); at >= 0 {
		return "", fmt.Errorf("no column %q in the answer, want %v", out[at].Name, namesOf(out))
	}
	return "", nil
}

func fillColumn(c *law.Column, bytes []byte, from, to int) error {
	width := 8
	if c.Words != nil {
		width = 1
	}
	rows := to - from
	if len(bytes) != width*rows {
		length := fmt.Sprintf("%d rows", len(bytes)/width)
		if len(bytes)%width != 0 {
			length = fmt.Sprintf("%d bytes", len(bytes))
		}
		return fmt.Errorf("column %s: %s, want %d rows of %d bytes", c.Name, length, rows, width)
	}
	if c.Words != nil {
		copy(c.Words[from:to], bytes)
	} else {
		getNumbers(c.Values[from:to], bytes)
	}
	return nil
}

func namesOf(columns []law.Column) []string {
	return each(columns, func(c law.Column) string { return c.Name })
}
