package law

// Law is one model of one process.
type Law interface {
	// Describe returns the law's card. It must return the same card every time.
	Describe() Card

	// Answer answers one question of the card for every row of in. The answer
	// has in.Rows rows and the columns that [Card.Outputs] lists, in that
	// order. An error means the law cannot answer at all; a row it has nothing
	// to say about is answered with "never" or zero, not with an error.
	Answer(question string, in Batch) (Batch, error)
}

// Batcher is a law that wants to be asked about many rows at a time, since each
// question costs it much beside the rows, as in another process.
type Batcher interface {
	Law
	// Rows is how many rows it wants at a time, from 1 on. It may get fewer.
	Rows() int
}

// Distant is a turning law whose waits are all long, whatever the object and
// the parameters: the host need not ask it about what is gone before.
type Distant interface {
	Law
	// Soonest is log10 of years: no wait that the law foretells is shorter.
	Soonest() float64
}

// Outside is what a law tells besides when it is not part of the program. Its
// faults are then reported with both.
type Outside interface {
	Label() string // what the person called it: "./my-burden"
	Log() string   // the last it wrote about itself; may be empty
}

// Batch is a table of rows in columns. A law reads the columns its card
// declares for the question, in that order, and never writes to them.
type Batch struct {
	Rows    int
	Columns []Column

	// Parameters holds the law's parameters in the order of its card. A word
	// parameter is the index of the word; a parameter marked Log10 is the
	// log10 of the quantity in the parameter's unit.
	Parameters []float64

	// Kinds is the word list that the codes of a kind column index: the
	// standard kinds first, then any that the laws of the run add.
	Kinds []string

	arena *Arena
}

// Column is one named column: numbers, or codes into a word list.
type Column struct {
	Name   string
	Values []float64
	Words  []uint8
}

// NoWord in a column of words means "none", such as the kind of a survivor
// that does not exist.
const NoWord = 255

// Values returns the numbers of the named column, or nil when there is none.
func (b Batch) Values(name string) []float64 {
	for i := range b.Columns {
		if b.Columns[i].Name == name {
			return b.Columns[i].Values
		}
	}
	return nil
}

// Words returns the codes of the named column, or nil when there is none.
func (b Batch) Words(name string) []uint8 {
	for i := range b.Columns {
		if b.Columns[i].Name == name {
			return b.Columns[i].Words
		}
	}
	return nil
}

// Kind returns the code of a kind in this batch's word list, NoWord if absent.
func (b Batch) Kind(word string) uint8 {
	for i, k := range b.Kinds {
		if k == word {
			return uint8(i)
		}
	}
	return NoWord
}

// NewValues returns a column of b.Rows numbers for an answer to b. Its
// contents are arbitrary: the law sets every row. The host may lend memory
// that it takes back once the answer is read.
func (b Batch) NewValues() []float64 {
	if b.arena != nil {
		return b.arena.Values(b.Rows)
	}
	return make([]float64, b.Rows)
}

// NewWords is NewValues for a column of words.
func (b Batch) NewWords() []uint8 {
	if b.arena != nil {
		return b.arena.Words(b.Rows)
	}
	return make([]uint8, b.Rows)
}

// Answer builds the answer to b from columns made by NewValues or NewWords.
func (b Batch) Answer(columns ...Column) Batch {
	if b.arena != nil {
		return Batch{Rows: b.Rows, Columns: b.arena.keep(columns)}
	}
	return Batch{Rows: b.Rows, Columns: append([]Column(nil), columns...)}
}

// Numbers names a column of numbers.
func Numbers(name string, values []float64) Column { return Column{Name: name, Values: values} }

// Codes names a column of words.
func Codes(name string, words []uint8) Column { return Column{Name: name, Words: words} }
