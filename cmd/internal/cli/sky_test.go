package cli

import (
	"encoding/csv"
	"encoding/json"
	"fmt"
	"math"
	"os"
	"path/filepath"
	"slices"
	"strconv"
	"strings"
	"testing"
	"unicode/utf8"

	"wane/cmd/internal/report"
	"wane/testdata/published"
	"wane/testdata/reference"
)

// skyRows reads the table of a CSV by the names of its columns; NaN for an
// empty cell.
func skyRows(t *testing.T, text string) []map[string]float64 {
	t.Helper()
	r := csv.NewReader(strings.NewReader(text))
	r.Comment = '#'
	lines, err := r.ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	var rows []map[string]float64
	for _, line := range lines[1:] {
		row := map[string]float64{}
		for i, cell := range line {
			row[lines[0][i]] = math.NaN()
			if cell == "" {
				continue
			}
			if row[lines[0][i]], err = strconv.ParseFloat(cell, 64); err != nil {
				t.Fatal(err)
			}
		}
		rows = append(rows, row)
	}
	return rows
}

type skyDocument struct {
	Scenario string
	Draws    bool
	Dates    []map[string]any
	Special  map[string]struct {
		Log10Date *float64 `json:"log10_date"`
		Why       string
	}
	Cause string
}

func skyJSONOf(t *testing.T, command string) skyDocument {
	t.Helper()
	var d skyDocument
	if err := json.Unmarshal([]byte(printed(t, "sky "+command+" --json")), &d); err != nil {
		t.Fatal(err)
	}
	return d
}

// TestSkyAgainstAstropy holds each column and each special date to 1e-4 of
// what Astropy and SciPy say, without radiation and with photons.
func TestSkyAgainstAstropy(t *testing.T) {
	columns := []string{"log10_date", "log10_scale_factor", "log10_expansion_rate", "log10_relic_temperature",
		"log10_horizon_temperature", "log10_felt_temperature", "log10_event_horizon", "log10_hubble_radius",
		"log10_particle_horizon", "log10_visible_limit"}
	special := []string{"today", "relic_meets_horizon", "hole_1_Msun", "hole_10_Msun", "hole_4.3e6_Msun", "hole_1e9_Msun"}
	allowed := math.Log10(1 + 1e-4)
	byRadiation := map[float64][][]float64{}
	for _, row := range reference.Python(t, "testdata/sky.py") {
		byRadiation[row[0]] = append(byRadiation[row[0]], row[1:])
	}
	if len(byRadiation) != 2 {
		t.Fatalf("%d skies, want 2", len(byRadiation))
	}
	worst := 0.0
	check := func(what string, got, want float64) {
		worst = math.Max(worst, math.Abs(got-want))
		if !(math.Abs(got-want) <= allowed) {
			t.Errorf("%s: %v, Astropy says %v", what, got, want)
		}
	}
	for radiation, rows := range byRadiation {
		marks := rows[len(rows)-1]
		rows = rows[:len(rows)-1]
		command := fmt.Sprintf("lambda-cdm --set expansion.radiation=%v", radiation)
		d := skyJSONOf(t, command)
		for i, key := range special {
			check(fmt.Sprintf("radiation %v, date of %s", radiation, key), *d.Special[key].Log10Date, marks[i])
		}
		for _, row := range rows {
			command += fmt.Sprintf(" --at 10^%vyr", row[0])
		}
		got := skyRows(t, printed(t, "sky "+command+" --csv"))
		if len(got) != len(rows) || len(rows) < 12 {
			t.Fatalf("%d rows for %d dates", len(got), len(rows))
		}
		for i, row := range rows {
			for j, name := range columns {
				what := fmt.Sprintf("radiation %v, date 10^%v yr, %s", radiation, row[0], name)
				if name == "log10_horizon_temperature" && row[j] == 0 { // no horizon
					if !math.IsInf(got[i][name], -1) {
						t.Errorf("%s: %v, want none", what, got[i][name])
					}
					continue
				}
				check(what, got[i][name], row[j])
			}
		}
	}
	t.Logf("largest difference %.2g dex", worst)
}

