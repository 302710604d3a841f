package motorcircuit

import (
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

var (
	necTotalDrop = tables.Rule{Ref: "215.2, informational note"}
	feederLoad   = tables.Rule{Outside: true, Ref: "sum of the currents that run together"}
)

// physical enlarges the feeder for voltage drop where asked, and works out its
// bonding conductor, raceway and voltage drop.
func (r *FeederResult) physical(g *group) error {
	f := &r.Feeder
	e := f.Edition
	line := r.lineLoad(g)
	_, carrying := g.conductors()
	load := conductor.Load{Ampacity: r.Ampacity, Count: carrying}
	base, err := sizeByAmpacity(e, f.Wiring, r.Conductors, load)
	if err != nil {
		return err
	}
	if r.Conductors, err = upsized(e, f.Wiring, r.Conductors, load, line, f.MaxDrop); err != nil {
		return err
	}
	if base, err = bondingBase(e, f.Wiring, r.Conductors, load, base); err != nil {
		return err
	}
	if r.Bonding, err = conductor.SelectBonding(e, r.Conductors.Material, r.Rating, r.Conductors, base); err != nil {
		return err
	}
	if f.Wiring.Raceway != 0 {
		r.Raceway, err = conductor.SelectRaceway(e, f.Wiring.Raceway, false, pullsOf(&r.Conductors, r.Count, r.Bonding.Size)...)
		if err != nil {
			return err
		}
		r.Raceway.Cautions = append(r.Raceway.Cautions, bondingPath(e, f.Wiring.Raceway)...)
	}
	if err := r.fault(line); err != nil || f.Wiring.Length.IsZero() {
		return err
	}
	r.Drop.Limit = dropLimit(e)
	if r.Drop.Running, err = f.Wiring.RunningDrop(e, r.Conductors, line); err != nil {
		return err
	}
	if r.Drop.LongestRun, err = f.Wiring.LongestRun(e, r.Conductors, line, r.Drop.Limit); err != nil {
		return err
	}
	r.totalDrops()
	return nil
}

// totalDrops adds the feeder's running drop to that of each circuit that has one.
func (r *FeederResult) totalDrops() {
	e := r.Feeder.Edition
	rule := &necTotalDrop
	if e.Code() == tables.CEC {
		rule = &cecDropLimit
	}
	for i := range r.Circuits {
		var total tables.Figure
		if branch := r.Circuits[i].Drop.Running; !branch.IsZero() {
			total = tables.SumOf("voltage drop of feeder and branch circuit", e, rule, r.Drop.Running.Renamed("feeder"), branch.Renamed("branch circuit"))
		}
		r.TotalDrop = append(r.TotalDrop, total)
	}
}

// lineLoad is the greatest set that runs together as a load of the feeder.
func (r *FeederResult) lineLoad(g *group) conductor.LineLoad {
	e := r.Feeder.Edition
	var most tables.Figure
	for _, running := range g.running {
		var terms []tables.Figure
		for _, m := range running {
			terms = append(terms, m.current.Renamed(m.tag))
		}
		for _, load := range []tables.Figure{g.continuous, g.other} {
			if !load.IsZero() {
				terms = append(terms, load)
			}
		}
		if len(terms) == 0 {
			continue
		}
		if sum := tables.SumOf("current of the feeder", e, &feederLoad, terms...); most.IsZero() || sum.Cmp(most) > 0 {
			most = sum
		}
	}
	system := g.members[0].result.Circuit.Motor
	for i := range g.members {
		if m := g.members[i].result.Circuit.Motor; m.PhaseCount() > system.PhaseCount() {
			system = m
		}
	}
	l := conductor.LineLoad{Volts: system.Voltage, Phases: system.PhaseCount(), Current: most}
	if l.Phases > 0 {
		l.PowerFactor = tables.StatedFigure("typical running power factor", e, &typicalFactor, tables.Plain, 85, 2)
	}
	return l
}

// dropCautions tells drops above what the code has.
func (r *FeederResult) dropCautions() (list []tables.Caution) {
	if d := &r.Drop; !d.Running.IsZero() {
		list = append(list, tables.Caution{Text: "voltage drop of the feeder is reckoned with a typical power factor of 0.85"})
		if d.Running.Cmp(d.Limit) > 0 {
			list = append(list, tables.Caution{Text: "the voltage drop of the feeder of " + d.Running.String() + " is above " + d.Limit.String() + " for one circuit", Cite: d.Limit.Citation()})
		}
	}
	five := tables.StatedFigure("voltage drop in all", r.Feeder.Edition, &necTotalDrop, tables.Percent, 5, 0)
	for i, total := range r.TotalDrop {
		if !total.IsZero() && total.Cmp(five) > 0 {
			list = append(list, tables.Caution{Text: "feeder and branch circuit of " + oneLine(r.Circuits[i].Circuit.Tag) + " together drop " + total.String() + ", above 5 %", Cite: total.Citation()})
		}
	}
	return list
}

// fault works out the fault current at the end of the feeder, and with it the
// fault duty of the circuits that give none of their own.
func (r *FeederResult) fault(line conductor.LineLoad) (err error) {
	f := &r.Feeder
	if f.Fault.IsZero() {
		return nil
	}
	source := f.Fault.Figure("fault current at the source")
	r.FaultDuty.Source = source
	if r.FaultDuty.AtMotor, err = f.Wiring.FaultAtEnd(f.Edition, r.Conductors, line.Volts, line.Phases, source, f.FaultXR.Figure("X/R of the source")); err != nil {
		return err
	}
	r.FaultDuty.Withstand = conductor.Withstand(f.Edition, r.Conductors, kiloamperes(f.Edition, source))
	if r.FaultDuty.AtMotor.IsZero() {
		return nil
	}
	end := r.FaultDuty.AtMotor.Renamed("fault current at the end of the feeder")
	r.FaultDuty.AtMotor = end
	amps := tables.ComputedFigure(end.Name(), f.Edition, &unitsRule, tables.Ampere, end.Float()*1000, 0, true, "in A", end)
	for i := range r.Circuits {
		c := r.Circuits[i].Circuit
		if !c.Fault.IsZero() || c.Wiring.Length.IsZero() {
			continue
		}
		// As of a reactive source: the most that the feeder lets through.
		if err := r.Circuits[i].fault(c, amps); err != nil {
			return &CircuitError{i, c.Tag, err}
		}
	}
	return nil
}
