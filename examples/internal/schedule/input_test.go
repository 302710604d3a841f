package schedule

import (
	"errors"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// Headers that end the program before any row.
func TestBadHeader(t *testing.T) {
	for _, tt := range []struct{ name, schedule, says string }{
		{"empty file", "", "the schedule is empty"},
		{"byte order mark alone", "\uFEFF", "the schedule is empty"},
		{"blank lines", "\n\n\n", "the schedule is empty"},
		{"a missing column", "tag,code,kind,volts\nP-1,NEC-2023,dc,120\n", "the header has no column power"},
		{"no header", "P-1,NEC-2023,dc,1 hp,120\n", "the header has no column tag, code, kind, power, volts"},
		{"semicolons", "tag;code;kind;power;volts\n", "the header has no column tag, code"},
		{"a column twice", "tag,code,kind,power,volts,Power ,zone\n", "the header names column power twice"},
		{"a later column twice", "tag,code,kind,power,volts,length_m,length_m\n", "the header names column length_m twice"},
		{"missing and twice", "tag,tag,code,kind,power\n", "the header has no column volts"},
		{"a broken quote", "tag,\"code,kind\n", "line 1, column 16: extraneous or missing"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			for _, format := range formatNames(formats) {
				status, out, complaint := ran(t, tt.schedule, "-format", format)
				assert.Equal(t, 2, status)
				assert.Empty(t, out)
				assert.Contains(t, complaint, tt.says)
			}
		})
	}
}

// Forms of a file that are all right.
func TestGoodInput(t *testing.T) {
	const header, row = "tag,code,kind,power,volts", "P-1,NEC-2023,squirrel_cage,5 hp,460"
	_, plain := records(t, header+"\n"+row+"\n")
	require.Equal(t, "7.6", plain[0]["table_current_a"])
	for _, tt := range []struct{ name, schedule string }{
		{"byte order mark", "\uFEFF" + header + "\n" + row + "\n"},
		{"carriage returns", header + "\r\n" + row + "\r\n"},
		{"no last line end", header + "\n" + row},
		{"blank lines", header + "\n\n" + row + "\n\n"},
		{"letter case and spaces", " Tag,CODE , Kind,pOwer,\tVolts\n" + row + "\n"},
		{"spaces in cells", header + "\n P-1 ,nec-2023 , Squirrel Cage,5  HP, 460 \n"},
		{"every cell quoted", header + "\n\"P-1\",\"NEC-2023\",\"squirrel_cage\",\"5 hp\",\"460\"\n"},
		{"quoted line end", header + "\nP-1,NEC-2023,squirrel_cage,\"5 hp\n\",460\n"},
		{"empty optional cells", header + ",duty,starting,conductor,device,phases,ambient_c,length_m\n" + row + ",,,,,,,\n"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			status, out, _ := ran(t, tt.schedule, "-format", "csv")
			assert.Equal(t, 0, status)
			assert.Equal(t, plain, byName(t, out))
		})
	}
}

func TestPassedThrough(t *testing.T) {
	_, out, _ := ran(t, "room,tag,code,kind,power,volts,,Panel \n\"Hall \"\"A\"\",\nwest\",P-1,NEC-2023,squirrel_cage,5 hp,460,x, MCC-1\nB,P-2,NEC-2023,squirrel_cage,5,460,y,\n", "-format", "csv")
	header, _, _ := strings.Cut(out, "\n")
	assert.True(t, strings.HasSuffix(header, ",cautions,room,,Panel "))
	rows := byName(t, out)
	require.Len(t, rows, 2)
	assert.Equal(t, "Hall \"A\",\nwest", rows[0]["room"])
	assert.Equal(t, " MCC-1", rows[0]["Panel "], "as it stands in the file")
	assert.Equal(t, "B", rows[1]["room"], "of a bad row too")
	assert.Equal(t, "y", rows[1][""])
}

