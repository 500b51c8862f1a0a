package cli

import (
	"context"
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

// diskFolder serves the files of one folder of the disk by the paths a person
// gave, so that messages name them so. Nothing outside it is opened.
type diskFolder struct{ path string }

func (f diskFolder) Open(name string) (fs.File, error) {
	if path.Dir(name) != f.path && path.Clean(name) != f.path {
		return nil, &fs.PathError{Op: "open", Path: name, Err: fs.ErrNotExist}
	}
	return os.Open(filepath.FromSlash(name))
}

// loaded is a scenario with the laws it may use, and those that had to be
// opened for it. Whoever loads closes.
type loaded struct {
	*scenario.Scenario
	registry *law.Registry
	outside  []*Outside
}

func (l *loaded) close() {
	for _, o := range l.outside {
		if o != nil {
			_ = o.Close() // it has answered; how it ends is no fault of the run
		}
	}
}

// healed says which laws had to be started again. Their answers are what they
// would have been: each was asked the same once more.
func (l *loaded) healed(w io.Writer) {
	for _, o := range l.outside {
		n := o.Restarts()
		times := "once"
		if n > 1 {
			times = fmt.Sprintf("%d times", n)
		}
		if n > 0 {
			fmt.Fprintf(w, "wane: warning: law %s (%s) ended in the run and was started again, %s\n", o.Path, o.id(), times)
		}
	}
}

// of returns the law outside the program that a process has, or nil.
func (l *loaded) of(process string) *Outside {
	given, outside := l.Outside[process]
	for _, o := range l.outside {
		if outside && o.Law == given.Law {
			return o
		}
	}
	return nil
}

// load reads a scenario by path or by the name of an embedded one, opens the
// laws that it or the command line gives by their paths, and prints its
// warnings. With trust, a scenario file may start what it likes.
func (p *Program) load(ctx context.Context, s *settings, which string, o scenario.Overrides, trust bool) (*loaded, error) {
	fsys, file, err := p.source(which)
	if err != nil {
		return nil, bad(err)
	}
	return p.loadFrom(ctx, s, fsys, file, o, trust)
}

// loadFrom is load of a file that is found.
func (p *Program) loadFrom(ctx context.Context, s *settings, fsys fs.FS, file string, o scenario.Overrides, trust bool) (*loaded, error) {
	registry, err := p.Builtin()
	if err != nil {
		return nil, failed(err)
	}
	l := &loaded{registry: registry}
	l.outside, o.Outside = p.openGiven(ctx, s, scenario.Paths(fsys, file, o), trust)
	if err := l.join(ctx, o); err != nil {
		l.close()
		return nil, err
	}
	sc, warnings, err := scenario.Load(fsys, file, registry, p.Defaults(), o)
	if !s.quiet {
		warn(p.Err, warnings)
	}
	if err != nil {
		l.close()
		return nil, bad(err)
	}
	l.Scenario = sc
	for _, o := range l.outside {
		if !s.quiet {
			o.announce(p.Err)
		}
	}
	return l, nil
}

// join puts the laws that were opened into the registry, each under its own
// process; where that is not the one it was given for, the scenario says so.
func (l *loaded) join(ctx context.Context, o scenario.Overrides) error {
	if ctx.Err() != nil {
		return &fault{ExitInterrupted, errors.New("interrupted before the run began")}
	}
	for _, x := range o.Outside {
		if x.Fault == nil && x.Law.Describe().Process == x.Process {
			if err := l.registry.Put(x.Law); err != nil {
				return bad(err)
			}
		}
	}
	return nil
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
	return scenario.Layered(diskFolder{path.Dir(file)}, p.Embedded), file, nil
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
