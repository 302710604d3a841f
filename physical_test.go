package motorcircuit_test

import (
	"math"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// longRun is a 25 hp motor at the end of a run: 34 A by the tables of both codes,
// 42.5 A of ampacity, 8 AWG copper (50 A) on 75 °C terminals.
func longRun(e tables.Edition, length string) motorcircuit.Circuit {
	return motorcircuit.Circuit{
		Edition: e,
		Motor:   motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("25"), Voltage: 460},
		Device:  protection.InverseTimeBreaker,
		Wiring:  conductor.Wiring{Termination: 75, Length: conductor.Metres(length), Raceway: tables.EMT},
	}
}

func circuitOf(t *testing.T, c motorcircuit.Circuit) motorcircuit.Result {
	t.Helper()
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	return r
}

func told(list []tables.Caution, text string) bool {
	for _, c := range list {
		if strings.Contains(c.Text, text) {
			return true
		}
	}
	return false
}

// MaxDrop takes the next larger sizes until the drop is within it, and tells so.
func TestMaxDrop(t *testing.T) {
	for _, e := range tables.Editions() {
		for _, limit := range []string{"1", "2", "3"} {
			c := longRun(e, "150")
			plain := circuitOf(t, c)
			assert.Equal(t, "8 AWG", plain.Branch.Size.String())
			assert.Equal(t, "8 AWG", plain.BySize.String())
			assert.Positive(t, plain.Drop.Running.Cmp(plain.Drop.Limit), "150 m of 8 AWG drop more than 3 %")
			assert.True(t, told(plain.Cautions, "for one circuit"))
			assert.False(t, told(plain.Cautions, "larger than the 8 AWG"))

			c.MaxDrop = motor.Factor(limit)
			r := circuitOf(t, c)
			most := motor.Factor(limit).Figure("limit")
			assert.Equal(t, "8 AWG", r.BySize.String(), "what ampacity asks for")
			assert.Positive(t, r.Branch.Size.Cmp(r.BySize))
			assert.LessOrEqual(t, r.Drop.Running.Cmp(most), 0)
			assert.True(t, told(r.Cautions, "larger than the 8 AWG that ampacity asks for"))

			smaller := r.Branch.Smaller
			assert.Equal(t, r.Branch.Size.Smaller(), smaller.Size)
			assert.Contains(t, smaller.Why, "its voltage drop running is ")
			c.MaxDrop, c.Wiring.Least = tables.Ratio{}, smaller.Size
			below := circuitOf(t, c)
			assert.Positive(t, below.Drop.Running.Cmp(most), "the next smaller size does not keep it")
			assert.Contains(t, smaller.Why, below.Drop.Running.String())
		}
	}
}

// A limit that is met already, or a run without a length, changes nothing.
func TestMaxDropMet(t *testing.T) {
	c := longRun(tables.NEC2023, "5")
	want := circuitOf(t, c).Branch
	c.MaxDrop = motor.Factor("3")
	assert.Equal(t, want, circuitOf(t, c).Branch)
}

// No size keeps half a percent over ten kilometres.
func TestMaxDropNoSize(t *testing.T) {
	for _, e := range tables.Editions() {
		c := longRun(e, "10000")
		c.MaxDrop = motor.Factor("0.5")
		r, err := motorcircuit.Size(c)
		var none *tables.NoSizeError
		require.ErrorAs(t, err, &none)
		assert.Equal(t, motorcircuit.Result{}, r)
		assert.NotEmpty(t, none.Constraint)
		if e.Code() == tables.CEC { // RW75 is made to 2000 kcmil, the end of the series
			assert.Equal(t, "max_drop_percent", none.Field)
		}
	}
}

// A least size of the caller's is told as an increase too.
func TestLeastSize(t *testing.T) {
	c := longRun(tables.NEC2023, "5")
	c.Wiring.Least = tables.Must(tables.ParseSize("4"))
	r := circuitOf(t, c)
	assert.Equal(t, []string{"4 AWG", "8 AWG"}, []string{r.Branch.Size.String(), r.BySize.String()})
	assert.True(t, told(r.Cautions, "larger than the 8 AWG"))
}

// dip is what a constant impedance loses over 8 AWG in steel (0.78 + j0.065 ohm
// by 1000 ft, NFPA 70 Chapter 9 Table 9), in percent.
func dip(amps, pf, metres float64) float64 {
	z, kft := 460/math.Sqrt(3)/amps, metres/304.8
	return 100 * (1 - z/math.Hypot(z*pf+0.78*kft, z*math.Sqrt(1-pf*pf)+0.065*kft))
}

