package cli

import (
	"fmt"
	"math"
	"strconv"
	"strings"

	"github.com/spf13/cobra"

	"wane/sim/scenario/quantity"
	"wane/sim/sky"
)

// skyDate is log10 of years since the Big Bang; NaN is today, which only a sky
// can tell.
type skyDate float64

const (
	lastSkyDate = 1e300 // what a sky can be asked about, log10 of years
	mostDates   = 100_000
)

func (d skyDate) on(s *sky.Sky) float64 {
	if math.IsNaN(float64(d)) {
		return s.Now()
	}
	return float64(d)
}

// usualDates are shown when none are given.
func usualDates() []skyDate {
	return []skyDate{9, skyDate(math.NaN()), 11, 12, 13, 14, 20, 40, 100, 1000}
}

// dates reads --at and --grid.
func (f *skyFlags) dates(c *cobra.Command) (dates []skyDate, faults []error) {
	for _, list := range f.at {
		for text := range strings.SplitSeq(list, ",") {
			d, err := readSkyDate(strings.TrimSpace(text))
			if err != nil {
				faults = append(faults, fmt.Errorf("--at %w", err))
			}
			dates = append(dates, d)
		}
	}
	if c.Flags().Changed("grid") {
		grid, err := readGrid(f.grid)
		if err != nil {
			faults = append(faults, fmt.Errorf("--grid %w", err))
		}
		dates = append(dates, grid...)
	}
	if len(dates) == 0 {
		dates = usualDates()
	}
	return dates, faults
}

func readSkyDate(text string) (skyDate, error) {
	switch strings.ToLower(text) {
	case "today", "now":
		return skyDate(math.NaN()), nil
	case "":
		return 0, fmt.Errorf(`%q: want dates such as 1e10yr,13.8Gyr,10^1500yr, or today`, text)
	}
	l, err := quantity.ParseFor(text, "yr", true)
	switch {
	case err != nil:
		return 0, err
	case !(l >= 0 && l <= lastSkyDate):
		return 0, fmt.Errorf("%q: want 1 .. 10^(1e300) yr", text)
	}
	return skyDate(l), nil
}

// readGrid reads from:to:count, both ends included.
func readGrid(text string) ([]skyDate, error) {
	const wanted = "want from:to:count, log10 of years, such as 9:14:51"
	parts := strings.Split(text, ":")
	if len(parts) != 3 {
		return nil, fmt.Errorf("%q: %s", text, wanted)
	}
	var ends [2]float64
	for i := range ends {
		v, err := strconv.ParseFloat(strings.TrimSpace(parts[i]), 64)
		if err != nil {
			return nil, fmt.Errorf("%q: %q is no number: %s", text, parts[i], wanted)
		}
		if !(v >= 0 && v <= lastSkyDate) {
			return nil, fmt.Errorf("%q: %s: want log10 of years, 0 .. 1e300", text, parts[i])
		}
		ends[i] = v
	}
	count := wholeNumber{parts[2]}
	n, err := count.within(2, mostDates)
	if err != nil {
		return nil, fmt.Errorf("%q: count %w", text, err)
	}
	if !(ends[0] < ends[1]) {
		return nil, fmt.Errorf("%q: want from < to", text)
	}
	dates := make([]skyDate, n)
	for i := range dates {
		u := float64(i) / float64(n-1)
		dates[i] = skyDate(ends[0]*(1-u) + ends[1]*u)
	}
	return dates, nil
}
