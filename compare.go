package motorcircuit

import (
	"errors"
	"fmt"

	"example.org/motorcircuit/internal/layout"
	"example.org/motorcircuit/tables"
)

// A Comparison is one circuit under several editions.
type Comparison struct {
	Editions    []tables.Edition `json:"editions"`    // in the order given
	Results     []Result         `json:"results"`     // by edition
	Differences []Difference     `json:"differences"` // in the order of the derivation; none if the editions agree
}

// A Difference is a figure or a choice that is not the same under all editions.
type Difference struct {
	Section string            `json:"section"` // heading of the part of the derivation
	What    string            `json:"what"`    // name of the figure, or the choice
	Values  []string          `json:"values"`  // by edition; "" where an edition has none
	Cites   []tables.Citation `json:"cites"`   // the rule behind each value, by edition
}

// An EditionError is why a circuit cannot be sized under one of the editions of
// a comparison.
type EditionError struct {
	Edition tables.Edition
	Err     error
}

func (e *EditionError) Error() string { return fmt.Sprintf("under %v: %v", e.Edition, e.Err) }

// Unwrap returns the error of the edition.
func (e *EditionError) Unwrap() error { return e.Err }

// Compare sizes one circuit under several editions and tells which figures
// differ, with the rule behind each. The circuit's own edition is not used.
// What one edition cannot size (its insulation has another designation, say)
// comes back as an [*EditionError], all of them joined.
func Compare(c Circuit, editions ...tables.Edition) (Comparison, error) {
	if len(editions) < 2 {
		return Comparison{}, &tables.InputError{Field: "editions", Value: itoa(len(editions)), Want: "two editions at the least"}
	}
	x := Comparison{Editions: editions, Differences: []Difference{}}
	var faults []error
	for _, e := range editions {
		c.Edition = e
		r, err := Size(c)
		if err != nil {
			faults = append(faults, &EditionError{e, err})
			continue
		}
		x.Results = append(x.Results, r)
	}
	if err := errors.Join(faults...); err != nil {
		return Comparison{}, err
	}
	x.differences()
	return x, nil
}

// A compared is one value of a result.
type compared struct {
	section Section
	what    string
	value   string
	cite    tables.Citation
}

// compareBy lists what results are compared by: the choices of a section, then
// its figures.
func (r *Result) compareBy() []compared {
	var list []compared
	for s := range sectionCount {
		for _, x := range r.selections(s) {
			list = append(list, compared{s, "conductors", wires(x), x.Required.Citation()})
		}
		switch s {
		case BondingConductor:
			list = append(list, compared{s, "conductor", r.Bonding.Size.String(), r.Bonding.Row.Citation()})
		case RacewayFill:
			list = append(list, compared{s, "trade size", r.Raceway.Trade, r.Raceway.Limit.Citation()})
		}
		for _, f := range r.section(nil, s) {
			if !f.IsZero() {
				list = append(list, compared{s, f.Name(), f.String(), f.Citation()})
			}
		}
	}
	return list
}

// differences lines the values of all results up by section and name, in the
// order in which they first come. Where a section has several of one name, those
// of the windings say, the first is held against the first.
func (x *Comparison) differences() {
	type key struct {
		section Section
		what    string
		nth     int
	}
	at := map[key]int{}
	var keys []key
	var rows []Difference
	for i := range x.Results {
		seen := map[key]int{}
		for _, v := range x.Results[i].compareBy() {
			k := key{section: v.section, what: v.what}
			seen[k]++
			k.nth = seen[k]
			row, ok := at[k]
			if !ok {
				row = len(rows)
				at[k], keys = row, append(keys, k)
				rows = append(rows, Difference{Section: v.section.String(), What: v.what,
					Values: make([]string, len(x.Results)), Cites: make([]tables.Citation, len(x.Results))})
			}
			rows[row].Values[i], rows[row].Cites[i] = v.value, v.cite
		}
	}
	for s := range sectionCount {
		for i, row := range rows {
			if keys[i].section == s && row.differs() {
				x.Differences = append(x.Differences, row)
			}
		}
	}
}

func (d *Difference) differs() bool {
	for _, v := range d.Values {
		if v != d.Values[0] {
			return true
		}
	}
	return false
}

// String tells the differences, one value a line with its rule.
func (x Comparison) String() string { return x.Text(0) }

// Text is [Comparison.String] in lines of at most so many characters, 40 at the
// least; 0 leaves them as long as they are.
func (x Comparison) Text(width int) string { return x.document().Text(width) }

// Markdown returns the differences in Markdown, a table for each.
func (x Comparison) Markdown() string { return x.document().Markdown() }

func (x *Comparison) document() *layout.Doc {
	d := &layout.Doc{Columns: [4]string{"Edition", "Value", "", "Rule"}}
	if len(x.Results) > 0 {
		d.Title = oneLine(x.Results[0].Circuit.Tag) + ": " + describe(&x.Results[0])
	}
	if len(x.Differences) == 0 {
		d.Sections = append(d.Sections, layout.Section{Heading: "No figure differs between the editions"})
	}
	for _, diff := range x.Differences {
		s := layout.Section{Heading: diff.Section + ", " + diff.What}
		for i, e := range x.Editions {
			row := layout.Row{Value: e.String(), Name: diff.Values[i], Rule: refsOf(diff.Cites[i : i+1])}
			if row.Name == "" {
				row = layout.Row{Value: e.String(), Name: "-"}
			}
			s.Rows = append(s.Rows, row)
		}
		d.Sections = append(d.Sections, s)
	}
	return d
}
