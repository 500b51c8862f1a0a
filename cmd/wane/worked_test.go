package main

import (
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"
)

// TestWorkedLaws runs every command that the README of a worked law shows, from
// its folder; runs of galaxies with one realisation.
func TestWorkedLaws(t *testing.T) {
	readmes, err := filepath.Glob("../../plugins/outside/*/README.md")
	if err != nil || len(readmes) < 2 {
		t.Fatalf("%v: want the README of two worked laws (%v)", readmes, err)
	}
	for _, readme := range readmes {
		text, err := os.ReadFile(readme)
		if err != nil {
			t.Fatal(err)
		}
		if strings.Contains(string(text), "python3") {
			needsPython(t)
		}
		commands := 0
		for _, line := range strings.Split(string(text), "\n") {
			words := strings.Fields(line)
			if !strings.HasPrefix(line, "    ") || len(words) < 2 || words[0] != "wane" && words[0] != "/usr/bin/python3" {
				continue
			}
			commands++
			if words[1] == "run" {
				words = append(words, "--realisations", "1")
			}
			cmd := exec.Command(words[0], words[1:]...)
			cmd.Dir = filepath.Dir(readme)
			cmd.Env = append(os.Environ(), "PYTHONDONTWRITEBYTECODE=1")
			if out, err := cmd.CombinedOutput(); err != nil {
				t.Errorf("%s: %s: %v\n%s", readme, strings.TrimSpace(line), err, out)
			}
		}
		if commands < 3 {
			t.Errorf("%s shows %d commands", readme, commands)
		}
	}
}

// needsPython skips a test without what laws in Python need, or fails it where
// nothing may be missing.
func needsPython(t *testing.T) {
	t.Helper()
	if out, err := exec.Command("/usr/bin/python3", "-c", "import numpy, grpc, google.protobuf").CombinedOutput(); err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("needs python3-numpy, python3-grpcio, python3-protobuf: %v\n%s", err, out)
		}
		t.Skipf("needs python3-numpy, python3-grpcio, python3-protobuf: %v", err)
	}
}
