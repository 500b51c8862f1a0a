// Package bigmath is the exponential and the logarithm in many digits. It
// makes the tables of packages num and draw and checks them; nothing that runs
// a simulation imports it.
package bigmath

import (
	"math"
	"math/big"
)

// Prec is the working precision in bits, 72 decimal digits.
const Prec = 240

// New returns x as a number of Prec bits.
func New(x float64) *big.Float { return new(big.Float).SetPrec(Prec).SetFloat64(x) }

// Add returns a + b.
func Add(a, b *big.Float) *big.Float { return New(0).Add(a, b) }

// Sub returns a - b.
func Sub(a, b *big.Float) *big.Float { return New(0).Sub(a, b) }

// Mul returns a b.
func Mul(a, b *big.Float) *big.Float { return New(0).Mul(a, b) }

// Quo returns a / b.
func Quo(a, b *big.Float) *big.Float { return New(0).Quo(a, b) }

// Neg returns -a.
func Neg(a *big.Float) *big.Float { return New(0).Neg(a) }

// Float64 returns the nearest float64, ties to even.
func Float64(a *big.Float) float64 { x, _ := a.Float64(); return x }

// Exp returns e^x for |x| below 1e4, by halving the argument to under 2^-16,
// the Taylor series, and squaring back.
func Exp(x *big.Float) *big.Float {
	if x.Sign() == 0 {
		return New(1)
	}
	halvings := max(0, x.MantExp(nil)+16)
	t := New(0).SetMantExp(x, -halvings)
	sum, term := New(1), New(1)
	for n := 1; term.Sign() != 0 && term.MantExp(nil) > -Prec-8; n++ {
		term = Quo(Mul(term, t), New(float64(n)))
		sum = Add(sum, term)
	}
	for range halvings {
		sum = Mul(sum, sum)
	}
	return sum
}

// Log returns ln x for x > 0, by Halley's iteration on Exp from the float64
// logarithm; three steps take 50 bits past 1000.
func Log(x *big.Float) *big.Float {
	mant := new(big.Float)
	e := x.MantExp(mant)
	y := New(math.Log(Float64(mant)))
	if e != 0 {
		y = Add(y, New(float64(e)*math.Ln2))
	}
	for range 3 {
		ey := Exp(y)
		y = Add(y, Quo(Mul(New(2), Sub(x, ey)), Add(x, ey)))
	}
	return y
}
