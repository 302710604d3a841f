package schedule

import (
	"bytes"
	"encoding/json"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// ranCheck runs the program check on the text of a file.
func ranCheck(t *testing.T, text string, flags ...string) (status int, out, complaint string) {
	t.Helper()
	var stdout, stderr bytes.Buffer
	status = RunCheck(append(flags, "-"), strings.NewReader(text), &stdout, &stderr)
	return status, stdout.String(), stderr.String()
}

// findings runs the program check for CSV and returns its lines by column name.
func findings(t *testing.T, text string, flags ...string) (status int, rows []map[string]string) {
	t.Helper()
	status, out, complaint := ranCheck(t, text, append(flags, "-format", "csv")...)
	require.Empty(t, complaint)
	return status, byName(t, out)
}

func TestCheckSample(t *testing.T) {
	for _, tt := range []struct {
		golden string
		args   []string
	}{
		{"check.text", nil},
		{"check.text", []string{"-format", "text", "-only", "caution"}},
		{"check.csv", []string{"-format", "csv"}},
		{"check.json", []string{"-format", "json"}},
	} {
		t.Run(strings.Join(tt.args, " "), func(t *testing.T) {
			var stdout, stderr bytes.Buffer
			assert.Equal(t, 1, RunCheck(tt.args, strings.NewReader(""), &stdout, &stderr), "the sample has violations and one bad row")
			assert.Empty(t, stderr.String())
			testkit.Golden(t, "testdata/golden/"+tt.golden, stdout.String())
		})
	}
}

// What stands in the sample and may not, or must be confirmed, with the working by
// hand. Tables and rules are those of the edition that the row names.
func TestCheckSampleByHand(t *testing.T) {
	type expected struct{ tag, finding, part, severity string }
	want := []expected{
		// 50 hp 460 V: 65 A × 1.25 = 81.25 A; 6 AWG THWN at 75 °C carries 65 A (430.22, Tables 430.250, 310.16).
		{"DH-11", "conductor_ampacity", "branch", "violation"},
		{"DH-11", "interrupting_rating", "device.interrupting_amperes", "violation"}, // 10 kA at 22 kA (110.9)
		{"WH-11", "conductor_least_size", "branch", "violation"},                     // 16 AWG; copper from 14 AWG (310.3(A))
		{"ML-11", "conductor_parallel_size", "branch", "violation"},                  // two of 1 AWG; in parallel from 1/0 AWG (310.10(G))
		{"NB-11", "conductor_insulation", "branch.insulation", "violation"},          // AC90 is no type for a raceway (CEC Table 19)
		// 50 A × 1.25 = 62.5 A; 6 AWG rated 75 °C at 45 °C: 65 A × 0.82 = 53.3 A (CEC 28-106, Tables 2, 5A).
		{"NB-12", "conductor_ampacity", "motor_supply", "violation"},
		// Class B asks for 75 °C, and 15 °C more at 45 °C (CEC 28-104, Table 37).
		{"NB-12", "conductor_insulation", "motor_supply.insulation", "violation"},
		{"NB-12", "instantaneous_setting", "device.instantaneous_amperes", "violation"}, // 700 A; 50 A × 13 = 650 A (CEC 28-210)
		{"NB-12", "switch_horsepower", "controller.horsepower", "violation"},            // 40 hp for 50 hp (CEC 28-500)
		{"LP-12", "overload_absent", "overload", "violation"},                           // a fire pump has none (695.6(C))
		{"LP-12", "device_carries", "device.rating_amperes", "violation"},               // 150 A; 40 hp 460 V with its rotor locked 290 A (695.4(B)(2)(a), Table 430.251(B))
		// 210 m of 6 AWG in steel: 0.338 Ω and 0.044 Ω (Chapter 9 Table 9). Running at 52 A × 1.15 and 0.9:
		// 1.732 × 59.8 A × (0.338 × 0.9 + 0.044 × 0.436) Ω = 33.5 V of 460 V, 7.3 %; 5 % is the most (695.7).
		{"LP-12", "drop_running", "length", "caution"},
		// The motor at rest is 460 V / (1.732 × 290 A) = 0.916 Ω, at 0.4: 0.366 + 0.338 and 0.839 + 0.044
		// are 1.130 Ω together, 19 % less voltage; 15 % is the most (695.7).
		{"LP-12", "drop_starting", "length", "caution"},
		{"CS-11", "device_kind", "device.kind", "violation"},                                      // an instantaneous trip ahead of a compressor (440.22)
		{"CS-11", "switch_locked_rotor", "disconnecting_means.locked_rotor_amperes", "violation"}, // 120 A; 140 A marked (440.12(A))
		{"WH-12", "overload_units", "overload.units", "violation"},                                // two of three phases (Table 430.37)
		{"WH-12", "overload_setting", "overload.setting_amperes", "violation"},                    // 48 A; 33 A × 1.25 = 41.25 A, and × 1.4 = 46.2 A (430.32)
		{"WH-12", "device_rating", "device.rating_amperes", "violation"},                          // 150 A; 34 A × 2.5 = 85 A, so 90 A, and × 4 = 136 A (430.52, 240.6(A))
		{"WH-12", "switch_amperes", "disconnecting_means.amperes", "violation"},                   // 30 A; 34 A × 1.15 = 39.1 A (430.110(A))
		{"WH-12", "switch_horsepower", "disconnecting_means.horsepower", "violation"},             // 20 hp for 25 hp (430.109)
		{"WH-12", "switch_locked_rotor", "disconnecting_means.locked_rotor_amperes", "violation"}, // 160 A; 183 A (Table 430.251(B))
		{"WH-12", "bonding_size", "bonding", "violation"},                                         // 12 AWG; 8 AWG for 90 A (Table 250.122)
		{"WH-13", "instantaneous_setting", "device.instantaneous_amperes", "violation"},           // 250 A; 16.7 A × 8 = 133.6 A, and × 13 = 217.1 A (430.52(C)(3))
		{"WH-14", "raceway_jam", "raceway", "caution"},                                            // 0.622 in over 0.216 in is 2.88 (Chapter 9 Tables 1, 4, 5)
		{"LP-13", "overload_setting", "overload.setting_amperes", "caution"},                      // 48 A; 39.5 A × 1.15 = 45.425 A, to × 1.3 = 51.35 A if it will not start (430.32)
		{"WH-15", "overload_setting", "overload.setting_amperes", "violation"},                    // 69 A; half of 98 A × 1.4 is 68.6 A (430.32(C), part winding)
		{"LP-14", "drop_running", "length", "violation"},                                          // 656 ft × 2 Ω/1000 ft × 0.83 × 1.732 × 11 A = 21 V, 4.5 % and the reactance; 3 % is the owner's
		{"NB-15", "raceway_fill", "raceway", "violation"},                                         // 142 mm²; 40 % of 330 mm² (CEC Tables 6, 8, 9)
		{"NB-14", "", "", ""}, // the bad row
	}
	_, rows := findings(t, sampleInstalled)
	var got []expected
	seen := map[string]string{}
	for _, row := range rows {
		tag, _, _ := strings.Cut(row["tag"], " ")
		got = append(got, expected{tag, row["finding"], row["part"], row["severity"]})
		if seen[row["finding"]] != "violation" {
			seen[row["finding"]] = row["severity"]
		}
		assert.Equal(t, row["finding"] == "", row["error"] != "", "%v", row)
	}
	assert.Equal(t, want, got)
	for _, code := range mc.FindingCodes() {
		gravest := "violation"
		if code == mc.RacewayJam || code == mc.DropStarting {
			gravest = "caution"
		}
		assert.Equal(t, gravest, seen[code.String()], code.String())
	}
	_, text, _ := ranCheck(t, sampleInstalled)
	for _, clean := range []string{"LP-11 ice crusher", "NB-13 north washer"} {
		assert.Contains(t, text, clean+": no violations, no points to be confirmed")
	}
	for _, e := range tables.Editions() {
		assert.Contains(t, sampleInstalled, ","+e.String()+",")
	}
}

// Numbers of a finding are plain, and the cells that are passed through follow them.
func TestFindingLine(t *testing.T) {
	const header = "zone,tag,code,kind,power,volts,insulation,termination_c,branch_size,feeder\n"
	status, out, _ := ranCheck(t, header+"A,P-1,nec-2023,squirrel_cage,50 hp,460,THWN,75,6,F-1\n", "-format", "csv")
	assert.Equal(t, 1, status)
	assert.Equal(t, "tag,code,part,finding,severity,required,found,margin,unit,rules,text,error,zone,feeder\n"+
		`P-1,NEC-2023,branch,conductor_ampacity,violation,81.25,65,-16.25,A,NFPA 70-2023 430.22; NFPA 70-2023 430.6(A)(1); NFPA 70-2023 Table 430.250; NFPA 70-2023 Table 310.16,`+
		`"ampacity of 6 AWG copper THWN, 65 A, is below the least ampacity of the branch-circuit conductors, 81.25 A, by 16.25 A",,A,F-1`+"\n", out)

	status, out, _ = ranCheck(t, header+"A,P-1,NEC-2023,squirrel_cage,50 hp,460,THWN,75,4,F-1\n", "-format", "csv")
	assert.Equal(t, 0, status)
	assert.Equal(t, 1, strings.Count(out, "\n"), "a circuit without findings that are shown gives no line")

	status, rows := findings(t, header+"B,P-2,NEC-2023,squirrel_cage,50 hp,460,THWN,75,4.5,F-1\n")
	assert.Equal(t, 1, status)
	require.Len(t, rows, 1)
	assert.Contains(t, rows[0]["error"], `branch_size "4.5": want a size from 18 AWG`)
	assert.Equal(t, "B", rows[0]["zone"])
}

// The flag -only leaves findings out, of every format, and nothing else: the first
// line in text counts all, and the exit status is the same.
func TestOnly(t *testing.T) {
	count := map[string]map[string]int{}
	var headings []string
	for _, only := range []string{"note", "caution", "violation"} {
		status, rows := findings(t, sampleInstalled, "-only", only)
		assert.Equal(t, 1, status)
		count[only] = map[string]int{}
		for _, row := range rows {
			count[only][row["severity"]]++
		}
		_, out, _ := ranCheck(t, sampleInstalled, "-only", only, "-format", "json")
		var reports []struct {
			Tag, Error string
			Findings   []struct{ Severity string }
		}
		require.NoError(t, json.Unmarshal([]byte(out), &reports))
		elements := map[string]int{}
		for _, r := range reports {
			assert.Equal(t, r.Error == "", r.Findings != nil, "no findings are an empty list: %s", r.Tag)
			if r.Error != "" {
				elements[""]++
			}
			for _, f := range r.Findings {
				elements[f.Severity]++
			}
		}
		assert.Equal(t, count[only], elements)
		_, out, _ = ranCheck(t, sampleInstalled, "-only", only)
		var these []string
		for line := range strings.Lines(out) {
			if strings.Contains(line, ", under ") {
				these = append(these, line)
			}
		}
		if headings == nil {
			headings = these
		}
		assert.Equal(t, headings, these)
		assert.Equal(t, only == "note", strings.Contains(out, "\nRequirements met\n"))
		assert.Equal(t, only != "violation", strings.Contains(out, "\nTo be confirmed\n"))
		assert.True(t, strings.HasSuffix(out, "\n16 circuits judged, 12 with violations, 1 not judged\n"), out[len(out)-80:])
	}
	note, caution, violation := count["note"], count["caution"], count["violation"]
	assert.Greater(t, note["note"], 100)
	assert.Equal(t, map[string]int{"": 1, "caution": note["caution"], "violation": note["violation"]}, caution)
	assert.Equal(t, map[string]int{"": 1, "violation": note["violation"]}, violation)
}

// The findings of a row stand in the order of the library's report.
func TestCheckIsTheLibrarys(t *testing.T) {
	_, out, _ := ranCheck(t, sampleInstalled, "-only", "note", "-format", "json")
	lines := strings.Split(out, "\n")
	s, err := openSheet(installed, strings.NewReader(sampleInstalled))
	require.NoError(t, err)
	broken, err := s.each(progress{}, func(r *row[installedRow], _ bool) error {
		lines = lines[1:]
		report, err := mc.Check(r.value.circuit, r.value.stands)
		if err != nil || len(r.faults.list) > 0 {
			assert.Contains(t, lines[0], `{"tag":"`+r.tag+`","error":"`)
			return nil
		}
		want, err := json.Marshal(report)
		assert.Equal(t, string(want), strings.TrimSuffix(lines[0], ","))
		return err
	})
	require.NoError(t, broken)
	require.NoError(t, err)
	assert.Equal(t, []string{"]", ""}, lines[1:])
}

func TestCheckExitStatus(t *testing.T) {
	const header = "tag,code,kind,power,volts,branch_size\n"
	file := func(rows string) string {
		path := filepath.Join(t.TempDir(), "installed.csv")
		require.NoError(t, os.WriteFile(path, []byte(header+rows), 0o644))
		return path
	}
	good := file("P-1,NEC-2023,squirrel_cage,5 hp,460,14\n")
	for _, tt := range []struct {
		name   string
		args   []string
		status int
		says   string
	}{
		{"nothing found", []string{good}, 0, ""},
		{"no rows", []string{"-format", "json", file("")}, 0, ""},
		{"a violation", []string{file("P-1,NEC-2023,squirrel_cage,50 hp,460,14\n")}, 1, ""},
		{"a violation among good rows", []string{file("P-1,NEC-2023,squirrel_cage,50 hp,460,14\nP-2,NEC-2023,squirrel_cage,5 hp,460,14\n")}, 1, ""},
		{"not judged", []string{"-format", "csv", "-only", "violation", file("P-1,NEC-2023,squirrel_cage,5 hp,460,\nP-2,NEC-2023,squirrel_cage,5,460,14\n")}, 1, ""},
		{"the sample", nil, 1, ""},
		{"help", []string{"-h"}, 0, "usage: check [-format text|csv|json] [-only violation|caution|note] [installed.csv]"},
		{"a format of later", []string{"-format", "html", good}, 2, `unknown -format "html": want one of text, csv, json`},
		{"no such severity", []string{"-only", "grave", good}, 2, "want violation, caution or note"},
		{"a flag of the schedule", []string{"-feeders", "f.csv", good}, 2, "flag provided but not defined: -feeders"},
		{"two files", []string{good, good}, 2, "want one file name, after the flags; got 2 arguments"},
		{"no such file", []string{filepath.Join(t.TempDir(), "none.csv")}, 2, "check: open "},
		{"a folder", []string{t.TempDir()}, 2, "check: reading the file of installed circuits"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			var stdout, stderr bytes.Buffer
			assert.Equal(t, tt.status, RunCheck(tt.args, strings.NewReader(""), &stdout, &stderr))
			if tt.says == "" {
				assert.Empty(t, stderr.String())
				return
			}
			assert.Contains(t, stderr.String(), tt.says)
			assert.Empty(t, stdout.String())
		})
	}
}

func TestCheckBrokenOutput(t *testing.T) {
	for _, format := range formatNames(reportFormats) {
		var stderr bytes.Buffer
		assert.Equal(t, 2, RunCheck([]string{"-format", format}, strings.NewReader(""), brokenWriter{}, &stderr))
		assert.Contains(t, stderr.String(), "disk full")
	}
}
