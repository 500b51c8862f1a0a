package rpc

import (
	"io"
	"time"
)

// Start says how to start an outside law.
type Start struct {
	Name string   // what the person called it ("./my-burden"): for messages
	Args []string // the program and its arguments; never a shell
	Dir  string   // where it runs; empty: here
	Env  []string // KEY=value, besides the few variables that every law gets
	Log  io.Writer
	Options
}

// Options are limits that hold while an outside law runs. Zero values stand
// for the usual ones.
type Options struct {
	Starting    time.Duration // until it says where it listens: 10 s
	Describing  time.Duration // for its card: 5 s
	Answering   time.Duration // for a batch: 5 s, or 20 times what such a batch usually takes if that is more
	Ending      time.Duration // to end by itself: 3 s, then it is killed
	Rows        int           // in a call: 16384, at most 65536; larger batches are split
	InFlight    int           // calls at once: 2
	MaxRestarts int           // in all: 2; below zero: none

	// OnlyCalls keeps to grpc where the law offers a socket of its own.
	OnlyCalls bool

	// AskOnce leaves it to others to find out whether the law is pure: else a
	// few rows of the first batches are asked again.
	AskOnce bool

	// BeforeRestart, if given, may refuse to start the law again, because its
	// files are no longer what they were.
	BeforeRestart func() error
}

const (
	usualRows   = 16384
	mostRows    = 65536
	slowAnswers = 20 // times the usual time of an answer is too long
)

func (o Options) withDefaults() Options {
	orElse := func(d *time.Duration, usual time.Duration) {
		if *d <= 0 {
			*d = usual
		}
	}
	orElse(&o.Starting, 10*time.Second)
	orElse(&o.Describing, 5*time.Second)
	orElse(&o.Answering, 5*time.Second)
	orElse(&o.Ending, 3*time.Second)
	if o.Rows <= 0 {
		o.Rows = usualRows
	}
	o.Rows = min(o.Rows, mostRows)
	if o.InFlight <= 0 {
		o.InFlight = 2
	}
	if o.MaxRestarts == 0 {
		o.MaxRestarts = 2
	}
	return o
}
