package verify

import (
	"bytes"
	"embed"
	"errors"
	"fmt"
	"io/fs"
	"math"
	"slices"

	"github.com/pelletier/go-toml/v2"

	"wane/scenarios"
	"wane/sim/scenario"
	"wane/sim/scenario/quantity"
)

//go:embed dates.toml
var datesFile []byte

//go:embed galaxies/*.toml
var galaxies embed.FS

// usualSlack is how far a recorded difference may stray, dex: it has two
// decimals.
const usualSlack = 0.006

// Dates are the dates that come with the program, in the order of their file.
func Dates() ([]Date, error) { return Read(datesFile) }

// Read reads a file of dates. The error joins all faults.
func Read(data []byte) ([]Date, error) {
	var file struct {
		Dates []Date `toml:"date"`
	}
	d := toml.NewDecoder(bytes.NewReader(data))
	d.DisallowUnknownFields()
	if err := d.Decode(&file); err != nil {
		var strict *toml.StrictMissingError
		if errors.As(err, &strict) {
			return nil, fmt.Errorf("verify: %s", strict.String())
		}
		return nil, fmt.Errorf("verify: %w", err)
	}
	if len(file.Dates) == 0 {
		return nil, errors.New("verify: no dates")
	}
	var faults []error
	seen := map[string]bool{}
	for i := range file.Dates {
		d := &file.Dates[i]
		for _, fault := range d.settle() {
			faults = append(faults, fmt.Errorf("verify: date %q: %s", d.Name, fault))
		}
		if seen[d.Name] {
			faults = append(faults, fmt.Errorf("verify: date %q: named twice", d.Name))
		}
		seen[d.Name] = true
	}
	return file.Dates, errors.Join(faults...)
}

// settle fills in what may be left out and returns every fault of the row.
func (d *Date) settle() (faults []string) {
	fault := func(format string, a ...any) { faults = append(faults, fmt.Sprintf(format, a...)) }
	read := func(text string) float64 {
		v, err := quantity.ParseFor(text, "yr", true)
		if err != nil {
			fault("%v", err)
		}
		return v
	}
	for _, x := range [][2]string{{"name", d.Name}, {"topic", d.Topic}, {"what", d.What}, {"source", d.Source}, {"locator", d.Locator}} {
		if x[1] == "" {
			fault("no %s", x[0])
		}
	}
	if d.Clock == "" {
		d.Clock = Clocks[0]
	}
	if d.Slack == 0 {
		d.Slack = usualSlack
	}
	d.printed, d.low, d.high = read(d.Printed), math.NaN(), math.NaN()
	if len(d.Span) == 2 {
		d.low, d.high = read(d.Span[0]), read(d.Span[1])
	}
	question, galaxy, sky := d.Law != "", d.Population != "", d.Sky != ""
	switch {
	case len(d.Span) != 0 && (len(d.Span) != 2 || !(d.low <= d.printed && d.printed <= d.high)):
		fault("span %v: want two dates with %s between them", d.Span, d.Printed)
	case !slices.Contains(Kinds, d.Kind):
		fault("kind %q: want one of %v", d.Kind, Kinds)
	case !slices.Contains(Clocks, d.Clock):
		fault("clock %q: want one of %v", d.Clock, Clocks)
	case !(d.Tolerance > 0 && d.Tolerance <= 1):
		fault("tolerance %v dex: want more than 0 to 1", d.Tolerance)
	case question == (galaxy || sky) || galaxy && sky:
		fault("want a law, a population or a sky, and only one of them")
	case question && d.Answer == "" || galaxy && d.Mark == "" || !question && d.Scenario == "":
		fault("want an answer of the law, or a scenario and a mark of the population or a date of the sky")
	case !slices.Contains([]string{Agrees, Within, Differs}, d.Verdict):
		fault("verdict %q: want %s, %s or %s", d.Verdict, Agrees, Within, Differs)
	case d.Verdict == Within && len(d.Span) == 0:
		fault("it cannot lie within a spread that the source does not give")
	case d.Verdict == Differs && (d.Reason == "" || d.Difference == nil):
		fault("it differs: want the difference and the reason")
	}
	return faults
}

// library is where the scenarios of rows come from: their own, then those of
// the program.
func library() fs.FS {
	own, err := fs.Sub(galaxies, "galaxies")
	if err != nil {
		panic("verify: the galaxies are not embedded")
	}
	return scenario.Layered(own, scenarios.FS)
}
