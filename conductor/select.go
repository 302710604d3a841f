package conductor

import (
	"errors"
	"strconv"

	"example.org/motorcircuit/tables"
)

// A Load is what a run of conductors is asked to carry.
type Load struct {
	Ampacity tables.Figure // least ampacity
	Count    int           // current-carrying conductors of the circuit itself
	Motor75  bool          // ends at a motor marked Design B, C or D, which NEC 110.14(C)(1)(a)(4) takes at 75 °C
}

// A Selection is the conductors chosen for a load, and why.
type Selection struct {
	Required    tables.Figure   `json:"required"`              // least ampacity asked for
	Size        tables.Size     `json:"size"`                  // of each conductor
	Sets        int             `json:"sets"`                  // conductors in parallel for each phase, 1 for none
	Material    tables.Material `json:"material"`              // metal of the conductors
	Insulation  string          `json:"insulation"`            // designation of the insulation
	Location    tables.Location `json:"location"`              // dry, damp or wet
	Run         tables.Run      `json:"run"`                   // how they are run
	Termination tables.Figure   `json:"termination"`           // temperature that the terminals allow, °C
	Ambient     tables.Figure   `json:"ambient_factor"`        // factor for ambient air
	Together    tables.Figure   `json:"together_factor"`       // factor or percent for conductors together
	Need        tables.Figure   `json:"least_table_ampacity"`  // of one conductor, before the factors
	Ampacity    tables.Figure   `json:"ampacity"`              // usable ampacity of all sets
	Smaller     Rejected        `json:"next_smaller,omitzero"` // the next smaller size and why it fails

	SmallLimit  tables.Figure    `json:"small_conductor_limit,omitzero"` // device limit of a small conductor outside of motor circuits, told but not applied
	LeastRating tables.Figure    `json:"least_insulation,omitzero"`      // least insulation temperature at a motor's terminal box, where the code asks for one
	Cautions    []tables.Caution `json:"-"`
}

// A Rejected is a size that does not do.
type Rejected struct {
	Size     tables.Size     `json:"size"`              // of each conductor
	Ampacity tables.Figure   `json:"ampacity,omitzero"` // its usable ampacity, absent if it fails for another reason
	Why      string          `json:"why"`               // it does not do
	Cite     tables.Citation `json:"cite,omitzero"`     // the rule, where it is not the ampacity
}

// IsZero reports whether nothing was selected.
func (s Selection) IsZero() bool { return s.Size == 0 }

// Select chooses the smallest conductors of a wiring that carry the load: one
// for each phase or, where no single one does, the fewest in parallel. Errors
// are [*tables.InputError], [*tables.NotTabulatedError] and
// [*tables.NoSizeError].
func (w Wiring) Select(e tables.Edition, l Load) (Selection, error) {
	c, err := w.choice(e, l)
	if err != nil {
		return Selection{}, err
	}
	return c.choose()
}

// choice begins the search for the conductors of a wiring that carry the load.
func (w Wiring) choice(e tables.Edition, l Load) (*choice, error) {
	if err := w.check(e, l); err != nil {
		return nil, err
	}
	ins, err := w.insulation(e)
	if err != nil {
		return nil, err
	}
	r := rulesOf(e)
	s := r.start(w, l, ins)
	s.Termination = r.termination(e, w, l, ins.celsius)
	return r.choice(e, w, l, ins, s, r.columns(w, ins.celsius, celsiusOf(s.Termination)))
}

// check reports a wiring or a load that cannot stand.
func (w Wiring) check(e tables.Edition, l Load) error {
	err := w.Validate(e)
	if l.Ampacity.Unit() != tables.Ampere || l.Ampacity.Cmp(tables.Figure{}) <= 0 {
		err = errors.Join(err, &tables.InputError{Field: "load.ampacity", Value: l.Ampacity.String(), Want: "a least ampacity above 0 A"})
	}
	return err
}

// start returns a selection with what is known before a size is.
func (r *rules) start(w Wiring, l Load, ins insulation) Selection {
	s := Selection{Required: l.Ampacity, Material: w.Material, Insulation: ins.Type, Location: w.Location, Run: w.Run}
	if w.Insulation == "" {
		s.Cautions = append(s.Cautions, tables.Caution{Text: r.defaultText, Cite: ins.Citation})
	}
	if ins.Mark == tables.MarkC {
		s.Cautions = append(s.Cautions, tables.FromMemory(ins.Citation))
	}
	if ins.Note != "" && (w.Insulation != "" || w.Location != tables.Dry) {
		s.Cautions = append(s.Cautions, tables.Caution{Text: ins.Type + ": " + ins.Note, Cite: ins.Citation})
	}
	return s
}

// columns are the columns of the ampacity table that hold together: the one
// that the factors apply to, and the one that holds uncorrected.
type columns struct{ corrected, terminal int }

// choice looks up the factors of a run and the tables that its conductors are held
// to.
func (r *rules) choice(e tables.Edition, w Wiring, l Load, ins insulation, s Selection, cols columns) (*choice, error) {
	run, err := r.corrections(e, w, l, ins, &s)
	if err != nil {
		return nil, err
	}
	table, err := e.Ampacities(run, w.Material)
	if err != nil {
		return nil, err
	}
	// Terminals go by the table for raceways, also where the run is in free air.
	terminal, err := e.Ampacities(r.terminalRun(run), w.Material)
	if err != nil {
		return nil, err
	}
	return &choice{e: e, w: w, r: r, s: s, ins: ins, table: table, terminal: terminal,
		cols: columns{table.Column(cols.corrected), terminal.Column(cols.terminal)}}, nil
}