// The published and recomputed values of the default sky, as the command
// prints them: those of sky.csv that are of lambda-cdm.
func TestSkyPublished(t *testing.T) {
	column := map[string]string{"log10_a": "log10_scale_factor", "log10_horizon": "log10_horizon_temperature",
		"log10_relic": "log10_relic_temperature", "log10_temperature": "log10_felt_temperature"}
	checked := 0
	for _, r := range published.Rows(t, "sky.csv") {
		if r.Inputs["law"] != "lambda-cdm" {
			continue
		}
		name := column[r.Inputs["quantity"]]
		at := "10^" + r.Inputs["at"] + "yr"
		switch r.Inputs["quantity"] {
		case "event_horizon":
			name, at = "log10_event_horizon", "today"
		case "particle_horizon":
			name, at = "log10_particle_horizon", "today"
		case "limit_horizon":
			name, at = "log10_visible_limit", "today"
		}
		if name == "" {
			continue
		}
		rows := skyRows(t, printed(t, fmt.Sprintf("sky lambda-cdm --set expansion.hubble=%skm/s/Mpc --set expansion.matter=%s "+
			"--set expansion.radiation=%s --at %s --csv", r.Inputs["hubble_km_per_s_per_Mpc"], r.Inputs["matter"], r.Inputs["radiation"], at)))
		got := rows[0][name]
		if at == "today" {
			got = math.Pow(10, got-9)
		}
		r.Check(t, got)
		checked++
	}
	if checked < 8 {
		t.Errorf("%d values checked: sky.csv has more of lambda-cdm", checked)
	}
}

// Text, JSON and CSV tell the same, at dates near and far, and fit.
func TestSkyForms(t *testing.T) {
	for _, command := range []string{
		"", "lantern-reach", "lambda-cdm --at 10^(10^26)yr,1yr,today --grid 300:330:4", "matter-only", "phantom", "open", "w-cdm",
		"dark-energy-decay/drawn --realisation 2", "vacuum-decay/literal --law expansion=w-cdm --seed 3",
	} {
		text := printed(t, "sky "+command)
		for line := range strings.SplitSeq(text, "\n") {
			if n := utf8.RuneCountInString(line); n > report.Width {
				t.Errorf("sky %s: %d columns: %s", command, n, line)
			}
		}
		if strings.ContainsAny(text, "\x1b\t") || strings.Contains(text, "NaN") || strings.Contains(text, "Inf") {
			t.Errorf("sky %s: text holds an escape, a tab, NaN or Inf:\n%s", command, text)
		}
		d, rows := skyJSONOf(t, command), skyRows(t, printed(t, "sky "+command+" --csv"))
		if len(d.Dates) != len(rows) || len(rows) == 0 {
			t.Fatalf("sky %s: %d dates in JSON, %d in CSV", command, len(d.Dates), len(rows))
		}
		for i, row := range rows {
			over := d.Dates[i]["over"] == true
			for name, want := range row {
				got, given := d.Dates[i][name]
				switch {
				case over && name != "log10_date":
					if given || !math.IsNaN(want) {
						t.Errorf("sky %s: %s after the end: %v", command, name, want)
					}
				case math.IsInf(want, 0):
					if got != csvNumber(want) {
						t.Errorf("sky %s: %s is %v in JSON, %v in CSV", command, name, got, want)
					}
				case math.IsNaN(want):
					if got != nil || name != "log10_log10_scale_factor" {
						t.Errorf("sky %s: %s is %v in JSON, nothing in CSV", command, name, got)
					}
				case got != want:
					t.Errorf("sky %s: %s is %v in JSON, %v in CSV", command, name, got, want)
				}
			}
		}
		for key, m := range d.Special {
			if (m.Log10Date == nil) == (m.Why == "") {
				t.Errorf("sky %s: special date %s: %v, because %q", command, key, m.Log10Date, m.Why)
			}
		}
	}
}

