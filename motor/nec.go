package motor

import (
	"strings"

	"example.org/motorcircuit/tables"
)

// Rules of NFPA 70, Articles 430 and 440, for motor currents and least ampacities.
var (
	necTableCurrent = tables.Rule{Ref: "430.6(A)(1)"}
	necNameplate    = tables.Rule{Ref: "430.6(A)(1)", Note: "nameplate current in place of the table"}
	necBeyond       = tables.Rule{Ref: "430.6(A)(1)", Moved: []tables.Move{{From: tables.NEC2023, Ref: "430.6(A)(2)"}}, Mark: tables.MarkB, Note: "motor larger than the tables cover"}
	necSixPole      = tables.Rule{Ref: "430.6(A)(1)", Note: "motors built for less than 1200 r/min"}
	necOverload     = tables.Rule{Ref: "430.6(A)(2)"}
	necFan          = tables.Rule{Ref: "430.6(A) Exception No. 2"}
	necAppliance    = tables.Rule{Ref: "430.6(A) Exception No. 3"}
	necTorque       = tables.Rule{Ref: "430.6(B)"}
	necValve        = tables.Rule{Ref: "430.6(D)"}
	necBypass       = tables.Rule{Ref: "430.122(B)", Moved: []tables.Move{{From: tables.NEC2020, Ref: "430.122(C)"}}}
	necRectifier    = tables.Rule{Ref: "430.22(A)"}
	necMultispeed   = tables.Rule{Ref: "430.22(B)"}
	necSecondaryR   = tables.Rule{Ref: "430.23(C)"}
	necDCResistor   = tables.Rule{Ref: "430.29"}
	necMarked       = tables.Rule{Ref: "440.35"}
	necSingle       = tables.Rule{Ref: "430.22"}
	necWyeDelta     = tables.Rule{Ref: "430.22(C)"}
	necPartWinding  = tables.Rule{Ref: "430.22(D)"}
	necDuty         = tables.Rule{Ref: "430.22(E)"}
	necSecondary    = tables.Rule{Ref: "430.23(A)"}
	necSecondaryE   = tables.Rule{Ref: "430.23(B)"}
	necRotor        = tables.Rule{Ref: "430.110(C)(3)"}
	necSyncNote     = tables.Rule{Ref: "Table 430.250", Note: "note on power factor"}
	necTwoPhase     = tables.Rule{Ref: "Table 430.249"}
	necCodeLetter   = tables.Rule{Ref: "Table 430.7(B)"}
	necDriveInput   = tables.Rule{Ref: "430.122(A)"}
	necDriveOutput  = tables.Rule{Ref: "430.22", Moved: []tables.Move{{From: tables.NEC2020, Ref: "430.122(B)"}}}
	necCompressor   = tables.Rule{Ref: "440.6(A)"}
	necCompressorC  = tables.Rule{Ref: "440.32"}
	necCompressorOL = tables.Rule{Ref: "440.52(A)"}
	necCompressorLR = tables.Rule{Ref: "440.12(C)"}
)

func (d *Demand) nec(m Motor, e tables.Edition) error {
	if err := d.necDesign(m, e); err != nil {
		return err
	}
	if err := d.necLockedRotor(m, e); err != nil {
		return err
	}
	d.necHorsepower(m, e)
	if m.PhaseCount() == 2 {
		d.caution(e, &necTwoPhase, "the figures are for a four-wire two-phase circuit: the common conductor of a three-wire one carries 1.41 times the current")
	}
	return d.necAmpacities(m, e)
}

