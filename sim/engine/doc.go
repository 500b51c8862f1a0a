// Package engine runs one realisation of a galaxy: it founds the objects,
// asks the laws, and decides who is hit, when and by what.
//
// # The model every engine follows
//
// Founding. Object i = 0..n-1 takes u from the stream of mass-function for its
// mass and from star-formation for its birth. Stars take their whole life at
// once: the wait from live, the kind of remnant from die, its mass from
// remain. A star that a wearing or turning law reaches first ends there
// instead.
//
// Prospects. An object that enters a kind at a date is asked for the wait of
// every wearing and turning law that speaks for it; the earliest wins, a tie
// goes to the process that comes first in [law.Processes]. A turning law that
// says how soon it may act at all ([law.Distant]) need not be asked about what
// is gone before. Where one wearing law acts alone its foretell counts; where
// several act the wait is the integral of dM over the sum of their rates to the
// next threshold. A law that answers heat acts only once the sky is colder: its
// wait starts then. What follows a prospect (a neutron star that becomes a
// relic) is founded with it, so that no law is asked per event.
//
// Clocks. The reading of clock k is the integral of its rate. A bound object
// that is born at date b is hit when the reading has advanced from there by
// E/s, E a unit exponential, s its susceptibility; on a change of kind the
// part not yet spent is rescaled by the old over the new s. Nothing is drawn
// anew but on a merger. What is due at a date (a birth, the end of a stage)
// happens before a hit, a stop or an end of the run at that date.
//
// Rates. See [Environment]: between refreshes a rate is a power law of the
// galaxy values its laws declare; a refresh comes when one of them has moved
// by 1 %, and at every removal while fewer than 100 objects are bound. A change
// of kind counts as such a move where rates hang on masses, kinds or sums, or
// where objects meet. Values that move with time alone are followed to 10^300 yr.
//
// Encounters. The object whose clock fires seeks a partner, picked in
// proportion to what is sought among those bound as they are then (a pick of
// itself, of one that waits or is not born yet is drawn again). Both wait, bound
// and out of reach, for the next refresh, where all pairs are asked meet in one
// batch. A refresh comes too when waiting objects make up 1 % of those bound. A
// product keeps the id of the seeker and counts from the date of the meeting.
//
// Wearing while bound. From the date at which a bound object has lost 1 % of
// its mass, masses and susceptibilities of bound objects are brought up to
// date in steps by the rate in the middle of each, or half the rate at its
// start where that is more (see wear.go).
//
// Draws are keyed (seed, realisation, process, object, generation, number);
// the numbers are the constants in draws.go.
package engine
