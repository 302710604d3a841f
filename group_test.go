package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// oneCircuit puts motors behind one device with terminals marked 75 °C.
func oneCircuit(e tables.Edition, motors ...motorcircuit.FeederCircuit) motorcircuit.Group {
	g := motorcircuit.Group{Tag: "G-1", Edition: e}
	g.Wiring.Termination = 75
	for _, fc := range motors {
		fc.Circuit.Edition = e
		g.Circuits = append(g.Circuits, fc.Circuit)
	}
	return g
}

func sizedGroup(t *testing.T, g motorcircuit.Group) motorcircuit.GroupResult {
	t.Helper()
	r, err := motorcircuit.SizeGroup(g)
	require.NoError(t, err)
	require.Len(t, r.Circuits, len(g.Circuits))
	require.Len(t, r.Ways, 3)
	require.GreaterOrEqual(t, r.Conductors.Ampacity.Cmp(r.Ampacity), 0)
	require.NotEmpty(t, r.Cautions)
	for _, w := range r.Ways {
		require.Equal(t, g.Edition, w.Cite.Edition)
		require.NotEmpty(t, w.Why)
		require.Equal(t, w.Allowed, !w.Limit.IsZero(), w.Cite)
		if w.Limit.Citation().Ref != "240.4(B)" && !w.Rating.IsZero() {
			require.LessOrEqual(t, w.Rating.Cmp(w.Limit), 0)
		}
		if w.Allowed {
			requireCited(t, g.Edition, motorcircuit.ShortCircuitDevice, w.Limit)
		}
	}
	return r
}

// way returns what the result says of a rule.
func way(t *testing.T, r motorcircuit.GroupResult, ref string) motorcircuit.GroupWay {
	t.Helper()
	for _, w := range r.Ways {
		if w.Cite.Ref == ref {
			return w
		}
	}
	t.Fatalf("no way %s", ref)
	return motorcircuit.GroupWay{}
}

// at draws the given current at another voltage and phase count.
func at(volts int, kind motor.Kind, hp string) change {
	return func(fc *motorcircuit.FeederCircuit) {
		fc.Circuit.Motor.Voltage, fc.Circuit.Motor.Kind, fc.Circuit.Motor.Power = volts, kind, motor.HP(hp)
	}
}

// NEC 430.53(A): motors of 1 hp and 6 A at the most, each; 20 A on a circuit of 120
// V, 15 A on another.
func TestGroupOfSmallMotors(t *testing.T) {
	for _, tt := range []struct {
		name   string
		motors list
		want   string // "" is not allowed
	}{
		{"120 V", list{single("a", "1/4", 115, ""), single("b", "1/6", 115, "")}, "20 A"}, // 5.8 and 4.4 A
		{"120 V, 6 A", list{drawing("a", "6", at(120, motor.SinglePhase, "1")), single("b", "1/6", 115, "")}, "20 A"},
		{"120 V, over 6 A", list{drawing("a", "6.01", at(120, motor.SinglePhase, "1")), single("b", "1/6", 115, "")}, ""},
		{"120 V, 1/3 hp", list{single("a", "1/3", 115, ""), single("b", "1/6", 115, "")}, ""}, // 7.2 A
		{"208 V", list{single("a", "1/4", 208, ""), single("b", "1/6", 208, "")}, "15 A"},
		{"480 V, 1 hp", list{cage("a", "1", 460), cage("b", "1", 460), cage("c", "1/2", 460)}, "15 A"},
		{"480 V, 1-1/2 hp", list{cage("a", "1-1/2", 460), cage("b", "1/2", 460)}, ""}, // 3 A
		{"480 V, 6 A", list{drawing("a", "6", at(460, motor.SquirrelCage, "1")), cage("b", "1/2", 460)}, "15 A"},
	} {
		for _, e := range necEditions {
			for _, d := range []tables.Device{protection.TimeDelayFuse, protection.InverseTimeBreaker} {
				g := oneCircuit(e, tt.motors...)
				g.Device = d
				w := way(t, sizedGroup(t, g), "430.53(A)")
				assert.Equal(t, tt.want, w.Limit.String(), "%s %v", tt.name, e)
				assert.Equal(t, tt.want, w.Rating.String(), "%s %v", tt.name, e)
			}
		}
	}
}

