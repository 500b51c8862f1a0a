package engine

// groupSize is how many are summed up into one at each level.
const groupSize = 64

// soughtTree holds how much each clock of encounters seeks each bound object,
// with sums over groups of objects, groups of groups and so on, so that one
// change and one pick cost little however many objects there are. What belongs
// to one object or group lies side by side, a column a clock.
type soughtTree struct {
	columns int
	levels  [][]float64 // the first by object
}

// resize makes room for n objects. What the levels hold is arbitrary.
func (x *soughtTree) resize(n, columns int) {
	x.columns = columns
	at := 0
	for {
		if at == len(x.levels) {
			x.levels = append(x.levels, nil)
		}
		x.levels[at] = grown(x.levels[at], n*columns)
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
		below, level := x.levels[l-1], x.levels[l]
		clear(level)
		group := groupSize * x.columns
		for g := 0; g < len(level); g += x.columns {
			sums := level[g : g+x.columns]
			from := g * groupSize
			for i, v := range below[from:min(from+group, len(below))] {
				sums[i%x.columns] += v
			}
		}
	}
}

// set changes how much object i is sought by the clock of a column.
func (x *soughtTree) set(i uint32, column int, weight float64) {
	leaf := &x.levels[0][int(i)*x.columns+column]
	by := weight - *leaf
	if by == 0 {
		return
	}
	*leaf = weight
	for _, level := range x.levels[1:] {
		i /= groupSize
		level[int(i)*x.columns+column] += by
	}
}

// of is how much object i is sought by the clock of a column.
func (x *soughtTree) of(i uint32, column int) float64 { return x.levels[0][int(i)*x.columns+column] }

// drop takes object i out.
func (x *soughtTree) drop(i uint32) {
	if len(x.levels) == 0 {
		return
	}
	n := x.columns
	leaf := x.levels[0][int(i)*n : int(i)*n+n]
	for _, level := range x.levels[1:] {
		i /= groupSize
		sums := level[int(i)*n : int(i)*n+n]
		for c, v := range leaf {
			sums[c] -= v
		}
	}
	clear(leaf)
}

// total is how much all are sought together by the clock of a column.
func (x *soughtTree) total(column int) float64 {
	sum := 0.0
	top := x.levels[len(x.levels)-1]
	for i := column; i < len(top); i += x.columns {
		sum += top[i]
	}
	return sum
}

// pick finds the object at which the running total of a column reaches a part of
// it. ok is false where rounding leads to none.
func (x *soughtTree) pick(column int, part float64) (i uint32, ok bool) {
	at, to := 0, len(x.levels[len(x.levels)-1])/x.columns
	for l := len(x.levels) - 1; l >= 0; l-- {
		level := x.levels[l]
		for at < to && level[at*x.columns+column] < part {
			part -= level[at*x.columns+column]
			at++
		}
		if at == to {
			return 0, false
		}
		if l > 0 {
			at *= groupSize
			to = min(at+groupSize, len(x.levels[l-1])/x.columns)
		}
	}
	return uint32(at), x.levels[0][at*x.columns+column] > 0
}
