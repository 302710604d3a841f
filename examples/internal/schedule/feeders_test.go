package schedule

import (
	"bytes"
	"encoding/csv"
	"encoding/json"
	"math/rand/v2"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"
)

// ranFeeders runs the program on the texts of a schedule and a feeders file.
func ranFeeders(t *testing.T, schedule, feeders string, flags ...string) (status int, out, complaint string) {
	t.Helper()
	path := filepath.Join(t.TempDir(), "feeders.csv")
	require.NoError(t, os.WriteFile(path, []byte(feeders), 0o644))
	return ran(t, schedule, append(flags, "-feeders", path)...)
}

// feederRecords runs the program for CSV and returns the rows of both blocks.
func feederRecords(t *testing.T, schedule, feeders string) (status int, circuits, rows []map[string]string) {
	t.Helper()
	status, out, _ := ranFeeders(t, schedule, feeders, "-format", "csv")
	first, second, found := strings.Cut(out, "\n\n")
	require.True(t, found, out)
	return status, byName(t, first), byName(t, second)
}

const (
	pumpHeader   = "tag,code,kind,power,volts,device,feeder\n"
	pump1        = "P-1,NEC-2023,squirrel_cage,50 hp,460,inverse_time_breaker,F-1\n"
	pump2        = "P-2,NEC-2023,squirrel_cage,10 hp,460,inverse_time_breaker,F-1\n"
	pump3        = "P-3,NEC-2023,squirrel_cage,5 hp,460,inverse_time_breaker,F-2\n"
	feederHeader = "tag,code,device\n"
	feeder1      = "F-1,NEC-2023,inverse_time_breaker\n"
	feeder2      = "F-2,NEC-2023,inverse_time_breaker\n"
)

// By hand from NFPA 70-2023: Table 430.250 (65 A, 14 A), 430.24, Table 310.16,
// 430.52 and 430.62 (65 A × 250 % to 175 A, plus 14 A), 430.63, Table 250.122.
func TestOneFeeder(t *testing.T) {
	status, circuits, rows := feederRecords(t, pumpHeader+pump1+pump2,
		"other_load_amps,tag,termination_c,continuous_load_amps,insulation,code,device\n10, F-1 ,75,8,THWN-2,nec-2023,inverse_time_breaker\n")
	assert.Equal(t, 0, status)
	require.Len(t, circuits, 2)
	require.Len(t, rows, 1)
	for name, want := range map[string]string{
		"tag": "F-1", "code": "NEC-2023", "error": "", "feeder_min_ampacity_a": "115.25", "feeder_conductor": "1", "feeder_sets": "1",
		"feeder_ampacity_a": "130", "feeder_device_limit_a": "209", "feeder_device_rating_a": "200", "bonding_conductor": "6",
		"raceway": "", "drop_running_percent": "",
	} {
		assert.Equal(t, want, rows[0][name], name)
	}
	assert.Contains(t, rows[0]["cautions"], " | ")
}

// The order of the columns is a promise.
func TestFeederColumns(t *testing.T) {
	const promised = "tag,code,error,feeder_min_ampacity_a,feeder_conductor,feeder_sets,feeder_ampacity_a,feeder_device_limit_a," +
		"feeder_device_rating_a,bonding_conductor,raceway,drop_running_percent,cautions"
	const known = "tag,code,device,conductor,insulation,termination_c,ambient_c,conductors_in_raceway,raceway,length_m,length_ft," +
		"continuous_load_amps,other_load_amps"
	status, out, complaint := ranFeeders(t, pumpHeader, "zone,"+known+",Note\n", "-format", "csv")
	assert.Equal(t, 0, status)
	_, block, found := strings.Cut(out, "\n\n")
	assert.True(t, found)
	assert.Equal(t, promised+",zone,Note\n", block)
	assert.Empty(t, complaint)
}

func TestFeederPassedThrough(t *testing.T) {
	_, _, rows := feederRecords(t, pumpHeader+pump1+pump3,
		"room,tag,code,,Panel \n\"Hall \"\"A\"\",\nwest\",F-1,NEC-2023,x, MDP\nB,F-9,NEC-2023,y,\n")
	require.Len(t, rows, 3)
	assert.Equal(t, "Hall \"A\",\nwest", rows[0]["room"])
	assert.Equal(t, " MDP", rows[0]["Panel "], "as it stands in the file")
	assert.Equal(t, "B", rows[1]["room"], "of a bad row too")
	assert.Equal(t, "y", rows[1][""])
	assert.Equal(t, "F-2", rows[2]["tag"])
	assert.Empty(t, rows[2]["room"], "of a feeder that the file lacks")
}

// Without -feeders nothing of a feeder is answered, whatever the motors name.
func TestNoFeedersUnasked(t *testing.T) {
	for _, format := range formatNames(formats) {
		status, plain, _ := ran(t, pumpHeader+strings.ReplaceAll(pump1, "F-1", ""), "-format", format)
		assert.Equal(t, 0, status)
		status, out, complaint := ran(t, pumpHeader+pump1, "-format", format)
		assert.Equal(t, 0, status)
		assert.Equal(t, plain, out)
		assert.Empty(t, complaint)
	}
}

