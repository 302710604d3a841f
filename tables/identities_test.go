package tables_test

import (
	"math"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// The tests of this file are arithmetic that the published tables obey as a
// whole. Cells that were copied wrong by hand break it.

// powers are the rows of all the tables, least first.
var powers = strings.Fields("1/6 1/4 1/3 1/2 3/4 1 1-1/2 2 3 5 7-1/2 10 15 20 25 30 40 50 60 75 100 125 150 200 250 300 350 400 450 500")

// motorVolts are the columns of each table, in rated volts.
var motorVolts = map[tables.MotorTable][]int{
	tables.InductionTable:     {115, 200, 208, 230, 460, 575, 2300},
	tables.SynchronousTable:   {200, 230, 460, 575, 2300},
	tables.SinglePhaseTable:   {115, 200, 208, 230},
	tables.TwoPhaseTable:      {115, 230, 460, 575, 2300},
	tables.DirectCurrentTable: {90, 120, 180, 240, 500, 550},
}

// current returns a printed current, 0 where there is none.
func current(f tables.Figure, err error) float64 {
	if err != nil {
		return 0
	}
	x, _ := f.Value().Float64()
	return x
}

func hp(s string) tables.Power { return tables.Must(tables.ParseHP(s)) }

func TestCurrentRisesWithPowerAndFallsWithVoltage(t *testing.T) {
	cells := 0
	for _, e := range tables.Editions() {
		for table, columns := range motorVolts {
			above := make(map[int]float64)
			for _, p := range powers {
				left := 0.0
				for _, v := range columns {
					now := current(e.FullLoadCurrent(table, hp(p), v))
					if now == 0 {
						continue
					}
					cells++
					assert.Greater(t, now, above[v], "%v %v %s hp %d V, against the row above", e, table, p, v)
					if left > 0 {
						assert.Less(t, now, left, "%v %v %s hp %d V, against the column before", e, table, p, v)
					}
					above[v], left = now, now
				}
			}
		}
		for _, phases := range []int{1, 3} {
			above := make(map[int]float64)
			for _, p := range powers {
				for _, v := range motorVolts[tables.InductionTable] {
					if now := current(e.LockedRotorCurrent(phases, hp(p), v)); now > 0 {
						cells++
						assert.Greater(t, now, above[v], "%v locked rotor, %s hp %d V", e, p, v)
						above[v] = now
					}
				}
			}
		}
	}
	// Printed cells that are not blank: NFPA 70 368 of full load and 149 of
	// locked rotor, CSA C22.1 272 and 24 that the note of Table 45 derives.
	assert.Equal(t, 3*(368+149)+2*(272+24), cells)
}

// step is half of the last place that a table prints: a tenth below 10 A, for
// which it is also the last place of the odd tenth above.
func step(amperes float64) float64 {
	if amperes < 10 || amperes != math.Trunc(amperes) {
		return 0.05
	}
	return 0.5
}

// TestVoltageRatios holds columns against each other, within the rounding of
// both prints. Exceptions are printed so; their source stands beside them.
func TestVoltageRatios(t *testing.T) {
	exceptions := map[string]bool{
		// CSA C22.1 Table 44, page of the 2024 edition: 1, 1.4, 1.8 and 2.6 A at 460 V.
		"CEC induction 460 1/2": true, "CEC induction 460 3/4": true, "CEC induction 460 1": true, "CEC induction 460 1-1/2": true,
		"CEC induction 575 1/2": true, "CEC induction 575 3/4": true, "CEC induction 575 1": true, "CEC induction 575 1-1/2": true,
		// NFPA 70 Table 430.249: 7-1/2 hp at 460 V is printed 9.0 although half of 19 is 9.5.
		"NEC two-phase 460 7-1/2": true, "NEC two-phase 575 7-1/2": true,
		// NFPA 70 Table 430.250: 200 hp synchronous is printed 400, 201 A. 350 hp is printed 336 A at
		// 575 V in both codes, 0.8 of 420 A.
		"NEC synchronous 460 200": true, "NEC induction 575 350": true, "CEC induction 575 350": true,
	}
	names := map[tables.MotorTable]string{tables.InductionTable: "induction", tables.SynchronousTable: "synchronous",
		tables.TwoPhaseTable: "two-phase", tables.SinglePhaseTable: "single-phase"}
	met := make(map[string]bool)
	pairs := 0
	for _, e := range tables.Editions() {
		for table, name := range names {
			for _, p := range powers {
				for _, r := range []struct {
					volts, of int
					ratio     float64
				}{{115, 230, 2}, {200, 230, 1.15}, {208, 230, 1.10}, {460, 230, 0.5}, {575, 460, 0.8}} {
					got, of := current(e.FullLoadCurrent(table, hp(p), r.volts)), current(e.FullLoadCurrent(table, hp(p), r.of))
					if got == 0 || of == 0 {
						continue
					}
					pairs++
					key := strings.Join([]string{e.Code().String(), name, itoa(r.volts), p}, " ")
					off := math.Abs(got-r.ratio*of) > step(got)+step(of)*r.ratio+1e-9
					assert.Equal(t, exceptions[key], off, "%v %s: %v A against %v × %v A", e, key, got, r.ratio, of)
					met[key] = met[key] || off
				}
			}
		}
	}
	for key := range exceptions {
		assert.True(t, met[key], key)
	}
	assert.Greater(t, pairs, 900)
}

// TestLockedRotorRatios: one phase is six times full load (NFPA 70
// 430.110(C)(3)), save the cell that 2023 prints 1000; three phases stand in
// the inverse ratio of the voltages, in Table 430.251(B).
func TestLockedRotorRatios(t *testing.T) {
	for _, e := range []tables.Edition{tables.NEC2017, tables.NEC2020, tables.NEC2023} {
		for _, p := range powers[3:12] {
			for _, v := range []int{115, 208, 230} {
				full, rotor := current(e.FullLoadCurrent(tables.SinglePhaseTable, hp(p), v)), current(e.LockedRotorCurrent(1, hp(p), v))
				if e == tables.NEC2023 && p == "10" && v == 115 {
					assert.InDelta(t, 10*full, rotor, 0.001)
					continue
				}
				// The 208 V column is 230/208 of the 230 V one, full load 1.10 of it.
				assert.InEpsilon(t, 6*full, rotor, 0.02, "%v %s hp %d V", e, p, v)
			}
		}
		for _, p := range powers[3:] {
			at230 := current(e.LockedRotorCurrent(3, hp(p), 230))
			for _, v := range []int{115, 200, 208, 460, 575} {
				if rotor := current(e.LockedRotorCurrent(3, hp(p), v)); rotor > 0 && at230 > 0 {
					assert.InEpsilon(t, at230*230/float64(v), rotor, 0.015, "%v %s hp %d V", e, p, v)
				}
			}
			at460 := current(e.LockedRotorCurrent(3, hp(p), 460))
			assert.InEpsilon(t, 0.8*at460, current(e.LockedRotorCurrent(3, hp(p), 575)), 0.01, "%v %s hp", e, p)
		}
	}
}

// TestSinglePhaseNote: under the note of CSA C22.1 Table 45, 208 V motors take
// the 230 V current plus 10 percent and 200 V motors plus 15.
func TestSinglePhaseNote(t *testing.T) {
	for _, e := range []tables.Edition{tables.CEC2021, tables.CEC2024} {
		f, err := e.FullLoadCurrent(tables.SinglePhaseTable, hp("7-1/2"), 208)
		require.NoError(t, err)
		assert.Equal(t, "44 A", f.String())
		assert.Equal(t, "table current 40 A × 110 %", f.How())
		assert.Equal(t, e.Standard()+" Table 45", f.Citation().String())
		for _, g := range f.Operands() {
			assert.Equal(t, e.Standard()+" Table 45", g.Citation().String())
		}
		f, err = e.FullLoadCurrent(tables.SinglePhaseTable, hp("1/6"), 200)
		require.NoError(t, err)
		assert.Equal(t, "2.53 A", f.String(), "2.2 A × 1.15, not rounded: no rule says so")
	}
}

// TestCodeLetters: the ranges of NFPA 70 Table 430.7(B) follow each other at a
// distance of 0.01.
func TestCodeLetters(t *testing.T) {
	for _, e := range []tables.Edition{tables.NEC2017, tables.NEC2020, tables.NEC2023} {
		end := -0.01
		for letter := range strings.SplitSeq("ABCDEFGHJKLMNPRSTUV", "") {
			low, high, err := e.LockedRotorKVA(letter)
			require.NoError(t, err, letter)
			assert.InDelta(t, end+0.01, current(low, nil), 1e-9, letter)
			assert.Equal(t, letter == "V", high.IsZero(), letter)
			if !high.IsZero() {
				end = current(high, nil)
				assert.Greater(t, end, current(low, nil))
			}
		}
	}
}
