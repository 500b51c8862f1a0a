//go:build linux

package cli

import (
	"os"
	"path/filepath"
	"strings"
	"testing"

	"wane/sim/rpc"
)

// What a path may lead to that is no law: every command says so and ends with
// code 2, and starts nothing.
func TestFaultsOfPaths(t *testing.T) {
	t.Cleanup(func() { noSockets(t, os.TempDir(), os.Getpid()) })
	dir := t.TempDir()
	write := func(name, text string, mode os.FileMode) {
		t.Helper()
		file := filepath.Join(dir, name)
		if err := os.MkdirAll(filepath.Dir(file), 0o755); err != nil {
			t.Fatal(err)
		}
		if err := os.WriteFile(file, []byte(text), mode); err != nil {
			t.Fatal(err)
		}
	}
	write("text", "a law of mine\n", 0o644)
	write("words", "a law of mine\n", 0o755)
	write("script", "#!/no/such/interpreter\n", 0o755)
	write("program", "#!/bin/sh\nexit 0\n", 0o644)
	write("hello", "#!/bin/sh\necho hello\n", 0o755)
	write("quits", "#!/bin/sh\necho no tables >&2\nexit 7\n", 0o755)
	write("empty/notes.txt", "", 0o644)
	write("python/law.toml", "start = [\"/usr/bin/python3.99\", \"law.py\"]\n", 0o644)
	write("python/law.py", "", 0o644)
	write("locked/law.toml", "start = [\"./law\"]\n", 0o644)
	write("locked/law", "#!/bin/sh\n", 0o644)
	write("missing/law.toml", "start = [\"./law\"]\n", 0o644)
	write("nowhere/law.toml", "start = [\"no-such-program\"]\n", 0o644)
	for path, want := range map[string]string{
		"text":    "no law: it is a text file",
		"words":   "it is a text file that names no interpreter in its first line",
		"script":  "its interpreter /no/such/interpreter is missing",
		"program": "not executable (chmod +x makes it so)",
		"hello":   `it is no law, or prints before it serves one: got "hello" on its standard output, which belongs to the protocol`,
		"quits":   "it is no law: it ended before it said where it listens (exit status 7); its log:",
		"empty":   "no law: the folder has no law.toml",
		"python":  "law.toml:1:10: start: no program /usr/bin/python3.99",
		"locked":  "law.toml:1:10: start: ./law is not executable (chmod +x makes it so)",
		"missing": "law.toml:1:10: start: no program ./law",
		"nowhere": "law.toml:1:10: start: no program no-such-program in PATH",
		"gone":    "no such file or folder",
	} {
		full := filepath.Join(dir, path)
		for _, command := range [][]string{append(strings.Fields(lamp), "--law", "evaporation="+full), {"laws", full}, {"ask", full, "mass=10Msun"}} {
			h := wane(t, rpc.Options{}, command...)
			h.mustSay(t, ExitBadInput, soon, full, want)
			if h.out != "" {
				t.Errorf("wane %v printed %q", command, h.out)
			}
		}
	}
}
