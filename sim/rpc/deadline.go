package rpc

import (
	"math/bits"
	"slices"
	"sync"
	"time"
)

// durations remembers how long the latest answers took, by the size of their
// batches (in powers of two).
type durations struct {
	mu   sync.Mutex
	last [bits.UintSize + 1][]time.Duration
	next [bits.UintSize + 1]int
}

const remembered = 31

func (d *durations) note(rows int, took time.Duration) {
	d.mu.Lock()
	defer d.mu.Unlock()
	size := bits.Len(uint(rows))
	if len(d.last[size]) < remembered {
		d.last[size] = append(d.last[size], took)
		return
	}
	d.last[size][d.next[size]] = took
	d.next[size] = (d.next[size] + 1) % remembered
}

// median is 0 before the first answer of this size.
func (d *durations) median(rows int) time.Duration {
	d.mu.Lock()
	var last [remembered]time.Duration
	n := copy(last[:], d.last[bits.Len(uint(rows))])
	d.mu.Unlock()
	if n == 0 {
		return 0
	}
	slices.Sort(last[:n])
	return last[n/2]
}
