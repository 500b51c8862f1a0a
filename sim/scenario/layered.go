package scenario

import (
	"errors"
	"io/fs"
	"sort"
)

// Layered is a file system that looks a file up in each of the given ones in
// turn: a folder of scenarios over the embedded ones.
func Layered(systems ...fs.FS) fs.FS { return layered(systems) }

type layered []fs.FS

var _ fs.ReadDirFS = layered{}

func (l layered) Open(name string) (fs.File, error) {
	for _, f := range l {
		file, err := f.Open(name)
		if err == nil || !errors.Is(err, fs.ErrNotExist) {
			return file, err
		}
	}
	return nil, &fs.PathError{Op: "open", Path: name, Err: fs.ErrNotExist}
}

// ReadDir lists a folder over all of them, each name once.
func (l layered) ReadDir(name string) ([]fs.DirEntry, error) {
	var out []fs.DirEntry
	seen := map[string]bool{}
	err := error(&fs.PathError{Op: "readdir", Path: name, Err: fs.ErrNotExist})
	for _, f := range l {
		entries, e := fs.ReadDir(f, name)
		if e != nil {
			continue
		}
		err = nil
		for _, x := range entries {
			if !seen[x.Name()] {
				seen[x.Name()] = true
				out = append(out, x)
			}
		}
	}
	sort.Slice(out, func(i, j int) bool { return out[i].Name() < out[j].Name() })
	return out, err
}
