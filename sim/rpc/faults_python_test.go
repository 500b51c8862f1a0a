//go:build linux

package rpc_test

import (
	"context"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"
	"time"

	kit "wane/plugins/outside/python"
	"wane/sim/law"
	"wane/sim/rpc"
)

// interpreter is Debian's, which sees Debian's libraries.
const interpreter = "/usr/bin/python3"

// goodLaw is a law in Python, of which each fault changes some words.
const goodLaw = `import os, sys, time
import numpy as np
import wanelaw

card = wanelaw.Card(
    process="evaporation", name="mine", version="1", summary="made up for a test", formula="dM/dt = -M", domain="none",
    sources=["assumption"], accepts=wanelaw.Accepts(kinds=["black-hole", "central-hole"]),
    questions=[wanelaw.Question("wear", ["mass"])],
    parameters=[wanelaw.Parameter("k", low=0, high=3, preset=1, citation="assumption")],
)

def wear(mass, p):
    # HERE
    return -67 - p.k * mass, 0.0

if __name__ == "__main__":
    wanelaw.serve(card, wear)
`

// python starts a law in Python: the good one with some words replaced.
func python(t *testing.T, replace ...string) rpc.Start {
	t.Helper()
	dir := t.TempDir()
	if err := kit.Copy(dir); err != nil {
		t.Fatal(err)
	}
	text := strings.NewReplacer(replace...).Replace(goodLaw)
	if text == goodLaw && len(replace) > 0 {
		t.Fatalf("nothing to replace: %q", replace)
	}
	if err := os.WriteFile(filepath.Join(dir, "law.py"), []byte(text), 0o644); err != nil {
		t.Fatal(err)
	}
	return rpc.Start{Name: called, Args: []string{interpreter, "-B", "law.py"}, Dir: dir, Env: []string{mark(t)},
		Options: rpc.Options{Ending: 2 * time.Second}}
}

func needsPython(t *testing.T) {
	t.Helper()
	if out, err := exec.Command(interpreter, "-c", "import numpy, grpc, google.protobuf").CombinedOutput(); err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("needs python3-numpy, python3-grpcio, python3-protobuf: %v\n%s", err, out)
		}
		t.Skipf("needs python3-numpy, python3-grpcio, python3-protobuf: %v", err)
	}
}

// here puts lines into the function.
func here(lines ...string) []string { return []string{"# HERE", strings.Join(lines, "\n    ")} }

// Faults of laws in Python after they have started.
func TestFaultsOfPythonAnswers(t *testing.T) {
	needsPython(t)
	leavesNothing(t)
	for name, x := range map[string]struct {
		replace []string
		words   []string // empty: no fault
	}{
		"good":       {here("pass"), nil},
		"prints":     {here("print('x' * 200_000)", "os.write(1, b'y' * 200_000)", "sys.stdout.write('z')"), nil},
		"floods":     {here("sys.stderr.write('and ' * 500_000)"), nil},
		"exception":  {here("table = {}", "table['neutron']"), []string{"KeyError: 'neutron'", "law.py:", "in wear: table['neutron']"}},
		"not a name": {here("return rate, 0"), []string{"NameError: name 'rate' is not defined", "in wear: return rate, 0"}},
		"sys.exit":   {here("sys.exit(0)"), []string{"SystemExit: 0"}},
		"writes":     {here("mass[0] = 1"), []string{"ValueError: assignment destination is read-only", "in wear: mass[0] = 1"}},
		"short":      {here("return mass[1:], 0.0"), []string{"question wear: column log10_rate has shape (4,); want (5,): one element a row"}},
		"ragged":     {here("return [[1, 2], [3]], 0.0"), []string{"column log10_rate"}},
		"one column": {here("return -mass"), []string{"want 2 columns: log10_rate, heat"}},
		"nothing":    {here("return None"), []string{"the function returned nothing; want log10_rate, heat"}},
		"words":      {here("return 'fast', 0.0"), []string{"column log10_rate holds"}},
		"NaN":        {here("return np.where(mass > 3, np.nan, -mass), 0.0"), []string{", row 3 (mass 4 solMass): log10_rate: got NaN, want a number or -Inf (zero)"}},
		"memory": {here("import resource", "resource.setrlimit(resource.RLIMIT_AS, (1 << 30, 1 << 30))", "eaten = np.ones(1 << 29)"),
			[]string{"MemoryError", "Unable to allocate"}},
		"exits":    {here("print('good night')", "os._exit(0)"), []string{"its process ended (exit status 0); it had been started again 2 times before; its log:", "good night"}},
		"segfault": {here("import ctypes", "ctypes.string_at(0)"), []string{"its process ended (signal: segmentation fault"}},
		"killed":   {here("os.kill(os.getpid(), 9)"), []string{"its process ended (signal: killed): did it run out of memory?"}},
		"spins":    {here("while True: pass"), []string{"no answer within 1s"}},
		"sleeps":   {here("time.sleep(300)"), []string{"no answer within 1s"}},
		"stops":    {here("os.kill(os.getpid(), 19)", "time.sleep(0.2)"), []string{"no answer within 1s"}},
	} {
		t.Run(name, func(t *testing.T) {
			t.Parallel()
			s := python(t, x.replace...)
			s.Answering = time.Second
			l, err := rpc.Open(context.Background(), s)
			if err != nil {
				t.Fatal(err)
			}
			defer l.Close()
			within(t, 4*soon, func() {
				_, err = law.NewUse(l).Ask("wear", holes(5))
				if len(x.words) > 0 {
					says(t, err, append([]string{"law ./my-burden (evaporation/mine): question wear"}, x.words...)...)
				} else if err != nil {
					t.Error(err)
				}
			})
			within(t, soon, func() {
				if err := l.Close(); err != nil {
					t.Error(err)
				}
			})
		})
	}
}

