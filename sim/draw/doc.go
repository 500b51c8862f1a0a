// Package draw gives random numbers by name instead of by turn: what an object
// draws depends on which object, which process and which draw it is, never on
// what was drawn before.
//
// A stream belongs to a seed, a realisation and a process. Within it a draw is
// named by the object's number, the object's generation and the number of the
// draw. Hence the same answers in any order and with any number of workers,
// and changing one law leaves the draws of every other process as they were
// (common random numbers).
//
// The generator hashes every part of the name before use, because small raw
// keys (1, 99, 12345) left visible correlations between streams:
//
//	key = M(M(M(seed + a) + realisation + b) + H(process))
//	c   = M(key + (generation 2^32 + number) g)     once a column
//	z   = M(c + object φ) xor rotl(c, 32)           once a draw
//	bits at step s = M(z + s σ)                     s = 0 unless a sampler rejects
//
// M is the 64-bit finaliser below, φ, g, σ are odd constants, H is FNV-1a.
// A sampler that rejects takes its next bits from step s + 1 of its own draw,
// so that no other draw shifts.
//
// Every bit this package returns is frozen: a change would silently change
// every result ever published with a seed.
//
// Columns are drawn eight at once where the processor has AVX-512; the bits are
// the same everywhere.
//
// Not for cryptography. Draws of one column do not repeat within 2^64 objects
// by more than chance.
//
// Sources: Stafford (2011), mixing function 13; Steele, Lea and Flood (2014),
// OOPSLA '14, for the additive constant; Fowler, Noll and Vo, FNV-1a; Marsaglia
// and Tsang (2000), J. Stat. Software 5(8), for the ziggurat.
package draw

//go:generate sh -c "go run ./internal/ziggurat > tables.go"
