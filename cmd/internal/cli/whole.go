package cli

import (
	"fmt"
	"math/big"
	"strconv"
	"strings"
)

// wholeNumber is a flag for a whole number, kept as it was written: what is wrong
// with it is said together with the faults of other flags.
type wholeNumber struct{ text string }

// Set keeps the text.
func (w *wholeNumber) Set(text string) error {
	w.text = text
	return nil
}

func (w *wholeNumber) String() string { return w.text }

// Type is what help calls the value.
func (*wholeNumber) Type() string { return "number" }

// within reads the number, low <= number <= high; it may be written as 1e5 or
// 100_000, as in a scenario.
func (w *wholeNumber) within(low, high uint64) (uint64, error) {
	v, ok := wholeOf(strings.ReplaceAll(strings.TrimSpace(w.text), "_", ""))
	if !ok || v < low || v > high {
		return 0, fmt.Errorf("%s: want a whole number, %d .. %d", w.text, low, high)
	}
	return v, nil
}

func wholeOf(text string) (uint64, bool) {
	if v, err := strconv.ParseUint(text, 10, 64); err == nil {
		return v, true
	}
	f, err := strconv.ParseFloat(text, 64)
	if err != nil || !(f >= 1 && f < 1e20) || strings.ContainsAny(text, "xX") {
		return 0, false
	}
	exact, ok := new(big.Rat).SetString(text) // short, since f is
	if !ok || !exact.IsInt() || !exact.Num().IsUint64() {
		return 0, false
	}
	return exact.Num().Uint64(), true
}
