package law

// Arena lends columns to the answers of one asker and takes them all back at
// Reset, so that asking allocates nothing once it has run for a while. It is
// for one goroutine. The zero value is ready.
type Arena struct {
	values      []float64
	words       []uint8
	columns     []Column
	usedValues  int
	usedWords   int
	usedColumns int
}

// With returns b with its answer columns lent by a.
func (b Batch) With(a *Arena) Batch { b.arena = a; return b }

// Values lends n numbers of arbitrary content.
func (a *Arena) Values(n int) []float64 {
	if a.usedValues+n > len(a.values) {
		a.values = make([]float64, max(2*len(a.values), 8*n))
		a.usedValues = 0
	}
	v := a.values[a.usedValues : a.usedValues+n : a.usedValues+n]
	a.usedValues += n
	return v
}

// Words lends n codes of arbitrary content.
func (a *Arena) Words(n int) []uint8 {
	if a.usedWords+n > len(a.words) {
		a.words = make([]uint8, max(2*len(a.words), 8*n))
		a.usedWords = 0
	}
	w := a.words[a.usedWords : a.usedWords+n : a.usedWords+n]
	a.usedWords += n
	return w
}

// keep lends a list of columns with the given ones in it.
func (a *Arena) keep(columns []Column) []Column {
	n := len(columns)
	if a.usedColumns+n > len(a.columns) {
		a.columns = make([]Column, max(2*len(a.columns), 8*n))
		a.usedColumns = 0
	}
	c := a.columns[a.usedColumns : a.usedColumns+n : a.usedColumns+n]
	a.usedColumns += n
	copy(c, columns)
	return c
}

// Reset takes back everything lent so far.
func (a *Arena) Reset() { a.usedValues, a.usedWords, a.usedColumns = 0, 0, 0 }