// Faults of laws in Python that keep them from starting, and of their cards.
func TestFaultsOfPythonStarts(t *testing.T) {
	needsPython(t)
	leavesNothing(t)
	for name, x := range map[string]struct {
		replace []string
		args    []string // instead of the usual ones
		words   []string
	}{
		"prints first":   {[]string{"import wanelaw", "print('loading the tables ...', flush=True)\nimport wanelaw"}, nil, []string{`got "loading the tables ..." on its standard output`}},
		"syntax":         {[]string{"def wear(mass, p):", "def wear(mass, p)"}, nil, []string{"(exit status 1); its log:", "law.py\", line 12", "SyntaxError: expected ':'"}},
		"raises":         {[]string{"if __name__", "raise OSError('no tables')\nif __name__"}, nil, []string{"(exit status 1); its log:", "Traceback", "OSError: no tables"}},
		"exits":          {[]string{"if __name__", "sys.exit(0)\nif __name__"}, nil, []string{"it ended before it said where it listens (exit status 0)"}},
		"module missing": {[]string{"import wanelaw", "import astrolabe\nimport wanelaw"}, nil, []string{"ModuleNotFoundError: No module named 'astrolabe'"}},
		"no libraries":   {nil, []string{interpreter, "-B", "-S", "law.py"}, []string{"(exit status 1); its log:", "No module named 'numpy'"}},
		"no file":        {nil, []string{interpreter, "-B", "other.py"}, []string{"(exit status 2); its log:", "can't open file"}},
		"no interpreter": {nil, []string{"/usr/bin/python3.99", "law.py"}, []string{"no program /usr/bin/python3.99"}},
		"no function":    {[]string{"wanelaw.serve(card, wear)", "wanelaw.serve(card)"}, nil, []string{"(exit status 1); its log:", "wanelaw: no function answers wear"}},
		"no argument":    {[]string{"wear(mass, p)", "wear(colour, p)"}, nil, []string{"wanelaw: function for wear wants colour, which the card's question does not read (it reads mass)"}},
		"card": {[]string{`"evaporation"`, `"evaporating"`, `sources=["assumption"]`, `sources=[]`, "preset=1", "preset=4", `citation="assumption"`, `citation=""`, `["black-hole"`, `["black-hoal"`}, nil,
			[]string{"(evaporating/mine): its card cannot be used:", `unknown process "evaporating"`, "no source", "parameter k: no citation", "parameter k: preset 4 outside 0 .. 3", `no kind "black-hoal"`}},
		"unit":   {[]string{`["mass"]`, `[("mass", "kg")]`}, nil, []string{`question wear: column mass: unit "kg", want "solMass"`}},
		"column": {[]string{`["mass"]`, `["mass", "colour"]`, "wear(mass, p)", "wear(mass, colour, p)"}, nil, []string{`question wear: unknown column "colour"`}},
	} {
		t.Run(name, func(t *testing.T) {
			t.Parallel()
			s := python(t, x.replace...)
			if x.args != nil {
				s.Args = x.args
			}
			refused(t, s, 2*soon, x.words...)
		})
	}
}