// NEC 430.53(B): the device that the smallest motor is allowed. 10 A × 1.75 = 17.5,
// next up 20; breaker 25.
func TestGroupBySmallestMotor(t *testing.T) {
	for _, e := range necEditions {
		for d, want := range map[tables.Device]string{protection.TimeDelayFuse: "20 A", protection.InverseTimeBreaker: "25 A", protection.NonTimeDelayFuse: "30 A"} {
			g := oneCircuit(e, drawing("a", "40"), drawing("b", "20"), drawing("c", "10"))
			g.Device = d
			w := way(t, sizedGroup(t, g), "430.53(B)")
			assert.True(t, w.Allowed)
			assert.Equal(t, want, w.Rating.String(), "%v %v", e, d)
			assert.Contains(t, w.Limit.Name(), "smallest motor c")
		}
	}
}

// NEC 430.53(C): parts listed for group installation: the largest motor's device
// plus the rest; not below what protects the conductors, 240.4(B).
func TestGroupListed(t *testing.T) {
	for _, e := range necEditions {
		g := oneCircuit(e, drawing("a", "40"), drawing("b", "20"), drawing("c", "10"))
		g.Other = motor.Amps("5")
		w := way(t, sizedGroup(t, g), "430.53(C)")
		assert.False(t, w.Allowed, "only if listed")
		assert.True(t, w.Rating.IsZero())
		g.Listed = true
		r := sizedGroup(t, g)
		w = way(t, r, "430.53(C)")
		assert.Equal(t, "105 A", w.Limit.String(), "70 + 20 + 10 + 5")
		assert.Equal(t, "100 A", w.Rating.String())
		assert.Equal(t, "85 A", r.Ampacity.String(), "50 + 20 + 10 + 5")
		assert.Equal(t, "4", r.Conductors.Size.Name(), "85 A at 75 °C, exactly")

		// Nine motors of 10 A: 20 + 80 = 100 A, which is what 3 AWG for 92.5 A carries.
		var many list
		for range 9 {
			many = append(many, drawing("m", "10"))
		}
		g = oneCircuit(e, many...)
		g.Listed = true
		r = sizedGroup(t, g)
		w = way(t, r, "430.53(C)")
		assert.Equal(t, "100 A", r.Conductors.Ampacity.String())
		assert.Equal(t, "100 A", w.Rating.String())
		assert.Equal(t, "430.53(C)", w.Limit.Citation().Ref, "no rise is needed")

		// Twelve motors of 10 A: 20 + 110 = 130 takes 125 A. The conductors are 1 AWG
		// for 12.5 + 110 A and carry 130: the next rating up is 150.
		for range 3 {
			many = append(many, drawing("m", "10"))
		}
		g = oneCircuit(e, many...)
		g.Listed = true
		w = way(t, sizedGroup(t, g), "430.53(C)")
		assert.Equal(t, "130 A", w.Limit.String())
		assert.Equal(t, "150 A", w.Rating.String())
		assert.Equal(t, "240.4(B)", w.Rating.Citation().Ref)
	}
}

// CEC Rule 28-206(a): a device of 15 A, for motors that it carries.
func TestGroupOf15A(t *testing.T) {
	for _, e := range cecEditions {
		w := way(t, sizedGroup(t, oneCircuit(e, drawing("a", "8"), drawing("b", "7"))), "Rule 28-206(a)")
		assert.Equal(t, "15 A", w.Limit.String())
		assert.Equal(t, "15 A", w.Rating.String())
		w = way(t, sizedGroup(t, oneCircuit(e, drawing("a", "8"), drawing("b", "7.01"))), "Rule 28-206(a)")
		assert.False(t, w.Allowed)
	}
}

