package cli

import (
	"encoding/json"
	"testing"

	"wane/testdata/published"
)

// TestAsks holds the answers of laws to check values: a row of asks.csv is all
// that a new law needs to be among them.
func TestAsks(t *testing.T) {
	for _, row := range published.Rows(t, "asks.csv") {
		question, output := row.Inputs["ask"], row.Inputs["output"]
		var a struct {
			Outputs map[string]struct {
				Value float64
				Unit  string
			}
		}
		if err := json.Unmarshal([]byte(printed(t, "ask "+question+" --json")), &a); err != nil {
			t.Errorf("%s: wane ask %s: %v", row.Where(), question, err)
			continue
		}
		v, ok := a.Outputs[output]
		if !ok || v.Unit != row.Unit {
			t.Errorf("%s: wane ask %s: no %s in %s among %v", row.Where(), question, output, row.Unit, a.Outputs)
			continue
		}
		row.Check(t, v.Value)
	}
}
