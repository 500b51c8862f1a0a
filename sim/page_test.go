package sim_test

import (
	"go/ast"
	"os"
	"path/filepath"
	"strings"
	"testing"
)

// Beyond these lengths a file or a function holds more than one idea. Tables
// that a generator writes are no page to be read.
const (
	longestFile     = 350 // lines
	longestFunction = 100
)

func TestLengths(t *testing.T) {
	for _, f := range goFiles(t) {
		if ast.IsGenerated(f.tree) {
			continue
		}
		text, err := os.ReadFile(filepath.Join(root, filepath.FromSlash(f.path)))
		if err != nil {
			t.Fatal(err)
		}
		if n := strings.Count(string(text), "\n"); n > longestFile {
			t.Errorf("%s: %d lines, want at most %d", f.path, n, longestFile)
		}
		for _, d := range f.tree.Decls {
			fn, ok := d.(*ast.FuncDecl)
			if !ok || f.test && strings.HasPrefix(fn.Name.Name, "Test") { // a test may be one long table
				continue
			}
			if n := f.files.Position(fn.End()).Line - f.files.Position(fn.Pos()).Line + 1; n > longestFunction {
				t.Errorf("%s: %s: %d lines, want at most %d", f.path, fn.Name.Name, n, longestFunction)
			}
		}
	}
}

// TestDocComments holds everything exported to a comment that says what it is.
// A method that only serves an interface may go without.
func TestDocComments(t *testing.T) {
	packages := map[string]bool{} // whether some file says what the package is
	for _, f := range goFiles(t) {
		if f.test {
			continue
		}
		folder := filepath.Dir(f.path)
		packages[folder] = packages[folder] || f.tree.Doc != nil
		if ast.IsGenerated(f.tree) { // its words are in what it is made from
			continue
		}
		missing := func(name string) { t.Errorf("%s: %s has no doc comment", f.path, name) }
		for _, d := range f.tree.Decls {
			switch d := d.(type) {
			case *ast.FuncDecl:
				if d.Recv == nil && d.Name.IsExported() && d.Doc == nil {
					missing(d.Name.Name)
				}
			case *ast.GenDecl:
				for _, s := range d.Specs {
					switch s := s.(type) {
					case *ast.TypeSpec:
						if s.Name.IsExported() && d.Doc == nil && s.Doc == nil {
							missing(s.Name.Name)
						}
					case *ast.ValueSpec:
						if s.Names[0].IsExported() && d.Doc == nil && s.Doc == nil && s.Comment == nil {
							missing(s.Names[0].Name)
						}
					}
				}
			}
		}
	}
	for folder, says := range packages {
		if !says {
			t.Errorf("package %s: no file says what it is", folder)
		}
	}
}
