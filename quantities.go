package motorcircuit

import (
	"github.com/shopspring/decimal"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// A Quantity is one line of a bill of quantities: so much of one thing. Lines
// of the same kind, item and unit may be added up.
type Quantity struct {
	Kind   string          `json:"kind"` // "conductor", "bonding_conductor", "raceway", "device", "overload", "disconnect" or "controller"
	Item   string          `json:"item"` // what it is, in the trade's words
	Amount decimal.Decimal `json:"amount"`
	Unit   string          `json:"unit"` // "m" or "each"
}

// MakeUp is the allowance for ends in [Result.Quantities], in metres for each
// conductor: common practice, no source.
const MakeUp = "1.5"

var (
	makeUp = decimal.RequireFromString(MakeUp)
	each   = decimal.New(1, 0)
)

// Quantities lists what the branch circuit takes: conductors of the run with
// [MakeUp] each, raceway by length, and the devices. Without a length there are
// no lines by length; the run from controller to motor is not in it where the
// code treats it apart.
func (r Result) Quantities() []Quantity {
	c := &r.Circuit
	list := runQuantities(c.Edition, c.Wiring.Length, c.Motor.LineConductors(), &r.Branch, &r.Bonding, &r.Raceway)
	add := func(kind, item string) {
		if item != "" {
			list = append(list, Quantity{kind, item, each, "each"})
		}
	}
	if x := &r.ShortCircuit; x.Rating.IsZero() {
		add("device", x.Device.Name()+", set to "+x.Limit.String())
	} else {
		add("device", x.Rating.String()+" "+x.Device.Name())
	}
	if o := &r.Overload; !o.Limit.IsZero() {
		add("overload", "overload relay of "+unitsText(o.Units.Text()))
	}
	add("disconnect", rating(r.Disconnect.Amperes, r.Disconnect.Horsepower, tables.Citation{}))
	add("controller", rating(r.Controller.Amperes, r.Controller.Horsepower, tables.Citation{}))
	return list
}

func unitsText(n string) string {
	if n == "1" {
		return "1 unit"
	}
	return n + " units"
}

// Quantities lists what the feeder itself takes; its circuits have their own.
func (r FeederResult) Quantities() []Quantity {
	lines := 2
	for i := range r.Circuits {
		lines = max(lines, r.Circuits[i].Circuit.Motor.LineConductors())
	}
	list := runQuantities(r.Feeder.Edition, r.Feeder.Wiring.Length, lines, &r.Conductors, &r.Bonding, &r.Raceway)
	return append(list, Quantity{"device", r.Rating.String() + " " + r.Device.Name(), each, "each"})
}

// runQuantities lists the conductors and the raceway of a run.
func runQuantities(e tables.Edition, length tables.Length, lines int, s *conductor.Selection, b *conductor.Bonding, raceway *conductor.Filled) []Quantity {
	if length.IsZero() {
		return nil
	}
	run, sets := length.Metres(), decimal.New(int64(s.Sets), 0)
	wire := run.Add(makeUp).Mul(sets)
	list := []Quantity{
		{"conductor", s.Size.String() + " " + s.Material.String() + " " + s.Insulation, wire.Mul(decimal.New(int64(lines), 0)), "m"},
		{"bonding_conductor", b.Size.String() + " " + b.Material.String(), wire, "m"},
	}
	if !raceway.IsZero() {
		list = append(list, Quantity{"raceway", raceway.Name(e), run.Mul(sets), "m"})
	}
	return list
}
