package law

import (
	"fmt"
	"math"
)

// riseSlack is how much, relatively, rounding may turn back what must not fall.
const riseSlack = 1e-12

// Rises returns a [Fault] if a quantile falls as its draw rises, or a hazard
// falls in time, from one row of an answered batch to the next. The rows of a
// hazard must follow one another in time; those of a quantile have any order.
// It looks at quantiles that hang on their draw alone, and only at those of
// outside laws: others are held to it by their tests.
func (u *Use) Rises(question string, in, out Batch) error {
	values := out.Columns[0].Values
	row, want := -1, "a hazard that never falls"
	switch question {
	case "end":
		for i := 1; i < len(values) && row < 0; i++ {
			if falls(values[i-1], values[i]) {
				row = i
			}
		}
	case "mass", "birth", "metals":
		want = "a quantile, which never falls as u rises"
		if _, outside := u.Law.(Outside); outside && len(in.Columns) == 1 && in.Columns[0].Name == "u" {
			row = turned(in.Columns[0].Values, values)
		}
	}
	if row < 0 {
		return nil
	}
	return u.Signed(u.rowFault(question, out.Columns[0].Name, row, in,
		fmt.Sprintf("%v, and %v in row %d (%s)", values[row], values[row-1], row-1, in.Object(row-1)), want))
}

// turned returns the first row whose value lies on the other side of the value
// before it than its draw lies of the draw before it, or -1.
func turned(u, values []float64) int {
	u = u[:len(values)]
	for i := 1; i < len(values); i++ {
		if (u[i]-u[i-1])*(values[i]-values[i-1]) >= 0 {
			continue
		}
		before, after := values[i-1], values[i]
		if u[i] < u[i-1] {
			before, after = after, before
		}
		if falls(before, after) {
			return i
		}
	}
	return -1
}

// falls tells whether a value falls by more than rounding does.
func falls(before, after float64) bool {
	if !(after < before) {
		return false
	}
	return math.IsInf(before, 0) || math.IsInf(after, 0) || before-after > riseSlack*max(1, math.Abs(before))
}
