package scenarios

import (
	"bufio"
	"bytes"
	"io/fs"
	"slices"
	"strings"
)

// Groups are the questions by which the scenarios are grouped, in the order in
// which they are listed.
var Groups = []string{
	"When does everything fade?",
	"Until when do stars shine?",
	"When is a dwarf cold?",
	"How long does the galaxy hold together?",
	"Does matter last?",
	"When are the black holes gone?",
	"Is space ever empty and cold?",
	"Does the vacuum last?",
}

// Head is what the head comment of a scenario says: paragraphs that begin with
// a word and a colon.
type Head struct {
	Group    string // one of Groups
	Question string
	LookAt   string // what to look at in the answer
	Sources  string
	Cost     string
}

// ReadHead reads the head comment of a scenario. What it does not say is empty.
func ReadHead(fsys fs.FS, file string) (Head, error) {
	data, err := fs.ReadFile(fsys, file)
	if err != nil {
		return Head{}, err
	}
	parts := map[string][]string{}
	named := []string{"Group", "Question", "Look at", "Sources", "Cost"}
	now := ""
	for lines := bufio.NewScanner(bytes.NewReader(data)); lines.Scan(); {
		text, comment := strings.CutPrefix(lines.Text(), "#")
		if !comment {
			break
		}
		text = strings.TrimSpace(text)
		if name, rest, ok := strings.Cut(text, ":"); ok && slices.Contains(named, name) {
			now, text = name, strings.TrimSpace(rest)
		} else if text == "" {
			now = ""
		}
		if now != "" {
			parts[now] = append(parts[now], text)
		}
	}
	part := func(name string) string { return strings.Join(parts[name], " ") }
	return Head{part("Group"), part("Question"), part("Look at"), part("Sources"), part("Cost")}, nil
}
