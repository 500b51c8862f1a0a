package scenario

import (
	"bytes"
	"errors"
	"fmt"
	"strings"
	"unicode/utf8"

	"github.com/pelletier/go-toml/v2/unstable"
)

// maxSyntaxFaults is after how many syntax errors the rest of a file is not
// worth reading.
const maxSyntaxFaults = 10

// document builds the tree of one file. After a syntax error it goes on with
// the next line, so that one slip does not hide the others.
type document struct {
	*report
	file string
	data []byte
	root *node
	open *node // the table that keys now go to; nil after a faulty header

	offset, line, column int // the last place asked for
}

// parse reads a whole document. The second result is false when the file is
// no text, holds nothing or has syntax errors: then it may give more than what
// was read, and nothing should be called missing.
func parse(r *report, file string, data []byte) (*node, bool) {
	d := &document{report: r, file: file, data: bytes.TrimPrefix(data, []byte("\xef\xbb\xbf"))}
	d.root = newTable(d.place(0))
	if !d.isText() {
		return d.root, false
	}
	d.open = d.root
	before := len(r.faults)
	sound := d.read()
	if len(d.root.names) == 0 && len(r.faults) == before {
		d.fault(d.place(0), `the file is empty: want a scenario, at the least base = "lantern-reach"`)
		return d.root, false
	}
	return d.root, sound
}

// isText reports the first byte that no text holds.
func (d *document) isText() bool {
	if bytes.HasPrefix(d.data, []byte("\xff\xfe")) || bytes.HasPrefix(d.data, []byte("\xfe\xff")) {
		d.fault(d.place(0), "the file is UTF-16 text: save it as UTF-8")
		return false
	}
	for i := 0; i < len(d.data); {
		c, n := utf8.DecodeRune(d.data[i:])
		if (c == utf8.RuneError && n == 1) || (c < ' ' && c != '\n' && c != '\r' && c != '\t') || c == 0x7f {
			d.fault(d.place(i), "the file is no text: it holds the byte 0x%02x", d.data[i])
			return false
		}
		i += n
	}
	return true
}

// place is the line and column of an offset, columns in characters. It counts
// on from the last place asked for, since places are mostly asked in order.
func (d *document) place(offset int) place {
	if d.line == 0 || offset < d.offset {
		d.offset, d.line, d.column = 0, 1, 1
	}
	for part := d.data[d.offset:offset]; ; {
		i := bytes.IndexByte(part, '\n')
		if i < 0 {
			d.column += utf8.RuneCount(part)
			break
		}
		part = part[i+1:]
		d.line, d.column = d.line+1, 1
	}
	d.offset = offset
	return place{d.file, d.line, d.column}
}

// read tells whether the file has no syntax errors.
func (d *document) read() bool {
	var p unstable.Parser
	faults := 0
	for start := 0; start < len(d.data); {
		// The full slice expression keeps offsets: the parser tells them
		// apart by capacity.
		part := d.data[start:len(d.data):len(d.data)]
		p.Reset(part)
		for p.NextExpression() {
			d.expression(start, p.Expression())
		}
		err := p.Error()
		if err == nil {
			break
		}
		at := start
		var pe *unstable.ParserError
		if errors.As(err, &pe) && pe.Highlight != nil {
			at = start + min(max(cap(part)-cap(pe.Highlight), 0), len(part))
		}
		d.fault(d.place(at), "%s", strings.TrimSpace(err.Error()))
		if faults++; faults == maxSyntaxFaults {
			d.fault(d.place(at), "too many syntax errors: the rest of the file is not read")
			break
		}
		line := bytes.LastIndexByte(d.data[:at], '\n') + 1
		if bytes.HasPrefix(bytes.TrimSpace(d.data[line:at]), []byte("[")) || at < len(d.data) && d.data[at] == '[' {
			d.open = nil
		}
		next := bytes.IndexByte(d.data[at:], '\n')
		if next < 0 {
			break
		}
		start = at + next + 1
	}
	return faults == 0
}

func (d *document) expression(start int, e *unstable.Node) {
	switch e.Kind {
	case unstable.Table:
		d.open = d.header(start, e)
	case unstable.ArrayTable:
		names, at := d.keys(e.Key(), start)
		d.fault(at[0], "[[%s]] is a list of tables: want one table, [%s]", strings.Join(names, "."), strings.Join(names, "."))
		d.open = nil
	case unstable.KeyValue:
		if d.open != nil {
			d.keyValue(d.open, start, e)
		}
	}
}

func (d *document) keys(it unstable.Iterator, start int) (names []string, at []place) {
	for it.Next() {
		n := it.Node()
		names = append(names, string(n.Data))
		at = append(at, d.place(start+int(n.Raw.Offset)))
	}
	return names, at
}

// header opens the table of a [header].
func (d *document) header(start int, e *unstable.Node) *node {
	names, at := d.keys(e.Key(), start)
	t := d.descend(d.root, names, at)
	if t == nil {
		return nil
	}
	if t.closed {
		d.fault(at[0], "table [%s] is given twice (first in line %d)", strings.Join(names, "."), t.key.line)
	}
	t.closed = true
	return t
}

// descend follows names from a table, making tables on the way.
func (d *document) descend(t *node, names []string, at []place) *node {
	for i, name := range names {
		child := t.field(name)
		switch {
		case child == nil:
			child = newTable(at[i])
			t.add(name, child)
		case child.form != aTable:
			d.fault(at[i], "%q is no table: it is given as %s in line %d", strings.Join(names[:i+1], "."), child.form, child.key.line)
			return nil
		}
		t = child
	}
	return t
}

func (d *document) keyValue(t *node, start int, e *unstable.Node) {
	names, at := d.keys(e.Key(), start)
	last := len(names) - 1
	if t = d.descend(t, names[:last], at[:last]); t == nil {
		return
	}
	if old := t.field(names[last]); old != nil {
		d.fault(at[last], "key %q is given twice (first in line %d)", names[last], old.key.line)
		return
	}
	t.add(names[last], d.value(e.Value(), start, at[last]))
}

// value turns a parsed value into a node. Nested tables and lists recurse as
// deep as the parser allows.
func (d *document) value(v *unstable.Node, start int, key place) *node {
	n := &node{key: key, at: key, text: string(v.Data)}
	if v.Raw.Length > 0 {
		n.at = d.place(start + int(v.Raw.Offset))
	}
	switch v.Kind {
	case unstable.String:
		n.form = aText
	case unstable.Bool:
		n.form = aFlag
	case unstable.Integer, unstable.Float:
		n.form = aNumber
	case unstable.Array:
		n.form = aList
		for it := v.Children(); it.Next(); {
			n.items = append(n.items, d.value(it.Node(), start, n.at))
		}
	case unstable.InlineTable:
		n.form, n.closed, n.fields = aTable, true, map[string]*node{}
		for it := v.Children(); it.Next(); {
			d.keyValue(n, start, it.Node())
		}
	default:
		n.form = aDate
	}
	return n
}

// sizeText is a number of bytes for a message.
func sizeText(n int64) string {
	if n >= 1e6 {
		return fmt.Sprintf("%.4g MB", float64(n)/1e6)
	}
	return fmt.Sprintf("%d bytes", n)
}
