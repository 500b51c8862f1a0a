package conform

import (
	"context"
	"errors"
	"fmt"
	"os"
	"os/exec"
	"slices"
	"strings"
	"sync/atomic"
	"testing"
	"time"

	"wane/sim/law"
	"wane/sim/rpc"
)

// paced takes its time for each row.
type paced struct {
	law.Law
	clock *clock
	row   time.Duration
}

func (p paced) Answer(question string, in law.Batch) (law.Batch, error) {
	p.clock.pass(50*time.Microsecond + time.Duration(in.Rows)*p.row)
	return p.Law.Answer(question, in)
}

// TestProcessFaults feeds the judge processes with one fault each.
func TestProcessFaults(t *testing.T) {
	quick := builtin(t, "remnant/cummings")
	for _, x := range []struct {
		fault
		change func(*Subject, *clock)
	}{
		{fault{name: "cannot be built", check: "folder", level: Fail, says: "no such package"}, func(s *Subject, _ *clock) {
			s.Ready = func(context.Context) error { return errors.New("no such package") }
		}},
		{fault{name: "does not start", check: "start", level: Fail, says: "second fault"}, func(s *Subject, _ *clock) {
			s.Open = func(context.Context) (Process, error) {
				return nil, errors.Join(errors.New("first fault"), errors.New("second fault"))
			}
		}},
		{fault{name: "a column in another unit", check: "units", level: Fail, says: `"kg"`}, refused(`card: question wear: column mass: unit "kg", want "solMass"`)},
		{fault{name: "a card that changes while it is read", check: "describe", level: Fail, says: "twice"}, refused("card: it is not the same when asked for twice")},
		{fault{name: "a card that the host refuses", check: "card", level: Fail, says: "preset"}, refused("card: parameter x: preset 3 outside 0 .. 1")},
		{fault{name: "slow to start", check: "start", level: Warn, says: "7.0 s"}, func(s *Subject, c *clock) {
			s.Open = func(context.Context) (Process, error) {
				c.pass(7 * time.Second)
				return process{Law: quick, clock: c}, nil
			}
		}},
		{fault{name: "slow answers", check: "speed", level: Warn, says: "20µs a row"}, func(s *Subject, c *clock) {
			s.Open = func(context.Context) (Process, error) {
				return process{Law: paced{quick, c, 20 * time.Microsecond}, clock: c}, nil
			}
		}},
		{fault{name: "answers that take for ever", check: "speed", level: Fail, says: "2ms a row"}, func(s *Subject, c *clock) {
			s.Open = func(context.Context) (Process, error) {
				return process{Law: paced{quick, c, 2 * time.Millisecond}, clock: c}, nil
			}
		}},
		{fault{name: "another answer in each process", check: "fresh", level: Fail, says: "then in a new one"}, func(s *Subject, c *clock) {
			started := 0
			s.Open = func(context.Context) (Process, error) {
				started++
				shift := 1e-12 * float64(started)
				return process{Law: each(quick, "die", "chance_white_dwarf", func(_ law.Batch, _ int, v float64) float64 { return v - shift }), clock: c}, nil
			}
		}},
		{fault{name: "another card in each process", check: "describe", level: Fail, says: "version differs"}, func(s *Subject, c *clock) {
			started := 0
			s.Open = func(context.Context) (Process, error) {
				started++
				version := string(rune('0' + started))
				return process{Law: carded(quick, func(c *law.Card) { c.Version = version }), clock: c}, nil
			}
		}},
		{fault{name: "starts but once", check: "fresh", level: Fail, says: "no more"}, func(s *Subject, c *clock) {
			started := 0
			s.Open = func(context.Context) (Process, error) {
				if started++; started > 1 {
					return nil, errors.New("no more")
				}
				return process{Law: quick, clock: c}, nil
			}
		}},
		{fault{name: "crashes that were healed", check: "crash", level: Fail, says: "2 times; its log: the last line of its log"}, func(s *Subject, c *clock) {
			s.Open = func(context.Context) (Process, error) { return process{Law: quick, clock: c, restarts: 2}, nil }
		}},
		{fault{name: "slow to end", check: "end", level: Fail, says: "2.5 s"}, func(s *Subject, c *clock) {
			s.Open = func(context.Context) (Process, error) {
				return process{Law: quick, clock: c, closing: 2500 * time.Millisecond}, nil
			}
		}},
		{fault{name: "had to be killed", check: "end", level: Fail, says: "killed"}, func(s *Subject, c *clock) {
			s.Open = func(context.Context) (Process, error) {
				return process{Law: quick, clock: c, fails: errors.New("killed")}, nil
			}
		}},
		{fault{name: "leaves its socket", check: "end", level: Fail, says: "/tmp/socket"}, func(s *Subject, c *clock) {
			s.Open = func(context.Context) (Process, error) {
				return process{Law: quick, clock: c, left: []string{"/tmp/socket"}}, nil
			}
			s.Left = func(p Process) []string { return p.(process).left }
		}},
		{fault{name: "content with being started by hand", check: "by-hand", level: Warn, says: "exit code 0"}, func(s *Subject, _ *clock) {
			s.ByHand = func(context.Context) (string, int, error) { return "hello", 0, nil }
		}},
		{fault{name: "silent when started by hand", check: "by-hand", level: Warn, says: "said nothing"}, func(s *Subject, _ *clock) {
			s.ByHand = func(context.Context) (string, int, error) { return " ", 1, nil }
		}},
	} {
		t.Run(x.name, func(t *testing.T) {
			c := &clock{}
			s := Subject{Open: func(context.Context) (Process, error) { return process{Law: quick, clock: c}, nil }, now: c.now}
			x.change(&s, c)
			expect(t, judged(t, s), x.fault)
		})
	}
}

