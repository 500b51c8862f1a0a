package folder

import (
	"os"
	"path/filepath"
	"strings"
	"testing"
)

// made makes a folder of files; a name that ends in * is executable.
func made(t *testing.T, files map[string]string) string {
	t.Helper()
	dir, err := filepath.EvalSymlinks(t.TempDir())
	if err != nil {
		t.Fatal(err)
	}
	for name, text := range files {
		mode := os.FileMode(0o644)
		if bare, ok := strings.CutSuffix(name, "*"); ok {
			name, mode = bare, 0o755
		}
		full := filepath.Join(dir, filepath.FromSlash(name))
		if err := os.MkdirAll(filepath.Dir(full), 0o755); err != nil {
			t.Fatal(err)
		}
		if err := os.WriteFile(full, []byte(text), mode); err != nil {
			t.Fatal(err)
		}
	}
	return dir
}

func TestReadFaults(t *testing.T) {
	for _, c := range []struct {
		what, path string
		files      map[string]string
		want       string // DIR stands for the folder
	}{
		{"nothing there", "x", nil, "DIR/x: no such file or folder: want a law's folder or an executable file"},
		{"a folder without law.toml", ".", map[string]string{"law.py": ""}, "DIR: no law: the folder has no law.toml (wane law new makes one)"},
		{"a text file", "x", map[string]string{"x": "mass 10\n"}, "DIR/x: no law: it is a text file (want a law's folder or an executable file)"},
		{"an executable text file", "x", map[string]string{"x*": "mass 10\n"}, "DIR/x: no law: it is a text file that names no interpreter in its first line"},
		{"a script that is not executable", "x", map[string]string{"x": "#!/bin/sh\n"}, "DIR/x: not executable (chmod +x makes it so)"},
		{"an empty file", "x", map[string]string{"x*": ""}, "DIR/x: no law: the file is empty"},
		{"a missing interpreter", "x", map[string]string{"x*": "#!/opt/no/python3\n"}, "DIR/x: its interpreter /opt/no/python3 is missing"},
		{"a missing interpreter by env", "x", map[string]string{"x*": "#!/usr/bin/env no-python\n"}, "DIR/x: its interpreter no-python is missing: it is not in PATH"},
		{"all faults at once", ".", map[string]string{"law.toml": "nmae = \"a/b\"\nname = 3\nstart = \"law.py\"\nfiles = [\"../x\", \"/etc/*\", \"a//b\", \"[\", 7, \".built/x\"]\n[more]\nstart = 1\n"},
			`DIR/law.toml:1:1: unknown key "nmae" (known: name, start, files, build)
DIR/law.toml:2:8: name: want a text, such as "evaporation/my-burden"
DIR/law.toml:3:9: start: want a list of texts, such as ["/usr/bin/python3", "law.py"]
DIR/law.toml:4:10: files: "../x": leads outside the law's folder
DIR/law.toml:4:18: files: "/etc/*": leads outside the law's folder: want a path from it
DIR/law.toml:4:28: files: "a//b": want names between single slashes
DIR/law.toml:4:36: files: "[": a bracket is not closed
DIR/law.toml:4:41: files: want a list of texts, such as ["/usr/bin/python3", "law.py"]
DIR/law.toml:4:44: files: ".built/x": what is built is no source: the digest covers what it is built from
DIR/law.toml:5:2: unknown table "more": a law.toml has none (known keys: name, start, files, build)`},
		{"slips of syntax hide nothing", ".", map[string]string{"law.toml": "name = evaporation/x\nstart = [\"/bin/sh\"\nstop = []\n"},
			"DIR/law.toml:1:8: unexpected character U+0065 'e' at start of value\nDIR/law.toml:3:1: expected ',' or ']' after array value"},
		{"no start", ".", map[string]string{"law.toml": "name = \"evaporation/x\"\n"},
			`DIR/law.toml:1:1: start is not given: want what starts the law, such as start = ["/usr/bin/python3", "law.py"]`},
		{"no such program", ".", map[string]string{"law.toml": "start = [\"./law\"]\n"}, `DIR/law.toml:1:10: start: no program ./law`},
		{"a program of the folder without its slash", ".", map[string]string{"law.toml": "start = [\"my-own-law\"]\n", "my-own-law*": "#!/bin/sh\n"},
			`DIR/law.toml:1:10: start: no program my-own-law in PATH (that of the folder is written ./my-own-law)`},
		{"an interpreter that is missing", ".", map[string]string{"law.toml": "start = [\"/opt/no/python3\", \"law.py\"]\n"}, `DIR/law.toml:1:10: start: no program /opt/no/python3`},
		{"a program that is not executable", ".", map[string]string{"law.toml": "start = [\"./law\"]\n", "law": "#!/bin/sh\n"},
			`DIR/law.toml:1:10: start: ./law is not executable (chmod +x makes it so)`},
		{"a program outside", ".", map[string]string{"law.toml": "start = [\"../law\"]\n"},
			"DIR/law.toml:1:10: start: no program ../law\nDIR/law.toml:1:10: start: ../law leads outside the law's folder"},
		{"to be built, but how", ".", map[string]string{"law.toml": "start = [\".built/law\"]\n"},
			`DIR/law.toml:1:10: start: .built/law is to be built, but build does not say how`},
		{"no text", ".", map[string]string{"law.toml": "start = \x00"}, `DIR/law.toml:1:9: the file is no text: it holds the byte 0x00`},
	} {
		dir := made(t, c.files)
		_, err := Read(filepath.Join(dir, c.path))
		if err == nil {
			t.Errorf("%s: no fault", c.what)
			continue
		}
		if got := strings.ReplaceAll(err.Error(), dir, "DIR"); got != c.want {
			t.Errorf("%s: got\n%s\nwant\n%s", c.what, got, c.want)
		}
	}
}

