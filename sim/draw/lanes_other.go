//go:build !amd64 || purego

package draw

// Without kernels a whole column is left to the scalar functions.

func uniformBlocks([]float64, uint64, uint64) (done int)     { return 0 }
func exponentialBlocks([]float64, uint64, uint64) (done int) { return 0 }
