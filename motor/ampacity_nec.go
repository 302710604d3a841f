package motor

import "example.org/motorcircuit/tables"

// necAmpacities works out the least ampacities of the branch circuit, of the run
// to the motor and of the secondary: 430.22 to 430.29, 430.122, 440.32, 440.35.
func (d *Demand) necAmpacities(m Motor, e tables.Edition) error {
	base := &necSingle
	if m.Kind == Hermetic {
		base = &necCompressorC
	}
	if m.Duty.Kind == Continuous {
		d.Branch = percentOf(branchName, e, base, d.Design, 125, 0)
	} else {
		nameplate := m.Nameplate.amperes().Figure("nameplate full-load current")
		if nameplate.IsZero() {
			nameplate = d.Overload // which stands in for it, with a caution
		}
		var err error
		if d.Branch, err = m.dutyAmpacity(branchName, e, &necDuty, nameplate); err != nil {
			return err
		}
	}
	switch m.Starting {
	case WyeDelta:
		rule := &necWyeDelta
		if m.Kind == Hermetic {
			rule = &necCompressorC
		}
		d.Supply = d.share(m, e, rule, 720, 58)
	case PartWinding:
		d.Supply = d.share(m, e, &necPartWinding, 625, 50)
	case Drive:
		d.Supply = d.Branch.Renamed(supplyName)
		if m.Duty.Kind == Continuous {
			d.Supply = percentOf(supplyName, e, &necDriveOutput, d.Design, 125, 0)
		}
		d.Branch = percentOf(branchName, e, &necDriveInput, d.Input, 125, 0)
		if m.Bypass {
			d.Branch = tables.LargestOf(branchName, e, &necBypass, d.Branch.Renamed("by drive input"), percentOf("by the motor on bypass", e, &necSingle, d.Design, 125, 0))
		}
	}
	if err := d.necSpecial(m, e); err != nil {
		return err
	}
	return d.secondary(m, e, &necSecondary, &necSecondaryE, &necSecondaryR)
}

// necSpecial follows the rules for motors on rectifiers, with resistors, of
// several speeds, and for equipment that is marked with its own ampacity.
func (d *Demand) necSpecial(m Motor, e tables.Edition) error {
	if percent := [...]int{NoRectifier: 0, HalfWave: 190, FullWave: 150}[m.Rectifier]; percent > 0 {
		d.Supply = percentOf(supplyName, e, &necRectifier, d.Design, percent, 0)
		d.Branch = percentOf(branchName, e, &necRectifier, m.Nameplate.RectifierInput.Figure("rated input current of the rectifier"), 125, 0)
	}
	if m.Kind == DirectCurrent {
		if err := d.resistor(m, e, &necDCResistor, d.Design); err != nil {
			return err
		}
	}
	if marked := m.Nameplate.MinimumAmpacity.Figure("marked minimum circuit ampacity"); !marked.IsZero() {
		d.Branch = marked.As(branchName, e, &necMarked)
	}
	return d.windings(m, e, &necMultispeed, &necDuty)
}

// share returns the ampacity of the conductors between controller and motor
// that carry a share of the motor's current: the rule's tenths of a percent of
// full-load current for continuous duty, else that share of the ampacity for
// the duty.
func (d *Demand) share(m Motor, e tables.Edition, rule *tables.Rule, tenths, sharePercent int) tables.Figure {
	if m.Duty.Kind != Continuous {
		return percentOf(supplyName, e, rule, d.Branch, sharePercent, 0)
	}
	return percentOf(supplyName, e, rule, d.Design, tenths, 1)
}
