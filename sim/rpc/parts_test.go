package rpc

import (
	"bytes"
	"fmt"
	"os"
	"path/filepath"
	"strings"
	"testing"
	"time"

	"github.com/hashicorp/go-hclog"
)

func TestTail(t *testing.T) {
	var s tail
	fmt.Fprintln(&s, `{"@level":"debug","@message":"plugin address"}`)
	fmt.Fprintln(&s, `{"@level":"error","@message":"something broke"}`)
	for i := range 10 {
		fmt.Fprintf(&s, "line %d\n", i)
	}
	if got := s.String(); !strings.HasPrefix(got, "something broke\nline 0\n") || !strings.HasSuffix(got, "line 9") {
		t.Errorf("the tail is\n%s", got)
	}
	for range 100 {
		s.Write(bytes.Repeat([]byte("x"), 10000)) // a flood without an end of line
	}
	if n := len(s.text); n > 2*tailKept {
		t.Errorf("it keeps %d bytes, want at most %d", n, 2*tailKept)
	}
	if n := len(s.String()); n > lineShown+10 {
		t.Errorf("it shows a line of %d bytes", n)
	}
}

func TestLogLimit(t *testing.T) {
	var out bytes.Buffer
	l := newLogger(&out, "./x").Named("stderr")
	for i := range 5000 {
		l.Info("flood", "i", i)
	}
	lines := strings.Count(out.String(), "\n")
	if lines < burst || lines > burst+100 {
		t.Errorf("%d of 5000 lines pass, want about %v", lines, burst)
	}
	time.Sleep(150 * time.Millisecond)
	l.Warn("after", "timestamp", "then", "odd")
	if tail := out.String(); !strings.Contains(tail, "lines left out") || !strings.Contains(tail, `"law":"./x"`) ||
		!strings.Contains(tail, `"said":"then"`) || !strings.Contains(tail, `"from":"stderr"`) {
		t.Errorf("the end of the log: %s", tail[max(0, len(tail)-600):])
	}
}

func TestLogLevels(t *testing.T) {
	var out bytes.Buffer
	l := newLogger(&out, "x")
	if l.GetLevel() != hclog.Debug || l.IsTrace() || !l.IsDebug() || !l.IsError() {
		t.Errorf("level %v", l.GetLevel())
	}
	l.Trace("unseen")
	l.SetLevel(hclog.Error)
	l.Warn("unseen")
	l.With("a", 1).Error("seen")
	if got := out.String(); strings.Contains(got, "unseen") || !strings.Contains(got, `"a":"1"`) {
		t.Errorf("log: %s", got)
	}
	if none := newLogger(nil, "x"); none.GetLevel() != hclog.Off {
		t.Errorf("a log to nowhere has level %v", none.GetLevel())
	}
}

func TestMedian(t *testing.T) {
	var d durations
	if d.median(16384) != 0 {
		t.Error("a median of nothing")
	}
	for i := 1; i <= 100; i++ { // the latest 31 are 70 .. 100 ms
		d.note(16384, time.Duration(i)*time.Millisecond)
	}
	if m := d.median(20000); m != 85*time.Millisecond {
		t.Errorf("median %v, want 85ms", m)
	}
	if d.median(64) != 0 {
		t.Error("small batches are timed with large ones")
	}
}

// TestSweep leaves folders of living hosts alone and removes those of dead
// ones.
func TestSweep(t *testing.T) {
	base := t.TempDir()
	if len(base) > 40 { // or it would not be used
		var err error
		if base, err = os.MkdirTemp("/tmp", "sweep"); err != nil {
			t.Fatal(err)
		}
		defer os.RemoveAll(base)
	}
	t.Setenv("TMPDIR", base)
	mine, err := newSocketFolder()
	if err != nil {
		t.Fatal(err)
	}
	if info, err := os.Stat(mine.path); err != nil || info.Mode().Perm() != 0o700 {
		t.Errorf("mode %v, %v: want 0700", info.Mode(), err)
	}
	dead := filepath.Join(base, folderPrefix+"999999999-1") // no system counts that far
	if err := os.Mkdir(dead, 0o700); err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(filepath.Join(dead, lockName), nil, 0o600); err != nil {
		t.Fatal(err)
	}
	other, err := newSocketFolder()
	if err != nil {
		t.Fatal(err)
	}
	if _, err := os.Stat(dead); err == nil {
		t.Error("the folder of a dead host is still there")
	}
	if _, err := os.Stat(mine.path); err != nil {
		t.Error("the folder of a living host is gone")
	}
	mine.remove()
	other.remove()
	if left, _ := os.ReadDir(base); len(left) != 0 {
		t.Errorf("left behind: %v", left)
	}
}
