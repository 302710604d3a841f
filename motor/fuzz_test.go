package motor_test

import (
	"errors"
	"strings"
	"testing"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Whatever text an enumeration is read from: an accepted value prints a text
// that reads back to itself, and an error leaves the zero value.
func FuzzKindText(f *testing.F) {
	for _, s := range []string{"", "squirrel_cage", "Wye Delta", "SHORT-TIME", "premium", " ", "_", "dc\x00", "٥", "\xff\xfe", "1e9999", "İ"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, text string) {
		for _, x := range enumerations {
			value, printed, err := x.read(text)
			if err != nil {
				var input *tables.InputError
				if value != 0 || !errors.As(err, &input) || input.Field != x.field {
					t.Fatalf("%s %q: value %d, error %v", x.name, text, value, err)
				}
				continue
			}
			if text != "" && x.texts[value] != printed {
				t.Fatalf("%s %q: value %d prints %q", x.name, text, value, printed)
			}
			if again, _, err := x.read(printed); err != nil || again != value {
				t.Fatalf("%s %q: %q reads back as %d, %v", x.name, text, printed, again, err)
			}
		}
	})
}

// Whatever the fields hold: no panic, a typed error that names a field, and with
// an error the zero Demand.
func FuzzDemand(f *testing.F) {
	f.Add(uint8(3), uint8(1), 3, "50 hp", 460, "61", "", "1.15", "40", "G", "B", uint8(0), 0, uint8(0), 1750, uint8(0), uint8(0))
	f.Add(uint8(1), uint8(4), 0, "100 hp", 460, "", "", "0.85", "", "", "", uint8(0), 0, uint8(0), 450, uint8(0), uint8(0))
	f.Add(uint8(4), uint8(7), 1, "", 230, "38", "200", "", "", "V", "", uint8(0), 0, uint8(1), 0, uint8(0), uint8(37))
	f.Add(uint8(5), uint8(5), 0, "1/3 hp", 120, "", "", "", "-5", "", "", uint8(1), 5, uint8(4), 0, uint8(0), uint8(129))
	f.Add(uint8(2), uint8(3), 3, "999999999 kW", -1, "999999999.999999", "0", "0", "0", "٥", "\xff", uint8(9), -7, uint8(6), 1<<62, uint8(255), uint8(255))
	f.Add(uint8(0), uint8(99), -9, "0.000001 hp", 1, "0.000001", "0.000001", "2", "180", "U", "A", uint8(3), 60, uint8(99), 1199, uint8(7), uint8(90))
	f.Fuzz(func(t *testing.T, edition, kind uint8, phases int, power string, volts int, amperes, rotor, factor, rise, letter, design string,
		duty uint8, minutes int, starting uint8, rpm int, flags, special uint8) {
		m := motor.Motor{Kind: motor.Kind(kind), Phases: phases, Voltage: volts, Starting: motor.Starting(starting),
			Duty: motor.Duty{Kind: tables.Duty(duty), Minutes: minutes}}
		m.Power, _ = tables.ParsePower(power)
		n := &m.Nameplate
		n.Amperes, _ = tables.ParseCurrent(amperes)
		n.LockedRotor, _ = tables.ParseCurrent(rotor)
		n.ServiceFactor, _ = tables.ParseRatio(factor)
		n.PowerFactor = n.ServiceFactor
		n.TemperatureRise, _ = tables.ParseTemperature(rise)
		n.CodeLetter, n.DesignLetter, n.SpeedRPM = letter, design, rpm
		n.HighTorque, n.Multispeed, n.Appliance, n.FanMotor = flags&1 != 0, flags&2 != 0, flags&4 != 0, flags&8 != 0
		if flags&16 != 0 {
			n.DriveInput = n.Amperes
		}
		if flags&32 != 0 {
			n.Secondary = n.LockedRotor
		}
		if flags&64 != 0 {
			n.BranchSelection = n.LockedRotor
		}
		m.Bypass, m.Use = special&1 != 0, motor.Use(special>>1&3)
		m.Rectifier, m.Resistor = motor.Rectifier(special>>3&3), tables.ResistorDuty(special>>5)
		n.RectifierInput, n.MinimumAmpacity, n.MaximumDevice = where(special, 3, n.Amperes), where(special, 7, n.LockedRotor), n.LockedRotor
		if special&6 == 6 {
			n.Windings = []motor.Winding{{Amperes: n.Amperes}, {Power: m.Power, Amperes: n.LockedRotor}}
			n.Amperes = tables.Current{}
		}
		d, err := m.Demand(tables.Edition(edition))
		if err == nil {
			if d.Design.IsZero() || d.Overload.IsZero() || d.Branch.IsZero() || d.Branch.Value().Sign() < 0 {
				t.Fatalf("%+v: no error, but design %v, overload %v, branch %v", m, d.Design, d.Overload, d.Branch)
			}
			return
		}
		if !d.Design.IsZero() || !d.Branch.IsZero() || d.Cautions != nil {
			t.Fatalf("%+v: error %v with a demand", m, err)
		}
		for _, one := range tables.Faults(err) {
			if name := tables.FieldOf(one); name != "edition" && !strings.HasPrefix(name, "motor.") {
				t.Fatalf("%+v: error %v names %q", m, one, name)
			}
		}
	})
}

// where gives the current if a bit is set, else none.
func where(bits uint8, bit int, c tables.Current) tables.Current {
	if bits>>bit&1 != 0 {
		return c
	}
	return tables.Current{}
}
