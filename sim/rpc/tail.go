package rpc

import (
	"encoding/json"
	"strings"
	"sync"
	"time"
)

// tail keeps the end of what a process writes to its log.
type tail struct {
	mu   sync.Mutex
	text []byte

	written int // bytes in all
}

const (
	tailKept  = 64 << 10 // bytes: what a Go program says when it dies may be long
	tailShown = 12       // lines
	lineShown = 400      // bytes
)

func (t *tail) Write(p []byte) (int, error) {
	t.mu.Lock()
	defer t.mu.Unlock()
	n := len(p)
	t.written += n
	p = p[max(0, n-tailKept):]
	t.text = append(t.text, p...)
	if len(t.text) > 2*tailKept {
		t.text = append(t.text[:0], t.text[len(t.text)-tailKept:]...)
	}
	return n, nil
}

// settle returns once nothing more comes for a while, or after a while longer.
func (t *tail) settle() {
	length := func() int {
		t.mu.Lock()
		defer t.mu.Unlock()
		return t.written
	}
	for range 10 {
		before := length()
		time.Sleep(20 * time.Millisecond)
		if length() == before {
			return
		}
	}
}

// String is the last lines. Lines that the machinery of the protocol writes
// about itself are left out, but for warnings.
func (t *tail) String() string {
	t.mu.Lock()
	text := string(t.text[max(0, len(t.text)-tailKept):])
	t.mu.Unlock()
	var lines []string
	for line := range strings.Lines(strings.ToValidUTF8(text, "?")) {
		if line = plain(strings.TrimRight(line, "\r\n")); line != "" {
			lines = append(lines, line)
		}
	}
	if at := lastPanic(lines); at >= 0 {
		return strings.Join(lines[at:min(at+tailShown, len(lines))], "\n")
	}
	return strings.Join(lines[max(0, len(lines)-tailShown):], "\n")
}

// lastPanic finds what a Go program died of, which it says before it tells, at
// length, where it was: -1 if that is not the end of the log.
func lastPanic(lines []string) int {
	for i := len(lines) - 1; i >= 0; i-- {
		l := lines[i]
		switch {
		case strings.HasPrefix(l, "panic: "), strings.HasPrefix(l, "fatal error: "):
			for i > 0 && strings.HasPrefix(lines[i-1], "runtime: ") {
				i--
			}
			if i > 0 && !traced(lines[i-1]) {
				i-- // what it was about to do
			}
			return i
		case !traced(l):
			return -1
		}
	}
	return -1
}

// traced tells whether a line is one of a stack of calls.
func traced(line string) bool {
	for _, start := range []string{"\t", "goroutine ", "created by ", "[signal ", "runtime stack:", "runtime: ", "...", "exit status "} {
		if strings.HasPrefix(line, start) {
			return true
		}
	}
	return strings.HasSuffix(line, ")") && strings.Contains(line, "(")
}

func plain(line string) string {
	if strings.HasPrefix(line, "{") {
		var entry struct {
			Level   string `json:"@level"`
			Message string `json:"@message"`
		}
		if json.Unmarshal([]byte(line), &entry) == nil && entry.Level != "" {
			switch entry.Level {
			case "trace", "debug", "info":
				return ""
			}
			line = entry.Message
		}
	}
	if len(line) > lineShown {
		line = strings.ToValidUTF8(line[:lineShown], "") + " ..."
	}
	return line
}