// Starting across the line takes the locked-rotor current at its typical power
// factor (25 hp: 0.44), a wye-delta start a third of it; of the others nothing is
// told but that.
func TestStartingDrop(t *testing.T) {
	for _, e := range tables.Editions() {
		c := longRun(e, "60")
		c.Motor.Nameplate.LockedRotor = motor.Amps("183")
		r := circuitOf(t, c)
		require.Equal(t, "8 AWG", r.Branch.Size.String())
		assert.InDelta(t, dip(183, 0.44, 60), r.Drop.Starting.Float(), 0.011)
		assert.Greater(t, r.Drop.Starting.Float(), r.Drop.Running.Float())

		c.Motor.Starting = motor.WyeDelta
		third := circuitOf(t, c)
		assert.InDelta(t, dip(61, 0.44, 60), third.Drop.Starting.Float(), 0.011)
		assert.Equal(t, r.Drop.Running.String(), third.Drop.Running.String())

		for _, s := range []motor.Starting{motor.PartWinding, motor.Autotransformer, motor.Resistor, motor.SoftStarter, motor.Drive} {
			c.Motor.Starting = s
			if s == motor.Drive {
				c.Motor.Nameplate.DriveInput = motor.Amps("30")
			}
			other := circuitOf(t, c)
			assert.True(t, other.Drop.Starting.IsZero(), s.String())
			assert.True(t, told(other.Cautions, "no voltage drop starting"), s.String())
		}
	}
}

// The limits: 3 percent as advice under NEC 210.19, as a rule under CEC 8-102,
// and 5 percent running for a fire pump (NEC 695.7). The longest run is within.
func TestDropLimits(t *testing.T) {
	for _, e := range tables.Editions() {
		r := circuitOf(t, longRun(e, "60"))
		assert.Equal(t, "3 %", r.Drop.Limit.String())
		ref := "210.19, informational note"
		if e.Code() == tables.CEC {
			ref = "Rule 8-102"
		}
		assert.Equal(t, ref, r.Drop.Limit.Citation().Ref)
		c := longRun(e, r.Drop.LongestRun.Value().String())
		assert.LessOrEqual(t, circuitOf(t, c).Drop.Running.Cmp(r.Drop.Limit), 0, "the longest run keeps the limit")
		c.Wiring.Length = tables.Length{}
		assert.Equal(t, motorcircuit.VoltageDrop{}, circuitOf(t, c).Drop, "nothing without a length")
	}
	c := longRun(tables.NEC2023, "60")
	c.Motor.Use = motor.FirePump
	r := circuitOf(t, c)
	assert.Equal(t, "5 %", r.Drop.Limit.String())
	assert.Equal(t, "695.7", r.Drop.Limit.Citation().Ref)
}

// A nameplate's power factor is taken, and a direct-current motor has none.
func TestDropPowerFactor(t *testing.T) {
	c := longRun(tables.NEC2023, "60")
	assert.True(t, told(circuitOf(t, c).Cautions, "typical power factor, of three-phase motors: 0.89"))
	typical := circuitOf(t, c).Drop.Running
	c.Motor.Nameplate.PowerFactor = motor.Factor("0.6")
	r := circuitOf(t, c)
	assert.False(t, told(r.Cautions, "typical power factor"))
	assert.Less(t, r.Drop.Running.Float(), typical.Float(), "a run of resistance loses less to a reactive load")
	c = longRun(tables.NEC2023, "60")
	c.Motor = motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}
	r = circuitOf(t, c)
	// 10 hp at 240 V: 38 A, 8 AWG: 2 × 38 × 0.778 × 196.85 / 1000 / 240 = 4.85 %.
	assert.Equal(t, "4.85 %", r.Drop.Running.String())
	assert.True(t, r.Drop.Starting.IsZero())
}

// Fault duty: the source, four times full-load current of the motor (IEEE
// 141-1993 chapter 4), less at the motor, and a withstand time.
func TestFaultDuty(t *testing.T) {
	for _, e := range tables.Editions() {
		c := longRun(e, "60")
		assert.Equal(t, motorcircuit.FaultDuty{}, circuitOf(t, c).FaultDuty)
		c.Fault = motor.Amps("20918")
		d := circuitOf(t, c).FaultDuty
		assert.Equal(t, "20918 A", d.Source.String())
		assert.Equal(t, "136 A", d.Contribution.String())
		assert.True(t, told(circuitOf(t, c).Cautions, "bolted faults"))
		c.FaultXR = motor.Factor("5.79")
		ratio := circuitOf(t, c).FaultDuty
		assert.Less(t, ratio.AtMotor.Float(), d.AtMotor.Float(), "reactance alone gives the most")
		// 8 AWG, 0.78 × (1 - 50 × 0.00323) + j0.065 by 1000 ft, in series with the source.
		z, kft := 460/math.Sqrt(3)/20918, 60/304.8
		res := z / math.Hypot(1, 5.79)
		want := 460 / math.Sqrt(3) / math.Hypot(res+0.78*(1-50*0.00323)*kft, 5.79*res+0.065*kft) / 1000
		assert.InDelta(t, want, ratio.AtMotor.Float(), 0.011)
		// ICEA P-32-382, 75 to 150 °C copper, 16 510 cmil.
		assert.InDelta(t, math.Pow(0.05294*16510/20918, 2), d.Withstand.Float(), 0.001)
		c.Fault = motor.Amps("2000")
		assert.InEpsilon(t, math.Pow(0.05294*16510/2000, 2), circuitOf(t, c).FaultDuty.Withstand.Float(), 0.01)
		c.Wiring.Length = tables.Length{}
		assert.True(t, circuitOf(t, c).FaultDuty.AtMotor.IsZero(), "no length, no fault at its end")
	}
}

