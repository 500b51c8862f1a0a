package remnants

import (
	"math"
	"testing"

	"wane/sim/physics/imf"
	"wane/sim/physics/stars"
	"wane/testdata/published"
)

func TestPublished(t *testing.T) {
	kroupa, err := imf.Kroupa(0.01, 120, imf.KroupaSlopes())
	if err != nil {
		t.Fatal(err)
	}
	between := func(low, high float64) float64 { return kroupa.NumberBelow(high) - kroupa.NumberBelow(low) }
	for _, row := range published.Rows(t, "remnants.csv") {
		in := func(column string) float64 { return row.Number(t, column) }
		switch quantity := row.Inputs["quantity"]; quantity {
		case "white-dwarf":
			row.Check(t, CummingsMean(in("mass_Msun")))
		case "white-dwarf-star":
			row.Check(t, CummingsInitial(in("mass_Msun")))
		case "neutron-star-chance":
			row.Check(t, NeutronStarChance(in("mass_Msun")))
		case "hole":
			row.Check(t, Hole(in("mass_Msun"), in("f")))
		case "share-brown-dwarf":
			row.Check(t, kroupa.NumberBelow(in("mass_Msun")))
		case "share-white-dwarf":
			row.Check(t, between(0.075, Collapse))
		case "share-helium":
			row.Check(t, between(0.075, HeliumLimit))
		case "share-neutron-star":
			row.Check(t, weigh(kroupa, NeutronStarChance))
		case "share-black-hole":
			row.Check(t, weigh(kroupa, func(m float64) float64 { return 1 - NeutronStarChance(m) }))
		case "share-white-dwarf-above":
			row.Check(t, between(CummingsInitial(in("mass_Msun")), Collapse))
		case "share-of-stars-white-dwarf-above":
			stars := 1 - kroupa.NumberBelow(0.08)
			row.Check(t, between(CummingsInitial(in("mass_Msun")), Collapse)/stars)
		case "gain-by-scatter":
			m := in("mass_Msun")
			row.Check(t, scatteredShare(kroupa, m)/between(CummingsInitial(m), Collapse))
		case "share-white-dwarf-above-scattered":
			row.Check(t, scatteredShare(kroupa, in("mass_Msun")))
		case "white-dwarf-seam":
			m := in("mass_Msun")
			row.Check(t, CummingsMean(m)/CummingsMean(math.Nextafter(m, 0)))
		case "direct-hole":
			row.Check(t, DirectHole(in("mass_Msun"), in("f")))
		case "returned":
			row.Check(t, 1-final(kroupa).all()/kroupa.Mean())
		case "returned-chabrier":
			c := imf.ChabrierSingle()
			f, err := c.With(0.01, 120, c.Centre, c.Width, c.Slope)
			if err != nil {
				t.Fatal(err)
			}
			row.Check(t, 1-final(f).all()/f.Mean())
		case "returned-salpeter":
			f, err := imf.Salpeter(0.1, 120, imf.SalpeterSlope)
			if err != nil {
				t.Fatal(err)
			}
			row.Check(t, 1-final(f).all()/f.Mean())
		case "ever-formed":
			row.Check(t, galaxyObjects*kroupa.Mean())
		case "rate-today":
			row.Check(t, galaxyObjects*kroupa.Mean()/7e9*math.Exp(-(now-1e9)/7e9))
		case "stars-today":
			row.Check(t, galaxyObjects*starsToday(kroupa))
		case "number-share-white-dwarf":
			row.Check(t, between(0.075, Collapse))
		case "number-share-brown-dwarf":
			row.Check(t, kroupa.NumberBelow(0.075))
		case "number-share-neutron-star":
			row.Check(t, weigh(kroupa, NeutronStarChance))
		case "mass-share-white-dwarf":
			x := final(kroupa)
			row.Check(t, x.dwarfs/x.all())
		case "mass-share-brown-dwarf":
			x := final(kroupa)
			row.Check(t, x.brown/x.all())
		case "mass-share-neutron-star":
			x := final(kroupa)
			row.Check(t, x.neutron/x.all())
		case "mass-share-black-hole":
			x := final(kroupa)
			row.Check(t, x.holes/x.all())
		case "neutron-stars-of-galaxy":
			row.Check(t, 2e11*weigh(kroupa, NeutronStarChance))
		case "black-holes-of-galaxy":
			row.Check(t, 2e11*weigh(kroupa, func(m float64) float64 { return 1 - NeutronStarChance(m) }))
		default:
			t.Errorf("%s: unknown quantity %q", row.Where(), quantity)
		}
	}
}

// left is what is left once all stars are dead, solar masses per object.
type left struct{ brown, dwarfs, neutron, holes float64 }

func (x left) all() float64 { return x.brown + x.dwarfs + x.neutron + x.holes }

// final sums what the objects of a mass function leave: midpoints in steps of
// number, finer towards the heavy end.
func final(f interface{ Quantile(u float64) float64 }) (x left) {
	const n = 200000
	for i := range n {
		a, b := 1-float64(i)/n, 1-float64(i+1)/n
		w, m := a*a*a-b*b*b, f.Quantile(1-(a*a*a+b*b*b)/2)
		switch {
		case m < 0.075:
			x.brown += w * m
		case m < Collapse:
			x.dwarfs += w * CummingsMean(m)
		default:
			x.neutron += w * NeutronStarChance(m) * NeutronStarMean
			x.holes += w * (1 - NeutronStarChance(m)) * Hole(m, 0.9)
		}
	}
	return x
}

// The default galaxy: objects, and its age, yr.
const galaxyObjects, now = 2e11, 13.79e9

