//go:build linux

package rpc_test

import (
	"context"
	"errors"
	"os"
	"path/filepath"
	"runtime"
	"strings"
	"sync"
	"syscall"
	"testing"
	"time"

	"wane/sim/law"
	"wane/sim/rpc"
)

// Close ends every process in bounded time, whatever it does.
func TestFaultsOfEnding(t *testing.T) {
	leavesNothing(t)
	for _, x := range []struct {
		name, fault string
		before      func(*testing.T, *rpc.Law)
	}{
		{"deaf", "deaf", nil},
		{"stopped", "none", func(t *testing.T, l *rpc.Law) { send(t, l, syscall.SIGSTOP) }},
		{"stopped served", "serves", func(t *testing.T, l *rpc.Law) { send(t, l, syscall.SIGSTOP) }},
		{"killed", "serves", func(t *testing.T, l *rpc.Law) { send(t, l, syscall.SIGKILL) }},
		{"terminated", "serves", func(t *testing.T, l *rpc.Law) { send(t, l, syscall.SIGTERM) }},
		{"interrupted", "serves", func(t *testing.T, l *rpc.Law) { send(t, l, syscall.SIGINT) }},
		{"offspring", "offspring", func(t *testing.T, l *rpc.Law) { sameBits(t, l, hole, "wear", holes(4)) }},
		{"hangs", "hang", func(t *testing.T, l *rpc.Law) {
			go func() { _, _ = l.Answer("wear", holes(4)) }()
			time.Sleep(200 * time.Millisecond)
		}},
	} {
		t.Run(x.name, func(t *testing.T) {
			t.Parallel()
			s := faulty(t, x.fault, hole)
			s.Ending = 500 * time.Millisecond
			l, err := rpc.Open(context.Background(), s)
			if err != nil {
				t.Fatal(err)
			}
			if x.before != nil {
				x.before(t, l)
			}
			dir := l.Dir()
			within(t, s.Ending+2*time.Second, func() {
				if err := l.Close(); err != nil {
					t.Error(err)
				}
			})
			if _, err := os.Stat(dir); !errors.Is(err, os.ErrNotExist) {
				t.Errorf("%s is left: %v", dir, err)
			}
			_, err = l.Answer("wear", holes(1))
			says(t, err, "it is closed")
		})
	}
}

func send(t *testing.T, l *rpc.Law, signal syscall.Signal) {
	t.Helper()
	if err := syscall.Kill(l.PID(), signal); err != nil {
		t.Fatal(err)
	}
	time.Sleep(50 * time.Millisecond)
}

// A law whose context ends while it hangs gives up at once.
func TestFaultsWhenInterrupted(t *testing.T) {
	leavesNothing(t)
	ctx, cancel := context.WithCancel(context.Background())
	l, err := rpc.Open(ctx, faulty(t, "hang", hole))
	if err != nil {
		t.Fatal(err)
	}
	time.AfterFunc(300*time.Millisecond, cancel)
	within(t, 2*time.Second, func() {
		if _, err := law.NewUse(l).Ask("wear", holes(4)); !errors.Is(err, context.Canceled) {
			t.Errorf("got %v, want that it was cancelled", err)
		}
	})
	within(t, soon, func() {
		if err := l.Close(); err != nil {
			t.Error(err)
		}
	})

	// So does one that starts.
	ctx, cancel = context.WithCancel(context.Background())
	time.AfterFunc(300*time.Millisecond, cancel)
	within(t, soon, func() {
		if _, err := rpc.Open(ctx, faulty(t, "silent", hole)); !errors.Is(err, context.Canceled) {
			t.Errorf("got %v, want that it was cancelled", err)
		}
	})
}

