package folder

import (
	"errors"
	"io/fs"
	"os"
	"path/filepath"
	"regexp"
	"strings"
)

const (
	// tomlName is the file that makes a folder a law.
	tomlName = "law.toml"
	// builtName is where what is built lies.
	builtName = ".built"
	// builtPrefix begins an argument that means a file in it.
	builtPrefix = builtName + "/"

	maxToml = 100_000 // bytes
)

// nameForm is process/name.
var nameForm = regexp.MustCompile(`^[a-z][a-z0-9]*(-[a-z0-9]+)*/[a-z][a-z0-9]*(-[a-z0-9]+)*$`)

// Folder is a law's folder, or one executable file.
type Folder struct {
	Path string // as the person wrote it
	Dir  string // absolute, without links: where the law is started
	Name string // process/name, if law.toml says it

	Start []string // the program and its arguments, as written
	build []string // what makes the program; empty: nothing has to be made
	files []string // globs; nil: everything but caches

	bare  string // the name of the one executable file
	toml  string // law.toml as messages call it
	where map[string]entry
}

// Read reads a law's folder, or looks at one executable file. It starts
// nothing. The error is [Faults], all of them together.
func Read(path string) (*Folder, error) {
	if filepath.Base(path) == tomlName {
		path = filepath.Dir(path)
	}
	info, err := os.Stat(path)
	switch {
	case errors.Is(err, fs.ErrNotExist):
		return nil, one(path, "no such file or folder: want a law's folder or an executable file")
	case err != nil:
		return nil, one(path, "%v", reason(err))
	}
	absolute, err := filepath.Abs(path)
	if err == nil {
		absolute, err = filepath.EvalSymlinks(absolute)
	}
	if err != nil {
		return nil, one(path, "%v", reason(err))
	}
	if !info.IsDir() {
		f := &Folder{Path: path, Dir: filepath.Dir(absolute), bare: filepath.Base(absolute)}
		f.Start = []string{"./" + f.bare}
		return f, f.lookAtBare(info)
	}
	f := &Folder{Path: path, Dir: absolute, toml: strings.TrimSuffix(path, "/") + "/" + tomlName}
	return f.readToml()
}

// reason takes the operation and the path off an error of a file system.
func reason(err error) error {
	var pe *fs.PathError
	if errors.As(err, &pe) {
		return pe.Err
	}
	return err
}

func (f *Folder) readToml() (*Folder, error) {
	name := filepath.Join(f.Dir, tomlName)
	info, err := os.Stat(name)
	switch {
	case errors.Is(err, fs.ErrNotExist):
		return nil, one(f.Path, "no law: the folder has no %s (wane law new makes one)", tomlName)
	case err != nil:
		return nil, one(f.toml, "%v", reason(err))
	case !info.Mode().IsRegular():
		return nil, one(f.toml, "want a file")
	case info.Size() > maxToml:
		return nil, one(f.toml, "the file has %d bytes: want at most %d", info.Size(), maxToml)
	}
	data, err := os.ReadFile(name)
	if err != nil {
		return nil, one(f.toml, "%v", reason(err))
	}
	entries, faults := read(f.toml, data)
	f.where = entries
	f.Start, f.build, f.files = entries["start"].texts, entries["build"].texts, entries["files"].texts
	if e := entries["name"]; len(e.texts) == 1 {
		f.Name = e.texts[0]
		if !nameForm.MatchString(f.Name) {
			faults = append(faults, f.at("name", 0, `name: %q: want process/name, such as "evaporation/my-burden"`, f.Name))
		}
	}
	for i, glob := range f.files {
		if why := badGlob(glob); why != "" {
			faults = append(faults, f.at("files", i, "files: %q: %s", glob, why))
		}
	}
	faults = append(faults, f.programs()...)
	if len(faults) > 0 {
		return nil, faults.sorted()
	}
	return f, nil
}

// at is a fault of the text with index i at a key.
func (f *Folder) at(key string, i int, format string, a ...any) Fault {
	e := f.where[key]
	p := e.at
	if i < len(e.where) {
		p = e.where[i]
	}
	fault := one(f.toml, format, a...).(Faults)[0]
	fault.Line, fault.Column = p.line, p.column
	return fault
}

// badGlob tells why a glob cannot say what the digest covers.
func badGlob(glob string) string {
	if filepath.IsAbs(glob) || strings.HasPrefix(glob, "~") {
		return "leads outside the law's folder: want a path from it"
	}
	for _, part := range strings.Split(glob, "/") {
		switch {
		case part == "..":
			return "leads outside the law's folder"
		case part == "" || part == ".":
			return "want names between single slashes"
		case part == builtName:
			return "what is built is no source: the digest covers what it is built from"
		}
		if _, err := filepath.Match(part, ""); err != nil {
			return "a bracket is not closed"
		}
	}
	return ""
}
