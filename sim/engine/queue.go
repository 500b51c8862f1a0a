package engine

import (
	"math"
	"math/bits"
)

// queue is an ordered list of readings or dates: a run sorted once, and a heap
// for what arrives late.
type queue struct {
	keys []float64
	ids  []uint32
	pos  int
	late []entry
}

// sorter is the scratch of sorting, one for all queues of a worker.
type sorter struct {
	keys   []float64
	ids    []uint32
	counts [3][radixSize]uint32
}

type entry struct {
	key float64
	id  uint32
}

func (q *queue) reset() {
	q.keys, q.ids, q.late, q.pos = q.keys[:0], q.ids[:0], q.late[:0], 0
}

// put adds an entry before sort.
func (q *queue) put(key float64, id uint32) {
	q.keys, q.ids = append(q.keys, key), append(q.ids, id)
}

// push adds an entry after sort.
func (q *queue) push(key float64, id uint32) {
	q.late = append(q.late, entry{key, id})
	i := len(q.late) - 1
	for i > 0 {
		p := (i - 1) / 4
		if !less(q.late[i], q.late[p]) {
			break
		}
		q.late[i], q.late[p] = q.late[p], q.late[i]
		i = p
	}
}

// less orders by key, then id: equal dates go by object.
func less(a, b entry) bool { return a.key < b.key || a.key == b.key && a.id < b.id }

// head returns the first entry; ok is false when there is none.
func (q *queue) head() (e entry, ok bool) {
	e.key = math.Inf(1)
	if q.pos < len(q.keys) {
		e, ok = entry{q.keys[q.pos], q.ids[q.pos]}, true
	}
	if len(q.late) > 0 && (!ok || less(q.late[0], e)) {
		return q.late[0], true
	}
	return e, ok
}

// pop drops the first entry.
func (q *queue) pop() {
	if q.pos < len(q.keys) && (len(q.late) == 0 || less(entry{q.keys[q.pos], q.ids[q.pos]}, q.late[0])) {
		q.pos++
		return
	}
	n := len(q.late) - 1
	last := q.late[n]
	q.late = q.late[:n]
	if n == 0 {
		return
	}
	i := 0
	for {
		c := 4*i + 1
		if c >= n {
			break
		}
		best := c
		for j := c + 1; j < min(c+4, n); j++ {
			if less(q.late[j], q.late[best]) {
				best = j
			}
		}
		if !less(q.late[best], last) {
			break
		}
		q.late[i] = q.late[best]
		i = best
	}
	q.late[i] = last
}

// Radix sort: two passes over the leading bits of what differs between the
// keys, three for long lists, then insertion on the whole key, then on the id.
// The prefix leaves few keys together: it has many more values than there are
// keys.
const (
	radixBits = 12
	radixSize = 1 << radixBits
	longList  = 1 << 20
)

// sort orders what was put. Equal keys keep the order of their ids if they
// were put in it.
func (q *queue) sort(scratch *sorter) {
	n := len(q.keys)
	q.pos = 0
	if n < 64 {
		insertion(q.keys, q.ids)
		return
	}
	scratch.keys, scratch.ids = grown(scratch.keys, n), grown(scratch.ids, n)
	low, high := uint64(math.MaxUint64), uint64(0)
	for _, k := range q.keys {
		b := math.Float64bits(k)
		if b < low {
			low = b
		}
		if b > high {
			high = b
		}
	}
	passes := 2
	if n > longList {
		passes = 3
	}
	shift := uint(max(0, bits.Len64(high-low)-passes*radixBits))
	counts := &scratch.counts
	clear(counts[:passes])
	for _, k := range q.keys {
		b := (math.Float64bits(k) - low) >> shift
		for pass := range passes {
			counts[pass][b>>(pass*radixBits)&(radixSize-1)]++
		}
	}
	src, dst, srcID, dstID := q.keys, scratch.keys[:n], q.ids, scratch.ids[:n]
	for pass := range passes {
		c := &counts[pass]
		sum, one := uint32(0), false
		for i := range c {
			one = one || c[i] == uint32(n)
			c[i], sum = sum, sum+c[i]
		}
		if one {
			continue
		}
		at := shift + uint(pass*radixBits)
		for i, k := range src {
			b := (math.Float64bits(k) - low) >> at & (radixSize - 1)
			p := c[b]
			c[b]++
			dst[p], dstID[p] = k, srcID[i]
		}
		src, dst, srcID, dstID = dst, src, dstID, srcID
	}
	q.keys, scratch.keys, q.ids, scratch.ids = src, dst, srcID, dstID
	insertion(q.keys, q.ids)
}

// insertion repairs what the prefix left unordered.
func insertion(keys []float64, ids []uint32) {
	for i := 1; i < len(keys); i++ {
		k, id := keys[i], ids[i]
		j := i
		for j > 0 && (keys[j-1] > k || keys[j-1] == k && ids[j-1] > id) {
			keys[j], ids[j] = keys[j-1], ids[j-1]
			j--
		}
		keys[j], ids[j] = k, id
	}
}
