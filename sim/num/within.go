package num

// AllWithin reports whether low ≤ v ≤ high for every value v; no NaN is.
func AllWithin(values []float64, low, high float64) bool {
	for _, v := range values[withinBlocks(values, low, high):] {
		if !(v >= low && v <= high) {
			return false
		}
	}
	return true
}
