package cli

import (
	"bytes"
	"encoding/json"
	"fmt"
	"io"
	"strings"
	"sync"
)

// lawLog is where the logs of laws outside the program go: warnings and errors
// to standard error, in the form of our own; the rest nowhere. With all, lines
// that a law just prints are shown too, for those who write it. The end of a
// law's log is shown anyway when it fails.
func (p *Program) lawLog(s *settings, all bool) io.Writer {
	if s.quiet {
		return nil
	}
	return &lawLog{to: p.Err, all: all}
}

// lawLog turns records of JSON, one a line, into lines for people.
type lawLog struct {
	mu       sync.Mutex
	to       io.Writer
	all      bool
	rest     []byte // of a line that is not at its end yet
	panicked bool   // what follows is a stack of calls
}

func (l *lawLog) Write(b []byte) (int, error) {
	l.mu.Lock()
	defer l.mu.Unlock()
	l.rest = append(l.rest, b...)
	for {
		line, rest, ok := bytes.Cut(l.rest, []byte("\n"))
		if !ok {
			return len(b), nil
		}
		l.rest = rest
		l.line(line)
	}
}

func (l *lawLog) line(line []byte) {
	// From is empty where the machinery of the protocol speaks of itself, and
	// Said is the time of a record that the law made on purpose.
	var record struct{ Level, Law, From, Said, Message string }
	if json.Unmarshal(line, &record) != nil {
		fmt.Fprintf(l.to, "wane: %s\n", line)
		return
	}
	if record.From == "" || strings.HasSuffix(record.From, "stdio") {
		return
	}
	switch record.Level {
	case "error", "fatal", "panic":
		if l.panicked {
			return
		}
		l.panicked = strings.HasPrefix(record.Message, "panic: ") || strings.HasPrefix(record.Message, "fatal error: ")
	case "warn":
	default:
		l.panicked = false
		if !l.all || record.Said != "" {
			return
		}
	}
	fmt.Fprintf(l.to, "wane: law %s: %s\n", record.Law, record.Message)
}
