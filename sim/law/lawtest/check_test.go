package lawtest

import (
	"errors"
	"math"
	"slices"
	"strings"
	"sync/atomic"
	"testing"

	"wane/sim/law"
	"wane/sim/num"
)

// good are laws without a fault, by a name for each.
func good() map[string]fake {
	return map[string]fake{
		"shine": shine(), "births": births(), "endless": endless(), "remnants": remnants(), "holes": holes(),
		"matter": matter(), "turning": turning(), "throwing": throwing(), "collapse": collapse(), "lives": lives(),
	}
}

func TestFaultlessLawsPass(t *testing.T) {
	for name, l := range good() {
		t.Run(name, func(t *testing.T) {
			Run(t, l)
			Run(t, l, Among(collapse()))
		})
	}
}

// A parameter that works only once another is off its preset is no idle one.
func TestParameterBesideAnother(t *testing.T) {
	l := births()
	l.card.Parameters = append(l.card.Parameters, number("more", 0, 0, 1), number("steepness", 1, 2, 3))
	l.answer = onlyNumbers("mass", []string{"u"}, func(p, x []float64) float64 {
		return p[0] * num.Exp(7*x[0]+p[1]*num.Pow(x[0], p[2]))
	})
	Run(t, l)
}

// changed spoils every number of an answer column.
func changed(column string, f func(in law.Batch, row int, v float64) float64) func(string, law.Batch, law.Batch) law.Batch {
	return func(_ string, in, out law.Batch) law.Batch {
		for row, v := range out.Values(column) {
			out.Values(column)[row] = f(in, row, v)
		}
		return out
	}
}

// recarded changes the card alone.
func recarded(f fake, change func(*law.Card)) law.Law {
	change(&f.card)
	return f
}

// forgetful gives another card each time.
type forgetful struct {
	fake
	asked *atomic.Int64
}

func (f forgetful) Describe() law.Card {
	c := f.card
	if f.asked.Add(1)%2 == 0 {
		c.Version = "2"
	}
	return c
}

