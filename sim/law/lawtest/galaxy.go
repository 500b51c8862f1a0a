package lawtest

import (
	"math/rand/v2"
	"strings"

	"wane/sim/law"
	"wane/sim/num"
)

// galaxy draws the values of a galaxy somewhere between its founding and its
// last bound object, for the columns a rate reads.
func (k *kit) galaxy(r *rand.Rand, columns []string) map[string]float64 {
	founded := logUniform(r, span{1e3, 1e12})
	left := max(1, founded*num.Exp10(-12*r.Float64()*r.Float64()))
	return k.galaxyOf(r, columns, founded, left, logUniform(r, span{1, 1e5}), logUniform(r, span{1, 500}))
}

// galaxyOf is a galaxy of which some objects are left. Radius in pc,
// dispersion in km/s.
func (k *kit) galaxyOf(r *rand.Rand, columns []string, founded, left, size, dispersion float64) map[string]float64 {
	mean := 0.2 + 0.5*r.Float64() // solMass
	bound := left * mean
	gone := (founded - left) * mean
	carried := gone * r.Float64()
	central := 0.1 * gone * r.Float64()
	out := map[string]float64{
		"log10_date": 10 + 15*r.Float64(), "founded_number": founded, "founded_mass": founded * mean,
		"founded_radius": size, "founded_dispersion": dispersion,
		"galaxy_radius": size * bound / (bound + carried), "galaxy_dispersion": dispersion,
		"carried_off": carried, "central_mass": central, "number": left, "mass_bound": bound,
	}
	shares := k.shares(r)
	for _, c := range columns {
		if _, known := out[c]; known {
			continue
		}
		share := 1.0
		for i, word := range k.set.Kinds {
			if strings.HasSuffix(c, "_"+strings.ReplaceAll(word, "-", "_")) {
				share = shares[i]
			}
		}
		switch {
		case strings.HasPrefix(c, "mass_bound"):
			out[c] = bound * share
		case strings.HasPrefix(c, "number"):
			out[c] = left * share
		case strings.HasPrefix(c, "sum_"):
			out[c] = left * share * (0.5 + r.Float64())
		case strings.HasPrefix(c, "reading_"):
			out[c] = 5 * (1 - left/founded) * r.ExpFloat64()
		}
	}
	return out
}

// shares are parts of a whole, one a kind; a kind may be gone.
func (k *kit) shares(r *rand.Rand) []float64 {
	out := make([]float64, len(k.set.Kinds))
	sum := 0.0
	for i := range out {
		if r.IntN(4) > 0 {
			out[i] = r.ExpFloat64()
		}
		sum += out[i]
	}
	if sum == 0 {
		out[0], sum = 1, 1
	}
	for i := range out {
		out[i] /= sum
	}
	return out
}

// cornerGalaxies are the extremes: one object left of one and of many, nothing
// lost yet, sizes from a room full of stars to a cluster of galaxies.
func (k *kit) cornerGalaxies(q law.Question) []entry {
	r := random("corner " + q.Name)
	var out []entry
	for _, founded := range []float64{1, 2, 3, 1e3, 1e12, 1e15} {
		for _, left := range []float64{1, 2, 3, founded / 2, founded} {
			if left > founded || left < 1 {
				continue
			}
			for _, size := range []float64{1e-6, 1e3, 1e8} {
				for _, dispersion := range []float64{1e-3, 200, 1e5} {
					out = append(out, entry{galaxy: k.galaxyOf(r, q.Inputs, founded, left, size, dispersion)})
				}
			}
		}
	}
	return out
}
