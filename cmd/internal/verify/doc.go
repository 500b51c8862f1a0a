// Package verify holds dates of the far future as the literature prints them,
// and works each of them out again under the assumptions of its source.
//
// The rows are data, dates.toml: what is printed, where, how sure the print is,
// and how ours comes about, always by the laws of the program:
//
//	a question   one law asked as 'wane ask' asks it
//	a galaxy     a mark of a population of a scenario, run as 'wane run' runs it
//	a sky        a date of the background of a scenario, as every run draws it
//
// A row also records what comes out: that ours agrees with the print within
// what its digits say; that it lies within the source's own spread; or that it
// differs, by how much and why. [Judge] works a row out and tells whether it
// is still as recorded.
//
// No row takes ours from the number it is held against: a law whose parameter
// is the printed date has no row for it.
package verify
