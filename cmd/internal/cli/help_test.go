package cli

import (
	"io"
	"strings"
	"testing"
	"unicode/utf8"

	"wane/cmd/internal/report"
)

// Help fits the width that answers keep to.
func TestHelpFits(t *testing.T) {
	for _, command := range []string{"", "run", "check", "scenarios", "laws", "ask", "sky", "law", "law new", "law check", "verify", "schema", "version"} {
		var said strings.Builder
		p := Standard()
		p.Out, p.Err = &said, io.Discard
		if code := p.Main(append(strings.Fields(command), "--help")); code != ExitOK || said.Len() == 0 {
			t.Fatalf("wane %s --help: exit code %d", command, code)
		}
		for line := range strings.SplitSeq(said.String(), "\n") {
			if n := utf8.RuneCountInString(line); n > report.Width {
				t.Errorf("wane %s --help: %d columns, want at most %d: %s", command, n, report.Width, line)
			}
		}
	}
}
