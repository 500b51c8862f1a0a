package newlaw

import (
	"context"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"

	"wane/plugins"
	"wane/sim/law"
	"wane/sim/rpc/conform"
)

// Every process has a sketch in either language, whose card is in order.
func TestFiles(t *testing.T) {
	for _, p := range law.Processes {
		s := sketchOf(p, "my-own")
		for _, f := range law.CheckCard(s.card) {
			t.Errorf("%s: %v", p.Name, f)
		}
		if s.example.why == "" || s.example.question == "" || s.example.column == "" {
			t.Errorf("%s: no example", p.Name)
		}
		for _, language := range Languages() {
			files, err := Files(p.Name, "my-own", language)
			if err != nil {
				t.Errorf("%s in %s: %v", p.Name, language, err)
				continue
			}
			for name, text := range files {
				if strings.HasPrefix(name, "wane") {
					continue
				}
				if strings.Contains(string(text), "{{") || strings.Contains(string(text), "<no value>") {
					t.Errorf("%s in %s: %s: %s", p.Name, language, name, text)
				}
			}
			page := string(files["README.md"])
			for _, q := range s.card.Questions {
				if !strings.Contains(page, "`"+q.Name+"`") {
					t.Errorf("%s in %s: README.md says nothing of %s", p.Name, language, q.Name)
				}
			}
			if n := strings.Count(page, "\n"); n > 70 {
				t.Errorf("%s in %s: README.md has %d lines, want a page", p.Name, language, n)
			}
		}
	}
}

func TestRefuses(t *testing.T) {
	for _, x := range [][4]string{
		{"evaportion", "my-own", "python", `process "evaportion" is not known`},
		{"evaporation", "My-Own", "python", "want lower-case letters"},
		{"evaporation", "../my-own", "go", "want lower-case letters"},
		{"evaporation", "", "go", "want lower-case letters"},
		{"evaporation", "wanelaw", "python", "name of the kit"},
		{"evaporation", "my-own", "fortran", "want one of go, python"},
	} {
		if _, err := Files(x[0], x[1], x[2]); err == nil || !strings.Contains(err.Error(), x[3]) {
			t.Errorf("%v: got %v", x, err)
		}
	}
	folder := t.TempDir()
	if err := os.WriteFile(filepath.Join(folder, "mine"), []byte("precious"), 0o600); err != nil {
		t.Fatal(err)
	}
	if err := Write(folder, map[string][]byte{"mine": nil}); err == nil || !strings.Contains(err.Error(), "is there already") {
		t.Errorf("an existing folder: %v", err)
	}
	if text := read(t, filepath.Join(folder, "mine")); text != "precious" {
		t.Errorf("the file of an existing folder is now %q", text)
	}
}

// needsPython skips a laptop without the packages, and fails where everything
// must be there.
func needsPython(t *testing.T) {
	t.Helper()
	if out, err := exec.Command("/usr/bin/python3", "-c", "import numpy, grpc, google.protobuf").CombinedOutput(); err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("python3-numpy, python3-grpcio and python3-protobuf: %v\n%s", err, out)
		}
		t.Skip("no python3-numpy, python3-grpcio and python3-protobuf")
	}
}

// made writes a new law's folder.
func made(t *testing.T, process, language string) string {
	t.Helper()
	files, err := Files(process, "my-own", language)
	if err != nil {
		t.Fatal(err)
	}
	folder := filepath.Join(t.TempDir(), "my-own")
	if err := Write(folder, files); err != nil {
		t.Fatal(err)
	}
	return folder
}

// passes judges a folder: not so much as a doubt may be found.
func passes(t *testing.T, folder string) {
	t.Helper()
	o := &conform.Outside{Path: folder}
	s := o.Subject()
	s.Among = defaults(t)
	findings, err := conform.Judge(context.Background(), s)
	if err != nil {
		t.Fatal(err)
	}
	for _, f := range findings {
		if f.Level != conform.Pass {
			t.Errorf("%s: %s: question %s: %s", f.Check, f.Level, f.Question, f.Text)
		}
	}
	if len(findings) < 18 {
		t.Errorf("only %d findings: %v", len(findings), findings)
	}
}

func defaults(t *testing.T) []law.Law {
	t.Helper()
	registry, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	var out []law.Law
	for process, name := range plugins.Defaults() {
		if l, ok := registry.Find(process, name); ok {
			out = append(out, l)
		}
	}
	return out
}

func command(t *testing.T, folder string, words ...string) {
	t.Helper()
	c := exec.Command(words[0], words[1:]...)
	c.Dir, c.Env = folder, append(os.Environ(), "PYTHONDONTWRITEBYTECODE=1")
	if out, err := c.CombinedOutput(); err != nil {
		t.Errorf("%s: %v\n%s", strings.Join(words, " "), err, out)
	}
}

// some tells whether a process is left out where there is little time: one of
// a role is enough but where each is asked another question.
func some(p law.Process, seen map[law.Role]int) bool {
	seen[p.Role]++
	alike := p.Role != law.Founding && p.Role != law.Stellar && p.Role != law.Dynamics
	return alike && seen[p.Role] > 1 && os.Getenv("WANE_REQUIRE") != "1"
}

// A new folder in Python runs as it is, whatever its process.
func TestPythonFoldersPass(t *testing.T) {
	needsPython(t)
	seen := map[law.Role]int{}
	for _, p := range law.Processes {
		if some(p, seen) {
			continue
		}
		t.Run(p.Name, func(t *testing.T) {
			folder := made(t, p.Name, "python")
			passes(t, folder)
			command(t, folder, "/usr/bin/python3", "test_law.py")
		})
	}
}

// A new folder in Go is built, tested and judged as it is.
func TestGoFolderPasses(t *testing.T) {
	folder := made(t, "evaporation", "go")
	passes(t, folder)
	command(t, folder, "go", "vet", ".")
	command(t, folder, "go", "test", ".")
}

// The laws of all other processes in Go keep the rules as well: here they are
// packages of one module, so that the kit is built but once.
func TestGoLawsPass(t *testing.T) {
	folder := made(t, "evaporation", "go")
	seen := map[law.Role]int{}
	for _, p := range law.Processes {
		if some(p, seen) {
			continue
		}
		files, err := Files(p.Name, "my-own", "go")
		if err != nil {
			t.Fatal(err)
		}
		one := map[string][]byte{"law.go": files["law.go"], "law_test.go": files["law_test.go"]}
		if err := Write(filepath.Join(folder, p.Name), one); err != nil {
			t.Fatal(err)
		}
	}
	command(t, folder, "go", "vet", "./...")
	command(t, folder, "go", "test", "./...")
}
