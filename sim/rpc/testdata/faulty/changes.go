package main

import (
	"math"
	"slices"
	"strconv"

	"wane/sim/law"
)

// changes are faults of the numbers themselves.
var changes = map[string]func(f *faulty, n int, in, out law.Batch){
	// value:COLUMN:NUMBER:ROW, the row of the first answer that has the column;
	// and wherever the same is asked, for that is another fault.
	"value": func(f *faulty, _ int, in, out law.Batch) {
		v, err := strconv.ParseFloat(f.more[1], 64)
		if err != nil {
			panic(err)
		}
		values := out.Values(f.more[0])
		f.mu.Lock()
		if f.bad == "" && f.number(2) < len(values) {
			f.bad = in.Object(f.number(2))
		}
		bad := f.bad
		f.mu.Unlock()
		for i := range values {
			if in.Object(i) == bad {
				values[i] = v
			}
		}
	},
	// scale:COLUMN:FACTOR
	"scale": func(f *faulty, _ int, _, out law.Batch) {
		by, err := strconv.ParseFloat(f.more[1], 64)
		if err != nil {
			panic(err)
		}
		values := out.Values(f.more[0])
		for i := range values {
			values[i] *= by
		}
	},
	"word": func(f *faulty, _ int, _, out law.Batch) {
		codes := out.Words(f.more[0])
		for i := range codes {
			codes[i] = 77
		}
	},
	"falls": func(f *faulty, _ int, _, out law.Batch) { // from 10 on
		values := out.Values(f.more[0])
		for i, v := range values {
			if v > 10 {
				values[i] = 20 - v
			}
		}
	},
	// An answer that hangs on the rows before.
	"by-order": func(f *faulty, _ int, _, out law.Batch) {
		values := out.Columns[0].Values
		for i := range values {
			values[i] += 1e-9 * math.Abs(values[i]) * float64(i)
		}
	},
	// An answer that hangs on how often it was asked.
	"by-count": func(f *faulty, n int, _, out law.Batch) {
		values := out.Columns[0].Values
		for i := range values {
			values[i] += 1e-9 * math.Abs(values[i]) * float64(n)
		}
	},
}

func mirrored(in law.Batch) law.Batch {
	in.Columns = slices.Clone(in.Columns)
	for i, c := range in.Columns {
		if c.Name != "u" {
			continue
		}
		u := make([]float64, len(c.Values))
		for j, v := range c.Values {
			u[j] = 1 - v
		}
		in.Columns[i].Values = u
	}
	return in
}
