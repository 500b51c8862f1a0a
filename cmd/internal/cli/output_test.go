package cli

import (
	"errors"
	"io"
	"strings"
	"testing"
)

type fullDisk struct{}

func (fullDisk) Write([]byte) (int, error) { return 0, errors.New("no space left on device") }

// An answer that could not be written is a failure, whatever the command.
func TestOutputThatCannotBeWritten(t *testing.T) {
	for _, command := range []string{
		"run little-lamp --realisations 1 --objects 50", "check little-lamp", "scenarios", "laws", "laws evaporation/page",
		"ask evaporation/page mass=1Msun", "sky", "schema", "version",
	} {
		for _, form := range []string{"", " --json"} {
			var said strings.Builder
			p := Standard()
			p.Out, p.Err = fullDisk{}, &said
			if code := p.Main(strings.Fields(command + form)); code != ExitFailed {
				t.Errorf("%s%s: exit code %d, want %d", command, form, code, ExitFailed)
			}
			if said.String() != "wane: no space left on device\n" {
				t.Errorf("%s%s: said %q", command, form, said.String())
			}
			p.Out = io.Discard
			if code := p.Main(strings.Fields(command + form)); code != ExitOK {
				t.Errorf("%s%s: exit code %d", command, form, code)
			}
		}
	}
}
