package python_test

import (
	"encoding/json"
	"fmt"
	"slices"
	"strings"
	"testing"

	"wane/sim/law"
)

// everyQuestion is every question of every role.
var everyQuestion = []string{
	"density", "end", "mass", "birth", "metals", "sort", "live", "die", "remain", "rate", "expose", "divert", "meet",
	"foretell", "wear", "heat", "shine", "merge", "warm",
}

var everyColumn = []string{
	"kind", "place", "origin", "composition", "mass", "birth_mass", "metals", "radius", "u", "e", "log10_date", "log10_age", "log10_since",
	"log10_four_volume", "ln_a", "separation", "eccentricity", "kind_1", "composition_2", "mass_1", "place_2",
}

const mirrorScript = `
import json
import keyword
import sys

import wanelaw
from wanelaw import words

given = json.load(sys.stdin)
print(json.dumps([wanelaw.KINDS, wanelaw.PLACES, wanelaw.ORIGINS, wanelaw.COMPOSITIONS]))
print(json.dumps([[words.is_words(q, c) for c in given["columns"]] for q in given["questions"]]))
out = {}
for process in given["processes"]:
    for frame in False, True:
        card = wanelaw.Card(
            process=process, name="x", version="1", summary="x", frame=frame,
            questions=[wanelaw.Question(q, words=["white-dwarf", "black-hole"] if q in ("die", "divert") else []) for q in given["questions"]],
            clocks=[wanelaw.Clock("close-pass"), wanelaw.Clock("meeting")],
            outcomes=[wanelaw.Outcome("blows-up"), wanelaw.Outcome("collapses")])
        for q in given["questions"]:
            out["%s %s %s" % (process, frame, q)] = " ".join(card.outputs(q))
print(json.dumps(out))
names = given["questions"] + given["columns"] + [c for o in out.values() for c in o.split()]
print(json.dumps(sorted({n for n in names if keyword.iskeyword(n) or not n.isidentifier()})))
`

// TestMirror holds what the kit knows by heart to the contract: words, columns
// of words, the columns of every answer; and the contract's names to what
// Python can call its own.
func TestMirror(t *testing.T) {
	needsNumpy(t)
	var processes []string
	for _, p := range law.Processes {
		processes = append(processes, p.Name)
	}
	in, err := json.Marshal(map[string]any{"processes": processes, "questions": everyQuestion, "columns": everyColumn})
	if err != nil {
		t.Fatal(err)
	}
	lines := strings.Split(strings.TrimSpace(string(python(t, in, "-c", mirrorScript))), "\n")
	if len(lines) != 4 {
		t.Fatalf("%d lines, want 4", len(lines))
	}
	var words [][]string
	var coded [][]bool
	var outputs map[string]string
	var reserved []string
	for i, to := range []any{&words, &coded, &outputs, &reserved} {
		if err := json.Unmarshal([]byte(lines[i]), to); err != nil {
			t.Fatal(err)
		}
	}
	for i, want := range [][]string{law.KindWords, law.PlaceWords, law.OriginWords, law.CompositionWords} {
		if !slices.Equal(words[i], want) {
			t.Errorf("words %v, want %v", words[i], want)
		}
	}
	for i, q := range everyQuestion {
		for j, c := range everyColumn {
			if info, known := law.ColumnNamed(q, c); known && coded[i][j] != (info.Words != "") {
				t.Errorf("question %s, column %s: words %v", q, c, coded[i][j])
			}
		}
	}
	for _, p := range processes {
		for _, frame := range []bool{false, true} {
			c := mirrorCard(p, frame)
			for _, q := range everyQuestion {
				key := fmt.Sprintf("%s %s %s", p, map[bool]string{false: "False", true: "True"}[frame], q)
				if want := strings.Join(c.Outputs(q), " "); outputs[key] != want {
					t.Errorf("%s: outputs %q, want %q", key, outputs[key], want)
				}
			}
		}
	}
	if len(reserved) > 0 {
		t.Errorf("no names for arguments in Python: %v", reserved)
	}
}

// mirrorCard is a card with all that names of columns follow from.
func mirrorCard(process string, frame bool) law.Card {
	c := law.Card{
		Process: process, Frame: frame,
		Clocks:   []law.Clock{{Name: "close-pass"}, {Name: "meeting"}},
		Outcomes: []law.Outcome{{Word: "blows-up"}, {Word: "collapses"}},
	}
	for _, q := range everyQuestion {
		x := law.Question{Name: q}
		if q == "die" || q == "divert" {
			x.Words = []string{"white-dwarf", "black-hole"}
		}
		c.Questions = append(c.Questions, x)
	}
	return c
}
