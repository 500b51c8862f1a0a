package stars

import (
	"fmt"
	"math"
	"testing"

	"wane/testdata/published"
	"wane/testdata/reference"
)

var endless = math.Inf(1)

func births(t *testing.T, g Gas) *Births {
	t.Helper()
	b, err := NewBirths(g)
	if err != nil {
		t.Fatal(err)
	}
	return b
}

// sinceStart is the time of the quantile u since the first birth, yr.
func sinceStart(b *Births, u float64) float64 {
	return math.Pow(10, b.Date(u)) - math.Pow(10, b.Log10Start)
}

func TestBirthsPublished(t *testing.T) {
	for _, row := range published.Rows(t, "births.csv") {
		g := Gas{9, math.Log10(5e9), 0.41, row.Number(t, "n"), row.Number(t, "infall_Msun_per_yr") * 5e9 / 1e10, math.Log10(5e9), endless}
		if row.Inputs["end_log10_yr"] != "" {
			g.Log10End = row.Number(t, "end_log10_yr")
		}
		b := births(t, g)
		switch quantity := row.Inputs["quantity"]; quantity {
		case "log10-birth":
			row.Check(t, b.Date(row.Number(t, "u")))
		case "log10-last-birth": // the median of the last of n is the quantile 2^(-1/n)
			row.Check(t, b.Date(math.Exp2(-1/row.Number(t, "number"))))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// Without infall, the share born before a date by hand: 1 - e^-kt, and
// 1 - (1 + (n-1) kt)^(-1/(n-1)).
func TestBirthsWithoutInfall(t *testing.T) {
	for _, n := range []float64{1, 1 + 1e-13, 1.01, 1.4, 2} {
		b := births(t, Gas{9, math.Log10(5e9), 0.41, n, 0, 9.7, endless})
		k := 0.59 / 5e9
		for _, u := range []float64{0.001, 0.1, 0.5, 0.9, 0.999} {
			x := k * sinceStart(b, u)
			got := -math.Expm1(-x)
			if n > 1.001 {
				got = 1 - math.Pow(1+(n-1)*x, -1/(n-1))
			}
			if math.Abs(got-u) > 1e-12 {
				t.Errorf("n = %v: share born before the date of %v is %v", n, u, got)
			}
		}
	}
}

// The usual exponential history is the gas-limited one with n = 1.
func TestExponentialIsGasLimited(t *testing.T) {
	b := births(t, Gas{9, math.Log10(0.59 * 7e9), 0.41, 1, 0, 9.7, endless})
	for _, u := range []float64{0, 1e-9, 0.3, 0.99, 1 - 0x1p-53, 1} {
		if got, want := b.Date(u), BirthDate(u, 9, math.Log10(7e9)); math.Abs(got-want) > 1e-13 {
			t.Errorf("date of %v is 10^%v, want 10^%v yr", u, got, want)
		}
	}
}

// With infall and n = 1 the gas by hand: e^-kx + J (e^-x - e^-kx)/(k - 1),
// x in infall times; births go as that, integrated by hand too.
func TestInfallLinear(t *testing.T) {
	for _, k := range []float64{0.05, 0.59, 3, 14} {
		for _, share := range []float64{0.01, 0.5, 20} {
			b := births(t, Gas{9, 9.7 - math.Log10(k), 0, 1, share, 9.7, endless})
			for _, u := range []float64{1e-3, 0.2, 0.5, 0.9, 0.999} {
				x := sinceStart(b, u) / math.Pow(10, 9.7)
				c := share / (k - 1)
				born := (1-c)*-math.Expm1(-k*x) + c*k*-math.Expm1(-x)
				if got := born / (1 + share); math.Abs(got-u) > 1e-12 {
					t.Errorf("k = %v, infall %v: share born before the date of %v is %v", k, share, u, got)
				}
			}
		}
	}
}

// With infall and any n, against SciPy's Runge-Kutta on gas and births, with
// no use of what is conserved.
func TestInfallAgainstRungeKutta(t *testing.T) {
	us := []float64{1e-3, 0.05, 0.3, 0.6, 0.9, 0.97}
	for _, c := range [][3]float64{{0.59, 1.4, 0.5}, {5, 1.1, 2}, {14, 2, 3}} {
		k, n, share := c[0], c[1], c[2]
		b := births(t, Gas{9, 9.7 - math.Log10(k), 0, n, share, 9.7, endless})
		args := []string{fmt.Sprint(k), fmt.Sprint(n), fmt.Sprint(share)}
		for _, u := range us {
			args = append(args, fmt.Sprintf("%.17g", sinceStart(b, u)/math.Pow(10, 9.7)))
		}
		want := reference.Python(t, "testdata/births.py", args...)[0]
		for i, u := range us {
			if got := u / us[len(us)-1]; math.Abs(got-want[i]) > 1e-9 {
				t.Errorf("k = %v, n = %v, infall %v: of the births before %v, %v come before %v, SciPy says %v", k, n, share, us[len(us)-1], got, u, want[i])
			}
		}
	}
}

// Dates never fall, also within a few roundings and where steps join; S gives
// the share back; an end cuts the same history.
func TestBirthsMonotone(t *testing.T) {
	for _, g := range []Gas{
		{9, 9.7, 0.41, 1, 0, 9.7, endless}, {9, 9.7, 0.41, 2, 0, 9.7, endless}, {8, 9, 0.5, 1.4, 5, 10.3, endless},
		{10, 10.3, 0.3, 1, 0.5, 9, endless}, {9, 9.7, 0.41, 1.4, 0.5, 9.7, 14}, {9, 9.7, 0.41, 1, 0, 9.7, 11}, {9, 9, 0, 3, 1e-6, 9.7, 13},
	} {
		b := births(t, g)
		before := math.Inf(-1)
		for i := 0; i <= 20000; i++ {
			u := float64(i) / 20000
			d := b.Date(u)
			if d < before || math.IsInf(d, 0) || d < g.Log10Start || d > g.Log10End {
				t.Fatalf("%+v: date of %v is 10^%v after 10^%v yr", g, u, d, before)
			}
			before = d
			x := math.Pow(10, num10Sub(d, g.Log10Start)-b.unit)
			want := 1 - u*(1-b.left)
			if got := b.unborn(x); u < 1 && math.Abs(got-want) > 1e-11 {
				t.Fatalf("%+v: %v unborn at the date of %v, want %v", g, got, u, want)
			}
		}
		for i := 53; i > 10; i-- { // the last births
			u := 1 - math.Ldexp(1, -i)
			if d := b.Date(u); d > before {
				t.Fatalf("%+v: date of %v is 10^%v, of a later birth 10^%v yr", g, u, d, before)
			} else {
				before = d
			}
		}
	}
}

func num10Sub(a, b float64) float64 {
	if a <= b {
		return math.Inf(-1)
	}
	return a + math.Log10(-math.Expm1((b-a)*math.Ln10))
}

func TestBirthsFaults(t *testing.T) {
	for _, g := range []Gas{
		{9, 9.7, 1, 1, 0, 9.7, endless}, {9, 9.7, -0.1, 1, 0, 9.7, endless}, {9, 9.7, 0.4, 0.9, 0, 9.7, endless}, {9, 9.7, 0.4, 1, -1, 9.7, endless},
		{9, 9.7, 0.4, 1, 0, 9.7, 9}, {9, math.NaN(), 0.4, 1, 0, 9.7, endless}, {9, 9.7, math.NaN(), 1, 0, 9.7, endless}, {9, 9.7, 0.4, 1, 0, 9.7, math.NaN()},
	} {
		if _, err := NewBirths(g); err == nil {
			t.Errorf("%+v: no error", g)
		}
	}
}

func BenchmarkNewBirths(b *testing.B) {
	for b.Loop() {
		if _, err := NewBirths(Gas{9, 9.7, 0.41, 1.4, 0.5, 9.7, endless}); err != nil {
			b.Fatal(err)
		}
	}
}
