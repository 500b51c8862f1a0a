package cli

import (
	"bytes"
	"flag"
	"os"
	"path/filepath"
	"strings"
	"testing"
	"unicode/utf8"

	"github.com/google/go-cmp/cmp"

	"wane/cmd/internal/report"
	"wane/sim/ensemble"
)

var update = flag.Bool("update", false, "rewrite the golden files")

func golden(t *testing.T, name string, got []byte) {
	t.Helper()
	file := filepath.Join("testdata", "golden", name)
	if *update {
		if err := os.WriteFile(file, got, 0o644); err != nil {
			t.Fatal(err)
		}
		return
	}
	want, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	if diff := cmp.Diff(string(want), string(got)); diff != "" {
		t.Errorf("%s (-want +got):\n%s", name, diff)
	}
}

func summaries() map[string]*ensemble.Summary {
	return map[string]*ensemble.Summary{"sampled": sampled(), "whole": whole(), "beyond": beyond()}
}

func TestGoldenSummaries(t *testing.T) {
	for name, s := range summaries() {
		t.Run(name, func(t *testing.T) {
			var text, data bytes.Buffer
			if err := report.Text(&text, s, report.Style{}); err != nil {
				t.Fatal(err)
			}
			golden(t, name+".txt", text.Bytes())
			if err := report.JSON(&data, s); err != nil {
				t.Fatal(err)
			}
			golden(t, name+".json", data.Bytes())
		})
	}
}

// A summary fits 100 columns, and its bold form differs by escapes alone.
func TestSummaryFits(t *testing.T) {
	for name, s := range summaries() {
		var plain, bold bytes.Buffer
		_ = report.Text(&plain, s, report.Style{})
		_ = report.Text(&bold, s, report.Style{Bold: true})
		for _, line := range strings.Split(plain.String(), "\n") {
			if n := utf8.RuneCountInString(line); n > report.Width {
				t.Errorf("%s: %d columns: %s", name, n, line)
			}
		}
		undressed := strings.NewReplacer("\x1b[1m", "", "\x1b[0m", "").Replace(bold.String())
		if undressed != plain.String() || bold.String() == plain.String() {
			t.Errorf("%s: bold differs by more, or less, than its escapes", name)
		}
		if strings.ContainsAny(plain.String(), "\x1b\t") || strings.Contains(plain.String(), "NaN") || strings.Contains(plain.String(), "Inf ") {
			t.Errorf("%s: text holds an escape, a tab, NaN or Inf", name)
		}
	}
}

// Where most realisations have no member, the median count is none: the real
// number is not called by it.
func TestLastOfAFewIsNotTheLastOfNone(t *testing.T) {
	s := sampled()
	for i := range s.Populations {
		s.Populations[i].PeakCount = 0
	}
	var text strings.Builder
	if err := report.Text(&text, s, report.Style{}); err != nil {
		t.Fatal(err)
	}
	if got := text.String(); strings.Contains(got, "all 0") || !strings.Contains(got, "the last of the real number goes at about 10^38.361, 0.003 dex beyond") {
		t.Errorf("got\n%s", got)
	}
}
