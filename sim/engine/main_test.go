package engine_test

import (
	"flag"
	"os"
	"testing"
)

// TestMain fixes the seed of the random tests, so that what passes for one
// passes for all; -rapid.seed=N looks elsewhere.
func TestMain(m *testing.M) {
	flag.Parse()
	given := false
	flag.Visit(func(f *flag.Flag) { given = given || f.Name == "rapid.seed" })
	if !given {
		if err := flag.Set("rapid.seed", "20000101"); err != nil {
			panic(err)
		}
	}
	os.Exit(m.Run())
}
