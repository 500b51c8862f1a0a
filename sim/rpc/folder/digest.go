package folder

import (
	"crypto/sha256"
	"encoding/hex"
	"errors"
	"fmt"
	"io"
	"io/fs"
	"os"
	"path"
	"path/filepath"
	"sort"
	"strings"
)

// File is a file of a law.
type File struct {
	Path   string `json:"path"` // from the law's folder, with slashes
	SHA256 string `json:"sha256"`
}

const (
	maxFiles = 10_000
	maxBytes = 2 << 30 // of all files together
)

// caches are names that a law does not consist of.
var caches = map[string]bool{
	builtName: true, "__pycache__": true, ".git": true, ".hg": true, ".svn": true, ".pytest_cache": true, ".mypy_cache": true,
	".ruff_cache": true, ".ipynb_checkpoints": true, ".idea": true, ".vscode": true, ".DS_Store": true,
}

func isCache(name string) bool {
	return caches[name] || strings.HasSuffix(name, "~") || strings.HasSuffix(name, ".swp") || strings.HasPrefix(name, ".#")
}

// code is the endings of files that are covered whatever law.toml says: Python
// imports, and Go compiles, what lies beside a file, so that one more would
// make another law.
var code = map[string]bool{
	".py": true, ".pyc": true, ".so": true, ".pth": true, ".go": true, ".mod": true, ".sum": true, ".c": true, ".h": true, ".s": true,
}

// Digest returns "sha256:<hex>", a digest of the law's files, and each file
// with its own. It is the SHA-256 of a line for each file in the order of
// their paths: the path, a zero byte, and the SHA-256 of its content in
// hexadecimal. A program that start names by an absolute path counts as a file of
// the law, unless it lies where the system has its own. The error is [Faults].
func (f *Folder) Digest() (sum string, files []File, err error) {
	if f.bare != "" {
		one, fault := f.file(f.bare, nil)
		if fault != nil {
			return "", nil, Faults{*fault}
		}
		return sumOf([]File{one}), []File{one}, nil
	}
	names, faults := f.covered()
	total := int64(0)
	for _, name := range names {
		file, fault := f.file(name, &total)
		if fault != nil {
			faults = append(faults, *fault)
			continue
		}
		files = append(files, file)
	}
	if len(faults) == 0 {
		faults = f.uncovered(names)
	}
	if program := f.Start[0]; filepath.IsAbs(program) && !ofSystem(program) && len(faults) == 0 {
		sum, err := HashFile(program)
		if err != nil {
			faults = append(faults, f.at("start", 0, "start: %s: %v", program, reason(err)))
		}
		files = append(files, File{program, sum})
	}
	if len(faults) > 0 {
		return "", nil, faults
	}
	return sumOf(files), files, nil
}

func sumOf(files []File) string {
	h := sha256.New()
	for _, f := range files {
		fmt.Fprintf(h, "%s\x00%s\n", f.Path, f.SHA256)
	}
	return "sha256:" + hex.EncodeToString(h.Sum(nil))
}

// covered lists the files that the digest covers, in the order of their paths.
func (f *Folder) covered() ([]string, Faults) {
	var names []string
	var faults Faults
	hits := make([]int, len(f.files))
	err := filepath.WalkDir(f.Dir, func(full string, d fs.DirEntry, err error) error {
		if err != nil {
			return err
		}
		rel, err := filepath.Rel(f.Dir, full)
		if err != nil || rel == "." {
			return err
		}
		name := filepath.ToSlash(rel)
		if d.IsDir() {
			if caches[d.Name()] {
				return filepath.SkipDir
			}
			return nil
		}
		if !f.covers(name, hits) {
			return nil
		}
		if names = append(names, name); len(names) > maxFiles {
			return fmt.Errorf("more than %d files: say in %s which of them are the law's (files)", maxFiles, tomlName)
		}
		return nil
	})
	if err != nil {
		faults = append(faults, Fault{File: f.Path, Message: reason(err).Error()})
	}
	for i, n := range hits {
		if n == 0 {
			faults = append(faults, f.at("files", i, "files: %q: no such file in the folder", f.files[i]))
		}
	}
	sort.Strings(names)
	return names, faults
}

