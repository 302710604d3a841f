package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// Two motors of 30 hp at 460 V, 40 A each, behind inverse-time breakers.
func twoMotors(changes ...change) list {
	changes = append(changes, behind(protection.InverseTimeBreaker))
	return list{cage("a", "30", 460, changes...), cage("b", "30", 460, changes...)}
}

// Feeders judged by hand: what is required and found, by code and part.
var checkFeederCases = []struct {
	name      string
	editions  []tables.Edition
	circuits  list
	demand    string
	installed motorcircuit.InstalledFeeder
	want      map[string]string
	source    string
}{
	{"start together", cecEditions, twoMotors(startsWith("line")), "", motorcircuit.InstalledFeeder{Conductors: wire("3"), Device: rated("200")},
		map[string]string{"conductor_ampacity conductors": "note 90 A 100 A", "device_rating device.rating_amperes": "note 200 A 200 A"}, "Rule 28-204(2): one motor of 80 A × 250 %; 28-108(1): 50 + 40"},
	{"start together, above", cecEditions, twoMotors(startsWith("line")), "", motorcircuit.InstalledFeeder{Conductors: wire("3"), Device: rated("225")},
		map[string]string{"device_rating device.rating_amperes": "violation 200 A 225 A"}, "as above"},
	{"start together on small conductors", cecEditions, twoMotors(startsWith("line")), "", motorcircuit.InstalledFeeder{Conductors: wire("8"), Device: rated("175")},
		map[string]string{"conductor_ampacity conductors": "violation 90 A 50 A", "device_rating device.rating_amperes": "violation 150 A 175 A"}, "Rule 28-204(2): 300 % of the 50 A that is there; 28-204(1): 100 + 40 A"},
	{"do not start together", cecEditions, twoMotors(), "", motorcircuit.InstalledFeeder{Conductors: wire("3"), Device: rated("150")},
		map[string]string{"device_rating device.rating_amperes": "violation 140 A 150 A"}, "Rule 28-204(1): 100 + 40 A"},
	{"together is no rule of the NEC", necEditions, twoMotors(startsWith("line")), "", motorcircuit.InstalledFeeder{Device: rated("150")},
		map[string]string{"device_rating device.rating_amperes": "violation 140 A 150 A"}, "430.62(A): 100 + 40 A"},

	{"demand", cecEditions, twoMotors(), "0.8", motorcircuit.InstalledFeeder{Conductors: wire("4"), Device: rated("100")},
		map[string]string{"conductor_ampacity conductors": "note 72 A 85 A", "device_rating device.rating_amperes": "violation 90 A 100 A"}, "Rules 28-108(3), 28-204(4): 90 × 0.8; Table 13 steps 85 A up to 90 A"},
	{"demand, larger conductors", cecEditions, twoMotors(), "0.8", motorcircuit.InstalledFeeder{Conductors: wire("2"), Device: rated("100")},
		map[string]string{"device_rating device.rating_amperes": "note 125 A 100 A"}, "Table 13 steps 115 A up to 125 A"},
	{"demand, NEC", necEditions, twoMotors(), "0.8", motorcircuit.InstalledFeeder{Conductors: wire("4"), Device: rated("125")},
		map[string]string{"conductor_ampacity conductors": "note 72 A 85 A", "device_rating device.rating_amperes": "note 140 A 125 A"}, "430.26, 430.62(A)"},

	{"group switch, CEC", cecEditions, twoMotors(), "", motorcircuit.InstalledFeeder{Disconnect: motorcircuit.Switch{Amperes: motor.Amps("85"), Horsepower: motor.HP("25")}},
		map[string]string{"switch_amperes disconnecting_means.amperes": "violation 86 A 85 A", "switch_horsepower disconnecting_means.horsepower": "violation 30 hp 25 hp"}, "Rule 28-602(2): 40 × 115 % + 40; the larger motor"},
	{"group switch, NEC", necEditions, twoMotors(), "", motorcircuit.InstalledFeeder{Disconnect: motorcircuit.Switch{Amperes: motor.Amps("92"), Horsepower: motor.HP("60"), LockedRotor: motor.Amps("435")}},
		map[string]string{"switch_amperes disconnecting_means.amperes": "note 92 A 92 A", "switch_horsepower disconnecting_means.horsepower": "violation 75 hp 60 hp", "switch_locked_rotor disconnecting_means.locked_rotor_amperes": "violation 436 A 435 A"},
		"430.110(C): 80 × 115 %; 80 A is 75 hp (96 A), 2 × 218 A of Table 430.251(B)"},

	{"one at a time", everyone, twoMotors(locked("x", "")), "", motorcircuit.InstalledFeeder{Conductors: wire("8"), Device: rated("110")},
		map[string]string{"conductor_ampacity conductors": "note 50 A 50 A", "device_rating device.rating_amperes": "violation 100 A 110 A"}, "430.24 Exception No. 3, Rule 28-108(2)"},
	{"a compressor at its higher limit", to2020, list{compressor("c", "40", "")}, "", motorcircuit.InstalledFeeder{Device: rated("80")},
		map[string]string{"device_rating device.rating_amperes": "violation 70 A 80 A"}, "440.22(A), 430.62(A): 40 × 175 %"},
	{"a compressor that starts hard", necEditions, list{with(compressor("c", "40", ""), hardStart)}, "", motorcircuit.InstalledFeeder{Device: rated("90")},
		map[string]string{"device_rating device.rating_amperes": "note 90 A 90 A"}, "440.22(A): 40 × 225 %"},
	{"not rounded up", from2023, list{compressor("c", "30", ""), compressor("d", "5", "")}, "", motorcircuit.InstalledFeeder{Device: rated("70")},
		map[string]string{"device_rating device.rating_amperes": "violation 65 A 70 A"}, "440.22(A) Exception No. 1: 52.5, 60 A; and 5 A"},
}

