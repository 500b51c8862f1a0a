package rpc

import (
	"context"
	"errors"
	"io"
	"os"
	"os/exec"
	"runtime"
	"strconv"
	"sync"
	"time"

	"github.com/hashicorp/go-plugin/runner"
)

// process is the running program of a law, and how go-plugin starts and ends
// it.
type process struct {
	cmd            *exec.Cmd
	stdout, stderr io.ReadCloser
	log            io.Writer // takes what it prints
	exited         chan struct{}

	mu     sync.Mutex
	doomed bool // to be killed as soon as it has started
	reaped bool
}

var _ runner.Runner = (*process)(nil)

// newProcess prepares the program with the environment that every law gets,
// besides the few words of go-plugin itself.
func newProcess(s Start, forPlugin []string, log io.Writer) (*process, error) {
	if len(s.Args) == 0 {
		return nil, errors.New("rpc: no program to start")
	}
	p := &process{cmd: exec.Command(s.Args[0], s.Args[1:]...), log: log, exited: make(chan struct{})}
	p.cmd.Dir = s.Dir
	p.cmd.Env = append(append(cleanEnv(), s.Env...), forPlugin...)
	apart(p.cmd)
	var err error
	if p.stdout, err = p.cmd.StdoutPipe(); err != nil {
		return nil, err
	}
	p.stderr, err = p.cmd.StderrPipe()
	return p, err
}

// cleanEnv is the environment of a law: nothing in it may change an answer,
// and one law must not take all processors for one batch.
func cleanEnv() []string {
	env := append(systemEnv(), "OPENBLAS_NUM_THREADS=1", "OMP_NUM_THREADS=1")
	for _, key := range []string{"PATH", "HOME", "LANG"} {
		if v, ok := os.LookupEnv(key); ok {
			env = append(env, key+"="+v)
		}
	}
	return env
}

// Start starts the program from a thread that lives as long as it does: on
// Linux the program is to die with the host, but what the kernel watches is
// the thread.
func (p *process) Start(context.Context) error {
	started := make(chan error)
	go func() {
		runtime.LockOSThread()
		defer runtime.UnlockOSThread()
		err := p.launch()
		started <- err
		if err == nil {
			<-p.exited
		}
	}()
	return <-started
}

func (p *process) launch() error {
	p.mu.Lock()
	defer p.mu.Unlock()
	if p.doomed {
		return context.Canceled
	}
	return p.cmd.Start()
}

// Wait waits until the program has ended, and ends what it leaves behind.
func (p *process) Wait(context.Context) error {
	awaitEnd(p.cmd.Process.Pid)
	p.mu.Lock()
	if p.reaped {
		p.mu.Unlock()
		<-p.exited
		return nil
	}
	p.reaped = true
	killGroup(p.cmd.Process)
	p.mu.Unlock()
	err := p.cmd.Wait()
	close(p.exited)
	return err
}

// Kill ends the program and what it started, at once.
func (p *process) Kill(context.Context) error {
	p.mu.Lock()
	defer p.mu.Unlock()
	p.doomed = true
	if p.cmd.Process != nil && !p.reaped {
		killGroup(p.cmd.Process)
	}
	return nil
}

// state says how the program ended; empty if it has not within the time given,
// or only because it was made to.
func (p *process) state(within time.Duration) string {
	select {
	case <-p.exited:
	case <-time.After(within):
		return ""
	}
	s := p.cmd.ProcessState
	p.mu.Lock()
	byUs := p.doomed
	p.mu.Unlock()
	if s == nil || byUs && killed(s) {
		return ""
	}
	return s.String()
}

func (p *process) Stdout() io.ReadCloser {
	return &greeting{from: p.stdout, log: p.log, ends: func() { p.awaitEnd(300 * time.Millisecond) }}
}

// awaitEnd waits for the end of the program, but not for long.
func (p *process) awaitEnd(within time.Duration) {
	over := make(chan struct{})
	go func() {
		awaitEnd(p.cmd.Process.Pid)
		close(over)
	}()
	select {
	case <-over:
	case <-time.After(within):
	}
}

func (p *process) Stderr() io.ReadCloser           { return p.stderr }
func (p *process) Name() string                    { return "stderr" } // go-plugin calls the law's own lines by it
func (p *process) Diagnose(context.Context) string { return "" }

func (p *process) ID() string {
	if n := p.number(); n != 0 {
		return strconv.Itoa(n)
	}
	return ""
}

// number is the process's number, 0 before it has started.
func (p *process) number() int {
	p.mu.Lock()
	defer p.mu.Unlock()
	if p.cmd.Process == nil {
		return 0
	}
	return p.cmd.Process.Pid
}

// The law sees the same files and addresses as the host.

func (p *process) PluginToHost(network, address string) (string, string, error) {
	return network, address, nil
}

func (p *process) HostToPlugin(network, address string) (string, string, error) {
	return network, address, nil
}
