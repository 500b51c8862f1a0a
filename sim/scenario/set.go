package scenario

import (
	"errors"
	"fmt"

	"wane/sim/law"
)

// Set prepares the scenario's laws with their parameters for a run, and proves
// that they leave no object without an answer and none with two. The error
// joins every fault, one a line.
func (s *Scenario) Set(reg *law.Registry) (*law.Set, error) {
	var uses []*law.Use
	var faults []error
	for _, p := range law.Processes {
		name, ok := s.Laws[p.Name]
		if !ok {
			continue
		}
		l, ok := reg.Find(p.Name, name)
		if !ok {
			if !(p.Optional && name == none) {
				faults = append(faults, fmt.Errorf("scenario: no law %s/%s", p.Name, name))
			}
			continue
		}
		u := law.NewUse(l)
		for _, parameter := range sortedKeys(s.Parameters[p.Name]) {
			if err := u.Set(parameter, s.Parameters[p.Name][parameter]); err != nil {
				faults = append(faults, err)
			}
		}
		uses = append(uses, u)
	}
	if len(faults) > 0 {
		return nil, errors.Join(faults...)
	}
	set, faults := law.NewSet(uses...)
	if len(faults) == 0 {
		faults = law.CheckCoverage(set)
	}
	if len(faults) > 0 {
		return nil, errors.Join(faults...)
	}
	return set, nil
}
