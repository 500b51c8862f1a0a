package newlaw

import (
	"embed"
	"errors"
	"fmt"
	"io/fs"
	"os"
	"path"
	"path/filepath"
	"regexp"
	"sort"
	"strings"

	"wane/plugins/outside/python"
	"wane/sim"
	"wane/sim/law"
)

// Languages in which a law's folder can be made.
var languages = []string{"go", "python"}

// Languages lists the languages in which a law's folder can be made.
func Languages() []string { return append([]string(nil), languages...) }

//go:embed templates module
var embedded embed.FS

var nameForm = regexp.MustCompile(`^[a-z][a-z0-9]*(-[a-z0-9]+)*$`)

// Files are the files of a new law's folder, by their paths in it. The error
// says what is wrong with process, name or language.
func Files(process, name, language string) (map[string][]byte, error) {
	p, ok := law.ProcessNamed(process)
	if !ok {
		return nil, &UnknownProcess{process}
	}
	if !nameForm.MatchString(name) || len(name) > 60 {
		return nil, fmt.Errorf("law %s/%s: the name %q: want lower-case letters, digits and single hyphens, such as my-burden", process, name, name)
	}
	if name == "wane" || name == "wanelaw" {
		return nil, fmt.Errorf("law %s/%s: %q is the name of the kit: want another", process, name, name)
	}
	s := sketchOf(p, name)
	switch language {
	case "python":
		return pythonFiles(p, s)
	case "go":
		return goFiles(p, s)
	}
	return nil, fmt.Errorf("language %q: want one of %s", language, strings.Join(languages, ", "))
}

// UnknownProcess is the fault of a process that nobody knows.
type UnknownProcess struct{ Process string }

func (u *UnknownProcess) Error() string { return fmt.Sprintf("process %q is not known", u.Process) }

// Write makes the folder. It refuses one that is there already, and leaves
// nothing behind where it fails.
func Write(folder string, files map[string][]byte) error {
	if err := os.Mkdir(folder, 0o777); err != nil {
		if errors.Is(err, fs.ErrExist) {
			return fmt.Errorf("%s is there already: want a new folder", folder)
		}
		return err
	}
	names := make([]string, 0, len(files))
	for name := range files {
		names = append(names, name)
	}
	sort.Strings(names)
	for _, name := range names {
		to := filepath.Join(folder, filepath.FromSlash(name))
		err := os.MkdirAll(filepath.Dir(to), 0o777)
		if err == nil {
			err = os.WriteFile(to, files[name], 0o666)
		}
		if err != nil {
			return errors.Join(err, os.RemoveAll(folder)) // it was not there before
		}
	}
	return nil
}

func pythonFiles(p law.Process, s sketch) (map[string][]byte, error) {
	functions, err := fs.ReadFile(embedded, "templates/python/"+s.file+".py")
	if err != nil {
		return nil, err
	}
	v := view{Language: "python", Process: p, Card: s.card, Example: shown(s), Functions: strings.TrimSpace(string(functions)) + "\n"}
	v.Imports = pythonImports(v.Functions)
	out, err := v.fill("python", "law.py", "test_law.py", "law.toml", "README.md")
	if err != nil {
		return nil, err
	}
	return out, copyInto(out, "", python.Kit, func(string) bool { return true })
}

func goFiles(p law.Process, s sketch) (map[string][]byte, error) {
	functions, err := fs.ReadFile(embedded, "templates/go/"+s.file+".go.txt")
	if err != nil {
		return nil, err
	}
	v := view{Language: "go", Process: p, Card: s.card, Example: shown(s)}
	if v.Functions, err = v.text("functions", string(functions)); err != nil {
		return nil, err
	}
	v.Imports = goImports(v.Functions)
	requirements, err := fs.ReadFile(embedded, "module/requirements.txt")
	if err != nil {
		return nil, err
	}
	v.Requirements = string(requirements)
	out, err := v.fill("go", "law.go", "law_test.go", "law.toml", "README.md", "go.mod", "wane/go.mod")
	if err != nil {
		return nil, err
	}
	for from, to := range map[string]string{"go.sum.txt": "go.sum", "LICENSE.txt": "wane/LICENSE"} {
		if out[to], err = fs.ReadFile(embedded, "module/"+from); err != nil {
			return nil, err
		}
	}
	source := func(name string) bool { return !strings.HasSuffix(name, "_test.go") }
	return out, copyInto(out, "wane/sim", sim.Contract, source)
}

// copyInto adds the files of a file system that are wanted.
func copyInto(files map[string][]byte, folder string, from fs.FS, wanted func(string) bool) error {
	return fs.WalkDir(from, ".", func(name string, d fs.DirEntry, err error) error {
		if err != nil || d.IsDir() || !wanted(name) {
			return err
		}
		text, err := fs.ReadFile(from, name)
		files[path.Join(folder, name)] = text
		return err
	})
}
