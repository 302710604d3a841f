package motorcircuit

import (
	"slices"
	"strings"

	"example.org/motorcircuit/tables"
)

// A judge holds what stands against what is required, and gathers the findings.
type judge struct {
	edition  tables.Edition
	report   Report
	cautions cautionList
	unfit    *tables.InputError // why the wiring's insulation may not be used where it is
}

func newJudge(tag string, e tables.Edition) judge {
	return judge{edition: e, report: Report{Tag: tag, Edition: e, Findings: []Finding{}}}
}

// A claim is one thing to judge.
type claim struct {
	code  FindingCode
	part  string
	found tables.Figure
	cites []tables.Citation // beside those of the figures
}

// missing lists a claim as not judged if it is not given, or if nothing is required
// of it.
func (j *judge) missing(c claim, required tables.Figure) bool {
	switch {
	case c.found.IsZero() && required.IsZero():
	case c.found.IsZero():
		j.skip(c.part, "not given")
	case required.IsZero():
		j.skip(c.part, "nothing is required of it here")
	default:
		return false
	}
	return true
}

// Why what depends on the conductors was not judged.
const (
	noConductors = "the conductors that it goes with cannot be judged or chosen"
	noLength     = "not given, or of conductors that cannot be judged or chosen"
)

func (j *judge) skip(part, why string) {
	j.report.NotJudged = append(j.report.NotJudged, NotJudged{part, why})
}

// atLeast holds what stands against the least that is required. One that falls
// short is of the given severity.
func (j *judge) atLeast(c claim, required tables.Figure, short Severity) {
	if j.missing(c, required) {
		return
	}
	f := j.finding(c, required, tables.DifferenceOf("margin", 0, nil, c.found, required))
	if f.Margin.Cmp(tables.Figure{}) < 0 {
		f.Severity = short
		f.Text = worded(c.found, "is below", required, f.Margin)
	} else {
		f.Text = worded(c.found, "meets", required, f.Margin)
	}
	j.add(f)
}

// A ceiling is the greatest that is allowed: at the limit without conditions, and
// to the higher one if the motor will not start under that.
type ceiling struct {
	limit, start tables.Figure
	confirmed    bool     // the motor will not start under the limit
	over         Severity // of what exceeds it
}

// atMost holds what stands against the greatest that is allowed.
func (j *judge) atMost(c claim, most ceiling) {
	if j.missing(c, most.limit) {
		return
	}
	required := most.limit
	over := c.found.Cmp(most.limit) > 0
	within := over && c.found.Cmp(most.start) <= 0
	if over && most.confirmed {
		required = greater(most.limit, most.start)
	}
	f := j.finding(c, required, tables.DifferenceOf("margin", 0, nil, required, c.found))
	f.Ceiling = true
	switch {
	case f.Margin.Cmp(tables.Figure{}) >= 0:
		f.Text = worded(c.found, "is within", required, f.Margin)
	case within:
		f.Severity = Caution
		f.Cites = union(f.Cites, most.start.Citations())
		f.Text = worded(c.found, "is above", required, f.Margin) + "; it may stand only if the motor will not start under that, up to " + most.start.String()
	default:
		f.Severity = most.over
		f.Text = worded(c.found, "is above", required, f.Margin)
	}
	j.add(f)
}

// finding begins a finding; its rules are the deciding ones first.
func (j *judge) finding(c claim, required, margin tables.Figure) Finding {
	cites := union(nil, c.cites, required.Citations(), c.found.Citations())
	return Finding{Code: c.code, Part: c.part, Required: required, Found: c.found, Margin: margin, Cites: cites}
}

func (j *judge) add(f Finding) { j.report.Findings = append(j.report.Findings, f) }

// say adds a finding without figures.
func (j *judge) say(code FindingCode, part string, severity Severity, text string, cites ...tables.Citation) {
	j.add(Finding{Code: code, Part: part, Severity: severity, Cites: cites, Text: text})
}

// worded words a comparison: "ampacity of 6 AWG copper THWN, 65 A, is below the
// least ampacity of the branch-circuit conductors, 81.25 A, by 16.25 A".
func worded(found tables.Figure, verb string, required, margin tables.Figure) string {
	by := strings.TrimPrefix(margin.String(), "-")
	switch margin.Cmp(tables.Figure{}) {
	case 0:
		by = "exactly"
	case 1:
		by = "with " + by + " to spare"
	default:
		by = "by " + by
	}
	return oneLine(found.Name() + ", " + found.String() + ", " + verb + " the " + required.Name() + ", " + required.String() + ", " + by)
}

// union returns the citations of several lists, each once.
func union(lists ...[]tables.Citation) []tables.Citation {
	var all []tables.Citation
	for _, list := range lists {
		for _, c := range list {
			if !c.IsZero() && !slices.Contains(all, c) {
				all = append(all, c)
			}
		}
	}
	return all
}

// finish closes the report with what the judgement rests on.
func (j *judge) finish(cautions []tables.Caution) Report {
	for _, f := range j.report.Findings {
		for _, g := range []tables.Figure{f.Required, f.Found} {
			for _, cite := range g.FromMemory() {
				j.cautions.add(tables.FromMemory(cite))
			}
		}
	}
	j.cautions.add(cautions...)
	j.report.Cautions = j.cautions
	return j.report
}
