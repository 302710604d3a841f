package tables

import (
	"fmt"
	"strconv"
	"strings"

	"example.org/motorcircuit/internal/csvgrid"
	"example.org/motorcircuit/internal/exact"
)

// A MotorTable is one of a code's tables of motor full-load current.
type MotorTable uint8

// The tables of full-load current.
const (
	InductionTable     MotorTable = iota // three-phase, squirrel cage and wound rotor
	SynchronousTable                     // three-phase, at unity power factor
	SinglePhaseTable                     // single-phase
	TwoPhaseTable                        // two-phase, four-wire; no table in the CEC
	DirectCurrentTable                   // dc at base speed
	motorTableCount
)

var motorTableNames = [...]string{
	"three-phase induction motors", "synchronous motors", "single-phase motors", "two-phase motors", "direct-current motors",
}

// String says what motors the table is for.
func (t MotorTable) String() string {
	if t < motorTableCount {
		return motorTableNames[t]
	}
	return ""
}

// FullLoadCurrent returns the current that the edition's table prints for a
// motor of the given power and voltage. Volts are the motor's rated volts or a
// system voltage that the table's notes allow for a column. What the table does
// not print is a [*NotTabulatedError].
func (e Edition) FullLoadCurrent(t MotorTable, p Power, volts int) (Figure, error) {
	m, err := e.motorTable(t)
	if err != nil {
		return Figure{}, err
	}
	return m.figure("table current", e, p, volts)
}

// LockedRotorCurrent returns the locked-rotor current by which the NEC chooses
// disconnecting means and controllers, Tables 430.251(A) (one phase) and (B)
// (two and three). The CEC has no such table: a [*NotTabulatedError].
func (e Edition) LockedRotorCurrent(phases int, p Power, volts int) (Figure, error) {
	m, err := e.lockedRotorTable(phases)
	if err != nil {
		return Figure{}, err
	}
	return m.figure("table locked-rotor current", e, p, volts)
}

// PowerAtOrAbove returns the least power whose table current at that voltage is
// at or above the given current: the horsepower of a motor that is marked in
// amperes only.
func (e Edition) PowerAtOrAbove(t MotorTable, volts int, current Figure) (Power, error) {
	m, err := e.motorTable(t)
	if err != nil {
		return Power{}, err
	}
	return m.powerAtOrAbove(e, volts, current)
}

// PowerAtOrAboveLockedRotor is [Edition.PowerAtOrAbove] for a locked-rotor
// current and the tables of [Edition.LockedRotorCurrent].
func (e Edition) PowerAtOrAboveLockedRotor(phases, volts int, current Figure) (Power, error) {
	m, err := e.lockedRotorTable(phases)
	if err != nil {
		return Power{}, err
	}
	return m.powerAtOrAbove(e, volts, current)
}

func (m *motorTable) powerAtOrAbove(e Edition, volts int, current Figure) (Power, error) {
	col, err := m.column(e, volts, current.String())
	if err != nil {
		return Power{}, err
	}
	for row, p := range m.powers {
		if cell := m.cell(row, col); cell >= 0 && m.value(row, col).Cmp(current.value) >= 0 {
			return p, nil
		}
	}
	return Power{}, &NotTabulatedError{Field: "motor.nameplate.amperes", Table: m.rule.In(e), Row: "row at or above " + current.String(), Col: m.cols[col].label, Covers: m.covers(col)}
}

// MotorPowers returns the powers that the table prints at that voltage, smallest
// first: the standard motors.
func (e Edition) MotorPowers(t MotorTable, volts int) ([]Power, error) {
	m, err := e.motorTable(t)
	if err != nil {
		return nil, err
	}
	col, err := m.column(e, volts, "row")
	if err != nil {
		return nil, err
	}
	return m.printed(col), nil
}

func (e Edition) motorTable(t MotorTable) (*motorTable, error) {
	if err := e.Check(); err != nil {
		return nil, err
	}
	if load := e.book().fullLoad[min(t, motorTableCount-1)]; load != nil && t < motorTableCount {
		return load(), nil
	}
	return nil, &NotTabulatedError{Field: "motor.kind", Table: Citation{Edition: e, Ref: e.book().motors}, Row: "table for " + t.String(),
		Covers: "three-phase, single-phase and direct-current motors"}
}

func (e Edition) lockedRotorTable(phases int) (*motorTable, error) {
	if err := e.Check(); err != nil {
		return nil, err
	}
	b := e.book()
	if b.lockedRotor1 == nil {
		return nil, &NotTabulatedError{Field: "motor.kind", Table: Citation{Edition: e, Ref: "Section 28"}, Row: "table of locked-rotor current",
			Covers: "six times full-load current for a motor that is not marked"}
	}
	switch phases {
	case 1:
		return b.lockedRotor1(e), nil
	case 2, 3:
		return b.lockedRotor3(), nil
	}
	return nil, &NotTabulatedError{Field: "motor.phases", Table: b.lockedRotor3().rule.In(e), Row: "direct-current motor", Covers: "one-, two- and three-phase motors"}
}

// A motorTable is a table of currents by power and voltage.
type motorTable struct {
	rule   *Rule
	powers []Power // rows, rising
	cols   []voltColumn
	cells  [][]int64  // hundredths of an ampere, -1 not tabulated
	notes  [][]string // where a cell stands
}

