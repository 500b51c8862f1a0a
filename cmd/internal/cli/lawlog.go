package cli

import (
	"bytes"
	"encoding/json"
	"fmt"
	"io"
	"sync"
)

// lawLog is where the logs of laws outside the program go: warnings and faults
// to standard error, in the form of our own; the rest nowhere. The end of a
// law's log is shown anyway when it fails.
func (p *Program) lawLog(s *settings) io.Writer {
	if s.quiet {
		return nil
	}
	return &lawLog{to: p.Err}
}

// lawLog turns records of JSON, one a line, into lines for people.
type lawLog struct {
	mu   sync.Mutex
	to   io.Writer
	rest []byte // of a line that is not at its end yet
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
	var record struct{ Level, Law, Message string }
	if json.Unmarshal(line, &record) != nil {
		fmt.Fprintf(l.to, "wane: %s\n", line)
		return
	}
	switch record.Level {
	case "warn", "error", "fatal", "panic":
		fmt.Fprintf(l.to, "wane: law %s: %s\n", record.Law, record.Message)
	}
}
