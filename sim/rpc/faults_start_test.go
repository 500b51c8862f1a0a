//go:build linux

package rpc_test

import (
	"bytes"
	"context"
	"errors"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"
	"time"

	"wane/sim/rpc"
)

const soon = 5 * time.Second // on a machine with much else to do

// Faults before the first answer: the message says what happened, at once or
// within the deadline.
func TestFaultsOfStarting(t *testing.T) {
	leavesNothing(t)
	shortly := func(o *rpc.Options) { o.Starting = 300 * time.Millisecond }
	for _, x := range []struct {
		fault string
		set   func(*rpc.Options)
		limit time.Duration
		words []string
	}{
		{"exit:3", nil, soon, []string{"it is no law: it ended before it said where it listens (exit status 3)", "the tables are not where they were"}},
		{"exit:0", nil, soon, []string{"it ended before it said where it listens (exit status 0)", "the tables are not where they were"}},
		{"panics-at-start", nil, soon, []string{"(exit status 2)", "its log:", "panic: the tables are empty"}},
		{"silent", shortly, soon, []string{"no word from it within 300ms", "reading the tables"}},
		{"prints-first", nil, soon, []string{`got "loading the tables ..." on its standard output, which belongs to the protocol`}},
		{"prints-bytes", nil, soon, []string{"on its standard output, which belongs to the protocol"}},
		{"prints-endlessly", shortly, soon, []string{"it closed its standard output, or printed there what is no line"}},
		{"other-cookie", nil, soon, []string{"it ended before it said where it listens (exit status 1)", "is a part of another one"}},
		{"no-path", nil, soon, []string{`got "1|1|unix" on its standard output`}},
		{"no-socket", shortly, soon, []string{"asked for its card: the connection broke off: ", "/nonexistent/law.sock"}},
		{"protocol-99", nil, soon, []string{"it speaks version 99 of the protocol, this program speaks version 1"}},
		{"core-protocol-7", nil, soon, []string{"it speaks another protocol"}},
		{"netrpc", nil, soon, []string{"it speaks another protocol"}},
	} {
		t.Run(x.fault, func(t *testing.T) {
			t.Parallel()
			s := faulty(t, x.fault, hole)
			if x.set != nil {
				x.set(&s.Options)
			}
			refused(t, s, x.limit, x.words...)
		})
	}
}

// Programs that are no laws, and what is no program.
func TestFaultsOfPrograms(t *testing.T) {
	leavesNothing(t)
	dir := t.TempDir()
	for name, text := range map[string]string{
		"text": "a law of mine", "script": "#!/no/such/interpreter\n", "plain": "a law of mine\n", "elf": "\x7fELF and nothing more",
	} {
		mode := os.FileMode(0o755)
		if name == "text" {
			mode = 0o644
		}
		if err := os.WriteFile(filepath.Join(dir, name), []byte(text), mode); err != nil {
			t.Fatal(err)
		}
	}
	for _, x := range []struct {
		args []string
		dir  string
		want string
	}{
		{[]string{"./text"}, dir, "./text may not be run: is it a program? (chmod +x makes it one)"},
		{[]string{"./script"}, dir, "./script does not start: the interpreter that its first line names is missing"},
		{[]string{"./plain"}, dir, "./plain is neither a program for this machine nor a script whose first line names an interpreter"},
		{[]string{"./elf"}, dir, "./elf is neither a program for this machine nor a script whose first line names an interpreter"},
		{[]string{"./nothing"}, dir, "no program ./nothing"},
		{[]string{"no-such-program"}, dir, `no program "no-such-program" on the PATH`},
		{[]string{"/usr/bin/no-python3", "law.py"}, dir, "no program /usr/bin/no-python3"},
		{[]string{dir}, "", "may not be run"},
		{[]string{"/bin/true"}, filepath.Join(dir, "nowhere"), "no folder " + filepath.Join(dir, "nowhere")},
		{[]string{"/bin/true"}, "", "it is no law: it ended before it said where it listens (exit status 0); its log is empty"},
		{[]string{"/bin/echo", "hello"}, "", `it is no law, or prints before it serves one: got "hello" on its standard output`},
		{[]string{"/bin/ls", "/no/such/folder"}, "", "(exit status 2); its log:\n  /bin/ls: cannot access '/no/such/folder': No such file or directory"},
		{[]string{"/bin/sleep", "60"}, "", "it is no law, or starts too slowly: no word from it within 300ms; its log is empty"},
		{nil, "", "no program to start"},
	} {
		s := rpc.Start{Name: called, Args: x.args, Dir: x.dir, Env: []string{mark(t)}, Options: rpc.Options{Starting: 300 * time.Millisecond}}
		refused(t, s, soon, x.want)
	}
}

