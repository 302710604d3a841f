package motor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Continuous duty: 125 percent (NEC 430.22, 440.32; CEC 28-106(1), 28-706).
func TestContinuousAmpacity(t *testing.T) {
	torque := motor.Motor{Kind: motor.Torque, Voltage: 230, Nameplate: motor.Nameplate{Amperes: motor.Amps("12")}}
	for _, tt := range []struct {
		name      string
		editions  []tables.Edition
		m         motor.Motor
		want, ref string
	}{
		{"table current", necEditions, marked50(), "81.25 A", "430.22"},
		{"torque", necEditions, torque, "15 A", "430.22"},
		{"hermetic", necEditions, compressor("38", "40", ""), "50 A", "440.32"},
		{"nameplate", cecEditions, marked50(), "76.25 A", "Rule 28-106(1)"},
		{"table as a guide", cecEditions, cage50(), "81.25 A", "Rule 28-106(1)"},
		{"hermetic", cecEditions, compressor("38", "", ""), "47.5 A", "Rule 28-706"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				d := demand(t, tt.m, e)
				assert.Equal(t, tt.want, d.Branch.String())
				assert.Equal(t, tt.ref, ref(d.Branch))
				if e.Code() == tables.NEC || tt.m.Kind == motor.Hermetic {
					assert.True(t, d.Supply.IsZero(), "the run to the motor is not treated apart")
				} else { // 28-104 treats it apart, for the same amperes
					assert.Equal(t, tt.want, d.Supply.String())
					assert.Equal(t, tt.ref, ref(d.Supply))
				}
				assert.True(t, d.Secondary.IsZero())
			})
		}
	}
}

// NEC Table 430.22(E) and CEC Table 27 print the same percents, of the
// nameplate current: 61 A here.
func TestDutyAmpacity(t *testing.T) {
	for _, tt := range []struct {
		duty tables.Duty
		min  int
		want string
	}{
		{motor.ShortTime, 5, "67.1 A"}, // 110 %
		{motor.ShortTime, 15, "73.2 A"},
		{motor.ShortTime, 30, "91.5 A"},
		{motor.ShortTime, 60, "91.5 A"},
		{motor.Intermittent, 5, "51.85 A"}, // 85 %
		{motor.Intermittent, 15, "51.85 A"},
		{motor.Intermittent, 30, "54.9 A"},
		{motor.Intermittent, 60, "54.9 A"},
		{motor.Intermittent, 0, "85.4 A"}, // 140 %
		{motor.Periodic, 5, "51.85 A"},
		{motor.Periodic, 15, "54.9 A"},
		{motor.Periodic, 30, "57.95 A"}, // 95 %
		{motor.Periodic, 60, "57.95 A"},
		{motor.Periodic, 0, "85.4 A"},
		{motor.Varying, 5, "67.1 A"},
		{motor.Varying, 15, "73.2 A"},
		{motor.Varying, 30, "91.5 A"},
		{motor.Varying, 60, "91.5 A"},
		{motor.Varying, 0, "122 A"}, // 200 %
	} {
		for _, e := range tables.Editions() {
			m := marked50()
			m.Duty = motor.Duty{Kind: tt.duty, Minutes: tt.min}
			d := demand(t, m, e)
			assert.Equal(t, tt.want, d.Branch.String(), "%v, %d min, %v", tt.duty, tt.min, e)
			rule, table := "430.22(E)", "Table 430.22(E)"
			if e.Code() == tables.CEC {
				rule, table = "Rule 28-106(2)", "Table 27"
				assert.Equal(t, tt.want, d.Supply.String())
			}
			assert.Equal(t, rule, ref(d.Branch))
			assert.True(t, testkit.Rests(d.Branch, table))
		}
	}
}

// The blank cell: short-time duty of a motor rated for continuous running.
func TestDutyBlankCell(t *testing.T) {
	m := marked50()
	m.Duty.Kind = motor.ShortTime
	for _, e := range tables.Editions() {
		d, err := m.Demand(e)
		var blank *tables.NotTabulatedError
		require.ErrorAs(t, err, &blank)
		assert.Equal(t, "motor.duty.minutes", blank.Field)
		assert.Equal(t, motor.Demand{}, d)
	}
}

// Published example, exam guide to CEC-2024: 30 hp, 240 V, 80 A, intermittent
// duty, rated 5 minutes: 80 × 85 % = 68 A.
func TestDutyPublishedCEC(t *testing.T) {
	m := motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("30"), Voltage: 240, Duty: motor.Duty{Kind: motor.Intermittent, Minutes: 5}}
	assert.Equal(t, "68 A", demand(t, m, tables.CEC2024).Branch.String())
}

