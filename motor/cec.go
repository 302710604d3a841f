package motor

import "example.org/motorcircuit/tables"

// Rules of CSA C22.1, Section 28, for motor currents and least ampacities.
var (
	cecRating      = tables.Rule{Ref: "Rule 28-106(1)", Mark: tables.MarkB, Note: "full-load current rating of the motor"}
	cecGuide       = tables.Rule{Ref: "Tables 44, 45 and D2", Mark: tables.MarkB, Note: "guides for motors whose nameplate is not at hand"}
	cecSyncNote    = tables.Rule{Ref: "Table 44", Mark: tables.MarkB, Note: "note on power factor"}
	cecOverload    = tables.Rule{Ref: "Rule 28-306(1)", Note: "full-load current rating of the motor"}
	cecContinuous  = tables.Rule{Ref: "Rule 28-106(1)"}
	cecDuty        = tables.Rule{Ref: "Rule 28-106(2)"}
	cecSecondary   = tables.Rule{Ref: "Rule 28-112", Mark: tables.MarkB}
	cecSecondaryR  = tables.Rule{Ref: "Rule 28-112", Mark: tables.MarkB, Note: "controller to resistors"}
	cecWinding     = tables.Rule{Ref: "Rule 28-804", Mark: tables.MarkB}
	cecRotor       = tables.Rule{Ref: "Rule 28-010"}
	cecCompressor  = tables.Rule{Ref: "Rule 28-706", Mark: tables.MarkB}
	cecCompressorO = tables.Rule{Ref: "Rule 28-710", Mark: tables.MarkB}
	cecCompressorR = tables.Rule{Ref: "Rule 28-704", Mark: tables.MarkB}
	cecWyeDelta    = tables.Rule{Ref: "Rule 28-106", Mark: tables.MarkC, Note: "six leads of a star-delta start: common practice"}
	cecPartWinding = tables.Rule{Ref: "Rule 28-804", Mark: tables.MarkB, Note: "each half-winding carries half"}
	cecDrive       = tables.Rule{Ref: "Rule 28-106", Mark: tables.MarkC, Note: "drive input: common practice, no rule of its own"}
	cecTorque      = tables.Rule{Ref: "Table 44", Mark: tables.MarkB, Note: "note on motors of low speed, high torque or several speeds"}
)

func (d *Demand) cec(m Motor, e tables.Edition) error {
	if err := d.cecDesign(m, e); err != nil {
		return err
	}
	d.Overload = d.Design.As("overload current", e, &cecOverload)
	if rated := m.Nameplate.Amperes.Figure("rated-load current"); m.Kind == Hermetic {
		if rated.IsZero() {
			rated = d.Design
		}
		d.Overload = rated.As("overload current", e, &cecCompressorO)
	}
	switch n := m.Nameplate; {
	case !n.LockedRotor.IsZero():
		d.LockedRotor = n.marked()
	case m.Kind == Torque:
		rotor := d.Design.As("locked-rotor current", e, &cecRotor)
		d.LockedRotor = LockedRotor{FromNameplate, rotor, rotor}
	case m.Kind == Hermetic:
		d.LockedRotor = sixTimes(e, &cecCompressorR, d.Overload)
	case m.Kind != DirectCurrent:
		d.LockedRotor = sixTimes(e, &cecRotor, d.Design)
	}
	if m.Power.IsHP() {
		d.Horsepower = m.Power
	} else if p, err := e.PowerAtOrAbove(m.Table(), m.Voltage, d.Design); err == nil && m.Kind != Torque {
		d.Horsepower = p
		d.caution(e, &cecGuide, "the motor is not marked in horsepower: that of the first table row to carry its amperes is taken for the disconnecting means")
	}
	return d.cecAmpacities(m, e)
}

