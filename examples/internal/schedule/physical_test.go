package schedule

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"
)

// The columns of the physical circuit: the run is told in the trade's words and
// the answers stand in their columns.
func TestPhysicalColumns(t *testing.T) {
	_, rows := records(t, scheduleWith(map[string]string{"raceway": "EMT", "length_m": "42.7", "fault_ka": "14.5", "termination_c": "75", "nameplate_amps": ""}))
	require.Len(t, rows, 1)
	require.Empty(t, rows[0]["error"])
	for _, name := range []string{"bonding_conductor", "raceway", "raceway_fill_percent", "drop_running_percent", "drop_starting_percent", "fault_at_motor_ka"} {
		assert.NotEmpty(t, rows[0][name], name)
	}
	assert.Contains(t, rows[0]["raceway"], "EMT ")

	// Feet and metres of the same run give the same answers: 140 ft is 42.672 m.
	_, metric := records(t, scheduleWith(map[string]string{"length_m": "42.672"}))
	_, feet := records(t, scheduleWith(map[string]string{"length_ft": "140"}))
	assert.Equal(t, metric[0]["drop_running_percent"], feet[0]["drop_running_percent"])
	assert.NotEmpty(t, feet[0]["drop_running_percent"])
}

func TestPhysicalFaults(t *testing.T) {
	for _, tt := range []struct {
		cells map[string]string
		want  string
	}{
		{map[string]string{"length_m": "40", "length_ft": "130"}, `length_ft "130": want length_m or length_ft, not both`},
		{map[string]string{"length_m": "40 m"}, `length_m "40 m": want a plain decimal`},
		{map[string]string{"raceway": "hose"}, `raceway "hose": want one of emt`},
		{map[string]string{"max_drop_percent": "3"}, `max_drop_percent "3": want none without a length`},
		{map[string]string{"max_drop_percent": "300", "length_m": "40"}, `max_drop_percent "300"`},
		{map[string]string{"fault_ka": "-1"}, `fault_ka "-1": want a plain decimal in kiloamperes`},
		{map[string]string{"fault_ka": "14 A"}, `fault_ka "14 A": want a plain decimal in kiloamperes`},
		{map[string]string{"fault_ka": "1000000"}, `fault_ka "1000000": want a plain decimal in kiloamperes, below a million`},
		{map[string]string{"fault_ka": "0"}, `fault_ka "0 kA": want 0.001 kA to 300 kA`},
		{map[string]string{"fault_ka": "400"}, `fault_ka "400 kA": want 0.001 kA to 300 kA`},
	} {
		status, rows := records(t, scheduleWith(tt.cells))
		assert.Equal(t, 1, status)
		assert.Contains(t, rows[0]["error"], tt.want, "%v", tt.cells)
	}
	_, rows := records(t, scheduleWith(map[string]string{"raceway": "cable", "length_m": "40"}))
	assert.Empty(t, rows[0]["error"])
	assert.Empty(t, rows[0]["raceway"])
}
