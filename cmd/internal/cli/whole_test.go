package cli

import "testing"

// Numbers as people write them; the largest is 2^64 - 1.
func TestWhole(t *testing.T) {
	for text, want := range map[string]uint64{
		"0": 0, "7": 7, "1e5": 100_000, "1E5": 100_000, "100_000": 100_000, "2.5e3": 2500, " 12 ": 12, "+3.0": 3, "1e19": 1e19,
		"18446744073709551615": 1<<64 - 1,
	} {
		got, err := (&wholeNumber{text}).within(0, 1<<64-1)
		if err != nil || got != want {
			t.Errorf("%q: got %d, %v, want %d", text, got, err, want)
		}
	}
	for _, text := range []string{
		"", "x", "-1", "1.5", "1e-5", "1e-999999999", "1e999999999", "NaN", "inf", "0x10", "1/2", "18446744073709551616", "1e5 yr",
	} {
		got, err := (&wholeNumber{text}).within(0, 1<<64-1)
		if err == nil || err.Error() != text+": want a whole number, 0 .. 18446744073709551615" {
			t.Errorf("%q: got %d, %v", text, got, err)
		}
	}
	if _, err := (&wholeNumber{"9"}).within(1, 8); err == nil || err.Error() != "9: want a whole number, 1 .. 8" {
		t.Errorf("9 in 1 .. 8: %v", err)
	}
}
