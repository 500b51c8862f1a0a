package main

import (
	"errors"
	"os/exec"
	"strings"
	"testing"
)

// run runs the program by hand.
func run(t *testing.T, args ...string) (stdout, stderr string, code int) {
	t.Helper()
	var out, errs strings.Builder
	c := exec.Command(built, args...)
	c.Stdout, c.Stderr = &out, &errs
	err := c.Run()
	var exit *exec.ExitError
	if err != nil && !errors.As(err, &exit) {
		t.Fatal(err)
	}
	return out.String(), errs.String(), c.ProcessState.ExitCode()
}

func TestByHand(t *testing.T) {
	out, errs, code := run(t, "evaporation/page")
	if code != 1 || out != "" || !strings.Contains(errs, "evaporation/page is a law that wane starts when it needs it") ||
		!strings.Contains(errs, "--law evaporation=PATH") {
		t.Errorf("exit %d, output %q, error %q", code, out, errs)
	}
	for _, args := range [][]string{{"evaporation/pages"}, {"page"}, {}, {"evaporation/page", "twice"}} {
		if out, errs, code = run(t, args...); code != 2 || out != "" || errs == "" {
			t.Errorf("%v: exit %d, output %q, error %q", args, code, out, errs)
		}
	}
	out, errs, code = run(t, "--help")
	if code != 0 || errs != "" {
		t.Errorf("--help: exit %d, error %q", code, errs)
	}
	for _, l := range builtin(t) {
		if c := l.Describe(); !strings.Contains(out, "  "+c.Process+"/"+c.Name+" ") {
			t.Errorf("--help does not list %s/%s", c.Process, c.Name)
		}
	}
}
