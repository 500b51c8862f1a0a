package scenario

import (
	"strings"
	"testing"
)

// Every kind of bad input, with every message it gives.
func TestFaults(t *testing.T) {
	for name, c := range map[string]struct{ text, want string }{
		"unknown key": {
			"base = \"reach\"\nsede = 1\n[galaxy]\nradios = \"1 pc\"\n[lawns]\n",
			`x.toml:2:1: unknown key "sede" (did you mean "seed"? known: base, title, question, until, realisations, seed, galaxy, laws, trust, parameters, populations)
x.toml:4:1: galaxy: unknown key "radios" (did you mean "radius"? known: objects, sample, radius, central-mass)
x.toml:5:2: unknown table "lawns" (did you mean "laws"? known: base, title, question, until, realisations, seed, galaxy, laws, trust, parameters, populations)`,
		},
		"key in the wrong table": {
			"base = \"reach\"\nobjects = 1\nevaporation = \"page\"\n",
			`x.toml:2:1: unknown key "objects" (it belongs in [galaxy])
x.toml:3:1: unknown key "evaporation" (a law is chosen in [laws], its parameters are set in [parameters.evaporation])`,
		},
		"wrong type": {
			"base = \"reach\"\ntitle = 3\nseed = \"one\"\nlaws = 1\n[galaxy]\nradius = true\nsample = 1.5\nobjects = [1]\n[parameters]\nevaporation = 1\n[populations]\np = 2",
			`x.toml:2:9: title: got a number, want a text
x.toml:3:8: seed: got a text, want a whole number
x.toml:4:8: laws: got a number, want a table, [laws]
x.toml:6:10: galaxy.radius: got true or false, want a number with its unit, such as "1 pc"
x.toml:7:10: galaxy.sample: 1.5: want a whole number, 1 .. 100000000
x.toml:8:1: galaxy.objects: got a list, want a number
x.toml:10:15: parameters.evaporation: got a number, want a table, [parameters.evaporation]
x.toml:12:5: populations.p: got a number, want a table, [populations.p]`,
		},
		"wrong unit": {
			"base = \"reach\"\nuntil = 1e30\n[galaxy]\nradius = \"10 Msun\"\ncentral-mass = 4e6\n[parameters.nucleon-decay]\nlifetime = \"1e37 years\"\nheat_share = \"0.5 K\"",
			`x.toml:2:9: until: 1e30 has no unit: want "1e30 yr", in quotes
x.toml:4:10: galaxy.radius: "10 Msun" is a mass: want a length, such as "1 pc"
x.toml:5:16: galaxy.central-mass: 4e6 has no unit: want "4e6 Msun", in quotes
x.toml:7:12: nucleon-decay.lifetime: "1e37 years": unknown unit "years" (did you mean "yr"?)
x.toml:8:14: nucleon-decay.heat_share: "0.5 K" is a temperature: want a pure number, without unit`,
		},
		"out of range": {
			"base = \"reach\"\nuntil = \"0.1 yr\"\nrealisations = 0\nseed = -1\n[galaxy]\nobjects = 0\nradius = \"-8 kpc\"\ncentral-mass = \"1e20 Msun\"\n[parameters.nucleon-decay]\nlifetime = \"1e33 yr\"\nheat_share = 2",
			`x.toml:2:9: until: "0.1 yr": want >= 1 yr
x.toml:3:16: realisations: 0: want a whole number, 1 .. 1000000
x.toml:4:8: seed: -1: want a whole number, 0 .. 18446744073709551615
x.toml:6:11: galaxy.objects: 0: want 1 .. 1e15
x.toml:7:10: galaxy.radius: "-8 kpc": want 0.001 .. 1e7 pc
x.toml:8:16: galaxy.central-mass: "1e20 Msun": want 0 .. 1e15 Msun
x.toml:10:12: nucleon-decay.lifetime: "1e33 yr": want 2.512e34 .. 1e41 yr
x.toml:11:14: nucleon-decay.heat_share: 2: want 0.333333 .. 1`,
		},
		"not finite": {
			"base = \"reach\"\nuntil = \"inf yr\"\n[galaxy]\nobjects = nan\nradius = inf\ncentral-mass = \"nan\"\n[parameters.evaporation]\nspin = -inf",
			`x.toml:2:9: until: "inf yr": no number at its start
x.toml:4:11: galaxy.objects: "nan": want a finite number
x.toml:5:10: galaxy.radius: "inf": want a finite number
x.toml:6:16: galaxy.central-mass: "nan": want a finite number
x.toml:8:8: evaporation.spin: "-inf": want a finite number`,
		},
		"unknown law": {
			"base = \"reach\"\n[laws]\nnucleon-decay = \"grand-unfied\"\ninfall = 3\nevapouration = \"page\"\nremnant = \"none\"",
			`x.toml:3:17: laws.nucleon-decay: unknown law "grand-unfied" (did you mean "grand-unified"? known: grand-unified, stable, virtual-holes, none)
x.toml:4:10: laws.infall: got a number, want the name of a law (known: branching, none)
x.toml:5:1: laws: unknown process "evapouration" (did you mean "evaporation"?)
x.toml:6:11: laws.remnant: unknown law "none" (known: light-only, simple)`,
		},
		"law of another process": {
			"base = \"reach\"\n[laws]\nevaporation = \"mestel-debye\"",
			`x.toml:3:15: laws.evaporation: "mestel-debye" is a law of process white-dwarf-cooling (known: page, none)`,
		},
		"parameter of another law": {
			"base = \"reach\"\n[laws]\nnucleon-decay = \"stable\"\ninfall = \"none\"\n[parameters]\nnucleon-decay.lifetime = \"1e37 yr\"\nevaporation.f_in = 0.1\nevaporation.spinn = 0.1\ninfall.f_in = 0.1",
			`x.toml:6:15: law nucleon-decay/stable has no parameter "lifetime": it is one of nucleon-decay/grand-unified (known: none)
x.toml:7:13: law evaporation/page has no parameter "f_in": it is one of infall/branching (known: spin)
x.toml:8:13: law evaporation/page has no parameter "spinn" (did you mean "spin"? known: spin)
x.toml:9:1: parameters.infall: the process has no law in this run (known: branching)`,
		},
		"wrong word": {
			"base = \"reach\"\n[parameters.nucleon-decay]\ngone = \"transparant\"\n[parameters.nucleon]\nx = 1",
			`x.toml:3:8: nucleon-decay.gone: "transparant": want one of its words (did you mean "transparent"? known: transparent, last-nucleon)
x.toml:4:13: parameters: unknown process "nucleon" (known: expansion, vacuum-decay, dark-energy-decay, mass-function, star-formation, metals, substellar-limit, lifetime, remnant, collapse, white-dwarf-cooling, neutron-star-cooling, brown-dwarf-cooling, warmth, ejection, infall, encounter, orbital-decay, nucleon-decay, evaporation, curvature, supernova, iron, tunnelling)`,
		},
		"twice": {
			"base = \"reach\"\nseed = 1\nseed = 2\n[galaxy]\nsample = 10\n[laws]\n[galaxy]\nsample = 11\n[[laws]]\n[seed]\nx = 1\n[galaxy.radius]",
			`x.toml:3:1: key "seed" is given twice (first in line 2)
x.toml:7:2: table [galaxy] is given twice (first in line 4)
x.toml:8:1: key "sample" is given twice (first in line 5)
x.toml:9:3: [[laws]] is a list of tables: want one table, [laws]
x.toml:10:2: "seed" is no table: it is given as a number in line 2
x.toml:12:9: galaxy.radius: got a table, want a number with its unit, such as "1 pc"`,
		},
		"syntax": {
			"base = \"reach\"\nseed 1\ntitle = \"open\n[galaxy\nobjects = 1\n[laws]\nevaporation = = 3\ninfall = \"nonsense\"",
			"x.toml:2:6: expected '=' after key\n" +
				"x.toml:3:14: basic strings cannot have new lines\n" +
				"x.toml:4:8: expected ']' to close table name\n" +
				"x.toml:7:15: unexpected character U+003D '=' at start of value\n" +
				`x.toml:8:10: laws.infall: unknown law "nonsense" (known: branching, none)`,
		},
		"empty":        {"", `x.toml:1:1: the file is empty: want a scenario, at the least base = "lantern-reach"`},
		"comment only": {"# nothing\n\n", `x.toml:1:1: the file is empty: want a scenario, at the least base = "lantern-reach"`},
		"binary":       {"base = \"reach\"\n\x00\x01\x02", `x.toml:2:1: the file is no text: it holds the byte 0x00`},
		"not UTF-8":    {"title = \"é\xff\"", `x.toml:1:11: the file is no text: it holds the byte 0xff`},
		"UTF-16":       {"\xff\xfeb\x00", `x.toml:1:1: the file is UTF-16 text: save it as UTF-8`},
		"nothing given": {
			"seed = 1",
			`x.toml:1:1: galaxy.objects is not given: want objects = 2e11 in [galaxy], or a base that has it
x.toml:1:1: galaxy.radius is not given: want radius = "10 kpc" in [galaxy], or a base that has it`,
		},
		"syntax errors, which may hide what is missing": {
			"base = \n[galaxy\n",
			`x.toml:1:8: unexpected character U+000A at start of value
x.toml:2:8: expected ']' to close table name`,
		},
		"too large a sample": {
			"base = \"reach\"\n[galaxy]\nobjects = 100",
			`x.toml:3:11: galaxy.sample: 100000 objects: want at most the 100 that the galaxy has (galaxy.objects)`,
		},
		"too large a galaxy": {
			"[galaxy]\nobjects = 2e11\nradius = \"1 pc\"",
			`x.toml:2:11: galaxy.objects: 2e11 objects cannot be held one by one (at most 1e8): want a sample, such as sample = 100_000`,
		},
		"half an object": {
			"[galaxy]\nobjects = 2.5\nradius = \"1 pc\"",
			`x.toml:2:11: galaxy.objects: 2.5: want a whole number of objects, or a sample`,
		},
		"base of itself":  {"base = \"x\"", `x.toml:1:8: bases form a loop: x.toml -> x.toml`},
		"no such base":    {"base = \"raech\"", `x.toml:1:8: base: no scenario "raech" (did you mean "reach"? known: reach)`},
		"base elsewhere":  {"base = \"../reach\"", `x.toml:1:8: base: "../reach": want the name of a scenario, such as "lantern-reach"`},
		"fault in a base": {"base = \"bad\"\nseed = -1", "bad.toml:1:1: unknown key \"sede\" (did you mean \"seed\"? known: base, title, question, until, realisations, seed, galaxy, laws, trust, parameters, populations)\nx.toml:2:8: seed: -1: want a whole number, 0 .. 18446744073709551615"},
		"populations": {
			"base = \"reach\"\n[populations.stars]\n[populations.\"a b\"]\n[populations.p]\nkinds = [\"white-dwarfs\", 3, \"star\", \"star\"]\nplaces = []\norigins = 1\ntemperature = \"798 K\"\nluminosity = \"> 3 K\"\nkind = 1\n[populations.q]\ntemperature = \">= 3 K\"\n[populations.r]\ntemperature = \"> 0 K\"\n[populations.s]\ntemperature = 5",
			`x.toml:2:14: populations.stars: every run counts a population of this name: want another name
x.toml:3:14: populations: "a b" is no name: want up to 40 letters, digits, - and _, a letter first
x.toml:5:10: populations.p.kinds: unknown word "white-dwarfs" (did you mean "white-dwarf"? known: star, brown-dwarf, white-dwarf, neutron-star, black-hole, central-hole, relic)
x.toml:5:26: populations.p.kinds: got a number, want a word (known: star, brown-dwarf, white-dwarf, neutron-star, black-hole, central-hole, relic)
x.toml:5:37: populations.p.kinds: "star" stands twice
x.toml:6:1: populations.p.places: an empty list: want at least one word, or no places at all for any (known: bound, adrift, central)
x.toml:7:11: populations.p.origins: got a number, want a list of words (known: founded, merged)
x.toml:8:15: populations.p.temperature: "798 K": want > or < first, such as "> 798 K"
x.toml:9:1: populations.p: want either temperature or luminosity, not both
x.toml:9:14: populations.p.luminosity: "3 K" is a temperature: want a power, such as "1 Lsun"
x.toml:10:1: populations.p: unknown key "kind" (did you mean "kinds"? known: kinds, places, origins, temperature, luminosity)
x.toml:12:15: populations.q.temperature: ">= 3 K": want > or < alone, such as "> 798 K"
x.toml:14:15: populations.r.temperature: "> 0 K": want > 0
x.toml:16:15: populations.s.temperature: got a number, want a comparison, such as "> 798 K"`,
		},
		"a gap between laws": {
			"base = \"reach\"\n[laws]\nremnant = \"light-only\"",
			"x.toml:3:11: question die of a star: no law for mass from 8 on, beyond law remnant/light-only\n" +
				"x.toml:3:11: question remain of a star: no law for mass from 8 on, beyond law remnant/light-only",
		},
	} {
		t.Run(name, func(t *testing.T) {
			fsys := files(c.text)
			fsys["bad.toml"] = fsys["reach.toml"]
			if !strings.Contains(c.text, `"bad"`) {
				delete(fsys, "bad.toml")
			} else {
				bad := *fsys["bad.toml"]
				bad.Data = append([]byte("sede = 1\n"), bad.Data...)
				fsys["bad.toml"] = &bad
			}
			s, _, err := Load(fsys, "x.toml", registry(t), defaults(), Overrides{})
			if err == nil || err.Error() != c.want || s != nil {
				t.Errorf("got\n%v\nwant\n%s", err, c.want)
			}
		})
	}
}

