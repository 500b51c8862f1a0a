package cli

import (
	"encoding/json"
	"fmt"
	"io"
	"os"
	"strings"
	"unicode/utf8"

	"golang.org/x/term"

	"wane/cmd/internal/report"
)

// printJSON prints a value as one indented JSON document.
func printJSON(w io.Writer, v any) error {
	e := json.NewEncoder(w)
	e.SetIndent("", "  ")
	e.SetEscapeHTML(false)
	return e.Encode(v)
}

// output remembers the first answer that could not be written, so that no
// command has to look after each line it prints.
type output struct {
	io.Writer
	err error
}

func (o *output) Write(p []byte) (int, error) {
	n, err := o.Writer.Write(p)
	if err != nil && o.err == nil {
		o.err = err
	}
	return n, err
}

// isTerminal tells whether a stream is a terminal.
func isTerminal(w io.Writer) bool {
	if o, ok := w.(*output); ok {
		w = o.Writer
	}
	f, ok := w.(*os.File)
	return ok && term.IsTerminal(int(f.Fd()))
}

// styleFor is plain unless the stream is a terminal that may be dressed:
// NO_COLOR and a dumb terminal ask for plain text (https://no-color.org).
func styleFor(w io.Writer) report.Style {
	return report.Style{Bold: isTerminal(w) && os.Getenv("NO_COLOR") == "" && os.Getenv("TERM") != "dumb"}
}

// field prints a term and its text, wrapped beside it.
func field(w io.Writer, indent, column int, name, text string) {
	lead := strings.Repeat(" ", indent) + name
	lead += strings.Repeat(" ", max(indent+column-utf8.RuneCountInString(lead), 1))
	for i, l := range report.Wrap(text, report.Width-utf8.RuneCountInString(lead)) {
		if i > 0 {
			lead = strings.Repeat(" ", max(indent+column, 0))
		}
		fmt.Fprintln(w, strings.TrimRight(lead+l, " "))
	}
}
