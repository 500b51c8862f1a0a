package rpc

import (
	"math"
	"strings"
	"testing"

	"github.com/google/go-cmp/cmp"
	"google.golang.org/protobuf/proto"
	"pgregory.net/rapid"
	"wane/sim/law"
	"wane/sim/rpc/wire"
)

// cards draws cards with every field set to something, empty lists as nil.
func cards() *rapid.Generator[law.Card] {
	text := rapid.StringN(0, 12, -1)
	texts := rapid.Map(rapid.SliceOfN(text, 0, 3), listed[string])
	number := rapid.Float64()
	limit := rapid.Custom(func(t *rapid.T) law.Limit {
		if rapid.Bool().Draw(t, "set") {
			return law.Limit{Set: true, Value: number.Draw(t, "value"), Parameter: text.Draw(t, "parameter")}
		}
		return law.Limit{}
	})
	fate := rapid.Map(text, func(s string) law.Fate { return law.Fate(s) })
	return rapid.Custom(func(t *rapid.T) law.Card {
		str := func(name string) string { return text.Draw(t, name) }
		return law.Card{
			Process: str("process"), Name: str("name"), Version: str("version"), Summary: str("summary"),
			Formula: str("formula"), Domain: str("domain"), Sources: texts.Draw(t, "sources"), Notes: texts.Draw(t, "notes"),
			Accepts: law.Accepts{Kinds: texts.Draw(t, "kinds"), Column: str("column"), Low: limit.Draw(t, "low"), High: limit.Draw(t, "high")},
			Wears:   str("wears"), Frame: rapid.Bool().Draw(t, "frame"), StopOutcome: str("stop"), StopFate: fate.Draw(t, "stop fate"),
			Effect: str("effect"), Idle: rapid.Bool().Draw(t, "idle"), Tolerance: number.Draw(t, "tolerance"),
			Questions: some(t, "questions", func() law.Question {
				return law.Question{Name: str("question"), Inputs: texts.Draw(t, "inputs"), Words: texts.Draw(t, "words")}
			}),
			Parameters: some(t, "parameters", func() law.Parameter {
				return law.Parameter{
					Name: str("parameter"), Unit: str("unit"), Doc: str("doc"), Low: number.Draw(t, "low"), High: number.Draw(t, "high"),
					Preset: number.Draw(t, "preset"), Log10: rapid.Bool().Draw(t, "log10"), Citation: str("citation"), Words: texts.Draw(t, "words"),
				}
			}),
			Thresholds: some(t, "thresholds", func() law.Threshold {
				return law.Threshold{
					Kind: str("kind"), Mass: number.Draw(t, "mass"), Parameter: str("parameter"), Becomes: str("becomes"), Outcome: str("outcome"),
					ByWord: listed(rapid.SliceOfN(number, 0, 3).Draw(t, "by word")),
				}
			}),
			Clocks: some(t, "clocks", func() law.Clock {
				return law.Clock{Name: str("clock"), Doc: str("doc"), Outcome: str("outcome"), Fate: fate.Draw(t, "fate")}
			}),
			Outcomes: some(t, "outcomes", func() law.Outcome {
				return law.Outcome{Word: str("word"), Doc: str("doc"), Becomes: str("becomes")}
			}),
			Kinds: some(t, "own kinds", func() law.Kind {
				return law.Kind{Name: str("kind"), Doc: str("doc"), Composition: rapid.Uint8Range(0, law.Pure).Draw(t, "composition")}
			}),
		}
	})
}

func some[A any](t *rapid.T, name string, one func() A) []A {
	var out []A
	for range rapid.IntRange(0, 2).Draw(t, name) {
		out = append(out, one())
	}
	return out
}

// TestCardRoundTrip sends cards to bytes and back: nothing may be lost.
func TestCardRoundTrip(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		card := cards().Draw(t, "card")
		b, err := proto.Marshal(cardToWire(card, "here"))
		if err != nil {
			t.Fatal(err)
		}
		var w wire.Card
		if err := proto.Unmarshal(b, &w); err != nil {
			t.Fatal(err)
		}
		got, faults := cardFromWire(&w)
		if len(faults) > 0 {
			t.Fatal(faults)
		}
		if diff := cmp.Diff(card, got); diff != "" {
			t.Fatal(diff)
		}
		if w.Runtime != "here" || w.Contract != Contract {
			t.Fatalf("runtime %q, contract %d", w.Runtime, w.Contract)
		}
	})
}

// TestWireCardFaults lists all at once what only the wire form can get wrong.
func TestWireCardFaults(t *testing.T) {
	_, faults := cardFromWire(&wire.Card{
		Contract: Contract + 1, Features: []string{"shared-columns"},
		Questions: []*wire.Question{{Name: "wear", Inputs: []*wire.Column{{Name: "mass", Unit: "kg"}, {Name: "kind"}}}},
		Kinds:     []*wire.Kind{{Name: "strange-star", Composition: "quarks"}},
	})
	want := []string{
		"written for contract 2, this program speaks contracts up to 1",
		`needs the feature "shared-columns"`,
		`question wear: column mass: unit "kg", want "solMass"`,
		`kind strange-star: composition "quarks"`,
	}
	if len(faults) != len(want) {
		t.Fatalf("%d faults, want %d: %v", len(faults), len(want), faults)
	}
	for i, w := range want {
		if !strings.Contains(faults[i].Error(), w) {
			t.Errorf("fault %d: %v, want %s", i, faults[i], w)
		}
	}
	if _, faults = cardFromWire(&wire.Card{}); len(faults) != 1 || !strings.Contains(faults[0].Error(), "no contract number") {
		t.Errorf("a card without a contract: %v", faults)
	}
}

// TestUnitsOfColumns: what a Go law sends names the unit of every column.
func TestUnitsOfColumns(t *testing.T) {
	q := questionToWire(law.Question{Name: "shine", Inputs: []string{"mass", "log10_age"}})
	if q.Inputs[0].Unit != "solMass" || q.Inputs[1].Unit != "yr" {
		t.Errorf("units %v", q.Inputs)
	}
	if l := limitToWire(law.At(math.Inf(1))); l.Value != math.Inf(1) {
		t.Errorf("limit %v", l)
	}
}
