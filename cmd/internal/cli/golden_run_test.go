package cli

import (
	"bytes"
	"os"
	"os/exec"
	"runtime"
	"strings"
	"testing"
)

// littleLamp is the whole galaxy of which the same bytes are promised.
const littleLamp = "run little-lamp --quiet --json"

// TestGoldenLittleLamp holds a whole run to the bytes it gave before, for any
// number of workers. The bytes are promised on amd64; elsewhere only that
// workers change nothing is tested.
func TestGoldenLittleLamp(t *testing.T) {
	first := printed(t, littleLamp+" --workers 1")
	if runtime.GOARCH == "amd64" {
		golden(t, "little-lamp.json", []byte(first))
	} else if *update {
		t.Fatalf("the golden of a run is of amd64: it can't be rewritten on %s", runtime.GOARCH)
	}
	for _, again := range []string{"--workers 1", "--workers 2", "--workers 3"} {
		if printed(t, littleLamp+" "+again) != first {
			t.Errorf("%s %s: other bytes than the first run with one worker", littleLamp, again)
		}
	}
}

// TestGoldenAnyProcessor runs the golden again in processes that are denied
// what processors differ in: fused multiply-add, and then all that is optional.
func TestGoldenAnyProcessor(t *testing.T) {
	if runtime.GOARCH != "amd64" {
		t.Skipf("the same bytes are promised on amd64, not on %s", runtime.GOARCH)
	}
	if *update {
		t.Skip("the golden is being rewritten")
	}
	if os.Getenv("GODEBUG") != "" {
		return // we are such a process
	}
	for _, without := range []string{"cpu.fma=off", "cpu.all=off"} {
		t.Run(without, func(t *testing.T) {
			c := exec.Command(os.Args[0], "-test.run", "^TestGolden(LittleLamp|Summaries)$", "-test.count", "1", "-test.v")
			c.Env = append(os.Environ(), "GODEBUG="+without)
			var out bytes.Buffer
			c.Stdout, c.Stderr = &out, &out
			err := c.Run()
			if err != nil || !strings.Contains(out.String(), "--- PASS: TestGoldenLittleLamp") {
				t.Errorf("GODEBUG=%s: %v\n%s", without, err, out.String())
			}
		})
	}
}
