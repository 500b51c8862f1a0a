package scenario

import (
	"errors"
	"strings"
	"testing"
	"testing/fstest"

	"github.com/google/go-cmp/cmp"

	"wane/sim/law"
)

const someDigest = "sha256:0123456789abcdef0123456789abcdef0123456789abcdef0123456789abcdef"

// stranger is a law outside the program, as the tests have it.
type stranger struct{ fake }

func (s stranger) Describe() law.Card {
	return law.Card{
		Process: "evaporation", Name: "burden", Version: "3", Summary: "a stranger's", Sources: []string{"assumption"},
		Accepts:   law.Accepts{Kinds: []string{"black-hole", "central-hole"}},
		Questions: []law.Question{{Name: "wear", Inputs: []string{"mass"}}},
		Parameters: []law.Parameter{
			{Name: "share", Low: 0, High: 1, Preset: 0.5, Citation: "assumption"},
			{Name: "delay", Unit: "yr", Low: 1, High: 1e100, Preset: 10, Citation: "assumption"},
		},
		Kinds: []law.Kind{{Name: "ember", Composition: law.Pure}},
	}
}

// opened opens whatever is given as the stranger, and puts it into a registry.
func opened(given []Given, reg *law.Registry) (*law.Registry, []Outside) {
	var out []Outside
	for _, g := range given {
		l := stranger{}
		if err := reg.Put(l); err != nil {
			panic(err)
		}
		out = append(out, Outside{Given: g, Law: l, Digest: someDigest})
	}
	return reg, out
}

// loadOutside loads main/x.toml with its outside laws opened.
func loadOutside(t *testing.T, files fstest.MapFS, o Overrides) (*Scenario, *law.Registry, []Fault, error) {
	t.Helper()
	reg, outside := opened(Paths(files, "main/x.toml", o), registry(t))
	o.Outside = outside
	s, warnings, err := Load(files, "main/x.toml", reg, defaults(), o)
	return s, reg, warnings, err
}

const galaxyLines = "[galaxy]\nobjects = 1000\nradius = \"8 kpc\"\n"

func TestPaths(t *testing.T) {
	file := func(text string) *fstest.MapFile { return &fstest.MapFile{Data: []byte(text)} }
	for _, c := range []struct {
		what, leaf, base string
		typed            []string
		want             []Given
	}{
		{"none", "", "", nil, nil},
		{"beside the file", "[laws]\nevaporation = \"./b\"\n", "", nil,
			[]Given{{Process: "evaporation", Written: "./b", Path: "main/b"}}},
		{"absolute, with its digest", "[laws]\nevaporation = \"/opt/b\"\n[trust]\nevaporation = \"" + someDigest + "\"\n", "", nil,
			[]Given{{Process: "evaporation", Written: "/opt/b", Path: "/opt/b", Trust: someDigest}}},
		{"of a base, from the base's file", "", "[laws]\nevaporation = \"../b\"\n", nil,
			[]Given{{Process: "evaporation", Written: "../b", Path: "b"}}},
		{"of a base, trusted above it", "[trust]\nevaporation = \"" + someDigest + "\"\n", "[laws]\nevaporation = \"./b\"\n", nil,
			[]Given{{Process: "evaporation", Written: "./b", Path: "main/b", Trust: someDigest}}},
		{"another one than the base's: its trust falls away", "[laws]\nevaporation = \"./c\"\n",
			"[laws]\nevaporation = \"./b\"\n[trust]\nevaporation = \"" + someDigest + "\"\n", nil,
			[]Given{{Process: "evaporation", Written: "./c", Path: "main/c"}}},
		{"a built-in one over the base's", "[laws]\nevaporation = \"page\"\n", "[laws]\nevaporation = \"./b\"\n", nil, nil},
		{"typed, from where the program runs", "[laws]\nevaporation = \"./b\"\n[trust]\nevaporation = \"" + someDigest + "\"\n", "",
			[]string{"evaporation=./d"}, []Given{{Process: "evaporation", Written: "./d", Path: "./d", Typed: true}}},
		{"a built-in one typed", "[laws]\nevaporation = \"./b\"\n", "", []string{"evaporation=page"}, nil},
		{"a broken file starts nothing", "[laws]\nevaporation = \"./b\"\n!\n", "", nil, nil},
	} {
		files := fstest.MapFS{"main/x.toml": file("base = \"y\"\n" + c.leaf), "main/y.toml": file(galaxyLines + c.base)}
		got := Paths(files, "main/x.toml", Overrides{Laws: c.typed})
		for i := range got {
			if got[i].at.file == "" {
				t.Errorf("%s: nowhere", c.what)
			}
			got[i].at = place{}
		}
		if diff := cmp.Diff(c.want, got, cmp.AllowUnexported(Given{}, place{})); diff != "" {
			t.Errorf("%s (-want +got):\n%s", c.what, diff)
		}
	}
}

