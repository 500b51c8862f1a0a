//go:build linux

package rpc_test

import (
	"context"
	"errors"
	"testing"

	"wane/sim/law"
	"wane/sim/rpc"
)

// A wrong number is named where it is read: law, question, row, object, value,
// and what is allowed.
func TestFaultsOfValues(t *testing.T) {
	leavesNothing(t)
	for _, x := range []struct {
		fault, id, question string
		words               []string
	}{
		{"value:log10_rate:NaN:3", hole, "wear", []string{"question wear, row 3 (mass ", " solMass): log10_rate: got NaN, want a number or -Inf (zero)"}},
		{"value:log10_rate:+Inf:0", hole, "wear", []string{"question wear, row 0 (mass ", "log10_rate: got +Inf, want a number or -Inf (zero)"}},
		{"value:heat:1.5:2", hole, "wear", []string{"row 2 (mass ", "heat: got 1.5, want 0 .. 1"}},
		{"value:wait:-Inf:1", hole, "foretell", []string{"question foretell, row 1 (mass ", "wait: got -Inf, want a number or +Inf (never)"}},
		{"value:wait:-Inf:1", "lifetime/table", "live", []string{"question live, row 1 (", "wait: got -Inf, want a number or +Inf (never)"}},
		{"value:log10_temperature:NaN:1", "white-dwarf-cooling/mestel-debye", "shine", []string{"question shine, row 1 (", "log10_temperature: got NaN"}},
		{"value:power:-1:1", "warmth/dark-matter", "warm", []string{"question warm, row 1 (", "power: got -1, want a finite number >= 0"}},
		{"value:mass:-1:4", "mass-function/kroupa", "mass", []string{"question mass, row 4 (u ", "mass: got -1, want a finite number > 0"}},
		{"value:mass:-0.5:0", "remnant/cummings", "remain", []string{"question remain, row 0 (", "mass: got -0.5, want a finite number >= 0"}},
		{"scale:mass:9", "remnant/cummings", "remain", []string{"question remain, row ", "(mass ", " solMass, want no more than the ", " solMass there was"}},
		{"value:mass:+Inf:0", "collapse/raithel", "remain", []string{"mass: got +Inf, want a finite number >= 0"}},
		{"scale:chance_neutron_star:3", "collapse/raithel", "die", []string{"question die, row "}},
		{"word:kind", "substellar-limit/fixed", "sort", []string{"question sort, row 0 (mass ", "kind: got code 77, want a code below "}},
		{"value:radius:0:0", "ejection/contracting", "rate", []string{"question rate, row 0 (", "radius: got 0, want a finite number > 0"}},
		{"value:stop:0.5:0", "ejection/contracting", "rate", []string{"stop: got 0.5, want 0 or 1"}},
	} {
		t.Run(x.id+"/"+x.fault, func(t *testing.T) {
			t.Parallel()
			if !exists(x.id) {
				t.Fatalf("no law %s", x.id)
			}
			l, err := rpc.Open(context.Background(), faulty(t, x.fault, x.id))
			if err != nil {
				t.Fatal(err)
			}
			defer l.Close()
			_, err = law.NewUse(l).Ask(x.question, rows(x.id, x.question, 500))
			says(t, err, append([]string{"law ./my-burden (" + x.id + "): "}, x.words...)...)
			var fault *law.Fault
			if !errors.As(err, &fault) || l.Restarts() != 0 {
				t.Errorf("got %#v, want a Fault and no restart", err)
			}
		})
	}
}

// Quantiles and hazards that fall are named by whoever asks for them.
func TestFaultsOfCurves(t *testing.T) {
	leavesNothing(t)
	draws := []law.Column{law.Numbers("u", []float64{0.1, 0.9, 0.2})}
	dates := []law.Column{law.Numbers("log10_date", []float64{20, 22, 24}), law.Numbers("log10_four_volume", []float64{79, 87, 95})}
	for _, x := range []struct {
		fault, id, question string
		in                  []law.Column
		asked, risen        string // the fault of the answer, or that of its rise
	}{
		{"mirror", "mass-function/kroupa", "mass", draws, "", "question mass, row 1 (u 0.9): mass: got 0."},
		{"mirror", "star-formation/exponential", "birth", draws, "", "want a quantile, which never falls as u rises"},
		{"falls:log10_hazard", "vacuum-decay/steady", "end", dates, "",
			"question end, row 2 (log10_date 24 yr, log10_four_volume 95 yr4): log10_hazard: got 5, and 7 in row 1 (log10_date 22 yr, log10_four_volume 87 yr4), want a hazard that never falls"},
		{"value:log10_hazard:NaN:1", "vacuum-decay/steady", "end", dates,
			"question end, row 1 (log10_date 22 yr, log10_four_volume 87 yr4): log10_hazard: got NaN, want a number or an infinity", ""},
	} {
		l, err := rpc.Open(context.Background(), faulty(t, x.fault, x.id))
		if err != nil {
			t.Fatal(err)
		}
		defer l.Close()
		use := law.NewUse(l)
		in := law.Batch{Rows: 3, Columns: x.in}
		out, err := use.Ask(x.question, in)
		if x.asked != "" {
			says(t, err, "law ./my-burden ("+x.id+"): ", x.asked)
			continue
		}
		if err != nil {
			t.Fatal(err)
		}
		says(t, use.Rises(x.question, in, out), "law ./my-burden ("+x.id+"): ", x.risen)
	}
}

// An answer that hangs on other rows, or on what was asked before, is named as
// soon as a question is answered for the first time.
func TestFaultsOfPurity(t *testing.T) {
	leavesNothing(t)
	for fault, words := range map[string][]string{
		"by-order": {"question wear: row 5 (mass 6 solMass): log10_rate: got -", ", but -", " when asked again with other rows, want the same for the same row"},
		"by-count": {"question wear: row 5 (mass 6 solMass): log10_rate: got -", " when asked again with other rows"},
		"serves":   nil,
	} {
		l, err := rpc.Open(context.Background(), faulty(t, fault, hole))
		if err != nil {
			t.Fatal(err)
		}
		defer l.Close()
		_, err = law.NewUse(l).Ask("wear", holes(10))
		if words == nil {
			if err != nil {
				t.Error(err)
			}
			continue
		}
		says(t, err, append([]string{"law ./my-burden (evaporation/black-body): "}, words...)...)
		if _, later := law.NewUse(l).Ask("heat", holes(2)); later == nil {
			t.Errorf("%s: the law is asked on", fault)
		}
	}
}
