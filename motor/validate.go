package motor

import (
	"errors"
	"strconv"
	"strings"

	"example.org/motorcircuit/tables"
)

// Validate reports every field that cannot stand, joined: each error is a
// [*tables.InputError]. What an edition does not tabulate is found only when
// it is looked up.
func (m Motor) Validate() error {
	f := &faults{}
	if m.Kind == 0 || m.Kind >= kindCount {
		f.add("motor.kind", intText(int(m.Kind)), "one of "+strings.Join(kindTexts[1:], ", "))
	} else {
		m.validatePhases(f)
	}
	m.validatePower(f)
	m.Nameplate.validate(f, m)
	m.validateDuty(f)
	m.validateStarting(f)
	m.validateSpecial(f)
	return f.err()
}

// faults collects input errors.
type faults struct{ list []error }

func (f *faults) add(field, value, want string) {
	f.list = append(f.list, &tables.InputError{Field: field, Value: value, Want: want})
}

func (f *faults) err() error { return errors.Join(f.list...) }

func (m Motor) validatePhases(f *faults) {
	value := strconv.Itoa(m.Phases)
	switch n := m.PhaseCount(); m.Kind {
	case DirectCurrent:
		if n != 0 {
			f.add("motor.phases", value, "no phases for a direct-current motor")
		}
	case SinglePhase:
		if n != 1 {
			f.add("motor.phases", value, "1 for a single-phase motor")
		}
	case Synchronous:
		if n != 3 {
			f.add("motor.phases", value, "3 for a synchronous motor: the tables have no other")
		}
	case SquirrelCage, WoundRotor:
		if n != 2 && n != 3 {
			f.add("motor.phases", value, "2 or 3 for a "+m.Kind.Name()+"; a motor of one phase is of kind single_phase")
		}
	default:
		if n < 1 || n > 3 {
			f.add("motor.phases", value, "1, 2 or 3")
		}
	}
}

func (m Motor) validatePower(f *faults) {
	if m.Power.IsZero() && m.Nameplate.amperes().IsZero() {
		switch m.Kind {
		case Torque:
			f.add("motor.nameplate.amperes", "", "the locked-rotor current marked on a torque motor")
		case Hermetic:
			f.add("motor.nameplate.amperes", "", "the rated-load current marked on a hermetic motor-compressor")
		default:
			f.add("motor.power", "", `rated output such as "7-1/2 hp" or "30 kW", or else motor.nameplate.amperes`)
		}
	}
	if !m.Power.IsZero() && !m.Power.AtMost(100_000) {
		f.add("motor.power", m.Power.String(), "at most 100000")
	}
	if m.Voltage < 1 || m.Voltage > 35_000 {
		f.add("motor.voltage", intText(m.Voltage), "rated volts from 1 to 35000")
	}
}

var (
	zero       = tables.Must(tables.ParseRatio("0"))
	one        = tables.Must(tables.ParseRatio("1"))
	two        = tables.Must(tables.ParseRatio("2"))
	noAmps     = tables.Must(tables.ParseCurrent("0"))
	mostAmps   = tables.Must(tables.ParseCurrent("100000"))
	leastRise  = tables.Must(tables.ParseTemperature("10"))
	mostRise   = tables.Must(tables.ParseTemperature("180"))
	syncRatios = []tables.Ratio{one, tables.Must(tables.ParseRatio("0.9")), tables.Must(tables.ParseRatio("0.8"))}
)