// An ending that is drawn is told with its realisation; another realisation
// and another seed draw another, the same ones the same.
func TestSkyDraws(t *testing.T) {
	end := func(flags string) float64 {
		d := skyJSONOf(t, "vacuum-decay/literal"+flags)
		if m := d.Special["end"]; !d.Draws || d.Cause != "vacuum-decay" || m.Log10Date == nil {
			t.Fatalf("%s: %+v", flags, d)
		}
		return *d.Special["end"].Log10Date
	}
	first := end("")
	if end(" --realisation 0 --seed 1") != first {
		t.Error("the sky is not that of realisation 0 of seed 1")
	}
	if end(" --realisation 1") == first || end(" --seed 2") == first {
		t.Error("another realisation, or another seed, draws the same")
	}
	text := printed(t, "sky vacuum-decay/literal --realisation 7")
	if !strings.Contains(text, "7 of seed 1") || !strings.Contains(text, "everything ends (vacuum-decay)") {
		t.Errorf("the text does not say what was drawn:\n%s", text)
	}
	if text := printed(t, "sky"); strings.Contains(text, "realisation") {
		t.Errorf("nothing is drawn, and yet:\n%s", text)
	}
}

// After everything has ended there is no sky, and what would come later does
// not come.
func TestSkyAfterItsEnd(t *testing.T) {
	d := skyJSONOf(t, "phantom --at 1e10yr,1e12yr")
	if d.Dates[0]["over"] != nil || d.Dates[1]["over"] != true || d.Cause != "rip" {
		t.Errorf("got %+v", d)
	}
	if m := d.Special["relic_meets_horizon"]; m.Why != "not before the end" {
		t.Errorf("relic_meets_horizon: %+v", m)
	}
	text := printed(t, "sky phantom --at 1e10yr,1e12yr")
	if strings.Count(text, "everything has ended") != 2 || !strings.Contains(text, "everything ends (rip)") {
		t.Errorf("got\n%s", text)
	}
}

// The head of the CSV is ECSV as Astropy reads it: units, special dates, and
// cells that are missing where everything has ended.
func TestSkyCSVIsECSV(t *testing.T) {
	for command, want := range map[string][]float64{
		"lambda-cdm --at today,1e12yr": {2, 11, 9, 0},
		// log10 of log10 a is missing before today, and all but the date after the end
		"phantom --at 1e9yr,1e12yr,1e13yr": {3, 11, 9, 21},
	} {
		for _, key := range []string{"today", "end"} {
			date := skyJSONOf(t, command).Special[key].Log10Date
			if date == nil {
				want = append(want, math.Inf(1))
			} else {
				want = append(want, *date)
			}
		}
		file := filepath.Join(t.TempDir(), "sky.ecsv")
		if err := os.WriteFile(file, []byte(printed(t, "sky "+command+" --csv")), 0o644); err != nil {
			t.Fatal(err)
		}
		if got := reference.Python(t, "testdata/ecsv.py", file)[0]; !slices.Equal(got, want) {
			t.Errorf("wane sky %s: Astropy reads %v, want %v", command, got, want)
		}
	}
}

// A law of expansion from outside the program is taken by its path, and closed
// however it ends; what was started is said.
func TestSkyOfLawOutside(t *testing.T) {
	dir := lawFolder(t)
	for _, c := range []struct {
		args, said string
		code       int
	}{
		{"sky " + dir, "law expansion/lambda-cdm, version 1, from " + dir, ExitOK},
		{"sky lantern-reach --law expansion=" + dir, "from " + dir, ExitOK},
		{"sky " + dir + " --set expansion.huble=70km/s/Mpc", `did you mean "hubble"`, ExitBadInput},
		{"sky --law vacuum-decay=" + dir, "a law of process expansion", ExitBadInput},
		{"sky " + dir + " --law expansion=open", "given twice", ExitBadInput},
	} {
		s := &strangers{law: builtin(t, "expansion", "lambda-cdm")}
		code, out, said := mainOf(s, nil, strings.Fields(c.args)...)
		if code != c.code || !strings.Contains(said, c.said) || (code == ExitOK) != strings.Contains(out, "10^12.086 yr") {
			t.Errorf("%s: exit code %d, said %q, printed\n%s", c.args, code, said, out)
		}
		if s.open.Load() != 0 {
			t.Errorf("%s: %d still open", c.args, s.open.Load())
		}
	}
}
