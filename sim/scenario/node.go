package scenario

import "strconv"

// form is what a value is in the file.
type form uint8

const (
	aTable form = iota
	aText
	aNumber
	aFlag
	aList
	aDate
	aLoose // from the command line: a text that may be meant as a number
)

func (f form) String() string {
	return [...]string{"a table", "a text", "a number", "true or false", "a list", "a date", "a text"}[f]
}

// node is a value of a document, with where it stands.
type node struct {
	form   form
	at     place // of the value
	key    place // of the key it belongs to
	text   string
	items  []*node          // of a list
	names  []string         // of a table, in the order of the file
	fields map[string]*node // of a table
	closed bool             // an inline table, or a table with its own header
}

func newTable(at place) *node {
	return &node{form: aTable, at: at, key: at, fields: map[string]*node{}}
}

func (n *node) add(name string, child *node) {
	n.names = append(n.names, name)
	n.fields[name] = child
}

// field returns the child of that name, or nil.
func (n *node) field(name string) *node {
	if n == nil {
		return nil
	}
	return n.fields[name]
}

// written is the value as it may stand in a message.
func (n *node) written() string {
	switch n.form {
	case aTable, aList:
		return n.form.String()
	case aText, aLoose:
		return strconv.Quote(cut(n.text))
	}
	return n.text
}