func (n Nameplate) validate(f *faults, m Motor) {
	for _, c := range []struct {
		field string
		amps  tables.Current
		only  bool // may be marked on this motor
		where string
	}{
		{"amperes", n.Amperes, true, ""},
		{"secondary_amperes", n.Secondary, m.Kind == WoundRotor, "only on a wound-rotor motor"},
		{"locked_rotor_amperes", n.LockedRotor, true, ""},
		{"branch_selection_amperes", n.BranchSelection, m.Kind == Hermetic, "only on a hermetic motor-compressor"},
		{"rectifier_input_amperes", n.RectifierInput, m.Rectifier != NoRectifier, "only with a rectifier"},
		{"minimum_circuit_ampacity", n.MinimumAmpacity, m.Kind == Hermetic, "only on a hermetic motor-compressor's equipment"},
		{"maximum_device_rating", n.MaximumDevice, true, ""},
		{"drive_input_amperes", n.DriveInput, m.Starting == Drive, `only with starting "drive"`},
	} {
		switch {
		case c.amps.IsZero():
		case !c.only:
			f.add("motor.nameplate."+c.field, c.amps.String(), c.where)
		case c.amps.Cmp(noAmps) <= 0 || c.amps.Cmp(mostAmps) > 0:
			f.add("motor.nameplate."+c.field, c.amps.String(), "above 0 A, at most 100000 A")
		}
	}
	if !n.LockedRotor.IsZero() && !n.Amperes.IsZero() && n.LockedRotor.Cmp(n.Amperes) < 0 {
		f.add("motor.nameplate.locked_rotor_amperes", n.LockedRotor.String(), "not below the nameplate's "+n.Amperes.String())
	}
	if sf := n.ServiceFactor; !sf.IsZero() && (sf.Cmp(one) < 0 || sf.Cmp(two) > 0) {
		f.add("motor.nameplate.service_factor", sf.String(), "1 to 2")
	}
	if r := n.TemperatureRise; !r.IsZero() && (r.Cmp(leastRise) < 0 || r.Cmp(mostRise) > 0) {
		f.add("motor.nameplate.temperature_rise", r.String(), "10 to 180 °C")
	}
	if e := n.Efficiency; !e.IsZero() && (e.Cmp(zero) <= 0 || e.Cmp(one) >= 0) {
		f.add("motor.nameplate.efficiency", e.String(), "above 0, below 1")
	}
	if n.SpeedRPM < 0 || n.SpeedRPM > 60_000 {
		f.add("motor.nameplate.speed_rpm", strconv.Itoa(n.SpeedRPM), "1 to 60000 revolutions a minute")
	}
	n.validatePowerFactor(f, m.Kind)
	if l := n.CodeLetter; l != "" {
		if _, _, err := tables.NEC2023.LockedRotorKVA(l); err != nil {
			f.list = append(f.list, err)
		}
		if m.Kind == DirectCurrent {
			f.add("motor.nameplate.code_letter", l, "none on a direct-current motor")
		}
	}
	if l := n.DesignLetter; l != "" {
		if len(l) != 1 || !strings.Contains("ABCD", strings.ToUpper(l)) {
			f.add("motor.nameplate.design_letter", shorten(l), "A, B, C or D")
		} else if m.Kind != SquirrelCage {
			f.add("motor.nameplate.design_letter", l, "only on a squirrel cage motor")
		}
	}
	if n.EfficiencyClass >= efficiencyCount {
		f.add("motor.nameplate.efficiency_class", strconv.Itoa(int(n.EfficiencyClass)), "standard, energy_efficient or premium")
	}
	if c := n.InsulationClass; c != "" && (len(c) != 1 || !strings.Contains("ABFH", strings.ToUpper(c))) {
		f.add("motor.nameplate.insulation_class", shorten(c), "A, B, F or H")
	}
}

func (n Nameplate) validatePowerFactor(f *faults, k Kind) {
	pf := n.PowerFactor
	switch {
	case pf.IsZero():
	case k == DirectCurrent:
		f.add("motor.nameplate.power_factor", pf.String(), "none on a direct-current motor")
	case k == Synchronous:
		for _, r := range syncRatios {
			if pf.Equal(r) {
				return
			}
		}
		f.add("motor.nameplate.power_factor", pf.String(), "1, 0.9 or 0.8 for a synchronous motor: the tables tell no other apart")
	case pf.Cmp(zero) <= 0 || pf.Cmp(one) > 0:
		f.add("motor.nameplate.power_factor", pf.String(), "above 0, at most 1")
	}
}

func (m Motor) validateDuty(f *faults) {
	d := m.Duty
	switch {
	case d.Kind > tables.Varying:
		f.add("motor.duty.kind", strconv.Itoa(int(d.Kind)), "continuous, short_time, intermittent, periodic or varying")
	case d.Kind == Continuous && d.Minutes != 0:
		f.add("motor.duty.minutes", strconv.Itoa(d.Minutes), "none for continuous duty: a motor with a time rating may not run on")
	case d.Kind != Continuous:
		if _, err := tables.NEC2023.DutyPercent(Intermittent, d.Minutes); err != nil {
			f.add("motor.duty.minutes", strconv.Itoa(d.Minutes), "5, 15, 30 or 60, or 0 for a motor rated for continuous running")
		}
		if m.Kind == Torque || m.Kind == Hermetic {
			f.add("motor.duty.kind", d.Kind.String(), "continuous for a "+m.Kind.Name())
		}
	}
}

func (m Motor) validateStarting(f *faults) {
	s := m.Starting
	bad := func(want string) { f.add("motor.starting", s.String(), want) }
	switch {
	case s >= startingCount:
		f.add("motor.starting", strconv.Itoa(int(s)), "one of "+strings.Join(startingTexts[:], ", "))
	case m.Kind == DirectCurrent && s != AcrossTheLine && s != Resistor:
		bad("across_the_line or resistor for a direct-current motor")
	case m.Kind == WoundRotor && s != AcrossTheLine && s != Resistor && s != Drive:
		bad("across_the_line, resistor or drive for a wound-rotor motor")
	case (s == WyeDelta || s == PartWinding) && m.PhaseCount() != 3:
		bad("a three-phase motor for this way of starting")
	case (s == WyeDelta || s == PartWinding) && m.Kind == Torque:
		bad("across_the_line, autotransformer, resistor, soft_starter or drive for a torque motor")
	}
	if s == Drive && m.Nameplate.DriveInput.IsZero() {
		f.add("motor.nameplate.drive_input_amperes", "", `the drive's rated input current with starting "drive"`)
	}
}

func intText(i int) string {
	if i == 0 {
		return ""
	}
	return strconv.Itoa(i)
}

func shorten(s string) string {
	if len(s) > 20 {
		return strings.ToValidUTF8(s[:20], "") + "..."
	}
	return s
}
