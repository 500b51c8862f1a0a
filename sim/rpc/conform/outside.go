package conform

import (
	"bytes"
	"context"
	"errors"
	"fmt"
	"io"
	"os"
	"os/exec"
	"strings"
	"syscall"
	"time"

	"wane/sim/rpc"
	"wane/sim/rpc/folder"
)

// Outside is the law at a path, to be judged as [Subject]: a law's folder or
// an executable file. What the law logs goes to the log, if it is not nil.
// Opened holds, after Judge, how it was opened first, or nil.
type Outside struct {
	Path   string
	Log    io.Writer
	Opened *folder.Opened
}

// started is an outside law and its process.
type started struct {
	*rpc.Law
	pid int // of the process it had last
}

func (r *started) Close() error {
	if pid := r.PID(); pid > 0 {
		r.pid = pid
	}
	return r.Law.Close()
}

// Subject makes the law one to be judged.
func (o *Outside) Subject() Subject {
	return Subject{
		Ready: func(ctx context.Context) error {
			f, err := folder.Read(o.Path)
			if err != nil {
				return err
			}
			return f.Build(ctx, o.Log)
		},
		Open: func(ctx context.Context) (Process, error) {
			opened, err := folder.Open(ctx, o.Path, folder.Options{Log: o.Log, Limits: rpc.Options{AskOnce: true}})
			if err != nil {
				return nil, err
			}
			if o.Opened == nil {
				o.Opened = opened
			}
			return &started{Law: opened.Law, pid: opened.Law.PID()}, nil
		},
		ByHand: o.byHand,
		Left:   left,
	}
}

// left looks for the process and the socket of a law that was closed.
func left(p Process) []string {
	if r, ok := p.(*started); ok {
		return remains(r.pid, r.Dir())
	}
	return nil
}

// remains names a process and a folder, as far as they are there.
func remains(pid int, sockets string) []string {
	var out []string
	if process, err := os.FindProcess(pid); err == nil && pid > 0 && process.Signal(syscall.Signal(0)) == nil {
		out = append(out, fmt.Sprintf("the process %d", pid))
	}
	if _, err := os.Stat(sockets); err == nil {
		out = append(out, "the folder of its socket, "+sockets)
	}
	return out
}

// byHand starts the law's program without what makes it a law's.
func (o *Outside) byHand(ctx context.Context) (string, int, error) {
	if o.Opened == nil {
		return "", 0, errors.New("it was not started at all")
	}
	f, err := folder.Read(o.Path)
	if err != nil {
		return "", 0, err
	}
	var said bytes.Buffer
	c := exec.CommandContext(ctx, o.Opened.Program.Path, f.Start[1:]...)
	c.Dir, c.Stdout, c.Stderr = o.Opened.Dir, &said, &said
	c.WaitDelay = time.Second
	for _, kv := range os.Environ() {
		if !strings.HasPrefix(kv, "WANE_LAW=") {
			c.Env = append(c.Env, kv)
		}
	}
	c.Env = append(c.Env, "PYTHONDONTWRITEBYTECODE=1")
	err = c.Run()
	var exit *exec.ExitError
	if err != nil && !errors.As(err, &exit) {
		return said.String(), 0, err
	}
	return said.String(), c.ProcessState.ExitCode(), nil
}
