package plugins_test

import (
	"math"
	"strconv"
	"testing"

	"wane/sim/law"
	"wane/sim/physics/collision"
	"wane/sim/physics/structure"
	"wane/testdata/published"
	"wane/testdata/reference"
)

var meetingClocks = []string{"area", "touch", "weight", "pull"}

// sizes are the radii of objects, km.
func sizes(pop remnants) []float64 {
	out := make([]float64, len(pop.mass))
	for i, m := range pop.mass {
		switch pop.kind[i] {
		case law.BrownDwarf:
			out[i] = structure.BrownDwarfRadius(m)
		case law.WhiteDwarf:
			out[i] = structure.WhiteDwarfRadius(m)
		case law.NeutronStar:
			out[i] = structure.NeutronStarRadius(m)
		default:
			out[i] = structure.HoleRadius(m)
		}
	}
	return out
}

// collisionsOf follows the dead of the default galaxy as it contracts, with
// susceptibilities m^-beta, until it is over, and counts by the default law of
// encounters the collisions per object founded and of an object that stays.
func collisionsOf(t *testing.T, beta float64, over func(left, mass, founded float64) bool) (each, staying float64) {
	const real, step = 2e11, 0.01
	uses := defaultUses(t)
	if err := uses["ejection"].Set("beta", beta); err != nil {
		t.Fatal(err)
	}
	pop := remnantsOf(t, uses, 1000)
	radius := sizes(pop)
	s := ask(t, uses, "ejection", "expose", law.WhiteDwarf, map[string][]float64{"mass": pop.mass}).Values("to_ejection")
	exposed := ask(t, uses, "encounter", "expose", law.WhiteDwarf, map[string][]float64{"mass": pop.mass, "radius": radius})
	one := func(v float64) []float64 { return []float64{v} }
	founded := 0.0
	for i, m := range pop.mass {
		founded += real * pop.weight[i] * m
	}
	for c := 0.0; c < 100; c += step {
		number, mass, sum, radii := 0.0, 0.0, 0.0, 0.0
		seeks := make([]float64, len(meetingClocks))
		for i, m := range pop.mass {
			n := real * pop.weight[i] * math.Exp(-s[i]*(c+step/2))
			number, mass, sum = number+n, mass+n*m, sum+n*s[i]
			radii += n * exposed.Values("sought_touch")[i]
			for k, clock := range meetingClocks {
				seeks[k] += n * exposed.Values(law.SeeksColumn(clock))[i]
			}
		}
		if over(number/real, mass, founded) {
			return each, staying
		}
		frame := ask(t, uses, "ejection", "rate", law.WhiteDwarf, map[string][]float64{
			"number": one(number), "mass_bound": one(mass), "sum_ejection": one(sum), "carried_off": one(founded - mass),
			"central_mass": one(0), "founded_number": one(real), "founded_radius": one(1e4),
		})
		years := step / math.Pow(10, frame.Values("log10_rate_ejection")[0])
		rates := ask(t, uses, "encounter", "rate", law.WhiteDwarf, map[string][]float64{
			"number": one(number), "mass_bound": one(mass), "sum_sought_touch": one(radii),
			"galaxy_radius": frame.Values("radius"), "galaxy_dispersion": frame.Values("dispersion"),
		})
		met := 0.0
		for k, clock := range meetingClocks {
			met += years * math.Pow(10, rates.Values(law.RateColumn(clock))[0]) * seeks[k]
		}
		each += met / real
		staying += 2 * met / number
	}
	t.Fatal("the galaxy does not end")
	return
}

