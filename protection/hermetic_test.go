package protection_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// NEC 440.22(A): 175 percent of the larger of rated-load and branch-circuit
// selection current, 225 if it will not start, 15 A always. The next size up is
// allowed from 2023 on, for the first limit only; the exceptions moved with it.
func TestHermeticDeviceNEC(t *testing.T) {
	for _, tt := range []struct {
		name             string
		editions         []tables.Edition
		kind             tables.Device
		rated, selection string
		limit, rating    string
		startLimit       string
		start            string
	}{
		{"check value of the rules", necEditions, breaker, "38", "40", "70 A", "70 A", "90 A", "90 A"},
		{"rated load alone", to2020, breaker, "38", "", "66.5 A", "60 A", "85.5 A", "80 A"},
		{"rated load alone", from2023, breaker, "38", "", "66.5 A", "70 A", "85.5 A", "80 A"},
		{"between ratings", to2020, timeDelay, "41", "", "71.75 A", "70 A", "92.25 A", "90 A"},
		{"between ratings", from2023, timeDelay, "41", "", "71.75 A", "80 A", "92.25 A", "90 A"},
		{"15 A floor, breaker", necEditions, breaker, "2", "", "3.5 A", "15 A", "4.5 A", "15 A"},
		{"15 A floor, fuse", necEditions, timeDelay, "2", "", "3.5 A", "15 A", "4.5 A", "15 A"},
		{"15 A floor over 10 A", necEditions, breaker, "5", "", "8.75 A", "15 A", "11.25 A", "15 A"},
		{"up reaches the second ceiling", from2023, breaker, "26", "", "45.5 A", "50 A", "58.5 A", "50 A"},
		{"up passes the second ceiling", from2023, breaker, "11.5", "", "20.125 A", "25 A", "25.875 A", "25 A"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				s := device(t, e, tt.kind, compressor(tt.rated, tt.selection, ""))
				assert.Equal(t, tt.limit, s.Limit.String())
				assert.Equal(t, "440.22(A)", ref(s.Limit))
				assert.Equal(t, tt.rating, s.Rating.String())
				assert.Equal(t, tt.startLimit, s.StartLimit.String())
				assert.Equal(t, tt.start, s.StartRating.String())
				want := "440.22(A)"
				if e == tables.NEC2023 {
					want = "440.22(A) Exception No. 2"
				}
				assert.Equal(t, want, ref(s.StartLimit))
				assert.True(t, testkit.Cautioned(s.Cautions, "440.22(A)", "marked on the equipment"))
			})
		}
	}
}

// The exceptions of 440.22(A) and what they are numbered from 2023.
func TestHermeticExceptionsNEC(t *testing.T) {
	s := device(t, tables.NEC2023, breaker, compressor("41", "", ""))
	assert.True(t, testkit.Rests(s.Rating, "440.22(A) Exception No. 1"), "next size up")
	s = device(t, tables.NEC2023, breaker, compressor("2", "", ""))
	assert.True(t, testkit.Rests(s.Rating, "440.22(A) Exception No. 3"), "15 A")
	s = device(t, tables.NEC2020, breaker, compressor("41", "", ""))
	assert.False(t, testkit.Rests(s.Rating, "440.22(A) Exception No. 1"))
}

// 175 percent of 3428.6 A is 6000.05 A: above every rating to round up to.
func TestHermeticNoRating(t *testing.T) {
	m := compressor("3428.6", "", "")
	_, err := protection.SizeShortCircuit(tables.NEC2023, breaker, m, demand(t, m, tables.NEC2023))
	var none *tables.NoSizeError
	require.ErrorAs(t, err, &none)
	assert.Equal(t, "device", none.Field)
	assert.Equal(t, "6000 A", device(t, tables.NEC2020, breaker, m).Rating.String(), "to 2020 the one below")
}

// CEC 28-708: 50 percent of locked-rotor current, 65 if it will not start, 15 A
// always; not marked, it is six times the rated-load current (28-704).
func TestHermeticDeviceCEC(t *testing.T) {
	for _, tt := range []struct {
		rated, rotor      string
		limit, rating     string
		startLimit, start string
	}{
		{"38", "200", "100 A", "100 A", "130 A", "125 A"},
		{"38", "199", "99.5 A", "90 A", "129.35 A", "125 A"},
		{"38", "", "114 A", "110 A", "148.2 A", "125 A"},
		{"3", "20", "10 A", "15 A", "13 A", "15 A"},
		{"5", "30", "15 A", "15 A", "19.5 A", "15 A"},
	} {
		for _, e := range cecEditions {
			for _, kind := range []tables.Device{nonTime, timeDelay, breaker} {
				s := device(t, e, kind, compressor(tt.rated, "", tt.rotor))
				assert.Equal(t, tt.limit, s.Limit.String(), "%+v", tt)
				assert.Equal(t, "Rule 28-708", ref(s.Limit))
				assert.Equal(t, tt.rating, s.Rating.String(), "%+v", tt)
				assert.Equal(t, tt.startLimit, s.StartLimit.String(), "%+v", tt)
				assert.Equal(t, tt.start, s.StartRating.String(), "%+v", tt)
			}
		}
	}
}
