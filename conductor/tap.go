package conductor

import (
	"github.com/shopspring/decimal"

	"example.org/motorcircuit/tables"
)

// A Tap is a run of conductors that leaves others without a device of its own
// ampacity where it leaves them.
type Tap struct {
	Load      tables.Figure // least ampacity that the load alone asks for
	Source    tables.Figure // ampacity of the conductors tapped
	Device    tables.Figure // rating of the device ahead of those
	Length    tables.Length // of the tap
	Protected bool          // in raceway or enclosure, or otherwise guarded from damage
	Group     bool          // a motor's tap from a group's branch circuit, not from a feeder
	Marked    bool          // ends at a manual controller listed for tap protection in group installations (NEC)
	HighBay   bool          // in a building over 11 m (35 ft) high, under the conditions of NEC 430.28, Exception
}

var (
	necTap10     = tables.Rule{Ref: "430.28(1)"}
	necTap25     = tables.Rule{Ref: "430.28(2)"}
	necTapFull   = tables.Rule{Ref: "430.28(3)"}
	necTapHigh   = tables.Rule{Ref: "430.28 Exception"}
	necGroupFull = tables.Rule{Ref: "430.53(D)(1)"}
	necGroup25   = tables.Rule{Ref: "430.53(D)(2)"}
	necGroup10   = tables.Rule{Ref: "430.53(D)(3)"}
	cecTap3      = tables.Rule{Ref: "Rule 28-110(2)(a)"}
	cecTap75     = tables.Rule{Ref: "Rule 28-110(2)(b)"}
	cecTapFull   = tables.Rule{Ref: "Rule 28-110(2)"}
	cecGroup75   = tables.Rule{Ref: "Rule 28-106(3)", Mark: tables.MarkB}
)

// The shares that tap rules ask for, as divisors.
const (
	third = 3
	tenth = 10
)

// Ampacity returns the least ampacity of the tap under the most favourable rule
// that its length and protection meet: NEC 430.28 and 430.53(D), CEC Rules
// 28-106(3) and 28-110(2). It is never below what the load asks for. Missing
// figures are an [*tables.InputError].
func (t Tap) Ampacity(e tables.Edition) (tables.Figure, error) {
	if err := e.Check(); err != nil {
		return tables.Figure{}, err
	}
	for _, in := range []struct {
		field string
		f     tables.Figure
	}{{"tap.load", t.Load}, {"tap.source", t.Source}, {"tap.device", t.Device}} {
		if in.f.IsZero() {
			return tables.Figure{}, &tables.InputError{Field: in.field, Want: "a figure in amperes"}
		}
	}
	rule, share := t.rule(e)
	if share.IsZero() {
		return t.Load.As(tapName, e, rule), nil
	}
	return tables.LargestOf(tapName, e, rule, t.Load, share), nil
}

const tapName = "least ampacity of the tap"

// rule returns the rule that holds and the share it asks for beside the load.
func (t Tap) rule(e tables.Edition) (*tables.Rule, tables.Figure) {
	of := func(rule *tables.Rule, name string, f tables.Figure, by int) (*tables.Rule, tables.Figure) {
		return rule, tables.QuotientOf(name, e, rule, f, tables.StatedFigure("parts", e, rule, tables.Plain, int64(by), 0))
	}
	within10 := t.Protected && t.within(e, 10, 30)
	within25 := t.Protected && t.within(e, 25, 75)
	_, oneTenth := of(&necTap10, "one-tenth of the device rating", t.Device, tenth)
	_, oneThird := of(&necTap25, "one-third of the feeder", t.Source, third)
	full := t.Source.Renamed("ampacity of the conductors tapped")
	switch cec := e.Code() == tables.CEC; {
	case cec && t.Group && t.within(e, 25, 75):
		return of(&cecGroup75, "one-third of the branch circuit", t.Source, third)
	case cec && t.Group:
		return &cecGroup75, full
	case cec && within10:
		return &cecTap3, tables.Figure{}
	case cec && within25:
		return of(&cecTap75, "one-third of the feeder", t.Source, third)
	case cec:
		return &cecTapFull, full
	case t.Group && t.Marked && within10:
		return of(&necGroup10, "one-tenth of the device rating", t.Device, tenth)
	case t.Group && within25:
		return of(&necGroup25, "one-third of the branch circuit", t.Source, third)
	case t.Group:
		return &necGroupFull, full
	case within10 && oneTenth.Cmp(oneThird) <= 0:
		return &necTap10, oneTenth
	case within25:
		return &necTap25, oneThird
	case t.HighBay && t.Protected && t.Length.Within(100, 300):
		return of(&necTapHigh, "one-third of the feeder", t.Source, third)
	}
	return &necTapFull, full
}

// within reports a tap of at most so many feet or tenths of a metre: the NEC
// prints both, the CEC metres alone.
func (t Tap) within(e tables.Edition, feet, tenths int64) bool {
	if e.Code() == tables.CEC {
		limit := decimal.New(tenths, -1)
		return !t.Length.IsZero() && t.Length.Metres().LessThanOrEqual(limit)
	}
	return t.Length.Within(feet, tenths)
}
