package motorcircuit_test

import (
	"fmt"
	"math/rand/v2"
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// anyOf returns one of the values.
func anyOf[T any](rnd *rand.Rand, values ...T) T { return values[rnd.IntN(len(values))] }

// anyCircuit draws a circuit of any kind that the library knows; not all can be
// sized.
func anyCircuit(rnd *rand.Rand) motorcircuit.Circuit {
	yes := func(percent int) bool { return rnd.IntN(100) < percent }
	amps := func(most int) tables.Current { return motor.Amps(fmt.Sprint(1 + rnd.IntN(most))) }
	e := anyOf(rnd, tables.Editions()...)
	m := motor.Motor{
		Kind:    anyOf(rnd, motor.SquirrelCage, motor.SquirrelCage, motor.SquirrelCage, motor.SinglePhase, motor.WoundRotor, motor.Synchronous, motor.DirectCurrent, motor.Torque, motor.Hermetic),
		Voltage: anyOf(rnd, 115, 200, 208, 230, 240, 460, 575),
		Power:   motor.HP(anyOf(rnd, ladder...)),
	}
	n := &m.Nameplate
	switch m.Kind {
	case motor.Hermetic, motor.Torque:
		m.Power, m.Phases = tables.Power{}, anyOf(rnd, 1, 3)
		n.Amperes = amps(200)
		if m.Kind == motor.Hermetic && yes(40) {
			n.BranchSelection = n.Amperes
		}
	case motor.DirectCurrent:
		m.Voltage = anyOf(rnd, 120, 240, 500)
	case motor.WoundRotor:
		if yes(70) {
			n.Secondary = amps(300)
			m.Resistor = anyOf(rnd, 0, tables.LightStarting, tables.ExtraHeavyStarting)
		}
	case motor.SquirrelCage:
		m.Starting = anyOf(rnd, motor.AcrossTheLine, motor.AcrossTheLine, motor.WyeDelta, motor.PartWinding, motor.Autotransformer, motor.SoftStarter, motor.Drive)
		if m.Starting == motor.Drive {
			n.DriveInput = amps(500)
		}
		if m.Starting == motor.AcrossTheLine && yes(10) {
			n.Windings = []motor.Winding{{Amperes: amps(300)}, {Amperes: amps(300)}}
		}
		if m.Starting == motor.AcrossTheLine && yes(4) && e.Code() == tables.NEC {
			m.Use = motor.FirePump
		}
	}
	if yes(30) && len(n.Windings) == 0 && n.Amperes.IsZero() {
		n.Amperes = amps(600)
	}
	if yes(40) {
		n.ServiceFactor = anyOf(rnd, motor.Factor("1"), motor.Factor("1.15"))
	}
	if yes(15) && m.Kind == motor.SquirrelCage {
		n.DesignLetter = anyOf(rnd, "A", "B", "C", "D")
	}
	if yes(15) && m.Kind != motor.DirectCurrent {
		n.CodeLetter = anyOf(rnd, "A", "F", "G", "K", "V")
	}
	if yes(20) {
		n.InsulationClass, n.NonVentilated = anyOf(rnd, "A", "B", "F", "H"), yes(30)
	}
	if yes(20) && m.Kind != motor.Torque && m.Kind != motor.Hermetic && m.Use == motor.Ordinary {
		m.Duty = motor.Duty{Kind: anyOf(rnd, motor.ShortTime, motor.Intermittent, motor.Periodic, motor.Varying), Minutes: anyOf(rnd, 0, 5, 15, 30, 60)}
	}
	w := conductor.Wiring{
		Material:    anyOf(rnd, conductor.Copper, conductor.Copper, conductor.Aluminum),
		Insulation:  anyOf(rnd, "", "", "THWN-2", "XHHW-2", "RW90"),
		Location:    anyOf(rnd, tables.Dry, tables.Dry, tables.Damp, tables.Wet),
		Run:         anyOf(rnd, tables.InRaceway, tables.InRaceway, tables.InRaceway, tables.InCable, tables.InFreeAir),
		Termination: anyOf(rnd, 0, 60, 75, 75, 90),
		Reading:     anyOf(rnd, conductor.CorrectTermination, conductor.CorrectInsulation),
	}
	if e.Code() == tables.CEC {
		w.Insulation = anyOf(rnd, "", "RW90", "TW75", "T90 NYLON")
	} else if w.Insulation == "RW90" {
		w.Insulation = "THHN"
	}
	if yes(50) {
		w.Ambient = motor.Celsius(fmt.Sprint(10 + rnd.IntN(50)))
	}
	if yes(30) {
		w.Conductors = 3 + rnd.IntN(30)
	}
	if yes(10) {
		w.Sets = 1 + rnd.IntN(3)
	}
	if yes(10) {
		w.Least = anyOf(rnd, tables.Sizes()...)
	}
	if w.Run == tables.InRaceway && yes(60) {
		w.Raceway = anyOf(rnd, conductor.EMT, conductor.RMC, conductor.PVC40, conductor.FMC)
		if yes(20) {
			w.Flexible = conductor.LFMC
		}
	}
	c := motorcircuit.Circuit{Tag: "r", Edition: e, Motor: m, Wiring: w, Device: anyOf(rnd, devices...)}
	if yes(10) {
		c.Device = 0
	}
	if yes(50) {
		c.Wiring.Length = conductor.Metres(fmt.Sprint(1 + rnd.IntN(200)))
		if yes(60) {
			c.MaxDrop = anyOf(rnd, motor.Factor("1"), motor.Factor("2.5"), motor.Factor("3"), motor.Factor("5"))
		}
	}
	if yes(40) {
		c.Fault = motor.Amps(anyOf(rnd, "5000", "14000", "42000"))
	}
	return c
}

// randomDesigns sizes so many random circuits.
func randomDesigns(t *testing.T, seed uint64, count int, visit func(rnd *rand.Rand, r motorcircuit.Result)) {
	t.Helper()
	rnd := rand.New(rand.NewPCG(seed, 1))
	refused := 0
	for sized := 0; sized < count; {
		r, err := motorcircuit.Size(anyCircuit(rnd))
		if err != nil {
			refused++
			continue
		}
		sized++
		visit(rnd, r)
	}
	require.Less(t, refused, 3*count, "circuits that the tables do not cover")
}
