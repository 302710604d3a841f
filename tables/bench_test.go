package tables

import (
	"testing"

	"github.com/stretchr/testify/require"
)

// The cost of the first use of a table: reading, parsing and checking the file.

func BenchmarkFirstUseMotorTable(b *testing.B) {
	b.ReportAllocs()
	for b.Loop() {
		g, err := open("nec/motor_flc_3ph_induction.csv")
		require.NoError(b, err)
		_, err = newMotorTable(g, &nec3Ph, necVolts, nil, nil)
		require.NoError(b, err)
	}
}

func BenchmarkFirstUseAmpacity(b *testing.B) {
	b.ReportAllocs()
	for b.Loop() {
		g, err := open("nec/conductor_ampacity.csv")
		require.NoError(b, err)
		for _, m := range []Material{Copper, Aluminum} {
			_, err = newAmpacity(g, m, necRacewayRule)
			require.NoError(b, err)
		}
	}
}

// BenchmarkReadAll reads every file of every code.
func BenchmarkReadAll(b *testing.B) {
	paths := dataFiles(b)
	b.ReportAllocs()
	for b.Loop() {
		for _, path := range paths {
			_, err := open(path)
			require.NoError(b, err)
		}
	}
}

func BenchmarkFullLoadCurrent(b *testing.B) {
	p := Must(ParseHP("50"))
	b.ReportAllocs()
	for b.Loop() {
		_, err := NEC2023.FullLoadCurrent(InductionTable, p, 460)
		require.NoError(b, err)
	}
}
