// Package law is the contract between Wane and the laws it runs.
//
// A law is one model of one process: how white dwarfs cool, how a black hole
// loses mass, how fast a galaxy throws its objects out. It answers questions
// about columns of objects and decides nothing: the engine picks who is hit,
// when, and by what, and it keeps the books.
//
// A law has two methods. Describe returns a [Card]: what the law is, which
// objects it speaks for, its parameters, and for each question the columns it
// wants to read. Answer takes one of those questions and a [Batch] of rows and
// returns a Batch with one row for each row asked.
//
// The rules every law keeps, in process or outside:
//
//   - Pure. The same batch gives the same bits: no state, no clock, no files,
//     no randomness of its own. Chance arrives as a column (u or e).
//   - Row by row. Row i of the answer depends on row i of the question alone,
//     so a batch may be split, reordered, or sent again.
//   - Waits, not dates. A wait is log10 of years from the moment the object
//     entered its present kind and place; never is +Inf. Zero is -Inf in a
//     log10 rate, hazard, density or elapsed time. Nothing else is non-finite.
//   - Words as chances. Where chance decides between words the law gives one
//     column of chances for each word and the engine picks.
//
// Which questions a process is asked, and what the answer must hold, is fixed
// by its [Role]; see roles.go. Every answer is checked in one place, [Use.Ask].
package law