// The command line is judged like a file, under the name of the setting.
func TestOverrideFaults(t *testing.T) {
	_, _, err := Load(files(`base = "reach"`), "x.toml", registry(t), defaults(), Overrides{
		Laws: []string{"nucleon-decay=stabel", "infall", "evaporation=page", "evaporation=page"},
		Sets: []string{"evaporation.spin=2", "galaxy.radius=8", "galaxy.mass=1Msun", "remnant.scatter=1 kpc", "seed=3",
			"evaporation.spin=0.5", "infal.f_in=0.1", "galaxy.objects=1e20"},
		Realisations: -1, Objects: -5, Until: "tomorrow",
	})
	const want = `--law infall: want process=name, such as "nucleon-decay=stable", or process=./path
--law evaporation: given twice: a run has one law of each process
--set seed=3: want process.parameter=value or galaxy.key=value, such as "galaxy.radius=8kpc"
--set evaporation.spin: given twice
--set evaporation.spin: "2": want 0 .. 1
--set galaxy.mass: galaxy: unknown key "mass" (known: objects, sample, radius, central-mass)
--set galaxy.radius: "8": no unit: want a length, such as "8 pc"
--set galaxy.objects: "1e20": want 1 .. 1e15
--law nucleon-decay: unknown law "stabel" (did you mean "stable"? known: grand-unified, stable, virtual-holes, none)
--set remnant.scatter: "1 kpc" is a length: want a mass, such as "1 Msun"
--set infal.f_in: parameters: unknown process "infal" (did you mean "infall"?)
--realisations: "-1": want a whole number, 1 .. 1000000
--objects: galaxy.sample: "-5": want a whole number, 1 .. 100000000
--until: "tomorrow": no number at its start`
	if err == nil || err.Error() != want {
		t.Errorf("got\n%v\nwant\n%s", err, want)
	}
}
