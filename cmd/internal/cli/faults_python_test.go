//go:build linux

package cli

import (
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"syscall"
	"testing"
	"time"

	kit "wane/plugins/outside/python"
	"wane/sim/rpc"
)

const interpreter = "/usr/bin/python3"

// pythonLaw is the folder of a law in Python: holes that lose mass like a
// black body, but for some lines.
func pythonLaw(t *testing.T, lines ...string) badLaw {
	t.Helper()
	if out, err := exec.Command(interpreter, "-c", "import numpy, grpc, google.protobuf").CombinedOutput(); err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("needs python3-numpy, python3-grpcio, python3-protobuf: %v\n%s", err, out)
		}
		t.Skipf("needs python3-numpy, python3-grpcio, python3-protobuf: %v", err)
	}
	l := badLaw{filepath.Join(t.TempDir(), "mine"), t.TempDir()}
	if err := os.Mkdir(l.path, 0o755); err != nil {
		t.Fatal(err)
	}
	text := fmt.Sprintf(`import os, sys, time
import wanelaw
from wanelaw import exact

STATE = sys.argv[1]
with open(STATE + "/start-%%d" %% (1 + len([n for n in os.listdir(STATE) if n.startswith("start-")])), "w") as f:
    f.write(str(os.getpid()))

def now():
    open(STATE + "/now", "w").close()

holes = ["black-hole", "central-hole"]
card = wanelaw.Card(
    process="evaporation", name="mine", version="1", summary="made up for a test", formula="dM/dt = -k/M^2", domain="none",
    sources=["assumption"], accepts=wanelaw.Accepts(kinds=holes), questions=[wanelaw.Question("wear", ["mass"])],
    thresholds=[wanelaw.Threshold(k, mass=0, becomes="gone", outcome="evaporated") for k in holes],
)

def wear(mass):
    %s
    return -67 - 2 * exact.log10(mass), 0.0

if __name__ == "__main__":
    wanelaw.serve(card, wear)
`, strings.Join(lines, "\n    "))
	start := fmt.Sprintf("start = [%q, \"-B\", \"law.py\", %q]\n", interpreter, l.state)
	for name, data := range map[string]string{"law.py": text, "law.toml": start} {
		if err := os.WriteFile(filepath.Join(l.path, name), []byte(data), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	if err := kit.Copy(l.path); err != nil {
		t.Fatal(err)
	}
	return l
}

// A law in Python is as safe in a run as one in Go.
func TestFaultsOfPythonInRuns(t *testing.T) {
	t.Cleanup(func() { noSockets(t, os.TempDir(), os.Getpid()) })
	for name, x := range map[string]struct {
		line  string
		code  int
		words []string
	}{
		"good":      {"pass", ExitOK, nil},
		"prints":    {"print('hello')", ExitOK, nil},
		"exception": {"{}['neutron']", ExitFailed, []string{"law MINE (evaporation/mine): question wear: KeyError: 'neutron'", "law.py:", "in wear: {}['neutron']"}},
		"dies once": {"if not os.path.exists(STATE + '/now'): now(); os._exit(0)", ExitOK, []string{"warning: law MINE (evaporation/mine) ended in the run and was started again, once"}},
		"NaN":       {"return float('nan'), 0.0", ExitFailed, []string{"law MINE (evaporation/mine): question wear, row 0 (mass ", "log10_rate: got NaN, want a number or -Inf (zero)"}},
		"impure":    {"return -67 + 1e-9 * (time.time_ns() // 1000 % 1_000_000), 0.0", ExitFailed, []string{"when asked again with other rows, want the same for the same row"}},
	} {
		t.Run(name, func(t *testing.T) {
			t.Parallel()
			mine := pythonLaw(t, x.line)
			h := wane(t, rpc.Options{Starting: soon}, append(strings.Fields(lamp), "--law", "evaporation="+mine.path)...)
			for i, w := range x.words {
				x.words[i] = strings.ReplaceAll(w, "MINE", mine.path)
			}
			h.mustSay(t, x.code, soon, x.words...)
			mine.gone(t, 0)
		})
	}
}

// Signals, while a law in Python sleeps or spins.
func TestFaultsOfPythonBySignals(t *testing.T) {
	for name, line := range map[string]string{"sleeps": "now(); time.sleep(300)", "spins": "now()\n    while True: pass"} {
		for _, s := range []syscall.Signal{syscall.SIGINT, syscall.SIGKILL} {
			t.Run(name+"/"+s.String(), func(t *testing.T) {
				t.Parallel()
				mine := pythonLaw(t, line)
				r := start(t, mine, append(strings.Fields(lamp), "--law", "evaporation="+mine.path)...)
				r.signal(t, s)
				h := r.end(t, soon)
				if s == syscall.SIGINT {
					h.mustSay(t, ExitInterrupted, 4500*time.Millisecond, "wane: interrupted before the ")
					if left := r.left(); len(left) > 0 {
						t.Errorf("left: %v", left)
					}
				}
				mine.gone(t, 2*time.Second)
			})
		}
	}
}
