package near

import "testing"

func TestWord(t *testing.T) {
	words := []string{"temperature", "mass", "birth_mass", "age", "white-dwarf-cooling"}
	for _, c := range []struct{ misspelt, want string }{
		{"temprature", "temperature"},
		{"temp", "temperature"},
		{"Mas", "mass"},
		{"birth-mass", "birth_mass"},
		{"ago", "age"},
		{"white-dwarf", "white-dwarf-cooling"},
		{"zzz", ""},
		{"", ""},
	} {
		if got := Word(c.misspelt, words); got != c.want {
			t.Errorf("Word(%q) = %q, want %q", c.misspelt, got, c.want)
		}
	}
}

// The distances are the textbook examples of Levenshtein's measure.
func TestEdits(t *testing.T) {
	for _, c := range []struct {
		a, b string
		want int
	}{{"kitten", "sitting", 3}, {"flaw", "lawn", 2}, {"saturday", "sunday", 3}, {"", "abc", 3}} {
		if got := edits(c.a, c.b); got != c.want {
			t.Errorf("edits(%q, %q) = %d, want %d", c.a, c.b, got, c.want)
		}
	}
}
