package motor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// The synchronous columns are for unity power factor; the notes multiply by 1.1
// at 0.9 and by 1.25 at 0.8. Without a power factor 0.8 is taken, the most
// current (a default of the library, no source).
func TestSynchronousPowerFactor(t *testing.T) {
	for _, tt := range []struct {
		editions   []tables.Edition
		pf, want   string
		table, ref string
		source     string
	}{
		{necEditions, "1", "101 A", "Table 430.250", "Table 430.250", "100 hp, 460 V"},
		{necEditions, "0.9", "111.1 A", "Table 430.250", "Table 430.250", "101 × 1.1"},
		{necEditions, "0.8", "126.25 A", "Table 430.250", "Table 430.250", "101 × 1.25"},
		{necEditions, "0.80", "126.25 A", "Table 430.250", "Table 430.250", "101 × 1.25"},
		{necEditions, "", "126.25 A", "Table 430.250", "Table 430.250", "101 × 1.25, no power factor given"},
		{cecEditions, "1", "106 A", "Table 44", "Table 44", "100 hp, 460 V; not the NEC's column"},
		{cecEditions, "0.9", "116.6 A", "Table 44", "Table 44", "106 × 1.1"},
		{cecEditions, "0.8", "132.5 A", "Table 44", "Table 44", "106 × 1.25"},
		{cecEditions, "", "132.5 A", "Table 44", "Table 44", "106 × 1.25, no power factor given"},
	} {
		for _, e := range tt.editions {
			t.Run(e.String()+" "+tt.pf, func(t *testing.T) {
				m := motor.Motor{Kind: motor.Synchronous, Power: motor.HP("100"), Voltage: 460}
				if tt.pf != "" {
					m.Nameplate.PowerFactor = motor.Factor(tt.pf)
				}
				d := demand(t, m, e)
				assert.Equal(t, tt.want, d.Table.String(), tt.source)
				assert.Equal(t, tt.want, d.Design.String(), tt.source)
				assert.Equal(t, tt.ref, ref(d.Table))
				assert.True(t, testkit.Rests(d.Design, tt.table))
				assert.Equal(t, tt.pf == "", testkit.Cautioned(d.Cautions, tt.ref, "no power factor"))
			})
		}
	}
}

// Under the CEC the nameplate makes the power factor of no account.
func TestSynchronousNameplateCEC(t *testing.T) {
	m := motor.Motor{Kind: motor.Synchronous, Power: motor.HP("100"), Voltage: 460}
	m.Nameplate.Amperes = motor.Amps("110")
	for _, e := range cecEditions {
		d := demand(t, m, e)
		assert.Equal(t, "110 A", d.Design.String(), "28-106(1)")
		assert.False(t, testkit.Cautioned(d.Cautions, "Table 44", "no power factor"))
	}
}
