package motorcircuit

import "example.org/motorcircuit/internal/layout"

// String tells the findings, gravest first, then what was not judged and what the
// judgement rests on.
func (r Report) String() string { return r.Text(0) }

// Text is [Report.String] in lines of at most so many characters, 40 at the least;
// 0 leaves them as long as they are.
func (r Report) Text(width int) string { return r.document().Text(width) }

// Markdown returns the report in Markdown.
func (r Report) Markdown() string { return r.document().Markdown() }

func (r *Report) document() *layout.Doc {
	d := &layout.Doc{Title: oneLine(r.Tag) + ": " + r.verdict() + ", under " + r.Edition.Standard()}
	list := func(heading string, items []string) {
		if len(items) > 0 {
			d.Sections = append(d.Sections, layout.Section{Heading: heading, List: items})
		}
	}
	for _, group := range []struct {
		severity Severity
		heading  string
	}{{Violation, "Violations"}, {Caution, "To be confirmed"}, {Note, "Requirements met"}} {
		var items []string
		for _, f := range r.Findings {
			if f.Severity == group.severity {
				items = append(items, f.Part+": "+f.Text+bracketed(refsOf(f.Cites)))
			}
		}
		list(group.heading, items)
	}
	var items []string
	for _, n := range r.NotJudged {
		items = append(items, n.Part+": "+oneLine(n.Why))
	}
	list("Not judged", items)
	d.Sections = append(d.Sections, cautionSection(r.Cautions))
	return d
}

func bracketed(rules string) string {
	if rules == "" {
		return ""
	}
	return " [" + rules + "]"
}

// verdict counts the findings in words.
func (r *Report) verdict() string {
	var count [Violation + 1]int
	for _, f := range r.Findings {
		count[f.Severity]++
	}
	return plural(count[Violation], "violation") + ", " + plural(count[Caution], "point") + " to be confirmed, " + plural(count[Note], "requirement") + " met"
}

// plural counts things in words: "no violations", "1 violation", "2 violations".
func plural(n int, thing string) string {
	switch n {
	case 0:
		return "no " + thing + "s"
	case 1:
		return "1 " + thing
	}
	return itoa(n) + " " + thing + "s"
}
