package rpc

import (
	"bytes"
	"context"
	"errors"
	"fmt"
	"slices"
	"time"

	"wane/sim/law"
)

// AnswerError is an answer that a law did not give, or gave in a wrong shape:
// its own doing, which asking again would not change.
type AnswerError struct {
	Reason string
	Log    string
}

func (e *AnswerError) Error() string {
	if e.Log == "" {
		return e.Reason
	}
	return e.Reason + logged(e.Log)
}

// StoppedError is a process that ended or hung too often.
type StoppedError struct {
	Batch    uint64 // which one it was
	Rows     int
	Restarts int
	Reason   string
	Log      string
}

func (e *StoppedError) Error() string {
	again := "it had been started again once before"
	switch e.Restarts {
	case 0:
		again = "it was not started again"
	case 1:
	default:
		again = fmt.Sprintf("it had been started again %d times before", e.Restarts)
	}
	return fmt.Sprintf("batch %d of %d rows: %s; %s%s", e.Batch, e.Rows, e.Reason, again, logged(e.Log))
}

// ask has rows from .. to answered into out. A process that is lost on the way
// is replaced, and the batch sent again.
func (l *Law) ask(question string, in law.Batch, out []law.Column, from, to int) error {
	select {
	case l.slots <- struct{}{}:
		defer func() { <-l.slots }()
	case <-l.ctx.Done():
		return l.ctx.Err()
	}
	rows := to - from
	seq := l.seq.Add(1)
	kinds := in.Kinds
	if slices.Equal(kinds, law.KindWords) {
		kinds = nil
	}
	batch := encodeBatch(&l.memory, seq, question, in, from, to, kinds)
	batch.kept = true
	defer batch.buffer.Free()
	read := func(message []byte) error {
		reason, err := readResult(message, seq, out, from, to)
		if err != nil {
			return &AnswerError{Reason: err.Error(), Log: l.Log()}
		}
		if reason != "" {
			return &AnswerError{Reason: reason}
		}
		return nil
	}
	for {
		c, err := l.running()
		if err != nil {
			return err
		}
		within := max(l.start.Answering, slowAnswers*l.times.median(rows))
		began := time.Now()
		err = c.answer(l.ctx, within, batch, read)
		var wrong *AnswerError
		switch {
		case err == nil:
			l.times.note(rows, time.Since(began))
			return nil
		case l.ctx.Err() != nil:
			return l.ctx.Err()
		case errors.As(err, &wrong):
			return err
		case !lost(err, c):
			return &AnswerError{Reason: callFault(err, c, within), Log: l.Log()}
		}
		if err := l.replace(c, &StoppedError{Batch: seq, Rows: rows, Reason: callFault(err, c, within)}); err != nil {
			return err
		}
	}
}

// running is the present child, or the reason why there is none.
func (l *Law) running() (*child, error) {
	l.mu.Lock()
	defer l.mu.Unlock()
	if l.stopped != nil {
		return nil, l.stopped
	}
	return l.child, nil
}

// replace starts another process for one that was lost. When several calls
// lose the same one, the first replaces it for all: none can know whose batch
// it was. One loss more than is allowed stops the law for good.
func (l *Law) replace(c *child, fault *StoppedError) error {
	l.mu.Lock()
	defer l.mu.Unlock()
	if l.stopped != nil {
		return l.stopped
	}
	if l.child != c {
		return nil
	}
	stop := func() error {
		fault.Restarts, fault.Log = l.restarts, l.Log()
		l.stopped = fault
		return fault
	}
	_ = c.end(l.start.Ending, true)
	if l.restarts >= l.start.MaxRestarts {
		return stop()
	}
	l.log.Warn("starting the law again", "batch", fault.Batch, "reason", fault.Reason)
	if err := l.startAgain(); err != nil {
		if errors.Is(err, context.Canceled) {
			return err
		}
		fault.Reason += "; starting it again: " + err.Error()
		return stop()
	}
	return nil
}

func (l *Law) startAgain() error {
	if check := l.start.BeforeRestart; check != nil {
		if err := check(); err != nil {
			return err
		}
	}
	l.restarts++
	c, err := startChild(l.ctx, l.start, l.folder.path, l.log, l.errs)
	if err != nil {
		return err
	}
	l.child = c
	card, err := c.describe(l.ctx, l.start.Describing, l.features())
	if err != nil {
		return err
	}
	c.converses(card.Direct, l.folder.path, l.start.InFlight)
	if !bytes.Equal(canonical(card), l.described) {
		return errors.New("its card is not what it was")
	}
	return nil
}
