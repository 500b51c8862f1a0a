// Package lawtest takes any law through the rules of the contract.
//
//	func TestPage(t *testing.T) { lawtest.Run(t, evaporation.Page()) }
//
// [Check] does the work and returns what it found as values; [Run] fails the
// test for each. The kit makes its own rows: plausible objects of the kinds
// the law accepts (masses by kind, radius, composition, place and origin to
// match), galaxies from founding to the last object, and the corners of every
// column. It draws with a fixed seed, so two runs find the same.
//
// What is checked, by the word in [Finding.Check]:
//
//	card        the card is in order (law.CheckCard), and says formula and domain
//	describe    the card is the same each time
//	answer      every answer keeps the rules of law.Use.Ask, on plausible rows
//	chances     chances are 0 .. 1 and sum to 1
//	shapes      0, 1, 2, 1000, 16384 and 65536 rows are answered
//	pure        the same batch gives the same bits: again, after other batches, in many goroutines
//	input       the law leaves the rows it reads as they were
//	unset       every row of the answer is set, even where memory is lent
//	rows        row i depends on row i alone: split, shuffled, concatenated
//	order       row i of the answer is the answer to row i
//	monotone    quantiles rise with the draw, cooling never warms, a hazard never falls
//	size        answers are of the size that their unit lets expect (a doubt, no breach)
//	domain      the rules hold in the corners of every column and parameter
//	foretell    a wearing law's foretold wait is the integral dM/rate to its next threshold
//	parameter   each parameter changes something (a doubt, no breach)
package lawtest
