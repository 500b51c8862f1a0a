//go:build !amd64 || purego

package engine

// Without kernels everything is left to the loops.

func countRatesLanes(*countRates, int) (done int) { return 0 }

func steadyLanes(x, _, _, _, _ []float64, _ *steadyNumbers) (done, next int) { return 0, len(x) }

func aloneLanes(*alone, int) (done int) { return 0 }