// Cells that cannot stand. The fault is told in the words of the column.
func TestBadCells(t *testing.T) {
	for _, tt := range []struct{ column, cell, want string }{
		{"tag", " ", `tag is not given: want a name for the motor`},
		{"code", "NEC-2026", `code "NEC-2026": want one of NEC-2017, NEC-2020, NEC-2023, CEC-2021, CEC-2024`},
		{"kind", "linear", `kind "linear": want one of squirrel_cage, single_phase, wound_rotor, synchronous, dc, torque, hermetic`},
		{"kind", "", `kind is not given`},
		{"power", "", `power is not given: want rated output such as "7-1/2 hp" or "30 kW", or else nameplate_amps`},
		{"power", "10", `power "10": want horsepower or kilowatts`},
		{"power", "1e9 hp", `power "1e9 hp": want horsepower or kilowatts`},
		{"power", "-5 hp", `power "-5 hp"`},
		{"power", "٥ hp", `power "٥ hp"`},
		{"power", "51 hp", `power: NFPA 70-2023 Table 430.250 has no 51 hp at 460 V; it covers`},
		{"volts", "", `volts is not given: want rated volts`},
		{"volts", "460 V", `volts "460 V": want a whole number`},
		{"volts", "460.0", `volts "460.0": want a whole number`},
		{"volts", "٥", `volts "٥": want a whole number in the digits 0 to 9`},
		{"volts", "+460", `volts "+460": want a whole number`},
		{"volts", "-460", `volts "-460": want rated volts from 1`},
		{"volts", "1e9", `volts "1e9": want a whole number`},
		{"volts", "99999999999999999999", `volts "99999999999999999999": want a whole number`},
		{"volts", "4160", `volts "4160": want 1000 V or less`},
		{"volts", "333", `volts: NFPA 70-2023 Table 430.250 has no`},
		{"phases", "4", `phases "4": want 2 or 3`},
		{"nameplate_amps", "-1", `nameplate_amps "-1": want a plain decimal in amperes`},
		{"nameplate_amps", "1e9", `nameplate_amps "1e9": want a plain decimal in amperes`},
		{"nameplate_amps", "٥", `nameplate_amps "٥": want a plain decimal in amperes`},
		{"nameplate_amps", "0", `nameplate_amps "0 A": want above 0 A`},
		{"nameplate_amps", "1,5", `nameplate_amps "1,5": want a plain decimal in amperes`},
		{"service_factor", "3", `service_factor "3": want 1 to 2`},
		{"temperature_rise_c", "500", `temperature_rise_c "500 °C": want 10 to 180 °C`},
		{"power_factor", "1.2", `power_factor "1.2": want above 0, at most 1`},
		{"efficiency", "93", `efficiency "93": want above 0, below 1`},
		{"efficiency", "93%", `efficiency "93%": want a plain decimal`},
		{"speed_rpm", "-1750", `speed_rpm "-1750": want 1 to 60000`},
		{"code_letter", "Z", `code_letter "Z"`},
		{"design_letter", "E", `design_letter "E": want A, B, C or D`},
		{"locked_rotor_amps", "x", `locked_rotor_amps "x": want a plain decimal in amperes`},
		{"secondary_amps", "30", `secondary_amps "30 A": want only on a wound-rotor motor`},
		{"branch_selection_amps", "30", `branch_selection_amps "30 A": want only on a hermetic`},
		{"duty", "sometimes", `duty "sometimes": want one of continuous, short_time, intermittent, periodic, varying`},
		{"duty_minutes", "30", `duty_minutes "30": want none for continuous duty`},
		{"starting", "kick", `starting "kick": want one of across_the_line, wye_delta`},
		{"starting", "drive", `drive_input_amps is not given: want the drive's rated input current`},
		{"drive_input_amps", "20", `drive_input_amps "20 A": want only with starting "drive"`},
		{"device", "wire", `device "wire": want one of non_time_delay_fuse`},
		{"conductor", "silver", `conductor "silver": want one of copper, aluminum`},
		{"insulation", "RW90", `insulation "RW90": want one of TW, THW`},
		{"termination_c", "70", `termination_c "70": want 60, 75 or 90 °C`},
		{"ambient_c", "300", `ambient_c "300 °C": want -60 to 150 °C`},
		{"ambient_c", "90", `ambient_c: NFPA 70-2023 Table 310.15(B)(1)(1) has no`},
		{"conductors_in_raceway", "2", `conductors_in_raceway "2": want at least the circuit's own 3`},
		{"conductors_in_raceway", "-3", `conductors_in_raceway "-3": want 1 to 1000`},
	} {
		t.Run(tt.column+" "+tt.cell, func(t *testing.T) {
			status, rows := records(t, scheduleWith(map[string]string{tt.column: tt.cell}))
			assert.Equal(t, 1, status)
			require.Len(t, rows, 1)
			assert.True(t, strings.HasPrefix(rows[0]["error"], tt.want), rows[0]["error"])
			assert.NotRegexp(t, `motor\.|wiring\.`, rows[0]["error"])
			for name, cell := range rows[0] {
				if name != "tag" && name != "code" && name != "error" {
					assert.Empty(t, cell, name)
				}
			}
		})
	}
}