// mortal ends for good over a row of next to no mass.
type mortal struct {
	law.Law
	dead *atomic.Bool
}

func (m mortal) Answer(question string, in law.Batch) (law.Batch, error) {
	if mass := in.Values("mass"); len(mass) > 0 && slices.Min(mass) < 1e-100 {
		m.dead.Store(true)
	}
	if m.dead.Load() {
		return law.Batch{}, &rpc.StoppedError{Batch: 7, Rows: 351, Restarts: 2, Reason: "no answer within 5s"}
	}
	return m.Law.Answer(question, in)
}

// What comes after a law's end is no finding.
func TestEndedForGood(t *testing.T) {
	var begun []string
	s := running(mortal{builtin(t, "evaporation/black-body"), new(atomic.Bool)})
	s.Begins = func(check string) { begun = append(begun, check) }
	failures := 0
	for _, f := range judged(t, s) {
		if f.Level == Pass {
			continue
		}
		if failures++; f.Check != "domain" || !strings.Contains(f.Text, "no answer within 5s") {
			t.Errorf("%+v", f)
		}
	}
	if failures != 1 || slices.Contains(begun, "parameter") || slices.Contains(begun, "fresh") || !slices.Contains(begun, "end") {
		t.Errorf("%d failures, checks begun: %v", failures, begun)
	}
}

// refused is a law whose card has a fault that only shows on its way here.
func refused(text string) func(*Subject, *clock) {
	return func(s *Subject, _ *clock) {
		s.Open = func(context.Context) (Process, error) {
			return nil, fmt.Errorf("opening: %w", &rpc.CardError{Name: "./it", Faults: []error{errors.New(text)}})
		}
	}
}

// What is left of a process is seen: our own is there, and so is a folder.
func TestRemains(t *testing.T) {
	here := t.TempDir()
	if got := remains(os.Getpid(), here); len(got) != 2 {
		t.Errorf("of a process that runs: %v", got)
	}
	c := exec.Command(os.Args[0], "-test.run", "^$")
	if err := c.Run(); err != nil {
		t.Fatal(err)
	}
	if got := remains(c.ProcessState.Pid(), here+"/gone"); len(got) != 0 {
		t.Errorf("of a process that has ended: %v", got)
	}
}

// A judgement that is interrupted is none.
func TestInterrupted(t *testing.T) {
	ctx, cancel := context.WithCancel(context.Background())
	s := running(builtin(t, "evaporation/page"))
	var begun []string
	s.Begins = func(check string) {
		if begun = append(begun, check); check == "answer" {
			cancel()
		}
	}
	findings, err := Judge(ctx, s)
	if !errors.Is(err, context.Canceled) || findings != nil {
		t.Errorf("got %v, %v", findings, err)
	}
	if slices.Contains(begun, "domain") {
		t.Errorf("went on with %v", begun)
	}
}

// Every check that may find something has advice.
func TestAdvice(t *testing.T) {
	seen := map[string]bool{}
	for _, c := range checks {
		if c.advice == "" || seen[c.word] || c.passed == "" {
			t.Errorf("check %q: advice %q, passed %q, twice %v", c.word, c.advice, c.passed, seen[c.word])
		}
		seen[c.word] = true
	}
}
