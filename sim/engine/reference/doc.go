// Package reference is the slow, obvious engine that the fast one is held to.
// It follows the model stated in package engine with one heap of scheduled
// events, one heap of thresholds a clock, objects that are structs, and laws
// asked one object at a time. Nothing is left out, put off or predicted.
//
// It shares with package engine what makes the rates (engine.Environment: the
// piecewise law is part of the model), and nothing else: the order of laws,
// the numbers of the draws, the rules of founding, prospects, wearing,
// meetings, books, populations and marks are written here a second time.
//
// It is for tests: a run costs some microseconds an event, and memory without
// measure.
package reference