// scheduleWith is a schedule of one good row but for the given cells.
func scheduleWith(cells map[string]string) string {
	return fileWith(motors, cells)
}

// fileWith is a file of one good row but for the given cells.
func fileWith[T any](of *layout[T], cells map[string]string) string {
	row := map[string]string{"tag": "P-1", "code": "NEC-2023", "kind": "squirrel_cage", "power": "5 hp", "volts": "460"}
	for name, cell := range cells {
		row[name] = cell
	}
	var names, values []string
	for _, c := range of.columns {
		if c.must || row[c.name] != "" {
			names = append(names, c.name)
			values = append(values, `"`+row[c.name]+`"`)
		}
	}
	return strings.Join(names, ",") + "\n" + strings.Join(values, ",") + "\n"
}

// All faults of a row are told at once, in the order of the columns, and none
// that only follows from another.
func TestAllFaultsAtOnce(t *testing.T) {
	for _, tt := range []struct {
		name  string
		cells map[string]string
		want  []string // how each begins
	}{
		{"a marking and a table", map[string]string{"service_factor": "3", "power": "900 hp"},
			[]string{`power: NFPA 70-2023 Table 430.250 has no 900 hp`, `service_factor "3"`}},
		{"words and numbers", map[string]string{"code": "x", "kind": "y", "power": "z", "volts": "v", "device": "w"},
			[]string{`code "x"`, `kind "y"`, `power "z"`, `volts "v"`, `device "w"`}},
		{"an unread word hides what rests on it", map[string]string{"starting": "VFD", "drive_input_amps": "20", "duty": "on and off", "duty_minutes": "30"},
			[]string{`duty "on and off"`, `starting "VFD"`}},
		{"amperes that cannot be read stand for the power", map[string]string{"nameplate_amps": "about 700", "power": "600 hp"},
			[]string{`nameplate_amps "about 700"`}},
		{"a voltage that no table has", map[string]string{"volts": "333", "power": "51 hp", "conductors_in_raceway": "2", "locked_rotor_amps": "0.5"},
			[]string{`volts:`, `conductors_in_raceway "2"`}},
		{"no power and a device for others", map[string]string{"kind": "torque", "power": "", "device": "instantaneous_breaker", "ambient_c": "90"},
			[]string{`nameplate_amps is not given`, `device "instantaneous_breaker"`, `ambient_c:`}},
		{"wiring and motor", map[string]string{"efficiency": "1.2", "ambient_c": "90", "termination_c": "61", "power": "51 hp"},
			[]string{`power:`, `efficiency "1.2"`, `termination_c "61"`, `ambient_c:`}},
	} {
		t.Run(tt.name, func(t *testing.T) {
			_, out, _ := ran(t, scheduleWith(tt.cells))
			var got []string
			for line := range strings.Lines(out) {
				if fault, ok := strings.CutPrefix(line, "  - "); ok {
					got = append(got, fault)
				}
			}
			require.Len(t, got, len(tt.want), out)
			for i, want := range tt.want {
				assert.True(t, strings.HasPrefix(got[i], want), "%s, want %s", got[i], want)
			}
			_, rows := records(t, scheduleWith(tt.cells))
			assert.Equal(t, strings.ReplaceAll(strings.Join(got, "; "), "\n", ""), rows[0]["error"])
		})
	}
}