// Faults of the card: all of them, and together.
func TestFaultsOfDescribing(t *testing.T) {
	leavesNothing(t)
	for _, x := range []struct {
		fault string
		words []string
	}{
		{"describe-crash", []string{"asked for its card: its process ended (exit status 4); its log:", "the card is not at hand"}},
		{"describe-panic", []string{"asked for its card: its process ended (exit status 2); its log:", "panic: no card"}},
		{"describe-hang", []string{"asked for its card: no answer within 400ms; its log:", "looking for the card"}},
		{"describe-changes", []string{"(evaporation/black-body): its card cannot be used:\n  card: it is not the same when asked for twice"}},
		{"newer", []string{
			"(evaporation/black-body): its card cannot be used:",
			"card: written for contract 2, this program speaks contracts up to 1: a newer wane is needed",
			`card: needs the feature "shared-columns", which this program has not`,
			`card: needs the feature "tides", which this program has not`,
		}},
		{"no-contract", []string{"card: no contract number, want 1"}},
		{"no-card", []string{"card: no contract number", `unknown process ""`, "name, version and summary must be given", "no source"}},
		{"all-wrong", []string{
			`needs the feature "tides"`, `question wear: column mass: unit "kg", want "solMass"`, `kind ember: composition "cheese", want one of`,
			"parameter k: no citation", "parameter k: preset 4 outside 0 .. 3", `accepts: limit evaporating.k: unknown process "evaporating"`,
			`question wear: unknown column "colour"`, `outcome "Tea Time": want a word`,
		}},
		{"bad-card", []string{
			"no source: name the publication", "parameter k: preset 4 outside 0 .. 3", "parameter tau: no citation",
			`question wear: unknown column "colour"`, `question "flutter" is not one that process evaporation is asked`,
			`no kind "teapot"`, `outcome "Tea Time": want a word`,
		}},
	} {
		t.Run(x.fault, func(t *testing.T) {
			t.Parallel()
			s := faulty(t, x.fault, hole)
			if x.fault == "describe-hang" {
				s.Describing = 400 * time.Millisecond
			}
			refused(t, s, soon, x.words...)
		})
	}
}

// A law that a person starts by hand says what it is, and ends.
func TestFaultsByHand(t *testing.T) {
	leavesNothing(t)
	s := faulty(t, "serves", hole)
	within(t, soon, func() {
		c := exec.Command(s.Args[0], s.Args[1:]...)
		var out, said bytes.Buffer
		c.Env, c.Stdout, c.Stderr = s.Env, &out, &said
		err := c.Run()
		if c.ProcessState.ExitCode() != 1 || out.Len() > 0 || !strings.Contains(said.String(), "evaporation/black-body is a law that wane starts when it needs it") {
			t.Errorf("%v, prints %q, says %q", err, out.String(), said.String())
		}
	})
}

// The faults of a card are there one by one, too.
func TestFaultsOfACardAreSeveral(t *testing.T) {
	leavesNothing(t)
	_, err := rpc.Open(context.Background(), faulty(t, "newer", hole))
	var card *rpc.CardError
	if !errors.As(err, &card) || len(card.Faults) != 3 || card.Name != called || card.ID != hole {
		t.Errorf("got %v, want three faults of %s", err, called)
	}
}