func TestCheckFeederCases(t *testing.T) {
	for _, tt := range checkFeederCases {
		for _, e := range tt.editions {
			t.Run(tt.name+"/"+e.String(), func(t *testing.T) {
				f := feeder(e, tt.circuits...)
				f.Device = protection.InverseTimeBreaker
				if tt.demand != "" {
					f.Demand = motor.Factor(tt.demand)
				}
				got := map[string]string{}
				for _, x := range checkedFeeder(t, f, tt.installed).Findings {
					got[x.Code.String()+" "+x.Part] = x.Severity.String() + " " + x.Required.String() + " " + x.Found.String()
				}
				for key, want := range tt.want {
					assert.Equal(t, want, got[key], "%s: %s", key, tt.source)
				}
			})
		}
	}
}

// Each published feeder, installed as it is printed, stands; the next standard rating
// does not.
func TestCheckAcceptsPublishedFeeders(t *testing.T) {
	held := 0
	for _, x := range readExamples(t) {
		if !x.in.isFeeder() {
			continue
		}
		for _, e := range everyone {
			if e.Code().String() != x.code {
				continue
			}
			f := x.in.feeder(t, e)
			var in motorcircuit.InstalledFeeder
			if raw, ok := x.want["feeder_conductor_size"]; ok {
				in.Conductors = wire(trimmed(string(raw)))
				held++
			}
			raw, ok := x.want["feeder_ocpd_max_a"]
			if ok {
				in.Device = rated(trimmed(string(raw)))
				held++
			}
			assert.Empty(t, checkedFeeder(t, f, in).Violations(), "%s of %s under %v", x.id, x.publication, e)
			if ok {
				in.Device.Rating = tables.CurrentAtMost(f.Edition.RatingAtOrAbove(protection.TimeDelayFuse, more(in.Device.Rating.Figure("rating")).Figure("rating"), "next", nil))
				bad := checkedFeeder(t, f, in).Violations()
				if assert.Len(t, bad, 1, x.id) {
					assert.Equal(t, motorcircuit.DeviceRating, bad[0].Code)
				}
			}
		}
	}
	assert.GreaterOrEqual(t, held, 10)
}
