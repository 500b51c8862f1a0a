package num_test

import (
	"math"
	"testing"

	"wane/sim/num"
	"wane/testdata/published"
)

func TestPublishedDates(t *testing.T) {
	for _, row := range published.Rows(t, "logtime.csv") {
		a := row.Number(t, "a")
		switch q := row.Inputs["quantity"]; q {
		case "sum":
			row.Check(t, num.Add10(a, row.Number(t, "b")))
		case "difference":
			row.Check(t, num.Sub10(a, row.Number(t, "b")))
		case "smallest-step":
			// The least age, in units of t, that can be told at date a.
			next := math.Nextafter(a, math.Inf(1))
			row.Check(t, num.Exp10(num.Sub10(next, a)-a))
		case "100-terms":
			terms := make([]float64, 100)
			for i := range terms {
				terms[i] = a
			}
			row.Check(t, num.Sum10(terms...))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), q)
		}
	}
}

// Values recomputed by hand: 2e10, 0.3e10, and sums and differences whose
// answer is a round number.
func TestDates(t *testing.T) {
	hundred := make([]float64, 100)
	for i := range hundred {
		hundred[i] = 1100
	}
	for _, c := range []struct {
		name           string
		got, want, tol float64
	}{
		{"1e10 yr and 1e10 yr", num.Add10(10, 10), 10.301029995664, 1e-12},
		{"born at 1.0e10 yr, seen at 1.3e10 yr", num.Sub10(num.Log10(1.3e10), 10), 9.477121255, 1e-9},
		{"the same, log10 of 3e9", num.Sub10(num.Log10(1.3e10), 10), num.Log10(3e9), 1e-12},
		{"100 equal terms of L = 1100", num.Sum10(hundred...), 1102, 1e-12},
		{"L = 1100 minus L = 1080", num.Sub10(1100, 1080), 1100, 0},
		{"L = 1e76 and L = 1e75", num.Add10(1e76, 1e75), 1e76, 0},
		{"no age", num.Sub10(7, 7), math.Inf(-1), 0},
		{"negative age", num.Sub10(7, 8), math.Inf(-1), 0},
		{"no terms", num.Sum10(), math.Inf(-1), 0},
		{"nothing and a date", num.Add10(math.Inf(-1), 12), 12, 0},
		{"a date less nothing", num.Sub10(12, math.Inf(-1)), 12, 0},
		{"nothing and nothing", num.Add10(-inf, -inf), -inf, 0},
		{"never and a date", num.Add10(12, inf), inf, 0},
		{"never and never", num.Add10(inf, inf), inf, 0},
		{"never less a date", num.Sub10(inf, 12), inf, 0},
		{"never among terms", num.Sum10(3, inf, 4), inf, 0},
		{"unknown and a date", num.Add10(nan, 4), nan, 0},
		{"a date and unknown", num.Add10(4, nan), nan, 0},
		{"never and unknown", num.Add10(inf, nan), nan, 0},
		{"unknown less a date", num.Sub10(nan, 4), nan, 0},
		{"unknown among terms", num.Sum10(3, nan, inf), nan, 0},
	} {
		if !(math.Abs(c.got-c.want) <= c.tol) && !same(c.got, c.want) {
			t.Errorf("%s: %.17g, want %.17g within %g", c.name, c.got, c.want, c.tol)
		}
	}
}

// log10 of sums and differences of powers of ten against mpmath. Above
// log10 of 1e5 the smaller one is formed in 40 digits relative to the larger.
func TestDatesAgainstMpmath(t *testing.T) {
	for _, scale := range []float64{1, 10, 100, 1100, 32000, 1e15, 1e26, 1e76} {
		n := 300
		as, gaps := spread(0.5*scale, scale, n), spread(1e-12, 18, n+1)
		bs := make([]float64, n)
		for i := range bs {
			bs[i] = as[i] - min(gaps[i], scale/2) // may round to no gap at all
		}
		for i, w := range mpmath(t, "x + log10(1 + mpf(10)**(y - x))", as, bs) {
			if got := num.Add10(as[i], bs[i]); !(math.Abs((got-w.value)-w.rest*w.ulp) <= 0.51*w.ulp+3e-16) {
				t.Errorf("Add10(%x, %x) = %x, want %x", as[i], bs[i], got, w.value)
			}
			if a, b := num.Add10(as[i], bs[i]), num.Add10(bs[i], as[i]); a != b {
				t.Errorf("Add10 depends on the order: %x, %x", a, b)
			}
		}
		for i, w := range mpmath(t, "x + log10(1 - mpf(10)**(y - x)) if y < x else mpf('-inf')", as, bs) {
			// The logarithm's own ulp counts where it is the larger part.
			gap := math.Abs(w.value-as[i]) + 1
			if got := num.Sub10(as[i], bs[i]); got != w.value && !(math.Abs((got-w.value)-w.rest*w.ulp) <= 0.51*w.ulp+3e-16*gap) {
				t.Errorf("Sub10(%x, %x) = %x, want %x", as[i], bs[i], got, w.value)
			}
		}
		for i, w := range mpmath(t, "x + log10(1 + 2*mpf(10)**(y - x))", as, bs) {
			if got := num.Sum10(bs[i], as[i], bs[i]); !(math.Abs((got-w.value)-w.rest*w.ulp) <= 0.51*w.ulp+5e-16) {
				t.Errorf("Sum10(%x, %x, %x) = %x, want %x", bs[i], as[i], bs[i], got, w.value)
			}
		}
	}
}