// CEC Rule 28-206(b): within 28-204(1), what the smallest motor's control equipment
// is marked for, or 400 percent of its current.
func TestGroupBySmallestMotorCEC(t *testing.T) {
	for _, tt := range []struct{ smallest, marked, limit, rating string }{
		{"10", "", "40 A", "40 A"},      // 4 × 10
		{"10.1", "", "40.4 A", "40 A"},  // just above a rating
		{"9.99", "", "39.96 A", "35 A"}, // just below
		{"10", "60", "60 A", "60 A"},    // the marking stands in place of 400 percent
		{"10", "15", "15 A", "15 A"},    // also where it is less
		{"10", "150", "80 A", "80 A"},   // 28-204(1): 70 + 10
		{"25", "", "95 A", "90 A"},      // 28-204(1): 70 + 25, below 4 × 25
	} {
		for _, e := range cecEditions {
			g := oneCircuit(e, drawing("a", "40"), drawing("b", tt.smallest))
			if tt.marked != "" {
				g.MarkedMost = motor.Amps(tt.marked)
			}
			w := way(t, sizedGroup(t, g), "Rule 28-206(b)")
			assert.Equal(t, tt.limit, w.Limit.String(), "%+v", tt)
			assert.Equal(t, tt.rating, w.Rating.String(), "%+v", tt)
		}
	}
}

// CEC Rule 28-206(c): machine tools and woodworking machines within 28-204(1): 200 A
// to 250 V, 100 A above.
func TestGroupOfMachine(t *testing.T) {
	for _, tt := range []struct {
		volts         int
		a, b          string
		limit, rating string
	}{
		{250, "124", "77", "200 A", "200 A"}, // 28-204(1): 217 + 77
		{230, "124", "77", "200 A", "200 A"},
		{251, "124", "77", "100 A", "100 A"},
		{575, "124", "77", "100 A", "100 A"},
		{250, "40", "20", "90 A", "90 A"}, // 28-204(1): 70 + 20
		{575, "40", "20", "90 A", "90 A"},
	} {
		for _, e := range cecEditions {
			g := oneCircuit(e, drawing("a", tt.a, at(tt.volts, motor.SquirrelCage, "5")), drawing("b", tt.b, at(tt.volts, motor.SquirrelCage, "5")))
			assert.False(t, way(t, sizedGroup(t, g), "Rule 28-206(c)").Allowed, "only a machine")
			g.Machine = true
			w := way(t, sizedGroup(t, g), "Rule 28-206(c)")
			assert.Equal(t, tt.limit, w.Limit.String(), "%+v", tt)
			assert.Equal(t, tt.rating, w.Rating.String(), "%+v", tt)
		}
	}
}

// Conductors of a group follow the rule for several motors: NEC 430.24, CEC Rule
// 28-108(1).
func TestGroupConductors(t *testing.T) {
	for _, e := range everyone {
		r := sizedGroup(t, oneCircuit(e, drawing("b", "20"), drawing("a", "40"), drawing("i", "10", duty(motor.Intermittent, 15))))
		assert.Equal(t, "78.5 A", r.Ampacity.String(), "50 + 20 + 8.5")
		assert.Len(t, r.Terms, 3)
		assert.Equal(t, "b", r.Circuits[0].Circuit.Tag, "in the order given")
		assert.True(t, testkit.Cautioned(r.Cautions, "", "overload protection"))
	}
}

func TestGroupRefusals(t *testing.T) {
	for _, tt := range []struct {
		name  string
		alter func(*motorcircuit.Group)
		want  map[int][]string
	}{
		{"no circuits", func(g *motorcircuit.Group) { g.Circuits = nil }, map[int][]string{-1: {"circuits"}}},
		{"no edition", func(g *motorcircuit.Group) { g.Edition = 0 }, map[int][]string{-1: {"edition"}}},
		{"instantaneous device", func(g *motorcircuit.Group) { g.Device = protection.InstantaneousBreaker }, map[int][]string{-1: {"device"}}},
		{"mixed voltages", func(g *motorcircuit.Group) { g.Circuits[1].Motor.Voltage = 230 }, map[int][]string{1: {"motor.voltage"}}},
		{"bad circuit", func(g *motorcircuit.Group) { g.Circuits[0].Motor.Kind = 0 }, map[int][]string{0: {"motor.kind"}}},
		{"wiring", func(g *motorcircuit.Group) { g.Wiring.Sets = 13 }, map[int][]string{-1: {"wiring.sets"}}},
	} {
		t.Run(tt.name, func(t *testing.T) {
			g := oneCircuit(tables.NEC2023, cage("a", "10", 460), cage("b", "5", 460))
			tt.alter(&g)
			r, err := motorcircuit.SizeGroup(g)
			require.Error(t, err)
			assert.Equal(t, motorcircuit.GroupResult{}, r)
			assert.Equal(t, tt.want, circuitFaults(err))
		})
	}
}
