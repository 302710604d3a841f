package motor

import "example.org/motorcircuit/tables"

// A Kind is a kind of motor. The zero Kind is "not given" and is refused.
type Kind uint8

// The kinds of motor.
const (
	SquirrelCage  Kind = iota + 1 // polyphase induction, squirrel cage
	SinglePhase                   // single-phase, all types
	WoundRotor                    // polyphase induction, wound rotor
	Synchronous                   // three-phase synchronous
	DirectCurrent                 // direct current
	Torque                        // torque motor, rated by its locked-rotor current
	Hermetic                      // hermetic refrigerant motor-compressor
	kindCount
)

var kindTexts = [...]string{"", "squirrel_cage", "single_phase", "wound_rotor", "synchronous", "dc", "torque", "hermetic"}

var kindNames = [...]string{"", "squirrel cage motor", "single-phase motor", "wound-rotor motor", "synchronous motor",
	"direct-current motor", "torque motor", "hermetic motor-compressor"}

// String returns the stable text form, "" for the zero Kind.
func (k Kind) String() string { return tables.TextOf(k, kindTexts[:]) }

// Name returns the kind in words.
func (k Kind) Name() string { return tables.TextOf(k, kindNames[:]) }

// MarshalText is [Kind.String].
func (k Kind) MarshalText() ([]byte, error) { return []byte(k.String()), nil }

// UnmarshalText reads the text form; no text is "not given".
func (k *Kind) UnmarshalText(text []byte) error {
	return tables.ReadText(k, "motor.kind", text, kindTexts[:])
}

// phases returns the number of phases that a kind has if none is given.
func (k Kind) phases() int {
	switch k {
	case SinglePhase:
		return 1
	case DirectCurrent:
		return 0
	}
	return 3
}

// A Starting is a way to start a motor. The zero Starting is across the line.
type Starting uint8

// The ways to start a motor.
const (
	AcrossTheLine   Starting = iota // full voltage
	WyeDelta                        // wye (star) start, delta run
	PartWinding                     // part-winding start, halves of the winding
	Autotransformer                 // reduced voltage by autotransformer
	Resistor                        // primary resistor or reactor
	SoftStarter                     // solid-state reduced voltage
	Drive                           // adjustable-speed drive
	startingCount
)

var startingTexts = [...]string{"across_the_line", "wye_delta", "part_winding", "autotransformer", "resistor", "soft_starter", "drive"}

// String returns the stable text form.
func (s Starting) String() string { return tables.TextOf(s, startingTexts[:]) }

// MarshalText is [Starting.String].
func (s Starting) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// UnmarshalText reads the text form; no text is AcrossTheLine.
func (s *Starting) UnmarshalText(text []byte) error {
	return tables.ReadText(s, "motor.starting", text, startingTexts[:])
}

// An Efficiency is an efficiency class that a nameplate is marked with.
type Efficiency uint8

// The efficiency classes that the rules tell apart.
const (
	StandardEfficiency Efficiency = iota // no such marking
	EnergyEfficient
	PremiumEfficiency
	efficiencyCount
)

var efficiencyTexts = [...]string{"standard", "energy_efficient", "premium"}

// String returns the stable text form.
func (c Efficiency) String() string { return tables.TextOf(c, efficiencyTexts[:]) }

// MarshalText is [Efficiency.String].
func (c Efficiency) MarshalText() ([]byte, error) { return []byte(c.String()), nil }

// UnmarshalText reads the text form; no text is StandardEfficiency.
func (c *Efficiency) UnmarshalText(text []byte) error {
	return tables.ReadText(c, "motor.nameplate.efficiency_class", text, efficiencyTexts[:])
}
