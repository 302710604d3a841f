package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// What Select chose is rated as it was chosen, and the next smaller size as it was
// told to fail.
func TestRateAgreesWithSelect(t *testing.T) {
	rated := 0
	grid(func(x trial) {
		for _, amps := range []string{"12", "48", "130", "420", "900"} {
			w := x.wiring()
			s, err := w.Select(x.e, load(amps))
			if err != nil {
				continue
			}
			rated++
			got, err := w.Rate(x.e, load(amps), s.Size, s.Sets)
			require.NoError(t, err)
			small := s.Smaller
			s.Smaller = conductor.Rejected{}
			require.Equal(t, s, got)
			if small.Ampacity.IsZero() {
				continue
			}
			got, err = w.Rate(x.e, load(amps), small.Size, s.Sets)
			require.NoError(t, err)
			require.Equal(t, small.Ampacity, got.Ampacity)
		}
	})
	assert.Greater(t, rated, 500)
}

// NFPA 70-2023 Table 310.16, CSA C22.1 Tables 2 and 4; terminals of 75 °C.
func TestRate(t *testing.T) {
	for _, tt := range []struct {
		e    tables.Edition
		w    conductor.Wiring
		size string
		sets int
		want string
		why  string
	}{
		{tables.NEC2023, conductor.Wiring{Insulation: "THWN-2", Termination: 75}, "6", 0, "65 A", "75 °C column"},
		{tables.NEC2023, conductor.Wiring{Insulation: "THWN-2", Termination: 75, Ambient: celsius("50")}, "6", 1, "61.5 A", "75 × 0.82 of the 90 °C column"},
		{tables.NEC2023, conductor.Wiring{Insulation: "THWN-2", Termination: 75}, "2/0", 3, "525 A", "3 × 175"},
		{tables.NEC2023, conductor.Wiring{Insulation: "THWN-2", Termination: 75}, "1/0", conductor.MaxSets, "1800 A", "12 × 150"},
		{tables.NEC2023, conductor.Wiring{Termination: 75, Least: size("1/0"), Sets: 5}, "12", 1, "25 A", "Least and Sets do not count"},
		{tables.NEC2023, conductor.Wiring{Termination: 75}, "16", 1, "", "no entry in the 75 °C column"},
		{tables.NEC2023, conductor.Wiring{Insulation: "THHN", Termination: 75}, "16", 1, "", "90 °C has one, the terminals' column none"},
		{tables.CEC2024, conductor.Wiring{Insulation: "RW90", Termination: 75, Material: conductor.Aluminum}, "4", 1, "65 A", "Table 4"},
		{tables.CEC2024, conductor.Wiring{Insulation: "RW90", Termination: 75, Conductors: 6}, "10", 1, "28 A", "35 × 80 %, Table 5C"},
	} {
		s, err := tt.w.Rate(tt.e, load("1"), size(tt.size), tt.sets)
		require.NoError(t, err)
		assert.Equal(t, tt.want, s.Ampacity.String(), tt.why)
		assert.Equal(t, max(tt.sets, 1), s.Sets)
		assert.Zero(t, s.Smaller.Size)
	}
}

func TestRateErrors(t *testing.T) {
	w := conductor.Wiring{Insulation: "THWN-2"}
	for _, tt := range []struct {
		size  tables.Size
		sets  int
		field string
	}{{0, 1, "size"}, {size("16 mm²"), 1, "size"}, {99, 1, "size"}, {size("1250"), 1, "size"}, {size("4"), -1, "sets"}, {size("4"), 13, "sets"}} {
		for _, rate := range []func() (conductor.Selection, error){
			func() (conductor.Selection, error) { return w.Rate(tables.NEC2023, load("5"), tt.size, tt.sets) },
			func() (conductor.Selection, error) {
				return w.RateMotorSupply(tables.NEC2023, load("5"), conductor.MotorEnd{}, tt.size, tt.sets)
			},
		} {
			s, err := rate()
			if err == nil || tables.FieldOf(err) != tt.field && tables.FieldOf(err) != "motor.nameplate.insulation_class" {
				t.Errorf("%v × %d: %v", tt.size, tt.sets, err)
			}
			assert.Equal(t, conductor.Selection{}, s)
		}
	}
	for _, bad := range []conductor.Wiring{{Insulation: "cloth"}, {Conductors: -1}} {
		_, err := bad.Rate(tables.NEC2023, load("5"), size("4"), 1)
		assert.Error(t, err)
		_, err = bad.RateMotorSupply(tables.CEC2024, load("5"), conductor.MotorEnd{}, size("4"), 1)
		assert.Error(t, err)
		_, _, err = bad.LeastSize(tables.NEC2023, 1)
		assert.Error(t, err)
	}
	_, err := w.Rate(0, load("5"), size("4"), 1)
	assert.Equal(t, "edition", tables.FieldOf(err))
}

