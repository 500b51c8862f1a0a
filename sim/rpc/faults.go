package rpc

import (
	"context"
	"errors"
	"fmt"
	"io/fs"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"syscall"
	"time"

	"google.golang.org/grpc/codes"
	"google.golang.org/grpc/status"
)

// startFault says in the words of this program why a law did not start.
func startFault(err error, s Start, state string) error {
	if len(s.Args) == 0 {
		return err
	}
	text := err.Error()
	program := s.Args[0]
	switch {
	case errors.Is(err, context.Canceled), errors.Is(err, context.DeadlineExceeded):
		return err
	case errors.Is(err, fs.ErrPermission):
		return fmt.Errorf("%s may not be run: is it a program? (chmod +x makes it one)", program)
	case errors.Is(err, exec.ErrNotFound):
		return fmt.Errorf("no program %q on the PATH", program)
	case errors.Is(err, fs.ErrNotExist):
		if _, missing := os.Stat(s.Dir); s.Dir != "" && missing != nil {
			return fmt.Errorf("no folder %s", s.Dir)
		}
		found := program
		if !filepath.IsAbs(found) {
			found = filepath.Join(s.Dir, found)
		}
		if _, missing := os.Stat(found); missing == nil {
			return fmt.Errorf("%s does not start: the interpreter that its first line names is missing", program)
		}
		return fmt.Errorf("no program %s", program)
	case errors.Is(err, syscall.ENOEXEC):
		return fmt.Errorf("%s is neither a program for this machine nor a script whose first line names an interpreter", program)
	}
	if line, ok := strings.CutPrefix(text, "Unrecognized remote plugin message: "); ok {
		line, _, silent := strings.Cut(line, "\nFailed to read any lines")
		if silent {
			return saidNothing(state)
		}
		return fmt.Errorf("it is no law, or prints before it serves one: got %q on its standard output, which belongs to the protocol", shortened(strings.TrimSpace(line)))
	}
	if _, versions, ok := strings.Cut(text, "Plugin version: "); ok && strings.Contains(text, "incompatible API version") {
		version, _, _ := strings.Cut(versions, ",")
		return fmt.Errorf("it speaks version %s of the protocol, this program speaks version %d", version, protocolVersion)
	}
	switch {
	case strings.HasPrefix(text, "timeout while waiting"):
		return fmt.Errorf("it is no law, or starts too slowly: no word from it within %v", s.Starting)
	case strings.HasPrefix(text, "plugin exited before"):
		return saidNothing(state)
	case strings.HasPrefix(text, "incompatible core API version"), strings.HasPrefix(text, "unsupported plugin protocol"):
		first, _, _ := strings.Cut(text, "\n")
		return fmt.Errorf("it speaks another protocol than laws do: %s", first)
	}
	return fmt.Errorf("it does not start: %w%s", err, parenthesis(state))
}

// saidNothing is the fault of a program that ended, or went on without a word
// by which it could be reached.
func saidNothing(state string) error {
	if state == "" {
		return errors.New("it is no law: before it said where it listens it closed its standard output, or printed there what is no line")
	}
	return fmt.Errorf("it is no law: it ended before it said where it listens (%s)", state)
}

// callFault says in the words of this program why a call failed. It ends a
// child that is beyond help, to know how it ended.
func callFault(err error, c *child, within time.Duration) string {
	if status.Code(err) == codes.DeadlineExceeded {
		return fmt.Sprintf("no answer within %v", within)
	}
	if !lost(err, c) {
		return status.Convert(err).Message()
	}
	state := c.process.state(time.Second)
	switch {
	case state == "":
		return "the connection broke off: " + status.Convert(err).Message()
	case killed(c.process.cmd.ProcessState):
		return "its process ended (" + state + "): did it run out of memory?"
	}
	return "its process ended (" + state + ")"
}

// lost tells whether the call failed because of the process or the connection,
// not because of the question: then another process may well answer it.
func lost(err error, c *child) bool {
	switch status.Code(err) {
	case codes.Unavailable, codes.DeadlineExceeded, codes.Canceled:
		return true
	}
	select {
	case <-c.process.exited:
		return true
	default:
		return false
	}
}

func parenthesis(state string) string {
	if state == "" {
		return ""
	}
	return " (" + state + ")"
}

func shortened(line string) string {
	if len(line) > 200 {
		return strings.ToValidUTF8(line[:200], "") + "..."
	}
	return line
}
