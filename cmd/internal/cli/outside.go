package cli

import (
	"context"
	"errors"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"strings"
	"sync"

	"wane/sim/law"
	"wane/sim/rpc/folder"
	"wane/sim/scenario"
)

// Outside is a law outside the program, open.
type Outside struct {
	Law      law.Law
	Path     string // as the person wrote it
	Digest   string // of its files
	Files    []folder.File
	Program  folder.File // what was started
	Runtime  string      // what it runs on, in its own words
	Restarts func() int  // how often it had to be started again
	Close    func() error
}

// OpenFunc opens the law at a path, a folder or an executable file.
type OpenFunc func(ctx context.Context, path string, o folder.Options) (*Outside, error)

// openFolder opens a law in a process of its own.
func openFolder(ctx context.Context, path string, o folder.Options) (*Outside, error) {
	opened, err := folder.Open(ctx, path, o)
	if err != nil {
		return nil, err
	}
	return &Outside{
		Law: opened.Law, Path: path, Digest: opened.Digest, Files: opened.Files, Program: opened.Program,
		Runtime: opened.Law.Runtime(), Restarts: opened.Law.Restarts, Close: opened.Close,
	}, nil
}

func (o *Outside) card() law.Card { return o.Law.Describe() }

func (o *Outside) id() string { return o.card().Process + "/" + o.card().Name }

// announce says what was started: whoever typed a path has agreed to it, and
// shall see to what.
func (o *Outside) announce(w io.Writer) {
	fmt.Fprintf(w, "wane: law %s, version %s, from %s, %s\n", o.id(), o.card().Version, o.Path, o.Digest)
}

// isLawPath tells whether the law that a command is asked about is given by its
// path: it begins with a full stop or a slash, or names neither a law nor a
// process but something on the disk.
func isLawPath(registry *law.Registry, which string) bool {
	if strings.HasPrefix(which, ".") || strings.HasPrefix(which, "/") {
		return true
	}
	process, name, slash := strings.Cut(which, "/")
	if _, known := registry.Find(process, name); known {
		return false
	}
	if !slash {
		if _, known := law.ProcessNamed(which); known {
			return false
		}
		which = filepath.Join(which, "law.toml")
	}
	_, err := os.Stat(which)
	return err == nil
}

// openTyped opens the law whose path was typed, and puts it into the registry.
func (p *Program) openTyped(ctx context.Context, s *settings, registry *law.Registry, path string) (*Outside, error) {
	o, err := p.Open(ctx, path, folder.Options{Log: p.lawLog(s, true)})
	if err != nil {
		if ctx.Err() != nil {
			return nil, &fault{ExitInterrupted, errors.New("interrupted")}
		}
		return nil, bad(err)
	}
	if err := registry.Put(o.Law); err != nil {
		return nil, bad(errors.Join(err, o.Close()))
	}
	if !s.quiet {
		o.announce(p.Err)
	}
	return o, nil
}

// openGiven opens the laws that a scenario and the command line give by their
// paths, all at a time. A law that cannot be opened, or must not be, comes
// with the reason.
func (p *Program) openGiven(ctx context.Context, s *settings, given []scenario.Given, trust bool) ([]*Outside, []scenario.Outside) {
	opened, told := make([]*Outside, len(given)), make([]scenario.Outside, len(given))
	var all sync.WaitGroup
	for i, g := range given {
		all.Go(func() {
			o, err := p.openOne(ctx, s, g, trust)
			told[i] = scenario.Outside{Given: g, Fault: err}
			if err == nil {
				opened[i] = o
				told[i].Law, told[i].Digest = o.Law, o.Digest
			}
		})
	}
	all.Wait()
	return opened, told
}

func (p *Program) openOne(ctx context.Context, s *settings, g scenario.Given, trust bool) (*Outside, error) {
	options := folder.Options{Log: p.lawLog(s, false)}
	if !g.Typed && !trust {
		if options.Digest = g.Trust; g.Trust == "" {
			return nil, untrusted(g)
		}
	}
	o, err := p.Open(ctx, g.Path, options)
	var changed *folder.Changed
	if errors.As(err, &changed) && options.Digest != "" {
		return nil, fmt.Errorf("%s has changed, and is not started: [trust] says\n  %s, but its files now have\n  %s (--trust starts it all the same)",
			g.Path, changed.Want, changed.Got)
	}
	if err != nil {
		return nil, p.meantBuiltin(g, err)
	}
	o.Path = g.Written
	return o, nil
}

// meantBuiltin adds to a fault that a path in the form of process/name was
// meant for the law of that name.
func (p *Program) meantBuiltin(g scenario.Given, err error) error {
	registry, failure := p.Builtin()
	process, name, _ := strings.Cut(g.Written, "/")
	if failure != nil || process != g.Process {
		return err
	}
	if _, known := registry.Find(process, name); known {
		return fmt.Errorf("%w (a law that is built in goes by its name alone: %s)", err, name)
	}
	return err
}

// untrusted is the fault of a scenario file that wants a program started which
// nobody has agreed to. It says how to agree.
func untrusted(g scenario.Given) error {
	f, err := folder.Read(g.Path)
	if err != nil {
		return err
	}
	sum, files, err := f.Digest()
	if err != nil {
		return err
	}
	if full, err := filepath.Abs(g.File()); err == nil {
		for _, x := range files {
			if filepath.Join(f.Dir, filepath.FromSlash(x.Path)) == full {
				return fmt.Errorf("%s is a program of its own, and a scenario file starts none by itself: --trust starts it. "+
					"Its digest cannot stand in this file, for it covers the file: move it, or list the law's files in its law.toml (files)", g.Path)
			}
		}
	}
	return fmt.Errorf("%s is a program of its own, and a scenario file starts none by itself. "+
		"If you know it: --trust, or in the file\n  [trust]\n  %s = %q", g.Path, g.Process, sum)
}
