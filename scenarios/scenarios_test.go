package scenarios_test

import (
	"io/fs"
	"math"
	"slices"
	"strings"
	"testing"
	"testing/fstest"
	"unicode/utf8"

	"wane/plugins"
	"wane/scenarios"
	"wane/sim/law"
	"wane/sim/scenario"
)

// one is a file system that holds one scenario, x.toml.
func one(text string) fs.FS { return fstest.MapFS{"x.toml": {Data: []byte(text)}} }

func names(t *testing.T) []string {
	t.Helper()
	files, err := fs.Glob(scenarios.FS, "*.toml")
	if err != nil || len(files) == 0 {
		t.Fatal(files, err)
	}
	return files
}

func load(t *testing.T, file string) (*scenario.Scenario, *law.Registry) {
	t.Helper()
	reg, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	s, warnings, err := scenario.Load(scenarios.FS, file, reg, plugins.Defaults(), scenario.Overrides{})
	if err != nil {
		t.Fatal(err)
	}
	for _, w := range warnings {
		t.Errorf("warning: %v", w)
	}
	return s, reg
}

// Every scenario that comes with the program is valid with the built-in laws,
// and its resolved text is a scenario with the same digest.
func TestValid(t *testing.T) {
	for _, file := range names(t) {
		t.Run(file, func(t *testing.T) {
			s, reg := load(t, file)
			if s.Title == "" || s.Question == "" {
				t.Error("no title or no question")
			}
			again, _, err := scenario.Load(one(s.Text()), "x.toml", reg, nil, scenario.Overrides{})
			if err != nil || again.Digest != s.Digest {
				t.Errorf("resolved text is not read back: %v\n%s", err, s.Text())
			}
			for process := range plugins.Defaults() {
				if s.Laws[process] == "" {
					t.Errorf("no law of %s", process)
				}
			}
		})
	}
}

// Each head comment gives the group, the question, what to look at, the sources
// and the cost, in lines that fit a page.
func TestHeads(t *testing.T) {
	for _, file := range names(t) {
		data, err := fs.ReadFile(scenarios.FS, file)
		if err != nil {
			t.Fatal(err)
		}
		for _, line := range strings.Split(string(data), "\n") {
			if utf8.RuneCountInString(line) > 100 {
				t.Errorf("%s: a line of more than 100 columns: %s", file, line)
			}
		}
		head, err := scenarios.ReadHead(scenarios.FS, file)
		if err != nil {
			t.Fatal(err)
		}
		if head.Question == "" || head.LookAt == "" || head.Sources == "" || head.Cost == "" {
			t.Errorf("%s: the head comment lacks a part: %+v", file, head)
		}
		if !slices.Contains(scenarios.Groups, head.Group) {
			t.Errorf("%s: group %q is none of scenarios.Groups", file, head.Group)
		}
	}
}

// The three galaxies as they are described.
func TestGalaxies(t *testing.T) {
	reach, _ := load(t, "lantern-reach.toml")
	if reach.Objects != 2e11 || reach.Held() != 100_000 || reach.CentralMass != 4.3e6 || reach.Radius != 10_000 ||
		reach.Realisations != 40 || !math.IsInf(reach.Until, 1) {
		t.Errorf("lantern-reach: %+v", reach)
	}
	stable, _ := load(t, "stable-matter.toml")
	if stable.Laws["nucleon-decay"] != "stable" || reach.Laws["nucleon-decay"] == "stable" {
		t.Errorf("nucleons: %s in stable-matter, %s in lantern-reach", stable.Laws["nucleon-decay"], reach.Laws["nucleon-decay"])
	}
	stable.Laws["nucleon-decay"] = reach.Laws["nucleon-decay"]
	for process, name := range reach.Laws {
		if stable.Laws[process] != name {
			t.Errorf("stable-matter differs from lantern-reach in %s", process)
		}
	}
	lamp, _ := load(t, "little-lamp.toml")
	if lamp.Sample != 0 || lamp.Held() != 2000 || lamp.Weight() != 1 {
		t.Errorf("little-lamp: %+v", lamp)
	}
}
