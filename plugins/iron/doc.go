// Package iron holds the laws of how cold matter turns to iron.
package iron

import (
	"wane/sim/law"
	"wane/sim/physics/coldmatter"
)

// accepts is cold bodies too light to collapse as iron.
func accepts() law.Accepts {
	return law.Accepts{Kinds: []string{"brown-dwarf", "white-dwarf", "relic"}, Column: "mass", High: law.At(coldmatter.LightestExploding)}
}
