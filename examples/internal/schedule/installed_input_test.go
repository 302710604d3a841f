package schedule

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"
)

// The names of the columns are a promise: those of the schedule but for the feeder,
// which is passed through, then those of what is installed.
func TestInstalledColumns(t *testing.T) {
	const stands = "flexible,branch_size,branch_sets,motor_supply_size,motor_supply_sets,motor_supply_insulation_c,secondary_size,resistor_size," +
		"overload_setting_a,overload_heater_a,overload_units,overload_share,hard_start,device_rating_a,instantaneous_a,interrupting_ka," +
		"disconnect_a,disconnect_power,disconnect_locked_rotor_a,disconnect_unfused,controller_a,controller_power,controller_locked_rotor_a," +
		"bonding_size,bonding_material,raceway_size,flexible_size"
	circuit, _ := strings.CutSuffix(strings.Join(namesOf(motors), ","), ",feeder")
	assert.Equal(t, circuit+","+stands, strings.Join(namesOf(installed), ","))
	for _, c := range installed.columns {
		for _, need := range strings.Fields(c.needs) {
			assert.GreaterOrEqual(t, installed.named(need), 0, c.name)
		}
	}
	for field, name := range elsewhere {
		assert.GreaterOrEqual(t, installed.named(name), 0, field)
	}
}

func TestInstalledBadHeader(t *testing.T) {
	for _, tt := range []struct{ name, text, says string }{
		{"empty file", "", "the file of installed circuits is empty"},
		{"a missing column", "tag,code,kind,volts,branch_size\n", "the header has no column power"},
		{"a column twice", "tag,code,kind,power,volts,branch_size,BRANCH_SIZE\n", "the header names column branch_size twice"},
	} {
		for _, format := range formatNames(reportFormats) {
			status, out, complaint := ranCheck(t, tt.text, "-format", format)
			assert.Equal(t, 2, status, tt.name)
			assert.Empty(t, out, tt.name)
			assert.Contains(t, complaint, "check: ", tt.name)
			assert.Contains(t, complaint, tt.says, tt.name)
		}
	}
}