// covers tells whether a file belongs to the law, and counts for each glob
// what it is good for.
func (f *Folder) covers(name string, hits []int) bool {
	if isCache(path.Base(name)) {
		return false
	}
	if f.files == nil {
		return true
	}
	covered := name == tomlName || code[path.Ext(name)]
	for i, glob := range f.files {
		if matches(strings.Split(glob, "/"), strings.Split(name, "/")) {
			hits[i]++
			covered = true
		}
	}
	return covered
}

// matches matches a path with a glob, both in parts; ** stands for any number
// of folders, and at the end for everything below.
func matches(glob, name []string) bool {
	switch {
	case len(glob) == 0:
		return len(name) == 0
	case glob[0] == "**" && len(glob) == 1:
		return len(name) > 0
	case glob[0] == "**":
		return matches(glob[1:], name) || len(name) > 0 && matches(glob, name[1:])
	case len(name) == 0:
		return false
	}
	ok, err := path.Match(glob[0], name[0])
	return ok && err == nil && matches(glob[1:], name[1:])
}

// ofSystem tells whether a file lies where only the system puts files.
func ofSystem(name string) bool {
	for _, dir := range []string{"/usr/", "/bin/", "/sbin/", "/lib/", "/opt/", "/nix/", "/etc/"} {
		if strings.HasPrefix(filepath.Clean(name), dir) {
			return true
		}
	}
	return false
}

// uncovered finds arguments of start that are files of the folder which the
// digest leaves out: the law could change and nobody would see it.
func (f *Folder) uncovered(names []string) Faults {
	var faults Faults
	for i, a := range f.Start {
		if filepath.IsAbs(a) {
			if info, err := os.Stat(a); i > 0 && err == nil && info.Mode().IsRegular() && !ofSystem(a) {
				faults = append(faults, f.at("start", i, "start: %s lies outside what the digest covers: want a file of the folder, without the folder's path", a))
			}
			continue
		}
		if strings.HasPrefix(a, builtPrefix) || i == 0 && !strings.Contains(a, "/") {
			continue
		}
		name := path.Clean(a)
		info, err := os.Stat(f.inDir(name))
		if err != nil || info.IsDir() {
			continue
		}
		if at := sort.SearchStrings(names, name); at == len(names) || names[at] != name {
			faults = append(faults, f.at("start", i, "start: %s is not among files: want a digest that covers it", a))
		}
	}
	return faults
}

// file takes the digest of one file, and adds its size to total.
func (f *Folder) file(name string, total *int64) (File, *Fault) {
	bad := func(format string, a ...any) (File, *Fault) {
		where := strings.TrimSuffix(f.Path, "/") + "/" + name
		if f.bare != "" {
			where = f.Path
		}
		return File{}, &Fault{File: where, Message: fmt.Sprintf(format, a...)}
	}
	full := f.inDir(name)
	real, err := filepath.EvalSymlinks(full)
	switch {
	case errors.Is(err, fs.ErrNotExist):
		return bad("a link to nowhere")
	case err != nil:
		return bad("%v", reason(err))
	case !within(f.Dir, real):
		return bad("a link that leads outside the law's folder, to %s", real)
	}
	info, err := os.Stat(real)
	switch {
	case err != nil:
		return bad("%v", reason(err))
	case info.IsDir(): // a link; what is in it is covered in its own place
		target, _ := filepath.Rel(f.Dir, real)
		sum := sha256.Sum256([]byte("a link to the folder " + filepath.ToSlash(target)))
		return File{name, hex.EncodeToString(sum[:])}, nil
	case !info.Mode().IsRegular():
		return bad("is no file, but %s", info.Mode().Type())
	}
	if total != nil {
		if *total += info.Size(); *total > maxBytes {
			return bad("the law's files have more than %d bytes in all", int64(maxBytes))
		}
	}
	sum, err := HashFile(real)
	if err != nil {
		return bad("%v", reason(err))
	}
	return File{name, sum}, nil
}

// HashFile is the SHA-256 of a file's content in hexadecimal.
func HashFile(name string) (string, error) {
	in, err := os.Open(name)
	if err != nil {
		return "", err
	}
	defer in.Close()
	h := sha256.New()
	if _, err := io.Copy(h, in); err != nil {
		return "", err
	}
	return hex.EncodeToString(h.Sum(nil)), nil
}
