// Package num is arithmetic that gives the same bits on every machine of one
// architecture, and arithmetic on dates that are logarithms.
//
// The standard library's exponential and logarithm choose their instructions
// by the processor they meet, so the same run could differ in its last bit
// between two machines and then, through the order of events, in everything.
// The functions here use only operations that IEEE 754 rounds one way, and
// every product that is added to something is rounded first (an explicit
// float64 conversion), so that no compiler fuses the two.
//
// Columns are done eight elements at once, by the same operations in the same
// order, where the processor has AVX-512.
//
// Dates are log10(t/yr), which Add10, Sub10 and Sum10 add and subtract as
// times. Errors are given in units in the last place (ulp), the largest found
// against mpmath over the ranges of the tests.
//
// Also here: Bisect and Brent for roots; Linear and Monotone for tables.
//
// Sources: Tang (1989, 1990), ACM Trans. Math. Softw. 15, 144 and 16, 378, for
// the table lookups; Dekker (1971) and Knuth (The Art of Computer Programming
// 2, 4.2.2) for sums in two parts.
package num

//go:generate sh -c "go run ./internal/tables exp > exp_table.go"
//go:generate sh -c "go run ./internal/tables log > log_table.go"
//go:generate sh -c "go run ./internal/tables erf > erf_table.go"
