package cli

import (
	"encoding/json"
	"math"
	"reflect"
	"strings"
	"testing"
)

// told is a population as the JSON of a run tells it: marks with all their
// quantiles, peak, causes and what it hangs on.
type told map[string]any

func toldBy(t *testing.T, command string) map[string]told {
	t.Helper()
	var s struct{ Populations []told }
	if err := json.Unmarshal([]byte(printed(t, command)), &s); err != nil {
		t.Fatalf("wane %s: %v", command, err)
	}
	out := map[string]told{}
	for _, p := range s.Populations {
		out[p["name"].(string)] = p
	}
	return out
}

// quietly leaves out what couples populations to one another: dwarfs that
// collide glow anew and make stars and holes, and so does cold matter that turns.
const quietly = " --law encounter=none --law supernova=none --law iron=none --law tunnelling=none"

// TestSwapLateLaw swaps a law that does next to nothing before the white dwarfs
// have cooled: when they stop glowing hangs on what they were born with, not on
// what wears or ejects them later.
func TestSwapLateLaw(t *testing.T) {
	const command = "run lantern-reach --quiet --objects 6000 --realisations 2" + quietly
	before, after := ran(t, command), ran(t, command+" --law ejection=balanced")
	for _, mark := range []string{"peak", "half", "hundredth", "last"} {
		a, b := before.date(t, "glowing-white-dwarfs", mark), after.date(t, "glowing-white-dwarfs", mark)
		if math.Abs(a-b) > 1e-9 {
			t.Errorf("glowing white dwarfs, %s: 10^%v yr, under ejection=balanced 10^%v yr", mark, a, b)
		}
	}
}

// TestSwapOneLaw swaps one law and looks at everything that must not feel it:
// those populations stay as they were to the last bit, because every process
// keeps its own draws. And each swap is felt somewhere.
func TestSwapOneLaw(t *testing.T) {
	const command = "run lantern-reach --quiet --json --objects 6000 --realisations 2" + quietly
	before := toldBy(t, command)
	for swap, keeps := range map[string]string{
		"evaporation=black-body": "stars brown-dwarfs white-dwarfs glowing-white-dwarfs neutron-stars bound-objects",
		"warmth=none":            "stars brown-dwarfs white-dwarfs neutron-stars black-holes central-hole bound-objects adrift-objects",
		"nucleon-decay=stable":   "stars black-holes central-hole bound-objects",
		"ejection=balanced":      "stars",
	} {
		after := toldBy(t, command+" --law "+swap)
		for _, name := range strings.Fields(keeps) {
			if !reflect.DeepEqual(before[name], after[name]) {
				t.Errorf("--law %s changes %s:\nbefore %v\nafter  %v", swap, name, before[name], after[name])
			}
		}
		if reflect.DeepEqual(before, after) {
			t.Errorf("--law %s changes nothing", swap)
		}
		// Whatever is swapped, what is born and what it becomes stays.
		for _, name := range []string{"stars", "brown-dwarfs", "white-dwarfs", "neutron-stars", "black-holes"} {
			if !reflect.DeepEqual(before[name]["peak"], after[name]["peak"]) {
				t.Errorf("--law %s: peak of %s: before %v, after %v", swap, name, before[name]["peak"], after[name]["peak"])
			}
		}
	}
}
