package scenario

import (
	"errors"
	"fmt"
	"io"
	"io/fs"
	"path"
	"sort"
	"strings"

	"wane/sim/law"
)

// maxFile is the largest scenario file that is read, bytes.
const maxFile = 1_000_000

// Load reads the scenario file in fsys, with its bases, and applies the
// overrides. A base "name" is the file name.toml beside the file, or else at
// the top of fsys; [Layered] puts embedded scenarios under a folder.
//
// defaults names the law of each process that a file need not mention; each
// must be in the registry.
//
// The second result is warnings, in good and bad scenarios. The error is
// [Faults], all faults of all files together, or the reason why the file
// could not be read (errors.Is with fs.ErrNotExist works).
func Load(fsys fs.FS, file string, reg *law.Registry, defaults map[string]string, o Overrides) (*Scenario, []Fault, error) {
	b, err := newBuilder(reg, defaults)
	if err != nil {
		return nil, nil, err
	}
	b.opened = o.Outside
	layers, err := b.files(fsys, file)
	if err != nil {
		return nil, nil, err
	}
	for _, l := range layers {
		b.apply(l)
	}
	b.s.Name = stem(file)
	leaf := layers[len(layers)-1]
	b.describe(leaf)
	for i := len(layers) - 2; i >= 0; i-- {
		b.s.Base = append(b.s.Base, stem(layers[i].at.file))
	}
	b.override(o)
	b.finish(leaf)
	if len(b.faults) > 0 {
		return nil, b.warnings.sorted(), b.faults.sorted().short()
	}
	return b.s, b.warnings.sorted(), nil
}

func stem(file string) string { return strings.TrimSuffix(path.Base(file), ".toml") }

// files reads a file and its bases, the deepest base first.
func (b *builder) files(fsys fs.FS, file string) ([]*node, error) {
	var layers []*node
	var chain []string
	for at := (place{}); file != ""; {
		data, err := b.content(fsys, file)
		switch {
		case err != nil && len(layers) == 0:
			return nil, err
		case err != nil:
			b.fault(at, "%v", err)
			b.broken = true
			return layers, nil
		}
		chain = append(chain, file)
		root, ok := parse(&b.report, file, data)
		layers = append([]*node{root}, layers...)
		b.broken = b.broken || !ok
		file, at = b.base(fsys, file, root)
		for _, seen := range chain {
			if file == seen {
				b.fault(at, "bases form a loop: %s", strings.Join(append(chain, file), " -> "))
				b.broken = true
				return layers, nil
			}
		}
	}
	return layers, nil
}

// content reads a file, but no more than a scenario can be.
func (b *builder) content(fsys fs.FS, file string) ([]byte, error) {
	f, err := fsys.Open(file)
	if err != nil {
		return nil, fmt.Errorf("scenario %s: %w", file, reason(err))
	}
	defer f.Close()
	info, err := f.Stat()
	switch {
	case err != nil:
		return nil, fmt.Errorf("scenario %s: %w", file, reason(err))
	case info.IsDir():
		return nil, Faults{{file, 0, 0, "is a folder: want a scenario file"}}
	case info.Size() > maxFile:
		return nil, Faults{{file, 0, 0, fmt.Sprintf("the file has %s: want at most %s", sizeText(info.Size()), sizeText(maxFile))}}
	}
	data, err := io.ReadAll(io.LimitReader(f, maxFile+1))
	switch {
	case err != nil:
		return nil, fmt.Errorf("scenario %s: %w", file, reason(err))
	case len(data) > maxFile:
		return nil, Faults{{file, 0, 0, fmt.Sprintf("the file is larger than %s", sizeText(maxFile))}}
	}
	return data, nil
}

// reason takes the operation and the path off an error of a file system.
func reason(err error) error {
	var pe *fs.PathError
	if errors.As(err, &pe) {
		return pe.Err
	}
	return err
}

// base returns the file of the base that a document names, "" if none.
func (b *builder) base(fsys fs.FS, file string, root *node) (string, place) {
	n := root.field("base")
	if n == nil {
		return "", place{}
	}
	name := strings.TrimSuffix(n.text, ".toml")
	if n.form != aText || !isName(name) {
		b.fault(n.at, `base: %s: want the name of a scenario, such as "lantern-reach"`, n.written())
		b.broken = true
		return "", place{}
	}
	beside, top := path.Join(path.Dir(file), name+".toml"), name+".toml"
	for _, candidate := range []string{beside, top} {
		if _, err := fs.Stat(fsys, candidate); err == nil {
			return candidate, n.at
		}
	}
	var known []string
	for _, pattern := range []string{path.Join(path.Dir(file), "*.toml"), "*.toml"} {
		found, _ := fs.Glob(fsys, pattern)
		for _, f := range found {
			if s := stem(f); isName(s) && !contains(known, s) && f != file {
				known = append(known, s)
			}
		}
	}
	sort.Strings(known)
	b.fault(n.at, "base: no scenario %q %s", name, among(name, known))
	b.broken = true
	return "", place{}
}

// isName tells whether a word may name a scenario or a population.
func isName(s string) bool {
	if s == "" || len(s) > 40 {
		return false
	}
	for i, c := range s {
		letter := c >= 'a' && c <= 'z' || c >= 'A' && c <= 'Z'
		if !letter && (i == 0 || !(c >= '0' && c <= '9' || c == '-' || c == '_')) {
			return false
		}
	}
	return true
}

func contains(words []string, word string) bool {
	for _, w := range words {
		if w == word {
			return true
		}
	}
	return false
}