// A row that is not shaped as the header is bad; the rest go on.
func TestBadRows(t *testing.T) {
	const header, good = "tag,code,kind,power,volts,zone\n", "P-%,NEC-2023,squirrel_cage,5 hp,460,A\n"
	status, rows := records(t, header+"P-1,NEC-2023,squirrel_cage\n"+good+"P-3,NEC-2023,squirrel_cage,5 hp,460,A,B\n"+good)
	assert.Equal(t, 1, status)
	require.Len(t, rows, 4)
	assert.Equal(t, "row: 3 cells where the header names 6 columns", rows[0]["error"])
	assert.Equal(t, "P-1", rows[0]["tag"])
	assert.Equal(t, "row: 7 cells where the header names 6 columns", rows[2]["error"])
	for _, i := range []int{1, 3} {
		assert.Empty(t, rows[i]["error"])
		assert.Equal(t, "7.6", rows[i]["design_current_a"])
	}
}

func TestTextOfBadRow(t *testing.T) {
	_, out, _ := ran(t, "tag,code,kind,power,volts\n\"P\n1\",NEC-2023,dc,5,240\n\nP-2,NEC-2023,squirrel_cage,5 hp,460\n")
	assert.True(t, strings.HasPrefix(out, "P 1: not sized, line 2\n  - power \"5\": want "), out)
	assert.True(t, strings.HasSuffix(out, "\n1 rows sized, 1 failed\n"), out)
}

// A broken quote ends the reading: its row is answered with where, and so is
// the person at the keyboard.
func TestBrokenQuote(t *testing.T) {
	const start = "tag,code,kind,power,volts\nP-1,NEC-2023,squirrel_cage,5 hp,460\n"
	for _, tt := range []struct{ name, rest, says string }{
		{"bare quote", "P 3\" main,NEC-2023,squirrel_cage,5 hp,460\nP-3,NEC-2023,squirrel_cage,5 hp,460\n", "line 3, column 4: bare"},
		{"never closed", "\"P-2,NEC-2023,squirrel_cage,5 hp,460\nP-3,NEC-2023,squirrel_cage,5 hp,460\n", ", in the row from line 3: extraneous or missing"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			for _, format := range formatNames(formats) {
				status, out, complaint := ran(t, start+tt.rest, "-format", format)
				assert.Equal(t, 2, status)
				assert.Contains(t, complaint, tt.says)
				assert.Contains(t, out, tt.says)
				assert.NotContains(t, out, "P-3,")
			}
			_, out, _ := ran(t, start+tt.rest, "-format", "csv")
			rows := byName(t, out)
			require.Len(t, rows, 2)
			assert.Empty(t, rows[0]["error"])
			assert.Contains(t, rows[1]["error"], tt.says)
		})
	}
}

// A cell of a megabyte is told shortened, in any column.
func TestLongCells(t *testing.T) {
	long := strings.Repeat("9", 1<<20)
	for _, c := range motors.columns {
		if c.name == "tag" || c.name == "feeder" { // these may be any text
			continue
		}
		t.Run(c.name, func(t *testing.T) {
			status, rows := records(t, scheduleWith(map[string]string{c.name: long}))
			assert.Equal(t, 1, status)
			assert.True(t, strings.HasPrefix(rows[0]["error"], c.name+` "999`), clip(rows[0]["error"]))
			assert.Less(t, len(rows[0]["error"]), 1000)
		})
	}
	status, rows := records(t, scheduleWith(map[string]string{"tag": long}))
	assert.Equal(t, 0, status)
	assert.Equal(t, long, rows[0]["tag"])
}

// A fault that the program knows no column for is told of the row.
func TestFaultOfNoColumn(t *testing.T) {
	f := faults[motorRow]{of: motors}
	for _, err := range tables.Faults(errors.Join(errors.New("odd"), &tables.InputError{Field: "wiring.run", Want: "a run"})) {
		assert.Equal(t, -1, motors.of(tables.FieldOf(err)))
		f.add(err, motors.of(tables.FieldOf(err)))
	}
	assert.Equal(t, []string{"row: odd", "row is not given: want a run"}, f.texts())
}
