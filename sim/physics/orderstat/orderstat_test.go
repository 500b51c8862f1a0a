package orderstat

import (
	"math"
	"os"
	"os/exec"
	"strconv"
	"strings"
	"testing"

	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	for _, row := range published.Rows(t, "orderstat.csv") {
		number := func(name string) float64 { return row.Number(t, name) }
		switch q := row.Inputs["quantity"]; q {
		case "mean-last":
			row.Check(t, MeanLast(number("n")))
		case "mean-first":
			row.Check(t, MeanFirst(number("n")))
		case "quantile-last":
			row.Check(t, QuantileLast(number("n"), number("p")))
		case "sample-deficit-dex":
			row.Check(t, math.Log10(MeanLast(number("p"))/MeanLast(number("n"))))
		case "threshold":
			row.Check(t, ThresholdTime(number("p")))
		case "threshold-dex":
			row.Check(t, math.Log10(ThresholdTime(number("p"))))
		case "threshold-error-dex":
			p := number("p")
			row.Check(t, ThresholdError(p, number("n"), math.Log(p))/math.Ln10)
		case "spread-last":
			row.Check(t, SpreadLast)
		case "edge-deficit":
			row.Check(t, EdgeDeficit(number("n"), number("xi"), number("mass_Msun"), number("p")))
		case "largest-of-tail":
			row.Check(t, LargestOfTail(number("n"), number("xi"), 2.3, number("mass_Msun"), number("p")))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// TestReference compares with SciPy and mpmath: harmonic numbers by digamma,
// quantiles of the last by the Gumbel distribution and by the exact power.
func TestReference(t *testing.T) {
	out, err := exec.Command("/usr/bin/python3", "testdata/last.py").Output()
	if err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("SciPy and mpmath are required: %v", err)
		}
		t.Skipf("no SciPy or mpmath: %v", err)
	}
	lines := strings.Split(strings.TrimSpace(string(out)), "\n")
	if len(lines) < 30 {
		t.Fatalf("last.py printed %d lines", len(lines))
	}
	for _, line := range lines {
		f := strings.Fields(line)
		n, p, want := number(t, f[1]), number(t, f[2]), number(t, f[3])
		var got, tol float64
		switch f[0] {
		case "mean":
			got, tol = MeanLast(n), 1e-14
		case "quantile":
			got, tol = QuantileLast(n, p), 1e-14
		case "gumbel": // differs from the exact quantile by order 1/n
			got, tol = QuantileLast(n, p), 1e-13+3/n
		default:
			t.Fatalf("unknown line %q", line)
		}
		if math.Abs(got-want) > tol*math.Max(1, math.Abs(want)) {
			t.Errorf("%s: got %.17g, difference %.1e", line, got, got-want)
		}
	}
}

func number(t *testing.T, s string) float64 {
	v, err := strconv.ParseFloat(s, 64)
	if err != nil {
		t.Fatal(err)
	}
	return v
}

// TestLastDate recovers the last of n exponential lives, of lives of two
// means, and of lives that all end on one day.
func TestLastDate(t *testing.T) {
	exponential := func(n, tau float64) func(float64) float64 {
		return func(l float64) float64 { return n * math.Exp(-math.Pow(10, l)/tau) }
	}
	got, err := LastDate(exponential(1e11, 1), 0.5, -3, 6)
	want := math.Log10(math.Log(1e11) - math.Log(math.Ln2))
	if err != nil || math.Abs(got-want) > 1e-14 {
		t.Errorf("exponential: %v, %v; want %v", got, err, want)
	}
	// Few long-lived against many short-lived: the last belongs to the few.
	few, many := exponential(10, 1000), exponential(1e11, 1)
	got, err = LastDate(func(l float64) float64 { return few(l) + many(l) }, 0.5, -3, 9)
	want = math.Log10(1000 * math.Log(10/math.Ln2))
	if err != nil || math.Abs(got-want) > 1e-14 {
		t.Errorf("two kinds: %v, %v; want %v", got, err, want)
	}
	step := func(l float64) float64 {
		if l < 13 {
			return 5
		}
		return 0
	}
	if got, err = LastDate(step, 0.95, 0, 100); err != nil || got != 13 {
		t.Errorf("all on one day: %v, %v; want 13", got, err)
	}
	for _, bracket := range [][2]float64{{14, 100}, {0, 12}} {
		if _, err = LastDate(step, 0.5, bracket[0], bracket[1]); err == nil {
			t.Errorf("bracket %v holds no solution, but there is no error", bracket)
		}
	}
	if _, err = LastDate(step, 1, 0, 100); err == nil {
		t.Error("quantile 1 has no date, but there is no error")
	}
}
