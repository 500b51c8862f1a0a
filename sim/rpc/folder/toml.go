package folder

import (
	"bytes"
	"errors"
	"fmt"
	"strings"
	"unicode/utf8"

	"github.com/pelletier/go-toml/v2/unstable"
)

// position is a line and a column.
type position struct{ line, column int }

// entry is the value of a key: texts, one or a list of them.
type entry struct {
	at    position
	list  bool
	texts []string
	where []position // of each text
}

// reader reads a law.toml, which is flat: keys with a text or a list of texts.
type reader struct {
	file    string
	data    []byte
	entries map[string]entry
	inTable bool // after the header of a table, which it should not have
	faults  Faults
}

// keys are those of a law.toml.
var keys = []string{"name", "start", "files", "build"}

// read parses the file. After a syntax error it goes on with the next line,
// so that one slip does not hide the others.
func read(file string, data []byte) (map[string]entry, Faults) {
	r := &reader{file: file, data: bytes.TrimPrefix(data, []byte("\xef\xbb\xbf")), entries: map[string]entry{}}
	if i := notText(r.data); i >= 0 {
		r.fault(r.position(i), "the file is no text: it holds the byte 0x%02x", r.data[i])
		return nil, r.faults
	}
	sound := r.parse()
	if _, ok := r.entries["start"]; !ok && sound {
		r.fault(position{1, 1}, `start is not given: want what starts the law, such as start = ["/usr/bin/python3", "law.py"]`)
	}
	return r.entries, r.faults
}

// notText is the place of the first byte that no text holds, or -1.
func notText(data []byte) int {
	for i := 0; i < len(data); {
		c, n := utf8.DecodeRune(data[i:])
		if (c == utf8.RuneError && n == 1) || (c < ' ' && c != '\n' && c != '\r' && c != '\t') || c == 0x7f {
			return i
		}
		i += n
	}
	return -1
}

func (r *reader) fault(at position, format string, a ...any) {
	r.faults = append(r.faults, Fault{r.file, at.line, at.column, fmt.Sprintf(format, a...)})
}

func (r *reader) position(offset int) position {
	before := r.data[:offset]
	line := bytes.LastIndexByte(before, '\n') + 1
	return position{bytes.Count(before, []byte("\n")) + 1, utf8.RuneCount(before[line:]) + 1}
}

// parse tells whether the file has no syntax errors.
func (r *reader) parse() bool {
	var p unstable.Parser
	sound := true
	for start := 0; start < len(r.data); {
		// The full slice expression keeps offsets: the parser tells them apart
		// by capacity.
		part := r.data[start:len(r.data):len(r.data)]
		p.Reset(part)
		for p.NextExpression() {
			r.expression(start, p.Expression())
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
		r.fault(r.position(at), "%s", strings.TrimSpace(err.Error()))
		sound = false
		next := bytes.IndexByte(r.data[at:], '\n')
		if next < 0 {
			break
		}
		start = at + next + 1
	}
	return sound
}

func (r *reader) expression(start int, e *unstable.Node) {
	if e.Kind != unstable.Table && e.Kind != unstable.ArrayTable && e.Kind != unstable.KeyValue {
		return
	}
	var names []string
	at := position{}
	for it := e.Key(); it.Next(); {
		n := it.Node()
		if len(names) == 0 {
			at = r.position(start + int(n.Raw.Offset))
		}
		names = append(names, string(n.Data))
	}
	name := strings.Join(names, ".")
	_, twice := r.entries[name]
	switch {
	case e.Kind != unstable.KeyValue:
		r.inTable = true
		r.fault(at, "unknown table %q: a law.toml has none (known keys: %s)", name, strings.Join(keys, ", "))
	case r.inTable:
	case !known(name):
		r.fault(at, "unknown key %q (known: %s)", name, strings.Join(keys, ", "))
	case twice:
		r.fault(at, "key %q is given twice", name)
	default:
		r.entries[name] = r.value(name, start, at, e.Value())
	}
}

func known(name string) bool {
	for _, k := range keys {
		if k == name {
			return true
		}
	}
	return false
}

// value reads a text or a list of texts, as the key wants it.
func (r *reader) value(name string, start int, key position, v *unstable.Node) entry {
	at := func(n *unstable.Node) position {
		if n.Raw.Length == 0 {
			return key
		}
		return r.position(start + int(n.Raw.Offset))
	}
	e := entry{at: key, list: v.Kind == unstable.Array}
	want := `a list of texts, such as ["/usr/bin/python3", "law.py"]`
	if name == "name" {
		want = `a text, such as "evaporation/my-burden"`
	}
	if e.list == (name == "name") || !e.list && v.Kind != unstable.String {
		r.fault(at(v), "%s: want %s", name, want)
		return e
	}
	if !e.list {
		e.texts, e.where = []string{string(v.Data)}, []position{at(v)}
		return e
	}
	for it := v.Children(); it.Next(); {
		n := it.Node()
		switch {
		case n.Kind == unstable.Comment:
		case n.Kind != unstable.String:
			r.fault(at(n), "%s: want %s", name, want)
		case len(n.Data) == 0:
			r.fault(at(n), "%s: an empty text", name)
		default:
			e.texts, e.where = append(e.texts, string(n.Data)), append(e.where, at(n))
		}
	}
	if len(e.texts) == 0 {
		r.fault(key, "%s: an empty list: want %s", name, want)
	}
	return e
}
