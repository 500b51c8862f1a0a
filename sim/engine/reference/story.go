package reference

import "wane/sim/law"

func (c Cause) String() string {
	if c.Process == "" {
		return ""
	}
	return c.Process + ":" + c.Outcome
}

// span is a time through which an object's state does not change.
type span struct {
	kind, place, origin uint8
	from, to            float64 // log10 dates
	entered             float64 // log10 date from which its age counts
	s                   *stage
	life, at            int
	cause               Cause // of its end
}

func (g *run) word(kind, place, origin uint8) string {
	return g.setup.Set.Kinds[kind] + "/" + law.PlaceWords[place] + "/" + law.OriginWords[origin]
}

// record writes down that an object has changed to what it now is, or gone.
func (g *run) record(o *object, date float64, gone bool, cause Cause) {
	c := Change{Date: date, Cause: cause.String()}
	if n := len(o.spans); n > 0 && o.spans[n-1].to == never {
		last := &o.spans[n-1]
		last.to, last.cause = date, cause
		c.From = g.word(last.kind, last.place, last.origin)
	}
	if !gone {
		s := o.now()
		c.To = g.word(s.kind, o.place, o.origin)
		o.spans = append(o.spans, span{s.kind, o.place, o.origin, date, never, s.from, &o.stages[o.at], o.life, o.at, Cause{}})
	}
	o.changes = append(o.changes, c)
}

func (g *run) isTurning(c Cause) bool {
	p, _ := law.ProcessNamed(c.Process)
	return p.Role == law.Turning
}
