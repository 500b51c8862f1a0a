package law

import "fmt"

// CheckCard lists everything wrong with a card: an unknown process, questions
// its role is not asked or lacks, columns outside the catalogue, presets
// outside their range, missing citations.
func CheckCard(c Card) []error {
	var faults []error
	bad := func(format string, a ...any) { faults = append(faults, fmt.Errorf("card: "+format, a...)) }
	p, ok := ProcessNamed(c.Process)
	if !ok {
		bad("unknown process %q", c.Process)
		return faults
	}
	if c.Name == "" || c.Version == "" || c.Summary == "" {
		bad("name, version and summary must be given")
	}
	if len(c.Sources) == 0 {
		bad("no source: name the publication, or say that it is an assumption")
	}
	allowed := questionsOf(p)
	for _, q := range allowed.required {
		if !c.Answers(q) {
			bad("process %s is asked %q, which the card does not answer", p.Name, q)
		}
	}
	for _, q := range c.Questions {
		if !contains(allowed.required, q.Name) && !contains(allowed.optional, q.Name) {
			bad("question %q is not one that process %s is asked", q.Name, p.Name)
			continue
		}
		for _, in := range q.Inputs {
			if _, ok := ColumnNamed(q.Name, in); !ok {
				bad("question %s: unknown column %q", q.Name, in)
			}
		}
	}
	for _, x := range c.Parameters {
		checkParameter(x, bad)
	}
	if p.Role == Sky {
		for _, name := range SkyParameters {
			if (&Use{Card: c, Parameters: make([]float64, len(c.Parameters))}).lacks(name) {
				bad("a law of process %s needs the parameter %q", p.Name, name)
			}
		}
	}
	for _, t := range c.Thresholds {
		if t.Parameter != "" && (&Use{Card: c, Parameters: make([]float64, len(c.Parameters))}).lacks(t.Parameter) {
			bad("threshold of %s: no parameter %q", t.Kind, t.Parameter)
		}
	}
	return faults
}

// SkyParameters are the parameters every sky law has, by these names: today's
// expansion rate (km/s/Mpc), matter and radiation as fractions of the critical
// density, and the temperature of the relic sky (K).
var SkyParameters = []string{"hubble", "matter", "radiation", "temperature"}

func (u *Use) lacks(name string) bool { _, ok := u.Parameter(name); return !ok }

func checkParameter(x Parameter, bad func(string, ...any)) {
	if x.Citation == "" {
		bad("parameter %s: no citation", x.Name)
	}
	if len(x.Words) > 0 {
		if !(x.Preset >= 0 && int(x.Preset) < len(x.Words)) {
			bad("parameter %s: preset %v is no index of its words", x.Name, x.Preset)
		}
		return
	}
	if !(x.Low <= x.Preset && x.Preset <= x.High) {
		bad("parameter %s: preset %v outside %v .. %v", x.Name, x.Preset, x.Low, x.High)
	}
}
