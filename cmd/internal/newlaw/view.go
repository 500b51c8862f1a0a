package newlaw

import (
	"fmt"
	"go/format"
	"io/fs"
	"math"
	"regexp"
	"strconv"
	"strings"
	"text/template"

	"wane/sim/law"
)

// view is what the templates see.
type view struct {
	Process      law.Process
	Card         law.Card
	Example      exampleView
	Functions    string
	Imports      []string
	Requirements string
	Language     string
}

// exampleView is the example of a known answer, in words for a test.
type exampleView struct {
	Why, Question, Column string
	Inputs                []inputView
	Want                  float64
	Words                 bool    // whether the answer is a code
	Scale                 string  // " / 1e15" where the answer is large
	Scaled, Within        float64 // what it must then be, and how nearly
	Ask                   string
}

type inputView struct {
	Name  string
	Value float64
	Words bool
}

func shown(s sketch) exampleView {
	x := s.example
	out := exampleView{Why: x.why, Question: x.question, Column: x.column, Want: x.want, Ask: x.ask, Scaled: x.want, Within: 1e-5,
		Words: x.column == "kind"}
	if size := math.Abs(x.want); size >= 1e6 {
		out.Scale, out.Scaled = fmt.Sprintf(" / %g", size), x.want/size
	}
	for _, i := range x.inputs {
		info, _ := law.ColumnNamed(x.question, i.Name)
		out.Inputs = append(out.Inputs, inputView{i.Name, i.Value, info.Words != ""})
	}
	return out
}

// fill makes the files of a language out of their templates.
func (v view) fill(language string, names ...string) (map[string][]byte, error) {
	out := map[string][]byte{}
	for _, name := range names {
		file := "templates/" + language + "/" + strings.ReplaceAll(name, "/", "_") + ".tmpl"
		if name == "README.md" {
			file = "templates/README.md.tmpl"
		}
		source, err := fs.ReadFile(embedded, file)
		if err != nil {
			return nil, err
		}
		text, err := v.text(name, string(source))
		if err != nil {
			return nil, err
		}
		out[name] = []byte(text)
		if strings.HasSuffix(name, ".go") {
			if out[name], err = format.Source(out[name]); err != nil {
				return nil, fmt.Errorf("%s: %w\n%s", name, err, text)
			}
		}
	}
	return out, nil
}

func (v view) text(name, source string) (string, error) {
	t, err := template.New(name).Funcs(functions).Parse(source)
	if err != nil {
		return "", err
	}
	var b strings.Builder
	err = t.Execute(&b, v)
	return b.String(), err
}

// functions are what the templates write values with. Go and Python spell
// texts of plain characters alike.
var functions = template.FuncMap{
	"py": quoted, "go": quoted, "pylist": func(s []string) string { return "[" + list(s) + "]" }, "golist": list,
	"pynumber": func(v float64) string { return number(v, "float(\"-inf\")") },
	"gonumber": func(v float64) string { return number(v, "math.Inf(-1)") },
	"pylimit":  func(l law.Limit) string { return limit(l, "wanelaw.at_parameter(%q)", "%v") },
	"golimit":  func(l law.Limit) string { return limit(l, "law.AtParameter(%q)", "law.At(%v)") },
	"pyname":   func(s string) string { return strings.ReplaceAll(s, "-", "_") },
	"goconst":  constant,
	"sentence": sentence,
	"join":     func(s []string) string { return strings.Join(s, ", ") },
	"composition": func(code uint8) string {
		return law.CompositionWords[code]
	},
}

func quoted(v any) string { return strconv.Quote(fmt.Sprint(v)) }

func list(words []string) string {
	out := make([]string, len(words))
	for i, w := range words {
		out[i] = strconv.Quote(w)
	}
	return strings.Join(out, ", ")
}

func number(v float64, minusInfinity string) string {
	if math.IsInf(v, -1) {
		return minusInfinity
	}
	text := strconv.FormatFloat(v, 'g', -1, 64)
	if !strings.ContainsAny(text, ".e") {
		text += ".0"
	}
	return text
}

func limit(l law.Limit, parameter, value string) string {
	if l.Parameter != "" {
		return fmt.Sprintf(parameter, l.Parameter)
	}
	return fmt.Sprintf(value, l.Value)
}

// constant is the Go name of a parameter's place: pHeatShare of heat_share.
func constant(parameter string) string {
	out := "p"
	for _, part := range strings.Split(parameter, "_") {
		out += strings.ToUpper(part[:1]) + part[1:]
	}
	return out
}

// sentence makes one of a phrase.
func sentence(s string) string { return strings.ToUpper(s[:1]) + s[1:] + "." }

// pythonImports lists the import lines that some functions need.
func pythonImports(functions string) []string {
	var out []string
	if strings.Contains(functions, "np.") {
		out = append(out, "import numpy as np\n")
	}
	out = append(out, "import wanelaw")
	var exact []string
	for _, name := range []string{"exp10", "log", "log10", "power"} {
		if regexp.MustCompile(`(^|[^.\w])` + name + `\(`).MatchString(functions) {
			exact = append(exact, name)
		}
	}
	if len(exact) > 0 {
		out = append(out, "from wanelaw.exact import "+strings.Join(exact, ", ")+"  # the same bits on every machine")
	}
	return out
}

// goImports lists what some functions need to import.
func goImports(functions string) []string {
	out := []string{`"fmt"`}
	if strings.Contains(functions, "math.") {
		out = append(out, `"math"`)
	}
	out = append(out, "", `"wane/sim/law"`)
	if strings.Contains(functions, "num.") {
		out = append(out, `"wane/sim/num"`)
	}
	return append(out, `"wane/sim/rpc"`)
}
