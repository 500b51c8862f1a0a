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
	for row := range in.Rows {
		limit, mass := rowSum(had, row), rowSum(has, row)
		if !(mass <= limit*(1+massSlack)) {
			return u.rowFault(question, strings.Join(after, " + "), row, in,
				fmt.Sprintf("%v solMass", mass), fmt.Sprintf("no more than the %v solMass there was", limit))
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

func rowSum(columns [][]float64, row int) float64 {
	sum := 0.0
	for _, c := range columns {
		sum += c[row]
	}
	return sum
}
