package cli

import (
	"io"
	"math"
	"strings"
	"testing"
)

// Bad dates and grids are all refused, with what is wanted.
func TestSkyDatesRefused(t *testing.T) {
	for flags, want := range map[string]string{
		"--at 10":               "no unit: want a time",
		"--at 10kg":             "is a mass: want a time",
		"--at ":                 "want dates such as",
		"--at 1e10yr,,1e11yr":   "want dates such as",
		"--at yesterday":        "no number",
		"--at -1yr":             "want >= 0",
		"--at 0yr":              "want 1 .. 10^(1e300) yr",
		"--at 0.5yr":            "want 1 .. 10^(1e300) yr",
		"--at NaNyr":            "no number",
		"--at 10^(10^301)yr":    "beyond 1e300",
		"--grid 9:14":           "want from:to:count",
		"--grid 9:14:3:4":       "want from:to:count",
		"--grid nine:14:3":      `"nine" is no number`,
		"--grid 14:9:3":         "want from < to",
		"--grid 9:9:3":          "want from < to",
		"--grid -1:9:3":         "want log10 of years, 0 .. 1e300",
		"--grid 1:NaN:3":        "want log10 of years, 0 .. 1e300",
		"--grid 1:2e300:3":      "want log10 of years, 0 .. 1e300",
		"--grid 9:14:1":         "count 1: want a whole number, 2 .. 100000",
		"--grid 9:14:1e9":       "count 1e9: want a whole number",
		"--grid 9:14:2.5":       "count 2.5: want a whole number",
		"--realisation -1":      "--realisation -1: want a whole number, 0 .. 999999",
		"--realisation 1000000": "want a whole number, 0 .. 999999",
		"--csv --json":          "--csv and --json: want one of them",
	} {
		var said, out strings.Builder
		p := Standard()
		p.Out, p.Err = &out, &said
		args := append([]string{"sky"}, strings.SplitN(flags, " ", 2)...)
		if code := p.Main(args); code != ExitBadInput || !strings.Contains(said.String(), want) || out.Len() > 0 {
			t.Errorf("sky %s: exit code %d, said %q, want %q; printed %q", flags, code, said.String(), want, out.String())
		}
	}
}

// A grid has both its ends, and dates come in order, each once.
func TestSkyGrid(t *testing.T) {
	var out strings.Builder
	p := Standard()
	p.Out, p.Err = &out, io.Discard
	if code := p.Main([]string{"sky", "--grid", "9:14:6", "--at", "1e14 yr, 13.8 Gyr,1e12yr", "--at", "10^1500yr", "--csv"}); code != ExitOK {
		t.Fatalf("exit code %d", code)
	}
	var got []float64
	for _, row := range skyRows(t, out.String()) {
		got = append(got, row["log10_date"])
	}
	want := []float64{9, 10, math.Log10(13.8e9), 11, 12, 13, 14, 1500}
	if len(got) != len(want) {
		t.Fatalf("dates %v, want %v", got, want)
	}
	for i := range want {
		if math.Abs(got[i]-want[i]) > 1e-14*want[i] {
			t.Errorf("dates %v, want %v", got, want)
		}
	}
}
