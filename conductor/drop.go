package conductor

import (
	"math"

	"example.org/motorcircuit/internal/phasor"
	"example.org/motorcircuit/tables"
)

// A LineLoad is a load at the end of a run, for its voltage drop.
type LineLoad struct {
	Volts       int           // line to line, or the line voltage of a circuit that is not three-phase
	Phases      int           // 0 for direct current
	Current     tables.Figure // in amperes
	PowerFactor tables.Figure // lagging; absent for direct current
}

var (
	dropRule     = tables.Rule{Outside: true, Ref: "IEEE 141-1993 3.11", Note: "exact form, lagging load"}
	dipRule      = tables.Rule{Outside: true, Ref: "IEEE 399-1997 chapter 9", Mark: tables.MarkB, Note: "motor as a constant impedance"}
	faultRule    = tables.Rule{Outside: true, Ref: "IEEE 141-1993 chapter 4", Mark: tables.MarkB, Note: "source and run in series"}
	withstand    = tables.Rule{Outside: true, Ref: "ICEA P-32-382", Mark: tables.MarkB}
	noImpedance  = "the impedance table has no entry for this size: that of the next smaller one, which is higher, stands in"
	roundedUp    = "rounded up to 0.01"
	alphaCopper  = 0.00323 // per °C at 75 °C: NFPA 70 Chapter 9 Table 8, note 2
	alphaAlumin  = 0.00330
	feetPerMetre = 1 / 0.3048
)

// An Impeded run is a selection with a length, and its impedance.
type impeded struct {
	run     phasor.Run
	figures []tables.Figure // resistance, reactance
	standIn bool
}

// impedance returns the impedance of a run at a conductor temperature, one
// conductor of all sets from end to end.
func (w Wiring) impedance(e tables.Edition, s Selection, dc bool, celsius float64) (impeded, error) {
	alpha := alphaCopper
	if s.Material == tables.Aluminum {
		alpha = alphaAlumin
	}
	metres, _ := w.Length.Metres().Float64()
	scale := metres * feetPerMetre / 1000 / float64(max(s.Sets, 1))
	warm := 1 + alpha*(celsius-75)
	if dc {
		r, err := e.DCResistance(s.Material, s.Size)
		return impeded{run: phasor.Run{R: r.Float() * scale * warm}, figures: []tables.Figure{r}}, err
	}
	z, err := e.Impedance(s.Material, s.Size, w.Raceway)
	if err != nil {
		return impeded{}, err
	}
	return impeded{phasor.Run{R: z.Resistance.Float() * scale * warm, X: z.Reactance.Float() * scale},
		[]tables.Figure{z.Resistance, z.Reactance}, z.StandIn != 0}, nil
}

// RunningDrop returns the voltage lost along a run to a running load, in percent
// of the voltage at its beginning, rounded up to 0.01. The conductors are taken
// at the temperature of their terminations. It is absent without a length.
func (w Wiring) RunningDrop(e tables.Edition, s Selection, l LineLoad) (tables.Figure, error) {
	if w.DropMethod == ByTableD3 && !w.Length.IsZero() && !l.Current.IsZero() && l.Volts > 0 {
		return w.dropD3(e, s, l)
	}
	return w.drop(e, s, l, "voltage drop running", &dropRule, phasor.Drop)
}

// StartingDrop is [Wiring.RunningDrop] for a motor with its rotor locked, whose
// current is what it draws at full voltage.
func (w Wiring) StartingDrop(e tables.Edition, s Selection, l LineLoad) (tables.Figure, error) {
	return w.drop(e, s, l, "voltage drop starting", &dipRule, phasor.Dip)
}

func (w Wiring) drop(e tables.Edition, s Selection, l LineLoad, name string, rule *tables.Rule, share func(float64, bool, float64, float64, phasor.Run) float64) (tables.Figure, error) {
	if w.Length.IsZero() || l.Current.IsZero() || l.Volts <= 0 {
		return tables.Figure{}, nil
	}
	z, err := w.impedance(e, s, l.Phases == 0, s.Termination.Float())
	if err != nil {
		return tables.Figure{}, err
	}
	pf := 1.0
	of := append([]tables.Figure{l.Current}, z.figures...)
	if l.Phases != 0 && !l.PowerFactor.IsZero() {
		pf = l.PowerFactor.Float()
		of = append(of, l.PowerFactor)
	}
	lost := share(float64(l.Volts), l.Phases == 3, l.Current.Float(), pf, z.run)
	note := w.Length.String() + ", " + roundedUp
	if z.standIn {
		note += ", " + noImpedance
	}
	return tables.ComputedFigure(name, e, rule, tables.Percent, math.Min(lost, 1)*100, 2, true, note, of...), nil
}

