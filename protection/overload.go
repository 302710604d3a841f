package protection

import (
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// An Overload is the running overload protection of a motor. Both limits are
// ceilings: nothing is rounded up beyond them.
type Overload struct {
	Limit      tables.Figure    `json:"limit,omitzero"`             // greatest trip setting; absent where no overload protection is wanted
	StartLimit tables.Figure    `json:"start_limit,omitzero"`       // greatest setting if the motor will not start or carry its load; absent where the code has no second step
	Share      tables.Figure    `json:"share_limit,omitzero"`       // greatest setting of a device inside the delta or in half of the winding
	Protector  tables.Figure    `json:"thermal_protector,omitzero"` // greatest ultimate trip current of an integral thermal protector, where the motor has one (NEC)
	Windings   []WindingLimit   `json:"windings,omitempty"`         // of a multispeed motor, in the order given
	Units      tables.Figure    `json:"units,omitzero"`             // number of overload units; its note says in which conductors
	Cautions   []tables.Caution `json:"-"`
}

// A WindingLimit is the overload protection of one winding of a multispeed motor.
type WindingLimit struct {
	Limit      tables.Figure `json:"limit"`                // greatest trip setting
	StartLimit tables.Figure `json:"start_limit,omitzero"` // the same if the motor will not start
}

// SizeOverload works out the overload protection of a motor.
func SizeOverload(e tables.Edition, m motor.Motor, d motor.Demand) (Overload, error) {
	units, err := e.OverloadUnits(m.PhaseCount())
	if err != nil {
		return Overload{}, err
	}
	o := Overload{Units: units}
	if m.Use == motor.FirePump && e.Code() == tables.NEC {
		o.Units = tables.Figure{}
		o.caution(e, &necFirePumpOverload, "a fire pump motor has no overload protection: it runs to destruction rather than stop")
		return o, nil
	}
	if e.Code() == tables.CEC {
		o.cec(e, m, d)
	} else {
		o.nec(e, m, d)
	}
	return o, nil
}

// share holds a device inside the delta of a wye-delta start to 58 percent of the
// limit, and one in half of a part winding to 50 percent.
func (o *Overload) share(e tables.Edition, rule *tables.Rule, s motor.Starting) {
	switch s {
	case motor.WyeDelta:
		o.Share = percentOf("greatest setting of a device inside the delta", e, rule, o.Limit, 58, "share of the current that it carries")
	case motor.PartWinding:
		o.Share = percentOf("greatest setting of a device in half of the winding", e, rule, o.Limit, 50, "share of the current that it carries")
	}
}

func (o *Overload) caution(e tables.Edition, rule *tables.Rule, text string) {
	o.Cautions = append(o.Cautions, tables.Caution{Text: text, Cite: rule.In(e)})
}

// The names of the overload figures.
const (
	overloadName      = "greatest overload setting"
	overloadStartName = "greatest overload setting if the motor will not start"
)

// percentOf returns percent × current.
func percentOf(name string, e tables.Edition, rule *tables.Rule, current tables.Figure, percent int, note string) tables.Figure {
	p := tables.StatedFigure("of the current", e, rule, tables.Percent, int64(percent), 0)
	if note != "" {
		p = p.WithNote(note)
	}
	return tables.ProductOf(name, e, rule, current, p)
}

var (
	eightHundred = tables.Whole("rating", tables.Ampere, 800)
	servicePoint = motor.Factor("1.15")
	risePoint    = motor.Celsius("40")
)

// highService reports a marked service factor of 1.15 or more.
func highService(n motor.Nameplate) bool {
	return !n.ServiceFactor.IsZero() && n.ServiceFactor.Cmp(servicePoint) >= 0
}