// digestOf reads a folder and takes its digest.
func digestOf(t *testing.T, dir string) (string, []string) {
	t.Helper()
	f, err := Read(dir)
	if err != nil {
		t.Fatal(err)
	}
	sum, files, err := f.Digest()
	if err != nil {
		t.Fatal(err)
	}
	var names []string
	for _, x := range files {
		names = append(names, x.Path)
	}
	return sum, names
}

const shellToml = "start = [\"/bin/sh\", \"law.sh\"]\n"

// The digest is a convention of its own; this one was made by sha256sum:
// printf 'law.sh\0%s\nlaw.toml\0%s\n' $(sha256sum law.sh law.toml) | sha256sum
func TestDigestFrozen(t *testing.T) {
	sum, _ := digestOf(t, made(t, map[string]string{"law.toml": shellToml, "law.sh": "exit\n"}))
	if want := "sha256:4717b57bca26518be6938326272eaf0beda99dfaf63d7b953b38d702c62cfacc"; sum != want {
		t.Errorf("got %s, want %s", sum, want)
	}
}

func TestDigestCovers(t *testing.T) {
	files := map[string]string{
		"law.toml": shellToml, "law.sh": "exit\n", "data/a.csv": "1", "data/deep/b.csv": "2", "README.md": "hello",
		"__pycache__/law.pyc": "x", "kit/__pycache__/y.pyc": "x", ".built/law": "x", ".git/HEAD": "x", "law.sh~": "x", "loose.pyc": "x",
	}
	for _, c := range []struct{ toml, want string }{
		{shellToml, "README.md data/a.csv data/deep/b.csv law.sh law.toml loose.pyc"},
		{shellToml + `files = ["law.sh"]`, "law.sh law.toml loose.pyc"},
		{shellToml + `files = ["law.sh", "data/*.csv"]`, "data/a.csv law.sh law.toml loose.pyc"},
		{shellToml + `files = ["law.*", "data/**"]`, "data/a.csv data/deep/b.csv law.sh law.toml loose.pyc"},
		{shellToml + `files = ["law.sh", "**/b.csv"]`, "data/deep/b.csv law.sh law.toml loose.pyc"},
	} {
		files["law.toml"] = c.toml
		if _, names := digestOf(t, made(t, files)); strings.Join(names, " ") != c.want {
			t.Errorf("%s: covers %v, want %s", c.toml, names, c.want)
		}
	}
}

