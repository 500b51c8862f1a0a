package main

import (
	"fmt"
	"os"
	"path/filepath"
	"sync"
	"sync/atomic"
	"time"

	"wane/sim/law"
)

// faulty is a law with a fault of its card or its answers.
type faulty struct {
	law.Law
	fault  string
	more   []string
	folder string
	start  int // which one this is

	described, asked atomic.Int64

	mu  sync.Mutex
	bad string // the object whose value is wrong
}

func (f *faulty) Describe() law.Card {
	card := f.Law.Describe()
	n := f.described.Add(1) // the first is by Serve itself
	switch f.fault {
	case "describe-crash":
		if n > 1 {
			fmt.Fprintln(os.Stderr, "the card is not at hand")
			os.Exit(4)
		}
	case "describe-panic":
		if n > 1 {
			panic("no card")
		}
	case "describe-hang":
		if n > 1 {
			fmt.Fprintln(os.Stderr, "looking for the card")
			time.Sleep(forever)
		}
	case "describe-changes":
		card.Summary += fmt.Sprintf(" (%d)", n)
	case "describe-changes-later":
		card.Summary += fmt.Sprintf(" (start %d)", f.start)
	case "bad-card":
		badCard(&card)
	case "heavy": // remnants of one mass, whatever the star's
		for i, q := range card.Questions {
			if q.Name == "remain" {
				card.Questions[i].Inputs = []string{"u"}
			}
		}
	}
	return card
}

// badCard has every fault that a card may have.
func badCard(c *law.Card) {
	c.Questions = append(c.Questions[:1:1], law.Question{Name: "flutter"})
	c.Questions[0].Inputs = []string{"mass", "colour"}
	c.Sources = nil
	c.Thresholds = append(c.Thresholds, law.Threshold{Kind: "black-hole", Mass: 1e9, Becomes: "teapot", Outcome: "Tea Time"})
	c.Parameters = []law.Parameter{
		{Name: "k", Low: 0, High: 3, Preset: 4, Citation: "assumption"},
		{Name: "tau", Low: 0, High: 3, Preset: 1},
	}
}

// Answer does what the fault says to the answer of the law, or to the process.
// Faults of the process count the questions of this start.
func (f *faulty) Answer(question string, in law.Batch) (law.Batch, error) {
	n := int(f.asked.Add(1))
	// word:N:TIMES happens at question N of the first TIMES starts; none: of all.
	at, times := f.number0(0), f.number0(1)
	if act, ok := acts[f.fault]; ok && n >= max(1, at) && (times == 0 || f.start <= times) {
		f.begins()
		act()
	}
	if f.fault == "heavy" && question == "remain" {
		mass, composition := in.NewValues(), in.NewWords()
		for i := range mass {
			mass[i], composition[i] = 900, law.CarbonOxygen
		}
		return in.Answer(law.Numbers("mass", mass), law.Codes("composition", composition)), nil
	}
	if f.fault == "mirror" { // quantiles fall
		in = mirrored(in)
	}
	out, err := f.Law.Answer(question, in)
	if err != nil {
		return out, err
	}
	if change, ok := changes[f.fault]; ok {
		change(f, n, in, out)
	}
	if f.fault == "replaces" && n == 3 && f.start == 1 {
		f.replace()
	}
	return out, nil
}

// replace puts another file into the place of one, as an installation does:
// replaces:FILE:what-then.
func (f *faulty) replace() {
	data, err := os.ReadFile(f.more[0])
	if err == nil {
		err = os.WriteFile(filepath.Join(f.folder, "new"), append(data, '\n'), 0o755)
	}
	if err == nil {
		err = os.Rename(filepath.Join(f.folder, "new"), f.more[0])
	}
	if err != nil {
		panic(err)
	}
	acts[f.more[1]]()
}

func (f *faulty) number0(i int) int {
	if _, ok := acts[f.fault]; !ok {
		return 0
	}
	return f.number(i)
}
