package cli

import (
	"bytes"
	"context"
	"encoding/json"
	"errors"
	"math"
	"os"
	"path/filepath"
	"reflect"
	"strings"
	"sync/atomic"
	"testing"

	"wane/plugins"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/rpc/folder"
	"wane/sim/scenario"
)

// strangers opens laws in this very process, and counts those that are open.
type strangers struct {
	law    law.Law
	err    error
	opened atomic.Int32
	open   atomic.Int32
}

func (s *strangers) openLaw(_ context.Context, path string, o folder.Options) (*Outside, error) {
	if s.err != nil {
		return nil, s.err
	}
	f, err := folder.Read(path)
	if err != nil {
		return nil, err
	}
	sum, files, err := f.Digest()
	switch {
	case err != nil:
		return nil, err
	case o.Digest != "" && o.Digest != sum:
		return nil, &folder.Changed{Path: path, Want: o.Digest, Got: sum}
	}
	s.opened.Add(1)
	s.open.Add(1)
	return &Outside{
		Law: s.law, Path: path, Digest: sum, Files: files, Program: folder.File{Path: "/bin/sh", SHA256: strings.Repeat("0", 64)},
		Runtime: "this test", Restarts: func() int { return 0 }, Close: func() error { s.open.Add(-1); return nil },
	}, nil
}

// builtin is a built-in law, to be taken for one from outside.
func builtin(t *testing.T, process, name string) law.Law {
	t.Helper()
	r, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	l, ok := r.Find(process, name)
	if !ok {
		t.Fatalf("no law %s/%s", process, name)
	}
	return l
}

// lawFolder makes a folder that passes for a law.
func lawFolder(t *testing.T) string {
	t.Helper()
	dir := filepath.Join(t.TempDir(), "x")
	if err := os.Mkdir(dir, 0o755); err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(filepath.Join(dir, "law.toml"), []byte("start = [\"/bin/sh\"]\n"), 0o644); err != nil {
		t.Fatal(err)
	}
	return dir
}

// mainOf runs a command with laws from outside, and an engine if one is given.
func mainOf(s *strangers, engine RunFunc, args ...string) (code int, out, said string) {
	var o, e bytes.Buffer
	p := Standard()
	p.Out, p.Err, p.Open = &o, &e, s.openLaw
	if engine != nil {
		p.Run = engine
	}
	code = p.Main(args)
	return code, o.String(), e.String()
}

// Whatever way a command ends, the laws that it opened are closed.
func TestOutsideIsClosed(t *testing.T) {
	interrupted := func(ctx context.Context, sc *scenario.Scenario, _ *law.Registry, _ int, _ func(int, int)) (*ensemble.Summary, error) {
		return &ensemble.Summary{Interrupted: true, Requested: sc.Realisations, EvaporationStarts: math.NaN()}, nil
	}
	breaks := func(context.Context, *scenario.Scenario, *law.Registry, int, func(int, int)) (*ensemble.Summary, error) {
		return nil, errors.New("law x: it broke off")
	}
	dir := lawFolder(t)
	for _, c := range []struct {
		what   string
		engine RunFunc
		code   int
		args   string
	}{
		{"a run", nil, ExitOK, "run little-lamp --objects 200 --realisations 1 --law evaporation=" + dir},
		{"a run that fails", breaks, ExitFailed, "run little-lamp --law evaporation=" + dir},
		{"a run that is interrupted", interrupted, ExitInterrupted, "run little-lamp --law evaporation=" + dir},
		{"a folder that may not be written", nil, ExitBadInput, "run little-lamp --out " + dir + " --law evaporation=" + dir},
		{"a fault of the scenario", nil, ExitBadInput, "run little-lamp --set evaporation.what=1 --law evaporation=" + dir},
		{"a law of another process", nil, ExitBadInput, "run little-lamp --law ejection=" + dir},
		{"a check", nil, ExitOK, "check little-lamp --law evaporation=" + dir},
		{"a card", nil, ExitOK, "laws " + dir},
		{"a question", nil, ExitOK, "ask " + dir + " mass=10Msun"},
		{"a question that is none", nil, ExitBadInput, "ask " + dir + " mass=10"},
	} {
		s := &strangers{law: builtin(t, "evaporation", "page")}
		code, _, said := mainOf(s, c.engine, strings.Fields(c.args)...)
		if code != c.code {
			t.Errorf("%s: exit code %d, want %d: %s", c.what, code, c.code, said)
		}
		if s.opened.Load() != 1 || s.open.Load() != 0 {
			t.Errorf("%s: %d opened, %d still open", c.what, s.opened.Load(), s.open.Load())
		}
	}
}