// A law given by a path is known by the name of its card from then on: its
// parameters, its kinds, and what the resolved text says.
func TestLoadOutside(t *testing.T) {
	files := fstest.MapFS{"main/x.toml": {Data: []byte(galaxyLines + `
[laws]
evaporation = "./b"
[parameters.evaporation]
share = 0.25
[populations.embers]
kinds = ["ember"]
`)}}
	s, reg, _, err := loadOutside(t, files, Overrides{Sets: []string{"evaporation.delay=3Gyr"}})
	if err != nil {
		t.Fatal(err)
	}
	if s.Laws["evaporation"] != "burden" || s.Outside["evaporation"].Written != "./b" {
		t.Errorf("law %q, outside %+v", s.Laws["evaporation"], s.Outside)
	}
	want := map[string]float64{"share": 0.25, "delay": 3e9}
	if diff := cmp.Diff(want, s.Parameters["evaporation"]); diff != "" {
		t.Error(diff)
	}
	if line := `evaporation = "burden" # version 3, outside, ` + someDigest + "\n"; !strings.Contains(s.Text(), line) {
		t.Errorf("the resolved text has no line %s:\n%s", line, s.Text())
	}
	if u, err := s.Set(reg); err != nil || u.Of("evaporation").ID() != "evaporation/burden" {
		t.Errorf("%v", err)
	}
	laws := s.Resolve(reg).Laws
	found := false
	for _, l := range laws {
		found = found || l.Name == "burden" && l.Path == "./b" && l.Digest == someDigest
	}
	if !found {
		t.Errorf("laid open: %+v", laws)
	}
}

func TestOutsideFaults(t *testing.T) {
	refused := errors.New("it may not be started")
	for _, c := range []struct {
		what, text string
		edit       func([]Outside)
		typed      []string
		want       string // of faults and warnings
	}{
		{"a law of another process", "[laws]\nejection = \"./b\"\n", nil, nil,
			"main/x.toml:5:12: laws.ejection: ./b is evaporation/burden, a law of process evaporation: want one of ejection"},
		{"not opened, and another fault", "seed = -1\n[laws]\nevaporation = \"./b\"\n[parameters.evaporation]\nwhat = 1\n",
			func(o []Outside) { o[0].Law, o[0].Fault = nil, refused }, nil,
			"main/x.toml:4:1: galaxy: unknown key \"seed\" (known: objects, sample, radius, central-mass)\n" +
				"main/x.toml:6:15: laws.evaporation: it may not be started"},
		{"typed and not opened", "", func(o []Outside) { o[0].Law, o[0].Fault = nil, refused }, []string{"evaporation=./b"},
			"--law evaporation: it may not be started"},
		{"a parameter it has not", "[laws]\nevaporation = \"./b\"\n[parameters.evaporation]\nshar = 1\n", nil, nil,
			"main/x.toml:7:1: law evaporation/burden has no parameter \"shar\" (did you mean \"share\"? known: share, delay)"},
		{"nobody opens it", "[laws]\nevaporation = \"./b\"\n", func(o []Outside) { o[0] = Outside{} }, nil,
			"main/x.toml:5:15: laws.evaporation: ./b is a law outside the program, and nothing opened it here"},
		{"digests that are none", "[laws]\nevaporation = \"./b\"\n[trust]\nevaporation = \"sha256:12\"\nevaporatoin = 3\n", nil, nil,
			"main/x.toml:7:15: trust.evaporation: \"sha256:12\": want the digest of the law, \"sha256:\" and 64 hexadecimal digits\n" +
				"main/x.toml:8:1: trust: unknown process \"evaporatoin\" (did you mean \"evaporation\"?)"},
		{"another law on top, whose kind a population wants",
			"[laws]\nevaporation = \"./b\"\n[populations.sparks]\nkinds = [\"ember\"]\n", nil, []string{"evaporation=page"},
			"main/x.toml:6:14: populations.sparks is left out: no law of this run knows the kind \"ember\" (./b, which may, has another law in its place)"},
		{"a digest of nothing", "[trust]\nevaporation = \"" + someDigest + "\"\n", nil, nil,
			"main/x.toml:5:15: trust.evaporation has no effect: the law of the process is page, which is built in"},
	} {
		files := fstest.MapFS{"main/x.toml": {Data: []byte(galaxyLines + c.text)}}
		o := Overrides{Laws: c.typed}
		reg, outside := opened(Paths(files, "main/x.toml", o), registry(t))
		if c.edit != nil {
			c.edit(outside)
		}
		o.Outside = outside
		_, warnings, err := Load(files, "main/x.toml", reg, defaults(), o)
		got := Faults(warnings).Error()
		if err != nil {
			got = err.Error()
		}
		if got != c.want {
			t.Errorf("%s: got\n%s\nwant\n%s", c.what, got, c.want)
		}
	}
}
