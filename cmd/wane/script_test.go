package main

import (
	"context"
	"errors"
	"math"
	"os"
	"path/filepath"
	"testing"
	"time"

	"github.com/rogpeppe/go-internal/testscript"
	"github.com/santhosh-tekuri/jsonschema/v6"

	"wane/cmd/internal/cli"
	"wane/sim/ensemble"
	"wane/sim/law"
	"wane/sim/rpc"
	"wane/sim/scenario"
)

// The scripts run wane itself, and slow-wane and broken-wane: the same program
// over an engine that waits to be interrupted, and one that fails. burden-law is
// a law outside the program.
func TestMain(m *testing.M) {
	testscript.Main(m, map[string]func(){
		"wane":        main,
		"slow-wane":   func() { os.Exit(with(slow)) },
		"broken-wane": func() { os.Exit(with(broken)) },
		"burden-law":  func() { rpc.Serve(burden{}) },
	})
}

func with(engine cli.RunFunc) int {
	p := cli.Standard()
	p.Run = engine
	return p.Main(os.Args[1:])
}

// slow finishes 3 realisations, says so in a file, and waits for the end of
// its context. Without seed 7 it finishes none.
func slow(ctx context.Context, sc *scenario.Scenario, _ *law.Registry, _ int, progress func(done, total int)) (*ensemble.Summary, error) {
	finished := 0
	if sc.Seed == 7 {
		finished = 3
	}
	progress(finished, sc.Realisations)
	if err := os.WriteFile("started", nil, 0o644); err != nil {
		return nil, err
	}
	select {
	case <-ctx.Done():
	case <-time.After(time.Minute):
		return nil, errors.New("nobody interrupted")
	}
	unknown := ensemble.Mark{Date: math.NaN(), Reason: "made up for a test"}
	return &ensemble.Summary{
		Engine: "individuals", Objects: sc.Held(), StandsFor: sc.Objects, Realisations: finished, Requested: sc.Realisations,
		Interrupted: true, Seed: sc.Seed, Scenario: sc.Name, EvaporationStarts: math.NaN(),
		Populations: []ensemble.Population{{Name: "stars", PeakCount: 1, PeakDate: 10, Half: unknown, Hundredth: unknown, Last: unknown,
			RealLast: math.NaN()}},
	}, nil
}

func broken(context.Context, *scenario.Scenario, *law.Registry, int, func(done, total int)) (*ensemble.Summary, error) {
	return nil, errors.New("engine: the mass ledger does not close: 1e-3, want <= 1e-12")
}

func TestScripts(t *testing.T) {
	testscript.Run(t, testscript.Params{
		Dir: filepath.Join("testdata", "script"),
		Cmds: map[string]func(ts *testscript.TestScript, neg bool, args []string){
			"validate": validate, "await": await, "sparse": sparse,
		},
	})
}

// validate checks JSON against a JSON Schema: validate schema document.
func validate(ts *testscript.TestScript, neg bool, args []string) {
	if len(args) != 2 || neg {
		ts.Fatalf("usage: validate schema document")
	}
	schema, err := jsonschema.NewCompiler().Compile(ts.MkAbs(args[0]))
	ts.Check(err)
	f, err := os.Open(ts.MkAbs(args[1]))
	ts.Check(err)
	defer f.Close()
	v, err := jsonschema.UnmarshalJSON(f)
	ts.Check(err)
	ts.Check(schema.Validate(v))
}

// await waits until a file exists: await file.
func await(ts *testscript.TestScript, _ bool, args []string) {
	for range 500 {
		if _, err := os.Stat(ts.MkAbs(args[0])); err == nil {
			return
		}
		time.Sleep(20 * time.Millisecond)
	}
	ts.Fatalf("%s did not appear in 10 s", args[0])
}

// sparse makes a file of 100 MB that takes no room: sparse file.
func sparse(ts *testscript.TestScript, _ bool, args []string) {
	f, err := os.Create(ts.MkAbs(args[0]))
	ts.Check(err)
	defer f.Close()
	ts.Check(f.Truncate(100_000_000))
}
