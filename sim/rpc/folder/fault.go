package folder

import (
	"fmt"
	"sort"
	"strings"
)

// Fault is one thing wrong with a law's folder. File is named as the person
// named the folder; without a line the fault concerns the whole of it. Lines
// and columns count from 1, columns in characters.
type Fault struct {
	File         string
	Line, Column int
	Message      string
}

func (f Fault) Error() string {
	if f.Line == 0 {
		return f.File + ": " + f.Message
	}
	return fmt.Sprintf("%s:%d:%d: %s", f.File, f.Line, f.Column, f.Message)
}

// Faults is everything wrong with a law's folder, one a line.
type Faults []Fault

func (f Faults) Error() string {
	lines := make([]string, len(f))
	for i := range f {
		lines[i] = f[i].Error()
	}
	return strings.Join(lines, "\n")
}

// sorted orders faults as they stand in the file.
func (f Faults) sorted() Faults {
	sort.SliceStable(f, func(i, j int) bool {
		a, b := f[i], f[j]
		return a.Line < b.Line || a.Line == b.Line && a.Column < b.Column
	})
	return f
}

// one is the fault of a path that is no law.
func one(path, format string, a ...any) error {
	return Faults{{File: path, Message: fmt.Sprintf(format, a...)}}
}

// Changed is the refusal of a law whose files are not those it was to consist
// of.
type Changed struct{ Path, Want, Got string }

func (c *Changed) Error() string {
	return fmt.Sprintf("law %s has changed: its digest was %s and is %s", c.Path, c.Want, c.Got)
}
