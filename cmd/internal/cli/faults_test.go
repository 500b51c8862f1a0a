//go:build linux

package cli

import (
	"bytes"
	"context"
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"strconv"
	"strings"
	"sync"
	"testing"
	"time"

	"wane/sim/rpc"
	"wane/sim/rpc/folder"
)

// The tests of faults run wane with laws that are real processes with a fault:
// the program in sim/rpc/testdata/faulty, which is a built-in law but for it.
// What is left of them is looked for in /proc, so that they run on Linux alone.

var programsFolder string

func TestMain(m *testing.M) {
	code := m.Run()
	os.RemoveAll(programsFolder)
	os.Exit(code)
}

// programs builds wane and faulty, once.
var programs = sync.OnceValues(func() (string, error) {
	var err error
	if programsFolder, err = os.MkdirTemp("", "faulty-"); err != nil {
		return "", err
	}
	out, err := exec.Command("go", "build", "-o", programsFolder+"/", "wane/cmd/wane", "wane/sim/rpc/testdata/faulty").CombinedOutput()
	if err != nil {
		return "", fmt.Errorf("%w\n%s", err, out)
	}
	return programsFolder, nil
})

func program(t *testing.T, name string) string {
	t.Helper()
	dir, err := programs()
	if err != nil {
		t.Fatal(err)
	}
	return filepath.Join(dir, name)
}

// badLaw is the folder of a law with a fault, and where it counts its starts.
type badLaw struct{ path, state string }

func newBadLaw(t *testing.T, fault, id string) badLaw {
	t.Helper()
	l := badLaw{filepath.Join(t.TempDir(), "mine"), t.TempDir()}
	for _, dir := range []string{l.path} {
		if err := os.Mkdir(dir, 0o755); err != nil {
			t.Fatal(err)
		}
	}
	start := fmt.Sprintf("start = [%q, %q, %q, %q]\n", program(t, "faulty"), fault, id, l.state)
	if err := os.WriteFile(filepath.Join(l.path, "law.toml"), []byte(start), 0o644); err != nil {
		t.Fatal(err)
	}
	return l
}

// pids are the processes that the law ever had.
func (l badLaw) pids(t *testing.T) []int {
	t.Helper()
	var out []int
	for n := 1; ; n++ {
		data, err := os.ReadFile(filepath.Join(l.state, "start-"+strconv.Itoa(n)))
		if err != nil {
			return out
		}
		pid, err := strconv.Atoi(strings.TrimSpace(string(data)))
		if err != nil {
			t.Fatal(err)
		}
		out = append(out, pid)
	}
}

// gone fails the test if a process of the law is still there after a while.
func (l badLaw) gone(t *testing.T, within time.Duration) {
	t.Helper()
	for _, pid := range l.pids(t) {
		left := func() bool {
			status, err := os.ReadFile(fmt.Sprintf("/proc/%d/cmdline", pid))
			return err == nil && bytes.Contains(status, []byte(l.state))
		}
		for end := time.Now().Add(within); left() && time.Now().Before(end); {
			time.Sleep(10 * time.Millisecond)
		}
		if left() {
			t.Errorf("process %d of the law is left", pid)
		}
	}
}

// heard is what came of a command.
type heard struct {
	code      int
	out, said string
	took      time.Duration
}

// wane runs a command in this process, with limits on laws outside that make
// tests short. Nothing may be left of it.
func wane(t *testing.T, limits rpc.Options, args ...string) heard {
	t.Helper()
	var out, said bytes.Buffer
	p := Standard()
	p.Out, p.Err = &out, &lockedWriter{to: &said}
	p.Open = func(ctx context.Context, path string, o folder.Options) (*Outside, error) {
		o.Limits = limits
		return openFolder(ctx, path, o)
	}
	began := time.Now()
	code := p.Main(args)
	return heard{code, out.String(), said.String(), time.Since(began)}
}

// lockedWriter takes what several write.
type lockedWriter struct {
	mu sync.Mutex
	to *bytes.Buffer
}

func (w *lockedWriter) Write(b []byte) (int, error) {
	w.mu.Lock()
	defer w.mu.Unlock()
	return w.to.Write(b)
}

// mustSay fails the test unless the command ended with the code, soon enough,
// and all the words stand in what it said, in this order.
func (h heard) mustSay(t *testing.T, code int, limit time.Duration, words ...string) {
	t.Helper()
	if h.code != code {
		t.Errorf("exit code %d, want %d", h.code, code)
	}
	if h.took > limit {
		t.Errorf("took %v, want at most %v", h.took, limit)
	}
	rest := h.said
	for _, w := range words {
		_, after, ok := strings.Cut(rest, w)
		if !ok {
			t.Fatalf("said\n%s\nwant %q in it", h.said, w)
		}
		rest = after
	}
}

// noSockets fails the test if folders for sockets of a process are left.
func noSockets(t *testing.T, temporary string, pid int) {
	t.Helper()
	left, _ := filepath.Glob(filepath.Join(temporary, fmt.Sprintf("wane-law-%d-*", pid)))
	hidden, _ := filepath.Glob(filepath.Join(temporary, ".wane-law-*"))
	if left = append(left, hidden...); len(left) > 0 {
		t.Errorf("left: %v", left)
	}
}
