package motorcircuit_test

import (
	"encoding/json"
	"fmt"
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// FuzzSizeFeeder sizes feeders of two to four arbitrary motors: never a panic; an
// error comes with the zero result, is typed and names a field; a result is whole,
// prints and encodes. A group of the same motors likewise.
func FuzzSizeFeeder(f *testing.F) {
	f.Add(uint8(3), uint8(2), uint8(1), "50 hp", "40", "10", 460, uint8(0), 0, uint8(0), uint8(3), "x", "1", "s", "AB", "20", "5", "", uint8(0))
	f.Add(uint8(5), uint8(4), uint8(2), "2 hp", "", "24", 115, uint8(0), 0, uint8(0), uint8(2), "", "", "", "C", "", "7", "0.8", uint8(1))
	f.Add(uint8(1), uint8(3), uint8(1), "30 hp", "36", "36", 460, uint8(2), 15, uint8(6), uint8(4), "x", "", "", "", "0", "0", "1", uint8(255))
	f.Add(uint8(4), uint8(3), uint8(7), "", "38", "12", 230, uint8(0), 0, uint8(1), uint8(1), "x", "2", "s", "", "1e9", "-1", "2", uint8(37))
	f.Add(uint8(9), uint8(0), uint8(99), "1e9999 hp", "٥", "0.000001", -5, uint8(9), -9, uint8(9), uint8(9), "\x00", "\xff", "Ω", "ABC", "100001", "1", "-1", uint8(2))
	f.Fuzz(func(t *testing.T, edition, count, kind uint8, power, amps, other string, volts int, service uint8, minutes int, starting, device uint8,
		interlock, alternative, together, lines, continuous, load, demand string, flags uint8) {
		n := 2 + int(count%3)
		fd := motorcircuit.Feeder{Tag: alternative, Edition: tables.Edition(edition), Device: tables.Device(device)}
		fd.Continuous, _ = tables.ParseCurrent(continuous)
		fd.Other, _ = tables.ParseCurrent(load)
		fd.Demand, _ = tables.ParseRatio(demand)
		fd.Wiring.Termination = int(flags%2) * 75
		for i := range n {
			fc := motorcircuit.FeederCircuit{}
			c := &fc.Circuit
			c.Edition, c.Device, c.Tag = fd.Edition, tables.Device(device), fmt.Sprint(interlock, i)
			c.Motor = motor.Motor{Kind: motor.Kind(kind), Voltage: volts}
			c.Motor.Power, _ = tables.ParsePower(power)
			c.Motor.Nameplate.Amperes, _ = tables.ParseCurrent(amps)
			switch i { // the others differ from the first in one thing each
			case 0:
				c.Motor.Duty = motor.Duty{Kind: tables.Duty(service), Minutes: minutes}
				fc.Lines = lines
			case 1:
				c.Motor.Nameplate.Amperes, _ = tables.ParseCurrent(other)
				fc.Interlock, fc.Alternative = interlock, alternative
			case 2:
				c.Motor.Starting = motor.Starting(starting)
				if c.Motor.Starting == motor.Drive {
					c.Motor.Nameplate.DriveInput, _ = tables.ParseCurrent(other)
					fc.DriveGroup = interlock
				}
				fc.Interlock = interlock
			case 3:
				c.Motor.Nameplate.Windings = []motor.Winding{{Amperes: c.Motor.Nameplate.Amperes}, {Amperes: c.Motor.Nameplate.Amperes}}
				c.Motor.Nameplate.Amperes = tables.Current{}
			}
			if flags&2 != 0 {
				c.Motor.Nameplate.MaximumDevice, _ = tables.ParseCurrent(load)
			}
			if flags&4 != 0 {
				fc.StartsWith = together
			}
			fc.HardStart = flags&8 != 0
			if flags&16 != 0 {
				fc.Lines = lines
			}
			if flags&32 != 0 {
				c.Motor.Use = motor.Use(1 + i%2)
			}
			c.Motor.Bypass = flags&64 != 0 && c.Motor.Starting == motor.Drive
			fd.Circuits = append(fd.Circuits, fc)
		}
		r, err := motorcircuit.SizeFeeder(fd)
		if err != nil {
			require.Equal(t, motorcircuit.FeederResult{}, r)
			requireNamed(t, err)
		} else {
			requireWhole(t, r)
			require.NotEmpty(t, r.String())
			_, err = json.Marshal(r)
			require.NoError(t, err)
		}
		g := motorcircuit.Group{Edition: fd.Edition, Device: fd.Device, Other: fd.Other, Wiring: fd.Wiring, Listed: flags&1 != 0, Machine: flags&2 != 0}
		for _, fc := range fd.Circuits {
			g.Circuits = append(g.Circuits, fc.Circuit)
		}
		gr, err := motorcircuit.SizeGroup(g)
		if err != nil {
			require.Equal(t, motorcircuit.GroupResult{}, gr)
			requireNamed(t, err)
			return
		}
		require.GreaterOrEqual(t, gr.Conductors.Ampacity.Cmp(gr.Ampacity), 0)
		require.Len(t, gr.Ways, 3)
	})
}
