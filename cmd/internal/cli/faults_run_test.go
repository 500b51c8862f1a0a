//go:build linux

package cli

import (
	"bytes"
	"encoding/json"
	"fmt"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"
	"time"

	"wane/sim/rpc"
)

const (
	lamp = "run little-lamp --realisations 2 --objects 500"
	soon = 20 * time.Second // on a machine with much else to do
)

// A run ends with code 1 when a law fails in it, with 2 when it cannot begin,
// and says why: the law as the person called it, the question, the row, the
// object, the value, what is allowed, and the end of the law's log.
func TestFaultsInRuns(t *testing.T) {
	t.Cleanup(func() { noSockets(t, os.TempDir(), os.Getpid()) })
	quick := rpc.Options{Starting: 2 * time.Second, Describing: 500 * time.Millisecond, Answering: time.Second, Ending: time.Second}
	for _, x := range []struct {
		fault, id string
		code      int
		words     []string
	}{
		{"exit:3", "evaporation/page", ExitBadInput, []string{"wane: --law evaporation: law MINE: it is no law: it ended before it said where it listens (exit status 3)", "the tables are not where they were"}},
		{"silent", "evaporation/page", ExitBadInput, []string{"law MINE: it is no law, or starts too slowly: no word from it within 2s", "reading the tables"}},
		{"prints-first", "evaporation/page", ExitBadInput, []string{"law MINE: ", `got "loading the tables ..." on its standard output`}},
		{"protocol-99", "evaporation/page", ExitBadInput, []string{"it speaks version 99 of the protocol, this program speaks version 1"}},
		{"describe-hang", "evaporation/page", ExitBadInput, []string{"law MINE: asked for its card: no answer within 500ms", "looking for the card"}},
		{"newer", "evaporation/page", ExitBadInput, []string{"law MINE (evaporation/page): its card cannot be used:", "written for contract 2", `"shared-columns"`, `"tides"`}},
		{"bad-card", "evaporation/page", ExitBadInput, []string{"parameter k: preset 4 outside 0 .. 3", "parameter tau: no citation", `unknown column "colour"`}},
		{"serves", "ejection/contracting", ExitBadInput, []string{"--law evaporation: MINE is ejection/contracting, a law of process ejection"}},

		{"crash", "evaporation/page", ExitFailed, []string{"law MINE (evaporation/page): question ", ": batch ", " rows: its process ended (exit status 3); it had been started again 2 times before; its log:", "a table has a hole in it"}},
		{"crash:2", "evaporation/page", ExitFailed, []string{"law MINE (evaporation/page)", "it had been started again 2 times before"}},
		{"exit-0:2", "evaporation/page", ExitFailed, []string{"its process ended (exit status 0)", "good night"}},
		{"killed", "evaporation/page", ExitFailed, []string{"its process ended (signal: killed): did it run out of memory?", "eating"}},
		{"hang", "evaporation/page", ExitFailed, []string{"no answer within 1s", "thinking"}},
		{"panic", "evaporation/page", ExitFailed, []string{"law MINE (evaporation/page): question ", ": panic: runtime error: index out of range", "at acts.go:"}},
		{"seq", "evaporation/page", ExitFailed, []string{"an answer to batch ", ", want one to batch ", "made by hand"}},
		{"short", "evaporation/page", ExitFailed, []string{"rows, want ", "rows of 8 bytes"}},
		{"value:log10_temperature:NaN:0", "evaporation/page", ExitFailed, []string{"law MINE (evaporation/page): question heat, row 0 (mass ", " solMass): log10_temperature: got NaN, want a number or -Inf (zero)"}},
		{"value:wait:-Inf:0", "lifetime/table", ExitFailed, []string{"law MINE (lifetime/table): question live, row 0 (mass ", "wait: got -Inf, want a number or +Inf (never)"}},
		{"scale:mass:9", "remnant/cummings", ExitFailed, []string{"law MINE (remnant/cummings): question remain, row ", " solMass, want no more than the ", " solMass there was"}},
		{"heavy", "remnant/cummings", ExitFailed, []string{"law MINE (remnant/cummings): question remain, row ", " (star, ", " Msun): mass: got 900 Msun left, want no more than it had"}},
		{"value:mass:-1:0", "mass-function/kroupa", ExitFailed, []string{"question mass, row 0 (u ", "mass: got -1, want a finite number > 0"}},
		{"mirror", "mass-function/kroupa", ExitFailed, []string{"law MINE (mass-function/kroupa): question mass, row 1 (u ", "want a quantile, which never falls as u rises"}},
		{"mirror", "star-formation/exponential", ExitFailed, []string{"question birth, row 1 (u ", "want a quantile"}},
		{"falls:log10_hazard", "vacuum-decay/steady", ExitFailed, []string{"law MINE (vacuum-decay/steady): question end, row ", "want a hazard that never falls"}},
		{"value:log10_rate_ejection:+Inf:0", "ejection/contracting", ExitFailed, []string{"law MINE (ejection/contracting): question rate, row 0 (", "got +Inf, want a number or -Inf (zero)"}},
		{"by-order", "lifetime/table", ExitFailed, []string{"law MINE (lifetime/table): question live: row ", "when asked again with other rows, want the same for the same row"}},
		{"by-count", "star-formation/exponential", ExitFailed, []string{"question birth: row ", "when asked again with other rows"}},
	} {
		t.Run(x.id+"/"+x.fault, func(t *testing.T) {
			t.Parallel()
			mine := newBadLaw(t, x.fault, x.id)
			process, _, _ := strings.Cut(x.id, "/")
			if x.fault == "serves" {
				process = "evaporation"
			}
			h := wane(t, quick, append(strings.Fields(lamp), "--quiet", "--law", process+"="+mine.path)...)
			for i, w := range x.words {
				x.words[i] = strings.ReplaceAll(w, "MINE", mine.path)
			}
			h.mustSay(t, x.code, soon, x.words...)
			if h.out != "" {
				t.Errorf("printed %q", h.out)
			}
			mine.gone(t, 0)
		})
	}
}

