package sky

import (
	"fmt"
	"math"

	"wane/sim/law"
	"wane/sim/num"
	"wane/sim/physics/cosmology"
)

var (
	inf  = math.Inf(1)
	zero = math.Inf(-1) // log10 of zero
)

// expansion asks the law of process expansion, and adds up the densities.
type expansion struct {
	use               *law.Use
	logH0             float64 // log10 of H0 in 1/yr
	lnMatter, lnOther float64 // ln Om, ln Or
	logT0             float64 // log10 of the relic temperature today, K
	in                law.Batch
	arena             law.Arena
}

func newExpansion(u *law.Use) (*expansion, error) {
	var v [4]float64
	for i, name := range law.SkyParameters {
		value, ok := u.Parameter(name)
		if !ok {
			return nil, fmt.Errorf("sky: law %s: no parameter %q", u.ID(), name)
		}
		v[i] = value
	}
	if !(v[0] > 0 && v[1] >= 0 && v[2] >= 0 && v[1]+v[2] > 0 && v[3] >= 0) {
		return nil, fmt.Errorf("sky: law %s: hubble %v km/s/Mpc, matter %v, radiation %v, temperature %v K: "+
			"want hubble > 0, the others >= 0, and matter or radiation", u.ID(), v[0], v[1], v[2], v[3])
	}
	e := &expansion{use: u, logH0: cosmology.LogHubbleRate(v[0]), lnMatter: num.Log(v[1]), lnOther: num.Log(v[2]), logT0: num.Log10(v[3])}
	for _, q := range u.Card.Questions {
		if q.Name != "density" {
			continue
		}
		for _, name := range q.Inputs {
			switch name {
			case "ln_a", "log10_date", "log10_since":
				e.in.Columns = append(e.in.Columns, law.Numbers(name, nil))
			default:
				return nil, fmt.Errorf("sky: law %s: question density reads %s: want ln_a, log10_date or log10_since", u.ID(), name)
			}
		}
	}
	return e, nil
}

// reads tells whether the law's answer may depend on the column.
func (e *expansion) reads(column string) bool {
	for _, c := range e.in.Columns {
		if c.Name == column {
			return true
		}
	}
	return false
}

// where is a point in the history of space.
type where struct{ x, date, since float64 }

// density is what the law says of a point, and the rate that follows.
type density struct {
	logH float64 // log10 of H in 1/yr
	// share of H^2 and ln of the density over today's critical one.
	matter, radiation, curvature, dark float64
	lnDark                             float64
}

// at answers for every point, in one batch.
func (e *expansion) at(points []where, out []density) error {
	e.arena.Reset()
	in := e.in.With(&e.arena)
	in.Rows = len(points)
	for i := range in.Columns {
		v := e.arena.Values(len(points))
		for j, p := range points {
			switch in.Columns[i].Name {
			case "ln_a":
				v[j] = p.x
			case "log10_date":
				v[j] = p.date
			default:
				v[j] = p.since
			}
		}
		in.Columns[i].Values = v
	}
	answer, err := e.use.Ask("density", in)
	if err != nil {
		return fmt.Errorf("sky: %w", err)
	}
	dark, curvature := answer.Columns[0].Values, answer.Columns[1].Values
	for i, p := range points {
		if out[i], err = e.add(p, dark[i]*num.Ln10, curvature[i]); err != nil {
			return err
		}
	}
	return nil
}

// add forms H^2 from the densities, in logarithms.
func (e *expansion) add(p where, lnDark, curvature float64) (density, error) {
	matter, radiation, bent := e.lnMatter-3*p.x, e.lnOther-4*p.x, num.Log(math.Abs(curvature))-2*p.x
	top := math.Max(math.Max(matter, radiation), math.Max(bent, lnDark))
	if top == zero {
		return density{logH: zero, lnDark: lnDark}, nil
	}
	d := density{lnDark: lnDark}
	d.matter, d.radiation = num.Exp(matter-top), num.Exp(radiation-top)
	d.curvature, d.dark = math.Copysign(num.Exp(bent-top), curvature), num.Exp(lnDark-top)
	sum := d.matter + d.radiation + d.curvature + d.dark
	if !(sum > 0) {
		return d, fmt.Errorf("sky: law %s: space stops expanding at ln a = %.6g, date 10^%.6g yr: a sky that falls back is not supported",
			e.use.ID(), p.x, p.date)
	}
	d.logH = e.logH0 + 0.5*(top+num.Log(sum))/num.Ln10
	d.matter, d.radiation, d.curvature, d.dark = d.matter/sum, d.radiation/sum, d.curvature/sum, d.dark/sum
	return d, nil
}
