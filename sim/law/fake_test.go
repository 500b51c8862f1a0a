package law

// fake is a law made of a card and a function.
type fake struct {
	card   Card
	answer func(question string, in Batch) (Batch, error)
}

func (f fake) Describe() Card                           { return f.card }
func (f fake) Answer(q string, in Batch) (Batch, error) { return f.answer(q, in) }

// card is a faultless card of a process, for tests to spoil.
func card(process, name string, questions ...Question) Card {
	return Card{Process: process, Name: name, Version: "1", Summary: "a test law", Sources: []string{"assumption"}, Questions: questions}
}

func use(c Card) *Use { return NewUse(fake{card: c}) }

func stars(c Card, low, high Limit) Card {
	c.Accepts = Accepts{Kinds: []string{"star"}, Column: "mass", Low: low, High: high}
	return c
}

func mUp(preset float64) Parameter {
	return Parameter{Name: "m_up", Unit: "solMass", Doc: "largest star that leaves a white dwarf", Low: 1, High: 20, Preset: preset, Citation: "assumption"}
}

var (
	die    = Question{Name: "die", Inputs: []string{"mass"}, Words: []string{"white-dwarf"}}
	remain = Question{Name: "remain", Inputs: []string{"mass", "u"}}
)