// TestFindsFaults feeds the kit laws with one fault each. It must find the
// fault under the name it has, and nothing that isn't its consequence.
func TestFindsFaults(t *testing.T) {
	for _, x := range []struct {
		name string
		law  func() law.Law
		want string
		also string // other checks that the same fault may trip
	}{
		{"a card without a source", func() law.Law { return recarded(shine(), func(c *law.Card) { c.Sources = nil }) }, "card", ""},
		{"a card without a domain", func() law.Law { return recarded(shine(), func(c *law.Card) { c.Domain = "" }) }, "card", ""},
		{"an unknown process", func() law.Law { return recarded(shine(), func(c *law.Card) { c.Process = "weather" }) }, "card", ""},
		{"two cards", func() law.Law { return forgetful{shine(), new(atomic.Int64)} }, "describe", ""},
		{"an error", func() law.Law {
			return fake{shine().card, func(string, law.Batch) (law.Batch, error) { return law.Batch{}, errors.New("no") }}
		}, "answer", "domain parameter"},
		{"a panic", func() law.Law {
			return fake{shine().card, func(string, law.Batch) (law.Batch, error) { panic("no") }}
		}, "answer", "domain parameter"},
		{"chances that miss 1", func() law.Law {
			return remnants().spoilt(changed("chance_white_dwarf", func(_ law.Batch, _ int, v float64) float64 { return 0.99 * v }))
		}, "chances", ""},
		{"years that are no logarithms", func() law.Law {
			return lives().spoilt(changed("wait", func(_ law.Batch, _ int, v float64) float64 { return num.Exp10(v) }))
		}, "size", ""},
		{"seconds for years", func() law.Law {
			return lives().spoilt(changed("wait", func(_ law.Batch, _ int, v float64) float64 { return v + 7.4991 }))
		}, "size", ""},
		{"rows that come back in another order", func() law.Law {
			return shine().spoilt(func(_ string, _, out law.Batch) law.Batch {
				slices.Sort(out.Columns[0].Values)
				return out
			})
		}, "order", "monotone rows"},
		{"a remnant heavier than its star", func() law.Law {
			return remnants().spoilt(func(q string, in, out law.Batch) law.Batch {
				if q == "remain" {
					return changed("mass", func(in law.Batch, row int, v float64) float64 { return in.Values("mass")[row] + v })(q, in, out)
				}
				return out
			})
		}, "answer", "domain"},
		{"afraid of no rows", func() law.Law {
			return shine().spoilt(func(_ string, in, out law.Batch) law.Batch { _ = in.Values("mass")[0]; return out })
		}, "shapes", ""},
		{"no columns for no rows", func() law.Law {
			return shine().spoilt(func(_ string, in, out law.Batch) law.Batch {
				if in.Rows == 0 {
					return law.Batch{}
				}
				return out
			})
		}, "shapes", ""},
		{"too many rows for it", func() law.Law {
			return shine().spoilt(func(_ string, in, out law.Batch) law.Batch {
				if in.Rows > 4096 {
					out.Columns[0].Values = out.Columns[0].Values[:4096]
				}
				return out
			})
		}, "shapes", ""},
		{"a memory of earlier batches", func() law.Law {
			n := new(atomic.Int64)
			return shine().spoilt(changed("log10_temperature", func(_ law.Batch, _ int, v float64) float64 { return v + 1e-9*float64(n.Add(1)) }))
		}, "pure", "rows unset monotone parameter"},
		{"a memory of other questions", func() law.Law {
			last := new(atomic.Uint64)
			return remnants().spoilt(func(q string, in, out law.Batch) law.Batch {
				if in.Rows > 0 && q == "die" {
					last.Store(math.Float64bits(in.Values("mass")[in.Rows-1]))
				} else if q == "remain" {
					for i := range out.Columns[0].Values {
						out.Columns[0].Values[i] *= 1 - 1e-6*min(1, math.Float64frombits(last.Load()))
					}
				}
				return out
			})
		}, "pure", ""},
		{"memory lent to two at a time", func() law.Law {
			kept := make([]float64, 1<<16)
			turn := new(atomic.Int64)
			return shine().spoilt(func(_ string, in, out law.Batch) law.Batch {
				// Each second answer is lent the memory of the first.
				if in.Rows == 100 && turn.Add(1)%2 == 0 {
					kept[0] = out.Columns[0].Values[0] + 1
					out.Columns[0].Values[0] = kept[0]
				}
				return out
			})
		}, "pure", "unset"},
		{"writes to what it reads", func() law.Law {
			return shine().spoilt(func(_ string, in, out law.Batch) law.Batch {
				for i, m := range in.Values("mass") {
					in.Values("mass")[i] = min(m, 1)
				}
				return out
			})
		}, "input", "rows unset pure"},
		{"rows left unset", func() law.Law {
			return fake{shine().card, func(q string, in law.Batch) (law.Batch, error) {
				out, err := shine().answer(q, in)
				lent := in.NewValues()
				for i, m := range in.Values("mass") {
					if m < 0.3 || m > 1.2 {
						continue
					}
					lent[i] = out.Columns[0].Values[i]
				}
				return in.Answer(law.Numbers("log10_temperature", lent)), err
			}}
		}, "unset", "monotone"},
		{"rows that look at their neighbours", func() law.Law {
			return shine().spoilt(changed("log10_temperature", func(in law.Batch, row int, v float64) float64 {
				return v + 1e-12*in.Values("mass")[(row+1)%in.Rows]
			}))
		}, "rows", "monotone"},
		{"rows that know their place", func() law.Law {
			return shine().spoilt(changed("log10_temperature", func(_ law.Batch, row int, v float64) float64 {
				if row%128 == 127 {
					return math.Nextafter(v, 9)
				}
				return v
			}))
		}, "rows", ""},
		{"rows that know the batch", func() law.Law {
			return shine().spoilt(changed("log10_temperature", func(in law.Batch, _ int, v float64) float64 {
				if in.Rows == 2000 {
					return v + 1e-9
				}
				return v
			}))
		}, "rows", ""},
		{"no answer at birth", func() law.Law {
			return shine().spoilt(changed("log10_temperature", func(in law.Batch, row int, v float64) float64 {
				if a := in.Values("log10_age")[row]; math.IsInf(a, -1) {
					return v + a - a
				}
				return v
			}))
		}, "domain", "monotone"},
		{"no answer at the edge of the draw", func() law.Law {
			return turning().spoilt(changed("wait", func(in law.Batch, row int, v float64) float64 {
				if in.Values("u")[row] > 1-1e-15 {
					return math.Inf(-1)
				}
				return v
			}))
		}, "domain", "monotone"},
		{"no answer for the tiny", func() law.Law {
			return holes().spoilt(func(q string, in, out law.Batch) law.Batch {
				if q == "wear" {
					return changed("log10_rate", func(in law.Batch, row int, v float64) float64 {
						m := in.Values("mass")[row]
						return v + 2*num.Log10(m) + num.Log10(1/(m*m)) // 1/m^2 overflows
					})(q, in, out)
				}
				return out
			})
		}, "domain", ""},
		{"no answer at a parameter's end", func() law.Law {
			f := shine()
			good := f.answer
			f.answer = func(q string, in law.Batch) (law.Batch, error) {
				out, err := good(q, in)
				if in.Parameters[0] == 0.5 && in.Rows > 0 {
					out.Columns[0].Values[0] = math.NaN()
				}
				return out, err
			}
			return f
		}, "domain", ""},
		{"a rate that ends with the last object", func() law.Law {
			return throwing().spoilt(changed("log10_rate_throw", func(in law.Batch, row int, v float64) float64 {
				return v - num.Log10(max(0, in.Values("number")[row]-1))
			}))
		}, "domain", "answer"},
		{"masses that fall", func() law.Law {
			return births().spoilt(changed("mass", func(in law.Batch, _ int, v float64) float64 { return 100 / v }))
		}, "monotone", ""},
		{"masses that dip at the edge", func() law.Law {
			return births().spoilt(changed("mass", func(in law.Batch, row int, v float64) float64 {
				if in.Values("u")[row] > 1-1e-12 {
					return v / 2
				}
				return v
			}))
		}, "monotone", ""},
		{"remnants that fall", func() law.Law {
			return remnants().spoilt(func(q string, in, out law.Batch) law.Batch {
				if q == "remain" {
					return changed("mass", func(in law.Batch, row int, v float64) float64 {
						return in.Values("mass")[row]*(1+0.2*in.Parameters[0]) - 2*v*0.5
					})(q, in, out)
				}
				return out
			})
		}, "monotone", "domain"},
		{"dwarfs that warm up", func() law.Law {
			return shine().spoilt(changed("log10_temperature", func(in law.Batch, row int, v float64) float64 {
				if a := in.Values("log10_age")[row]; a > 9.3 && a < 9.4 {
					return v + 0.1
				}
				return v
			}))
		}, "monotone", ""},
		{"a hazard that falls", func() law.Law {
			return endless().spoilt(changed("log10_hazard", func(in law.Batch, row int, v float64) float64 {
				if in.Values("log10_date")[row] > 150 {
					return v - 10
				}
				return v
			}))
		}, "monotone", ""},
		{"waits that go both ways", func() law.Law {
			return turning().spoilt(changed("wait", func(in law.Batch, row int, v float64) float64 {
				return 1500 + math.Abs(in.Values("u")[row]-0.5)
			}))
		}, "monotone", ""},
		{"a wait that its wear does not bear out", func() law.Law {
			return holes().spoilt(changed("wait", func(_ law.Batch, _ int, v float64) float64 { return v + 1e-6 }))
		}, "foretell", ""},
		{"a wait to the wrong threshold", func() law.Law {
			f := matter()
			f.answer = wearing("nucleon-decay", 1, f.card.Thresholds[1:]...).answer
			return f
		}, "foretell", ""},
		{"a wait that forgets a jump of the rate", func() law.Law {
			return holes().spoilt(func(q string, in, out law.Batch) law.Batch {
				if q == "wear" {
					return changed("log10_rate", func(in law.Batch, row int, v float64) float64 {
						if in.Values("mass")[row] < 1 {
							return v + 0.3
						}
						return v
					})(q, in, out)
				}
				return out
			})
		}, "foretell", ""},
		{"a wait of what never wears", func() law.Law {
			return holes().spoilt(changed("log10_rate", func(law.Batch, int, float64) float64 { return math.Inf(-1) }))
		}, "foretell", ""},
		{"an idle parameter", func() law.Law {
			return recarded(shine(), func(c *law.Card) { c.Parameters = append(c.Parameters, number("idle", 0, 1, 2)) })
		}, "parameter", ""},
		{"a parameter without a range", func() law.Law {
			return recarded(shine(), func(c *law.Card) { c.Parameters[0] = number("slope", 0.35, 0.35, 0.35) })
		}, "parameter", ""},
	} {
		t.Run(x.name, func(t *testing.T) {
			var found []string
			findings := Check(x.law())
			for _, f := range findings {
				found = append(found, f.Check)
				if f.Check != x.want && !slices.Contains(strings.Fields(x.also), f.Check) {
					t.Errorf("also found %s", f)
				}
			}
			if !slices.Contains(found, x.want) {
				t.Errorf("want a finding of check %q, got %v", x.want, findings)
			}
		})
	}
}
