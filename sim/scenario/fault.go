package scenario

import (
	"fmt"
	"sort"
	"strings"
)

// Fault is one thing wrong with a scenario, or worth a warning. File is the
// file, or the command line setting ("--set nucleon-decay.lifetime"), which has
// neither line nor column. Lines and columns count from 1, columns in characters.
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

// Faults is everything wrong with a scenario, one a line.
type Faults []Fault

func (f Faults) Error() string {
	lines := make([]string, len(f))
	for i := range f {
		lines[i] = f[i].Error()
	}
	return strings.Join(lines, "\n")
}

// place is where something was written.
type place struct {
	file         string
	line, column int
}

// report collects faults and warnings.
type report struct{ faults, warnings Faults }

func (r *report) fault(at place, format string, a ...any) {
	message := fmt.Sprintf(format, a...)
	if at.line == 0 {
		// "--set evaporation.spin" has named the setting.
		flag := strings.TrimLeft(at.file, "-")
		_, named, _ := strings.Cut(flag, " ")
		for _, prefix := range []string{flag, named, "laws." + named} {
			message = strings.TrimPrefix(message, prefix+": ")
		}
	}
	const longest = 1000
	if len(message) > longest {
		message = strings.ToValidUTF8(message[:longest], "") + "..."
	}
	r.faults = append(r.faults, Fault{at.file, at.line, at.column, message})
}

func (r *report) warn(at place, format string, a ...any) {
	r.warnings = append(r.warnings, Fault{at.file, at.line, at.column, fmt.Sprintf(format, a...)})
}

// maxFaults is how many faults are worth reading.
const maxFaults = 200

// short keeps the first faults of very many.
func (f Faults) short() Faults {
	if len(f) <= maxFaults {
		return f
	}
	last := f[maxFaults]
	last.Message = fmt.Sprintf("and %d faults more", len(f)-maxFaults)
	return append(f[:maxFaults:maxFaults], last)
}

// sorted orders faults as they stand in each file, files in the order in
// which they first appear.
func (f Faults) sorted() Faults {
	rank := map[string]int{}
	for _, x := range f {
		if _, ok := rank[x.File]; !ok {
			rank[x.File] = len(rank)
		}
	}
	sort.SliceStable(f, func(i, j int) bool {
		a, b := f[i], f[j]
		if a.File != b.File {
			return rank[a.File] < rank[b.File]
		}
		if a.Line != b.Line {
			return a.Line < b.Line
		}
		return a.Column < b.Column
	})
	return f
}
