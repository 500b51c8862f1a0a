package main

import (
	"context"
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"sync/atomic"
	"testing"
	"testing/fstest"

	"wane/plugins"
	"wane/sim/engine"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/rpc"
	"wane/sim/scenario"
	"wane/sim/sky"
)

var built string // the program under test

func TestMain(m *testing.M) {
	os.Exit(func() int {
		dir, err := os.MkdirTemp("", "wane-law-test")
		if err != nil {
			fmt.Fprintln(os.Stderr, err)
			return 1
		}
		defer os.RemoveAll(dir)
		built = filepath.Join(dir, "wane-law.exe")
		if out, err := exec.Command("go", "build", "-o", built, ".").CombinedOutput(); err != nil {
			fmt.Fprintf(os.Stderr, "go build: %v\n%s", err, out)
			return 1
		}
		return m.Run()
	}())
}

// asked counts the questions that a law is asked.
type asked struct {
	law.Law
	times atomic.Int64
}

func (a *asked) Answer(question string, in law.Batch) (law.Batch, error) {
	a.times.Add(1)
	return a.Law.Answer(question, in)
}

// Rows passes on how many rows the law likes at a time.
func (a *asked) Rows() int { return a.Law.(law.Batcher).Rows() }

// outside starts a built-in law outside the program, with so many rows in a
// call.
func outside(t *testing.T, l law.Law, rows int, onlyCalls bool) *asked {
	t.Helper()
	card := l.Describe()
	id := card.Process + "/" + card.Name
	out, err := rpc.Open(context.Background(), rpc.Start{Name: built, Args: []string{built, id}, Options: rpc.Options{Rows: rows, OnlyCalls: onlyCalls}})
	if err != nil {
		t.Fatal(err)
	}
	t.Cleanup(func() {
		if err := out.Close(); err != nil {
			t.Errorf("%s: %v", id, err)
		}
	})
	return &asked{Law: out}
}

func builtin(t testing.TB) []law.Law {
	t.Helper()
	reg, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	return reg.All()
}

// lamp is a galaxy small enough to be run a hundred times, with populations for
// which every law of cooling is asked.
const lamp = `
title        = "a lamp"
question     = "Does it matter where a law is?"
realisations = 2
seed         = 1

[galaxy]
objects      = 1500
radius       = "30 pc"
central-mass = "30 Msun"

[populations.warm-neutron-stars]
kinds       = ["neutron-star"]
temperature = "> 1000 K"

[populations.warm-brown-dwarfs]
kinds       = ["brown-dwarf"]
temperature = "> 100 K"
`

// outcomes is everything that some realisations of a galaxy came to, in full precision: dates and counts of all populations, what took their
// members, and the ledger.
func outcomes(t *testing.T, laws []law.Law, workers int, chosen ...string) string {
	t.Helper()
	reg, err := law.NewRegistry(laws...)
	if err != nil {
		t.Fatal(err)
	}
	files := fstest.MapFS{"lamp.toml": {Data: []byte(lamp)}}
	sc, _, err := scenario.Load(files, "lamp.toml", reg, plugins.Defaults(), scenario.Overrides{Laws: chosen})
	if err != nil {
		t.Fatal(err)
	}
	set, err := sc.Set(reg)
	if err != nil {
		t.Fatal(err)
	}
	background, err := sky.Prepare(set)
	if err != nil {
		t.Fatal(err)
	}
	model, err := engine.Compile(engine.Setup{
		Set: set, Sky: skies{background}, Objects: int(sc.Held()), Real: sc.Objects, Radius: sc.Radius,
		CentralMass: sc.CentralMass, Until: sc.Until, Seed: sc.Seed, Populations: sc.Populations,
	})
	if err != nil {
		t.Fatal(err)
	}
	done, err := ensemble.Each(context.Background(), sc.Realisations, workers, model.NewWorkspace,
		func(w *engine.Workspace, r int) (*engine.Outcome, error) {
			return w.Run(context.Background(), uint64(r))
		}, nil)
	if err != nil {
		t.Fatal(err)
	}
	text := ""
	for r, o := range done.Results {
		text += fmt.Sprintf("realisation %d: %+v\n", r, *o) // the shortest digits that name each float
	}
	return text
}

type skies struct{ prepared *sky.Prepared }

func (s skies) Draw(seed, realisation uint64) (engine.Sky, error) {
	return s.prepared.Draw(seed, realisation)
}

// TestTwins runs the same galaxy with each built-in law in turn outside the
// program and inside: not a bit may differ, for any number of workers and any
// size of calls.
func TestTwins(t *testing.T) {
	laws := builtin(t)
	for i, inside := range laws {
		card := inside.Describe()
		t.Run(card.Process+"/"+card.Name, func(t *testing.T) {
			chosen := card.Process + "=" + card.Name
			want := outcomes(t, laws, 1, chosen)
			for _, way := range []struct{ workers, rows int }{{1, 97}, {2, 16384}} {
				out := outside(t, inside, way.rows, false)
				mixed := append([]law.Law(nil), laws...)
				mixed[i] = out
				if got := outcomes(t, mixed, way.workers, chosen); got != want {
					t.Errorf("%d workers, %d rows a call:\ninside:  %s\noutside: %s", way.workers, way.rows, want, got)
				}
				// A law that never acts is not asked, and one of pairs only by `wane ask`.
				if out.times.Load() == 0 && !card.Idle && card.Process != "orbital-decay" {
					t.Error("the run did not ask it anything")
				}
			}
		})
	}
}

// TestAllOutside has every law of a run in a process of its own.
func TestAllOutside(t *testing.T) {
	laws := builtin(t)
	want := outcomes(t, laws, 1)
	for _, rows := range []int{97, 16384} {
		all := make([]law.Law, len(laws))
		for i, inside := range laws {
			all[i] = outside(t, inside, rows, rows == 16384) // both ways across
		}
		for _, workers := range []int{1, 2} {
			if got := outcomes(t, all, workers); got != want {
				t.Errorf("%d workers, %d rows a call:\ninside:  %s\noutside: %s", workers, rows, want, got)
			}
		}
	}
}
