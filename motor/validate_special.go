package motor

import "strconv"

// validateSpecial checks the fields of special motors.
func (m Motor) validateSpecial(f *faults) {
	if m.Bypass && m.Starting != Drive {
		f.add("motor.bypass", "true", `only with starting "drive"`)
	}
	switch r := m.Resistor; {
	case r == 0:
	case !r.IsValid():
		f.add("motor.resistor", strconv.Itoa(int(r)), "a duty of resistors")
	case m.Kind == WoundRotor && m.Nameplate.Secondary.IsZero():
		f.add("motor.nameplate.secondary_amperes", "", "the secondary current that resistors carry")
	case m.Kind != WoundRotor && m.Kind != DirectCurrent:
		f.add("motor.resistor", r.String(), "only with a wound-rotor or direct-current motor")
	}
	switch r := m.Rectifier; {
	case r == NoRectifier:
	case r >= rectifierCount:
		f.add("motor.rectifier", strconv.Itoa(int(r)), "none, half_wave or full_wave")
	case m.Kind != DirectCurrent:
		f.add("motor.rectifier", r.String(), "only with a direct-current motor")
	case m.Nameplate.RectifierInput.IsZero():
		f.add("motor.nameplate.rectifier_input_amperes", "", "the rectifier's rated input current")
	}
	switch u := m.Use; {
	case u >= useCount:
		f.add("motor.use", strconv.Itoa(int(u)), "ordinary, fire_pump or valve_actuator")
	case u == FirePump && m.Kind != SquirrelCage && m.Kind != SinglePhase && m.Kind != WoundRotor:
		f.add("motor.use", u.String(), "fire_pump only for a squirrel cage, wound-rotor or single-phase motor")
	case u == FirePump && (m.Starting == Drive || m.Duty.Kind != Continuous):
		f.add("motor.use", u.String(), "a fire pump of continuous duty that is not sized as fed by a drive")
	}
	m.validateWindings(f)
}

func (m Motor) validateWindings(f *faults) {
	list := m.Nameplate.Windings
	switch {
	case len(list) == 0:
		return
	case len(list) == 1 || len(list) > 4:
		f.add("motor.nameplate.windings", strconv.Itoa(len(list)), "two to four speeds")
	case m.Kind == Hermetic || m.Kind == Torque || m.Starting == WyeDelta || m.Starting == PartWinding || m.Starting == Drive:
		f.add("motor.nameplate.windings", strconv.Itoa(len(list)), "none for this kind of motor or this way of starting")
	case !m.Nameplate.Amperes.IsZero():
		f.add("motor.nameplate.amperes", m.Nameplate.Amperes.String(), "none beside motor.nameplate.windings, which hold the currents")
	}
	for i, w := range list {
		field := "motor.nameplate.windings[" + strconv.Itoa(i) + "].amperes"
		if w.Amperes.IsZero() || w.Amperes.Cmp(noAmps) <= 0 || w.Amperes.Cmp(mostAmps) > 0 {
			f.add(field, w.Amperes.String(), "nameplate current above 0 A, at most 100000 A")
		}
	}
}
