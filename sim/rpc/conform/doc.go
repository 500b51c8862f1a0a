// Package conform judges a law that runs in a process of its own: whether it
// is fit to be used in a run.
//
// What any law must hold (shapes, purity, rows that stand for themselves,
// corners, quantiles, ...) is judged by package lawtest, the same code that
// judges the built-in laws. Added here is what only a process can get wrong:
// starting, being started by hand, crashing, giving another answer when
// started anew, ending, leaving something behind; and how long it takes.
//
// [Judge] returns findings, at least one a check: a pass, a doubt or a
// failure, and for the latter two what to do about it.
package conform
