package cli

import (
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/scenario"
)

// manifest is what is needed to repeat a run. It holds no date and no path,
// so the same run writes the same bytes.
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
}

// parameterValue is a parameter as a run uses it.
type parameterValue struct {
	Name     string `json:"name"`
	Value    any    `json:"value"` // a number, or a word
	Unit     string `json:"unit"`
	Preset   bool   `json:"preset"`
	Citation string `json:"citation"`
}

func manifestOf(sc *scenario.Scenario, registry *law.Registry, summary *ensemble.Summary) manifest {
	return manifest{
		Schema: "wane-manifest-1", Wane: thisBuild(),
		Scenario: scenarioJSON{sc.Name, sc.Digest, sc.Text()}, Laws: lawsOf(sc, registry),
		Seed: sc.Seed, Objects: summary.Objects, Realisations: summary.Realisations, Requested: summary.Requested,
		Interrupted: summary.Interrupted,
	}
}

// lawsOf lists the laws of a scenario with every parameter.
func lawsOf(sc *scenario.Scenario, registry *law.Registry) []lawJSON {
	out := []lawJSON{}
	for _, process := range law.Processes {
		l, ok := registry.Find(process.Name, sc.Laws[process.Name])
		if !ok {
			continue
		}
		c := l.Describe()
		j := lawJSON{c.Process, c.Name, c.Version, []parameterValue{}}
		for _, x := range c.Parameters {
			j.Parameters = append(j.Parameters, parameterOf(x, sc.Parameters[c.Process][x.Name]))
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