// A voltColumn is a printed column and the voltages it may serve; or, with
// percent, one that a note derives from a printed column.
type voltColumn struct {
	volts, low, high int
	label            string
	printed          int // index into the cells of a row
	percent          Figure
}

// A voltRange widens a column to the system voltages that a code allows for it.
type voltRange struct{ volts, low, high int }

// A derivedColumn is a column that a note makes from a printed one.
type derivedColumn struct {
	volts, from int
	percent     int64
	rule        *Rule
}

func loadMotorTable(path string, rule *Rule, ranges []voltRange, derived []derivedColumn, rename map[string]string) func() *motorTable {
	return loaded(func() (*motorTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		return newMotorTable(g, rule, ranges, derived, rename)
	})
}

func newMotorTable(g *csvgrid.Grid, rule *Rule, ranges []voltRange, derived []derivedColumn, rename map[string]string) (*motorTable, error) {
	m := &motorTable{rule: rule}
	var source []int // grid column of each printed column
	for i, name := range g.Header[1:] {
		if to, ok := rename[name]; ok {
			name = to
		}
		volts, err := strconv.Atoi(strings.TrimPrefix(name, "v"))
		if err != nil {
			continue // a column that this edition does not use
		}
		c := voltColumn{volts: volts, low: volts, high: volts, label: strconv.Itoa(volts) + " V", printed: len(source)}
		for _, r := range ranges {
			if r.volts == volts {
				c.low, c.high = r.low, r.high
			}
		}
		m.cols = append(m.cols, c)
		source = append(source, i+1)
	}
	for row := range g.Rows {
		p, err := ParseHP(g.Rows[row][0])
		if err != nil {
			return nil, fmt.Errorf("%s: %w", g.Path, err)
		}
		if row > 0 && p.Cmp(m.powers[row-1]) <= 0 {
			return nil, fmt.Errorf("%s: %v is out of order", g.Path, p)
		}
		cells, notes := make([]int64, len(source)), make([]string, len(source))
		for i, col := range source {
			if cells[i], err = g.Hundredths(row, col); err != nil {
				return nil, err
			}
			if row > 0 && cells[i] >= 0 && cells[i] < m.cells[row-1][i] {
				return nil, fmt.Errorf("%s: %v at %s is below the row above", g.Path, p, m.cols[i].label)
			}
			notes[i] = p.String() + ", " + m.cols[i].label
		}
		m.powers, m.cells, m.notes = append(m.powers, p), append(m.cells, cells), append(m.notes, notes)
	}
	for _, d := range derived {
		for i, c := range m.cols {
			if c.volts == d.from {
				m.cols = append(m.cols, voltColumn{volts: d.volts, low: d.volts, high: d.volts, label: strconv.Itoa(d.volts) + " V", printed: i,
					percent: StatedFigure(fmt.Sprintf("%d V motors, of the %d V value", d.volts, d.from), 0, d.rule, Percent, d.percent, 0)})
				break
			}
		}
	}
	return m, nil
}

func (m *motorTable) cell(row, col int) int64 { return m.cells[row][m.cols[col].printed] }

func (m *motorTable) value(row, col int) exact.Num {
	n := exact.New(m.cell(row, col), 2)
	if pct := m.cols[col].percent; !pct.IsZero() {
		n = n.Mul(pct.value).Mul(exact.New(1, 2))
	}
	return n
}

func (m *motorTable) column(e Edition, volts int, row string) (int, error) {
	for i, c := range m.cols {
		if c.low <= volts && volts <= c.high {
			return i, nil
		}
	}
	var b strings.Builder
	for i, c := range m.cols {
		if i > 0 {
			b.WriteString(", ")
		}
		b.WriteString(strconv.Itoa(c.volts))
		if c.low != c.high {
			fmt.Fprintf(&b, " (%d to %d)", c.low, c.high)
		}
	}
	return 0, &NotTabulatedError{Field: "motor.voltage", Table: m.rule.In(e), Row: row, Col: strconv.Itoa(volts) + " V", Covers: b.String() + " V"}
}

// printed returns the powers that a column prints.
func (m *motorTable) printed(col int) (powers []Power) {
	for row, p := range m.powers {
		if m.cell(row, col) >= 0 {
			powers = append(powers, p)
		}
	}
	return powers
}

func (m *motorTable) covers(col int) string {
	var texts []string
	for _, p := range m.printed(col) {
		texts = append(texts, p.Text())
	}
	return strings.Join(texts, ", ") + " hp"
}

func (m *motorTable) figure(name string, e Edition, p Power, volts int) (Figure, error) {
	col, err := m.column(e, volts, p.String())
	if err != nil {
		return Figure{}, err
	}
	if p.IsHP() {
		for row := range m.powers {
			if m.powers[row] == p && m.cell(row, col) >= 0 {
				f := newFigure(name, Tabulated, e, m.rule, exact.New(m.cell(row, col), 2), Ampere)
				f.note = m.notes[row][m.cols[col].printed]
				if pct := m.cols[col].percent; !pct.IsZero() {
					pct.edition = e
					f = ProductOf(name, e, m.rule, f, pct)
				}
				return f, nil
			}
		}
	}
	row := p.String()
	if p.IsZero() {
		row = "motor without a power"
	}
	return Figure{}, &NotTabulatedError{Field: "motor.power", Table: m.rule.In(e), Row: row, Col: m.cols[col].label, Covers: m.covers(col)}
}
