package rpc

import (
	"encoding/json"
	"strings"
	"sync"
)

// tail keeps the end of what a process writes to its log.
type tail struct {
	mu   sync.Mutex
	text []byte
}

const (
	tailKept  = 16 << 10 // bytes
	tailShown = 12       // lines
	lineShown = 400      // bytes
)

func (t *tail) Write(p []byte) (int, error) {
	t.mu.Lock()
	defer t.mu.Unlock()
	n := len(p)
	p = p[max(0, n-tailKept):]
	t.text = append(t.text, p...)
	if len(t.text) > 2*tailKept {
		t.text = append(t.text[:0], t.text[len(t.text)-tailKept:]...)
	}
	return n, nil
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
	return strings.Join(lines[max(0, len(lines)-tailShown):], "\n")
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
