package cli

import (
	"encoding/json"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"

	"wane/sim/law"
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

// The commands on the page of a new law do what they say, for every process:
// it is shown, asked, and takes part in a galaxy.
func TestNewLawsRun(t *testing.T) {
	needsPython(t)
	for _, process := range law.Processes {
		if process.Name != "evaporation" && os.Getenv("WANE_REQUIRE") != "1" {
			continue // they take a minute
		}
		t.Run(process.Name, func(t *testing.T) {
			page, err := os.ReadFile(filepath.Join(newFolder(t, process.Name+"/my-own", "python"), "README.md"))
			if err != nil {
				t.Fatal(err)
			}
			tried := 0
			for line := range strings.Lines(string(page)) {
				command, ok := strings.CutPrefix(strings.TrimSpace(line), "wane ")
				if !ok || !strings.HasPrefix(line, "    ") || strings.HasPrefix(command, "law check") { // that is tried beside the templates
					continue
				}
				words := strings.Fields(command)
				if words[0] == "run" {
					words = append(words, "--objects", "1e4", "--realisations", "1")
				}
				tried++
				if code, out, errs := typed(t, words...); code != ExitOK || out == "" {
					t.Errorf("wane %s: exit code %d\n%s", strings.Join(words, " "), code, errs)
				}
			}
			if tried < 2 {
				t.Errorf("only %d commands on the page", tried)
			}
		})
	}
}
