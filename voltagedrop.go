package motorcircuit

import (
	"errors"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// A VoltageDrop is the voltage lost along a circuit's own run.
type VoltageDrop struct {
	Running    tables.Figure `json:"running,omitzero"`     // at design current, in percent
	Starting   tables.Figure `json:"starting,omitzero"`    // with the rotor locked, in percent
	Limit      tables.Figure `json:"limit,omitzero"`       // what the code has for one circuit, in percent
	LongestRun tables.Figure `json:"longest_run,omitzero"` // of the chosen conductors within the limit, in metres
}

// upsized takes the next larger size until the running drop is within a limit in
// percent. With no limit or no length it returns the selection as it is.
func upsized(e tables.Edition, w conductor.Wiring, s conductor.Selection, load conductor.Load, line conductor.LineLoad, most tables.Ratio) (conductor.Selection, error) {
	if most.IsZero() || w.Length.IsZero() {
		return s, nil
	}
	limit := tables.PercentFigure("limit of voltage drop", most)
	w.Sets = s.Sets
	for {
		drop, err := w.RunningDrop(e, s, line)
		if err != nil || drop.Cmp(limit) <= 0 {
			return s, err
		}
		smaller := conductor.Rejected{Size: s.Size, Why: "its voltage drop running is " + drop.String()}
		w.Least = s.Size.Larger()
		if w.Least == 0 {
			return s, &tables.NoSizeError{Field: "max_drop_percent", Need: drop, Constraint: "no size keeps the drop within " + limit.String()}
		}
		next, err := w.Select(e, load)
		var none *tables.NoSizeError
		if errors.As(err, &none) {
			return s, &tables.NoSizeError{Field: "max_drop_percent", Need: drop, Constraint: "no size keeps the drop within " + limit.String()}
		} else if err != nil {
			return s, err
		}
		s = next
		s.Smaller = smaller
	}
}

// lineCurrent is what the line feeds: the motor, or its drive.
func (r *Result) lineCurrent() tables.Figure {
	d := &r.Demand
	switch {
	case r.Circuit.Motor.Bypass: // drive or motor
		return greater(d.Input, d.Design)
	case !d.Input.IsZero():
		return d.Input
	}
	return d.Design
}

// lineLoad is the running motor as a load of the branch circuit.
func (r *Result) lineLoad() conductor.LineLoad {
	c := &r.Circuit
	current := r.lineCurrent()
	if c.Motor.Use == motor.FirePump { // 695.7 asks for the drop at 115 percent
		current = percent("115 percent of full-load current", c.Edition, &pumpDrop, current, 115)
	}
	l := conductor.LineLoad{Volts: c.Motor.Voltage, Phases: c.Motor.PhaseCount(), Current: current}
	if l.Phases == 0 {
		return l
	}
	l.PowerFactor = c.Motor.Nameplate.PowerFactor.Figure("nameplate power factor")
	if l.PowerFactor.IsZero() {
		l.PowerFactor, _ = tables.TypicalPowerFactors(r.Demand.Horsepower)
	}
	if l.PowerFactor.IsZero() {
		l.PowerFactor = tables.StatedFigure("typical running power factor", 0, &typicalFactor, tables.Plain, 85, 2)
	}
	return l
}

// startingShare is the part of the full-voltage locked-rotor current that a way
// of starting draws from the line, exactly; 0 where it is not known.
func startingShare(s motor.Starting) float64 {
	switch s {
	case motor.AcrossTheLine:
		return 1
	case motor.WyeDelta:
		return 1.0 / 3
	}
	return 0
}

// dropLimit is what the code has for one feeder or branch circuit.
func dropLimit(e tables.Edition) tables.Figure {
	if e.Code() == tables.CEC {
		return tables.StatedFigure("voltage drop of one circuit", e, &cecDropLimit, tables.Percent, 3, 0).WithNote("and 5 % from the supply")
	}
	return tables.StatedFigure("voltage drop of one circuit", e, &necDropNote, tables.Percent, 3, 0).WithNote("advice, not enforced")
}

// drops works out the voltage drop running and starting, and the longest run.
func (r *Result) drops(c Circuit) (err error) {
	if c.Wiring.Length.IsZero() {
		return nil
	}
	e := c.Edition
	l := r.lineLoad()
	d := &r.Drop
	d.Limit = dropLimit(e)
	if c.Motor.Use == motor.FirePump {
		d.Limit = pumpRunning(e)
	}
	if d.Running, err = c.Wiring.RunningDrop(e, r.Branch, l); err != nil {
		return err
	}
	if d.LongestRun, err = c.Wiring.LongestRun(e, r.Branch, l, d.Limit); err != nil {
		return err
	}
	rotor := r.Demand.LockedRotor.High
	if share := startingShare(c.Motor.Starting); rotor.IsZero() || share == 0 || l.Phases == 0 || c.Motor.Starting == motor.Drive {
		return nil
	} else if share < 1 {
		rotor = tables.ComputedFigure("line current while starting", e, &wyeStart, tables.Ampere, rotor.Float()*share, 2, true, "a third of the locked-rotor current, rounded up to 0.01 A", rotor)
	}
	l.Current = rotor
	if _, l.PowerFactor = tables.TypicalPowerFactors(r.Demand.Horsepower); l.PowerFactor.IsZero() {
		l.PowerFactor = tables.StatedFigure("typical locked-rotor power factor", 0, &typicalFactor, tables.Plain, 35, 2)
	}
	d.Starting, err = c.Wiring.StartingDrop(e, r.Branch, l)
	return err
}
