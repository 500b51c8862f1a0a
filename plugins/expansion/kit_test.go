package expansion_test

import (
	"math"
	"testing"

	"wane/plugins/expansion"
	"wane/sim/law"
	"wane/sim/law/lawtest"
)

func TestKit(t *testing.T) {
	for _, l := range []law.Law{
		expansion.LambdaCDM(), expansion.WCDM(), expansion.Phantom(), expansion.DecayingDarkEnergy(), expansion.MatterOnly(), expansion.Open(),
	} {
		lawtest.Run(t, l)
	}
}

// ask answers question density of two rows: before dark energy began to
// decay, and after, at the same ln a and date.
func ask(t *testing.T, l law.Law, values map[string]float64, x, date float64) (dark, curvature []float64) {
	t.Helper()
	u := law.NewUse(l)
	for name, v := range values {
		if err := u.Set(name, v); err != nil {
			t.Fatal(err)
		}
	}
	all := map[string][]float64{"ln_a": {x, x}, "log10_date": {date, date}, "log10_since": {math.Inf(-1), 3}}
	in := law.Batch{Rows: 2}
	for _, name := range u.Card.Questions[0].Inputs {
		in.Columns = append(in.Columns, law.Numbers(name, all[name]))
	}
	out, err := u.Ask("density", in)
	if err != nil {
		t.Fatal(err)
	}
	return out.Values("log10_dark"), out.Values("curvature")
}

// Dark energy is what matter and radiation leave of the critical density, as
// flat space has it, and is gone once it has begun to decay. Its change with
// the scale factor and with the date is by hand from each law's formula.
func TestDensity(t *testing.T) {
	none := math.Inf(-1)
	today := math.Log10(13.7915010e9) // of matter and a constant: mpmath, see the age in cosmology.csv
	for _, c := range []struct {
		law     law.Law
		values  map[string]float64
		x, date float64
		want    float64
		bent    float64
	}{
		{expansion.LambdaCDM(), map[string]float64{"radiation": 1e-4}, 5, 11, math.Log10(1 - 0.3111 - 1e-4), 0},
		{expansion.WCDM(), map[string]float64{"w": -1}, 50, 11, math.Log10(0.6889), 0},
		{expansion.WCDM(), map[string]float64{"w": -0.7}, math.Ln10, 11, math.Log10(0.6889) - 0.9, 0},
		{expansion.Phantom(), nil, math.Ln10, 11, math.Log10(0.6889) + 1.5, 0},
		{expansion.DecayingDarkEnergy(), nil, 0, today - 0.1, math.Log10(0.6889), 0},
		{expansion.DecayingDarkEnergy(), nil, 0, math.Log10(13.791501e9 + 1e11), math.Log10(0.6889 / 2), 0},
		{expansion.DecayingDarkEnergy(), map[string]float64{"half_life": 10}, 0, math.Log10(13.791501e9 + 1e11), math.Log10(0.6889 / 1024), 0},
		{expansion.DecayingDarkEnergy(), nil, 0, 400, none, 0},
		{expansion.MatterOnly(), nil, 3, 11, none, 0},
		{expansion.Open(), map[string]float64{"radiation": 1e-4}, 3, 11, none, 0.7 - 1e-4},
	} {
		dark, curvature := ask(t, c.law, c.values, c.x, c.date)
		name := c.law.Describe().Name
		if dark[0] != c.want && !(math.Abs(dark[0]-c.want) < 1e-7) {
			t.Errorf("%s: log10_dark = %v at ln a = %v, date 10^%v yr, want %v", name, dark[0], c.x, c.date, c.want)
		}
		if !math.IsInf(dark[1], -1) {
			t.Errorf("%s: after the decay began: log10_dark = %v", name, dark[1])
		}
		for _, b := range curvature {
			if math.Abs(b-c.bent) > 1e-15 {
				t.Errorf("%s: curvature %v, want %v", name, b, c.bent)
			}
		}
	}
}
