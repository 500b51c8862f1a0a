package sim_test

import (
	"os"
	"path/filepath"
	"regexp"
	"sort"
	"strings"
	"testing"

	"wane/sim/law"
	"wane/testdata/published"
)

func processFolders() map[string]bool {
	out := map[string]bool{}
	for _, p := range law.Processes {
		out[strings.ReplaceAll(p.Name, "-", "")] = true
	}
	return out
}

// keys are the keys of the list of sources.
func keys(t *testing.T) map[string]bool {
	t.Helper()
	out := map[string]bool{}
	for _, s := range published.Sources(t) {
		if out[s.Key] {
			t.Errorf("%s: key %s is there twice", published.SourcesFile, s.Key)
		}
		out[s.Key] = true
		if !regexp.MustCompile(`^[A-Z][A-Za-z0-9]+$`).MatchString(s.Key) {
			t.Errorf("%s: key %q: want letters and digits", published.SourcesFile, s.Key)
		}
		if len(s.Reference) < 20 {
			t.Errorf("%s: %s: reference %q is not in full", published.SourcesFile, s.Key, s.Reference)
		}
		if s.DOI != "" && !strings.HasPrefix(s.DOI, "10.") {
			t.Errorf("%s: %s: %q is no DOI", published.SourcesFile, s.Key, s.DOI)
		}
	}
	return out
}

// TestPublishedRows checks the check values: each has a known source, a place
// in it, and a tolerance.
func TestPublishedRows(t *testing.T) {
	known := keys(t)
	for _, file := range published.Files() {
		rows, err := published.Read(file)
		if err != nil {
			t.Error(err)
			continue
		}
		if len(rows) == 0 {
			t.Errorf("%s: no rows", file)
		}
		seen := map[string]string{}
		for _, r := range rows {
			if !known[r.Source] {
				t.Errorf("%s: source %q is not in %s", r.Where(), r.Source, published.SourcesFile)
			}
			if r.Locator == "" {
				t.Errorf("%s: no locator: where in %s does it stand?", r.Where(), r.Source)
			}
			if r.Tol == 0 && r.Kind != "limit" && r.Value != 0 {
				t.Errorf("%s: a tolerance of 0: only an exact limit and a value of 0 have that", r.Where())
			}
			if r.Note == "" && (r.Kind == "recomputed" || r.Kind == "open") {
				t.Errorf("%s: kind %s wants a note: the tool and its digits, or what is open", r.Where(), r.Kind)
			}
			id := r.Kind + " of " + inWords(r)
			if before, again := seen[id]; again {
				t.Errorf("%s: the same inputs as %s", r.Where(), before)
			}
			seen[id] = r.Where()
			if r.Kind == "open" {
				t.Logf("open: %s: %s", r.Where(), r.Note)
			}
		}
	}
}

// inWords is what a row is about, in a fixed order.
func inWords(r published.Row) string {
	var parts []string
	for name, v := range r.Inputs {
		parts = append(parts, name+"="+v)
	}
	sort.Strings(parts)
	return strings.Join(parts, ",") + " from " + r.Source + " " + r.Locator + " in " + r.Unit
}

// TestPublishedFilesAreRun finds files of check values that no test reads.
func TestPublishedFilesAreRun(t *testing.T) {
	var tests strings.Builder
	for _, f := range goFiles(t) {
		if !f.test || strings.HasPrefix(f.path, "testdata/") {
			continue
		}
		text, err := os.ReadFile(filepath.Join(root, filepath.FromSlash(f.path)))
		if err != nil {
			t.Fatal(err)
		}
		tests.Write(text)
	}
	for _, file := range published.Files() {
		if !strings.Contains(tests.String(), `"`+file+`"`) {
			t.Errorf("testdata/published/%s: no test reads it", file)
		}
	}
}

// cited is a key in a comment: [Kroupa2001].
var cited = regexp.MustCompile(`\[([A-Z][A-Za-z]*(?:1[89]|20)[0-9]{2}[A-Za-z0-9]*)\]`)

// TestCitedSourcesAreListed finds keys in comments that no source has.
func TestCitedSourcesAreListed(t *testing.T) {
	known := keys(t)
	for _, f := range goFiles(t) {
		for _, group := range f.tree.Comments {
			for _, m := range cited.FindAllStringSubmatch(group.Text(), -1) {
				if !known[m[1]] {
					t.Errorf("%s: source [%s] is not in %s", f.path, m[1], published.SourcesFile)
				}
			}
		}
	}
}