// Cells that cannot stand. The fault is told in the words of the column.
func TestInstalledBadCells(t *testing.T) {
	cells := func(pairs ...string) map[string]string {
		m := map[string]string{}
		for i := 0; i < len(pairs); i += 2 {
			m[pairs[i]] = pairs[i+1]
		}
		return m
	}
	for _, tt := range []struct {
		cells map[string]string
		want  string
	}{
		{cells("tag", " "), `tag is not given: want a name for the circuit`},
		{cells("power", "5"), `power "5": want horsepower or kilowatts`},
		{cells("use", "sprinkler"), `use "sprinkler": want one of ordinary, fire_pump, valve_actuator`},
		{cells("kind", "dc", "volts", "240", "use", "fire_pump"), `use "fire_pump": want fire_pump only for`},
		{cells("resistor_duty", "heavy"), `resistor_duty "heavy": want one of light_starting`},
		{cells("resistor_duty", "heavy_starting"), `resistor_duty "heavy_starting": want only with a wound-rotor`},
		{cells("fault_ka", "400"), `fault_ka "400 kA": want 0.001 kA to 300 kA`},
		{cells("branch_size", "5"), `branch_size "5": want a size from 18 AWG`},
		{cells("branch_size", "16 mm²"), `branch_size "16 mm²": want an AWG or kcmil size`},
		{cells("branch_size", "2000", "insulation", "THHN"), `branch_size "2000 kcmil": want an AWG or kcmil size up to 1000 kcmil, the largest of THHN`},
		{cells("branch_size", "1/0", "branch_sets", "13"), `branch_sets "13": want 1 to 12`},
		{cells("branch_sets", "two"), `branch_sets "two": want a whole number`},
		{cells("motor_supply_size", "x"), `motor_supply_size "x": want a size`},
		{cells("motor_supply_size", "16 mm²"), `motor_supply_size "16 mm²": want an AWG or kcmil size`},
		{cells("motor_supply_sets", "-1"), `motor_supply_sets "-1": want 1 to 12`},
		{cells("motor_supply_insulation_c", "90"), `motor_supply_insulation_c "90 °C": want none but for motor supply conductors under the CEC`},
		{cells("motor_supply_insulation_c", "300", "code", "CEC-2024", "volts", "575"), `motor_supply_insulation_c "300 °C": want 60 to 250 °C`},
		{cells("secondary_size", "16 mm²"), `secondary_size "16 mm²": want an AWG`},
		{cells("resistor_size", "16 mm²"), `resistor_size "16 mm²": want an AWG`},
		{cells("overload_setting_a", "-1"), `overload_setting_a "-1": want a plain decimal in amperes`},
		{cells("overload_setting_a", "0"), `overload_setting_a "0 A": want above 0 A, at most 1000000 A`},
		{cells("overload_heater_a", "2000000"), `overload_heater_a "2000000 A": want above 0 A`},
		{cells("overload_units", "10"), `overload_units "10": want 1 to 9`},
		{cells("overload_share", "true"), `overload_share "true": want yes or no`},
		{cells("overload_share", "yes"), `overload_share "yes": want no but with a wye-delta or part-winding start`},
		{cells("hard_start", "1"), `hard_start "1": want yes or no`},
		{cells("device_rating_a", "20 kA"), `device_rating_a "20 kA": want a plain decimal in amperes`},
		{cells("device_rating_a", "0"), `device_rating_a "0 A": want above 0 A`},
		{cells("instantaneous_a", "0"), `instantaneous_a "0 A": want above 0 A`},
		{cells("interrupting_ka", "14 kA"), `interrupting_ka "14 kA": want a plain decimal in kiloamperes`},
		{cells("interrupting_ka", "65000"), `interrupting_ka "65000 kA": want above 0 kA, at most 1000 kA`},
		{cells("disconnect_a", "0"), `disconnect_a "0 A": want above 0 A`},
		{cells("disconnect_power", "40"), `disconnect_power "40": want horsepower or kilowatts`},
		{cells("disconnect_power", "200000 hp"), `disconnect_power "200000 hp": want `},
		{cells("disconnect_locked_rotor_a", "0"), `disconnect_locked_rotor_a "0 A": want above 0 A`},
		{cells("disconnect_unfused", "maybe"), `disconnect_unfused "maybe": want yes or no`},
		{cells("controller_a", "0"), `controller_a "0 A": want above 0 A`},
		{cells("controller_power", "x"), `controller_power "x": want horsepower or kilowatts`},
		{cells("controller_locked_rotor_a", "0"), `controller_locked_rotor_a "0 A": want above 0 A`},
		{cells("bonding_size", "16 mm²"), `bonding_size "16 mm²": want an AWG`},
		{cells("bonding_material", "steel"), `bonding_material "steel": want one of copper, aluminum`},
		{cells("raceway_size", "3/4"), `raceway is not given: want the type of the raceway whose trade size is given`},
		{cells("raceway_size", "1-3/4", "raceway", "EMT"), `raceway_size: NFPA 70-2023 Chapter 9 Table 4 has no EMT of trade size "1-3/4"; it covers 1/2 (16), 3/4 (21)`},
		{cells("flexible", "EMT"), `flexible "emt": want a flexible raceway`},
		{cells("flexible", "hose"), `flexible "hose": want one of emt`},
		{cells("flexible_size", "3/4"), `flexible is not given: want the type of the raceway whose trade size is given`},
		{cells("flexible_size", "9", "flexible", "LFMC"), `flexible_size: NFPA 70-2023 Chapter 9 Table 4 has no LFMC of trade size "9"`},
	} {
		status, rows := findings(t, fileWith(installed, tt.cells))
		assert.Equal(t, 1, status, "%v", tt.cells)
		require.Len(t, rows, 1, "%v", tt.cells)
		assert.True(t, strings.HasPrefix(rows[0]["error"], tt.want), "%s, want %s", rows[0]["error"], tt.want)
		assert.NotRegexp(t, `motor\.|wiring\.|installed\.`, rows[0]["error"])
	}
}

// Cells that mean the same.
func TestInstalledGoodCells(t *testing.T) {
	for _, tt := range []struct{ column, cell, same string }{
		{"branch_size", "#8", "8 AWG"}, {"hard_start", "YES", "yes"}, {"hard_start", "no", ""}, {"raceway_size", "21", "3/4"},
		{"device_rating_a", "20 A", "20"}, {"disconnect_power", "7.5 hp", "7-1/2 hp"}, {"branch_sets", "1", ""},
	} {
		cells := map[string]string{"branch_size": "8", "raceway": "EMT", "overload_setting_a": "10", tt.column: tt.cell}
		_, a := findings(t, fileWith(installed, cells), "-only", "note")
		cells[tt.column] = tt.same
		_, b := findings(t, fileWith(installed, cells), "-only", "note")
		assert.Equal(t, a, b, tt.column)
		assert.Greater(t, len(a), 2, tt.column)
	}
}

