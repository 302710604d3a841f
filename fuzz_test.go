package motorcircuit_test

import (
	"encoding/json"
	"errors"
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// FuzzSize sizes arbitrary circuits: never a panic; an error comes with the zero
// result and names a field; a result is whole, prints and encodes.
func FuzzSize(f *testing.F) {
	f.Add(uint8(3), uint8(1), 3, "7-1/2 hp", 460, "10.4", "1.15", "40", "H", "B", uint8(0), 0, uint8(0), uint8(3), "THWN-2", "40", 6, 75, uint8(0), 0, "", uint8(0), "", "", "", "", uint8(0))
	f.Add(uint8(5), uint8(4), 0, "30 hp", 600, "", "", "", "", "", uint8(2), 15, uint8(1), uint8(2), "RW90", "-5", 0, 0, uint8(2), 3, "200 ft", uint8(1), "6", "2", "10000", "5.79", uint8(1))
	f.Add(uint8(1), uint8(7), 1, "", 230, "38", "3", "41", "", "A", uint8(4), 7, uint8(6), uint8(4), "", "200", 1000, 90, uint8(1), 12, "3000 m", uint8(12), "1/0", "50", "300000", "0.01", uint8(44))
	f.Add(uint8(9), uint8(0), -1, "1e9999 hp", -5, "٥", "65.", "-1", "I", "Ω", uint8(9), -9, uint8(9), uint8(9), "\x00", "1e9", -3, 61, uint8(9), 99, "1e9 m", uint8(99), "16 mm²", "٥", "-1", "1e9999", uint8(255))
	f.Add(uint8(2), uint8(1), 3, "50", 460, "", "", "", "", "", uint8(0), 0, uint8(1), uint8(3), "THHN", "", 0, 75, uint8(0), 2, "0 ft", uint8(8), "", "0.1", "1", "1", uint8(8))
	f.Fuzz(func(t *testing.T, edition, kind uint8, phases int, power string, volts int, amps, service, rise, letter, design string,
		duty uint8, minutes int, starting, device uint8, insulation, ambient string, conductors, termination int, run uint8, sets int,
		length string, raceway uint8, least, drop, fault, xr string, special uint8) {
		p, _ := tables.ParsePower(power)
		a, _ := tables.ParseCurrent(amps)
		sf, _ := tables.ParseRatio(service)
		tr, _ := tables.ParseTemperature(rise)
		air, _ := tables.ParseTemperature(ambient)
		far, _ := tables.ParseLength(length)
		from, _ := tables.ParseSize(least)
		most, _ := tables.ParseRatio(drop)
		source, _ := tables.ParseCurrent(fault)
		reactive, _ := tables.ParseRatio(xr)
		c := motorcircuit.Circuit{
			MaxDrop: most, Fault: source, FaultXR: reactive,
			Edition: tables.Edition(edition),
			Motor: motor.Motor{
				Kind: motor.Kind(kind), Phases: phases, Power: p, Voltage: volts,
				Nameplate: motor.Nameplate{Amperes: a, Secondary: a, LockedRotor: a, DriveInput: a, ServiceFactor: sf, TemperatureRise: tr, CodeLetter: letter, DesignLetter: design,
					EfficiencyClass: motor.Efficiency(sets), SpeedRPM: conductors, InsulationClass: design},
				Duty: motor.Duty{Kind: tables.Duty(duty), Minutes: minutes}, Starting: motor.Starting(starting),
			},
			Device: tables.Device(device),
			Wiring: conductor.Wiring{Material: tables.Material(run), Insulation: insulation, Location: tables.Location(run), Run: tables.Run(run), Ambient: air,
				Conductors: conductors, Termination: termination, Sets: sets, Reading: conductor.Reading(run), Length: far, Raceway: tables.Raceway(raceway), Least: from},
		}
		if c.Motor.Kind != motor.WoundRotor {
			c.Motor.Nameplate.Secondary = tables.Current{}
		}
		if c.Motor.Starting != motor.Drive {
			c.Motor.Nameplate.DriveInput = tables.Current{}
		}
		m := &c.Motor
		m.Bypass, m.Use, m.Rectifier, m.Resistor = special&1 != 0, motor.Use(special>>1&3), motor.Rectifier(special>>3&3), tables.ResistorDuty(special>>5)
		if special&8 != 0 {
			m.Nameplate.RectifierInput = a
		}
		if special&64 != 0 {
			m.Nameplate.MaximumDevice, m.Nameplate.MinimumAmpacity = a, a
		}
		if special&6 == 4 {
			m.Nameplate.Windings = []motor.Winding{{Amperes: a}, {Amperes: a}}
			m.Nameplate.Amperes = tables.Current{}
		}
		r, err := motorcircuit.Size(c)
		if err != nil {
			require.Equal(t, motorcircuit.Result{}, r)
			requireNamed(t, err)
			return
		}
		require.NotEmpty(t, r.Cautions)
		require.GreaterOrEqual(t, r.Branch.Ampacity.Cmp(r.Demand.Branch), 0)
		require.NotEmpty(t, r.String())
		require.False(t, r.Bonding.IsZero())
		require.LessOrEqual(t, r.Bonding.Size.Cmp(r.Branch.Size), 0)
		require.GreaterOrEqual(t, r.Branch.Size.Cmp(from), 0)
		if !r.Raceway.IsZero() {
			require.LessOrEqual(t, r.Raceway.Area.Cmp(r.Raceway.Limit), 0)
		}
		if !c.MaxDrop.IsZero() && !r.Drop.Running.IsZero() {
			require.LessOrEqual(t, r.Drop.Running.Cmp(c.MaxDrop.Figure("limit")), 0)
		}
		for _, q := range r.Quantities() {
			require.True(t, q.Item != "" && q.Kind != "" && !q.Amount.IsNegative(), "%+v", q)
		}
		_, err = json.Marshal(r)
		require.NoError(t, err)
	})
}

// requireNamed holds that every fault is typed and names its field.
func requireNamed(t *testing.T, err error) {
	t.Helper()
	for _, one := range tables.Faults(err) {
		var (
			input *tables.InputError
			none  *tables.NotTabulatedError
			size  *tables.NoSizeError
		)
		switch within := errors.Unwrap(one); {
		case within != nil: // the faults of a circuit
			requireNamed(t, within)
			continue
		case errors.As(one, &input):
			require.NotEmpty(t, input.Want)
		case errors.As(one, &none):
			require.NotEmpty(t, none.Covers)
		case errors.As(one, &size):
			require.NotEmpty(t, size.Constraint)
		default:
			t.Fatalf("an error that is not typed: %v", one)
		}
		require.NotEmpty(t, tables.FieldOf(one))
	}
}
