package law

import (
	"fmt"
	"strings"
)

// Object puts a row into words, for messages: its columns and values.
func (b Batch) Object(row int) string {
	s := ""
	for _, c := range b.Columns {
		if s != "" {
			s += ", "
		}
		switch {
		case c.Words == nil:
			s += fmt.Sprintf("%s %.6g", c.Name, c.Values[row])
			if unit := unitOf(c.Name); unit != "" {
				s += " " + unit
			}
		default:
			s += wordOf(b, c.Name, c.Words[row])
		}
	}
	return s
}

// unitOf is the unit of a column of whatever question.
func unitOf(column string) string {
	for _, question := range []string{"", "meet", "rate"} {
		if info, ok := ColumnNamed(question, column); ok {
			return info.Unit
		}
	}
	return ""
}

func wordOf(b Batch, column string, code uint8) string {
	list := b.Kinds
	switch {
	case strings.HasPrefix(column, "place"):
		list = PlaceWords
	case strings.HasPrefix(column, "origin"):
		list = OriginWords
	case strings.HasPrefix(column, "composition"):
		list = CompositionWords
	}
	if int(code) < len(list) {
		return list[code]
	}
	return fmt.Sprintf("%s %d", column, code)
}
