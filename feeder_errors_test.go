package motorcircuit_test

import (
	"encoding/json"
	"errors"
	"fmt"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// refused sizes a feeder that must be refused, and returns the fields at fault by
// index of circuit; -1 is the feeder itself.
func refused(t *testing.T, f motorcircuit.Feeder) (map[int][]string, error) {
	t.Helper()
	r, err := motorcircuit.SizeFeeder(f)
	require.Error(t, err)
	require.Equal(t, motorcircuit.FeederResult{}, r, "with an error comes the zero result")
	return circuitFaults(err), err
}

func TestFeederRefusals(t *testing.T) {
	for _, tt := range []struct {
		name  string
		alter func(*motorcircuit.Feeder)
		want  map[int][]string
	}{
		{"no edition", func(f *motorcircuit.Feeder) { f.Edition = 0 }, map[int][]string{-1: {"edition"}}},
		{"no circuits", func(f *motorcircuit.Feeder) { f.Circuits = nil }, map[int][]string{-1: {"circuits"}}},
		{"another edition", func(f *motorcircuit.Feeder) { f.Circuits[1].Circuit.Edition = tables.NEC2017 }, map[int][]string{1: {"edition"}}},
		{"another code", func(f *motorcircuit.Feeder) { f.Circuits[0].Circuit.Edition = tables.CEC2024 }, map[int][]string{0: {"edition"}}},
		{"instantaneous feeder device", func(f *motorcircuit.Feeder) { f.Device = protection.InstantaneousBreaker }, map[int][]string{-1: {"device"}}},
		{"unknown feeder device", func(f *motorcircuit.Feeder) { f.Device = 99 }, map[int][]string{-1: {"device"}}},
		{"demand above 1", func(f *motorcircuit.Feeder) { f.Demand = motor.Factor("1.01") }, map[int][]string{-1: {"demand_factor"}}},
		{"demand of 0", func(f *motorcircuit.Feeder) { f.Demand = motor.Factor("0") }, map[int][]string{-1: {"demand_factor"}}},
		{"too much other load", func(f *motorcircuit.Feeder) { f.Other = motor.Amps("100000.1") }, map[int][]string{-1: {"other_load_amperes"}}},
		{"too much continuous load", func(f *motorcircuit.Feeder) { f.Continuous = motor.Amps("100001") }, map[int][]string{-1: {"continuous_load_amperes"}}},
		{"termination", func(f *motorcircuit.Feeder) { f.Wiring.Termination = 61 }, map[int][]string{-1: {"wiring.termination"}}},
		{"unknown line", func(f *motorcircuit.Feeder) { f.Circuits[1].Lines = "AC" }, map[int][]string{1: {"lines"}}},
		{"lines of three phases", func(f *motorcircuit.Feeder) { f.Circuits[0].Lines = "A" }, map[int][]string{0: {"lines"}}},
		{"another voltage", func(f *motorcircuit.Feeder) { f.Circuits[1].Circuit.Motor.Voltage = 230 }, map[int][]string{1: {"motor.voltage"}}},
		{"120 V on a 480 V feeder", func(f *motorcircuit.Feeder) { f.Circuits[1] = single("b", "2", 115, "A") }, map[int][]string{1: {"motor.voltage"}}},
		{"direct current", func(f *motorcircuit.Feeder) {
			f.Circuits[1].Circuit.Motor = motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}
		}, map[int][]string{1: {"motor.voltage"}}},
		{"120 V single-phase on direct current", func(f *motorcircuit.Feeder) {
			f.Circuits[0].Circuit.Motor = motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}
			f.Circuits[1] = single("b", "2", 115, "")
		}, map[int][]string{0: {"motor.voltage"}}},
		{"two phases", func(f *motorcircuit.Feeder) { f.Circuits[1].Circuit.Motor.Phases = 2 }, map[int][]string{1: {"motor.voltage"}}},
		{"drive group without a drive", func(f *motorcircuit.Feeder) { f.Circuits[1].DriveGroup = "D" }, map[int][]string{1: {"drive_group"}}},
		{"inputs of one drive differ", func(f *motorcircuit.Feeder) {
			f.Circuits = append(f.Circuits, drawing("v1", "20", onDrive("36", "D")), drawing("v2", "20", onDrive("35", "D")))
		}, map[int][]string{3: {"motor.nameplate.drive_input_amperes"}}},
		{"faults of every circuit", func(f *motorcircuit.Feeder) {
			f.Circuits[0].Circuit.Motor.Nameplate.ServiceFactor = motor.Factor("3")
			f.Circuits[0].Circuit.Device = 77
			f.Circuits[1].Circuit.Motor.Power = motor.HP("35")
		}, map[int][]string{0: {"motor.nameplate.service_factor", "device"}, 1: {"motor.power"}}},
	} {
		t.Run(tt.name, func(t *testing.T) {
			f := feeder(tables.NEC2023, cage("a", "50", 460), cage("b", "10", 460))
			tt.alter(&f)
			for i := range f.Circuits {
				if fc := &f.Circuits[i]; fc.Circuit.Edition == 0 {
					fc.Circuit.Edition = f.Edition
				}
			}
			got, err := refused(t, f)
			assert.Equal(t, tt.want, got, "%v", err)
		})
	}
}

