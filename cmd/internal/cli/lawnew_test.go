package cli

import (
	"encoding/json"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"
)

func TestLawNew(t *testing.T) {
	t.Chdir(t.TempDir())
	for _, language := range []string{"python", "go"} {
		code, out, errs := typed(t, "law", "new", "iron/in-"+language, "--lang", language, "--json")
		var made madeJSON
		if err := json.Unmarshal([]byte(out), &made); err != nil || code != ExitOK || errs != "" {
			t.Fatalf("exit code %d, %v\n%s\n%s", code, err, out, errs)
		}
		if made.Law != "iron/in-"+language || made.Folder != "./in-"+language {
			t.Errorf("made %+v", made)
		}
		for _, file := range made.Files {
			if _, err := os.Stat(filepath.Join(made.Folder, file)); err != nil {
				t.Error(err)
			}
		}
		for _, want := range []string{"law.toml", "README.md"} {
			if !slices.Contains(made.Files, want) {
				t.Errorf("%v: no %s", made.Files, want)
			}
		}
	}
}

func TestLawNewRefuses(t *testing.T) {
	t.Chdir(t.TempDir())
	if err := os.Mkdir("taken", 0o777); err != nil {
		t.Fatal(err)
	}
	for _, x := range []struct{ words, says string }{
		{"evaporation/taken --lang python", "taken is there already"},
		{"evaportion/mine --lang python", `did you mean "evaporation"`},
		{"evaporation/Mine --lang go", "want lower-case letters"},
		{"evaporation/../mine --lang go", "want lower-case letters"},
		{"evaporation --lang go", "want process/name"},
		{"evaporation/mine", "--lang go or --lang python"},
		{"evaporation/mine --lang cobol", "want one of go, python"},
		{"", "want one process/name"},
	} {
		code, out, errs := typed(t, append([]string{"law", "new"}, strings.Fields(x.words)...)...)
		if code != ExitBadInput || out != "" || !strings.Contains(errs, x.says) {
			t.Errorf("law new %s: exit code %d, want to hear %q\n%s%s", x.words, code, x.says, out, errs)
		}
	}
	left, err := os.ReadDir(".")
	if err != nil || len(left) != 1 {
		t.Errorf("left behind: %v, %v", left, err)
	}
}
