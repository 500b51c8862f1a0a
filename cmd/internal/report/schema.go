package report

import _ "embed"

// SchemaID names the version of the JSON form of a summary. It changes
// whenever a field changes its meaning or goes.
const SchemaID = "wane-summary-1"

// Schema is the JSON Schema (draft 2020-12) of a summary.
//
//go:embed summary.schema.json
var Schema []byte
