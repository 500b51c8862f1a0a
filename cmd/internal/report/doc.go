// Package report puts the answer of a run into words and into JSON.
//
// Text is for people: it fits 100 columns, needs no colour and no manual. JSON
// is for programs: its form is fixed by a versioned JSON Schema (Schema), a
// mark that was never reached is null with a reason beside it, and NaN and
// infinities never appear.
//
// Dates are log10(t/yr) in both. Neither prints a digit that the Monte Carlo
// error of the number does not support.
package report
