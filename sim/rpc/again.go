package rpc

import (
	"fmt"
	"math"
	"sync/atomic"

	"wane/sim/law"
)

// askedAgain is how many rows of an answer are asked for twice, at most.
const askedAgain = 256

// again asks the last rows of a batch once more, by themselves, if it is the
// first of its question or twice as large as any before. A law whose
// answers hang on the other rows, or on what it was asked before, is found out
// so before anything is made of them, and a run costs what it did. (What is
// rarer, the judgement of laws finds.)
func (l *Law) again(question string, in law.Batch, first []law.Column) error {
	if l.start.AskOnce {
		return nil
	}
	tried, _ := l.tried.LoadOrStore(question, new(atomic.Int64))
	largest := tried.(*atomic.Int64)
	before := largest.Load()
	if in.Rows == 0 || before >= 2*askedAgain || int64(in.Rows) < 2*before || !largest.CompareAndSwap(before, int64(in.Rows)) {
		return nil
	}
	from := in.Rows - min(askedAgain, (in.Rows+1)/2)
	second := make([]law.Column, len(first))
	for i, c := range first {
		if second[i].Name = c.Name; c.Words != nil {
			second[i].Words = make([]uint8, in.Rows)
		} else {
			second[i].Values = make([]float64, in.Rows)
		}
	}
	if err := l.ask(question, in, second, from, in.Rows); err != nil {
		return err
	}
	for i, c := range first {
		for row := from; row < in.Rows; row++ {
			var a, b any
			if c.Words != nil {
				a, b = fmt.Sprint("code ", c.Words[row]), fmt.Sprint("code ", second[i].Words[row])
			} else if v, w := c.Values[row], second[i].Values[row]; !l.same(v, w) {
				a, b = v, w
			}
			if a != b {
				return l.stop(&AnswerError{Reason: fmt.Sprintf("row %d (%s): %s: got %v, but %v when asked again with other rows, want the same for the same row",
					row, in.Object(row), c.Name, a, b), Log: l.Log()})
			}
		}
	}
	return nil
}

// stop makes a fault the last word of the law: no other run of the same galaxy
// shall build on its answers.
func (l *Law) stop(fault error) error {
	l.mu.Lock()
	defer l.mu.Unlock()
	if l.stopped == nil {
		l.stopped = fault
	}
	return l.stopped
}

// same tells whether two answers are as equal as the law says they are.
func (l *Law) same(v, w float64) bool {
	return math.Float64bits(v) == math.Float64bits(w) || math.Abs(v-w) <= l.card.Tolerance*max(1, math.Abs(v)) || math.IsNaN(v) && math.IsNaN(w)
}
