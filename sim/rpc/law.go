package rpc

import (
	"context"
	"errors"
	"fmt"
	"sync"
	"sync/atomic"

	"wane/sim/law"
)

// Law is an outside law that is running. It is safe for concurrent use.
type Law struct {
	start     Start
	ctx       context.Context
	folder    *socketFolder
	log       *logger
	errs      *tail
	card      law.Card
	described []byte // the card as it came
	runtime   string

	slots  chan struct{} // one for each call in flight
	seq    atomic.Uint64
	times  durations
	memory shelf    // of batches
	tried  sync.Map // by question, the most rows of a batch that was asked again

	mu       sync.Mutex // holds what follows
	child    *child
	restarts int
	stopped  error // why it answers no more
	closed   bool
}

var (
	_ law.Law     = (*Law)(nil)
	_ law.Outside = (*Law)(nil)
	_ law.Batcher = (*Law)(nil)
)

// Describe returns the card as it was when the law was opened.
func (l *Law) Describe() law.Card { return l.card }

// Runtime is what the law runs on, in its own words.
func (l *Law) Runtime() string { return l.runtime }

// Rows is how many rows go into a call.
func (l *Law) Rows() int { return l.start.Rows }

// Label is what the person called it.
func (l *Law) Label() string { return l.start.Name }

// Log is the end of what the law wrote to its standard error. It is asked for
// when something went wrong, and waits a moment for what is still on its way.
func (l *Law) Log() string {
	l.errs.settle()
	return l.errs.String()
}

// Stderr is Log.
func (l *Law) Stderr() string { return l.Log() }

// Restarts is how often the law had to be started again.
func (l *Law) Restarts() int {
	l.mu.Lock()
	defer l.mu.Unlock()
	return l.restarts
}

// Dir is the folder of the law's sockets, which Close removes.
func (l *Law) Dir() string { return l.folder.path }

// PID is the number of the law's present process, 0 if there is none.
func (l *Law) PID() int {
	l.mu.Lock()
	defer l.mu.Unlock()
	if l.child == nil {
		return 0
	}
	return l.child.process.number()
}

// Close ends the process, by force if it does not end by itself, and removes
// what it leaves behind. It returns within seconds, whatever the law does.
func (l *Law) Close() error {
	l.mu.Lock()
	defer l.mu.Unlock()
	if l.closed {
		return nil
	}
	l.closed = true
	if l.stopped == nil {
		l.stopped = errors.New("it is closed")
	}
	var err error
	if l.child != nil {
		if err = l.child.end(l.start.Ending, false); err != nil {
			err = fmt.Errorf("law %s: %w", l.start.Name, err)
		}
		l.child = nil
	}
	l.folder.remove()
	return err
}

// Answer asks the law's process. A batch of more rows than go into a call is
// split, two parts at a time; the parts' answers are read into their places in
// columns of the batch's own memory.
func (l *Law) Answer(question string, in law.Batch) (law.Batch, error) {
	names := l.card.Outputs(question)
	columns := make([]law.Column, len(names))
	for i, name := range names {
		if law.AnsweredInWords(name) {
			columns[i] = law.Codes(name, in.NewWords())
		} else {
			columns[i] = law.Numbers(name, in.NewValues())
		}
	}
	size := l.start.Rows
	parts := max(1, (in.Rows+size-1)/size)
	var err error
	if parts == 1 {
		err = l.ask(question, in, columns, 0, in.Rows)
	} else {
		err = l.askParts(question, in, columns, parts)
	}
	if err == nil {
		err = l.again(question, in, columns)
	}
	if err != nil {
		return law.Batch{}, err
	}
	return in.Answer(columns...), nil
}

// askParts asks part by part, a few at once, and returns the error of the
// first part that has one.
func (l *Law) askParts(question string, in law.Batch, out []law.Column, parts int) error {
	faults := make([]error, parts)
	var next atomic.Int64
	var failed atomic.Bool
	var all sync.WaitGroup
	for range min(l.start.InFlight, parts) {
		all.Go(func() {
			for !failed.Load() {
				part := int(next.Add(1)) - 1
				if part >= parts {
					return
				}
				from := part * l.start.Rows
				faults[part] = l.ask(question, in, out, from, min(from+l.start.Rows, in.Rows))
				if faults[part] != nil {
					failed.Store(true)
				}
			}
		})
	}
	all.Wait()
	for _, err := range faults {
		if err != nil {
			return err
		}
	}
	return nil
}