// necDesign chooses the current for conductors, switches and short-circuit
// devices (the table's, with the exceptions of 430.6) and that for overload
// (the nameplate's).
func (d *Demand) necDesign(m Motor, e tables.Edition) error {
	n := m.Nameplate
	marked := n.amperes().Figure("nameplate full-load current")
	switch {
	case m.Kind == Torque: // rated by locked-rotor current
		if marked.IsZero() {
			return needAmperes("the locked-rotor current marked on a torque motor", &necTorque, e)
		}
		d.Design = n.Amperes.Figure("nameplate locked-rotor current").As("design current", e, &necTorque)
		d.Overload = d.Design.As("overload current", e, &necTorque)
		return nil
	case m.Kind == Hermetic:
		if marked.IsZero() {
			return needAmperes("the rated-load current marked on a hermetic motor-compressor", &necCompressor, e)
		}
		rated := n.Amperes.Figure("rated-load current")
		d.Design = rated.As("design current", e, &necCompressor)
		if branch := n.BranchSelection.Figure("branch-circuit selection current"); !branch.IsZero() {
			d.Design = tables.LargestOf("design current", e, &necCompressor, rated, branch)
		}
		d.Overload = rated.As("overload current", e, &necCompressorOL)
		return nil
	}
	why, rule := m.necByNameplate()
	switch {
	case why != "" && marked.IsZero():
		return needAmperes("the nameplate current of "+why, rule, e)
	case why != "":
		d.Design = marked.As("design current", e, rule).WithNote("nameplate of " + why)
	case m.Power.IsZero():
		d.Design = marked.As("design current", e, &necNameplate)
		d.caution(e, &necTableCurrent, "the motor is marked in amperes only: its horsepower is that of the first table row to carry them")
	case !m.Power.IsHP() && !marked.IsZero():
		d.Design = marked.As("design current", e, &necNameplate)
		d.caution(e, &necTableCurrent, "the motor is marked in kilowatts, which the tables do not list: taken by its amperes, as a motor that is not marked in horsepower")
	default:
		if err := d.necFromTable(m, e, marked); err != nil {
			return err
		}
	}
	if marked.IsZero() {
		d.Overload = d.Design.StandIn("overload current", e, &necOverload)
		d.caution(e, &necOverload, "no nameplate current is given: the overload figures stand on the design current for pricing only and must be redone from the nameplate")
	} else {
		d.Overload = marked.As("overload current", e, &necOverload)
	}
	return nil
}

// necByNameplate tells why, if at all, 430.6 puts the nameplate in place of
// the table for every purpose.
func (m Motor) necByNameplate() (why string, rule *tables.Rule) {
	n := m.Nameplate
	switch {
	case m.Use == ValveActuator:
		return "a valve actuator motor assembly", &necValve
	case n.FanMotor:
		return "a shaded-pole or permanent-split-capacitor fan motor", &necFan
	case n.Appliance:
		return "a listed motor-operated appliance", &necAppliance
	case n.Multispeed || len(n.Windings) > 0:
		return "a multispeed motor", &necNameplate
	case n.HighTorque:
		return "a high-torque motor", &necNameplate
	case m.lowSpeed():
		return "a motor built for less than 1200 r/min", &necNameplate
	}
	return "", nil
}

// necFromTable takes the table current; a motor larger than the table's column
// goes by its nameplate.
func (d *Demand) necFromTable(m Motor, e tables.Edition, marked tables.Figure) error {
	table, err := e.FullLoadCurrent(m.Table(), m.Power, m.Voltage)
	if err != nil {
		powers, noColumn := e.MotorPowers(m.Table(), m.Voltage)
		if noColumn != nil || m.Power.IsHP() && m.Power.Cmp(powers[len(powers)-1]) <= 0 {
			return err
		}
		if marked.IsZero() {
			return instead(err, "a motor larger than the table, or not marked in horsepower, goes by motor.nameplate.amperes")
		}
		d.Design = marked.As("design current", e, &necBeyond)
		if e < tables.NEC2023 {
			d.caution(e, &necBeyond, "this edition does not say that a motor larger than its tables goes by the nameplate; taken as NEC-2023 says it")
		}
		return nil
	}
	d.Table = table
	if m.Kind == Synchronous {
		d.Table = d.synchronous(m, e, table, &necSyncNote)
	}
	d.Design = d.Table.As("design current", e, &necTableCurrent)
	if m.sixPole() && !marked.IsZero() {
		d.Design = tables.LargestOf("design current", e, &necSixPole, d.Table, marked)
		d.caution(e, &necSixPole, "the nameplate speed is below 1200 r/min, but that of a motor built for 1200: the larger of the table and nameplate currents is taken")
	}
	return nil
}

