// Package near finds the word somebody meant when they misspelt it.
package near

import "strings"

// Word returns the one of words that lies nearest to the misspelt word, or ""
// when none is near enough to be meant. Case, and - for _, count for nothing.
func Word(misspelt string, words []string) string {
	a := plain(misspelt)
	best, distance := "", max(2, len(a)/3)+1
	for _, w := range words {
		b := plain(w)
		d := edits(a, b)
		if len(a) >= 3 && strings.HasPrefix(b, a) {
			d = min(d, 1)
		}
		if d < distance && d < max(len(a), len(b)) {
			best, distance = w, d
		}
	}
	return best
}

// Ask is a question to append to a message, or nothing.
func Ask(misspelt string, words []string) string {
	if w := Word(misspelt, words); w != "" {
		return "; did you mean " + w + "?"
	}
	return ""
}

func plain(s string) string { return strings.ReplaceAll(strings.ToLower(s), "-", "_") }

// edits is the Levenshtein distance: how many insertions, deletions and
// replacements of single bytes turn a into b.
func edits(a, b string) int {
	row := make([]int, len(b)+1)
	for j := range row {
		row[j] = j
	}
	for i := 1; i <= len(a); i++ {
		diagonal := row[0]
		row[0] = i
		for j := 1; j <= len(b); j++ {
			replace := diagonal
			if a[i-1] != b[j-1] {
				replace++
			}
			diagonal = row[j]
			row[j] = min(replace, row[j]+1, row[j-1]+1)
		}
	}
	return row[len(b)]
}