// The raceway holds the lines and the bonding conductor; a metal one may bond in
// its place, a flexible one not.
func TestRacewayOfACircuit(t *testing.T) {
	for _, e := range tables.Editions() {
		c := longRun(e, "60")
		r := circuitOf(t, c)
		want, err := conductor.SelectRaceway(e, tables.EMT, false,
			conductor.Pull{Insulation: r.Branch.Insulation, Size: r.Branch.Size, Count: 3},
			conductor.Pull{Insulation: r.Branch.Insulation, Size: r.Bonding.Size, Count: 1})
		require.NoError(t, err)
		assert.Equal(t, want.Name(e), r.Raceway.Name(e))
		assert.Equal(t, 4, r.Raceway.Conductors)
		assert.True(t, told(r.Cautions, "may be left out"))
		c.Wiring.Raceway = tables.FMC
		assert.True(t, told(circuitOf(t, c).Cautions, "flexible raceway does not bond"))
		c.Wiring.Raceway = tables.PVC40
		assert.False(t, told(circuitOf(t, c).Cautions, "bond unless"))
		c.Wiring.Raceway = 0
		assert.True(t, circuitOf(t, c).Raceway.IsZero())
	}
}

func TestPhysicalRefusals(t *testing.T) {
	for _, tt := range []struct {
		name   string
		change func(*motorcircuit.Circuit)
		field  string
	}{
		{"drop too small", func(c *motorcircuit.Circuit) { c.MaxDrop = motor.Factor("0.09") }, "max_drop_percent"},
		{"drop too large", func(c *motorcircuit.Circuit) { c.MaxDrop = motor.Factor("50.1") }, "max_drop_percent"},
		{"fault too small", func(c *motorcircuit.Circuit) { c.Fault = motor.Amps("0.9") }, "fault_amperes"},
		{"fault too large", func(c *motorcircuit.Circuit) { c.Fault = motor.Amps("300000.1") }, "fault_amperes"},
		{"too far", func(c *motorcircuit.Circuit) { c.Wiring.Length = conductor.Metres("10000.1") }, "wiring.length"},
		{"no such raceway", func(c *motorcircuit.Circuit) { c.Wiring.Raceway = 99 }, "wiring.raceway"},
		{"a raceway in free air", func(c *motorcircuit.Circuit) { c.Wiring.Run = tables.InFreeAir }, "wiring.raceway"},
		{"a metric least size", func(c *motorcircuit.Circuit) { c.Wiring.Least = tables.Must(tables.ParseSize("16 mm²")) }, "wiring.least_size"},
		{"IMC under the CEC", func(c *motorcircuit.Circuit) { c.Edition, c.Wiring.Raceway = tables.CEC2024, tables.IMC }, "wiring.raceway"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			c := longRun(tables.NEC2023, "60")
			tt.change(&c)
			r, err := motorcircuit.Size(c)
			require.ErrorContains(t, err, tt.field)
			assert.Equal(t, motorcircuit.Result{}, r)
			assert.ErrorContains(t, c.Validate(), tt.field)
			requireNamed(t, err)
		})
	}
	for _, most := range []string{"0.1", "50"} {
		c := longRun(tables.NEC2023, "5")
		c.MaxDrop = motor.Factor(most)
		assert.NoError(t, c.Validate(), "on the edge")
	}
}

// A drive with a bypass drops for the motor where that draws more: 30 hp at 460 V, 40
// A (Table 430.250), beside an input of 36 A.
func TestDropOfBypass(t *testing.T) {
	for _, e := range necEditions {
		c := cage("d", "30", 460, onDrive("36", "")).Circuit
		c.Edition, c.Wiring.Termination, c.Wiring.Length = e, 75, conductor.Metres("80")
		through, err := motorcircuit.Size(c)
		require.NoError(t, err)
		c.Motor.Bypass = true
		c.Wiring.Least = through.Branch.Size
		past, err := motorcircuit.Size(c)
		require.NoError(t, err)
		assert.Equal(t, "36 A", through.Drop.Running.Operands()[0].String())
		assert.Equal(t, "40 A", past.Drop.Running.Operands()[0].String())
	}
}