// synchronous multiplies the unity power factor entry of the table by 1.1 at
// 0.9 and by 1.25 at 0.8, as the note of both codes' tables says.
func (d *Demand) synchronous(m Motor, e tables.Edition, table tables.Figure, rule *tables.Rule) tables.Figure {
	pf := m.Nameplate.PowerFactor
	if pf.IsZero() {
		pf = syncRatios[2]
		d.caution(e, rule, "no power factor is given for the synchronous motor: 0.8 taken, the most current")
	}
	switch {
	case pf.Equal(syncRatios[1]):
		table = tables.ProductOf("table current", e, rule, table, tables.StatedFigure("at 0.9 power factor", e, rule, tables.Plain, 11, 1).WithNote("at 0.9 power factor"))
	case pf.Equal(syncRatios[2]):
		table = tables.ProductOf("table current", e, rule, table, tables.StatedFigure("at 0.8 power factor", e, rule, tables.Plain, 125, 2).WithNote("at 0.8 power factor"))
	}
	return table
}

// necLockedRotor takes the marked amperes, else the range of the code letter,
// else the table for switches, else six times full-load current.
func (d *Demand) necLockedRotor(m Motor, e tables.Edition) error {
	n := m.Nameplate
	switch {
	case !n.LockedRotor.IsZero():
		d.LockedRotor = n.marked()
	case m.Kind == Torque:
		rotor := d.Design.As("locked-rotor current", e, &necTorque)
		d.LockedRotor = LockedRotor{FromNameplate, rotor, rotor}
	case m.Kind == DirectCurrent:
	case m.Kind == Hermetic:
		d.LockedRotor = sixTimes(e, &necCompressorLR, d.Overload)
	case n.CodeLetter != "" && m.Power.IsHP():
		low, high, err := e.LockedRotorKVA(n.CodeLetter)
		if err != nil {
			return err
		}
		letter := " end of code letter " + strings.ToUpper(n.CodeLetter)
		d.LockedRotor = LockedRotor{Source: FromCodeLetter, Low: e.LockedRotorOf(low, m.Power, m.Voltage, m.PhaseCount(), false).Renamed("locked-rotor current, low" + letter)}
		if high.IsZero() {
			d.caution(e, &necCodeLetter, "code letter V has no upper end: the locked-rotor current may be any above its low end")
			return nil
		}
		d.LockedRotor.High = e.LockedRotorOf(high, m.Power, m.Voltage, m.PhaseCount(), true).Renamed("locked-rotor current, high" + letter)
	case strings.EqualFold(n.DesignLetter, "A"):
		d.caution(e, &necRotor, "the locked-rotor tables do not hold for Design A motors: give the marked locked-rotor current or the code letter")
	case m.Kind == SquirrelCage || m.Kind == SinglePhase:
		if f, err := e.LockedRotorCurrent(m.PhaseCount(), m.Power, m.Voltage); err == nil {
			d.LockedRotor = LockedRotor{FromTable, f, f}
			return nil
		}
		d.LockedRotor = sixTimes(e, &necRotor, d.Design)
	default:
		d.LockedRotor = sixTimes(e, &necRotor, d.Design)
	}
	return nil
}

// necHorsepower finds the horsepower by which switches are chosen. A hermetic
// motor-compressor takes the larger of its equivalents by rated-load and by
// locked-rotor current.
func (d *Demand) necHorsepower(m Motor, e tables.Edition) {
	if m.Power.IsHP() && m.Kind != Hermetic {
		d.Horsepower = m.Power
		return
	}
	if m.Kind == Torque {
		return
	}
	p, err := e.PowerAtOrAbove(m.Table(), m.Voltage, d.Design)
	if err == nil && m.Kind == Hermetic {
		var rotor tables.Power
		if rotor, err = e.PowerAtOrAboveLockedRotor(m.PhaseCount(), m.Voltage, d.LockedRotor.High); rotor.Cmp(p) > 0 {
			p = rotor
		}
	}
	if err != nil {
		d.caution(e, &necTableCurrent, "no horsepower follows from the motor's amperes: the tables have no row for them at this voltage")
		return
	}
	d.Horsepower = p
}

func needAmperes(what string, rule *tables.Rule, e tables.Edition) error {
	return &tables.InputError{Field: "motor.nameplate.amperes", Want: what, Cite: rule.In(e)}
}