// CEC Rule 28-104: by the 75 °C column whatever the insulation, 90 °C for 90 °C
// conductors of a Class A motor (Table 2: 65 and 75 A for 6 AWG); Table 37 asks a
// Class B motor for 90 °C.
func TestRateMotorSupply(t *testing.T) {
	w := conductor.Wiring{Insulation: "RW90"}
	for _, tt := range []struct {
		end  conductor.MotorEnd
		want string
	}{
		{conductor.MotorEnd{InsulationClass: "B"}, "65 A"}, {conductor.MotorEnd{InsulationClass: "A"}, "75 A"},
		{conductor.MotorEnd{InsulationClass: "A", Insulated: celsius("75")}, "65 A"},
	} {
		s, err := w.RateMotorSupply(tables.CEC2024, load("5"), tt.end, size("6"), 1)
		require.NoError(t, err)
		assert.Equal(t, tt.want, s.Ampacity.String(), "%+v", tt.end)
		assert.Equal(t, "RW90", s.Insulation)
	}
	s, err := conductor.Wiring{}.RateMotorSupply(tables.CEC2024, load("5"), conductor.MotorEnd{InsulationClass: "F"}, size("6"), 1)
	require.NoError(t, err)
	assert.Equal(t, "RW75", s.Insulation, "what is there, though the terminal box asks for more")
	assert.Positive(t, s.LeastRating.Cmp(tables.Whole("", tables.Celsius, 75)))
}

// NFPA 70 310.3(A), 310.106(A) and CSA C22.1 Rule 4-002: 14 AWG copper, 12 AWG
// aluminum; 310.10(G), (H) and Rule 12-108: 1/0 AWG in parallel.
func TestLeastSize(t *testing.T) {
	for _, e := range tables.Editions() {
		for _, tt := range []struct {
			m    tables.Material
			sets int
			want string
		}{{conductor.Copper, 0, "14"}, {conductor.Copper, 1, "14"}, {conductor.Aluminum, 1, "12"}, {conductor.Copper, 2, "1/0"}, {conductor.Aluminum, 4, "1/0"}} {
			least, cite, err := conductor.Wiring{Material: tt.m, Least: size("250")}.LeastSize(e, tt.sets)
			require.NoError(t, err)
			assert.Equal(t, tt.want, least.Name())
			assert.False(t, cite.IsZero())
		}
	}
}

// What SelectRaceway chose is rated as it was chosen, by either name of its size.
func TestRateRaceway(t *testing.T) {
	pulls := []conductor.Pull{{Insulation: "RW90", Size: size("4"), Count: 3}, {Insulation: "RW90", Size: size("8"), Count: 1}}
	want, err := conductor.SelectRaceway(tables.CEC2024, conductor.EMT, false, pulls...)
	require.NoError(t, err)
	assert.Equal(t, "Rule 12-910 and Table 8", want.Area.Citation().Ref)
	for _, trade := range []string{want.Trade, motor.HP(want.Trade).Text()} {
		got, err := conductor.RateRaceway(tables.CEC2024, conductor.EMT, trade, false, pulls...)
		require.NoError(t, err)
		assert.Equal(t, want, got)
	}
	sizes, err := tables.CEC2024.RacewaySizes(conductor.EMT)
	require.NoError(t, err)
	for _, s := range sizes {
		f, err := conductor.RateRaceway(tables.CEC2024, conductor.EMT, s.Trade, false, pulls...)
		require.NoError(t, err)
		assert.Equal(t, want.Area, f.Area)
		assert.Equal(t, s.Metric >= want.Metric, f.Area.Cmp(f.Limit) <= 0, s.Trade)
	}
	for _, tt := range []struct {
		kind  tables.Raceway
		trade string
		pulls []conductor.Pull
		field string
	}{{conductor.EMT, "7", pulls, "trade_size"}, {conductor.EMT, "", pulls, "trade_size"}, {99, "1", pulls, "wiring.raceway"}, {conductor.EMT, "1", nil, "wiring.raceway"},
		{conductor.EMT, "1", []conductor.Pull{{Insulation: "cloth", Size: size("4"), Count: 1}}, "wiring.insulation"}} {
		f, err := conductor.RateRaceway(tables.CEC2024, tt.kind, tt.trade, false, tt.pulls...)
		assert.Equal(t, tt.field, tables.FieldOf(err), "%v", err)
		assert.Equal(t, conductor.Filled{}, f)
	}
}
