package main

import (
	"bytes"
	"fmt"
	"math"
	"os"
	"os/exec"
	"path/filepath"
	"slices"
	"strconv"
	"sync"
	"sync/atomic"
	"syscall"
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

// acts are faults of a process in the middle of an answer.
var acts = map[string]func(){
	"nothing": func() {},
	"crash": func() {
		fmt.Fprintln(os.Stderr, "a table has a hole in it")
		os.Exit(3)
	},
	"exit-0": func() {
		fmt.Fprintln(os.Stderr, "good night")
		os.Exit(0)
	},
	"fatal": func() { // a panic that nobody can catch
		go func() { panic("lost in the tables") }()
		time.Sleep(forever)
	},
	"panic": func() { var table []float64; fmt.Fprintln(os.Stderr, table[len(os.Args)]) },
	"hang":  func() { fmt.Fprintln(os.Stderr, "thinking"); time.Sleep(forever) },
	"spin": func() {
		fmt.Fprintln(os.Stderr, "spinning")
		for spinning.Load() {
		}
	},
	"stop": func() {
		fmt.Fprintln(os.Stderr, "stopping")
		_ = syscall.Kill(os.Getpid(), syscall.SIGSTOP)
		time.Sleep(10 * time.Millisecond)
	},
	"killed": func() {
		fmt.Fprintln(os.Stderr, "eating")
		_ = syscall.Kill(os.Getpid(), syscall.SIGKILL)
		time.Sleep(forever)
	},
	"balloon": func() {
		fmt.Fprintln(os.Stderr, "eating")
		limit := syscall.Rlimit{Cur: 3 << 30, Max: 3 << 30}
		if err := syscall.Setrlimit(syscall.RLIMIT_AS, &limit); err != nil {
			panic(err)
		}
		for size := 1 << 24; ; size *= 2 {
			eaten = append(eaten, make([]byte, size))
		}
	},
	"print": func() { // past what catches it
		_, _ = syscall.Write(1, []byte("hello\n"))
		_, _ = syscall.Write(1, bytes.Repeat([]byte("hello "), 30_000))
		fmt.Println("a word on standard output")
	},
	"flood": func() {
		_, _ = os.Stderr.Write(bytes.Repeat([]byte("and "), 1<<18))
		for range 2000 {
			fmt.Fprintln(os.Stderr, "a line in a flood")
		}
	},
	"offspring": func() {
		c := exec.Command("sleep", "300")
		c.Stdout, c.Stderr = os.Stdout, os.Stderr
		if err := c.Start(); err != nil {
			panic(err)
		}
	},
}

var (
	spinning atomic.Bool
	eaten    [][]byte
)

func init() { spinning.Store(true) }

// changes are faults of the numbers themselves.
var changes = map[string]func(f *faulty, n int, in, out law.Batch){
	// value:COLUMN:NUMBER:ROW, the row of the first answer that has the column;
	// and wherever the same is asked, for that is another fault.
	"value": func(f *faulty, _ int, in, out law.Batch) {
		v, err := strconv.ParseFloat(f.more[1], 64)
		if err != nil {
			panic(err)
		}
		values := out.Values(f.more[0])
		f.mu.Lock()
		if f.bad == "" && f.number(2) < len(values) {
			f.bad = in.Object(f.number(2))
		}
		bad := f.bad
		f.mu.Unlock()
		for i := range values {
			if in.Object(i) == bad {
				values[i] = v
			}
		}
	},
	// scale:COLUMN:FACTOR
	"scale": func(f *faulty, _ int, _, out law.Batch) {
		by, err := strconv.ParseFloat(f.more[1], 64)
		if err != nil {
			panic(err)
		}
		values := out.Values(f.more[0])
		for i := range values {
			values[i] *= by
		}
	},
	"word": func(f *faulty, _ int, _, out law.Batch) {
		codes := out.Words(f.more[0])
		for i := range codes {
			codes[i] = 77
		}
	},
	"falls": func(f *faulty, _ int, _, out law.Batch) { // from 10 on
		values := out.Values(f.more[0])
		for i, v := range values {
			if v > 10 {
				values[i] = 20 - v
			}
		}
	},
	// An answer that hangs on the rows before.
	"by-order": func(f *faulty, _ int, _, out law.Batch) {
		values := out.Columns[0].Values
		for i := range values {
			values[i] += 1e-9 * math.Abs(values[i]) * float64(i)
		}
	},
	// An answer that hangs on how often it was asked.
	"by-count": func(f *faulty, n int, _, out law.Batch) {
		values := out.Columns[0].Values
		for i := range values {
			values[i] += 1e-9 * math.Abs(values[i]) * float64(n)
		}
	},
}

func mirrored(in law.Batch) law.Batch {
	in.Columns = slices.Clone(in.Columns)
	for i, c := range in.Columns {
		if c.Name != "u" {
			continue
		}
		u := make([]float64, len(c.Values))
		for j, v := range c.Values {
			u[j] = 1 - v
		}
		in.Columns[i].Values = u
	}
	return in
}