// Runs between controller and motor. With a duty that is not continuous the
// share of the winding is taken of the ampacity for the duty: 58 percent for
// wye-delta and 50 for part-winding, the shares inside 72 and 62.5 (common
// practice, no source).
func TestSharedWindings(t *testing.T) {
	intermittent := motor.Duty{Kind: motor.Intermittent, Minutes: 5}
	for _, tt := range []struct {
		name                      string
		editions                  []tables.Edition
		m                         motor.Motor
		start                     motor.Starting
		duty                      motor.Duty
		branch, supply, supplyRef string
	}{
		{"wye-delta", necEditions, cage50(), motor.WyeDelta, motor.Duty{}, "81.25 A", "46.8 A", "430.22(C)"},
		{"part-winding", necEditions, cage50(), motor.PartWinding, motor.Duty{}, "81.25 A", "40.625 A", "430.22(D)"},
		{"hermetic wye-delta", necEditions, compressor("38", "40", ""), motor.WyeDelta, motor.Duty{}, "50 A", "28.8 A", "440.32"},
		{"wye-delta, intermittent", necEditions, marked50(), motor.WyeDelta, intermittent, "51.85 A", "30.073 A", "430.22(C)"},
		{"part-winding, intermittent", necEditions, marked50(), motor.PartWinding, intermittent, "51.85 A", "25.925 A", "430.22(D)"},
		{"wye-delta", cecEditions, cage50(), motor.WyeDelta, motor.Duty{}, "81.25 A", "46.8 A", "Rule 28-106"},
		{"part-winding", cecEditions, cage50(), motor.PartWinding, motor.Duty{}, "81.25 A", "40.625 A", "Rule 28-804"},
		{"wye-delta, intermittent", cecEditions, marked50(), motor.WyeDelta, intermittent, "51.85 A", "30.073 A", "Rule 28-106"},
		{"part-winding, intermittent", cecEditions, marked50(), motor.PartWinding, intermittent, "51.85 A", "25.925 A", "Rule 28-804"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				m := tt.m
				m.Starting, m.Duty = tt.start, tt.duty
				d := demand(t, m, e)
				assert.Equal(t, tt.branch, d.Branch.String())
				assert.Equal(t, tt.supply, d.Supply.String())
				assert.Equal(t, tt.supplyRef, ref(d.Supply))
			})
		}
	}
}

// Drives. Check value of the rules: input 36 A, motor 30 hp at 460 V, 40 A. The
// NEC has a rule for the output conductors from 2020 on, 430.22 before; the CEC
// has none for drives (common practice).
func TestDriveAmpacity(t *testing.T) {
	m := motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("30"), Voltage: 460, Starting: motor.Drive}
	m.Nameplate.DriveInput = motor.Amps("36")
	for _, tt := range []struct {
		e                    tables.Edition
		branchRef, supplyRef string
	}{
		{tables.NEC2017, "430.122(A)", "430.22"},
		{tables.NEC2020, "430.122(A)", "430.122(B)"},
		{tables.NEC2023, "430.122(A)", "430.122(B)"},
		{tables.CEC2021, "Rule 28-106", "Rule 28-106(1)"},
		{tables.CEC2024, "Rule 28-106", "Rule 28-106(1)"},
	} {
		t.Run(tt.e.String(), func(t *testing.T) {
			d := demand(t, m, tt.e)
			assert.Equal(t, "36 A", d.Input.String())
			assert.Equal(t, "45 A", d.Branch.String())
			assert.Equal(t, tt.branchRef, ref(d.Branch))
			assert.Equal(t, "50 A", d.Supply.String())
			assert.Equal(t, tt.supplyRef, ref(d.Supply))
			// The duty is the motor's: it does not touch the drive's input.
			duty := m
			duty.Nameplate.Amperes = motor.Amps("38")
			duty.Duty = motor.Duty{Kind: motor.Intermittent, Minutes: 15}
			d = demand(t, duty, tt.e)
			assert.Equal(t, "45 A", d.Branch.String())
			assert.Equal(t, "32.3 A", d.Supply.String())
		})
	}
}

// Wound-rotor secondary, slip rings to controller: NEC 430.23(A), (B); CEC 28-112.
func TestSecondaryAmpacity(t *testing.T) {
	m := motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("40"), Voltage: 460}
	m.Nameplate.Secondary = motor.Amps("52")
	duty := m
	duty.Duty = motor.Duty{Kind: motor.Intermittent, Minutes: 30}
	for _, e := range tables.Editions() {
		refs := [2]string{"430.23(A)", "430.23(B)"}
		if e.Code() == tables.CEC {
			refs = [2]string{"Rule 28-112", "Rule 28-112"}
		}
		d := demand(t, m, e)
		assert.Equal(t, "65 A", d.Secondary.String(), "125 percent, %v", e)
		assert.Equal(t, refs[0], ref(d.Secondary))
		d = demand(t, duty, e)
		assert.Equal(t, "46.8 A", d.Secondary.String(), "90 percent, %v", e)
		assert.Equal(t, refs[1], ref(d.Secondary))
	}
}

// The common conductor of a three-wire two-phase circuit carries more: told.
func TestTwoPhaseCaution(t *testing.T) {
	m := motor.Motor{Kind: motor.SquirrelCage, Phases: 2, Power: motor.HP("10"), Voltage: 230}
	for _, e := range necEditions {
		assert.True(t, testkit.Cautioned(demand(t, m, e).Cautions, "Table 430.249", "1.41"))
		assert.False(t, testkit.Cautioned(demand(t, cage50(), e).Cautions, "Table 430.249", "1.41"))
	}
}
