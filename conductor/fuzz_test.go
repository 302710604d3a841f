package conductor_test

import (
	"errors"
	"strings"
	"testing"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// Whatever the fields hold: no panic, a typed error that names a field, and with
// an error the zero Selection. What is selected carries the load.
func FuzzSelect(f *testing.F) {
	f.Add(uint8(3), uint8(0), "THWN-2", uint8(0), uint8(0), "30", false, 0, 75, 0, uint8(0), "81.25", 3, false, "B", false)
	f.Add(uint8(1), uint8(1), "XHHW-2", uint8(2), uint8(2), "85", true, 41, 0, 12, uint8(0), "6540.01", 6, true, "", true)
	f.Add(uint8(4), uint8(0), "RW90", uint8(0), uint8(2), "-60", false, 5, 90, 2, uint8(1), "0.000001", 0, false, "A", false)
	f.Add(uint8(5), uint8(0), "t90 nylon", uint8(2), uint8(1), "150", false, -1, 60, -1, uint8(9), "999999999.999999", -7, false, "h", true)
	f.Add(uint8(0), uint8(9), "٥\xff", uint8(9), uint8(9), "-273.15", true, 1001, 77, 13, uint8(2), "0", 1<<40, true, "\xff", false)
	f.Fuzz(func(t *testing.T, edition, material uint8, insulation string, location, run uint8, ambient string, rooftop bool,
		together, termination, sets int, reading uint8, amps string, own int, design bool, class string, closed bool) {
		w := conductor.Wiring{Material: tables.Material(material), Insulation: insulation, Location: tables.Location(location), Run: tables.Run(run),
			Rooftop: rooftop, Conductors: together, Termination: termination, Sets: sets, Reading: conductor.Reading(reading)}
		w.Ambient, _ = tables.ParseTemperature(ambient)
		current, err := tables.ParseCurrent(amps)
		if err != nil {
			return
		}
		e := tables.Edition(edition)
		l := conductor.Load{Ampacity: current.Figure("least ampacity"), Count: own, Motor75: design}
		check := func(s conductor.Selection, err error) {
			if err == nil {
				if !s.Size.IsValid() || s.Sets < 1 || s.Ampacity.Cmp(s.Required) < 0 || s.Smaller.Why == "" {
					t.Fatalf("%+v for %s A in %v: %d × %v carries %v", w, amps, e, s.Sets, s.Size, s.Ampacity)
				}
				return
			}
			if !s.IsZero() || !s.Required.IsZero() || s.Cautions != nil {
				t.Fatalf("%+v: error %v with a selection", w, err)
			}
			for _, one := range tables.Faults(err) {
				name := tables.FieldOf(one)
				if name != "edition" && name != "wiring" && name != "load.ampacity" && name != "motor.nameplate.insulation_class" && !strings.HasPrefix(name, "wiring.") {
					t.Fatalf("%+v: error %v names %q", w, one, name)
				}
			}
		}
		check(w.Select(e, l))
		check(w.SelectMotorSupply(e, l, conductor.MotorEnd{InsulationClass: class, NonVentilated: closed}))
	})
}

// Whatever text a reading is read from: an accepted value prints a text that
// reads back to itself, and an error leaves the zero value.
func FuzzReadingText(f *testing.F) {
	for _, s := range []string{"", "correct_insulation", "Correct Termination", "_", "\xff", "٥"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, text string) {
		r := conductor.CorrectInsulation
		err := r.UnmarshalText([]byte(text))
		if err != nil {
			var input *tables.InputError
			if r != 0 || !errors.As(err, &input) || input.Field != "wiring.reading" {
				t.Fatalf("%q: value %d, error %v", text, r, err)
			}
			return
		}
		var again conductor.Reading
		if err := again.UnmarshalText([]byte(r.String())); err != nil || again != r {
			t.Fatalf("%q: %q reads back as %v, %v", text, r, again, err)
		}
	})
}
