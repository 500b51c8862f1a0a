package cli

import (
	"bytes"
	"context"
	"os"
	"path/filepath"
	"regexp"
	"runtime"
	"strings"
	"testing"

	"github.com/google/go-cmp/cmp"
)

// sample is a block of README.md that shows a command and what it prints.
var sample = regexp.MustCompile("(?s)```console\n\\$ wane ([^\n]*)\n(.*?)```")

// The samples of README.md are what the program prints, to the byte. Those of
// whole runs take their time: they are compared under WANE_REQUIRE=1, and where
// the same bytes are promised, on amd64.
func TestReadmeIsReal(t *testing.T) {
	file := filepath.Join("..", "..", "..", "README.md")
	text, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	if len(sample.FindAll(text, -1)) < 5 {
		t.Fatal("README.md shows next to nothing")
	}
	fresh := sample.ReplaceAllFunc(text, func(block []byte) []byte {
		m := sample.FindSubmatch(block)
		command, shown := string(m[1]), string(m[2])
		compared := os.Getenv("WANE_REQUIRE") == "1" && runtime.GOARCH == "amd64"
		if strings.HasPrefix(command, "run ") && !compared {
			return block
		}
		got := printed(t, command)
		if diff := cmp.Diff(shown, got); diff != "" && !*update {
			t.Errorf("README.md: wane %s (-shown +printed):\n%s", command, diff)
		}
		return []byte("```console\n$ wane " + command + "\n" + got + "```")
	})
	if *update {
		if err := os.WriteFile(file, fresh, 0o644); err != nil {
			t.Fatal(err)
		}
	}
}

// printed is what a command prints on standard output.
func printed(t *testing.T, command string) string {
	t.Helper()
	var out, errs bytes.Buffer
	p := Standard()
	p.Out, p.Err = &out, &errs
	root := p.root()
	root.SetArgs(strings.Fields(command))
	root.SetOut(&out)
	root.SetErr(&errs)
	if err := root.ExecuteContext(context.Background()); err != nil {
		t.Errorf("wane %s: %v", command, err)
	}
	return out.String()
}
