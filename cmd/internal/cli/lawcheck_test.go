package cli

import (
	"bytes"
	"encoding/json"
	"os"
	"os/exec"
	"path/filepath"
	"slices"
	"strings"
	"testing"

	"wane/sim/rpc/conform"
)

// needsPython skips a laptop without the packages that a law in Python needs,
// and fails where everything must be there.
func needsPython(t *testing.T) {
	t.Helper()
	if out, err := exec.Command("/usr/bin/python3", "-c", "import numpy, grpc, google.protobuf").CombinedOutput(); err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("python3-numpy, python3-grpcio and python3-protobuf: %v\n%s", err, out)
		}
		t.Skip("no python3-numpy, python3-grpcio and python3-protobuf")
	}
}

// typed runs the program as a person does.
func typed(t *testing.T, words ...string) (code int, out, errs string) {
	t.Helper()
	var o, e bytes.Buffer
	p := Standard()
	p.Out, p.Err = &o, &e
	code = p.Main(words)
	return code, o.String(), e.String()
}

// newFolder begins a law in an empty folder, which becomes the present one.
func newFolder(t *testing.T, id, language string) string {
	t.Helper()
	t.Chdir(t.TempDir())
	if code, _, errs := typed(t, "law", "new", id, "--lang", language); code != ExitOK {
		t.Fatalf("law new: exit code %d: %s", code, errs)
	}
	_, name, _ := strings.Cut(id, "/")
	return "./" + name
}

// A new law passes, in text and in JSON.
func TestLawCheckPasses(t *testing.T) {
	needsPython(t)
	folder := newFolder(t, "evaporation/my-burden", "python")
	code, out, errs := typed(t, "law", "check", folder)
	if code != ExitOK || !strings.Contains(out, "evaporation/my-burden, version 1, from ./my-burden") ||
		!strings.Contains(out, "\nfit to be used in a run: no failure, no warning\n") || errs != "" {
		t.Errorf("exit code %d\n%s\n%s", code, out, errs)
	}
	for line := range strings.Lines(out) {
		if strings.HasPrefix(line, "warn") || strings.HasPrefix(line, "fail") {
			t.Error(line)
		}
	}
	code, out, _ = typed(t, "law", "check", folder, "--json")
	var told checkedJSON
	if err := json.Unmarshal([]byte(out), &told); err != nil {
		t.Fatalf("%v: %s", err, out)
	}
	if code != ExitOK || !told.Fit || told.Law != "evaporation/my-burden" || !strings.HasPrefix(told.Digest, "sha256:") ||
		!strings.Contains(told.Runtime, "numpy") || len(told.Findings) < 20 {
		t.Errorf("exit code %d: %+v", code, told)
	}
}

// A law with one fault fails that check, in a process of its own as in ours.
func TestLawCheckFails(t *testing.T) {
	needsPython(t)
	folder := newFolder(t, "evaporation/my-burden", "python")
	file := filepath.Join(folder, "law.py")
	sound, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	const heat, wear = "    return log10(6.17026e-8) - log10(mass)\n", "    return -2 * log10(mass) - log10(3) - p.lifetime, 0.0\n"
	for _, x := range []struct{ name, old, new, check, says string }{
		{"impure", heat, "    heat.asked = getattr(heat, 'asked', 0) + 1\n    return log10(6.17026e-8) - log10(mass) + 1e-9 * heat.asked\n", "pure", "asked twice"},
		{"looks at other rows", heat, "    return log10(6.17026e-8) - log10(mass) + 1e-9 * mass.sum() / (1 + mass.sum())\n", "rows", "in pieces of 1"},
		{"sorts", heat, "    import numpy as np\n    return np.sort(log10(6.17026e-8) - log10(mass))\n", "order", "the same values in other rows"},
		{"NaN in a corner", wear, "    return -log10(mass * mass) - log10(3) - p.lifetime + 0 / (mass * mass), 0.0\n", "domain", "NaN"},
		{"a wrong foretell", "3 * log10(mass)", "2.9 * log10(mass)", "foretell", "worn down in"},
		{"an exception", heat, "    raise ValueError('bad physics')\n", "answer", "bad physics"},
		{"a wrong unit", `("heat", ["mass"])`, `("heat", [("mass", "kg")])`, "units", `unit "kg", want "solMass"`},
		{"a card with two faults", `sources=["Hawking`, `effect="none", sources=[]and["Hawking`, "card", "no source"},
		{"dies", heat, "    import os\n    os._exit(3)\n", "answer", "exit"},
		{"ends in the start", "import wanelaw\n", "import sys\nsys.exit('no data file')\nimport wanelaw\n", "start", "no data file"},
	} {
		t.Run(x.name, func(t *testing.T) {
			if !bytes.Contains(sound, []byte(x.old)) {
				t.Fatalf("law.py has no %q", x.old)
			}
			spoilt := bytes.Replace(sound, []byte(x.old), []byte(x.new), 1)
			if err := os.WriteFile(file, spoilt, 0o666); err != nil {
				t.Fatal(err)
			}
			code, out, errs := typed(t, "law", "check", folder, "--json")
			var told checkedJSON
			if err := json.Unmarshal([]byte(out), &told); err != nil {
				t.Fatalf("%v: %s %s", err, out, errs)
			}
			found := slices.ContainsFunc(told.Findings, func(f conform.Finding) bool {
				return f.Check == x.check && f.Level == conform.Fail && strings.Contains(f.Text, x.says) && f.Advice != ""
			})
			if code != ExitCheckFails || told.Fit || !found {
				t.Errorf("exit code %d, want check %s to say %q, got %s", code, x.check, x.says, out)
			}
		})
	}
}

func TestLawCheckRefuses(t *testing.T) {
	t.Chdir(t.TempDir())
	if err := os.Mkdir("empty", 0o777); err != nil {
		t.Fatal(err)
	}
	for _, x := range []struct {
		words []string
		code  int
		says  string
	}{
		{[]string{"law", "check", "./nowhere"}, ExitBadInput, "./nowhere: no such file or folder"},
		{[]string{"law", "check"}, ExitBadInput, "want one path"},
		{[]string{"law", "chekc"}, ExitBadInput, `did you mean "check"`},
		{[]string{"law", "check", "./empty"}, ExitCheckFails, "the folder has no law.toml"},
		{[]string{"law", "check", "./empty", "--quiet"}, ExitCheckFails, "the folder has no law.toml"},
	} {
		code, out, errs := typed(t, x.words...)
		if code != x.code || !strings.Contains(strings.Join(strings.Fields(out+errs), " "), x.says) {
			t.Errorf("%v: exit code %d, want %d\n%s%s", x.words, code, x.code, out, errs)
		}
	}
}
