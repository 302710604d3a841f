package motorcircuit

import (
	"fmt"
	"io"
	"slices"
	"strings"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/layout"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// String returns the derivation as text: what was asked, each figure with how
// it came about and the rule behind it, the choices made, and the cautions.
func (r Result) String() string { return r.Text(0) }

// Text is [Result.String] in lines of at most so many characters, 40 at the least;
// 0 leaves them as long as they are.
func (r Result) Text(width int) string { return r.document().Text(width) }

// Markdown returns the derivation in Markdown, a table for each section.
func (r Result) Markdown() string { return r.document().Markdown() }

// WriteTo writes the text of [Result.String].
func (r Result) WriteTo(w io.Writer) (int64, error) {
	n, err := io.WriteString(w, r.String())
	return int64(n), err
}

// derivationColumns head the rows of a derivation.
var derivationColumns = [4]string{"Value", "What", "How", "Rule"}

func (r *Result) document() *layout.Doc {
	c := &r.Circuit
	d := &layout.Doc{Title: fmt.Sprintf("%s: %s, under %s", oneLine(c.Tag), describe(r), c.Edition.Standard()), Columns: derivationColumns}
	for s := range sectionCount {
		rows := figureRows(r.section(nil, s))
		chosen := r.chosen(s)
		if len(rows) == 0 && chosen == "" {
			continue
		}
		for _, x := range r.selections(s) {
			rows = append(rows, whySmallerFails(x)...)
		}
		d.Sections = append(d.Sections, layout.Section{Heading: s.String(), Chosen: chosen, Rows: rows})
	}
	d.Sections = append(d.Sections, cautionSection(r.Cautions))
	return d
}

// figureRows sets the figures that are present, one a row.
func figureRows(figures []*tables.Figure) (rows []layout.Row) {
	for _, f := range figures {
		if !f.IsZero() {
			rows = append(rows, figureRow(*f))
		}
	}
	return rows
}

// figureRow sets a figure: the value, what it is, how it came about and the rules
// behind it.
func figureRow(f tables.Figure) layout.Row {
	return layout.Row{Value: f.String(), Name: oneLine(f.Name()), How: f.How(), Rule: refs(f)}
}

func cautionSection(cautions []tables.Caution) layout.Section {
	s := layout.Section{Heading: "Cautions"}
	for _, c := range cautions {
		s.List = append(s.List, strings.TrimSpace(c.Text+" "+ref(c.Cite)))
	}
	return s
}

// ref prints a citation without its edition, which the heading names.
func ref(c tables.Citation) string {
	if c.IsZero() {
		return ""
	}
	c.Edition = 0
	return "[" + c.String() + "]"
}

// refs prints the rule that decided a figure and those that its percents,
// factors and ratings were read from.
func refs(f tables.Figure) string {
	cites := []tables.Citation{f.Citation()}
	for _, g := range f.Operands() {
		if c := g.Citation(); (g.Op() == tables.Tabulated || g.Op() == tables.Stated) && !c.IsZero() && !slices.Contains(cites, c) {
			cites = append(cites, c)
		}
	}
	return refsOf(cites)
}

// refsOf prints citations without their edition.
func refsOf(cites []tables.Citation) string {
	var texts []string
	for _, c := range cites {
		if !c.IsZero() {
			c.Edition = 0
			texts = append(texts, c.String())
		}
	}
	return strings.Join(texts, "; ")
}

func describe(r *Result) string {
	m := &r.Circuit.Motor
	parts := []string{m.Kind.Name()}
	if !m.Power.IsZero() {
		parts = append(parts, m.Power.String())
	}
	parts = append(parts, fmt.Sprintf("%d V", m.Voltage))
	if n := m.PhaseCount(); n > 0 && m.Kind != motor.SinglePhase {
		parts = append(parts, fmt.Sprintf("%d-phase", n))
	}
	if m.Duty.Kind != tables.Continuous {
		parts = append(parts, strings.ReplaceAll(m.Duty.Kind.String(), "_", "-")+" duty")
	}
	if m.Starting != 0 {
		parts = append(parts, startings[m.Starting])
	}
	if m.Use != motor.Ordinary {
		parts = append(parts, strings.ReplaceAll(m.Use.String(), "_", " "))
	}
	if m.Bypass {
		parts = append(parts, "with bypass")
	}
	if n := len(m.Nameplate.Windings); n > 0 {
		parts = append(parts, fmt.Sprintf("%d speeds", n))
	}
	return strings.Join(parts, ", ")
}

// startings words the ways to start a motor.
var startings = map[motor.Starting]string{
	motor.WyeDelta: "wye-delta start", motor.PartWinding: "part-winding start", motor.Autotransformer: "autotransformer start",
	motor.Resistor: "resistor or reactor start", motor.SoftStarter: "soft starter", motor.Drive: "on an adjustable-speed drive",
}

// chosen says what a section comes to.
func (r *Result) chosen(s Section) string {
	if runs := r.selections(s); len(runs) > 0 {
		texts := make([]string, len(runs))
		for i, x := range runs {
			texts[i] = wires(x)
		}
		return strings.Join(texts, "; ")
	}
	switch s {
	case OverloadProtection:
		if r.Overload.Limit.IsZero() {
			return "none"
		}
		return "set at not more than " + r.Overload.Limit.String()
	case ShortCircuitDevice:
		if x := &r.ShortCircuit; !x.Rating.IsZero() {
			return x.Rating.String() + " " + x.Device.Name()
		}
		return r.ShortCircuit.Device.Name() + " set at not more than " + r.ShortCircuit.Limit.String()
	case DisconnectingMeans:
		return rating(r.Disconnect.Amperes, r.Disconnect.Horsepower, r.Disconnect.Cite)
	case ControllerRating:
		return rating(r.Controller.Amperes, r.Controller.Horsepower, r.Controller.Cite)
	case BondingConductor:
		return fmt.Sprintf("%v %v, %s", r.Bonding.Size, r.Bonding.Material, r.Bonding.Why)
	case RacewayFill:
		name := r.Raceway.Name(r.Circuit.Edition)
		if flexible := r.Flexible.Name(r.Circuit.Edition); flexible != "" {
			name = strings.TrimPrefix(name+", at the motor "+flexible, ", ")
		}
		return name
	}
	return ""
}

func rating(amps tables.Figure, p tables.Power, cite tables.Citation) string {
	hp := strings.TrimSpace(p.String() + " " + ref(cite))
	switch {
	case amps.IsZero() && p.IsZero():
		return ""
	case amps.IsZero():
		return "at least " + hp
	case p.IsZero():
		return "at least " + amps.String()
	}
	return "at least " + amps.String() + " and " + hp
}

func wires(s *conductor.Selection) string {
	if s.IsZero() {
		return ""
	}
	text := fmt.Sprintf("%v %v %s", s.Size, s.Material, s.Insulation)
	if s.Sets > 1 {
		text = fmt.Sprintf("%d in parallel, each %s", s.Sets, text)
	}
	return text + ", " + strings.ReplaceAll(s.Run.String(), "_", " ") + ", " + s.Location.String()
}

// whySmallerFails says why the next smaller size does not do.
func whySmallerFails(x *conductor.Selection) []layout.Row {
	small := x.Smaller
	if small.Size == 0 {
		return nil
	}
	row := layout.Row{Value: small.Size.String(), Name: "next smaller size, fails"}
	if small.Ampacity.IsZero() {
		row.How, row.Rule = small.Why, refsOf([]tables.Citation{small.Cite})
	} else {
		row.How = "carries " + small.Ampacity.String() + ", " + small.Ampacity.How()
	}
	return []layout.Row{row}
}

// oneLine returns a caller's text on one line, "-" if there is none.
func oneLine(s string) string {
	if s = strings.Join(strings.Fields(s), " "); s == "" {
		return "-"
	}
	return s
}
