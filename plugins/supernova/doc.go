// Package supernova holds the laws of how cold white dwarfs burn to iron by
// zero-point motion, give way, and collapse or explode.
package supernova

import (
	"wane/sim/law"
	"wane/sim/physics/coldmatter"
)

// outcomes, in the order of the words of the parameter.
func outcomes() []law.Outcome {
	return []law.Outcome{
		{Word: "collapsed", Doc: "the iron core captures its electrons and collapses", Becomes: "neutron-star"},
		{Word: "exploded", Doc: "burning disrupts the whole dwarf, all of it becomes gas", Becomes: law.Gone},
		{Word: "imploded", Doc: "the whole dwarf falls into a black hole", Becomes: "black-hole"},
	}
}

// exploded is the place of that word.
const exploded = 1

func outcomeParameter() law.Parameter {
	return law.Parameter{Name: "outcome", Doc: "what the collapse leaves", Words: []string{"neutron-star", "gas", "black-hole"},
		Citation: "Caplan 2020 (collapse by electron capture); the others: assumption"}
}

// accepts is dwarfs heavy enough to be unstable once they are iron.
func accepts() law.Accepts {
	return law.Accepts{Kinds: []string{"white-dwarf"}, Column: "mass", Low: law.At(coldmatter.LightestExploding)}
}

// remains is a note that every law here carries.
const remains = "what the collapse leaves has all of the mass: what is blown off and carried away by neutrinos is left out (assumption)"

// answer completes waits with what comes of it.
func answer(in law.Batch, wait []float64, outcome float64) law.Batch {
	m, mass, gas := in.Values("mass"), in.NewValues(), in.NewValues()
	columns := []law.Column{law.Numbers("wait", wait)}
	for w, o := range outcomes() {
		chance := in.NewValues()
		for i := range chance {
			chance[i] = 0
			if w == int(outcome) {
				chance[i] = 1
			}
		}
		columns = append(columns, law.Numbers(law.ChanceColumn(o.Word), chance))
	}
	for i := range m {
		mass[i], gas[i] = m[i], 0
		if int(outcome) == exploded {
			mass[i], gas[i] = 0, m[i]
		}
	}
	return in.Answer(append(columns, law.Numbers("mass", mass), law.Numbers("gas", gas))...)
}
