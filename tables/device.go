package tables

import (
	"fmt"

	"example.org/motorcircuit/internal/exact"
)

// A Device is a kind of branch-circuit short-circuit and ground-fault device.
// The zero Device is "not given".
type Device uint8

// The kinds of device.
const (
	NonTimeDelayFuse     Device = iota + 1
	TimeDelayFuse               // dual element
	InverseTimeBreaker          // thermal-magnetic
	InstantaneousBreaker        // magnetic only, part of a listed combination controller
	deviceCount
)

var deviceTexts = [...]string{"", "non_time_delay_fuse", "time_delay_fuse", "inverse_time_breaker", "instantaneous_breaker"}

// String returns the stable text form, "" for the zero Device.
func (d Device) String() string { return TextOf(d, deviceTexts[:]) }

// MarshalText is [Device.String].
func (d Device) MarshalText() ([]byte, error) { return []byte(d.String()), nil }

// UnmarshalText reads the text form; no text is "not given".
func (d *Device) UnmarshalText(text []byte) error {
	return ReadText(d, "device", text, deviceTexts[:])
}

// IsValid reports whether d is a kind of device.
func (d Device) IsValid() bool { return d > 0 && d < deviceCount }

// IsFuse reports whether d is a fuse.
func (d Device) IsFuse() bool { return d == NonTimeDelayFuse || d == TimeDelayFuse }

// A MotorType is a row of the tables of device percentages.
type MotorType uint8

// The types of motor that the tables tell apart.
const (
	SinglePhaseType   MotorType = iota
	CageType                    // polyphase squirrel cage
	EfficientCageType           // Design B energy efficient or premium efficiency
	SynchronousType
	WoundRotorType
	DirectCurrentType
	motorTypeCount
)

// A DeviceQuery asks for a device percentage.
type DeviceQuery struct {
	Device         Device
	Motor          MotorType
	ReducedVoltage bool   // started by autotransformer or star-delta
	Current        Figure // full-load current, which splits some rows
}

// DevicePercent returns the greatest rating of a short-circuit device as a
// percent of full-load current: NEC Table 430.52, CEC Table 29. For an
// instantaneous breaker under the CEC see [Edition.InstantaneousCaps].
func (e Edition) DevicePercent(q DeviceQuery) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	if !q.Device.IsValid() {
		return Figure{}, &InputError{Field: "device", Value: fmt.Sprint(uint8(q.Device)), Want: "a kind of short-circuit device"}
	}
	t := e.book().devices()
	for i := range t.rows {
		if r := &t.rows[i]; r.matches(q) && r.percent[q.Device] >= 0 {
			return newFigure(deviceNames[q.Device], Tabulated, e, t.rule, exact.New(r.percent[q.Device], 2), Percent).WithNote(r.note), nil
		}
	}
	return Figure{}, &NotTabulatedError{Field: "device", Table: t.rule.In(e), Row: "percent for " + q.Device.String(), Covers: "fuses and breakers for every type of motor"}
}

var deviceNames = [deviceCount]string{
	NonTimeDelayFuse: "non-time-delay fuse", TimeDelayFuse: "time-delay fuse",
	InverseTimeBreaker: "inverse-time breaker", InstantaneousBreaker: "instantaneous-trip breaker",
}

// Name returns the device in words.
func (d Device) Name() string {
	if d < deviceCount {
		return deviceNames[d]
	}
	return ""
}

type deviceTable struct {
	rule *Rule
	rows []deviceRow
}

// A deviceRow holds for the types of motor, the way of starting and the band of
// current that it is printed for.
type deviceRow struct {
	types     []MotorType
	reduced   int       // 1 reduced voltage only, -1 full voltage only, 0 any
	above, to exact.Num // above < current <= to; to 0 is no end
	percent   [deviceCount]int64
	note      string
}