// choose finds the smallest size for which the corrected ampacity and the
// uncorrected one of the termination both carry the load.
func (c *choice) choose() (Selection, error) {
	first, last := 1, MaxSets
	if c.w.Sets > 0 {
		first, last = c.w.Sets, c.w.Sets
	}
	for sets := first; sets <= last; sets++ {
		least, _ := c.least(sets)
		from := max(least, c.w.Least)
		if size := c.smallest(sets, from); size != 0 {
			c.finish(size, sets)
			c.tellSmaller(from)
			return c.s, nil
		}
	}
	return Selection{}, &tables.NoSizeError{Field: "wiring", Need: c.s.Required, Cite: c.table.Citation(),
		Constraint: "no " + c.ins.Type + " " + c.w.Material.String() + " conductor up to " + c.ins.Most.String() + " carries it, in " + setsText(first, last)}
}

// least returns the smallest size that the code allows in so many sets, and the
// rule that says so.
func (c *choice) least(sets int) (tables.Size, *tables.Rule) {
	if size := max(c.r.least[c.w.Material], c.ins.Least); sets <= 1 || size >= leastParallel {
		return size, &c.r.leastRule
	}
	return leastParallel, &c.r.parallel
}

func setsText(first, last int) string {
	if first == last {
		return strconv.Itoa(first) + " set(s)"
	}
	return "sets of up to " + strconv.Itoa(last) + " in parallel"
}

// A choice is a search under way.
type choice struct {
	e               tables.Edition
	w               Wiring
	r               *rules
	s               Selection
	ins             insulation
	table, terminal tables.AmpacityTable
	cols            columns
}

// need works out the least table ampacity of one conductor of so many sets.
func (c *choice) need(sets int) tables.Figure {
	c.s.Need = c.s.Required
	if divisors := c.factors(sets); len(divisors) > 0 {
		c.s.Need = tables.QuotientOf("least table ampacity of one conductor", c.e, &c.r.correction, c.s.Required, divisors...)
	}
	return c.s.Need
}

// smallest returns the smallest size from the given one that carries the load in
// so many sets, 0 if none does.
func (c *choice) smallest(sets int, from tables.Size) tables.Size {
	size := c.table.AtLeast(c.need(sets), c.cols.corrected, from, c.ins.Most)
	if size == 0 || c.cols.terminal == 0 {
		return size
	}
	at := c.s.Required
	if sets > 1 {
		at = tables.QuotientOf("ampacity of one conductor at its termination", c.e, &c.r.parallel, at, setsFigure(sets))
	}
	return c.terminal.AtLeast(at, c.cols.terminal, size, c.ins.Most)
}

func setsFigure(sets int) tables.Figure { return tables.Whole("sets in parallel", tables.Plain, sets) }

// factors returns what an ampacity is multiplied by, leaving out factors of one.
func (c *choice) factors(sets int) []tables.Figure {
	var f []tables.Figure
	if !c.s.Ambient.IsOne() {
		f = append(f, c.s.Ambient)
	}
	if !c.s.Together.IsOne() {
		f = append(f, c.s.Together)
	}
	if sets > 1 {
		f = append(f, setsFigure(sets))
	}
	return f
}

// usable returns the ampacity of a size in so many sets: the corrected one, or
// that of its termination if it is less; absent where a table prints none.
func (c *choice) usable(size tables.Size, sets int) tables.Figure {
	corrected := c.table.Ampacity(size, c.cols.corrected)
	if corrected.IsZero() {
		return corrected
	}
	if f := c.factors(sets); len(f) > 0 {
		corrected = tables.ProductOf("corrected ampacity", c.e, &c.r.correction, append([]tables.Figure{corrected}, f...)...)
	}
	if c.cols.terminal == 0 {
		return corrected
	}
	terminal := c.terminal.Ampacity(size, c.cols.terminal)
	if terminal.IsZero() {
		return terminal
	}
	if sets > 1 {
		terminal = tables.ProductOf("ampacity", c.e, &c.r.parallel, terminal, setsFigure(sets))
	}
	if c.cols.terminal == c.cols.corrected && corrected.Cmp(terminal) <= 0 {
		return corrected
	}
	return tables.SmallestOf("usable ampacity", c.e, &c.r.terminalRule, corrected, terminal.Renamed(terminal.Name()+" at the terminals"))
}

// finish fills in the size.
func (c *choice) finish(size tables.Size, sets int) {
	s := &c.s
	s.Size, s.Sets = size, sets
	s.Ampacity = c.usable(size, sets)
	s.SmallLimit = c.e.SmallConductorLimit(s.Material, size)
	if sets > 1 {
		s.Cautions = append(s.Cautions, tables.Caution{Text: strconv.Itoa(sets) + " conductors in parallel for each phase: each set in a raceway of its own, all of one length, material, size, insulation and way of ending", Cite: c.r.parallel.In(c.e)})
	}
	c.r.afterwards(c.e, c.w, s)
}

// tellSmaller tells why the next size smaller than the chosen one fails.
func (c *choice) tellSmaller(from tables.Size) {
	s := &c.s
	if smaller := s.Size.Smaller(); smaller >= from {
		s.Smaller = Rejected{Size: smaller, Ampacity: c.usable(smaller, s.Sets), Why: "carries less than is asked for"}
	} else if rule := &c.r.leastRule; smaller != 0 {
		why := "below the smallest size allowed"
		if s.Sets > 1 {
			rule, why = &c.r.parallel, "too small to be run in parallel"
		}
		s.Smaller = Rejected{Size: smaller, Why: why, Cite: rule.In(c.e)}
	}
}

func celsiusOf(f tables.Figure) int { return int(f.Value().IntPart()) }