// The faults of the feeder itself come together.
func TestFeederFaultsTogether(t *testing.T) {
	f := feeder(tables.NEC2023)
	f.Device, f.Demand, f.Wiring.Insulation = protection.InstantaneousBreaker, motor.Factor("2"), "RW90"
	got, _ := refused(t, f)
	assert.ElementsMatch(t, []string{"circuits", "device", "demand_factor", "wiring.insulation"}, got[-1])
}

func TestCircuitErrorNamesTheCircuit(t *testing.T) {
	f := feeder(tables.NEC2023, cage("a", "50", 460), cage("P-9", "35", 460))
	_, err := refused(t, f)
	var one *motorcircuit.CircuitError
	require.ErrorAs(t, err, &one)
	assert.Equal(t, 1, one.Index)
	assert.Equal(t, "P-9", one.Tag)
	assert.True(t, strings.HasPrefix(one.Error(), `circuits[1] "P-9": motor.power: `), one.Error())
	var none *tables.NotTabulatedError
	assert.True(t, errors.As(one, &none), "the circuit's own error is inside")
}

// Voltages that one feeder can have: columns of one nominal system, and 120 V
// single-phase on the neutral of a 208 or 240 V feeder.
func TestFeederVoltages(t *testing.T) {
	for _, tt := range []struct {
		editions []tables.Edition
		system   int
		other    motorcircuit.FeederCircuit
	}{
		{everyone, 208, single("a", "2", 115, "A")}, {everyone, 208, single("a", "2", 120, "C")}, {everyone, 240, single("a", "2", 115, "")},
		{everyone, 230, cage("a", "2", 240)}, {everyone, 200, cage("a", "2", 208)}, {everyone, 480, cage("a", "2", 460)}, {everyone, 600, cage("a", "2", 575)},
		{everyone, 208, single("a", "2", 208, "AB")}, {everyone, 240, single("a", "2", 230, "BC")},
		{necEditions, 240, single("a", "2", 110, "")}, {necEditions, 480, cage("a", "2", 440)}, {necEditions, 230, single("a", "2", 220, "BC")}, // system volts that only the NEC names
	} {
		for _, e := range tt.editions {
			r := sized(t, feeder(e, cage("pump", "10", tt.system), tt.other))
			assert.Len(t, r.Circuits, 2)
		}
	}
	// Without three phases, the highest voltage names the system.
	got, _ := refused(t, feeder(tables.NEC2023, single("a", "2", 115, ""), single("b", "2", 208, ""), single("c", "2", 230, "")))
	assert.Equal(t, map[int][]string{1: {"motor.voltage"}}, got)
}

// More than 4096 combinations of interlocks are refused, 4096 are not.
func TestFeederInterlockCombinations(t *testing.T) {
	build := func(interlocks int) motorcircuit.Feeder {
		f := feeder(tables.NEC2023)
		for i := range interlocks {
			for _, alternative := range []string{"1", "2"} {
				fc := drawing(fmt.Sprint("m", i, alternative), "5", locked(fmt.Sprint("x", i), alternative))
				fc.Circuit.Edition = f.Edition
				f.Circuits = append(f.Circuits, fc)
			}
		}
		return f
	}
	r := sized(t, build(12))
	assert.Equal(t, "61.25 A", r.Ampacity.String(), "6.25 + 11 × 5")
	got, err := refused(t, build(13))
	assert.Equal(t, map[int][]string{-1: {"circuits"}}, got)
	assert.Contains(t, err.Error(), "4096")
}

// A feeder survives its JSON form.
func TestFeederJSON(t *testing.T) {
	f := feeder(tables.CEC2024, drawing("a", "40", startsWith("s"), locked("x", "1"), hardStart), drawing("v", "20", onDrive("18", "D")), drawing("b", "10", startsWith("s")))
	f.Device, f.Demand, f.Continuous, f.Other = protection.InverseTimeBreaker, motor.Factor("0.9"), motor.Amps("4"), motor.Amps("3")
	b, err := json.Marshal(f)
	require.NoError(t, err)
	var back motorcircuit.Feeder
	require.NoError(t, json.Unmarshal(b, &back))
	assert.Equal(t, f, back)
	out, err := json.Marshal(sized(t, f))
	require.NoError(t, err)
	for _, want := range []string{`"terms":`, `"governs":"a"`, `"largest_device":"a"`, `"start_limit"`, `"bonding"`} {
		assert.Contains(t, string(out), want)
	}
}
