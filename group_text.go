package motorcircuit

import (
	"fmt"

	"example.org/motorcircuit/internal/layout"
	"example.org/motorcircuit/tables"
)

// String returns the derivation as text: the loads, the conductors, and each way in
// which the code has motors behind one device.
func (r GroupResult) String() string { return r.Text(0) }

// Text is [GroupResult.String] in lines of at most so many characters, 40 at the
// least; 0 leaves them as long as they are.
func (r GroupResult) Text(width int) string { return r.document().Text(width) }

// Markdown returns the derivation in Markdown, a table for each section.
func (r GroupResult) Markdown() string { return r.document().Markdown() }

func (r *GroupResult) document() *layout.Doc {
	d := &layout.Doc{Title: fmt.Sprintf("%s: %s on one branch circuit, under %s", oneLine(r.Group.Tag), motors(len(r.Circuits)), r.Group.Edition.Standard()), Columns: derivationColumns}
	loads := layout.Section{Heading: "Loads that size the conductors"}
	for _, t := range r.Terms {
		loads.Rows = append(loads.Rows, figureRow(t.Figure))
	}
	ways := layout.Section{Heading: "Ways to put the motors behind one device"}
	for _, w := range r.Ways {
		verdict := "not allowed"
		if w.Allowed {
			verdict = "allowed, with a device of " + w.Rating.String()
		}
		ways.Rows = append(ways.Rows, layout.Row{Name: verdict, How: w.Why, Rule: refsOf([]tables.Citation{w.Cite})})
		ways.Rows = append(ways.Rows, figureRows([]*tables.Figure{&w.Limit, &w.Rating})...)
	}
	d.Sections = []layout.Section{loads,
		{Heading: "Branch-circuit conductors", Chosen: wires(&r.Conductors), Rows: append(figureRows(selectionFigures(nil, &r.Conductors)), whySmallerFails(&r.Conductors)...)},
		ways, cautionSection(r.Cautions)}
	return d
}

// String returns the derivation as text: the circuits, and the bonding conductor and
// the raceway of all. Each circuit's own derivation is in [SharedResult.Circuits].
func (s SharedResult) String() string { return s.Text(0) }

// Text is [SharedResult.String] in lines of at most so many characters, 40 at the
// least; 0 leaves them as long as they are.
func (s SharedResult) Text(width int) string { return s.document().Text(width) }

// Markdown returns the derivation in Markdown, a table for each section.
func (s SharedResult) Markdown() string { return s.document().Markdown() }

func (s *SharedResult) document() *layout.Doc {
	var e tables.Edition
	if len(s.Circuits) > 0 {
		e = s.Circuits[0].Circuit.Edition
	}
	d := &layout.Doc{Title: fmt.Sprintf("%d circuits in one raceway, %d conductors that carry current, under %s", len(s.Circuits), s.Count, e.Standard()), Columns: derivationColumns}
	circuits := layout.Section{Heading: "Circuits"}
	for i := range s.Circuits {
		r := &s.Circuits[i]
		row := figureRow(r.Branch.Ampacity)
		row.Name = oneLine(r.Circuit.Tag) + ", " + wires(&r.Branch)
		circuits.Rows = append(circuits.Rows, row)
	}
	d.Sections = []layout.Section{circuits,
		{Heading: "Bonding conductor", Chosen: fmt.Sprintf("%v %v, %s", s.Bonding.Size, s.Bonding.Material, s.Bonding.Why), Rows: []layout.Row{figureRow(s.Bonding.Row)}},
		{Heading: "Raceway", Chosen: s.Raceway.Name(e), Rows: figureRows(racewayFigures(nil, &s.Raceway))},
		cautionSection(s.Cautions)}
	return d
}
