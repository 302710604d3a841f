package motorcircuit_test

import (
	"encoding"
	"reflect"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// longText is a text that no field has room for.
var longText = strings.Repeat("Q", 4096)

// absurdities are what a value of a type may be set to and never should be.
func absurdities(v reflect.Value) (set []func()) {
	if text, ok := v.Addr().Interface().(encoding.TextUnmarshaler); ok && v.Kind() == reflect.Struct {
		for _, s := range []string{"0", "0.000001", "999999999", "-60", "999999999 hp", "1/64 hp", "0.001 kW", "999999 m", "0.001 ft"} {
			set = append(set, func() { _ = text.UnmarshalText([]byte(s)) })
		}
		return set
	}
	switch v.Kind() {
	case reflect.Int:
		for _, n := range []int64{-1 << 62, -1, 1, 1 << 62} {
			set = append(set, func() { v.SetInt(n) })
		}
	case reflect.Uint8:
		for _, n := range []uint64{0, 3, 9, 31, 99, 101, 255} {
			set = append(set, func() { v.SetUint(n) })
		}
	case reflect.String:
		for _, s := range []string{longText, "\x00\xff", "RW90", "TW", "½"} {
			set = append(set, func() { v.SetString(s) })
		}
	case reflect.Bool:
		set = append(set, func() { v.SetBool(!v.Bool()) })
	case reflect.Slice:
		set = append(set, func() { v.Set(reflect.MakeSlice(v.Type(), 300, 300)) }, func() { v.SetZero() })
	}
	return set
}

// leaves visits every value in a structure that holds no other, with its path.
func leaves(v reflect.Value, path string, visit func(reflect.Value, string)) {
	if _, ok := v.Addr().Interface().(encoding.TextUnmarshaler); ok {
		visit(v, path)
		return
	}
	switch v.Kind() {
	case reflect.Struct:
		for i := range v.NumField() {
			leaves(v.Field(i), path+"."+v.Type().Field(i).Name, visit)
		}
	case reflect.Slice:
		visit(v, path)
		for i := range v.Len() {
			leaves(v.Index(i), path+"[]", visit)
		}
	default:
		visit(v, path)
	}
}

// spoiled calls the check once for every absurd value of every field of what make
// returns, and holds that each gives a sound report or errors that name their fields
// and are short.
func spoiled(t *testing.T, fresh func() any, check func(any) (motorcircuit.Report, error)) {
	t.Helper()
	fields, refused := 0, 0
	leaves(reflect.ValueOf(fresh()).Elem(), "", func(v reflect.Value, path string) {
		for i := range absurdities(v) {
			x := fresh()
			leaves(reflect.ValueOf(x).Elem(), "", func(w reflect.Value, at string) {
				if at == path {
					absurdities(w)[i]()
				}
			})
			fields++
			report, err := check(x)
			if err != nil {
				refused++
				require.Less(t, strings.Count(err.Error(), "Q"), 500, path)
			}
			soundReport(t, report, err)
		}
	})
	assert.Greater(t, fields, 300)
	assert.Greater(t, refused, fields/4)
	assert.Less(t, refused, fields, "not all are absurd there")
}

// Absurd values of any field of a circuit or of what is installed.
func TestCheckOfAbsurdValues(t *testing.T) {
	type both struct {
		C  motorcircuit.Circuit
		In motorcircuit.Installed
	}
	bases := []motorcircuit.Circuit{pump("50", 460, protection.InverseTimeBreaker, plate("61", "1.15")), wyeDelta, twoSpeeds, crane, chiller, bypass, hoist}
	if testing.Short() {
		bases = bases[2:3]
	}
	for _, e := range []tables.Edition{tables.NEC2017, tables.CEC2024} {
		for _, base := range bases {
			spoiled(t, func() any {
				c := base
				c.Edition, c.Fault, c.Wiring.Ambient = e, motor.Amps("14000"), motor.Celsius("40")
				c.Motor.Nameplate.Windings = append([]motor.Winding(nil), c.Motor.Nameplate.Windings...)
				in := motorcircuit.Installed{Branch: wire("4"), MotorSupply: wire("4"), Secondary: wire("4"), Resistor: wire("4"), Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("40"), Units: 3},
					Device: rated("60"), Disconnect: motorcircuit.Switch{Amperes: motor.Amps("100"), Horsepower: motor.HP("50")}, Controller: motorcircuit.Switch{Horsepower: motor.HP("50")}, Bonding: motorcircuit.BondingConductors{Size: sizeOf("6")},
					Raceway: motorcircuit.InstalledRaceway{Type: conductor.EMT, Trade: "2", Others: []conductor.Pull{{Size: sizeOf("12"), Count: 2}}}, Flexible: motorcircuit.InstalledRaceway{Type: conductor.LFMC, Trade: "2"}, Length: conductor.Metres("40")}
				for range c.Motor.Nameplate.Windings {
					in.Windings = append(in.Windings, motorcircuit.InstalledWinding{Conductors: wire("10")})
				}
				return &both{c, in}
			}, func(x any) (motorcircuit.Report, error) {
				b := x.(*both)
				return motorcircuit.Check(b.C, b.In)
			})
		}
	}
}

// The same of a feeder and its circuits.
func TestCheckFeederOfAbsurdValues(t *testing.T) {
	type both struct {
		F  motorcircuit.Feeder
		In motorcircuit.InstalledFeeder
	}
	editions := []tables.Edition{tables.CEC2024, tables.NEC2017}
	if testing.Short() {
		editions = editions[:1]
	}
	for _, e := range editions {
		spoiled(t, func() any {
			f := feeder(e, cage("a", "30", 460, startsWith("line")), cage("b", "15", 460, startsWith("line")), compressor("c", "38", ""))
			f.Fault, f.Wiring.Ambient, f.Continuous = motor.Amps("14000"), motor.Celsius("40"), motor.Amps("10")
			return &both{f, motorcircuit.InstalledFeeder{Conductors: wire("1/0"), Device: rated("200"), Disconnect: motorcircuit.Switch{Amperes: motor.Amps("200"), Horsepower: motor.HP("100")}, Bonding: motorcircuit.BondingConductors{Size: sizeOf("4")},
				Raceway: motorcircuit.InstalledRaceway{Type: conductor.EMT, Trade: "2", Others: []conductor.Pull{{Size: sizeOf("12"), Count: 2}}}, Length: conductor.Metres("40")}}
		}, func(x any) (motorcircuit.Report, error) {
			b := x.(*both)
			return motorcircuit.CheckFeeder(b.F, b.In)
		})
	}
}
