package engine_test

import (
	"flag"
	"os"
	"testing"
)

// TestMain fixes the seed of the random tests, so that what passes for one
// passes for all; -rapid.seed=N looks elsewhere. Short tests try a quarter.
func TestMain(m *testing.M) {
	flag.Parse()
	preset := map[string]string{"rapid.seed": "20000101"}
	if testing.Short() {
		preset["rapid.checks"] = "25"
	}
	flag.Visit(func(f *flag.Flag) { delete(preset, f.Name) })
	for name, value := range preset {
		if err := flag.Set(name, value); err != nil {
			panic(err)
		}
	}
	os.Exit(m.Run())
}
