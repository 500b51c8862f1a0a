package sim_test

import (
	"go/ast"
	"go/parser"
	"go/token"
	"io/fs"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"
)

// root is the top of the tree, seen from this package.
const root = ".."

// source is one Go file of the tree.
type source struct {
	path    string // from the root, with slashes
	test    bool
	imports []string
	tree    *ast.File
	files   *token.FileSet
}

// goFiles parses every Go file of the tree, but for test data.
func goFiles(t *testing.T) []source {
	t.Helper()
	var out []source
	err := filepath.WalkDir(root, func(name string, d fs.DirEntry, err error) error {
		if err != nil {
			return err
		}
		if d.IsDir() {
			if base := d.Name(); name != root && (strings.HasPrefix(base, ".") || base == "testdata" && filepath.Dir(name) != root) {
				return filepath.SkipDir
			}
			return nil
		}
		if !strings.HasSuffix(name, ".go") {
			return nil
		}
		rel, err := filepath.Rel(root, name)
		if err != nil {
			return err
		}
		s := source{path: filepath.ToSlash(rel), test: strings.HasSuffix(name, "_test.go"), files: token.NewFileSet()}
		if s.tree, err = parser.ParseFile(s.files, name, nil, parser.ParseComments); err != nil {
			return err
		}
		for _, i := range s.tree.Imports {
			imported, err := strconv.Unquote(i.Path.Value)
			if err != nil {
				return err
			}
			s.imports = append(s.imports, imported)
		}
		out = append(out, s)
		return nil
	})
	if err != nil {
		t.Fatal(err)
	}
	return out
}

// localName is the name under which a file knows an imported package; empty
// if it does not import it.
func (s source) localName(imported string) string {
	for _, i := range s.tree.Imports {
		if i.Path.Value != strconv.Quote(imported) {
			continue
		}
		if i.Name != nil {
			return i.Name.Name
		}
		return imported[strings.LastIndex(imported, "/")+1:]
	}
	return ""
}

// uses reports each use of one of the names of an imported package.
func (s source) uses(imported string, names map[string]bool, report func(position, name string)) {
	local := s.localName(imported)
	if local == "" {
		return
	}
	if local == "." {
		report(s.path, "everything, by a dot import")
		return
	}
	ast.Inspect(s.tree, func(n ast.Node) bool {
		selector, ok := n.(*ast.SelectorExpr)
		if !ok || !names[selector.Sel.Name] {
			return true
		}
		if x, ok := selector.X.(*ast.Ident); ok && x.Name == local {
			report(s.path+":"+strconv.Itoa(s.files.Position(n.Pos()).Line), selector.Sel.Name)
		}
		return true
	})
}

func set(words string) map[string]bool {
	out := map[string]bool{}
	for _, w := range strings.Fields(words) {
		out[w] = true
	}
	return out
}

// differing are the functions of math whose last bits differ between
// processors and releases; package num has portable ones.
var differing = set(`Exp Exp2 Expm1 Log Log2 Log10 Log1p Pow Cbrt Hypot
	Sin Cos Tan Sincos Asin Acos Atan Atan2 Sinh Cosh Tanh Asinh Acosh Atanh
	Erf Erfc Erfinv Erfcinv Gamma Lgamma J0 J1 Jn Y0 Y1 Yn`)

// free are files that may use them all the same, with the reason.
var free = map[string]string{
	"sim/internal/bigmath/bigmath.go": "a first guess that arithmetic of any precision then improves",
}

func TestPortableFunctionsOnly(t *testing.T) {
	for _, f := range goFiles(t) {
		if f.test || strings.HasPrefix(f.path, "sim/num/") || free[f.path] != "" {
			continue
		}
		f.uses("math", differing, func(position, name string) {
			t.Errorf("%s: math.%s: its bits differ between processors, use package num", position, name)
		})
	}
}

// TestNoClock keeps the time of day out of everything that makes results.
func TestNoClock(t *testing.T) {
	clock := set("Now Since Until After AfterFunc Tick NewTicker NewTimer Sleep Local LoadLocation")
	for _, f := range goFiles(t) {
		below := strings.HasPrefix(f.path, "sim/") || strings.HasPrefix(f.path, "plugins/")
		if f.test || !below || strings.HasPrefix(f.path, "sim/rpc/") || strings.HasPrefix(f.path, "plugins/outside/") {
			continue
		}
		f.uses("time", clock, func(position, name string) {
			t.Errorf("%s: time.%s: no result may depend on the time of day", position, name)
		})
	}
}

// TestNoInit keeps hidden effects of being imported out: nothing runs before
// main. What a generator writes for the wire cannot do without.
func TestNoInit(t *testing.T) {
	for _, f := range goFiles(t) {
		if f.test || f.path == "sim/rpc/wire/law.pb.go" {
			continue
		}
		for _, d := range f.tree.Decls {
			if fn, ok := d.(*ast.FuncDecl); ok && fn.Recv == nil && fn.Name.Name == "init" {
				t.Errorf("%s: an init function", f.path)
			}
		}
	}
}

// TestTopLevel holds the top of the tree to its fixed entries.
func TestTopLevel(t *testing.T) {
	fixed := set("cmd sim plugins scenarios testdata go.mod go.sum README.md DEVELOPERS.md LICENSE")
	entries, err := os.ReadDir(root)
	if err != nil {
		t.Fatal(err)
	}
	ignored, err := os.ReadFile(filepath.Join(root, ".gitignore"))
	if err != nil {
		t.Fatal(err)
	}
	for _, e := range entries {
		name := e.Name()
		if fixed[name] || strings.HasPrefix(name, ".") {
			delete(fixed, name)
			continue
		}
		built := false
		for _, pattern := range strings.Fields(string(ignored)) {
			match, err := filepath.Match(strings.TrimPrefix(pattern, "/"), name)
			built = built || match && err == nil
		}
		if !built {
			t.Errorf("%s at the top of the tree: it has a place further down", name)
		}
	}
	for name := range fixed {
		t.Errorf("no %s at the top of the tree", name)
	}
}

// TestPluginFolders holds the folders of laws to the processes they are for.
func TestPluginFolders(t *testing.T) {
	entries, err := os.ReadDir(filepath.Join(root, "plugins"))
	if err != nil {
		t.Fatal(err)
	}
	for _, e := range entries {
		if e.IsDir() && e.Name() != "outside" && e.Name() != "testdata" && !processFolders()[e.Name()] {
			t.Errorf("plugins/%s: no process of that name", e.Name())
		}
	}
}
