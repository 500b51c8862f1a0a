package ensemble

import (
	"fmt"
	"strings"

	"wane/sim/galaxy"
)

// Words puts a condition into words: "white dwarfs hotter than 798 K".
func Words(c galaxy.Condition) string {
	what := "objects"
	if len(c.Kinds) > 0 {
		what = list(c.Kinds, plural)
	}
	parts := []string{}
	if len(c.Origins) > 0 {
		parts = append(parts, list(c.Origins, plain))
	}
	parts = append(parts, what)
	if len(c.Places) > 0 {
		parts = append(parts, list(c.Places, placeWords))
	}
	if c.Warmth != nil {
		parts = append(parts, warmthWords(*c.Warmth))
	}
	return strings.Join(parts, " ")
}

func list(words []string, say func(string) string) string {
	said := make([]string, len(words))
	for i, w := range words {
		said[i] = say(w)
	}
	if n := len(said); n > 1 {
		return strings.Join(said[:n-1], ", ") + " or " + said[n-1]
	}
	return said[0]
}

func plain(word string) string { return strings.ReplaceAll(word, "-", " ") }

func plural(kind string) string {
	if kind == "central-hole" { // there is one
		return "the central hole"
	}
	return plain(kind) + "s"
}

func placeWords(place string) string {
	switch place {
	case "bound":
		return "bound to the galaxy"
	case "central":
		return "in the centre"
	}
	return plain(place)
}

func warmthWords(w galaxy.Warmth) string {
	comparison := map[string][2]string{"temperature": {"hotter than", "colder than"}, "luminosity": {"brighter than", "fainter than"}}[w.Quantity]
	word := comparison[1]
	if w.Above {
		word = comparison[0]
	}
	if word == "" {
		word = "with " + plain(w.Quantity) + " below"
		if w.Above {
			word = "with " + plain(w.Quantity) + " above"
		}
	}
	unit := w.Unit
	switch unit {
	case "floor":
		return fmt.Sprintf("%s %.6g times their own floor", word, w.Value)
	case "solLum":
		unit = "Lsun"
	}
	return strings.TrimRight(fmt.Sprintf("%s %.6g %s", word, w.Value, unit), " ")
}
