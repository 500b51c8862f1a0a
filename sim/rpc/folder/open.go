package folder

import (
	"context"
	"errors"
	"fmt"
	"io"
	"io/fs"
	"os"
	"os/exec"
	"path/filepath"
	"strings"

	"wane/sim/rpc"
)

// Options say how a law is opened.
type Options struct {
	// Digest, if given, is the only one that is opened: anything else is
	// refused with a [Changed].
	Digest string
	// Log, if not nil, takes what the law writes to its standard error, and
	// what there is to say about building it.
	Log io.Writer
	// Limits on times and sizes while it runs.
	Limits rpc.Options
}

// Opened is a law that runs.
type Opened struct {
	Path    string // as the person wrote it
	Dir     string // absolute
	Digest  string // "sha256:<hex>"
	Files   []File
	Program File // what was started, with an absolute path
	Law     *rpc.Law
}

// Open reads a law's folder, builds its program if need be, and starts it.
// Whoever opens a law closes it.
func Open(ctx context.Context, path string, o Options) (*Opened, error) {
	f, err := Read(path)
	if err != nil {
		return nil, err
	}
	return f.Open(ctx, o)
}

// Open builds the law's program if need be, and starts it.
func (f *Folder) Open(ctx context.Context, o Options) (*Opened, error) {
	sum, files, err := f.Digest()
	if err != nil {
		return nil, err
	}
	if o.Digest != "" && o.Digest != sum {
		return nil, &Changed{f.Path, o.Digest, sum}
	}
	if err := f.Build(ctx, o.Log); err != nil {
		return nil, err
	}
	words, program, err := f.command()
	if err != nil {
		return nil, err
	}
	opened := &Opened{Path: f.Path, Dir: f.Dir, Digest: sum, Files: files, Program: program}
	limits := o.Limits
	started, err := os.Stat(program.Path)
	if err != nil {
		return nil, fmt.Errorf("law %s: %w", f.Path, err)
	}
	limits.BeforeRestart = func() error { return f.same(sum, program, started) }
	opened.Law, err = rpc.Open(ctx, rpc.Start{
		Name: f.Path, Args: words, Dir: f.Dir, Log: o.Log, Env: f.environment(), Options: limits,
	})
	if err != nil {
		return nil, err
	}
	if err := opened.check(f, started); err != nil {
		return nil, errors.Join(err, opened.Law.Close())
	}
	return opened, nil
}

// Close ends the law's process.
func (o *Opened) Close() error { return o.Law.Close() }

// check finds what can be found only once the law has started.
func (o *Opened) check(f *Folder, started os.FileInfo) error {
	card := o.Law.Describe()
	if is := card.Process + "/" + card.Name; f.Name != "" && f.Name != is {
		return Faults{f.at("name", 0, "name: %q, but its card says %q", f.Name, is)}
	}
	return f.same(o.Digest, o.Program, started)
}

// same tells whether the law still consists of what it did. A program outside
// the folder may be large: it is looked at, not read again.
func (f *Folder) same(sum string, program File, started os.FileInfo) error {
	now, _, err := f.Digest()
	if err != nil {
		return err
	}
	if now != sum {
		return &Changed{f.Path, sum, now}
	}
	is, err := os.Stat(program.Path)
	if err != nil || !os.SameFile(is, started) || is.Size() != started.Size() || !is.ModTime().Equal(started.ModTime()) {
		return fmt.Errorf("law %s: its program %s has been replaced", f.Path, program.Path)
	}
	return nil
}

// environment keeps Python from reading code that the digest does not cover:
// compiled code in the law's folder, which nobody compares with its source. So that
// there is none, Python is told to write none; where there is some, to look for it
// elsewhere.
func (f *Folder) environment() []string {
	if !f.holdsBytecode() {
		return []string{"PYTHONDONTWRITEBYTECODE=1"}
	}
	if cache, err := os.UserCacheDir(); err == nil {
		place := filepath.Join(cache, "wane", "python")
		if os.MkdirAll(place, 0o700) == nil {
			return []string{"PYTHONPYCACHEPREFIX=" + place}
		}
	}
	return []string{"PYTHONPYCACHEPREFIX=" + filepath.Join(f.Dir, builtName, "none"), "PYTHONDONTWRITEBYTECODE=1"}
}

func (f *Folder) holdsBytecode() bool {
	found := false
	filepath.WalkDir(f.Dir, func(name string, d fs.DirEntry, err error) error {
		switch {
		case err != nil:
			return nil
		case d.IsDir() && d.Name() == "__pycache__":
			found = true
			return fs.SkipAll
		case d.IsDir() && d.Name() == ".git":
			return fs.SkipDir
		}
		return nil
	})
	return found
}

// command is the program, by its absolute path, and its arguments.
func (f *Folder) command() ([]string, File, error) {
	place := filepath.Join(f.Dir, builtName)
	if len(f.build) > 0 {
		var err error
		if place, err = f.builtPlace(); err != nil {
			return nil, File{}, fmt.Errorf("law %s: %w", f.Path, err)
		}
	}
	words := f.arguments(f.Start, place)
	if !strings.Contains(words[0], "/") {
		found, err := exec.LookPath(words[0])
		if err == nil {
			found, err = filepath.Abs(found)
		}
		if err != nil {
			return nil, File{}, fmt.Errorf("law %s: %w", f.Path, err)
		}
		words[0] = found
	}
	if _, err := os.Stat(words[0]); err != nil {
		return nil, File{}, fmt.Errorf("law %s: no program %s", f.Path, words[0])
	}
	sum, err := HashFile(words[0])
	if err != nil {
		return nil, File{}, fmt.Errorf("law %s: %s: %w", f.Path, words[0], reason(err))
	}
	return words, File{words[0], sum}, nil
}
