//go:build linux

package rpc_test

import (
	"context"
	"errors"
	"testing"
	"time"

	"wane/sim/law"
	"wane/sim/rpc"
)

// A process that ends or hangs is started again and asked the same once more:
// the answers are those of a law without fault, to the bit.
func TestFaultsHealed(t *testing.T) {
	leavesNothing(t)
	for _, x := range []struct {
		fault    string
		restarts int
	}{
		{"none", 0}, {"swapped", 0},
		{"crash:1:1", 1}, {"crash:3:1", 1}, {"crash:2:2", 2},
		{"exit-0:2:1", 1}, {"fatal:2:1", 1}, {"killed:2:1", 1}, {"balloon:2:1", 1},
		{"hang:2:1", 1}, {"spin:2:1", 1}, {"stop:2:1", 1},
		{"print", 0}, {"flood", 0}, {"offspring", 0},
	} {
		t.Run(x.fault, func(t *testing.T) {
			t.Parallel()
			s := faulty(t, x.fault, hole)
			s.Rows, s.Answering = 300, 1500*time.Millisecond
			l, err := rpc.Open(context.Background(), s)
			if err != nil {
				t.Fatal(err)
			}
			within(t, 4*soon, func() {
				for range 3 {
					sameBits(t, l, hole, "wear", rows(hole, "wear", 1000))
				}
			})
			if l.Restarts() != x.restarts {
				t.Errorf("started again %d times, want %d", l.Restarts(), x.restarts)
			}
			within(t, soon, func() {
				if err := l.Close(); err != nil {
					t.Error(err)
				}
			})
		})
	}
}

// What cannot be healed is named: what happened, how often, and the law's last
// words. Nothing is asked after that.
func TestFaultsNamed(t *testing.T) {
	leavesNothing(t)
	for _, x := range []struct {
		fault string
		asks  int // before it fails
		words []string
	}{
		{"crash", 0, []string{"batch 1 of 5 rows: its process ended (exit status 3); it had been started again 2 times before; its log:", "a table has a hole in it"}},
		{"crash:2", 2, []string{"batch 4 of 5 rows: its process ended (exit status 3); it had been started again 2 times before; its log:", "a table has a hole in it"}},
		{"exit-0", 0, []string{"its process ended (exit status 0)", "good night"}},
		{"fatal", 0, []string{"its process ended (exit status 2)", "panic: lost in the tables"}},
		{"killed", 0, []string{"its process ended (signal: killed): did it run out of memory?", "eating"}},
		{"balloon", 0, []string{"its process ended (exit status 2)", "eating", "out of memory"}},
		{"hang", 0, []string{"no answer within 400ms", "thinking"}},
		{"stop", 0, []string{"no answer within 400ms", "stopping"}},
	} {
		t.Run(x.fault, func(t *testing.T) {
			t.Parallel()
			s := faulty(t, x.fault, hole)
			if x.fault == "hang" || x.fault == "stop" {
				s.Answering = 400 * time.Millisecond
			}
			l, err := rpc.Open(context.Background(), s)
			if err != nil {
				t.Fatal(err)
			}
			defer l.Close()
			use := law.NewUse(l)
			for range x.asks {
				if _, err := use.Ask("wear", holes(5)); err != nil {
					t.Fatal(err)
				}
			}
			within(t, 2*soon, func() {
				_, err := use.Ask("wear", holes(5))
				says(t, err, append([]string{"law ./my-burden (evaporation/black-body): question wear: "}, x.words...)...)
				var stopped *rpc.StoppedError
				if !errors.As(err, &stopped) || stopped.Rows != 5 {
					t.Errorf("got %#v, want a StoppedError", err)
				}
				_, again := use.Ask("wear", holes(2))
				if again == nil || again.Error() != err.Error() {
					t.Errorf("asked after that: %v, want the same error", again)
				}
			})
		})
	}
}

// A law that stumbles over a batch lives on; its own words are shown, and it is
// not asked the same again.
func TestFaultsOfTheLaw(t *testing.T) {
	leavesNothing(t)
	l := open(t, faulty(t, "panic", hole))
	use := law.NewUse(l)
	_, err := use.Ask("wear", holes(5))
	says(t, err, "law ./my-burden (evaporation/black-body): question wear: panic: runtime error: index out of range [4] with length 0 at acts.go:")
	if log := l.Log(); l.Restarts() != 0 || l.PID() == 0 || len(log) == 0 {
		t.Errorf("started again %d times, log %q", l.Restarts(), log)
	}
}

// An answer of a wrong shape is refused with what it is and what it must be.
func TestFaultsOfShape(t *testing.T) {
	leavesNothing(t)
	for fault, want := range map[string]string{
		"seq":     "an answer to batch 8, want one to batch 1",
		"rows":    "an answer of 6 rows, want 5",
		"short":   "column log10_rate: 4 rows, want 5 rows of 8 bytes",
		"long":    "column log10_rate: 6 rows, want 5 rows of 8 bytes",
		"ragged":  "column heat: 37 bytes, want 5 rows of 8 bytes",
		"empty":   "column log10_rate: 0 rows, want 5 rows of 8 bytes",
		"nothing": `no column "log10_rate" in the answer, want [log10_rate heat]`,
		"unnamed": "an answer with 1 names for 2 columns",
		"unknown": `unknown column "colour" in the answer, want [log10_rate heat]`,
		"twice":   `column "heat" is in the answer twice`,
		"garbage": "a message that cannot be read",
		"huge":    "larger than max",
	} {
		t.Run(fault, func(t *testing.T) {
			t.Parallel()
			l, err := rpc.Open(context.Background(), faulty(t, fault, hole))
			if err != nil {
				t.Fatal(err)
			}
			defer l.Close()
			_, err = law.NewUse(l).Ask("wear", holes(5))
			says(t, err, "law ./my-burden (evaporation/black-body): question wear: ", want, "; its log:\n  made by hand")
			var wrong *rpc.AnswerError
			if !errors.As(err, &wrong) || l.Restarts() != 0 {
				t.Errorf("got %#v, want an AnswerError and no restart", err)
			}
		})
	}
}
