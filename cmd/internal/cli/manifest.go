package cli

import (
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/rpc/folder"
	"wane/sim/scenario"
)

// manifest is what is needed to repeat a run. It holds no date, and no path but
// those of laws outside the program, so the same run writes the same bytes.
type manifest struct {
	Schema       string       `json:"schema"`
	Wane         build        `json:"wane"`
	Scenario     scenarioJSON `json:"scenario"`
	Laws         []lawJSON    `json:"laws"`
	Seed         uint64       `json:"seed"`
	Objects      int64        `json:"objects"`
	Realisations int          `json:"realisations"`
	Requested    int          `json:"requested"`
	Interrupted  bool         `json:"interrupted"`
}

type scenarioJSON struct {
	Name   string `json:"name"`
	Digest string `json:"digest_sha256"`
	Text   string `json:"text"`
}

type lawJSON struct {
	Process    string           `json:"process"`
	Name       string           `json:"name"`
	Version    string           `json:"version"`
	Parameters []parameterValue `json:"parameters"`
	Outside    *outsideJSON     `json:"outside,omitempty"`
}

// outsideJSON is what a law outside the program consists of.
type outsideJSON struct {
	Path          string        `json:"path"` // as it was given
	Digest        string        `json:"digest"`
	Files         []folder.File `json:"files"`
	Program       folder.File   `json:"program"`       // what was started
	Repeatability string        `json:"repeatability"` // portable: the same bits everywhere; or tolerance
	Tolerance     float64       `json:"tolerance,omitempty"`
	Runtime       string        `json:"runtime"`
}

func outsideOf(o *Outside) *outsideJSON {
	if o == nil {
		return nil
	}
	j := &outsideJSON{Path: o.Path, Digest: o.Digest, Files: o.Files, Program: o.Program, Repeatability: "portable", Runtime: o.Runtime}
	if t := o.card().Tolerance; t > 0 {
		j.Repeatability, j.Tolerance = "tolerance", t
	}
	return j
}

// parameterValue is a parameter as a run uses it.
type parameterValue struct {
	Name     string `json:"name"`
	Value    any    `json:"value"` // a number, or a word
	Unit     string `json:"unit"`
	Preset   bool   `json:"preset"`
	Citation string `json:"citation"`
}

func manifestOf(l *loaded, summary *ensemble.Summary) manifest {
	sc := l.Scenario
	return manifest{
		Schema: "wane-manifest-1", Wane: thisBuild(),
		Scenario: scenarioJSON{sc.Name, sc.Digest, sc.Text()}, Laws: lawsOf(l),
		Seed: sc.Seed, Objects: summary.Objects, Realisations: summary.Realisations, Requested: summary.Requested,
		Interrupted: summary.Interrupted,
	}
}

// lawsOf lists the laws of a scenario with every parameter.
func lawsOf(run *loaded) []lawJSON {
	out := []lawJSON{}
	for _, process := range law.Processes {
		l, ok := run.registry.Find(process.Name, run.Laws[process.Name])
		if !ok {
			continue
		}
		c := l.Describe()
		j := lawJSON{c.Process, c.Name, c.Version, []parameterValue{}, outsideOf(run.of(c.Process))}
		for _, x := range c.Parameters {
			j.Parameters = append(j.Parameters, parameterOf(x, run.Parameters[c.Process][x.Name]))
		}
		out = append(out, j)
	}
	return out
}

func parameterOf(x law.Parameter, value float64) parameterValue {
	v := parameterValue{Name: x.Name, Unit: x.Unit, Value: finite(value), Preset: value == x.Preset, Citation: x.Citation}
	switch {
	case len(x.Words) > 0:
		v.Value = scenario.Show(x, value)
	case x.Log10:
		v.Unit = "log(" + x.Unit + ")"
	}
	return v
}
