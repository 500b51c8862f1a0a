package lawtest

import (
	"fmt"
	"math"
	"slices"

	"wane/sim/law"
)

// differ tells where two batches differ in a bit; it is empty when they do not.
func differ(a, b law.Batch) string {
	if a.Rows != b.Rows || len(a.Columns) != len(b.Columns) {
		return fmt.Sprintf("%d rows of %d columns, then %d of %d", a.Rows, len(a.Columns), b.Rows, len(b.Columns))
	}
	for i := range a.Columns {
		x, y := a.Columns[i], b.Columns[i]
		if x.Name != y.Name || len(x.Values) != len(y.Values) || len(x.Words) != len(y.Words) {
			return fmt.Sprintf("column %s of %d, then %s of %d", x.Name, len(x.Values)+len(x.Words), y.Name, len(y.Values)+len(y.Words))
		}
		for row := range x.Values {
			if math.Float64bits(x.Values[row]) != math.Float64bits(y.Values[row]) {
				return fmt.Sprintf("row %d: %s %v, then %v", row, x.Name, x.Values[row], y.Values[row])
			}
		}
		for row := range x.Words {
			if x.Words[row] != y.Words[row] {
				return fmt.Sprintf("row %d: %s code %d, then %d", row, x.Name, x.Words[row], y.Words[row])
			}
		}
	}
	return ""
}

// reordered tells whether two answers hold the same values, each column in
// whatever order.
func reordered(a, b law.Batch) bool {
	if len(a.Columns) != len(b.Columns) {
		return false
	}
	for i := range a.Columns {
		x, y := a.Columns[i], b.Columns[i]
		if !slices.Equal(sortedBits(x), sortedBits(y)) {
			return false
		}
	}
	return true
}

func sortedBits(c law.Column) []uint64 {
	out := make([]uint64, 0, len(c.Values)+len(c.Words))
	for _, v := range c.Values {
		out = append(out, math.Float64bits(v))
	}
	for _, w := range c.Words {
		out = append(out, uint64(w))
	}
	slices.Sort(out)
	return out
}

// pick makes a batch of some rows of another, in the given order.
func pick(b law.Batch, rows []int) law.Batch {
	out := law.Batch{Rows: len(rows)}
	for _, c := range b.Columns {
		to := law.Column{Name: c.Name}
		if c.Words != nil {
			to.Words = make([]uint8, len(rows))
			for i, row := range rows {
				to.Words[i] = c.Words[row]
			}
		} else {
			to.Values = make([]float64, len(rows))
			for i, row := range rows {
				to.Values[i] = c.Values[row]
			}
		}
		out.Columns = append(out.Columns, to)
	}
	return out
}

// appended puts b's rows after a's.
func appended(a, b law.Batch) law.Batch {
	if a.Rows == 0 && a.Columns == nil {
		return pick(b, upTo(0, b.Rows))
	}
	out := law.Batch{Rows: a.Rows + b.Rows}
	for i, c := range a.Columns {
		c.Values = append(c.Values, b.Columns[i].Values...)
		c.Words = append(c.Words, b.Columns[i].Words...)
		out.Columns = append(out.Columns, c)
	}
	return out
}

// upTo lists low .. high-1.
func upTo(low, high int) []int {
	out := make([]int, 0, high-low)
	for i := low; i < high; i++ {
		out = append(out, i)
	}
	return out
}
