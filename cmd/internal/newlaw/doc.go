// Package newlaw makes the folder of a new outside law: a card and simple
// functions for the questions that its process is asked, in Python or Go, with
// the kit that serves it, a test and a page on how to go on. The folder runs as
// it is.
package newlaw
