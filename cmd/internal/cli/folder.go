package cli

import (
	"errors"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
	"sort"
)

// manifestName is the file by which a run's folder is known.
const manifestName = "manifest.json"

// mayWrite tells whether a run's folder may be written: it does not exist, is
// empty, or, with force, holds an earlier run and nothing else.
func mayWrite(dir string, force bool) error {
	entries, err := os.ReadDir(dir)
	switch {
	case errors.Is(err, fs.ErrNotExist):
		parent := filepath.Dir(filepath.Clean(dir))
		if info, err := os.Stat(parent); err != nil || !info.IsDir() {
			return fmt.Errorf("--out %s: no folder %s to make it in", dir, parent)
		}
		return nil
	case err != nil:
		return fmt.Errorf("--out %s: want a folder that can be written: %w", dir, err)
	case len(entries) == 0:
		return nil
	}
	own := map[string]bool{"summary.txt": true, "summary.json": true, "summary.schema.json": true, manifestName: true}
	for _, e := range entries {
		if !own[e.Name()] {
			return fmt.Errorf("--out %s: holds %s, which no run wrote: want a new folder", dir, e.Name())
		}
	}
	if !force {
		return fmt.Errorf("--out %s: holds an earlier run; --force replaces it", dir)
	}
	return nil
}

// writeFolder writes files into a new folder, whole or not at all: into a
// folder beside it first, which then takes its name.
func writeFolder(dir string, force bool, files map[string][]byte) error {
	if err := mayWrite(dir, force); err != nil {
		return err
	}
	dir = filepath.Clean(dir)
	fresh, err := os.MkdirTemp(filepath.Dir(dir), "."+filepath.Base(dir)+"-new-*")
	if err != nil {
		return fmt.Errorf("--out %s: %w", dir, err)
	}
	defer os.RemoveAll(fresh)
	names := make([]string, 0, len(files))
	for name := range files {
		names = append(names, name)
	}
	sort.Strings(names)
	for _, name := range names {
		if err := writeFile(filepath.Join(fresh, name), files[name]); err != nil {
			return fmt.Errorf("--out %s: %w", dir, err)
		}
	}
	if err := os.Chmod(fresh, 0o755); err != nil {
		return fmt.Errorf("--out %s: %w", dir, err)
	}
	syncFolder(fresh)
	if err := replace(fresh, dir); err != nil {
		return fmt.Errorf("--out %s: %w", dir, err)
	}
	syncFolder(filepath.Dir(dir))
	return nil
}

// replace gives fresh the name of dir. An earlier dir steps aside, and comes
// back when that fails.
func replace(fresh, dir string) error {
	if _, err := os.Stat(dir); errors.Is(err, fs.ErrNotExist) {
		return os.Rename(fresh, dir)
	}
	old := fresh + "-old"
	if err := os.Rename(dir, old); err != nil {
		return err
	}
	if err := os.Rename(fresh, dir); err != nil {
		return errors.Join(err, os.Rename(old, dir))
	}
	return os.RemoveAll(old)
}

func writeFile(name string, data []byte) error {
	f, err := os.OpenFile(name, os.O_WRONLY|os.O_CREATE|os.O_EXCL, 0o644)
	if err != nil {
		return err
	}
	_, err = f.Write(data)
	return errors.Join(err, f.Sync(), f.Close())
}

// syncFolder makes a folder's names last. Where a system cannot sync folders
// there is nothing to be done about it.
func syncFolder(dir string) {
	if f, err := os.Open(dir); err == nil {
		_ = f.Sync()
		f.Close()
	}
}
