package schedule

import (
	"encoding/csv"
	"fmt"
	"io"
	"slices"
	"strings"

	mc "example.org/motorcircuit"
)

// A reportOutput writes reports in one format, a row at a time.
type reportOutput interface {
	begin(passed []string) error // names of the passed-through columns
	row(a *answer[judged]) error
	end(n verdict) error // after the last row
}

// reportFormats are the formats of the program check.
var reportFormats = []format[func(io.Writer) reportOutput]{
	{"text", func(w io.Writer) reportOutput { return &reportText{textOutput{w, "not judged"}} }},
	{"csv", func(w io.Writer) reportOutput { return &reportCSV{csv.NewWriter(w)} }},
	{"json", func(w io.Writer) reportOutput { return &reportJSON{jsonArray{w: w}} }},
}

// A reportText writes the report on each row and a summary.
type reportText struct{ textOutput }

// String prints the report with the findings that are shown. Its first line counts
// those of the whole.
func (j judged) String() string {
	heading, _, _ := strings.Cut(j.whole.String(), "\n")
	_, findings, _ := strings.Cut(j.shown.String(), "\n")
	return heading + "\n" + findings
}

func (o *reportText) row(a *answer[judged]) error { return writeText(&o.textOutput, a) }

func (o *reportText) end(n verdict) error {
	return o.write(fmt.Sprintf("%d circuits judged, %d with violations, %d not judged\n", n.judged, n.violating, n.failed))
}

// findingNames are the columns of a finding.
var findingNames = []string{"tag", "code", "part", "finding", "severity", "required", "found", "margin", "unit", "rules", "text", "error"}

// A reportCSV writes one line for each finding that is shown, and one for a row that
// could not be judged.
type reportCSV struct{ w *csv.Writer }

func (o *reportCSV) begin(passed []string) error {
	return o.w.Write(append(slices.Clone(findingNames), passed...))
}

func (o *reportCSV) row(a *answer[judged]) error {
	if len(a.faults) > 0 {
		cells := make([]string, len(findingNames))
		cells[0], cells[1], cells[len(cells)-1] = a.tag, a.code, strings.Join(a.faults, "; ")
		return o.w.Write(append(cells, a.passed...))
	}
	for _, f := range a.result.shown.Findings {
		cells := []string{a.tag, a.code, f.Part, f.Code.String(), f.Severity.String(), f.Required.Text(), f.Found.Text(), f.Margin.Text(), f.Required.Unit().String(), rules(&f), f.Text, ""}
		if err := o.w.Write(append(cells, a.passed...)); err != nil {
			return err
		}
	}
	return nil
}

func (o *reportCSV) end(verdict) error {
	o.w.Flush()
	return o.w.Error()
}

func rules(f *mc.Finding) string {
	texts := make([]string, len(f.Cites))
	for i, c := range f.Cites {
		texts[i] = c.String()
	}
	return strings.Join(texts, "; ")
}

// A reportJSON writes an array: the library's own report on a row, or the tag and
// the error.
type reportJSON struct{ jsonArray }

func (o *reportJSON) begin([]string) error { return o.write("[") }

func (o *reportJSON) row(a *answer[judged]) error {
	if len(a.faults) == 0 {
		return o.element(&a.result.shown)
	}
	return o.element(struct {
		badJSON
		Error string `json:"error"`
	}{badJSON{a.tag}, strings.Join(a.faults, "; ")})
}

func (o *reportJSON) end(verdict) error { return o.write("\n]\n") }