// cecDesign takes the motor's own rating for every purpose, and the tables,
// which are guides, where it is not given.
func (d *Demand) cecDesign(m Motor, e tables.Edition) error {
	n := m.Nameplate
	n.Amperes = n.amperes()
	switch {
	case !n.Amperes.IsZero() && m.Kind == Hermetic:
		rated := n.Amperes.Figure("rated-load current")
		d.Design = rated.As("design current", e, &cecCompressor)
		if branch := n.BranchSelection.Figure("branch-circuit selection current"); !branch.IsZero() {
			d.Design = tables.LargestOf("design current", e, &cecCompressor, rated, branch)
			d.caution(e, &cecCompressor, "Section 28 does not speak of a branch-circuit selection current: the larger of it and the rated-load current is taken")
		}
		return nil
	case !n.Amperes.IsZero() && m.Kind == Torque:
		d.Design = n.Amperes.Figure("nameplate locked-rotor current").As("design current", e, &cecRating)
		return nil
	case !n.Amperes.IsZero():
		d.Design = n.Amperes.Figure("nameplate full-load current").As("design current", e, &cecRating)
		return nil
	case m.Kind == Torque:
		return needAmperes("the locked-rotor current marked on a torque motor", &cecTorque, e)
	case n.Multispeed || m.Use == ValveActuator || n.HighTorque || m.lowSpeed():
		return needAmperes("the nameplate current of a motor of several speeds, of low speed or of high torque", &cecTorque, e)
	}
	table, err := e.FullLoadCurrent(m.Table(), m.Power, m.Voltage)
	if err != nil {
		return instead(err, "motor.nameplate.amperes, where given, sizes any motor")
	}
	if m.Kind == Synchronous {
		table = d.synchronous(m, e, table, &cecSyncNote)
	}
	d.Table = table
	rule := &cecRating
	if m.Kind == Hermetic {
		rule = &cecCompressorR
	}
	d.Design = table.As("design current", e, rule)
	d.Cautions = append(d.Cautions, tables.Caution{Cite: table.Citation(),
		Text: "no nameplate current is given: the table's is a guide and must give way to the motor's own rating"})
	return nil
}

func (d *Demand) cecAmpacities(m Motor, e tables.Edition) (err error) {
	rule := &cecContinuous
	if m.Kind == Hermetic {
		rule = &cecCompressor
	}
	if m.Duty.Kind == Continuous {
		d.Branch = percentOf(branchName, e, rule, d.Design, 125, 0)
	} else if d.Branch, err = m.dutyAmpacity(branchName, e, &cecDuty, d.Design); err != nil {
		return err
	}
	// Conductors that enter the motor's terminal box are treated apart: 28-104.
	// Compressors stand in a subsection of their own.
	if m.Kind != Hermetic {
		d.Supply = d.Branch.Renamed(supplyName)
	}
	switch m.Starting {
	case WyeDelta:
		d.Supply = d.share(m, e, &cecWyeDelta, 720, 58)
	case PartWinding:
		d.Supply = d.share(m, e, &cecPartWinding, 625, 50)
	case Drive:
		onLine := d.Branch.Renamed("by the motor on bypass")
		d.Branch = percentOf(branchName, e, &cecDrive, d.Input, 125, 0)
		if m.Bypass {
			d.Branch = tables.LargestOf(branchName, e, &cecDrive, d.Branch.Renamed("by drive input"), onLine)
		}
	}
	if marked := m.Nameplate.MinimumAmpacity.Figure("marked minimum circuit ampacity"); !marked.IsZero() {
		d.Branch = tables.LargestOf(branchName, e, &cecCompressor, d.Branch, marked)
	}
	if m.Kind == DirectCurrent {
		if err := d.resistor(m, e, &cecSecondaryR, d.Design); err != nil {
			return err
		}
	}
	if err := d.windings(m, e, &cecWinding, &cecDuty); err != nil {
		return err
	}
	return d.secondary(m, e, &cecSecondary, &cecSecondary, &cecSecondaryR)
}
