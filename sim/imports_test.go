package sim_test

import (
	"path"
	"strings"
	"testing"
)

// allowed is the table of what each package may import: its own subpackages,
// the packages of this module named here, whole trees ending in /..., and
// modules of others. The first line that fits a package holds. Anything of the
// standard library is free but for the words in guarded, which a line must
// name. An arrow points down: num, draw < physics < law < sky, galaxy < engine,
// fade < ensemble, scenario < sim < cmd.
const allowed = `
sim/num/internal/...     : sim/internal/... os
sim/num                  : golang.org/x/sys/cpu
sim/draw/internal/...    : sim/internal/... sim/num os
sim/draw                 : sim/num golang.org/x/sys/cpu
sim/internal/...         : sim/num
sim/physics/...          : sim/num sim/physics/... gonum.org/v1/gonum/...
sim/law/lawtest          : sim/num sim/draw sim/physics/... sim/law math/rand/v2
sim/law                  : sim/num sim/draw sim/physics/...
sim/sky                  : sim/num sim/draw sim/physics/... sim/law gonum.org/v1/gonum/...
sim/galaxy               : sim/num sim/draw sim/physics/... sim/law
sim/fade                 : sim/num sim/draw sim/physics/... sim/law sim/sky sim/galaxy gonum.org/v1/gonum/...
sim/engine/...           : sim/num sim/draw sim/physics/... sim/law sim/sky sim/galaxy sim/fade sim/engine gonum.org/v1/gonum/... golang.org/x/sys/cpu
sim/table                : sim/num sim/law
sim/rpc/conform          : sim/law sim/law/lawtest sim/scenario/quantity sim/rpc sim/rpc/folder os os/exec syscall
sim/rpc/folder           : sim/law sim/rpc os os/exec github.com/pelletier/go-toml/v2/...
sim/rpc/wire             : unsafe google.golang.org/protobuf/...
sim/rpc                  : sim/law os os/exec net log syscall github.com/hashicorp/... github.com/rs/zerolog google.golang.org/... golang.org/x/sys/unix
sim/scenario/...         : sim/num sim/draw sim/physics/... sim/law sim/sky sim/galaxy sim/engine sim/fade sim/scenario sim/scenario/quantity github.com/pelletier/go-toml/v2/...
sim/ensemble             : sim/num sim/draw sim/physics/... sim/law sim/sky sim/galaxy sim/engine sim/fade gonum.org/v1/gonum/...
sim                      : sim/... github.com/rs/zerolog
plugins/outside/...      : sim/num sim/physics/... sim/law sim/rpc os
plugins                  : plugins/... sim/law
plugins/...              : sim/num sim/physics/... sim/law gonum.org/v1/gonum/...
scenarios                :
testdata/published       :
testdata/reference       : os os/exec
cmd/internal/newlaw      : sim sim/law plugins/outside/python os
cmd/internal/...         : sim/... plugins scenarios cmd/internal/... os os/exec os/signal syscall flag net log github.com/... golang.org/x/term gonum.org/v1/...
cmd/...                  : sim/... plugins plugins/... scenarios cmd/internal/... os os/exec os/signal syscall flag net log github.com/...
`

// allowedInTests is what tests may import besides what their package may:
// the package itself, check values, the kit, laws to try things on (from the
// sky up), and libraries that are for tests.
const allowedInTests = `
sim/num/...              : sim/internal/... testdata/... os os/exec math/rand/v2 math/rand
sim/draw/...             : sim/internal/... testdata/... os os/exec math/rand/v2 math/rand
sim/physics/...          : testdata/... sim/draw os os/exec math/rand/v2
sim/law/...              : testdata/... os os/exec math/rand/v2
plugins                  : plugins/... sim/... testdata/... os os/exec math/rand/v2
plugins/outside/...      : sim/... plugins plugins/outside/python scenarios testdata/... os os/exec math/rand/v2
plugins/...              : sim/law/lawtest sim/draw sim/sky testdata/... os os/exec math/rand/v2
scenarios                : sim/... plugins os
sim/rpc/...              : sim/... plugins plugins/outside/python testdata/... os os/exec syscall math/rand/v2
sim/...                  : sim/law/lawtest plugins plugins/... scenarios testdata/... sim/engine/reference os os/exec flag math/rand/v2
testdata/...             : os
cmd/...                  : scenarios plugins plugins/... testdata/... sim/... os os/exec math/rand/v2 flag
`

