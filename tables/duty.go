package tables

import (
	"fmt"

	"example.org/motorcircuit/internal/exact"
)

// A Duty is the service that a motor does. The zero Duty is continuous.
type Duty uint8

// The kinds of duty. All but Continuous are "non-continuous".
const (
	Continuous   Duty = iota
	ShortTime         // a steady load for a short, definite time
	Intermittent      // load alternating with no load or rest
	Periodic          // intermittent with regular recurrence
	Varying           // load and interval both vary widely
	dutyCount
)

var dutyTexts = [...]string{"continuous", "short_time", "intermittent", "periodic", "varying"}

// String returns the stable text form.
func (d Duty) String() string { return TextOf(d, dutyTexts[:]) }

// MarshalText is [Duty.String].
func (d Duty) MarshalText() ([]byte, error) { return []byte(d.String()), nil }

// UnmarshalText reads the text form; no text is Continuous.
func (d *Duty) UnmarshalText(text []byte) error {
	return ReadText(d, "motor.duty.kind", text, dutyTexts[:])
}

// DutyPercent returns the percent of nameplate current for which conductors of
// a motor of other than continuous duty are chosen. Minutes is the motor's time
// rating: 5, 15, 30 or 60, or 0 for a motor rated for continuous running.
// Errors are [*InputError] and, for the blank cell, [*NotTabulatedError].
func (e Edition) DutyPercent(d Duty, minutes int) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	t := e.book().duty()
	col := -1
	for i, c := range dutyColumns {
		if c.minutes == minutes || c.also == minutes {
			col = i
		}
	}
	if col < 0 {
		return Figure{}, &InputError{"motor.duty.minutes", fmt.Sprint(minutes), "5, 15, 30 or 60, or 0 for a motor rated for continuous running", t.rule.In(e)}
	}
	if d == Continuous || d >= dutyCount {
		return Figure{}, &InputError{"motor.duty.kind", d.String(), "short_time, intermittent, periodic or varying", t.rule.In(e)}
	}
	cell := t.cells[d-1][col]
	if cell < 0 {
		return Figure{}, &NotTabulatedError{Field: "motor.duty.minutes", Table: t.rule.In(e), Row: "figure for short-time duty", Col: "a motor rated for continuous running", Covers: "motors rated 5, 15, 30 and 60 minutes"}
	}
	return newFigure(t.names[d-1], Tabulated, e, t.rule, exact.New(cell, 2), Percent).WithNote(dutyColumns[col].label), nil
}

var dutyColumns = [...]struct {
	name          string
	minutes, also int
	label         string
}{
	{"rated_5_minute_pct", 5, 5, "motor rated 5 minutes"},
	{"rated_15_minute_pct", 15, 15, "motor rated 15 minutes"},
	{"rated_30_and_60_minute_pct", 30, 60, "motor rated 30 or 60 minutes"},
	{"rated_continuous_pct", 0, 0, "motor rated continuous"},
}

type dutyTable struct {
	rule  *Rule
	names [4]string
	cells [4][4]int64 // by duty from ShortTime, then column
}

func loadDuty(path string, rule *Rule) func() *dutyTable {
	return loaded(func() (*dutyTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &dutyTable{rule: rule, names: [4]string{"short-time duty", "intermittent duty", "periodic duty", "varying duty"}}
		for row, cells := range g.Rows {
			if row > 3 || cells[0] != dutyTexts[row+1] {
				return nil, fmt.Errorf("%s: row %q is out of place", path, cells[0])
			}
			for i, c := range dutyColumns {
				col, err := g.Col(c.name)
				if err != nil {
					return nil, err
				}
				if t.cells[row][i], err = g.Hundredths(row, col); err != nil {
					return nil, err
				}
			}
		}
		return t, nil
	})
}
