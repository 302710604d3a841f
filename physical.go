package motorcircuit

import (
	"errors"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A FaultDuty is what a fault at the motor draws, and what stands it.
type FaultDuty struct {
	Source       tables.Figure `json:"source,omitzero"`       // at the beginning of the run: the least interrupting rating of the device
	AtMotor      tables.Figure `json:"at_motor,omitzero"`     // at the motor's terminals, of all phases
	LineToLine   tables.Figure `json:"line_to_line,omitzero"` // at the motor's terminals, of two of three phases
	Contribution tables.Figure `json:"contribution,omitzero"` // what the running motor feeds into a fault at the source
	Withstand    tables.Figure `json:"withstand,omitzero"`    // longest clearing time that the conductors stand at the source's current
}

var (
	necDropNote   = tables.Rule{Ref: "210.19, informational note"}
	cecDropLimit  = tables.Rule{Ref: "Rule 8-102"}
	necBondMotor  = tables.Rule{Ref: "250.122(D)(2)"}
	contribution  = tables.Rule{Outside: true, Ref: "IEEE 141-1993 chapter 4", Mark: tables.MarkC, Note: "usual multiple of a group of motors"}
	pumpDrop      = tables.Rule{Ref: "695.7", Mark: tables.MarkB}
	necRaceBond   = tables.Rule{Ref: "250.118", Mark: tables.MarkC}
	cecRaceBond   = tables.Rule{Ref: "Rule 10-616(6)", Mark: tables.MarkB}
	wyeStart      = tables.Rule{Ref: "wye start: a third of the line current", Outside: true}
	unitsRule     = tables.Rule{Ref: "conversion of units", Outside: true}
	typicalFactor = tables.Rule{Outside: true, Ref: "typical motor data", Mark: tables.MarkC}
)

var (
	leastDrop  = motor.Factor("0.1")
	mostDrop   = motor.Factor("50")
	leastFault = motor.Amps("1")
	mostFault  = motor.Amps("300000")
	mostXR     = motor.Factor("100")
)

// pumpRunning is what the run to a fire pump may lose while the motor runs.
func pumpRunning(e tables.Edition) tables.Figure {
	return tables.StatedFigure("voltage drop running of a fire pump", e, &pumpDrop, tables.Percent, 5, 0).WithNote("at 115 % of full-load current; 15 % while starting")
}

// pumpStart is what the controller of a fire pump may lose while the motor starts.
func pumpStart(e tables.Edition) tables.Figure {
	return tables.StatedFigure("voltage drop starting of a fire pump", e, &pumpDrop, tables.Percent, 15, 0)
}

// checkPhysical reports what of a run's voltage drop and fault duty cannot stand.
func checkPhysical(w conductor.Wiring, drop tables.Ratio, fault tables.Current, xr tables.Ratio) error {
	var faults []error
	add := func(field, value, want string) {
		faults = append(faults, &tables.InputError{Field: field, Value: value, Want: want})
	}
	switch {
	case drop.IsZero():
	case drop.Cmp(leastDrop) < 0 || drop.Cmp(mostDrop) > 0:
		add("max_drop_percent", drop.String(), "0.1 to 50 percent")
	case w.Length.IsZero():
		add("max_drop_percent", drop.String(), "none without a length of the run")
	}
	if !fault.IsZero() && (fault.Cmp(leastFault) < 0 || fault.Cmp(mostFault) > 0) {
		add("fault_amperes", fault.String(), "1 A to 300000 A")
	}
	switch {
	case xr.IsZero():
	case fault.IsZero():
		add("fault_xr", xr.String(), "none without a fault current")
	case xr.Decimal().Sign() <= 0 || xr.Cmp(mostXR) > 0:
		add("fault_xr", xr.String(), "above 0, at most 100")
	}
	return errors.Join(faults...)
}

// upsize raises the branch-circuit conductors until the running drop is within
// the caller's limit. It keeps the size that ampacity alone asks for.
func (r *Result) upsize(c Circuit) (err error) {
	load := c.branchLoad(r.Demand.Branch)
	if r.BySize, err = sizeByAmpacity(c.Edition, c.Wiring, r.Branch, load); err != nil {
		return err
	}
	r.Branch, err = upsized(c.Edition, c.Wiring, r.Branch, load, r.lineLoad(), c.MaxDrop)
	return err
}

// sizeByAmpacity returns the size that ampacity alone asks for, where the caller
// asks for a least size.
func sizeByAmpacity(e tables.Edition, w conductor.Wiring, s conductor.Selection, load conductor.Load) (tables.Size, error) {
	if w.Least == 0 || s.Size != w.Least {
		return s.Size, nil
	}
	w.Least = 0
	s, err := w.Select(e, load)
	return s.Size, err
}

// bondingBase returns the size from which an increase of the circuit conductors
// enlarges the bonding conductor: that by ampacity, and in NEC 2017 that before
// correction and adjustment.
func bondingBase(e tables.Edition, w conductor.Wiring, s conductor.Selection, load conductor.Load, bySize tables.Size) (tables.Size, error) {
	if e != tables.NEC2017 || s.Ambient.IsOne() && s.Together.IsOne() {
		return bySize, nil
	}
	w.Ambient, w.Conductors, w.Rooftop, w.Least, w.Sets, w.Insulation = tables.Temperature{}, 0, false, 0, s.Sets, s.Insulation
	load.Count = 1
	s, err := chosen(w.Select(e, load)) // none: nothing is larger than it need be
	return s.Size, err
}

// branchLoad is what the branch-circuit conductors are asked to carry.
func (c Circuit) branchLoad(ampacity tables.Figure) conductor.Load {
	return conductor.Load{Ampacity: ampacity, Count: c.Motor.LineConductors(), Motor75: c.Motor.IsDesignBCD()}
}

// physical works out the bonding conductor, the raceway, the voltage drop and
// the fault duty of the chosen conductors.
func (r *Result) physical(c Circuit) error {
	if err := r.bonding(c, r.ShortCircuit.Rating, r.Branch.Material); err != nil {
		return err
	}
	if err := r.fill(c); err != nil {
		return err
	}
	if err := r.drops(c); err != nil {
		return err
	}
	return r.fault(c, c.Fault.Figure("fault current at the source"))
}

// bonding sizes the bonding conductor by the rating of the branch device; an
// instantaneous trip, which has none, counts as the time-delay fuse that would be
// allowed (NEC 250.122(D)(2)).
func (r *Result) bonding(c Circuit, rating tables.Figure, material tables.Material) error {
	e := c.Edition
	if rating.IsZero() {
		x, err := protection.SizeShortCircuit(e, protection.TimeDelayFuse, c.Motor, r.Demand)
		if err != nil {
			return err
		}
		rating = x.Rating
		if e.Code() == tables.NEC {
			defer func() {
				r.Bonding.Why += ", a time-delay fuse of " + rating.String() + " in place of the instantaneous trip (" + necBondMotor.In(e).String() + ")"
			}()
		}
	}
	base, err := bondingBase(e, c.Wiring, r.Branch, c.branchLoad(r.Demand.Branch), r.BySize)
	if err != nil {
		return err
	}
	r.Bonding, err = conductor.SelectBonding(e, material, rating, r.Branch, base)
	return err
}

// fill chooses the raceway of one set of conductors with its bonding conductor,
// and that of a flexible connection at the motor.
func (r *Result) fill(c Circuit) (err error) {
	pulls := pullsOf(&r.Branch, c.Motor.LineConductors(), r.Bonding.Size)
	for _, x := range []struct {
		kind tables.Raceway
		into *conductor.Filled
	}{{c.Wiring.Raceway, &r.Raceway}, {c.Wiring.Flexible, &r.Flexible}} {
		if x.kind == 0 {
			continue
		}
		if *x.into, err = conductor.SelectRaceway(c.Edition, x.kind, false, pulls...); err != nil {
			return err
		}
		x.into.Cautions = append(x.into.Cautions, bondingPath(c.Edition, x.kind)...)
	}
	return nil
}

// pullsOf is what is pulled into the raceway of one set of conductors.
func pullsOf(s *conductor.Selection, lines int, bonding tables.Size) []conductor.Pull {
	return []conductor.Pull{{Insulation: s.Insulation, Size: s.Size, Count: lines}, {Insulation: s.Insulation, Size: bonding, Count: 1}}
}

// bondingPath tells whether a raceway may bond in place of the conductor.
func bondingPath(e tables.Edition, r tables.Raceway) []tables.Caution {
	rule := &necRaceBond
	if e.Code() == tables.CEC {
		rule = &cecRaceBond
	}
	switch {
	case r.IsFlexible():
		return []tables.Caution{{Text: "a flexible raceway does not bond unless it is listed for it: the bonding conductor stays", Cite: rule.In(e)}}
	case r.IsMetal():
		return []tables.Caution{{Text: "where the metal raceway is permitted as the bonding path, the bonding conductor inside may be left out", Cite: rule.In(e)}}
	}
	return nil
}

// fault works out the fault duty from the fault current at the beginning of the
// run, in amperes.
func (r *Result) fault(c Circuit, source tables.Figure) (err error) {
	if source.IsZero() {
		return nil
	}
	f := &r.FaultDuty
	f.Source = source
	if c.Motor.PhaseCount() != 0 && c.Motor.Starting != motor.Drive {
		four := tables.StatedFigure("times full-load current", c.Edition, &contribution, tables.Plain, 4, 0)
		f.Contribution = tables.ProductOf("what the running motor feeds into a fault", c.Edition, &contribution, r.Demand.Design, four)
	}
	if f.AtMotor, err = c.Wiring.FaultAtEnd(c.Edition, r.Branch, c.Motor.Voltage, c.Motor.PhaseCount(), source, c.FaultXR.Figure("X/R of the source")); err != nil {
		return err
	}
	if c.Motor.PhaseCount() == 3 {
		f.LineToLine = conductor.LineToLine(c.Edition, f.AtMotor)
	}
	f.Withstand = conductor.Withstand(c.Edition, r.Branch, kiloamperes(c.Edition, source))
	return nil
}

// kiloamperes returns a current in kiloamperes.
func kiloamperes(e tables.Edition, amps tables.Figure) tables.Figure {
	return tables.ComputedFigure(amps.Name(), e, &unitsRule, tables.Kiloampere, amps.Float()/1000, 6, true, "in kA", amps)
}

// dropCautions tells a drop above what the code has for one circuit.
func (r *Result) dropCautions() (list []tables.Caution) {
	d := &r.Drop
	if !d.Running.IsZero() && d.Running.Cmp(d.Limit) > 0 {
		list = append(list, tables.Caution{Text: "the voltage drop running of " + d.Running.String() + " is above " + d.Limit.String() + " for one circuit", Cite: d.Limit.Citation()})
	}
	if r.Circuit.Motor.Use == motor.FirePump && d.Starting.Cmp(pumpStart(r.Circuit.Edition)) > 0 {
		list = append(list, tables.Caution{Text: "the voltage drop starting of " + d.Starting.String() + " is above the 15 % that a fire pump's controller may lose", Cite: pumpDrop.In(r.Circuit.Edition)})
	}
	if !d.Running.IsZero() && r.Circuit.Motor.Nameplate.PowerFactor.IsZero() && r.Circuit.Motor.PhaseCount() > 0 {
		list = append(list, tables.Caution{Text: "voltage drop is reckoned with a typical power factor, of three-phase motors: " + r.lineLoad().PowerFactor.String()})
	}
	if !d.Running.IsZero() && d.Starting.IsZero() && r.Circuit.Motor.PhaseCount() > 0 {
		list = append(list, tables.Caution{Text: "no voltage drop starting is worked out for this way of starting or without a locked-rotor current"})
	}
	if f := &r.FaultDuty; !f.Source.IsZero() && f.AtMotor.IsZero() {
		list = append(list, tables.Caution{Text: "no length of the run is given, so that the fault current at the motor is left out"})
	}
	if !r.FaultDuty.Source.IsZero() {
		list = append(list, tables.Caution{Text: "fault duty is for bolted faults: compare the withstand time with the device's own clearing curve, and its interrupting rating with the fault current at the source and what motors add"})
	}
	if r.Branch.Size.Cmp(r.BySize) > 0 && r.BySize != 0 {
		list = append(list, tables.Caution{Text: "the branch-circuit conductors are larger than the " + r.BySize.String() + " that ampacity asks for: the bonding conductor grows with them"})
	}
	return list
}