// A run in which a law is lost and comes back has the bytes of one without
// fault, and says that it happened.
func TestFaultsHealedInRuns(t *testing.T) {
	t.Cleanup(func() { noSockets(t, os.TempDir(), os.Getpid()) })
	answers := func(out string) string { // without who answered
		var all map[string]json.RawMessage
		if err := json.Unmarshal([]byte(out), &all); err != nil {
			t.Fatalf("%v in\n%s", err, out)
		}
		delete(all, "outside")
		var text bytes.Buffer
		if err := json.NewEncoder(&text).Encode(all); err != nil {
			t.Fatal(err)
		}
		return text.String()
	}
	args := slices.Clip(append(strings.Fields(lamp), "--json", "--workers", "2"))
	want := wane(t, rpc.Options{}, append(args, "--law", "evaporation=page")...)
	want.mustSay(t, ExitOK, soon)
	for _, fault := range []string{"none", "deaf", "offspring", "crash:3:1", "crash:2:2", "exit-0:3:1", "killed:1:1", "hang:2:1", "stop:2:1", "flood:2", "print:2"} {
		t.Run(fault, func(t *testing.T) {
			t.Parallel()
			mine := newBadLaw(t, fault, "evaporation/page")
			h := wane(t, rpc.Options{Answering: time.Second}, append(args, "--law", "evaporation="+mine.path)...)
			words := []string{}
			if strings.Contains(fault, ":1") || strings.HasSuffix(fault, ":2:2") {
				words = append(words, "wane: warning: law "+mine.path+" (evaporation/page) ended in the run and was started again, ")
			}
			h.mustSay(t, ExitOK, soon, words...)
			if h.code == ExitOK && answers(h.out) != answers(want.out) {
				t.Error("other answers than without the fault")
			}
			mine.gone(t, 0)
		})
	}
}

// A law whose files are replaced while it runs goes on as what it was; but it
// is not started again as something else.
func TestFaultsOfReplacedFiles(t *testing.T) {
	t.Cleanup(func() { noSockets(t, os.TempDir(), os.Getpid()) })
	for then, words := range map[string][]string{
		"nothing": nil,
		"crash":   {"its process ended (exit status 3); starting it again: law MINE has changed: its digest was sha256:", " and is sha256:", "it was not started again"},
	} {
		mine := newBadLaw(t, "replaces:law.toml:"+then, "evaporation/page")
		code := ExitOK
		if words != nil {
			code = ExitFailed
		}
		for i, w := range words {
			words[i] = strings.ReplaceAll(w, "MINE", mine.path)
		}
		out := filepath.Join(t.TempDir(), "out")
		h := wane(t, rpc.Options{}, append(strings.Fields(lamp), "--out", out, "--law", "evaporation="+mine.path)...)
		h.mustSay(t, code, soon, words...)
		mine.gone(t, 0)
		if data, err := os.ReadFile(filepath.Join(out, manifestName)); code == ExitOK {
			_, digest, _ := strings.Cut(h.said, mine.path+", ")
			digest, _, _ = strings.Cut(digest, "\n")
			if err != nil || !strings.HasPrefix(digest, "sha256:") || !bytes.Contains(data, []byte(digest)) {
				t.Errorf("the manifest does not hold the digest %q of what ran: %v", digest, err)
			}
		}
	}
}

// The program itself is a file of the law, too.
func TestFaultsOfReplacedProgram(t *testing.T) {
	mine := newBadLaw(t, "serves", "evaporation/page")
	data, err := os.ReadFile(program(t, "faulty"))
	if err == nil {
		err = os.WriteFile(filepath.Join(mine.path, "law"), data, 0o755)
	}
	if err == nil {
		start := fmt.Sprintf("start = [\"./law\", \"replaces:law:killed\", \"evaporation/page\", %q]\n", mine.state)
		err = os.WriteFile(filepath.Join(mine.path, "law.toml"), []byte(start), 0o644)
	}
	if err != nil {
		t.Fatal(err)
	}
	h := wane(t, rpc.Options{}, append(strings.Fields(lamp), "--law", "evaporation="+mine.path)...)
	_, digest, _ := strings.Cut(h.said, mine.path+", ")
	digest, _, _ = strings.Cut(digest, "\n")
	h.mustSay(t, ExitFailed, soon, "its process ended (signal: killed)", "starting it again: law "+mine.path+" has changed: its digest was "+digest+" and is sha256:")
	mine.gone(t, 0)
}

// A process has one law.
func TestFaultsOfTwoLaws(t *testing.T) {
	one, other := newBadLaw(t, "none", "evaporation/page"), newBadLaw(t, "none", "evaporation/black-body")
	h := wane(t, rpc.Options{}, append(strings.Fields(lamp), "--law", "evaporation="+one.path, "--law", "evaporation="+other.path)...)
	h.mustSay(t, ExitBadInput, soon, "wane: --law evaporation: given twice: a run has one law of each process")
	one.gone(t, 0)
	other.gone(t, 0)
}