// LongestRun returns the longest run of the selection that keeps the running
// drop within a limit in percent, in metres rounded down to 0.1.
func (w Wiring) LongestRun(e tables.Edition, s Selection, l LineLoad, limit tables.Figure) (tables.Figure, error) {
	if l.Current.IsZero() || l.Volts <= 0 {
		return tables.Figure{}, nil
	}
	if w.DropMethod == ByTableD3 {
		return w.longestD3(e, s, l, limit)
	}
	w.Length = tables.Must(tables.ParseLength("1 m"))
	z, err := w.impedance(e, s, l.Phases == 0, s.Termination.Float())
	if err != nil {
		return tables.Figure{}, err
	}
	pf := 1.0
	if l.Phases != 0 && !l.PowerFactor.IsZero() {
		pf = l.PowerFactor.Float()
	}
	low, high := 0.0, 1e6
	for range 80 {
		at := (low + high) / 2
		if phasor.Drop(float64(l.Volts), l.Phases == 3, l.Current.Float(), pf, phasor.Run{R: z.run.R * at, X: z.run.X * at})*100 <= limit.Float() {
			low = at
		} else {
			high = at
		}
	}
	return tables.ComputedFigure("longest run within the limit", e, &dropRule, tables.Metre, low, 1, false, "rounded down to 0.1 m", limit, l.Current), nil
}

// FaultAtEnd returns the bolted fault current at the end of a run in kiloamperes,
// rounded up to 0.01, from that at its beginning in amperes: of three phases, or
// line to line. XR is the source's ratio of reactance to resistance; an absent
// one takes reactance alone, which gives the most. The conductors are taken cold,
// at 25 °C, for the same reason.
func (w Wiring) FaultAtEnd(e tables.Edition, s Selection, volts, phases int, source, xr tables.Figure) (tables.Figure, error) {
	if w.Length.IsZero() || source.IsZero() || volts <= 0 {
		return tables.Figure{}, nil
	}
	z, err := w.impedance(e, s, phases == 0, 25)
	if err != nil {
		return tables.Figure{}, err
	}
	amps := phasor.Fault(float64(volts), phases == 3, source.Float(), xr.Float(), z.run)
	note := w.Length.String() + ", conductors at 25 °C, " + roundedUp
	if xr.IsZero() {
		note += ", source of reactance alone"
	}
	return tables.ComputedFigure("fault current at the motor", e, &faultRule, tables.Kiloampere, amps/1000, 2, true, note, append([]tables.Figure{source}, z.figures...)...), nil
}

// Withstand returns how long a conductor withstands a fault current, in seconds
// rounded down to 0.001: ICEA P-32-382, from the rated temperature of the
// insulation to 250 °C for thermosets of 90 °C and to 150 °C otherwise.
func Withstand(e tables.Edition, s Selection, fault tables.Figure) tables.Figure {
	ins, err := e.Insulation(s.Insulation)
	if err != nil || fault.IsZero() {
		return tables.Figure{}
	}
	k, b := 0.0297, 234.0
	if s.Material == tables.Aluminum {
		k, b = 0.0125, 228
	}
	from := float64(ins.Celsius[s.Location])
	to := 150.0
	if ins.Thermoset && from >= 90 {
		to = 250
	}
	mils, _ := s.Size.CircularMils().Float64()
	cmils := mils * float64(max(s.Sets, 1))
	amps := fault.Float() * 1000
	t := cmils * cmils / amps / amps * k * math.Log10((to+b)/(from+b))
	note := "rounded down to 0.001 s"
	if t < 0.1 || t > 5 {
		note += ", outside of the 0.1 to 5 s for which the method is meant"
	}
	return tables.ComputedFigure("longest clearing time that the conductors withstand", e, &withstand, tables.Second, t, 3, false, note, fault)
}