// TestCollisions checks how often the objects of the default galaxy collide,
// by the default laws, against a calculation with SciPy.
func TestCollisions(t *testing.T) {
	scipy := reference.Python(t, "testdata/collisions.py")
	found := map[string]float64{}
	found["per-object 0.5"], found["per-survivor 0.5"] = collisionsOf(t, 0.5, func(_, mass, founded float64) bool {
		return 4.3e6+0.05*(founded-mass) > mass
	})
	found["per-object 0"], _ = collisionsOf(t, 0, func(left, _, _ float64) bool { return left < 0.01 })
	heavy, share, sorted := heavyPairs(t)
	found["star-making-share "] = heavy
	for _, row := range published.Rows(t, "collisions.csv") {
		q := row.Inputs["quantity"]
		switch got, ok := found[q+" "+row.Inputs["beta"]]; {
		case ok:
			row.Check(t, got)
		case q == "star-making":
			v := row.Number(t, "speed_km_s")
			years := 0.0
			for _, m := range sorted { // equal shares of heavy pairs
				years += heavy * collision.CrossSection(row.Number(t, "distance_km"), m, v) / float64(len(sorted))
			}
			n := row.Number(t, "number")
			rate := share * share * n / 2 / collision.Time(collision.MeanDensity(n, row.Number(t, "radius_pc")), years, v)
			row.Check(t, 1/rate)
			found[strconv.FormatFloat(v, 'g', -1, 64)] = 1 / rate
		}
	}
	for i, want := range []struct {
		got, scipy float64
	}{
		{found["200"], scipy[0][0]}, {found["86"], scipy[0][1]}, {heavy, scipy[0][2]},
		{found["per-object 0.5"], scipy[1][0]}, {found["per-survivor 0.5"], scipy[1][1]}, {found["per-object 0"], scipy[2][0]},
	} {
		if !(math.Abs(want.got/want.scipy-1) < 0.01) {
			t.Errorf("number %d: %.6g, SciPy says %.6g", i, want.got, want.scipy)
		}
	}
}

// heavyPairs finds among pairs of brown dwarfs of the default laws those that
// the law of encounters merges into one of at least 0.075 solar masses: their
// share, the share of brown dwarfs among objects, and the masses of such pairs.
func heavyPairs(t *testing.T) (heavy, share float64, masses []float64) {
	const n, limit = 400, 0.075
	uses := defaultUses(t)
	var u, metals []float64
	for i := range 40 * n {
		u, metals = append(u, (float64(i)+0.5)/(40*n)), append(metals, 0.02)
	}
	mass := ask(t, uses, "mass-function", "mass", law.Star, map[string][]float64{"u": u}).Values("mass")
	kind := ask(t, uses, "substellar-limit", "sort", law.Star, map[string][]float64{"mass": mass, "metals": metals}).Words("kind")
	dwarfs := 0
	for _, k := range kind {
		if k == law.BrownDwarf {
			dwarfs++
		}
	}
	share = float64(dwarfs) / float64(len(kind))
	for i := range n {
		u[i] = share * (float64(i) + 0.5) / n
	}
	mass = ask(t, uses, "mass-function", "mass", law.Star, map[string][]float64{"u": u[:n]}).Values("mass")
	in := map[string][]float64{}
	for _, a := range mass {
		for _, b := range mass {
			in["mass_1"], in["mass_2"] = append(in["mass_1"], a), append(in["mass_2"], b)
		}
	}
	rows := len(in["mass_1"])
	codes := func(code uint8) []uint8 {
		out := make([]uint8, rows)
		for i := range out {
			out[i] = code
		}
		return out
	}
	batch := law.Batch{Rows: rows}
	for _, q := range uses["encounter"].Card.Questions {
		if q.Name != "meet" {
			continue
		}
		for _, name := range q.Inputs {
			switch name {
			case "kind_1", "kind_2":
				batch.Columns = append(batch.Columns, law.Codes(name, codes(law.BrownDwarf)))
			case "composition_1", "composition_2":
				batch.Columns = append(batch.Columns, law.Codes(name, codes(law.Hydrogen)))
			default:
				batch.Columns = append(batch.Columns, law.Numbers(name, in[name]))
			}
		}
	}
	out, err := uses["encounter"].Ask("meet", batch)
	if err != nil {
		t.Fatal(err)
	}
	for i, m := range out.Values("mass_1") {
		if m >= limit && out.Words("kind_2")[i] == law.NoWord {
			masses = append(masses, m)
		}
	}
	return float64(len(masses)) / float64(rows), share, masses
}