// Each change of what is covered changes the digest, and nothing else does.
func TestDigestChanges(t *testing.T) {
	base := map[string]string{"law.toml": shellToml + "files = [\"law.sh\", \"data/*\"]\n", "law.sh": "exit\n", "data/a": "1", "notes": "n"}
	before, _ := digestOf(t, made(t, base))
	for _, c := range []struct {
		name, text string
		changes    bool
	}{
		{"law.sh", "exit 1\n", true}, {"data/a", "2", true}, {"data/b", "", true}, {"law.toml", base["law.toml"] + "# x\n", true},
		{"numpy.py", "", true}, {"notes", "m", false}, {"__pycache__/law.pyc", "x", false},
	} {
		files := map[string]string{}
		for k, v := range base {
			files[k] = v
		}
		files[c.name] = c.text
		if after, _ := digestOf(t, made(t, files)); (after != before) != c.changes {
			t.Errorf("%s: digest changes: %v, want %v", c.name, after != before, c.changes)
		}
	}
}

func TestDigestFaults(t *testing.T) {
	binary := testBinary(t)
	for _, c := range []struct {
		what  string
		files map[string]string
		links map[string]string
		want  string
	}{
		{"a link outside", map[string]string{"law.toml": shellToml, "law.sh": ""}, map[string]string{"data": "/etc/passwd"},
			"DIR/data: a link that leads outside the law's folder, to /etc/passwd"},
		{"a folder outside", map[string]string{"law.toml": shellToml, "law.sh": ""}, map[string]string{"data": "/etc"},
			"DIR/data: a link that leads outside the law's folder, to /etc"},
		{"a link to nowhere", map[string]string{"law.toml": shellToml, "law.sh": ""}, map[string]string{"data": "nowhere"},
			"DIR/data: a link to nowhere"},
		{"a glob for nothing", map[string]string{"law.toml": shellToml + "files = [\"law.sh\", \"x/*\"]\n", "law.sh": ""}, nil,
			"DIR/law.toml:2:20: files: \"x/*\": no such file in the folder"},
		{"what start runs is left out", map[string]string{"law.toml": shellToml + "files = [\"a\"]\n", "a": "", "law.sh": ""}, nil,
			"DIR/law.toml:1:21: start: law.sh is not among files: want a digest that covers it"},
		{"a script outside", map[string]string{"law.toml": "start = [\"/bin/sh\", \"" + binary + "\"]\n"}, nil,
			"DIR/law.toml:1:21: start: " + binary + " lies outside what the digest covers: want a file of the folder, without the folder's path"},
	} {
		dir := made(t, c.files)
		for name, to := range c.links {
			if err := os.Symlink(to, filepath.Join(dir, name)); err != nil {
				t.Fatal(err)
			}
		}
		f, err := Read(dir)
		if err != nil {
			t.Fatal(err)
		}
		_, _, err = f.Digest()
		if err == nil || strings.ReplaceAll(err.Error(), dir, "DIR") != c.want {
			t.Errorf("%s: got %v, want %s", c.what, err, c.want)
		}
	}
}

// A link within the folder is as good as what it leads to.
func TestLinkWithin(t *testing.T) {
	dir := made(t, map[string]string{"law.toml": shellToml, "law.sh": "", "data/a": "1"})
	for name, to := range map[string]string{"b": "data/a", "more": "data"} {
		if err := os.Symlink(to, filepath.Join(dir, name)); err != nil {
			t.Fatal(err)
		}
	}
	if _, names := digestOf(t, dir); strings.Join(names, " ") != "b data/a law.sh law.toml more" {
		t.Errorf("covers %v", names)
	}
}

// The law.toml may be named instead of its folder, and the folder by a link.
func TestReadByOtherNames(t *testing.T) {
	dir := made(t, map[string]string{"law.toml": shellToml, "law.sh": ""})
	link := filepath.Join(t.TempDir(), "link")
	if err := os.Symlink(dir, link); err != nil {
		t.Fatal(err)
	}
	for _, path := range []string{dir, dir + "/", filepath.Join(dir, "law.toml"), link} {
		if f, err := Read(path); err != nil || f.Dir != dir {
			t.Errorf("%s: %+v, %v", path, f, err)
		}
	}
}
