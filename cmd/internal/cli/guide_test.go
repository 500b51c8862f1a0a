package cli

import (
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"strings"
	"testing"

	"wane/sim/law"
)

// fence is a block of a guide: its language, the file it is if it names one,
// and its text.
var fence = regexp.MustCompile("(?ms)^```([a-z]+)(?: (\\S+))?\n(.*?)^```$")

// The guide for who writes a law is what the program does: its files are
// written, and its commands run, in order, in an empty folder.
func TestGuideIsReal(t *testing.T) {
	needsPython(t)
	text, err := os.ReadFile(filepath.Join("..", "..", "..", "plugins", "outside", "README.md"))
	if err != nil {
		t.Fatal(err)
	}
	t.Chdir(t.TempDir())
	commands := 0
	for _, block := range fence.FindAllStringSubmatch(string(text), -1) {
		language, file, body := block[1], block[2], block[3]
		switch {
		case file != "":
			if err := os.WriteFile(file, []byte(body), 0o666); err != nil {
				t.Fatal(err)
			}
		case language == "console":
			for _, part := range strings.Split("\n"+body, "\n$ ")[1:] {
				commands++
				command, shown, _ := strings.Cut(part, "\n")
				said := carriedOut(t, command)
				if shown != "" && !shows(said, shown) {
					t.Errorf("%s\nprints\n%s\nthe guide shows\n%s", command, said, shown)
				}
			}
		default:
			t.Errorf("a block of %s that nobody tries: %.60s", language, body)
		}
	}
	if commands < 15 {
		t.Errorf("only %d commands were tried", commands)
	}
}

// carriedOut is what a command prints; it must succeed.
func carriedOut(t *testing.T, command string) string {
	t.Helper()
	words := strings.Fields(command)
	if words[0] == "wane" {
		code, out, errs := typed(t, words[1:]...)
		if code != ExitOK {
			t.Errorf("%s: exit code %d\n%s%s", command, code, out, errs)
		}
		return out
	}
	out, err := exec.Command(words[0], words[1:]...).CombinedOutput()
	if err != nil {
		t.Errorf("%s: %v\n%s", command, err, out)
	}
	return string(out)
}

// shows tells whether a text is what is shown of it, where a line of three
// dots stands for any lines.
func shows(text, shown string) bool {
	pattern := regexp.QuoteMeta(strings.TrimRight(shown, "\n"))
	pattern = regexp.MustCompile(`(?m)^\\\.\\\.\\\.\n?`).ReplaceAllString(pattern, `(?s:.*)`)
	return regexp.MustCompile(`\A` + pattern + `\s*\z`).MatchString(text)
}

// The guide names every process and question, and its columns are those of the
// catalogue.
func TestGuideIsWhole(t *testing.T) {
	page, err := os.ReadFile(filepath.Join("..", "..", "..", "plugins", "outside", "README.md"))
	if err != nil {
		t.Fatal(err)
	}
	text := string(page)
	_, asked, _ := strings.Cut(text, "## What is asked")
	for _, p := range law.Processes {
		if !strings.Contains(asked, p.Name) {
			t.Errorf("nothing is said of process %s", p.Name)
		}
	}
	for _, q := range []string{"density", "end", "mass", "birth", "metals", "sort", "live", "die", "remain", "rate", "expose", "divert",
		"meet", "foretell", "wear", "heat", "shine", "merge", "warm"} {
		if !strings.Contains(asked, "`"+q+"`") {
			t.Errorf("nothing is said of question %s", q)
		}
	}
	lines := regexp.MustCompile("(?m)^\\| `(\\w+)` \\| (\\S*) ?\\| ([^|]+) \\|$").FindAllStringSubmatch(asked, -1)
	if len(lines) < 10 {
		t.Errorf("only %d columns are told", len(lines))
	}
	for _, line := range lines {
		info, known := law.ColumnNamed("wear", line[1])
		if !known {
			info, known = law.ColumnNamed("merge", line[1])
		}
		if want := fmt.Sprintf("%s in %s: %s", line[1], info.Unit, info.Doc); !known || want != fmt.Sprintf("%s in %s: %s", line[1], line[2], line[3]) {
			t.Errorf("column %s in %q: %s; the catalogue has %s", line[1], line[2], line[3], want)
		}
	}
}
