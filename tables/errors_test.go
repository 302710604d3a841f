package tables_test

import (
	"encoding/json"
	"errors"
	"fmt"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func TestErrorTexts(t *testing.T) {
	cite := tables.Citation{Edition: tables.NEC2023, Ref: "Table 430.250"}
	for _, tt := range []struct {
		err  error
		want string
	}{
		{&tables.InputError{Field: "motor.power", Value: "x", Want: "a power"}, `motor.power "x": want a power`},
		{&tables.InputError{Field: "motor.power", Want: "a power", Cite: cite}, `motor.power is not given: want a power [NFPA 70-2023 Table 430.250]`},
		{&tables.NotTabulatedError{Field: "motor.power", Table: cite, Row: "51 hp", Col: "460 V", Covers: "50 and 60 hp"},
			"motor.power: NFPA 70-2023 Table 430.250 has no 51 hp at 460 V; it covers 50 and 60 hp"},
		{&tables.NotTabulatedError{Field: "motor.kind", Table: cite, Row: "row", Covers: "others"}, "motor.kind: NFPA 70-2023 Table 430.250 has no row; it covers others"},
		{&tables.NoSizeError{Field: "wiring", Constraint: "no conductor is large enough"}, "wiring: no conductor is large enough"},
		{&tables.NoSizeError{Field: "wiring", Constraint: "no conductor is large enough", Need: amps("900"), Cite: cite},
			"wiring: current 900 A: no conductor is large enough [NFPA 70-2023 Table 430.250]"},
	} {
		assert.EqualError(t, tt.err, tt.want)
	}
	joined := errors.Join(&tables.InputError{Field: "a"}, &tables.NotTabulatedError{Field: "b"}, &tables.NoSizeError{Field: "c"})
	assert.ErrorAs(t, joined, new(*tables.InputError))
	assert.ErrorAs(t, joined, new(*tables.NotTabulatedError))
	assert.ErrorAs(t, joined, new(*tables.NoSizeError))
}

func TestFaults(t *testing.T) {
	a, b, c := &tables.InputError{Field: "a"}, &tables.NotTabulatedError{Field: "b"}, &tables.NoSizeError{Field: "c"}
	plain := errors.New("of no field")
	var fields []string
	for _, one := range tables.Faults(errors.Join(errors.Join(a, b), plain, fmt.Errorf("wrapped: %w", c))) {
		fields = append(fields, tables.FieldOf(one))
	}
	assert.Equal(t, []string{"a", "b", "", "c"}, fields)
	assert.Equal(t, []error{a}, tables.Faults(a))
	assert.Empty(t, tables.Faults(nil))
	assert.Empty(t, tables.FieldOf(nil))
}

func TestCaution(t *testing.T) {
	plain := tables.Caution{Text: "check the nameplate"}
	assert.Equal(t, "check the nameplate", plain.String())
	cited := tables.Caution{Text: "check the nameplate", Cite: tables.Citation{Edition: tables.NEC2023, Ref: "430.6"}}
	assert.Equal(t, "check the nameplate [NFPA 70-2023 430.6]", cited.String())
	text, err := json.Marshal([]tables.Caution{plain, cited})
	require.NoError(t, err)
	assert.Equal(t, `[{"text":"check the nameplate"},{"text":"check the nameplate","cite":"NFPA 70-2023 430.6"}]`, string(text))
}

// TestWhatTablesLack: a question that a table does not answer is told, with
// what the table covers.
func TestWhatTablesLack(t *testing.T) {
	n, c := tables.NEC2023, tables.CEC2024
	for _, tt := range []struct {
		ask  func() (tables.Figure, error)
		want string
	}{
		{func() (tables.Figure, error) { return n.FullLoadCurrent(tables.InductionTable, hp("51"), 460) }, "motor.power: NFPA 70-2023 Table 430.250 has no 51 hp at 460 V; it covers 1/2, 3/4, 1, 1-1/2, 2, 3, 5, 7-1/2, 10, 15, 20, 25, 30, 40, 50, 60, 75, 100, 125, 150, 200, 250, 300, 350, 400, 450, 500 hp"},
		{func() (tables.Figure, error) {
			return n.FullLoadCurrent(tables.InductionTable, tables.Must(tables.ParseKW("50")), 2300)
		}, "motor.power: NFPA 70-2023 Table 430.250 has no 50 kW at 2300 V; it covers 60, 75, 100, 125, 150, 200, 250, 300, 350, 400, 450, 500 hp"},
		{func() (tables.Figure, error) { return c.FullLoadCurrent(tables.SynchronousTable, tables.Power{}, 200) }, "motor.power: CSA C22.1:24 Table 44 has no motor without a power at 200 V; it covers 25, 30, 40, 50, 60, 75, 100, 125 hp"},
		{func() (tables.Figure, error) { return n.FullLoadCurrent(tables.InductionTable, hp("50"), 400) }, "motor.voltage: NFPA 70-2023 Table 430.250 has no 50 hp at 400 V; it covers 115 (110 to 120), 200, 208, 230 (220 to 240), 460 (440 to 480), 575 (550 to 600), 2300 V"},
		{func() (tables.Figure, error) { return c.FullLoadCurrent(tables.SinglePhaseTable, hp("1"), 460) }, "motor.voltage: CSA C22.1:24 Table 45 has no 1 hp at 460 V; it covers 115 (115 to 120), 230 (230 to 240), 200, 208 V"},
		{func() (tables.Figure, error) { return c.FullLoadCurrent(tables.TwoPhaseTable, hp("1"), 230) }, "motor.kind: CSA C22.1:24 Section 28 has no table for two-phase motors; it covers three-phase, single-phase and direct-current motors"},
		{func() (tables.Figure, error) { return c.LockedRotorCurrent(3, hp("1"), 230) }, "motor.kind: CSA C22.1:24 Section 28 has no table of locked-rotor current; it covers six times full-load current for a motor that is not marked"},
		{func() (tables.Figure, error) { return n.LockedRotorCurrent(0, hp("1"), 230) }, "motor.phases: NFPA 70-2023 Table 430.251(B) has no direct-current motor; it covers one-, two- and three-phase motors"},
		{func() (tables.Figure, error) { return n.DutyPercent(tables.ShortTime, 0) }, "motor.duty.minutes: NFPA 70-2023 Table 430.22(E) has no figure for short-time duty at a motor rated for continuous running; it covers motors rated 5, 15, 30 and 60 minutes"},
		{func() (tables.Figure, error) { return n.DutyPercent(tables.ShortTime, 10) }, `motor.duty.minutes "10": want 5, 15, 30 or 60, or 0 for a motor rated for continuous running [NFPA 70-2023 Table 430.22(E)]`},
		{func() (tables.Figure, error) { return n.DutyPercent(tables.Continuous, 5) }, `motor.duty.kind "continuous": want short_time, intermittent, periodic or varying [NFPA 70-2023 Table 430.22(E)]`},
		{func() (tables.Figure, error) { return c.DutyPercent(tables.Duty(9), 5) }, `motor.duty.kind is not given: want short_time, intermittent, periodic or varying [CSA C22.1:24 Table 27]`},
		{func() (tables.Figure, error) { return n.OverloadUnits(4) }, "motor.phases: NFPA 70-2023 Table 430.37 has no 4-phase motor; it covers dc, one-, two- and three-phase motors"},
		{func() (tables.Figure, error) { return n.SupplyInsulation("B", false) }, "motor.nameplate.insulation_class: NFPA 70-2023 Article 430 has no table of supply conductor insulation; it covers no such case"},
		{func() (tables.Figure, error) { return c.SupplyInsulation("E", false) }, `motor.nameplate.insulation_class "E": want A, B, F or H [CSA C22.1:24 Table 37]`},
		{func() (tables.Figure, error) { return n.CountFactor(0) }, `wiring.conductors "0": want a count from 1 conductors [NFPA 70-2023 Table 310.15(C)(1)]`},
		{func() (tables.Figure, error) { return n.SpacingFactor(3) }, "wiring.run: NFPA 70-2023 Article 310 has no factor by spacing in free air; it covers conductors bundled or spaced"},
		{func() (tables.Figure, error) {
			return c.DevicePercent(tables.DeviceQuery{Device: tables.InstantaneousBreaker, Motor: tables.CageType})
		}, "device: CSA C22.1:24 Table 29 has no percent for instantaneous_breaker; it covers fuses and breakers for every type of motor"},
	} {
		f, err := tt.ask()
		assert.EqualError(t, err, tt.want)
		assert.True(t, f.IsZero(), "an error comes with the zero figure")
	}
	_, err := n.FullLoadCurrent(tables.MotorTable(9), hp("1"), 230)
	assert.ErrorAs(t, err, new(*tables.NotTabulatedError))
	_, err = c.CountFactor(-1)
	assert.ErrorAs(t, err, new(*tables.InputError))
	for _, count := range []int{1, 5} {
		_, err = c.SpacingFactor(count)
		assert.ErrorAs(t, err, new(*tables.InputError), "%d conductors", count)
	}
	_, err = n.Ampacities(tables.Run(9), tables.Copper)
	assert.EqualError(t, err, `wiring.run "9": want raceway, cable or free_air`)
	_, err = n.Ampacities(tables.InRaceway, tables.Material(9))
	assert.EqualError(t, err, `wiring.material "9": want copper or aluminum`)
	for _, letter := range []string{"", "I", "O", "Q", "W", "AA", "5", "É"} {
		low, high, err := n.LockedRotorKVA(letter)
		assert.ErrorAs(t, err, new(*tables.InputError), letter)
		assert.True(t, low.IsZero() && high.IsZero())
	}
}
