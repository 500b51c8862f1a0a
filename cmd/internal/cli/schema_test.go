package cli

import (
	"bytes"
	"encoding/json"
	"strings"
	"testing"

	"github.com/santhosh-tekuri/jsonschema/v6"

	"wane/cmd/internal/report"
)

func schemaOf(t *testing.T) *jsonschema.Schema {
	t.Helper()
	document, err := jsonschema.UnmarshalJSON(bytes.NewReader(report.Schema))
	if err != nil {
		t.Fatal(err)
	}
	c := jsonschema.NewCompiler()
	if err := c.AddResource("summary.schema.json", document); err != nil {
		t.Fatal(err)
	}
	s, err := c.Compile("summary.schema.json")
	if err != nil {
		t.Fatal(err)
	}
	return s
}

func TestSummariesKeepTheSchema(t *testing.T) {
	schema := schemaOf(t)
	for name, s := range summaries() {
		var b bytes.Buffer
		if err := report.JSON(&b, s); err != nil {
			t.Fatal(err)
		}
		v, err := jsonschema.UnmarshalJSON(&b)
		if err != nil {
			t.Fatal(err)
		}
		if err := schema.Validate(v); err != nil {
			t.Errorf("%s: %v", name, err)
		}
	}
}

// The schema refuses what a summary may not be, so that passing it means
// something.
func TestSchemaRefuses(t *testing.T) {
	schema := schemaOf(t)
	var b bytes.Buffer
	if err := report.JSON(&b, sampled()); err != nil {
		t.Fatal(err)
	}
	for _, c := range []struct{ what, old, new string }{
		{"a null mark without its reason", `"last": "the run ended at 10^80 yr"`, `"half": "twice"`},
		{"another version", report.SchemaID, "wane-summary-0"},
		{"a negative count", `"count": 1,`, `"count": -1,`},
		{"a share above 1", `"cut": 0.125`, `"cut": 1.125`},
		{"a word for a date", `"log10_yr": 70.51`, `"log10_yr": "late"`},
		{"an unknown field", `"events"`, `"event"`},
	} {
		text := strings.Replace(b.String(), c.old, c.new, 1)
		if text == b.String() {
			t.Errorf("%s: the test changed nothing", c.what)
		}
		v, err := jsonschema.UnmarshalJSON(strings.NewReader(text))
		if err != nil {
			t.Fatal(err)
		}
		if schema.Validate(v) == nil {
			t.Errorf("the schema lets %s pass", c.what)
		}
	}
}

// What the first field names is what the schema is called.
func TestSchemaName(t *testing.T) {
	var head struct {
		ID string `json:"$id"`
	}
	if err := json.Unmarshal(report.Schema, &head); err != nil {
		t.Fatal(err)
	}
	if head.ID != "urn:wane:"+report.SchemaID {
		t.Errorf("schema is called %q", head.ID)
	}
}
