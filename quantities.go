package motorcircuit

import (
	"github.com/shopspring/decimal"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// A Quantity is one line of a bill of quantities: so much of one thing. Lines
// of the same kind, item and unit may be added up.
type Quantity struct {
	Kind   string          `json:"kind"`   // "conductor", "bonding_conductor", "raceway", "device", "overload", "disconnect" or "controller"
	Item   string          `json:"item"`   // what it is, in the trade's words
	Amount decimal.Decimal `json:"amount"` // in that unit
	Unit   string          `json:"unit"`   // "m", "each" or "set": fuses come in sets, one for each ungrounded conductor
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
// no lines by length. The runs that the code treats apart are not in it: from
// controller to motor, from slip rings, to resistors and to each winding.
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
		list = append(list, deviceQuantity(x.Rating, x.Device))
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
	list := runQuantities(r.Feeder.Edition, r.Feeder.Wiring.Length, r.Count, &r.Conductors, &r.Bonding, &r.Raceway)
	list = append(list, deviceQuantity(r.Rating, r.Device))
	if item := rating(r.Disconnect.Amperes, r.Disconnect.Horsepower, tables.Citation{}); item != "" {
		list = append(list, Quantity{"disconnect", item, each, "each"})
	}
	return list
}

// Quantities lists what circuits in one raceway take: the conductors and devices
// of each, and the raceway and bonding conductor of all once, as long as the
// longest run. The quantities of the single results count those again.
func (s SharedResult) Quantities() []Quantity {
	if len(s.Circuits) == 0 {
		return nil
	}
	var list []Quantity
	longest := &s.Circuits[0]
	for i := range s.Circuits {
		r := &s.Circuits[i]
		if r.Circuit.Wiring.Length.Cmp(longest.Circuit.Wiring.Length) > 0 {
			longest = r
		}
		for _, q := range r.Quantities() {
			if q.Kind != "raceway" && q.Kind != "bonding_conductor" {
				list = append(list, q)
			}
		}
	}
	for _, q := range runQuantities(longest.Circuit.Edition, longest.Circuit.Wiring.Length, 0, &longest.Branch, &s.Bonding, &s.Raceway) {
		if q.Kind != "conductor" {
			list = append(list, q)
		}
	}
	return list
}

// deviceQuantity is one short-circuit device, or one set of fuses.
func deviceQuantity(rating tables.Figure, device tables.Device) Quantity {
	unit := "each"
	if device.IsFuse() {
		unit = "set"
	}
	return Quantity{"device", rating.String() + " " + device.Name(), each, unit}
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
