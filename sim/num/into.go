package num

// Exp10Into sets dst[i] to Exp10(src[i]), bit for bit.
func Exp10Into(dst, src []float64) {
	for i, x := range src {
		dst[i] = Exp10(x)
	}
}
