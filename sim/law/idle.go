package law

import "math"

// idle is a law that never does anything.
type idle struct{ card Card }

// NewIdle returns the law "none" of a process: to every question of the card
// it answers that nothing happens. A wait is never, what is given as a
// logarithm (a rate, a hazard, a temperature) is that of zero, the rest is
// zero. It sets Idle on the card.
func NewIdle(card Card) Law {
	card.Idle = true
	return idle{card}
}

func (l idle) Describe() Card { return l.card }

func (l idle) Answer(question string, in Batch) (Batch, error) {
	var columns []Column
	for _, o := range outputsOf(l.card, question) {
		nothing := 0.0
		switch o.rule {
		case wait:
			nothing = math.Inf(1)
		case logZero, hazard:
			nothing = math.Inf(-1)
		}
		values := in.NewValues()
		for i := range values {
			values[i] = nothing
		}
		columns = append(columns, Numbers(o.name, values))
	}
	return in.Answer(columns...), nil
}