// What the cells of a switch, the share and the confirmation decide.
func TestInstalledFlags(t *testing.T) {
	severities := func(cells map[string]string) map[string]string {
		_, rows := findings(t, fileWith(installed, cells), "-only", "note")
		found := map[string]string{}
		for _, row := range rows {
			found[row["part"]+" "+row["finding"]] = row["severity"]
		}
		return found
	}
	// Table current 7.6 A; × 1.15 = 8.74 A, to × 1.3 = 9.88 A if the motor will not start (430.32).
	setting := map[string]string{"overload_setting_a": "9", "service_factor": "1"}
	assert.Equal(t, "caution", severities(setting)["overload.setting_amperes overload_setting"])
	setting["hard_start"] = "yes"
	assert.Equal(t, "note", severities(setting)["overload.setting_amperes overload_setting"])
	setting["starting"], setting["overload_share"] = "wye_delta", "yes" // 58 percent of 8.74 A
	assert.Equal(t, "violation", severities(setting)["overload.setting_amperes overload_setting"])
	// 430.110(A) Exception: a listed unfused switch of the motor's horsepower.
	unfused := map[string]string{"disconnect_a": "5", "disconnect_power": "5 hp"}
	assert.Equal(t, "violation", severities(unfused)["disconnecting_means.amperes switch_amperes"])
	unfused["disconnect_unfused"] = "yes"
	assert.NotContains(t, severities(unfused), "disconnecting_means.amperes switch_amperes")
	// Secondary 52 A × 1.25 and resistors 52 A × 0.35 (Table 430.23(C)): 8 AWG carries 40 A at 60 °C.
	wound := severities(map[string]string{"kind": "wound_rotor", "power": "30 hp", "secondary_amps": "52", "starting": "resistor", "resistor_duty": "light_starting", "secondary_size": "8", "resistor_size": "8"})
	assert.Equal(t, "violation", wound["secondary conductor_ampacity"])
	assert.Equal(t, "note", wound["resistor conductor_ampacity"])
}

// All faults of a row are told at once, in the order of the columns, and none that
// only follows from another.
func TestInstalledFaultsAtOnce(t *testing.T) {
	_, rows := findings(t, fileWith(installed, map[string]string{
		"raceway_size": "3/4", "raceway": "hose", "overload_share": "yes", "starting": "kick", "interrupting_ka": "9999", "branch_size": "x", "service_factor": "3",
	}))
	require.Len(t, rows, 1)
	var columns []string
	for _, fault := range strings.Split(rows[0]["error"], "; ") {
		name, _, _ := strings.Cut(fault, " ")
		columns = append(columns, name)
	}
	assert.Equal(t, []string{"service_factor", "starting", "raceway", "branch_size", "interrupting_ka"}, columns, rows[0]["error"])
}

// A cell of a megabyte is told shortened, in any column.
func TestInstalledLongCells(t *testing.T) {
	long := strings.Repeat("9", 1<<20)
	for _, c := range installed.columns {
		if c.name == "tag" { // which may be any text
			continue
		}
		_, rows := findings(t, fileWith(installed, map[string]string{"raceway": "EMT", "flexible": "LFMC", c.name: long}))
		require.Len(t, rows, 1, c.name)
		assert.True(t, strings.HasPrefix(rows[0]["error"], c.name), "%s: %s", c.name, clip(rows[0]["error"]))
		assert.Less(t, len(rows[0]["error"]), 1000, c.name)
	}
}

// A broken quote ends the reading, and rows that are not shaped as the header are
// told; the rows before are judged.
func TestInstalledBadRows(t *testing.T) {
	const start = "tag,code,kind,power,volts,branch_size\nP-1,NEC-2023,squirrel_cage,50 hp,460,14\nP-2,NEC-2023\n"
	status, rows := findings(t, start)
	assert.Equal(t, 1, status)
	require.Len(t, rows, 2)
	assert.Equal(t, "conductor_ampacity", rows[0]["finding"])
	assert.Equal(t, "row: 2 cells where the header names 6 columns", rows[1]["error"])
	for _, format := range formatNames(reportFormats) {
		status, out, complaint := ranCheck(t, start+"P 3\",NEC-2023,squirrel_cage,5 hp,460,14\n", "-format", format)
		assert.Equal(t, 2, status)
		assert.Contains(t, complaint, "line 4, column 4: bare")
		assert.Contains(t, out, "line 4, column 4: bare")
	}
	_, out, _ := ranCheck(t, start)
	assert.Contains(t, out, "P-2: not judged, line 3\n  - row: 2 cells")
	assert.True(t, strings.HasSuffix(out, "\n1 circuits judged, 1 with violations, 1 not judged\n"), out)
}
