package scenario

import (
	"errors"
	"io/fs"
	"math"
	"strings"
	"testing"
	"testing/fstest"

	"github.com/google/go-cmp/cmp"
	"github.com/google/go-cmp/cmp/cmpopts"

	"wane/sim/galaxy"
	"wane/sim/num"
)

func TestLoad(t *testing.T) {
	s, warnings, err := Load(files(`
title = "Warm"
base = "reach"
until = "10^1100 yr"
[laws]
infall = "none"
[parameters.nucleon-decay]
heat_share = 0.5
gone = "last-nucleon"
[populations.warm]
kinds = ["white-dwarf"]
places = ["bound", "adrift"]
origins = "founded"
temperature = "> 0.1 eV"
[populations.faint]
luminosity = "<1e-6 Lsun"
[populations.near-floor]
kinds = ["neutron-star", "relic"]
temperature = "< 1.1 times the floor"
`), "x.toml", registry(t), defaults(), Overrides{
		Laws: []string{"evaporation=page"}, Sets: []string{"galaxy.radius=8kpc", "evaporation.spin = 0.25"}, Objects: 1000,
	})
	if err != nil || len(warnings) > 0 {
		t.Fatal(err, warnings)
	}
	want := &Scenario{
		Name: "x", Title: "Warm", Base: []string{"reach"},
		Objects: 2e11, Sample: 1000, Radius: 8000, CentralMass: 4.3e6, Realisations: 40, Seed: 7, Until: 1100,
		Laws: map[string]string{"nucleon-decay": "grand-unified", "evaporation": "page", "remnant": "simple", "infall": "none", "white-dwarf-cooling": "mestel-debye", "ejection": "still", "substellar-limit": "fixed", "lifetime": "table"},
		Parameters: map[string]map[string]float64{
			"nucleon-decay": {"lifetime": 37 + num.Log10(2), "heat_share": 0.5, "gone": 1},
			"evaporation":   {"spin": 0.25},
			"remnant":       {"scatter": 0.06},
		},
		Populations: append(galaxy.Default(),
			galaxy.Population{Name: "warm", Condition: galaxy.Condition{
				Kinds: []string{"white-dwarf"}, Places: []string{"bound", "adrift"}, Origins: []string{"founded"},
				Warmth: &galaxy.Warmth{Quantity: "temperature", Above: true, Value: 1160.4518121550082, Unit: "K"}, // 0.1 eV / k, CODATA 2018
			}},
			galaxy.Population{Name: "faint", Condition: galaxy.Condition{Warmth: &galaxy.Warmth{Quantity: "luminosity", Value: 1e-6, Unit: "solLum"}}},
			galaxy.Population{Name: "near-floor", Condition: galaxy.Condition{
				Kinds: []string{"neutron-star", "relic"}, Warmth: &galaxy.Warmth{Quantity: "temperature", Value: 1.1, Unit: "floor"},
			}},
		),
	}
	if d := cmp.Diff(want, s, cmpopts.IgnoreUnexported(Scenario{}), cmpopts.IgnoreFields(Scenario{}, "Digest"), cmpopts.EquateApprox(1e-15, 0)); d != "" {
		t.Error(d)
	}
	if s.Held() != 1000 || s.Weight() != 2e8 {
		t.Errorf("held %d, weight %v", s.Held(), s.Weight())
	}
	set, err := s.Set(registry(t))
	if err != nil {
		t.Fatal(err)
	}
	if v, _ := set.Of("nucleon-decay").Parameter("gone"); v != 1 || set.Of("infall") != nil {
		t.Errorf("the set has gone %v, infall %v", v, set.Of("infall"))
	}
}

// The resolved text is a scenario of its own, with the same digest.
func TestTextIsAScenario(t *testing.T) {
	s, _, err := Load(files(`
base = "reach"
until = "2.5e1100 yr"
[populations.warm]
temperature = "> 0.1 eV"
[parameters.remnant]
scatter = "1e29 kg"
`), "x.toml", registry(t), defaults(), Overrides{})
	if err != nil {
		t.Fatal(err)
	}
	again, _, err := Load(files(s.Text()), "x.toml", registry(t), nil, Overrides{})
	if err != nil {
		t.Fatalf("%v\n%s", err, s.Text())
	}
	if again.Digest != s.Digest {
		t.Errorf("read back:\n%s\nwas:\n%s", again.Text(), s.Text())
	}
	if d := cmp.Diff(s, again, cmpopts.IgnoreUnexported(Scenario{}), cmpopts.IgnoreFields(Scenario{}, "Base", "Title", "Question")); d != "" {
		t.Error(d)
	}
}

