package cli

import (
	"context"
	"encoding/json"
	"errors"
	"io"
	"math"
	"slices"
	"strings"
	"testing"
	"unicode/utf8"

	"wane/cmd/internal/report"
	"wane/cmd/internal/verify"
)

// verified types wane verify with dates that a test has spoilt.
func verified(t *testing.T, spoil func([]verify.Date) []verify.Date, args ...string) (code int, out, errs string) {
	t.Helper()
	var said, warned strings.Builder
	p := Standard()
	p.Out, p.Err = &said, &warned
	if spoil != nil {
		p.Dates = func() ([]verify.Date, error) {
			dates, err := verify.Dates()
			return spoil(dates), err
		}
	}
	code = p.Main(append([]string{"verify"}, args...))
	return code, said.String(), warned.String()
}

// The dates of the literature are as recorded: table and JSON tell the same.
func TestVerify(t *testing.T) {
	code, text, errs := verified(t, nil)
	if code != ExitOK || errs != "" {
		t.Fatalf("exit code %d: %s", code, errs)
	}
	for line := range strings.SplitSeq(text, "\n") {
		if n := utf8.RuneCountInString(line); n > report.Width || strings.ContainsAny(line, "\x1b\t") || strings.Contains(line, "NaN") {
			t.Errorf("%d columns, or what no plain text should have: %s", n, line)
		}
	}
	code, document, errs := verified(t, nil, "--json")
	var told verifiedAllJSON
	if err := json.Unmarshal([]byte(document), &told); err != nil || code != ExitOK || errs != "" {
		t.Fatalf("exit code %d, %v: %s", code, err, errs)
	}
	counted := 0
	for _, n := range told.Verdicts {
		counted += n
	}
	if !told.AsRecorded || len(told.Dates) < 30 || counted != len(told.Dates) {
		t.Errorf("as recorded %v, %d dates, verdicts %v", told.AsRecorded, len(told.Dates), told.Verdicts)
	}
	for _, d := range told.Dates {
		if !strings.Contains(text, "\n"+d.Name+" ") || d.Ours == nil || d.Difference == nil || d.Verdict != d.Recorded {
			t.Errorf("date %s: %+v", d.Name, d)
		}
		if want := *d.Ours - d.Date; d.Scale == "log10(t/yr)" && math.Abs(*d.Difference-want) > 1e-12*math.Abs(*d.Ours) {
			t.Errorf("date %s: difference %v, want %v", d.Name, *d.Difference, want)
		}
	}
}

// A date that is not as recorded ends in exit code 3, and is named.
func TestVerifyFindsStrays(t *testing.T) {
	wrong := func(dates []verify.Date) []verify.Date {
		for i := range dates {
			switch dates[i].Name {
			case "earth-spirals-in":
				dates[i].Verdict = verify.Agrees
			case "hole-naive":
				dates[i].Law = "evaporation/nobody"
			}
		}
		return dates
	}
	code, text, errs := verified(t, wrong)
	if code != ExitCheckFails || strings.Count(text, "NOT AS RECORDED") != 2 || !strings.Contains(text, "2 not as recorded") ||
		!strings.Contains(errs, "earth-spirals-in is not as recorded: recorded: agrees; now: differs, by +3.029 dex") ||
		!strings.Contains(errs, "hole-naive is not as recorded") || strings.Contains(errs, "--help") {
		t.Errorf("exit code %d\n%s%s", code, text, errs)
	}
	code, document, _ := verified(t, wrong, "hole-naive", "--json")
	var told verifiedAllJSON
	if err := json.Unmarshal([]byte(document), &told); err != nil || code != ExitCheckFails || told.AsRecorded ||
		len(told.Dates) != 1 || told.Dates[0].Ours != nil || told.Dates[0].Why == "" {
		t.Errorf("exit code %d, %v: %+v", code, err, told)
	}
	if code, _, errs = verified(t, wrong, "pulsar-merges"); code != ExitOK || errs != "" {
		t.Errorf("a date that is as recorded: exit code %d: %s", code, errs)
	}
}

func TestVerifyBadInput(t *testing.T) {
	for _, c := range []struct{ typed, want string }{
		{"earth-spiral-in", `did you mean "earth-spirals-in"?`},
		{"black-hole", `did you mean "black-holes"?`},
		{"hole-naive nonsense", `no date or topic "nonsense"`},
		{"rap hole-niave", `did you mean "hole-naive"?`},
		{"--json=maybe", "maybe"},
		{"--all", "unknown flag"},
	} {
		code, out, errs := verified(t, nil, strings.Fields(c.typed)...)
		if code != ExitBadInput || out != "" || !strings.Contains(errs, c.want) {
			t.Errorf("verify %s: exit code %d, %q, %q, want %q", c.typed, code, out, errs, c.want)
		}
	}
	broken := errors.New("a file of dates that is broken")
	p := Standard()
	p.Out, p.Err = io.Discard, io.Discard
	p.Dates = func() ([]verify.Date, error) { return nil, broken }
	if code := p.Main([]string{"verify"}); code != ExitFailed {
		t.Errorf("exit code %d without dates", code)
	}
}

// A list works nothing out, and a topic means all its dates.
func TestVerifyChooses(t *testing.T) {
	code, text, errs := verified(t, nil, "--list", "black-holes")
	if code != ExitOK || errs != "" || !strings.Contains(text, "hole-naive") || strings.Contains(text, "rip") {
		t.Errorf("exit code %d: %s%s", code, text, errs)
	}
	var listed []dateJSON
	code, text, _ = verified(t, nil, "--list", "--json")
	if err := json.Unmarshal([]byte(text), &listed); err != nil || code != ExitOK || len(listed) < 30 {
		t.Errorf("exit code %d, %v, %d dates", code, err, len(listed))
	}
	code, text, _ = verified(t, nil, "rip", "hole-naive", "rip", "--quiet")
	lines := strings.Split(strings.TrimSpace(text), "\n")
	if code != ExitOK || len(lines) != 5 || !strings.HasPrefix(lines[1], "rip ") || !strings.HasPrefix(lines[4], "hole-naive ") {
		t.Errorf("exit code %d: %s", code, text)
	}
}

func TestVerifyCompletes(t *testing.T) {
	got, _ := Standard().completeVerify(nil, nil, "hole")
	if !slices.ContainsFunc(got, func(s string) bool { return strings.HasPrefix(s, "hole-naive\t") }) {
		t.Errorf("completes to %v", got)
	}
	if got, _ = Standard().completeVerify(nil, nil, "black-h"); len(got) != 1 {
		t.Errorf("completes to %v", got)
	}
}

func TestVerifyInterrupted(t *testing.T) {
	ctx, cancel := context.WithCancel(t.Context())
	cancel()
	p := Standard()
	p.Out, p.Err = io.Discard, io.Discard
	root := p.root()
	root.SetArgs([]string{"verify"})
	var stopped *fault
	if err := root.ExecuteContext(ctx); !errors.As(err, &stopped) || stopped.code != ExitInterrupted {
		t.Errorf("got %v, want exit code %d", err, ExitInterrupted)
	}
}
