package law

import (
	"fmt"
	"strings"
)

// massSlack is by how much, relatively, masses may fail to add up.
const massSlack = 1e-12

// checkMass finds a row in which an object's end has more mass than the object
// had: only a meeting's survivors may be heavier than either, and then not
// heavier than both.
func (u *Use) checkMass(question string, in, out Batch) *Fault {
	var before, after []string
	switch {
	case question == "remain":
		before, after = []string{"mass"}, []string{"mass"}
	case question == "foretell" && u.role == Turning:
		before, after = []string{"mass"}, []string{"mass", "gas"}
	case question == "meet":
		before, after = []string{"mass_1", "mass_2"}, []string{"mass_1", "mass_2", "gas"}
	default:
		return nil
	}
	had, has := columnsNamed(in, before), columnsNamed(out, after)
	if had == nil {
		return nil // the law does not read the mass
	}
	var limits, masses sums
	for from := 0; from < in.Rows; from += len(limits) {
		to := min(from+len(limits), in.Rows)
		limit := limits.of(had, from, to)
		for i, mass := range masses.of(has, from, to) {
			if !(mass <= limit[i]*(1+massSlack)) {
				return u.rowFault(question, strings.Join(after, " + "), from+i, in,
					fmt.Sprintf("%v solMass", mass), fmt.Sprintf("no more than the %v solMass there was", limit[i]))
			}
		}
	}
	return nil
}

// columnsNamed returns columns of numbers, or nil when one is not there.
func columnsNamed(b Batch, names []string) [][]float64 {
	out := make([][]float64, len(names))
	for i, name := range names {
		if out[i] = b.Values(name); out[i] == nil {
			return nil
		}
	}
	return out
}

// sums are the sums of some columns, for a few rows at a time.
type sums [256]float64

// of returns the sums of rows from .. to-1. They are to be read only.
func (s *sums) of(columns [][]float64, from, to int) []float64 {
	if len(columns) == 1 {
		return columns[0][from:to]
	}
	part := s[:to-from]
	copy(part, columns[0][from:to])
	for _, c := range columns[1:] {
		for i, v := range c[from:to] {
			part[i] += v
		}
	}
	return part
}
