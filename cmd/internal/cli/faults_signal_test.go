//go:build linux

package cli

import (
	"bytes"
	"errors"
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"syscall"
	"testing"
	"time"
)

// running is wane in a process group of its own, as a shell starts it, with a
// folder of its own for temporary files.
type running struct {
	cmd       *exec.Cmd
	out, said bytes.Buffer
	temporary string
	ended     chan error
}

func start(t *testing.T, l badLaw, args ...string) *running {
	t.Helper()
	r := &running{ended: make(chan error, 1)}
	var err error
	if r.temporary, err = os.MkdirTemp("", "w"); err != nil { // a short name: sockets are in it
		t.Fatal(err)
	}
	r.cmd = exec.Command(program(t, "wane"), args...)
	r.cmd.Env = append(os.Environ(), "TMPDIR="+r.temporary)
	r.cmd.Stdout, r.cmd.Stderr = &r.out, &r.said
	r.cmd.SysProcAttr = &syscall.SysProcAttr{Setpgid: true}
	if err := r.cmd.Start(); err != nil {
		t.Fatal(err)
	}
	go func() { r.ended <- r.cmd.Wait() }()
	t.Cleanup(func() {
		_ = syscall.Kill(-r.cmd.Process.Pid, syscall.SIGKILL)
		os.RemoveAll(r.temporary)
	})
	for end := time.Now().Add(soon); ; time.Sleep(5 * time.Millisecond) {
		if _, err := os.Stat(filepath.Join(l.state, "now")); err == nil {
			return r
		}
		if time.Now().After(end) {
			t.Fatalf("the fault did not begin: %s", r.said.String())
		}
	}
}

// signal sends a signal as a terminal does, to the whole group.
func (r *running) signal(t *testing.T, s syscall.Signal) {
	t.Helper()
	if err := syscall.Kill(-r.cmd.Process.Pid, s); err != nil {
		t.Fatal(err)
	}
}

// end waits for the end.
func (r *running) end(t *testing.T, limit time.Duration) heard {
	t.Helper()
	began := time.Now()
	select {
	case err := <-r.ended:
		code := 0
		if exit := (*exec.ExitError)(nil); errors.As(err, &exit) {
			code = exit.ExitCode()
		}
		return heard{code, r.out.String(), r.said.String(), time.Since(began)}
	case <-time.After(limit):
		t.Fatalf("it has not ended after %v", limit)
		return heard{}
	}
}

// left lists what is in the folder for temporary files.
func (r *running) left() []string {
	entries, _ := os.ReadDir(r.temporary)
	var names []string
	for _, e := range entries {
		names = append(names, e.Name())
	}
	return names
}

// Ctrl-C ends a run at once and cleanly, whatever the law is doing.
func TestFaultsInterrupted(t *testing.T) {
	for _, x := range []struct {
		fault  string
		signal syscall.Signal
	}{
		{"hang:2", syscall.SIGINT}, {"hang:2", syscall.SIGTERM}, {"spin:2", syscall.SIGINT}, {"stop:2", syscall.SIGINT}, {"silent", syscall.SIGINT},
	} {
		t.Run(x.fault+"/"+x.signal.String(), func(t *testing.T) {
			t.Parallel()
			mine := newBadLaw(t, x.fault, "evaporation/page")
			r := start(t, mine, append(strings.Fields(lamp), "--law", "evaporation="+mine.path)...)
			time.Sleep(100 * time.Millisecond)
			r.signal(t, x.signal)
			h := r.end(t, soon)
			h.mustSay(t, ExitInterrupted, 4500*time.Millisecond, "wane: interrupted before the ")
			if h.out != "" || strings.Contains(h.said, "panic") {
				t.Errorf("printed %q, said %q", h.out, h.said)
			}
			mine.gone(t, 0)
			if left := r.left(); len(left) > 0 {
				t.Errorf("left: %v", left)
			}
		})
	}
}

// Laws do not outlive wane, however it ends; the folder of their sockets is
// swept away by the next one.
func TestFaultsWaneIsKilled(t *testing.T) {
	for _, fault := range []string{"hang:2", "spin:2", "stop:2", "deaf-hang"} {
		t.Run(fault, func(t *testing.T) {
			t.Parallel()
			mine := newBadLaw(t, fault, "evaporation/page")
			r := start(t, mine, append(strings.Fields(lamp), "--law", "evaporation="+mine.path)...)
			if err := r.cmd.Process.Kill(); err != nil {
				t.Fatal(err)
			}
			r.end(t, soon)
			mine.gone(t, 2*time.Second)
			if left := r.left(); len(left) != 1 || !strings.HasPrefix(left[0], fmt.Sprintf("wane-law-%d-", r.cmd.Process.Pid)) {
				t.Fatalf("left: %v, want the folder of the law's sockets", left)
			}
			next := newBadLaw(t, "serves", "evaporation/page")
			c := exec.Command(program(t, "wane"), "laws", next.path, "--quiet")
			c.Env = append(os.Environ(), "TMPDIR="+r.temporary)
			if out, err := c.CombinedOutput(); err != nil {
				t.Fatalf("%v\n%s", err, out)
			}
			if left := r.left(); len(left) > 0 {
				t.Errorf("left by the next one: %v", left)
			}
		})
	}
}

// What a run does not see, the judgement of laws does.
func TestFaultsThatLawCheckNames(t *testing.T) {
	for fault, words := range map[string][]string{
		"by-order":     {"fail  rows "},
		"by-count":     {"fail  pure "},
		"serves":       nil, // without fault
		"crash:40:1":   {"fail  crash "},
		"prints-first": {"fail  start ", `got "loading the tables ..." on its standard`},
	} {
		t.Run(fault, func(t *testing.T) {
			t.Parallel()
			mine := newBadLaw(t, fault, "warmth/dark-matter")
			r := start(t, badLaw{state: started(t)}, "law", "check", mine.path)
			h := r.end(t, 60*time.Second)
			h.said = h.out
			code := ExitCheckFails
			if words == nil {
				code = ExitOK
			}
			h.mustSay(t, code, 60*time.Second, words...)
			mine.gone(t, 0)
			if left := r.left(); len(left) > 0 {
				t.Errorf("left: %v", left)
			}
		})
	}
}

// started is a folder that says that a fault has begun.
func started(t *testing.T) string {
	t.Helper()
	dir := t.TempDir()
	if err := os.WriteFile(filepath.Join(dir, "now"), nil, 0o600); err != nil {
		t.Fatal(err)
	}
	return dir
}