// starsToday is the mass of the stars that live and of the remnants of those
// that do not, per object ever formed; brown dwarfs are left out.
func starsToday(f imf.BrokenPowerLaw) (sum float64) {
	const n = 200000
	lifetimes := stars.NewLifetimes()
	born := func(before float64) float64 { return -math.Expm1(-max(before-1e9, 0) / 7e9) }
	for i := range n {
		a, b := 1-float64(i)/n, 1-float64(i+1)/n
		w, m := a*a*a-b*b*b, f.Quantile(1-(a*a*a+b*b*b)/2)
		if m < 0.075 {
			continue
		}
		dead := born(now - math.Pow(10, lifetimes.Life(m, 0.1)))
		rest := CummingsMean(m)
		if m >= Collapse {
			rest = NeutronStarChance(m)*NeutronStarMean + (1-NeutronStarChance(m))*Hole(m, 0.9)
		}
		sum += w * (m*(born(now)-dead) + rest*dead)
	}
	return sum
}

// weigh sums a chance over the stars that collapse, between the ends of the
// islands where it is constant.
func weigh(f imf.BrokenPowerLaw, chance func(float64) float64) float64 {
	ends := []float64{Collapse, 15, 17.8, 18.5, 21.7, 25.2, 27.5, 60, 120}
	sum := 0.0
	for i, low := range ends[:len(ends)-1] {
		sum += (f.NumberBelow(ends[i+1]) - f.NumberBelow(low)) * chance((low+ends[i+1])/2)
	}
	return sum
}

// scatteredShare is the share of all objects that end as white dwarfs above a mass
// with the scatter of 0.06, by a midpoint sum over stars and draws.
func scatteredShare(f imf.BrokenPowerLaw, above float64) float64 {
	const stars, draws = 800, 800
	low, high, hits := f.NumberBelow(4), f.NumberBelow(Collapse), 0
	for i := range stars {
		m := f.Quantile(low + (high-low)*(float64(i)+0.5)/stars)
		for j := range draws {
			if WhiteDwarf(m, (float64(j)+0.5)/draws, 0.06) > above {
				hits++
			}
		}
	}
	return (high - low) * float64(hits) / (stars * draws)
}

// The pieces of the relation join to the 0.001 that their doc states.
func TestSeams(t *testing.T) {
	for _, m := range []float64{HeliumLimit, 2.85, 3.60} {
		below, above := CummingsMean(math.Nextafter(m, 0)), CummingsMean(m)
		if math.Abs(below-above) > 1.01e-3 {
			t.Errorf("at %v: %v below, %v above", m, below, above)
		}
	}
	for _, m := range []float64{40, 45} {
		if below, above := Hole(math.Nextafter(m, 0), 0.9), Hole(m, 0.9); math.Abs(below-above) > 1e-9 {
			t.Errorf("hole at %v: %v below, %v above", m, below, above)
		}
	}
}

// Scatter: the quantiles of a Gaussian cut at 3 sigma. SciPy 1.10,
// stats.truncnorm(-3, 3).ppf: 0.1 and 0.975 below.
func TestWhiteDwarfScatter(t *testing.T) {
	const m, scatter = 2.0, 0.06
	for u, z := range map[float64]float64{0: -3, 0.1: -1.27542222347, 0.5: 0, 0.975: 1.9384790343, 1: 3} {
		want := CummingsMean(m) + scatter*z
		if got := WhiteDwarf(m, u, scatter); math.Abs(got-want) > 1e-9 {
			t.Errorf("white dwarf of 2 solar masses at u = %v: %.12g, want %.12g", u, got, want)
		}
	}
	if got := WhiteDwarf(0.54, 1, 0.1); got != 0.54 {
		t.Errorf("a star of 0.54 leaves %v: more than itself", got)
	}
	if got := WhiteDwarf(8, 1, 0.06); got != HeaviestWhiteDwarf {
		t.Errorf("heaviest white dwarf is %v, want %v", got, HeaviestWhiteDwarf)
	}
	if a, b := WhiteDwarf(0.3, 0.01, 0.06), WhiteDwarf(0.3, 0.99, 0.06); a != 0.3 || b != 0.3 {
		t.Errorf("helium dwarfs scatter: %v, %v", a, b)
	}
}

// Neutron stars: the median, the clips, and the mixture's own distribution.
func TestNeutronStars(t *testing.T) {
	if got := SingleGaussian(0.5, 1.36, 0.09, 2.2); math.Abs(got-1.36) > 1e-12 {
		t.Errorf("median of the single Gaussian is %v, want 1.36", got)
	}
	// One sigma of a Gaussian holds 0.8413447461 below it.
	if got := SingleGaussian(0.8413447460685429, 1.36, 0.09, 2.2); math.Abs(got-1.45) > 1e-9 {
		t.Errorf("one sigma of the single Gaussian is %v, want 1.45", got)
	}
	for _, u := range []float64{0, 1} {
		want := []float64{LightestNeutronStar, 2.2}[int(u)]
		if got := SingleGaussian(u, 1.36, 0.09, 2.2); got != want {
			t.Errorf("single Gaussian at u = %v: %v, want %v", u, got, want)
		}
		if got := DoubleGaussian(u, 2.2); math.Abs(got-want) > 1e-11 {
			t.Errorf("double Gaussian at u = %v: %v, want %v", u, got, want)
		}
	}
	for _, u := range []float64{0.05, 0.3, 0.57, 0.7, 0.95} {
		m := DoubleGaussian(u, 2.4)
		below := 0.57*(1+math.Erf((m-1.393)/0.064/math.Sqrt2))/2 + 0.43*(1+math.Erf((m-1.807)/0.177/math.Sqrt2))/2
		if math.Abs(below-u) > 1e-9 {
			t.Errorf("share below the double Gaussian's quantile of %v is %v", u, below)
		}
	}
}