// panics is an engine that should not be.
func panics(context.Context, *scenario.Scenario, *law.Registry, int, func(int, int)) (*ensemble.Summary, error) {
	panic("a fault of the engine")
}

func TestOutsideIsClosedInAPanic(t *testing.T) {
	s := &strangers{law: builtin(t, "evaporation", "page")}
	func() {
		defer func() { _ = recover() }()
		mainOf(s, panics, "run", "little-lamp", "--law", "evaporation="+lawFolder(t))
	}()
	if s.opened.Load() != 1 || s.open.Load() != 0 {
		t.Errorf("%d opened, %d still open", s.opened.Load(), s.open.Load())
	}
}

// A law from outside that is the built-in one gives the same answer in every
// byte, but for what says where it came from.
func TestOutsideTwin(t *testing.T) {
	dir := lawFolder(t)
	documents := [2]map[string]any{}
	for i, extra := range []string{"", " --law evaporation=" + dir} {
		s := &strangers{law: builtin(t, "evaporation", "page")}
		code, out, said := mainOf(s, nil, strings.Fields("run little-lamp --objects 500 --realisations 2 --json --set evaporation.lightest_neutrino=0.01eV"+extra)...)
		if code != ExitOK {
			t.Fatal(said)
		}
		if err := json.Unmarshal([]byte(out), &documents[i]); err != nil {
			t.Fatal(err)
		}
	}
	outside, _ := documents[1]["outside"].([]any)
	if _, there := documents[0]["outside"]; there || len(outside) != 1 {
		t.Errorf("outside: %v, built in: %v", outside, documents[0]["outside"])
	}
	delete(documents[1], "outside")
	if !reflect.DeepEqual(documents[0], documents[1]) {
		t.Error("other answers")
	}
}

// What is interrupted while a law is being started ends as what is interrupted.
func TestOutsideInterrupted(t *testing.T) {
	s := &strangers{law: builtin(t, "evaporation", "page"), err: context.Canceled}
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	p := Standard()
	p.Err, p.Open = &bytes.Buffer{}, s.openLaw
	for _, args := range []string{"run little-lamp --law evaporation=./x", "ask ./x mass=1Msun", "check little-lamp --law evaporation=./x"} {
		root := p.root()
		root.SetArgs(strings.Fields(args))
		var f *fault
		if err := root.ExecuteContext(ctx); !errors.As(err, &f) || f.code != ExitInterrupted {
			t.Errorf("wane %s: %v, want an exit code of %d", args, err, ExitInterrupted)
		}
	}
}

// A law that does not start is a fault of the input.
func TestOutsideThatDoesNotStart(t *testing.T) {
	s := &strangers{err: errors.New("law ./x: it is no law: it ended before it said where it listens")}
	for _, args := range []string{"run little-lamp --law evaporation=./x", "ask ./x mass=1Msun", "laws ./x", "check little-lamp --law evaporation=./x"} {
		code, out, said := mainOf(s, nil, strings.Fields(args)...)
		if code != ExitBadInput || out != "" || !strings.Contains(said, "it is no law") {
			t.Errorf("wane %s: exit code %d, printed %q, said %q", args, code, out, said)
		}
	}
}

// The logs of laws are shown where they matter, in words.
func TestLawLog(t *testing.T) {
	const records = "building law ./x\n" +
		`{"level":"debug","law":"./x","message":"starting plugin"}
{"level":"error","law":"./x","message":"plugin process exited"}
{"level":"debug","law":"./x","from":"x.py","message":"mass is 3"}
{"level":"debug","law":"./x","from":"x.py","said":"2026-12-01","message":"plugin address"}
{"level":"warn","law":"./x","from":"x.py","message":"a table is short"}
{"level":"error","law":"./x","from":"x.py","message":"panic: no mass"}
{"level":"error","law":"./x","from":"x.py","message":"goroutine 1 [running]:"}
`
	const warned = "wane: building law ./x\nwane: law ./x: a table is short\nwane: law ./x: panic: no mass\n"
	for all, want := range map[bool]string{false: warned, true: strings.Replace(warned, "wane: law", "wane: law ./x: mass is 3\nwane: law", 1)} {
		var said bytes.Buffer
		p := &Program{Err: &said}
		w := p.lawLog(&settings{}, all)
		for _, part := range []string{records[:100], records[100:]} { // a line may come in pieces
			if _, err := w.Write([]byte(part)); err != nil {
				t.Fatal(err)
			}
		}
		if said.String() != want {
			t.Errorf("all: %v: said\n%s\nwant\n%s", all, said.String(), want)
		}
	}
	if (&Program{}).lawLog(&settings{quiet: true}, true) != nil {
		t.Error("a quiet command has a log")
	}
}