// testLibraries are for tests of any package.
var testLibraries = []string{
	"github.com/google/go-cmp/...", "pgregory.net/rapid", "github.com/rogpeppe/go-internal/testscript",
	"github.com/santhosh-tekuri/jsonschema/v6", "gonum.org/v1/gonum/...",
}

// guarded are the standard packages through which something other than its
// input could reach a result: a line of the table must name them.
var guarded = []string{"os", "os/exec", "os/signal", "os/user", "net", "flag", "log", "syscall", "plugin", "unsafe", "math/rand", "math/rand/v2", "crypto/rand"}

// rule is a line of a table.
type rule struct {
	pattern string
	imports []string
}

func table(t *testing.T, text string) []rule {
	t.Helper()
	var out []rule
	for _, line := range strings.Split(strings.TrimSpace(text), "\n") {
		pattern, imports, ok := strings.Cut(line, ":")
		if !ok {
			t.Fatalf("table: %q has no colon", line)
		}
		out = append(out, rule{strings.TrimSpace(pattern), strings.Fields(imports)})
	}
	return out
}

// fits tells whether a path is the pattern, or below it when it ends in /...
func fits(pattern, name string) bool {
	tree, whole := strings.CutSuffix(pattern, "/...")
	return name == tree || whole && strings.HasPrefix(name, tree+"/")
}

func fitsAny(patterns []string, name string) bool {
	for _, p := range patterns {
		if fits(p, name) {
			return true
		}
	}
	return false
}

func ruleFor(rules []rule, pkg string) (rule, bool) {
	for _, r := range rules {
		if fits(r.pattern, pkg) {
			return r, true
		}
	}
	return rule{}, false
}

// needsPermission tells whether an import must be named in the table.
func needsPermission(name string) bool {
	first, _, _ := strings.Cut(name, "/")
	if strings.Contains(first, ".") {
		return true
	}
	for _, g := range guarded {
		if fits(g+"/...", name) {
			return true
		}
	}
	return false
}

func TestImports(t *testing.T) {
	rules, inTests := table(t, allowed), table(t, allowedInTests)
	files := 0
	for _, f := range goFiles(t) {
		files++
		pkg := path.Dir(f.path)
		r, ok := ruleFor(rules, pkg)
		if !ok {
			t.Errorf("%s: no line of the table of imports is for package %s", f.path, pkg)
			continue
		}
		may := append([]string{pkg + "/..."}, r.imports...)
		if f.test {
			extra, _ := ruleFor(inTests, pkg)
			may = append(append(may, testLibraries...), extra.imports...)
		}
		for _, name := range f.imports {
			own, ours := strings.CutPrefix(name, "wane/")
			if (ours || needsPermission(name)) && !fitsAny(may, own) {
				t.Errorf("%s imports %s: the table allows %s only %v", f.path, name, pkg, may)
			}
			if f.test && fits("net/...", name) {
				t.Errorf("%s imports %s: no test needs the network", f.path, name)
			}
		}
	}
	for _, f := range goFiles(t) {
		for _, name := range f.imports {
			own, _ := strings.CutPrefix(name, "wane/")
			if fits("sim/rpc/...", own) && !f.test && !fitsAny([]string{"sim/rpc/...", "plugins/outside/...", "cmd/..."}, path.Dir(f.path)) {
				t.Errorf("%s imports %s: only commands start processes", f.path, name)
			}
		}
	}
	if files < 20 {
		t.Fatalf("looked at %d files only", files)
	}
}

// TestImportsTable holds the table itself to the order of the house.
func TestImportsTable(t *testing.T) {
	rules := table(t, allowed)
	for _, x := range []struct {
		pkg, name string
		want      bool
	}{
		{"sim/num", "os", false}, {"sim/engine", "time", true}, {"sim/engine", "net/http", false}, {"sim/engine", "sim/ensemble", false},
		{"sim/law", "sim/engine", false}, {"plugins/evaporation", "sim/engine", false}, {"plugins/evaporation", "plugins/infall", false},
		{"plugins/evaporation", "sim/physics/hole", true}, {"sim/rpc", "os/exec", true}, {"sim/sky", "sim/law", true},
		{"sim/physics/hole", "sim/law", false}, {"sim/fade", "sim/engine", false}, {"sim", "flag", false}, {"sim", "log/slog", false},
	} {
		r, _ := ruleFor(rules, x.pkg)
		ours := strings.HasPrefix(x.name, "sim") || strings.HasPrefix(x.name, "plugins")
		if got := !(ours || needsPermission(x.name)) || fitsAny(r.imports, x.name); got != x.want {
			t.Errorf("%s may import %s: %v, want %v", x.pkg, x.name, got, x.want)
		}
	}
}