// A law that comes back as another one is not asked.
func TestFaultsOfStartingAgain(t *testing.T) {
	leavesNothing(t)
	// It comes back with another card.
	l := open(t, faulty(t, "describe-changes-later", hole))
	send(t, l, syscall.SIGKILL)
	_, err := law.NewUse(l).Ask("wear", holes(4))
	says(t, err, "law ./my-burden (evaporation/black-body): question wear: batch 1 of 4 rows: ", "starting it again: its card is not what it was")

	// Its files have changed meanwhile.
	s := faulty(t, "crash", hole)
	s.BeforeRestart = func() error { return errors.New("its files have changed") }
	l = open(t, s)
	_, err = law.NewUse(l).Ask("wear", holes(4))
	says(t, err, "its process ended (exit status 3); starting it again: its files have changed; it was not started again")

	// It does not come back.
	s = faulty(t, "serves", hole)
	program := filepath.Join(t.TempDir(), "law")
	data, err := os.ReadFile(s.Args[0])
	if err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(program, data, 0o755); err != nil {
		t.Fatal(err)
	}
	s.Args[0] = program
	l = open(t, s)
	if err := os.Remove(program); err != nil {
		t.Fatal(err)
	}
	send(t, l, syscall.SIGKILL)
	_, err = law.NewUse(l).Ask("wear", holes(4))
	says(t, err, "starting it again: no program "+program)
}

// Several askers lose one process: it is replaced once for all of them.
func TestFaultsSharedByAskers(t *testing.T) {
	leavesNothing(t)
	l := open(t, faulty(t, "crash:6:1", hole))
	var all sync.WaitGroup
	for range 4 {
		all.Go(func() {
			for range 10 {
				sameBits(t, l, hole, "wear", rows(hole, "wear", 64))
			}
		})
	}
	all.Wait()
	if l.Restarts() != 1 {
		t.Errorf("started again %d times, want once", l.Restarts())
	}
}

// Fifty starts, of good laws and bad ones, leave nothing behind: no process,
// socket, goroutine or open file.
func TestFaultsFiftyStarts(t *testing.T) {
	leavesNothing(t)
	faults := []string{"serves", "crash:1:1", "exit:1", "killed:1:1", "describe-crash", "deaf", "prints-first", "protocol-99", "panic", "bad-card"}
	once := func(fault string) {
		s := faulty(t, fault, hole)
		s.Ending = 100 * time.Millisecond
		l, err := rpc.Open(context.Background(), s)
		if err != nil {
			return
		}
		_, _ = l.Answer("wear", holes(3))
		if err := l.Close(); err != nil {
			t.Error(err)
		}
	}
	once("serves")
	routines, files := runtime.NumGoroutine(), openFiles(t)
	for i := range 50 {
		once(faults[i%len(faults)])
	}
	for end := time.Now().Add(3 * time.Second); time.Now().Before(end) && (runtime.NumGoroutine() > routines || openFiles(t) > files); {
		time.Sleep(20 * time.Millisecond)
	}
	if n := runtime.NumGoroutine(); n > routines {
		buf := make([]byte, 1<<20)
		t.Errorf("%d goroutines, before %d\n%s", n, routines, shortStacks(string(buf[:runtime.Stack(buf, true)])))
	}
	if n := openFiles(t); n > files {
		t.Errorf("%d open files, before %d", n, files)
	}
	if children := zombies(t); children != "" {
		t.Errorf("dead children nobody waited for: %s", children)
	}
}

func openFiles(t *testing.T) int {
	t.Helper()
	entries, err := os.ReadDir("/proc/self/fd")
	if err != nil {
		t.Fatal(err)
	}
	return len(entries)
}

// zombies are children that have ended and wait to be asked how.
func zombies(t *testing.T) string {
	t.Helper()
	var dead []string
	lists, _ := filepath.Glob("/proc/self/task/*/children")
	for _, list := range lists {
		data, _ := os.ReadFile(list)
		for _, pid := range strings.Fields(string(data)) {
			status, _ := os.ReadFile("/proc/" + pid + "/status")
			if strings.Contains(string(status), "State:\tZ") {
				dead = append(dead, pid)
			}
		}
	}
	return strings.Join(dead, " ")
}

// shortStacks is the first of each goroutine's calls.
func shortStacks(all string) string {
	var out []string
	for g := range strings.SplitSeq(all, "\n\n") {
		lines := strings.Split(g, "\n")
		out = append(out, strings.Join(lines[:min(len(lines), 6)], "\n"))
	}
	return strings.Join(out, "\n\n")
}
