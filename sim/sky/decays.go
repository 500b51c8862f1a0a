package sky

// Decays is the log10 date when dark energy begins to decay by an event of
// process dark-energy-decay; +Inf: it never does.
func (s *Sky) Decays() float64 {
	if len(s.pieces) < 2 {
		return inf
	}
	return s.pieces[1].origin
}
