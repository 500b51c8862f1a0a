package sky

import (
	"math"

	"wane/sim/law"
)

// Where the date of an ending is looked for, and how many dates an ending is
// asked about at once.
const (
	firstDate = -12
	lastDate  = 1e300
	asked     = 64
)

// date returns the date at which an ending's cumulative hazard reaches
// 10^logHazard under this sky; +Inf if it never does.
func (s *Sky) date(u *law.Use, logHazard float64) (float64, error) {
	// From firstDate on in steps, then ever faster: the first batch finds the
	// stretch, the following ones divide it.
	dates := make([]float64, 0, 600)
	for l := float64(firstDate); l < lastDate; {
		dates = append(dates, l)
		l += math.Max(1, 0.25*l)
	}
	dates = append(dates, lastDate)
	for {
		i, err := s.firstReached(u, dates, logHazard)
		if err != nil {
			return 0, err
		}
		if i == len(dates) {
			return inf, nil
		}
		if i == 0 {
			return dates[0], nil
		}
		low, high := dates[i-1], dates[i]
		dates = dates[:0]
		for k := 0; k <= asked; k++ {
			l := low + (high-low)*float64(k)/asked
			if len(dates) == 0 || l > dates[len(dates)-1] {
				dates = append(dates, l)
			}
		}
		if len(dates) <= 2 {
			return high, nil
		}
	}
}

// firstReached returns the first of the ascending dates by which the hazard
// is reached; len(dates) if none.
func (s *Sky) firstReached(u *law.Use, dates []float64, logHazard float64) (int, error) {
	in := law.Batch{Rows: len(dates)}
	for _, q := range u.Card.Questions {
		if q.Name != "end" {
			continue
		}
		for _, name := range q.Inputs {
			v := dates
			if name == "log10_four_volume" {
				v = make([]float64, len(dates))
				for i, l := range dates {
					v[i] = s.LogFourVolume(l)
				}
			}
			in.Columns = append(in.Columns, law.Numbers(name, v))
		}
	}
	out, err := u.Ask("end", in)
	if err != nil {
		return 0, err
	}
	if err := u.Rises("end", in, out); err != nil {
		return 0, err
	}
	hazard := out.Columns[0].Values
	for i := range hazard {
		if hazard[i] >= logHazard {
			return i, nil
		}
	}
	return len(dates), nil
}
