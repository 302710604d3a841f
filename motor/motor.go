package motor

import "example.org/motorcircuit/tables"

// A Motor is one motor as a designer knows it. Kind, Power and Voltage are
// required; Power may give way to Nameplate.Amperes where the code sizes by the
// nameplate. The comment of each other field says what its zero means.
type Motor struct {
	Kind      Kind         `json:"kind"`               // what motor it is
	Phases    int          `json:"phases,omitzero"`    // 1, 2 or 3; zero is the kind's own (direct current has none)
	Power     tables.Power `json:"power,omitzero"`     // rated output in hp or kW, see [HP] and [KW]; never converted
	Voltage   int          `json:"voltage,omitzero"`   // rated volts, or a system voltage that the tables allow for it
	Nameplate Nameplate    `json:"nameplate,omitzero"` // what the motor is marked with
	Duty      Duty         `json:"duty,omitzero"`      // zero is continuous
	Starting  Starting     `json:"starting,omitzero"`  // zero is across the line

	Bypass    bool                `json:"bypass,omitzero"`    // the drive can be bypassed, so that the line feeds the motor
	Resistor  tables.ResistorDuty `json:"resistor,omitzero"`  // duty of resistors apart from the controller; zero is none
	Rectifier Rectifier           `json:"rectifier,omitzero"` // single-phase rectifier that feeds a direct-current motor (NEC)
	Use       Use                 `json:"use,omitzero"`       // zero is ordinary
}

// A Nameplate is what a motor is marked with. Each zero field is "not marked".
type Nameplate struct {
	Amperes         tables.Current     `json:"amperes,omitzero"`                  // full-load current; rated-load current of a hermetic compressor; locked-rotor current of a torque motor
	Secondary       tables.Current     `json:"secondary_amperes,omitzero"`        // full-load secondary current of a wound rotor
	LockedRotor     tables.Current     `json:"locked_rotor_amperes,omitzero"`     // marked locked-rotor current
	BranchSelection tables.Current     `json:"branch_selection_amperes,omitzero"` // branch-circuit selection current of a hermetic compressor
	DriveInput      tables.Current     `json:"drive_input_amperes,omitzero"`      // rated input current of the drive that feeds the motor
	RectifierInput  tables.Current     `json:"rectifier_input_amperes,omitzero"`  // rated input current of the rectifier that feeds a direct-current motor
	MinimumAmpacity tables.Current     `json:"minimum_circuit_ampacity,omitzero"` // marked on refrigeration equipment
	MaximumDevice   tables.Current     `json:"maximum_device_rating,omitzero"`    // marked on the equipment or its controller: never exceeded
	Windings        []Winding          `json:"windings,omitempty"`                // of a multispeed motor, in place of Amperes
	ServiceFactor   tables.Ratio       `json:"service_factor,omitzero"`           // 1 to 2
	TemperatureRise tables.Temperature `json:"temperature_rise,omitzero"`         // in °C
	PowerFactor     tables.Ratio       `json:"power_factor,omitzero"`             // above 0, at most 1; of a synchronous motor 1, 0.9 or 0.8
	Efficiency      tables.Ratio       `json:"efficiency,omitzero"`               // above 0, below 1
	SpeedRPM        int                `json:"speed_rpm,omitzero"`                // full-load speed in revolutions a minute
	CodeLetter      string             `json:"code_letter,omitzero"`              // locked-rotor code letter, A to V
	DesignLetter    string             `json:"design_letter,omitzero"`            // NEMA design A, B, C or D
	EfficiencyClass Efficiency         `json:"efficiency_class,omitzero"`         // tells Design B energy-efficient and premium motors
	InsulationClass string             `json:"insulation_class,omitzero"`         // A, B, F or H; "" counts as B under the CEC
	NonVentilated   bool               `json:"non_ventilated,omitzero"`           // totally enclosed, non-ventilated
	HighTorque      bool               `json:"high_torque,omitzero"`              // built for high torque
	Multispeed      bool               `json:"multispeed,omitzero"`               // more than one speed: Amperes is the highest of them
	ThermalProtect  bool               `json:"thermally_protected,omitzero"`      // has an integral thermal protector
	Appliance       bool               `json:"appliance,omitzero"`                // listed motor-operated appliance marked with horsepower and current
	FanMotor        bool               `json:"fan_motor,omitzero"`                // shaded-pole or permanent-split-capacitor fan or blower motor marked with its type
}

