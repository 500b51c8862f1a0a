package newlaw

import (
	"flag"
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"sort"
	"strings"
	"testing"

	"github.com/google/go-cmp/cmp"
)

var update = flag.Bool("update", false, "write what a law's module requires anew")

var root = filepath.Join("..", "..", "..")

// What a law's module requires is what the packages it gets are built with
// here, in the same versions.
func TestModuleIsCurrent(t *testing.T) {
	sums := read(t, filepath.Join(root, "go.sum"))
	modules := modules(t)
	want := map[string]string{
		"requirements.txt": "require (\n\t" + strings.Join(modules, "\n\t") + "\n)\n",
		"go.sum.txt":       sumsFor(sums, modules),
		"LICENSE.txt":      read(t, filepath.Join(root, "LICENSE")),
	}
	for name, text := range want {
		file := filepath.Join("module", name)
		if *update {
			if err := os.WriteFile(file, []byte(text), 0o644); err != nil {
				t.Fatal(err)
			}
		}
		if diff := cmp.Diff(text, read(t, file)); diff != "" {
			t.Errorf("%s is not current: go test ./cmd/internal/newlaw -run TestModuleIsCurrent -update (-want +is)\n%s", file, diff)
		}
	}
}

func read(t *testing.T, file string) string {
	t.Helper()
	text, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	return string(text)
}

// modules lists, with their versions, those that any system needs.
func modules(t *testing.T) []string {
	t.Helper()
	found := map[string]bool{}
	for _, system := range []string{"linux", "darwin", "windows"} {
		c := exec.Command("go", "list", "-deps", "-f", "{{with .Module}}{{.Path}} {{.Version}}{{end}}", "./sim/rpc", "./sim/law/lawtest")
		c.Dir, c.Env = root, append(os.Environ(), "GOOS="+system, "CGO_ENABLED=0")
		out, err := c.Output()
		if err != nil {
			t.Fatalf("go list: %v", err)
		}
		for _, line := range strings.Split(strings.TrimSpace(string(out)), "\n") {
			if line = strings.TrimSpace(line); line != "" && line != "wane" {
				found[line] = true
			}
		}
	}
	var list []string
	for m := range found {
		list = append(list, m)
	}
	sort.Strings(list)
	return list
}

// sumsFor are the lines of go.sum that those modules need: their own, and
// those of the go.mod files that choosing versions may read.
func sumsFor(sums string, modules []string) string {
	needed := map[string]bool{}
	for _, m := range modules {
		needed[m] = true
	}
	version := regexp.MustCompile(`^(\S+ \S+?)(/go\.mod)? h1:`)
	var b strings.Builder
	for _, line := range strings.SplitAfter(sums, "\n") {
		if m := version.FindStringSubmatch(line); m != nil && (needed[m[1]] || m[2] != "") {
			b.WriteString(line)
		}
	}
	return b.String()
}

// The folder's go.mod files name the Go that the program's does.
func TestGoVersionIsCurrent(t *testing.T) {
	version := regexp.MustCompile(`(?m)^go \S+$`).FindString(read(t, filepath.Join(root, "go.mod")))
	for _, name := range []string{"go.mod.tmpl", "wane_go.mod.tmpl"} {
		if text := read(t, filepath.Join("templates", "go", name)); version == "" || !strings.Contains(text, "\n"+version+"\n") {
			t.Errorf("%s: want the line %q", name, version)
		}
	}
}
