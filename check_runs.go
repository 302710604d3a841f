package motorcircuit

import (
	"errors"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// conductors judges the conductors of every run.
func (k *checker) conductors() (err error) {
	c, d := &k.r.Circuit, &k.r.Demand
	load := c.branchLoad(d.Branch)
	if k.r.Branch, err = k.run("branch", c.Wiring, k.in.Branch, load, nil); err != nil {
		return err
	}
	if k.r.Branch.IsZero() {
		if k.r.Branch, err = chosen(c.Wiring.Select(k.edition, load)); err != nil {
			return err
		}
	}
	if k.r.BySize, err = bySize(k.edition, c.Wiring, &k.r.Branch, load); err != nil {
		return err
	}
	supply := load
	supply.Ampacity, supply.Count = d.Supply, c.Motor.SupplyConductors()
	var end *conductor.MotorEnd
	if c.Edition.Code() == tables.CEC {
		x := c.motorEnd(d)
		x.Insulated, end = k.in.MotorSupply.Insulated, &x
	}
	for _, x := range []struct {
		part  string
		given Conductors
		load  conductor.Load
		end   *conductor.MotorEnd
		into  *conductor.Selection
	}{
		{"motor_supply", k.in.MotorSupply, supply, end, &k.r.MotorSupply},
		{"secondary", k.in.Secondary, conductor.Load{Ampacity: d.Secondary, Count: 3}, nil, &k.r.Secondary},
		{"resistor", k.in.Resistor, conductor.Load{Ampacity: d.Resistor, Count: 3}, nil, &k.r.Resistor},
	} {
		w := c.Wiring
		w.Conductors = atLeastOwn(w.Conductors, x.load.Count)
		if *x.into, err = k.run(x.part, w, x.given, x.load, x.end); err != nil {
			return err
		}
	}
	for i, w := range d.Windings {
		load.Ampacity = w.Ampacity
		s, err := k.run(windingPart(i)+".conductors", c.Wiring, k.winding(i).Conductors, load, nil)
		if err != nil {
			return err
		}
		k.r.Windings = append(k.r.Windings, s)
	}
	return nil
}

func windingPart(i int) string { return "windings[" + itoa(i) + "]" }

// winding returns what stands of the circuit to a winding, nothing if none is given.
func (k *checker) winding(i int) InstalledWinding {
	if i < len(k.in.Windings) {
		return k.in.Windings[i]
	}
	return InstalledWinding{}
}

// run judges the conductors of one run, and returns what they come to; nothing of
// conductors that are not given or whose insulation may not be used there.
func (k *judge) run(part string, w conductor.Wiring, given Conductors, load conductor.Load, end *conductor.MotorEnd) (conductor.Selection, error) {
	unfit := k.unfit
	if given.Insulation != "" {
		w.Insulation = given.Insulation
		unfit = k.unfitIn(w)
	}
	why := ""
	switch {
	case load.Ampacity.IsZero() && given.Size == 0:
		return conductor.Selection{}, nil
	case load.Ampacity.IsZero():
		why = "the code does not treat such a run apart here"
	case given.Size == 0:
		why = "not given"
	case unfit != nil:
		k.tellUnfit(part, unfit)
		why = unfitHere
	}
	if why != "" {
		k.skip(part, why)
		return conductor.Selection{}, nil
	}
	var s conductor.Selection
	var err error
	if end != nil {
		s, err = w.RateMotorSupply(k.edition, load, *end, given.Size, given.Sets)
	} else {
		s, err = w.Rate(k.edition, load, given.Size, given.Sets)
	}
	if cold := coldIn(end, err); cold != nil {
		k.tellUnfit(part, cold)
		k.skip(part, unfitHere)
		return conductor.Selection{}, nil
	}
	if err != nil {
		return conductor.Selection{}, within("installed."+part, err)
	}
	if err := k.sized(part, w, &s); err != nil {
		return conductor.Selection{}, err
	}
	if end != nil {
		rating := end.Insulated
		if ins, err := k.edition.Insulation(s.Insulation); rating.IsZero() && err == nil {
			rating = tables.TemperatureOf(tables.Whole("rating", tables.Celsius, ins.Celsius[s.Location]))
		}
		k.atLeast(claim{code: ConductorInsulation, part: part + ".insulation", found: rating.Figure("rating of the insulation")}, s.LeastRating, Violation)
	}
	return s, nil
}

// strip takes an insulation away from a wiring that it may not be used in. It is told
// of the runs that have it; where none is given, of the part named.
func (k *judge) strip(part string, given Conductors, w *conductor.Wiring) {
	if k.unfit = k.unfitIn(*w); k.unfit == nil {
		return
	}
	w.Insulation = ""
	if given.Size == 0 {
		k.tellUnfit(part, k.unfit)
	}
}

// unfitIn returns why an insulation may not be used where a wiring is, nil if it
// may. One that the edition does not know is left to the errors.
func (k *judge) unfitIn(w conductor.Wiring) *tables.InputError {
	if _, err := k.edition.Insulation(w.Insulation); err != nil {
		return nil
	}
	for _, fault := range tables.Faults(w.Validate(k.edition)) {
		var input *tables.InputError
		if errors.As(fault, &input) && input.Field == "wiring.insulation" && !input.Cite.IsZero() {
			return input
		}
		if cold := tooCold(w.Insulation, fault); cold != nil {
			return cold
		}
	}
	return nil
}

// tooCold words an error of an ambient that an insulation is not allowed in; nil is
// another error.
func tooCold(insulation string, err error) *tables.InputError {
	var missing *tables.NotTabulatedError
	if !errors.As(err, &missing) || missing.Field != "wiring.ambient" {
		return nil
	}
	return &tables.InputError{Field: "wiring.insulation", Value: insulation, Want: "a type that may be used at " + missing.Col, Cite: missing.Table}
}

// coldIn is [tooCold] of motor supply conductors whose insulation is given by its
// rating.
func coldIn(end *conductor.MotorEnd, err error) *tables.InputError {
	if end == nil || end.Insulated.IsZero() {
		return nil
	}
	return tooCold("rated "+end.Insulated.String(), err)
}

// unfitHere is why conductors of such an insulation were not judged.
const unfitHere = "its insulation may not be used where it is"

func (k *judge) tellUnfit(part string, why *tables.InputError) {
	k.say(ConductorInsulation, part+".insulation", Violation, "the insulation is "+why.Value+", and the code asks for "+why.Want, why.Cite)
}

// sized judges the size and the ampacity of conductors.
func (k *judge) sized(part string, w conductor.Wiring, s *conductor.Selection) error {
	least, cite, err := w.LeastSize(k.edition, s.Sets)
	if err != nil {
		return err
	}
	code, of := ConductorLeast, "smallest size allowed"
	if s.Sets > 1 {
		code, of = ConductorParallel, "smallest size allowed in parallel"
	}
	k.atLeast(claim{code: code, part: part, found: s.Size.Figure("conductor of " + s.Size.String()), cites: []tables.Citation{cite}}, least.Figure(of+", "+least.String()), Violation)
	if s.Ampacity.IsZero() {
		k.skip(part, "the ampacity table has no entry for "+s.Size.String())
		return nil
	}
	k.atLeast(claim{code: ConductorAmpacity, part: part, found: s.Ampacity.Renamed("ampacity of " + setsOf(s))}, s.Required, Violation)
	return nil
}

// setsOf names the conductors of a phase.
func setsOf(s *conductor.Selection) string {
	text := s.Size.String() + " " + s.Material.String() + " " + s.Insulation
	if s.Sets > 1 {
		return itoa(s.Sets) + " × " + text
	}
	return text
}

// bySize returns the size that ampacity asks for in as many sets as there are; 0 if
// no size carries the load in so many, so that nothing is larger than it need be.
func bySize(e tables.Edition, w conductor.Wiring, s *conductor.Selection, load conductor.Load) (tables.Size, error) {
	if s.IsZero() {
		return 0, nil
	}
	w.Sets, w.Insulation = s.Sets, s.Insulation
	least, err := chosen(w.Select(e, load))
	return least.Size, err
}

// chosen passes a selection on, none where no size does.
func chosen(s conductor.Selection, err error) (conductor.Selection, error) {
	var none *tables.NoSizeError
	if errors.As(err, &none) {
		return conductor.Selection{}, nil
	}
	return s, err
}

// within puts the path of what is installed before the field of an error.
func within(path string, err error) error {
	var input *tables.InputError
	var missing *tables.NotTabulatedError
	switch {
	case errors.As(err, &input):
		e := *input
		e.Field = path + "." + e.Field
		return &e
	case errors.As(err, &missing):
		e := *missing
		e.Field = path + "." + e.Field
		return &e
	}
	return err
}
