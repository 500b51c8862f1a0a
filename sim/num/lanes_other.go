//go:build !amd64 || purego

package num

// Without kernels a whole column is left to the scalar functions.

func expColumn(_, src []float64) (done, next int)   { return 0, len(src) }
func exp10Column(_, src []float64) (done, next int) { return 0, len(src) }
func logColumn(_, src []float64) (done, next int)   { return 0, len(src) }
func log10Column(_, src []float64) (done, next int) { return 0, len(src) }

func withinBlocks(_ []float64, _, _ float64) (done int) { return 0 }