// The digest depends on what is run, not on how it was said.
func TestDigest(t *testing.T) {
	load := func(text string, o Overrides) string {
		t.Helper()
		s, _, err := Load(files(text), "x.toml", registry(t), defaults(), o)
		if err != nil {
			t.Fatal(err)
		}
		return s.Digest
	}
	one := load(`base = "reach"`, Overrides{})
	for name, same := range map[string]string{
		"title":   "title = \"other\"\nbase = \"reach\"",
		"units":   "base = \"reach\"\n[galaxy]\nradius = \"10000 pc\"",
		"default": "base = \"reach\"\n[laws]\nevaporation = \"page\"\n[parameters.evaporation]\nspin = 0.5",
		"whole":   reach,
	} {
		if load(same, Overrides{}) != one {
			t.Errorf("%s changes the digest", name)
		}
	}
	seed := uint64(8)
	for name, o := range map[string]Overrides{
		"seed": {Seed: &seed}, "law": {Laws: []string{"nucleon-decay=stable"}}, "until": {Until: "1e50 yr"},
		"parameter": {Sets: []string{"evaporation.spin=0.4"}}, "objects": {Objects: 10}, "realisations": {Realisations: 3},
	} {
		if load(`base = "reach"`, o) == one {
			t.Errorf("%s does not change the digest", name)
		}
	}
}

// A law other than the base's starts from its presets, and says so.
func TestSwapDropsParameters(t *testing.T) {
	s, warnings, err := Load(files("base = \"reach\"\n[laws]\nnucleon-decay = \"virtual-holes\""), "x.toml", registry(t), defaults(), Overrides{})
	if err != nil {
		t.Fatal(err)
	}
	if s.Parameters["nucleon-decay"]["lifetime"] != 45 {
		t.Errorf("lifetime %v, want the preset", s.Parameters["nucleon-decay"])
	}
	const want = "x.toml:3:17: nucleon-decay.lifetime, set in reach.toml for nucleon-decay/grand-unified, falls away: the law is now virtual-holes"
	if len(warnings) != 1 || warnings[0].Error() != want {
		t.Errorf("warnings %v, want %s", warnings, want)
	}
}

func TestImpossiblePopulations(t *testing.T) {
	for condition, want := range map[string]string{
		`kinds = ["relic"]`:                                                                           "",
		"kinds = [\"black-hole\"]\n":                                                                  "no law of this run makes a black-hole",
		`kinds = ["central-hole"]` + "\nplaces = [\"bound\"]":                                         "the central hole is always in place central",
		`kinds = ["star"]` + "\nplaces = [\"central\"]":                                               "only the central hole is ever in place central",
		`origins = ["merged"]`:                                                                        "no law of this run merges objects",
		`temperature = "< 1 floor"`:                                                                   "no object is ever colder than its own floor",
		`kinds = ["star", "central-hole"]` + "\nplaces = [\"central\"]":                               "",
		`kinds = ["star", "black-hole"]` + "\nplaces = [\"central\"]":                                 "none of its kinds is ever in one of its places",
		`kinds = ["central-hole"]` + "\n[galaxy]\ncentral-mass = \"0 kg\"":                            "",
		`kinds = ["central-hole"]` + "\n[laws]\ninfall = \"none\"\n[galaxy]\ncentral-mass = \"0 kg\"": "the galaxy has no central hole (galaxy.central-mass is 0), and no law of this run makes one",
	} {
		_, warnings, err := Load(files("base = \"reach\"\n[populations.p]\n"+condition), "x.toml", registry(t), defaults(), Overrides{})
		if err != nil {
			t.Errorf("%s: %v", condition, err)
			continue
		}
		got := Faults(warnings).Error()
		if want != "" {
			want = "x.toml:2:14: population p can never have a member: " + want
		}
		if got != want {
			t.Errorf("%s:\ngot  %s\nwant %s", condition, got, want)
		}
	}
}

func TestFilesThatAreNotRead(t *testing.T) {
	big := fstest.MapFS{"x.toml": {Data: make([]byte, 100_000_000)}}
	_, _, err := Load(big, "x.toml", registry(t), defaults(), Overrides{})
	if err == nil || err.Error() != "x.toml: the file has 100 MB: want at most 1 MB" {
		t.Errorf("a large file: %v", err)
	}
	_, _, err = Load(files(""), "y.toml", registry(t), defaults(), Overrides{})
	if !errors.Is(err, fs.ErrNotExist) || err.Error() != "scenario y.toml: file does not exist" {
		t.Errorf("a missing file: %v", err)
	}
	_, _, err = Load(fstest.MapFS{"x.toml/y": {}}, "x.toml", registry(t), defaults(), Overrides{})
	if err == nil || err.Error() != "x.toml: is a folder: want a scenario file" {
		t.Errorf("a folder: %v", err)
	}
	if _, _, err = Load(files(reach), "x.toml", registry(t), map[string]string{"infall": "nothing"}, Overrides{}); err == nil {
		t.Error("a default law that does not exist was taken")
	}
}

