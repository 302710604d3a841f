package motorcircuit

import "example.org/motorcircuit/tables"

// A Report is what [Check] and [CheckFeeder] find.
type Report struct {
	Tag       string           `json:"tag,omitzero"`         // of the circuit or feeder
	Edition   tables.Edition   `json:"edition"`              // the code that it is held against
	Findings  []Finding        `json:"findings"`             // in the order of the derivation; never empty if anything was judged
	NotJudged []NotJudged      `json:"not_judged,omitempty"` // what could not be, and why
	Cautions  []tables.Caution `json:"cautions"`             // what the judgement rests on; never empty
}

// A Finding is one part of an installation held against one requirement. Code and
// Part together name the check, so that a later run of the same check can take
// the place of an earlier one.
type Finding struct {
	Code     FindingCode       `json:"code"`              // what the finding is about
	Part     string            `json:"part"`              // what is judged, as a path in [Installed] or [InstalledFeeder]: "branch", "windings[1].overload.setting_amperes"
	Severity Severity          `json:"severity"`          // a note tells of a requirement that is met
	Required tables.Figure     `json:"required,omitzero"` // the least or the greatest that the code allows
	Ceiling  bool              `json:"ceiling,omitzero"`  // required is the greatest that is allowed, otherwise the least
	Found    tables.Figure     `json:"found,omitzero"`    // what stands
	Margin   tables.Figure     `json:"margin,omitzero"`   // how far found is on the right side of required, in its unit; below zero it is on the wrong one
	Cites    []tables.Citation `json:"cites"`             // the rules and tables behind it
	Text     string            `json:"text"`              // one sentence in plain words
}

// A NotJudged is a part, or a property of one, that was not judged.
type NotJudged struct {
	Part string `json:"part"` // path in [Installed] or [InstalledFeeder]
	Why  string `json:"why"`  // not given, not asked for, or not to be judged
}

// A Severity tells how grave a finding is. The zero Severity is a note.
type Severity uint8

// The severities, least grave first.
const (
	Note      Severity = iota // the requirement is met
	Caution                   // it stands on a condition that somebody must confirm, or goes against advice
	Violation                 // the code does not allow it
)

var severityTexts = [...]string{"note", "caution", "violation"}

// String returns the stable text form.
func (s Severity) String() string { return tables.TextOf(s, severityTexts[:]) }

// MarshalText is [Severity.String].
func (s Severity) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// A FindingCode names what a finding is about. Its text form is stable.
type FindingCode uint8

// The codes of findings.
const (
	ConductorAmpacity    FindingCode = iota + 1 // conductors carry the load
	ConductorLeast                              // conductors are not below the smallest size allowed
	ConductorParallel                           // conductors in parallel are large enough to be
	ConductorInsulation                         // the insulation may be used where it is
	OverloadUnits                               // there are as many overload units as are asked for
	OverloadSetting                             // overload protection trips in time
	OverloadAbsent                              // there is no overload protection where none may be
	DeviceKind                                  // the kind of device may protect the motor
	DeviceRating                                // the device is not rated above what is allowed
	DeviceCarries                               // the device carries the current that it must
	InstantaneousSetting                        // the instantaneous trip is not set above what is allowed
	InterruptingRating                          // the device can interrupt the fault current
	SwitchAmperes                               // disconnecting means or controller is rated for the current
	SwitchHorsepower                            // disconnecting means or controller is rated for the power
	SwitchLockedRotor                           // disconnecting means or controller is rated for the locked-rotor current
	BondingSize                                 // the bonding conductor is large enough
	RacewayFilled                               // the raceway is not overfilled
	RacewayJam                                  // three conductors do not jam while they are pulled
	DropRunning                                 // voltage drop running
	DropStarting                                // voltage drop starting
	findingCodeCount
)

var findingTexts = [...]string{
	"", "conductor_ampacity", "conductor_least_size", "conductor_parallel_size", "conductor_insulation",
	"overload_units", "overload_setting", "overload_absent",
	"device_kind", "device_rating", "device_carries", "instantaneous_setting", "interrupting_rating",
	"switch_amperes", "switch_horsepower", "switch_locked_rotor",
	"bonding_size", "raceway_fill", "raceway_jam", "drop_running", "drop_starting",
}

// FindingCodes returns every code.
func FindingCodes() []FindingCode {
	var all []FindingCode
	for c := ConductorAmpacity; c < findingCodeCount; c++ {
		all = append(all, c)
	}
	return all
}

// String returns the stable text form.
func (c FindingCode) String() string { return tables.TextOf(c, findingTexts[:]) }

// MarshalText is [FindingCode.String].
func (c FindingCode) MarshalText() ([]byte, error) { return []byte(c.String()), nil }

// Violations returns the findings that are violations; none if all that was judged
// may stand.
func (r Report) Violations() []Finding {
	var list []Finding
	for _, f := range r.Findings {
		if f.Severity == Violation {
			list = append(list, f)
		}
	}
	return list
}