func (r *deviceRow) matches(q DeviceQuery) bool {
	found := false
	for _, t := range r.types {
		found = found || t == q.Motor
	}
	return found && (r.reduced == 0 || (r.reduced > 0) == q.ReducedVoltage) &&
		(r.above.IsZero() || q.Current.value.Cmp(r.above) > 0) && (r.to.IsZero() || q.Current.value.Cmp(r.to) <= 0)
}

// deviceRowNames are the row names of both codes' files.
var deviceRowNames = map[string]struct {
	types []MotorType
	note  string
}{
	"single_phase":                                       {[]MotorType{SinglePhaseType}, "single-phase motors"},
	"ac_polyphase_other_than_wound_rotor":                {[]MotorType{}, ""},
	"squirrel_cage_other_than_design_b_energy_efficient": {[]MotorType{CageType}, "squirrel cage, other than Design B energy-efficient"},
	"design_b_energy_efficient_or_premium":               {[]MotorType{EfficientCageType}, "Design B energy-efficient or premium"},
	"synchronous":                                        {[]MotorType{SynchronousType}, "synchronous"},
	"wound_rotor":                                        {[]MotorType{WoundRotorType}, "wound rotor"},
	"dc_constant_voltage":                                {[]MotorType{DirectCurrentType}, "direct current"},
	"ac_single_phase_all_types":                          {[]MotorType{SinglePhaseType}, "single-phase, all types"},
	"ac_squirrel_cage_or_synchronous":                    {[]MotorType{CageType, EfficientCageType, SynchronousType}, "squirrel cage and synchronous"},
	"ac_wound_rotor":                                     {[]MotorType{WoundRotorType}, "wound rotor"},
	"dc":                                                 {[]MotorType{DirectCurrentType}, "direct current"},
}

func loadDevices(path string, rule *Rule) func() *deviceTable {
	return loaded(func() (*deviceTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &deviceTable{rule: rule}
		for row, cells := range g.Rows {
			name, ok := deviceRowNames[cells[0]]
			if !ok {
				return nil, fmt.Errorf("%s: unknown row %q", path, cells[0])
			}
			r := deviceRow{types: name.types, note: name.note}
			for d := range r.percent {
				r.percent[d] = -1
			}
			for col, head := range g.Header {
				switch head {
				case "motor_type":
				case "starting_method":
					switch cells[col] {
					case "any":
					case "full_voltage_resistor_or_reactor":
						r.reduced, r.note = -1, r.note+", full-voltage, resistor or reactor starting"
					case "autotransformer_or_star_delta":
						r.reduced, r.note = 1, r.note+", autotransformer or star-delta starting"
					default:
						return nil, fmt.Errorf("%s: unknown starting method %q", path, cells[col])
					}
				case "flc_from_a", "flc_to_a":
					h, err := g.Hundredths(row, col)
					if err != nil {
						return nil, err
					}
					if h < 0 {
						continue
					}
					if head == "flc_from_a" {
						r.above, r.note = exact.New(h, 2), r.note+", more than "+cells[col]+" A"
					} else {
						r.to, r.note = exact.New(h, 2), r.note+", not more than "+cells[col]+" A"
					}
				default:
					d, ok := deviceColumns[head]
					if !ok {
						return nil, fmt.Errorf("%s: unknown column %q", path, head)
					}
					if r.percent[d], err = g.Hundredths(row, col); err != nil {
						return nil, err
					}
				}
			}
			t.rows = append(t.rows, r)
		}
		return t, nil
	})
}

var deviceColumns = map[string]Device{
	"nontime_delay_fuse_pct": NonTimeDelayFuse, "non_time_delay_fuse_pct": NonTimeDelayFuse,
	"dual_element_time_delay_fuse_pct": TimeDelayFuse, "time_delay_fuse_pct": TimeDelayFuse,
	"inverse_time_breaker_pct":       InverseTimeBreaker,
	"instantaneous_trip_breaker_pct": InstantaneousBreaker,
}
