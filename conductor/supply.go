package conductor

import (
	"strings"

	"example.org/motorcircuit/tables"
)

// A MotorEnd describes the terminal box that motor supply conductors enter, for
// CEC Rule 28-104.
type MotorEnd struct {
	InsulationClass string       // A, B, F or H; "" is taken as B
	NonVentilated   bool         // totally enclosed, non-ventilated motor
	Power           tables.Power // tells a motor of 100 hp and more, from which the conductors end farther off

	// Insulated is what the insulation of the conductors is rated, for
	// [Wiring.RateMotorSupply]; not given is the rating of its designation.
	Insulated tables.Temperature
}

var cecSupply = tables.Rule{Ref: "Rule 28-104", Mark: tables.MarkB}

// SelectMotorSupply chooses the conductors that enter a motor's terminal box
// under CEC Rule 28-104: ampacity from the 75 °C column whatever the
// insulation, or from the 90 °C column for 90 °C conductors of a Class A motor;
// insulation rated at least as Table 37 says, with what the ambient exceeds
// 30 °C by added. The NEC does not treat them apart: use [Wiring.Select].
func (w Wiring) SelectMotorSupply(e tables.Edition, l Load, end MotorEnd) (Selection, error) {
	c, err := w.supplyChoice(e, l, end)
	if err != nil {
		return Selection{}, err
	}
	return c.choose()
}

// supplyChoice begins the search for motor supply conductors.
func (w Wiring) supplyChoice(e tables.Edition, l Load, end MotorEnd) (*choice, error) {
	if err := w.check(e, l); err != nil {
		return nil, err
	}
	ins, err := w.insulation(e)
	if err != nil {
		return nil, err
	}
	class := strings.ToUpper(end.InsulationClass)
	if class == "" {
		class = "B"
	}
	least, err := e.SupplyInsulation(class, end.NonVentilated)
	if err != nil {
		return nil, err
	}
	r := rulesOf(e)
	s := r.start(w, l, ins)
	if over := excess(e, w.ambient(ins)); !over.IsZero() {
		least = tables.SumOf("motor supply conductor insulation", e, &cecSupply, least, over)
	}
	s.LeastRating = least
	if end.InsulationClass == "" {
		s.Cautions = append(s.Cautions, tables.Caution{Text: "no insulation class of the motor is given: class B taken for the insulation of the motor supply conductors", Cite: least.Citation()})
	}
	leastCelsius := int(least.Value().Ceil().IntPart())
	if leastCelsius > 75 {
		s.Cautions = append(s.Cautions, supplyRun(e, end))
	}
	if !end.Insulated.IsZero() {
		ins.celsius = int(end.Insulated.Decimal().IntPart())
	} else if leastCelsius > ins.celsius {
		s.Cautions = append(s.Cautions, tables.Caution{Cite: cecSupply.In(e),
			Text: ins.Type + " is not rated for the motor's terminal box: the motor supply conductors need insulation of " + least.String() + " or more, spliced to the branch conductors"})
		ins.celsius, ins.Type = leastCelsius, least.String()+" insulation"
		s.Insulation = ins.Type
	}
	column := int64(75)
	note := "whatever the insulation"
	if class == "A" && ins.celsius >= 90 {
		column, note = 90, "90 °C conductors of a Class A motor"
	}
	s.Termination = tables.StatedFigure("ampacity column at the motor", e, &cecSupply, tables.Celsius, column, 0).WithNote(note)
	return r.choice(e, w, l, ins, s, columns{int(column), 0})
}

// supplyRun tells how long the hotter conductors must be and how far from the
// motor they must end.
func supplyRun(e tables.Edition, end MotorEnd) tables.Caution {
	text := "Table 37 asks for more than 75 °C: run the motor supply conductors at least 1.2 m and end them at least 600 mm from the motor"
	if end.Power.IsHP() && end.Power.Cmp(hundredHP) >= 0 {
		text = "Table 37 asks for more than 75 °C: run the motor supply conductors at least 1.2 m and end them at least 1.2 m from the motor of 100 hp or more"
	}
	return tables.Caution{Text: text, Cite: cecSupply.In(e)}
}

var hundredHP = tables.Must(tables.ParseHP("100"))

// excess returns what an ambient exceeds 30 °C by, absent if it does not.
func excess(e tables.Edition, ambient tables.Temperature) tables.Figure {
	if ambient.Cmp(baseAmbient) <= 0 {
		return tables.Figure{}
	}
	over := tables.Must(tables.ParseTemperature(ambient.Decimal().Sub(baseAmbient.Decimal()).String()))
	return over.Figure("ambient above 30 °C").As("ambient above 30 °C", e, &cecSupply)
}
