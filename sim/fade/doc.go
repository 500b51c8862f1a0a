// Package fade finds when a population fades: its peak and the dates after
// which it stays below a half and a hundredth of it, and the statistics of
// such dates over realisations.
//
// A population is two lists of dates, entries and exits, in no order. Its
// count is a step function of time,
//
//	count(t) = entries up to and at t - exits up to and at t.
//
// All changes at one date happen at once: the count is looked at only after
// all of them. An object that enters and leaves at one date is therefore
// never counted (and the count is never negative), and when one object leaves
// at the date at which another enters, the peak is not one too high.
//
// Dates are float64 in any unit that grows with time, such as years or
// log10 years. Nothing is interpolated: every date returned is one that was
// given. +Inf is "never".
//
// Left out: weights. Counts are of objects as given.
package fade
