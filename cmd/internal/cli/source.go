package cli

import (
	"errors"
	"fmt"
	"io"
	"io/fs"
	"os"
	"path"
	"path/filepath"
	"strings"

	"wane/cmd/internal/inquiry"
	"wane/sim/law"
	"wane/sim/scenario"
)

// folder serves the files of one folder of the disk by the paths a person
// gave, so that messages name them so. Nothing outside it is opened.
type folder struct{ path string }

func (f folder) Open(name string) (fs.File, error) {
	if path.Dir(name) != f.path && path.Clean(name) != f.path {
		return nil, &fs.PathError{Op: "open", Path: name, Err: fs.ErrNotExist}
	}
	return os.Open(filepath.FromSlash(name))
}

// load reads a scenario by path or by the name of an embedded one, and prints
// its warnings.
func (p *Program) load(s *settings, which string, o scenario.Overrides) (*scenario.Scenario, *law.Registry, error) {
	registry, err := p.Builtin()
	if err != nil {
		return nil, nil, failed(err)
	}
	fsys, file, err := p.source(which)
	if err != nil {
		return nil, nil, bad(err)
	}
	sc, warnings, err := scenario.Load(fsys, file, registry, p.Defaults(), o)
	if !s.quiet {
		warn(p.Err, warnings)
	}
	if err != nil {
		return nil, nil, bad(err)
	}
	return sc, registry, nil
}

func warn(w io.Writer, warnings []scenario.Fault) {
	for _, f := range warnings {
		fmt.Fprintln(w, "wane: warning: "+f.Error())
	}
}

// source finds the file system and the file in it that a scenario's name or
// path means.
func (p *Program) source(which string) (fs.FS, string, error) {
	isPath := strings.HasSuffix(which, ".toml") || strings.ContainsAny(which, `/\`)
	if !isPath {
		file := which + ".toml"
		if _, err := fs.Stat(p.Embedded, file); err == nil {
			return p.Embedded, file, nil
		}
		if _, err := os.Stat(which); err != nil {
			known := p.embedded()
			return nil, "", fmt.Errorf("no scenario %q: want a .toml file, or one of %s%s", which,
				strings.Join(known, ", "), inquiry.Meant(which, known))
		}
	}
	file := path.Clean(filepath.ToSlash(which))
	if _, err := os.Stat(which); errors.Is(err, fs.ErrNotExist) {
		known := p.embedded()
		hint := ""
		if name := strings.TrimSuffix(path.Base(file), ".toml"); contains(known, name) {
			hint = fmt.Sprintf(" (the built-in one is called %q)", name)
		}
		return nil, "", fmt.Errorf("scenario %s: no such file%s", which, hint)
	}
	return scenario.Layered(folder{path.Dir(file)}, p.Embedded), file, nil
}

// embedded lists the names of the embedded scenarios.
func (p *Program) embedded() []string {
	files, _ := fs.Glob(p.Embedded, "*.toml")
	for i := range files {
		files[i] = strings.TrimSuffix(files[i], ".toml")
	}
	return files
}

func contains(words []string, word string) bool {
	for _, w := range words {
		if w == word {
			return true
		}
	}
	return false
}