// A Duty is the service that a motor does and its time rating.
type Duty struct {
	Kind    tables.Duty `json:"kind,omitzero"`    // zero is continuous
	Minutes int         `json:"minutes,omitzero"` // time rating of the motor: 5, 15, 30 or 60; zero is rated for continuous running
}

// The kinds of duty.
const (
	Continuous   = tables.Continuous
	ShortTime    = tables.ShortTime
	Intermittent = tables.Intermittent
	Periodic     = tables.Periodic
	Varying      = tables.Varying
)

// HP returns a power in horsepower, such as HP("7-1/2"). It panics on a typing
// slip; to read input use [tables.ParseHP].
func HP(s string) tables.Power { return tables.Must(tables.ParseHP(s)) }

// KW returns a power in kilowatts, such as KW("30"). It panics on a typing
// slip; to read input use [tables.ParseKW].
func KW(s string) tables.Power { return tables.Must(tables.ParseKW(s)) }

// Amps returns a current, such as Amps("10.4"). It panics on a typing slip; to
// read input use [tables.ParseCurrent].
func Amps(s string) tables.Current { return tables.Must(tables.ParseCurrent(s)) }

// Factor returns a ratio, such as a service factor of Factor("1.15"). It panics
// on a typing slip; to read input use [tables.ParseRatio].
func Factor(s string) tables.Ratio { return tables.Must(tables.ParseRatio(s)) }

// Celsius returns a temperature or a temperature rise, such as Celsius("40").
// It panics on a typing slip; to read input use [tables.ParseTemperature].
func Celsius(s string) tables.Temperature { return tables.Must(tables.ParseTemperature(s)) }

// PhaseCount returns the number of phases, the kind's own if none is given; 0
// for direct current.
func (m Motor) PhaseCount() int {
	if m.Phases != 0 {
		return m.Phases
	}
	return m.Kind.phases()
}

// Table returns the table of full-load current that serves the motor by its kind
// and phases.
func (m Motor) Table() tables.MotorTable {
	switch {
	case m.Kind == DirectCurrent:
		return tables.DirectCurrentTable
	case m.PhaseCount() == 1:
		return tables.SinglePhaseTable
	case m.PhaseCount() == 2:
		return tables.TwoPhaseTable
	case m.Kind == Synchronous:
		return tables.SynchronousTable
	}
	return tables.InductionTable
}

// lowSpeed reports a motor built for a lower speed than 1200 r/min, the
// synchronous speed of six poles at 60 Hz. The next lower, of eight poles, is 900.
func (m Motor) lowSpeed() bool {
	return m.Kind != DirectCurrent && m.Nameplate.SpeedRPM > 0 && m.Nameplate.SpeedRPM <= 900
}

// sixPole reports a nameplate speed between the two, slip included: a motor
// built for 1200 r/min, though its own speed is less.
func (m Motor) sixPole() bool {
	return m.Kind != DirectCurrent && m.Nameplate.SpeedRPM > 900 && m.Nameplate.SpeedRPM < 1200
}

// ReducedVoltage reports a start by autotransformer or wye-delta, which the
// device table of the CEC tells apart.
func (s Starting) ReducedVoltage() bool { return s == Autotransformer || s == WyeDelta }

// IsDesignBCD reports a motor marked Design B, C or D, whose conductors NEC
// 110.14(C)(1)(a)(4) lets be taken at 75 °C.
func (m Motor) IsDesignBCD() bool {
	switch m.Nameplate.DesignLetter {
	case "B", "C", "D", "b", "c", "d":
		return true
	}
	return false
}

// LineConductors returns the number of current-carrying conductors of the
// branch circuit: three for three phases, four for two, two otherwise.
func (m Motor) LineConductors() int {
	switch m.PhaseCount() {
	case 3:
		return 3
	case 2:
		return 4
	}
	return 2
}

// SupplyConductors returns the number of current-carrying conductors between
// controller and motor: six for a wye-delta or part-winding start.
func (m Motor) SupplyConductors() int {
	if m.Starting == WyeDelta || m.Starting == PartWinding {
		return 6
	}
	return m.LineConductors()
}
