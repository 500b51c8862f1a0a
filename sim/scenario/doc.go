// Package scenario reads a scenario, a TOML file that says which galaxy to
// run under which laws, into validated values.
//
// The shape of a file; every key may be left out but the galaxy's objects and
// radius, which must come from somewhere:
//
//	title    = "Lantern Reach with lasting nucleons"
//	question = "What fades, and when, if nucleons never decay?"
//	base     = "lantern-reach"    # start from lantern-reach.toml
//	until    = "10^1100 yr"       # since the Big Bang; "never" is the default
//	realisations = 40             # 20 is the default
//	seed     = 1                  # 1 is the default
//
//	[galaxy]
//	objects      = 2e11           # of the real galaxy
//	sample       = 100_000        # held one by one for all; without it: whole
//	radius       = "10 kpc"       # holds half the mass
//	central-mass = "4.3e6 Msun"   # of the central hole; 0 is the default: none
//
//	[laws]                        # process = law; the others keep their default
//	nucleon-decay = "grand-unified"
//
//	[parameters.nucleon-decay]    # of the law that the process has
//	lifetime = "1e37 yr"
//
//	[populations.warm-dwarfs]     # counted besides those of every run
//	kinds       = ["white-dwarf"]
//	places      = ["bound"]
//	origins     = ["founded"]
//	temperature = "> 60 K"        # or luminosity = "> 1e-6 Lsun", or "> 1.1 floor"
//
// A base is read first and completely; what the file says replaces it, key by
// key, and a population as a whole. A file that gives a process another law
// than its base takes that law's presets: parameters that the base set for the
// old law fall away, with a warning. Title and question are not inherited.
// Command line settings come last, under the same rules.
//
// All faults of all files are reported together, each with file, line, column,
// the value with its unit, and what is allowed.
package scenario
