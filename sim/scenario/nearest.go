package scenario

import (
	"fmt"
	"strings"
)

// Nearest returns the known word that a misspelt one most likely means, or
// "" when none is near: at most one slip in three letters, where a slip is a
// letter missing, added, changed, or swapped with its neighbour.
func Nearest(word string, known []string) string {
	if len(word) > 60 {
		return ""
	}
	best, least := "", max(1, len(word)/3)+1
	for _, k := range known {
		if strings.EqualFold(k, word) {
			return k
		}
		if d := slips(strings.ToLower(word), k); d < least {
			best, least = k, d
		}
	}
	return best
}

// slips is the edit distance with swaps of neighbours (optimal string
// alignment).
func slips(a, b string) int {
	before, last, now := make([]int, len(b)+1), make([]int, len(b)+1), make([]int, len(b)+1)
	for j := range last {
		last[j] = j
	}
	for i := 1; i <= len(a); i++ {
		now[0] = i
		for j := 1; j <= len(b); j++ {
			change := 1
			if a[i-1] == b[j-1] {
				change = 0
			}
			now[j] = min(last[j]+1, now[j-1]+1, last[j-1]+change)
			if i > 1 && j > 1 && a[i-1] == b[j-2] && a[i-2] == b[j-1] {
				now[j] = min(now[j], before[j-2]+1)
			}
		}
		before, last, now = last, now, before
	}
	return last[len(b)]
}

// among ends a message about an unknown word: the suggestion and the list, or
// the suggestion alone where the list is long.
func among(word string, known []string) string {
	list := strings.Join(known, ", ")
	if len(known) == 0 {
		list = "none"
	}
	const long = 12
	if n := Nearest(word, known); n != "" {
		if len(known) > long {
			return fmt.Sprintf("(did you mean %q?)", n)
		}
		return fmt.Sprintf("(did you mean %q? known: %s)", n, list)
	}
	return fmt.Sprintf("(known: %s)", list)
}
