//go:build linux

package rpc_test

import (
	"bytes"
	"context"
	"errors"
	"os"
	"os/exec"
	"path/filepath"
	"strconv"
	"strings"
	"sync"
	"testing"
	"time"

	"wane/plugins"
	"wane/sim/law"
	"wane/sim/law/lawtest"
	"wane/sim/rpc"
)

// The tests of faults start real processes that misbehave: testdata/faulty,
// which is a built-in law but for one fault. What is left of them is looked
// for in /proc, so that they run on Linux alone.

// faultyProgram is built once, into a folder that TestMain removes.
var faultyProgram = sync.OnceValues(func() (string, error) {
	dir, err := os.MkdirTemp("", "faulty-")
	if err != nil {
		return "", err
	}
	faultyFolder = dir
	program := filepath.Join(dir, "faulty")
	if out, err := exec.Command("go", "build", "-o", program, "./testdata/faulty").CombinedOutput(); err != nil {
		return "", errors.New(err.Error() + "\n" + string(out))
	}
	return program, nil
})

// hole is the law that most faults are tried on.
const hole = "evaporation/black-body"

// called is what a person calls the law.
const called = "./my-burden"

// faulty starts a law with a fault.
func faulty(t testing.TB, fault, id string) rpc.Start {
	t.Helper()
	program, err := faultyProgram()
	if err != nil {
		t.Fatal(err)
	}
	return rpc.Start{Name: called, Args: []string{program, fault, id, t.TempDir()}, Env: []string{mark(t)},
		Options: rpc.Options{Ending: 2 * time.Second}}
}

// mark is a variable of the environment by which the processes of a test are
// found, and those that they start.
func mark(t testing.TB) string {
	name, _, _ := strings.Cut(t.Name(), "/")
	return "WANE_TEST_MARK=" + strconv.Itoa(os.Getpid()) + "-" + name
}

// leavesNothing fails the test if at its end, when all its parts are over, a
// process is left that it started, a socket or a temporary file.
func leavesNothing(t *testing.T) {
	t.Helper()
	before := temporaries(t)
	t.Cleanup(func() {
		left := marked(mark(t))
		for end := time.Now().Add(2 * time.Second); len(left) > 0 && time.Now().Before(end); left = marked(mark(t)) {
			time.Sleep(20 * time.Millisecond)
		}
		for _, p := range left {
			t.Errorf("process %s is left", p)
		}
		for name := range temporaries(t) {
			if !before[name] && faultyFolder != filepath.Join(os.TempDir(), name) {
				t.Errorf("%s is left in %s", name, os.TempDir())
			}
		}
	})
}

// marked lists the processes that have a variable in their environment.
func marked(variable string) []string {
	var found []string
	environments, _ := filepath.Glob("/proc/[0-9]*/environ")
	for _, name := range environments {
		data, err := os.ReadFile(name)
		if err == nil && bytes.Contains(data, []byte(variable)) {
			found = append(found, strings.Split(name, "/")[2])
		}
	}
	return found
}

// temporaries are the files that laws leave, and those of Go's tests not.
func temporaries(t *testing.T) map[string]bool {
	t.Helper()
	entries, err := os.ReadDir(os.TempDir())
	if err != nil {
		t.Fatal(err)
	}
	names := map[string]bool{}
	for _, e := range entries {
		own := strings.HasPrefix(e.Name(), "wane-law-"+strconv.Itoa(os.Getpid())+"-") || strings.HasPrefix(e.Name(), ".wane-law-") ||
			strings.HasPrefix(e.Name(), "plugin")
		if own {
			names[e.Name()] = true
		}
	}
	return names
}

// within runs what must not take longer.
func within(t *testing.T, limit time.Duration, what func()) {
	t.Helper()
	began := time.Now()
	what()
	if took := time.Since(began); took > limit {
		t.Errorf("took %v, want at most %v", took, limit)
	}
}

// says fails the test unless an error has all the words, which stand in it in
// this order.
func says(t *testing.T, err error, words ...string) {
	t.Helper()
	if err == nil {
		t.Fatalf("no error, want %q", words)
	}
	rest := err.Error()
	for _, w := range words {
		_, after, ok := strings.Cut(rest, w)
		if !ok {
			t.Fatalf("got\n%v\nwant %q in it", err, w)
		}
		rest = after
	}
}

// refused opens a law that cannot be opened, in at most so much time.
func refused(t *testing.T, s rpc.Start, limit time.Duration, words ...string) {
	t.Helper()
	within(t, limit, func() {
		l, err := rpc.Open(context.Background(), s)
		if err == nil {
			_ = l.Close()
		}
		says(t, err, append([]string{"law " + called}, words...)...)
	})
}

// rows is a batch of a question of a built-in law.
func rows(id, question string, n int) law.Batch { return lawtest.Rows(served(id), question, n) }

// sameBits fails the test unless the law answers what the built-in law of this
// id does, to the bit.
func sameBits(t *testing.T, l law.Law, id, question string, in law.Batch) {
	t.Helper()
	got, err := l.Answer(question, in)
	if err != nil {
		t.Fatal(err)
	}
	want, err := served(id).Answer(question, in)
	if err != nil {
		t.Fatal(err)
	}
	if diff := lawtest.Differ(want, got); diff != "" {
		t.Error(diff)
	}
}

// holes are holes whose mass is 1 solMass, then 2, ...
func holes(n int) law.Batch {
	m := make([]float64, n)
	for i := range m {
		m[i] = float64(i + 1)
	}
	return law.Batch{Rows: n, Columns: []law.Column{law.Numbers("mass", m)}, Kinds: law.KindWords}
}

// exists tells whether there is a built-in law.
func exists(id string) bool {
	laws, err := plugins.Builtin()
	if err != nil {
		return false
	}
	process, name, _ := strings.Cut(id, "/")
	_, ok := laws.Find(process, name)
	return ok
}