// The answer to a feeder does not hang on the order of the motors.
func TestFeedersIgnoreOrder(t *testing.T) {
	for _, tt := range []struct{ name, schedule, feeders string }{
		{"the sample", sample, sampleFeeders},
		{"bad ones", pumpHeader + pump1 + pump2 + strings.Replace(pump3, "F-2", "F-1", 1) + "Q-1,NEC-2023,dc,1 hp,240,,F-1\nQ-2,CEC-2021,squirrel_cage,5 hp,575,,F-1\n" +
			"B-2,NEC-2023,dc,x,240,,F-2\nB-1,NEC-2023,dc,x,240,,F-2\nL-2,NEC-2023,dc,1 hp,240,,F-8\nL-1,NEC-2023,dc,1 hp,240,,F-7\nL-0,NEC-2023,dc,1 hp,240,,F-8\n",
			feederHeader + feeder1 + feeder2 + "F-3,NEC-2023,\n"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			_, _, plain := feederRecords(t, tt.schedule, tt.feeders)
			all, err := csv.NewReader(strings.NewReader(tt.schedule)).ReadAll()
			require.NoError(t, err)
			random := rand.New(rand.NewPCG(430, 24))
			for range 5 {
				var b strings.Builder
				w := csv.NewWriter(&b)
				require.NoError(t, w.Write(all[0]))
				for _, i := range random.Perm(len(all) - 1) {
					require.NoError(t, w.Write(all[1+i]))
				}
				w.Flush()
				_, _, shuffled := feederRecords(t, b.String(), tt.feeders)
				assert.Equal(t, plain, shuffled)
			}
		})
	}
}

func TestFeedersJSON(t *testing.T) {
	type document struct {
		Circuits []struct {
			Circuit struct{ Tag string }
			Error   string
		}
		Feeders []struct {
			Feeder     struct{ Tag, Edition string }
			Conductors struct{ Size string }
			Error      string
		}
	}
	_, out, _ := ranFeeders(t, sample, sampleFeeders, "-format", "json")
	var d document
	require.NoError(t, json.Unmarshal([]byte(out), &d))
	_, circuits, rows := feederRecords(t, sample, sampleFeeders)
	require.Len(t, d.Circuits, len(circuits))
	require.Len(t, d.Feeders, len(rows))
	for i, row := range rows {
		assert.Equal(t, row["tag"], d.Feeders[i].Feeder.Tag)
		assert.Equal(t, row["error"], d.Feeders[i].Error)
		assert.Equal(t, row["error"] == "", d.Feeders[i].Conductors.Size != "", row["tag"])
	}
	_, out, _ = ranFeeders(t, pumpHeader, feederHeader, "-format", "json")
	assert.JSONEq(t, `{"circuits":[],"feeders":[]}`, out)
	_, out, _ = ranFeeders(t, pumpHeader, feederHeader+"F <1>,NEC-2023,\n", "-format", "json")
	assert.JSONEq(t, `{"circuits":[],"feeders":[{"feeder":{"tag":"F <1>"},"error":"no motor of the schedule names this feeder"}]}`, out)
}

func TestFeedersText(t *testing.T) {
	_, out, _ := ranFeeders(t, pumpHeader+pump1+pump3, feederHeader+feeder1+"F-9,NEC-2023,\n")
	motorsText, feedersText, found := strings.Cut(out, "\nFeeders\n\n")
	require.True(t, found)
	assert.Contains(t, motorsText, "2 rows sized, 0 failed\n")
	assert.True(t, strings.HasPrefix(feedersText, "F-1: feeder of "), feedersText)
	assert.Contains(t, feedersText, "\nF-9: not sized, line 3\n  - no motor of the schedule names this feeder\n")
	assert.Contains(t, feedersText, "\nF-2: not sized\n  - no feeder of this tag is in the feeders file; named by P-3\n")
	assert.True(t, strings.HasSuffix(feedersText, "\n1 feeders sized, 2 failed\n"), feedersText)
}

// The sample has feeders under both codes, one of them bad on purpose.
func TestSampleFeeders(t *testing.T) {
	_, _, rows := feederRecords(t, sample, sampleFeeders)
	codes, bad := map[string]int{}, 0
	for _, row := range rows {
		if row["error"] != "" {
			bad++
			assert.Contains(t, row["error"], "device ")
			continue
		}
		code, _, _ := strings.Cut(row["code"], "-")
		codes[code]++
	}
	assert.Equal(t, 1, bad)
	assert.GreaterOrEqual(t, codes["NEC"], 2)
	assert.GreaterOrEqual(t, codes["CEC"], 2)
	assert.True(t, slices.ContainsFunc(rows, func(a map[string]string) bool { return a["feeder_sets"] == "2" }), "parallel sets")
}

// Memory: what is held of a sized motor is its circuit, and only if it names a
// feeder.
func TestHeldForFeeders(t *testing.T) {
	l, err := readFeeders(strings.NewReader(feederHeader + feeder1))
	require.NoError(t, err)
	s, err := openSheet(motors, strings.NewReader(pumpHeader+pump1+strings.ReplaceAll(pump2, "F-1", "")+strings.ReplaceAll(pump1, "50 hp", "x")))
	require.NoError(t, err)
	_, broken, err := answerMotors(s, l, newCSVOutput(&bytes.Buffer{}), progress{})
	require.NoError(t, err)
	require.NoError(t, broken)
	require.Len(t, l.loads, 1)
	assert.Len(t, l.loads["F-1"].circuits, 1)
	assert.Equal(t, []string{"P-1"}, l.loads["F-1"].unsized)
}
