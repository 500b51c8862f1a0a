package cli

import (
	"os"
	"path/filepath"
	"strings"
	"testing"
)

func files(text string) map[string][]byte {
	return map[string][]byte{"summary.txt": []byte(text), manifestName: []byte("{}")}
}

func content(t *testing.T, dir string) string {
	t.Helper()
	data, err := os.ReadFile(filepath.Join(dir, "summary.txt"))
	if err != nil {
		t.Fatal(err)
	}
	return string(data)
}

func TestWriteFolder(t *testing.T) {
	parent := t.TempDir()
	dir := filepath.Join(parent, "run")
	if err := writeFolder(dir, false, files("first")); err != nil {
		t.Fatal(err)
	}
	if err := writeFolder(dir, false, files("second")); err == nil || !strings.Contains(err.Error(), "--force") {
		t.Errorf("an earlier run is replaced without force: %v", err)
	}
	if got := content(t, dir); got != "first" {
		t.Errorf("the folder holds %q after a refusal", got)
	}
	if err := writeFolder(dir, true, files("third")); err != nil {
		t.Fatal(err)
	}
	if got := content(t, dir); got != "third" {
		t.Errorf("the folder holds %q, want the third run", got)
	}
	only(t, parent, "run")
}

// only fails when anything else is left in a folder.
func only(t *testing.T, parent string, names ...string) {
	t.Helper()
	entries, err := os.ReadDir(parent)
	if err != nil {
		t.Fatal(err)
	}
	for _, e := range entries {
		if !contains(names, e.Name()) {
			t.Errorf("%s is left behind", e.Name())
		}
	}
}

func TestWriteFolderRefuses(t *testing.T) {
	parent := t.TempDir()
	file, foreign := filepath.Join(parent, "file"), filepath.Join(parent, "foreign")
	if err := os.WriteFile(file, []byte("kept"), 0o644); err != nil {
		t.Fatal(err)
	}
	if err := os.Mkdir(foreign, 0o755); err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(filepath.Join(foreign, "thesis.tex"), nil, 0o644); err != nil {
		t.Fatal(err)
	}
	for _, dir := range []string{file, foreign, filepath.Join(parent, "missing", "run")} {
		if err := writeFolder(dir, true, files("x")); err == nil {
			t.Errorf("%s was written", dir)
		}
	}
	only(t, parent, "file", "foreign")
}

// A file that cannot be written leaves nothing behind, and the earlier run.
func TestWriteFolderIsWholeOrNot(t *testing.T) {
	parent := t.TempDir()
	dir := filepath.Join(parent, "run")
	if err := writeFolder(dir, false, files("first")); err != nil {
		t.Fatal(err)
	}
	broken := files("second")
	broken[filepath.Join("no", "such", "folder")] = nil
	if err := writeFolder(dir, true, broken); err == nil {
		t.Fatal("a file in a folder that does not exist was written")
	}
	if got := content(t, dir); got != "first" {
		t.Errorf("the folder holds %q, want the first run", got)
	}
	only(t, parent, "run")
}
