//go:build !purego

package num

import "golang.org/x/sys/cpu"

// lanes is how many elements of a column the kernels in assembly take at once.
// They perform the operations of the scalar functions, in their order and
// rounded as they are, so both give the same bits. The build tag purego leaves
// them out.
const lanes = 8

// expNumbers is what Exp and Exp10 differ in, in the order of exp_amd64.s.
type expNumbers struct {
	steps, high, low   float64 // of expReduce
	c1, c2, c3, c4, c5 float64 // of expSeries; r times 1 is r
	greatest           float64 // results of smaller arguments are normal
	over, under        float64 // beyond these the result is +Inf or 0
}

var expBase = expNumbers{
	steps: stepsPerE, high: stepHigh, low: stepLow,
	c1: 1, c2: 0.5, c3: 1.0 / 6, c4: 1.0 / 24, c5: 1.0 / 120,
	greatest: expGreatest, over: expOver, under: expUnder,
}

var exp10Base = expNumbers{
	steps: stepsPerTen, high: step10High, low: step10Low,
	c1: tenC1, c2: tenC2, c3: tenC3, c4: tenC4, c5: tenC5,
	greatest: exp10Greatest, over: exp10Over, under: exp10Under,
}

// logNumbers is what Log and Log10 compute with, in the order of log_amd64.s.
type logNumbers struct {
	least, normal, offset, exponent, upper, index uint64
	c0, c2, c3, c4, c5, c6, c7                    float64 // of logSeries
	twoHigh, twoLow                               float64 // log 2
	high, low, unit                               float64 // log e; high is 0 to the base e itself
	turn, turnOther                               [lanes]uint64
}

var logBase, log10Base = logNumbersOf(lnTwoHigh, lnTwoLow, 0, 0, 1), logNumbersOf(log10TwoHigh, log10TwoLow, tenHigh, tenLow, ten)

func logNumbersOf(twoHigh, twoLow, high, low, unit float64) logNumbers {
	return logNumbers{
		least: leastBits, normal: normalBits, offset: logOffset, exponent: 0xfff << 52, upper: highMask, index: 127 << 5,
		c0: 1, c2: -1.0 / 2, c3: 1.0 / 3, c4: -1.0 / 4, c5: 1.0 / 5, c6: -1.0 / 6, c7: 1.0 / 7,
		twoHigh: twoHigh, twoLow: twoLow, high: high, low: low, unit: unit,
		turn: [lanes]uint64{0, 1, 8, 9, 4, 5, 12, 13}, turnOther: [lanes]uint64{2, 3, 10, 11, 6, 7, 14, 15},
	}
}

// expLanes sets dst to the exponentials of src, in blocks of lanes elements,
// up to the first block with an element it leaves to the scalar function: a
// result near overflow or underflow, or NaN. It returns how many are done.
//
//go:noescape
func expLanes(dst, src []float64, table *[128]expEntry, c *expNumbers) (done int)

// logLanes sets dst to logarithms of src as expLanes does; it leaves what is
// subnormal, negative or NaN.
//
//go:noescape
func logLanes(dst, src []float64, table *[128]logEntry, c *logNumbers) (done int)

// withinLanes returns how many elements, in whole blocks, are all from low to high.
//
//go:noescape
func withinLanes(values []float64, low, high float64) (done int)

// haveLanes reports whether this processor has the instructions of the kernels.
func haveLanes() bool { return cpu.X86.HasAVX512F && cpu.X86.HasAVX512DQ }

// The functions below do as much of a column as the kernels can and return
// the range that is left to the scalar function before the next try.

func expColumn(dst, src []float64) (done, next int) {
	if !haveLanes() {
		return 0, len(src)
	}
	done = expLanes(dst, src, &expTable, &expBase)
	return done, min(done+lanes, len(src))
}

func exp10Column(dst, src []float64) (done, next int) {
	if !haveLanes() {
		return 0, len(src)
	}
	done = expLanes(dst, src, &expTable, &exp10Base)
	return done, min(done+lanes, len(src))
}

func logColumn(dst, src []float64) (done, next int) {
	if !haveLanes() {
		return 0, len(src)
	}
	done = logLanes(dst, src, &logTable, &logBase)
	return done, min(done+lanes, len(src))
}

func log10Column(dst, src []float64) (done, next int) {
	if !haveLanes() {
		return 0, len(src)
	}
	done = logLanes(dst, src, &log10Table, &log10Base)
	return done, min(done+lanes, len(src))
}

// withinBlocks returns how many elements at the front are known to be within.
func withinBlocks(values []float64, low, high float64) (done int) {
	if !haveLanes() {
		return 0
	}
	return withinLanes(values, low, high)
}
