package engine

// groupSize is how many are summed up into one at each level.
const groupSize = 64

// soughtTree holds how much one clock seeks each bound object, with sums over
// groups of objects, groups of groups and so on, so that one change and one pick
// cost little however many objects there are.
type soughtTree struct {
	levels [][]float64 // the first by object
}

// resize makes room for n objects. What the levels hold is arbitrary.
func (x *soughtTree) resize(n int) {
	at := 0
	for {
		if at == len(x.levels) {
			x.levels = append(x.levels, nil)
		}
		x.levels[at] = grown(x.levels[at], n)
		at++
		if n <= groupSize {
			break
		}
		n = (n + groupSize - 1) / groupSize
	}
	x.levels = x.levels[:at]
}

// build sums up what the first level holds.
func (x *soughtTree) build() {
	for l := 1; l < len(x.levels); l++ {
		below := x.levels[l-1]
		for g := range x.levels[l] {
			sum := 0.0
			for _, v := range below[g*groupSize : min((g+1)*groupSize, len(below))] {
				sum += v
			}
			x.levels[l][g] = sum
		}
	}
}

// set changes how much object i is sought.
func (x *soughtTree) set(i uint32, weight float64) {
	by := weight - x.levels[0][i]
	if by == 0 {
		return
	}
	x.levels[0][i] = weight
	for _, level := range x.levels[1:] {
		i /= groupSize
		level[i] += by
	}
}

// of is how much object i is sought.
func (x *soughtTree) of(i uint32) float64 { return x.levels[0][i] }

// total is how much all are sought together.
func (x *soughtTree) total() float64 {
	sum := 0.0
	for _, v := range x.levels[len(x.levels)-1] {
		sum += v
	}
	return sum
}

// pick finds the object at which the running total reaches a part of it. ok is
// false where rounding leads to none.
func (x *soughtTree) pick(part float64) (i uint32, ok bool) {
	at, to := 0, len(x.levels[len(x.levels)-1])
	for l := len(x.levels) - 1; l >= 0; l-- {
		level := x.levels[l]
		for at < to && level[at] < part {
			part -= level[at]
			at++
		}
		if at == to {
			return 0, false
		}
		if l > 0 {
			at *= groupSize
			to = min(at+groupSize, len(x.levels[l-1]))
		}
	}
	return uint32(at), x.levels[0][at] > 0
}