// A base stands beside the file or at the top, the folder before the embedded.
func TestLayered(t *testing.T) {
	user := fstest.MapFS{"mine/x.toml": {Data: []byte(`base = "reach"`)}, "mine/y.toml": {Data: []byte(`base = "x"`)}}
	s, _, err := Load(Layered(user, files("")), "mine/y.toml", registry(t), defaults(), Overrides{})
	if err != nil || strings.Join(s.Base, " ") != "x reach" || s.Name != "y" {
		t.Errorf("%+v, %v", s, err)
	}
	entries, err := fs.ReadDir(Layered(user, files("")), ".")
	if err != nil || len(entries) != 3 {
		t.Errorf("%v, %v", entries, err)
	}
}

func TestNever(t *testing.T) {
	s, _, err := Load(files("base = \"reach\"\nuntil = \"1e20 yr\""), "x.toml", registry(t), defaults(), Overrides{Until: "never"})
	if err != nil || !math.IsInf(s.Until, 1) {
		t.Errorf("%v, %v", s, err)
	}
}

// A limit may be written as messages print it.
func TestRoundedLimits(t *testing.T) {
	s, _, err := Load(files(`base = "reach"`), "x.toml", registry(t), defaults(), Overrides{
		Sets: []string{"nucleon-decay.heat_share=0.333333", "nucleon-decay.lifetime=2.511e34 yr"}})
	if err != nil {
		t.Fatal(err)
	}
	if p := s.Parameters["nucleon-decay"]; p["heat_share"] != 1./3 || p["lifetime"] != 34.4 {
		t.Errorf("%v", p)
	}
}

// The resolved text is frozen: digests in old manifests hang on it.
func TestFrozenText(t *testing.T) {
	s, _, err := Load(files("base = \"reach\"\nuntil = \"10^1100 yr\"\n[laws]\ninfall = \"none\"\n[populations.p]\nkinds = [\"star\", \"relic\"]\ntemperature = \"> 1.1 floor\""),
		"x.toml", registry(t), defaults(), Overrides{Sets: []string{"nucleon-decay.lifetime=1e38yr"}})
	if err != nil {
		t.Fatal(err)
	}
	const want = `until = "10^1100 yr"
realisations = 40
seed = 7

[galaxy]
objects = 2e11
sample = 100000
radius = "10000 pc"
central-mass = "4.3e6 Msun"

[laws]
substellar-limit = "fixed" # version 1
lifetime = "table" # version 1
remnant = "simple" # version 1
white-dwarf-cooling = "mestel-debye" # version 1
ejection = "still" # version 1
infall = "none"
nucleon-decay = "grand-unified" # version 1
evaporation = "page" # version 1

[parameters.remnant]
scatter = "0.06 Msun"

[parameters.nucleon-decay]
lifetime = "10^38 yr"
heat_share = "0.6666666666666666"
gone = "transparent"

[parameters.evaporation]
spin = "0.5"

[populations.p]
kinds = ["star", "relic"]
temperature = "> 1.1 floor"
`
	if d := cmp.Diff(want, s.Text()); d != "" {
		t.Error(d)
	}
	// sha256sum of the text above.
	if s.Digest != "16ee18a5740abc444f3b474d47ae12ce7348fb84149c266495cc925d9ef1184d" {
		t.Errorf("digest %s", s.Digest)
	}
}

func TestResolve(t *testing.T) {
	s, _, err := Load(files(`base = "reach"`), "x.toml", registry(t), defaults(), Overrides{Sets: []string{"evaporation.spin=0.25"}})
	if err != nil {
		t.Fatal(err)
	}
	var b strings.Builder
	if err := s.Resolve(registry(t)).Print(&b); err != nil {
		t.Fatal(err)
	}
	for _, want := range []string{
		"galaxy.radius          10000 pc         reach.toml; allowed: 0.001 .. 1e7 pc",
		"until                  never            preset; allowed: >= 1 yr, or \"never\"",
		"  spin                   0.25             --set evaporation.spin; allowed: 0 .. 1",
		"  scatter                0.06 Msun        preset; allowed: 0 .. 0.1 Msun\n      [assumption]",
		"  lifetime               2e37 yr          reach.toml; allowed: 2.512e34 .. 1e41 yr",
		"  gone                   transparent      preset; allowed: transparent, last-nucleon",
		"  glowing-white-dwarfs     white-dwarf, temperature > 798 K (every run)",
	} {
		if !strings.Contains(b.String(), want) {
			t.Errorf("no %q in\n%s", want, b.String())
		}
	}
}
