package motorcircuit

import (
	"fmt"
	"strings"

	"example.org/motorcircuit/tables"
)

// String tells the findings, gravest first, then what was not judged and what the
// judgement rests on.
func (r Report) String() string {
	var b strings.Builder
	fmt.Fprintf(&b, "%s: %s, under %s\n", oneLine(r.Tag), r.verdict(), r.Edition.Standard())
	for _, group := range []struct {
		severity Severity
		heading  string
	}{{Violation, "Violations"}, {Caution, "To be confirmed"}, {Note, "Requirements met"}} {
		heading := group.heading
		for _, f := range r.Findings {
			if f.Severity != group.severity {
				continue
			}
			if heading != "" {
				fmt.Fprintf(&b, "\n%s\n", heading)
				heading = ""
			}
			fmt.Fprintf(&b, "  - %s: %s%s\n", f.Part, f.Text, refsOf(f.Cites))
		}
	}
	if len(r.NotJudged) > 0 {
		b.WriteString("\nNot judged\n")
		for _, n := range r.NotJudged {
			fmt.Fprintf(&b, "  - %s: %s\n", n.Part, oneLine(n.Why))
		}
	}
	writeCautions(&b, r.Cautions)
	return b.String()
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

// refsOf prints citations without their edition, which the heading names.
func refsOf(cites []tables.Citation) string {
	texts := make([]string, len(cites))
	for i, c := range cites {
		c.Edition = 0
		texts[i] = c.String()
	}
	if len(texts) == 0 {
		return ""
	}
	return " [" + strings.Join(texts, "; ") + "]"
}
