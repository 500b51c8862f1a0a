// Package published reads the check values of the literature: one CSV file a
// topic, one row a value, each with its source, its place in that source and
// a tolerance that comes from the source's digits.
//
// A file starts with a heading. Its first columns are inputs, named with
// their units (mass_Msun); then always
//
//	value,unit,rel_tol,kind,source,locator,note
//
// Lines that start with # are comments. rel_tol is a relative tolerance, or
// an absolute one when it is written like 0.03dex (value and answer are then
// base-10 logarithms). The kinds are
//
//	published   printed in the source
//	derived     by hand from the source
//	limit       an exact limiting case
//	recomputed  an independent high-precision calculation
//	open        a disagreement: listed by the test, not failed
//
// source is a key of sources.csv (key, full reference, DOI).
package published

import (
	"bytes"
	"embed"
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"io/fs"
	"math"
	"slices"
	"strconv"
	"strings"
	"testing"
)

//go:embed *.csv
var files embed.FS

// SourcesFile is the file of references; every other file holds rows.
const SourcesFile = "sources.csv"

// Kinds are the words a row's kind may be.
var Kinds = []string{"published", "derived", "limit", "recomputed", "open"}

// tail is what every heading ends with.
var tail = []string{"value", "unit", "rel_tol", "kind", "source", "locator", "note"}

// Row is one check value.
type Row struct {
	File   string
	Line   int
	Inputs map[string]string // the columns before value, by heading
	Value  float64
	Unit   string
	Tol    float64 // relative, or absolute when Dex
	Dex    bool

	Kind, Source, Locator, Note string
}

// Source is one reference.
type Source struct{ Key, Reference, DOI string }

// Rows returns the rows of one file. It fails the test if the file is absent,
// malformed or empty, so that a table test can never pass over nothing.
func Rows(t testing.TB, file string) []Row {
	t.Helper()
	rows, err := Read(file)
	if err != nil {
		t.Fatal(err)
	}
	if len(rows) == 0 {
		t.Fatalf("published: %s holds no rows", file)
	}
	return rows
}

// Files lists the names of the files of rows.
func Files() []string {
	names, err := fs.Glob(files, "*.csv")
	if err != nil {
		panic("published: bad pattern")
	}
	return slices.DeleteFunc(names, func(n string) bool { return n == SourcesFile })
}

// Read reads one file of rows. The error joins the first fault with its line.
func Read(file string) ([]Row, error) {
	data, err := files.ReadFile(file)
	if err != nil {
		return nil, fmt.Errorf("published: %w", err)
	}
	records, lines, err := parse(file, data)
	if err != nil {
		return nil, err
	}
	heading := records[0]
	inputs := len(heading) - len(tail)
	if inputs < 0 || !slices.Equal(heading[inputs:], tail) {
		return nil, fmt.Errorf("published: %s:%d: the heading must end with %s", file, lines[0], strings.Join(tail, ","))
	}
	rows := make([]Row, 0, len(records)-1)
	for i, record := range records[1:] {
		row, err := rowOf(heading[:inputs], record)
		if err != nil {
			return nil, fmt.Errorf("published: %s:%d: %w", file, lines[i+1], err)
		}
		row.File, row.Line = file, lines[i+1]
		rows = append(rows, row)
	}
	return rows, nil
}

// parse splits a file into records and tells the line of each.
func parse(file string, data []byte) (records [][]string, lines []int, err error) {
	r := csv.NewReader(bytes.NewReader(data))
	r.Comment = '#'
	for {
		record, err := r.Read()
		switch {
		case errors.Is(err, io.EOF) && len(records) > 0:
			return records, lines, nil
		case errors.Is(err, io.EOF):
			return nil, nil, fmt.Errorf("published: %s: no heading", file)
		case err != nil:
			return nil, nil, fmt.Errorf("published: %s: %w", file, err)
		}
		line, _ := r.FieldPos(0)
		for i := range record {
			record[i] = strings.TrimSpace(record[i])
		}
		records, lines = append(records, record), append(lines, line)
	}
}

func rowOf(inputs, record []string) (Row, error) {
	row := Row{Inputs: make(map[string]string, len(inputs))}
	for i, name := range inputs {
		row.Inputs[name] = record[i]
	}
	f := record[len(inputs):]
	row.Unit, row.Kind, row.Source, row.Locator, row.Note = f[1], f[3], f[4], f[5], f[6]
	var err error
	if row.Value, err = strconv.ParseFloat(f[0], 64); err != nil {
		return row, fmt.Errorf("value %q is no number", f[0])
	}
	tolerance, dex := strings.CutSuffix(f[2], "dex")
	row.Dex = dex
	if row.Tol, err = strconv.ParseFloat(tolerance, 64); err != nil || !(row.Tol >= 0 && row.Tol < math.Inf(1)) {
		return row, fmt.Errorf("tolerance %q: want a number >= 0, or one like 0.03dex", f[2])
	}
	if !slices.Contains(Kinds, row.Kind) {
		return row, fmt.Errorf("kind %q: want one of %s", row.Kind, strings.Join(Kinds, ", "))
	}
	return row, nil
}

// Sources returns the references, in the order of the file.
func Sources(t testing.TB) []Source {
	t.Helper()
	data, err := files.ReadFile(SourcesFile)
	if err != nil {
		t.Fatalf("published: %v", err)
	}
	records, lines, err := parse(SourcesFile, data)
	if err != nil {
		t.Fatal(err)
	}
	if !slices.Equal(records[0], []string{"key", "reference", "doi"}) {
		t.Fatalf("published: %s:%d: the heading must be key,reference,doi", SourcesFile, lines[0])
	}
	var out []Source
	for _, r := range records[1:] {
		out = append(out, Source{r[0], r[1], r[2]})
	}
	return out
}

// Number returns an input as a number; the test fails if it is none.
func (r Row) Number(t testing.TB, input string) float64 {
	t.Helper()
	text, ok := r.Inputs[input]
	if !ok {
		t.Fatalf("published: %s: no column %q", r.Where(), input)
	}
	v, err := strconv.ParseFloat(text, 64)
	if err != nil {
		t.Fatalf("published: %s: %s %q is no number", r.Where(), input, text)
	}
	return v
}

// Where is the row's file and line.
func (r Row) Where() string { return fmt.Sprintf("%s:%d", r.File, r.Line) }

// Check fails the test if got is not the row's value within its tolerance. An
// open row is logged and never fails.
func (r Row) Check(t testing.TB, got float64) {
	t.Helper()
	if r.Holds(got) {
		return
	}
	text := fmt.Sprintf("%s: got %.10g %s, want %.10g within %s (%s, %s %s) for %v",
		r.Where(), got, r.Unit, r.Value, r.tolerance(), r.Kind, r.Source, r.Locator, r.Inputs)
	if r.Kind == "open" {
		t.Logf("open: %s: %s", text, r.Note)
		return
	}
	t.Error(text)
}

// Holds tells whether got is the row's value within its tolerance.
func (r Row) Holds(got float64) bool {
	if got == r.Value { // infinities, and an exact zero
		return true
	}
	allowed := r.Tol
	if !r.Dex {
		allowed *= math.Abs(r.Value)
	}
	return math.Abs(got-r.Value) <= allowed && !math.IsInf(got, 0) && !math.IsInf(r.Value, 0)
}

func (r Row) tolerance() string {
	if r.Dex {
		return fmt.Sprintf("%gdex", r.Tol)
	}
	return fmt.Sprintf("a relative %g", r.Tol)
}
