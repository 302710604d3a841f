package protection_test

import (
	"errors"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// twoSpeed has windings of 12 and 28 A.
func twoSpeed() motor.Motor {
	m := motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("20"), Voltage: 460}
	m.Nameplate.Windings = []motor.Winding{{Amperes: motor.Amps("12")}, {Amperes: motor.Amps("28")}}
	return m
}

// pump is a fire pump of 50 hp, 460 V: locked rotor 363 A (NEC Table 430.251(B)).
func pump() motor.Motor {
	m := cage50()
	m.Use = motor.FirePump
	return m
}

// Each winding has overload protection of its own: NEC 430.32(A) by its markings,
// CEC Rule 28-808 at most 125 percent.
func TestOverloadOfWindings(t *testing.T) {
	high := twoSpeed()
	high.Nameplate.ServiceFactor = motor.Factor("1.15")
	for _, e := range necEditions {
		o := overload(t, e, twoSpeed())
		require.Len(t, o.Windings, 2)
		assert.Equal(t, "13.8 A", o.Windings[0].Limit.String(), "12 × 115 %")
		assert.Equal(t, "15.6 A", o.Windings[0].StartLimit.String(), "12 × 130 %")
		assert.Equal(t, "32.2 A", o.Windings[1].Limit.String())
		assert.Equal(t, "36.4 A", o.Windings[1].StartLimit.String())
		assert.Equal(t, "430.32(A)", ref(o.Windings[0].Limit))
		assert.Equal(t, "430.32(C)", ref(o.Windings[0].StartLimit))
		assert.Equal(t, "32.2 A", o.Limit.String(), "of the largest")
		o = overload(t, e, high)
		assert.Equal(t, "15 A", o.Windings[0].Limit.String(), "12 × 125 %")
		assert.Equal(t, "39.2 A", o.Windings[1].StartLimit.String(), "28 × 140 %")
	}
	for _, e := range cecEditions {
		for _, m := range []motor.Motor{twoSpeed(), high} {
			o := overload(t, e, m)
			require.Len(t, o.Windings, 2)
			assert.Equal(t, "15 A", o.Windings[0].Limit.String())
			assert.Equal(t, "35 A", o.Windings[1].Limit.String())
			assert.True(t, o.Windings[0].StartLimit.IsZero(), "the CEC has no second step")
			assert.Equal(t, "Rule 28-808", ref(o.Windings[0].Limit))
		}
	}
	assert.Empty(t, overload(t, tables.NEC2023, cage50()).Windings)
}

// The device of a multispeed motor goes by the largest winding, with the limit by
// the smallest beside it: NEC 430.52(C)(4), CEC Rule 28-806.
func TestDeviceOfWindings(t *testing.T) {
	for _, tt := range []struct {
		editions                     []tables.Edition
		limit, rating, smallest, ref string
	}{
		{necEditions, "49 A", "50 A", "21 A", "430.52(C)(4)"}, // 28 and 12 × 175 %
		{cecEditions, "49 A", "45 A", "21 A", "Rule 28-806"},
	} {
		for _, e := range tt.editions {
			x := device(t, e, timeDelay, twoSpeed())
			assert.Equal(t, tt.limit, x.Limit.String())
			assert.Equal(t, tt.rating, x.Rating.String())
			assert.Equal(t, tt.smallest, x.Smallest.String())
			assert.Equal(t, tt.ref, ref(x.Smallest))
			assert.True(t, testkit.Cautioned(x.Cautions, tt.ref, ""))
			assert.True(t, device(t, e, timeDelay, cage50()).Smallest.IsZero())
		}
	}
}

// A maximum device marked on the equipment wins over every limit and rating: NEC
// 430.52(C)(2), 440.22(C), CEC Rule 28-202. 65 A: 113.75 A, at most 146.25.
func TestMarkedMaximumDevice(t *testing.T) {
	for _, tt := range []struct {
		marked                                   string
		limit, rating, cecRating, start, startAt string
	}{
		{"150", "113.75 A", "125 A", "110 A", "146.25 A", "125 A"}, // above every figure
		{"125", "113.75 A", "125 A", "110 A", "125 A", "125 A"},
		{"124", "113.75 A", "110 A", "110 A", "124 A", "110 A"}, // not a standard rating: the next down
		{"113", "113 A", "110 A", "110 A", "113 A", "110 A"},
		{"90", "90 A", "90 A", "90 A", "90 A", "90 A"},
	} {
		m := cage50()
		m.Nameplate.MaximumDevice = motor.Amps(tt.marked)
		for _, e := range tables.Editions() {
			x := device(t, e, timeDelay, m)
			rating, rule := tt.rating, "430.52(C)(2)"
			if e.Code() == tables.CEC {
				rating, rule = tt.cecRating, "Rule 28-202"
			}
			assert.Equal(t, tt.limit, x.Limit.String(), "%v %s", e, tt.marked)
			assert.Equal(t, rating, x.Rating.String(), "%v %s", e, tt.marked)
			assert.Equal(t, tt.start, x.StartLimit.String(), "%v %s", e, tt.marked)
			assert.Equal(t, tt.startAt, x.StartRating.String(), "%v %s", e, tt.marked)
			if tt.marked == "90" {
				assert.Equal(t, rule, ref(x.Limit))
				assert.Equal(t, rule, ref(x.Rating))
			}
		}
	}
	for _, e := range necEditions {
		m := compressor("40", "", "")
		m.Nameplate.MaximumDevice = motor.Amps("60")
		x := device(t, e, breaker, m)
		assert.Equal(t, "60 A", x.Rating.String(), "not 70")
		assert.Equal(t, "440.22(C)", ref(x.Rating))
	}
	// Settings of an instantaneous-trip breaker are held too: 65 × 800 % = 520 A.
	m := cage50()
	m.Nameplate.MaximumDevice = motor.Amps("400")
	x := device(t, tables.NEC2023, magnetic, m)
	assert.Equal(t, "400 A", x.Limit.String())
	assert.Equal(t, "400 A", x.StartLimit.String())
	assert.Equal(t, "400 A", x.Instantaneous.String())
	// The marking wins over the 15 A that the CEC always allows.
	m.Nameplate.MaximumDevice = motor.Amps("10")
	_, err := protection.SizeShortCircuit(tables.CEC2024, timeDelay, m, demand(t, m, tables.CEC2024))
	var none *tables.NoSizeError
	require.True(t, errors.As(err, &none), "%v", err)
	assert.Equal(t, "device", none.Field)
}

// NEC 695.4(B)(2)(a): the device of a fire pump carries locked-rotor current for
// as long as it lasts, the next standard rating up; 695.6(C): no overload device.
func TestFirePump(t *testing.T) {
	marked := func(amps string) motor.Motor { m := pump(); m.Nameplate.LockedRotor = motor.Amps(amps); return m }
	letter := pump()
	letter.Nameplate.CodeLetter = "G" // 6.29 × 50 × 1000 ÷ (460 × √3) = 394.7 A
	for _, e := range necEditions {
		for _, d := range []tables.Device{nonTime, timeDelay, breaker} {
			for _, tt := range []struct {
				m             motor.Motor
				limit, rating string
			}{{pump(), "363 A", "400 A"}, {marked("400"), "400 A", "400 A"}, {marked("400.1"), "400.1 A", "450 A"}} {
				x := device(t, e, d, tt.m)
				assert.Equal(t, tt.limit, x.Limit.String())
				assert.Equal(t, tt.rating, x.Rating.String())
				assert.Equal(t, "695.4(B)(2)(a)", ref(x.Limit))
				assert.Equal(t, tables.MarkB, x.Limit.Mark())
				assert.True(t, x.StartLimit.IsZero())
				assert.True(t, testkit.Cautioned(x.Cautions, "695.4(B)(2)(a)", "FIRE PUMP"))
			}
			assert.Equal(t, "400 A", device(t, e, d, letter).Rating.String())
		}
		o := overload(t, e, pump())
		assert.True(t, o.Limit.IsZero())
		assert.True(t, o.StartLimit.IsZero())
		assert.True(t, o.Units.IsZero())
		assert.True(t, testkit.Cautioned(o.Cautions, "695.6(C)", "no overload protection"))

		// Without a locked-rotor current there is no device.
		a := pump()
		a.Nameplate.DesignLetter = "A"
		_, err := protection.SizeShortCircuit(e, timeDelay, a, demand(t, a, e))
		assert.Equal(t, "motor.nameplate.locked_rotor_amperes", tables.FieldOf(err))
	}
}

// A device inside the delta carries 58 percent, one in half of a part winding 50:
// NEC 430.32, 430.4; CEC Rule 28-306(2). 61 A × 115 % = 70.15 A.
func TestOverloadShare(t *testing.T) {
	for _, tt := range []struct {
		starting motor.Starting
		want     string
	}{{motor.WyeDelta, "40.687 A"}, {motor.PartWinding, "35.075 A"}, {motor.AcrossTheLine, ""}, {motor.Autotransformer, ""}, {motor.SoftStarter, ""}} {
		m := started(tt.starting, cage50())
		m.Nameplate.Amperes = motor.Amps("61")
		for _, e := range tables.Editions() {
			o := overload(t, e, m)
			assert.Equal(t, tt.want, o.Share.String(), "%v %v", e, tt.starting)
			assert.Equal(t, "70.15 A", o.Limit.String())
			if tt.want != "" {
				want := "430.32(A)(1)"
				if e.Code() == tables.CEC {
					want = "Rule 28-306(2)"
				}
				assert.Equal(t, want, ref(o.Share))
			}
		}
	}
}

// Two devices, one for each half of a part winding, are each half of the ordinary
// limit: NEC 430.4; CEC Rule 28-806, each run by its own current. 65 A.
func TestPartWindingHalves(t *testing.T) {
	m := started(motor.PartWinding, cage50())
	for _, tt := range []struct {
		editions  []tables.Edition
		device    tables.Device
		half      string
		limit     string // of one device for both; a time-delay fuse is held to 150 percent
		rating    string
		reference string
	}{
		{necEditions, nonTime, "97.5 A", "195 A", "200 A", "430.4"},
		{necEditions, breaker, "81.25 A", "162.5 A", "175 A", "430.4"},
		{necEditions, timeDelay, "56.875 A", "97.5 A", "90 A", "430.4"},
		{cecEditions, nonTime, "97.5 A", "195 A", "175 A", "Rule 28-806"},
		{cecEditions, breaker, "81.25 A", "162.5 A", "150 A", "Rule 28-806"},
	} {
		for _, e := range tt.editions {
			x := device(t, e, tt.device, m)
			assert.Equal(t, tt.half, x.Half.String(), "%v %v", e, tt.device)
			assert.Equal(t, tt.limit, x.Limit.String(), "%v %v", e, tt.device)
			assert.Equal(t, tt.rating, x.Rating.String(), "%v %v", e, tt.device)
			assert.Equal(t, tt.reference, ref(x.Half))
		}
	}
	for _, e := range tables.Editions() {
		assert.True(t, device(t, e, timeDelay, cage50()).Half.IsZero())
	}
}

// A valve actuator's device goes by its nameplate, NEC 430.6(D).
func TestValveActuatorDevice(t *testing.T) {
	m := cage50()
	m.Use, m.Nameplate.Amperes = motor.ValveActuator, motor.Amps("40")
	for _, e := range tables.Editions() {
		assert.Equal(t, "70 A", device(t, e, timeDelay, m).Rating.String(), "40 × 175 %")
		assert.Equal(t, "46 A", overload(t, e, m).Limit.String())
	}
}

// The rules that say why: CEC Rule 28-708 for the device of a compressor, NEC
// 440.12(A) for its horsepower and 430.130(A)(4) for an instantaneous trip before a
// drive.
func TestRulesThatSayWhy(t *testing.T) {
	for _, e := range tables.Editions() {
		err := protection.ValidateDevice(e, magnetic, motor.Hermetic)
		var input *tables.InputError
		require.ErrorAs(t, err, &input)
		assert.Equal(t, map[tables.Code]string{tables.NEC: "430.52(D), 440.22", tables.CEC: "Rule 28-708"}[e.Code()], input.Cite.Ref)
	}
	drive := cage50()
	drive.Starting, drive.Nameplate.DriveInput = motor.Drive, motor.Amps("60")
	for _, e := range necEditions {
		assert.True(t, testkit.Cautioned(device(t, e, magnetic, drive).Cautions, "430.130(A)(4)", "listed with the drive"))
		assert.False(t, testkit.Cautioned(device(t, e, magnetic, cage50()).Cautions, "430.130(A)(4)", ""))
		m := compressor("38", "", "")
		d, err := m.Demand(e)
		require.NoError(t, err)
		assert.Equal(t, "440.12(A)", protection.SizeDisconnect(e, m, d).Cite.Ref)
		d, err = cage50().Demand(e)
		require.NoError(t, err)
		assert.Equal(t, "430.109", protection.SizeDisconnect(e, cage50(), d).Cite.Ref)
	}
}

// A fire pump's device may be as large as what is marked and must not be larger
// (NEC 695.4(B)(2)(a), 430.52(C)(2)): 363 A asks for 400 A.
func TestFirePumpAtItsMarking(t *testing.T) {
	m := pump()
	for _, e := range necEditions {
		m.Nameplate.MaximumDevice = motor.Amps("400")
		assert.Equal(t, "400 A", device(t, e, timeDelay, m).Rating.String())
		m.Nameplate.MaximumDevice = motor.Amps("399.9")
		d, err := m.Demand(e)
		require.NoError(t, err)
		_, err = protection.SizeShortCircuit(e, timeDelay, m, d)
		require.ErrorAs(t, err, new(*tables.NoSizeError))
	}
}

// The higher ceiling that reaches just the ordinary rating gives no more, and is not
// told to be passed: 20 A × 225 % = 45 A beside 20 × 175 % = 35 A; 8 A × 175 % = 14 A,
// 15 A, and 8 × 225 % = 18 A, 15 A again (NEC 430.52(C)(1), 240.6(A)).
func TestStartRatingThatIsTheOrdinary(t *testing.T) {
	for _, e := range necEditions {
		s := device(t, e, timeDelay, drawing("8"))
		assert.Equal(t, "15 A 15 A", s.Rating.String()+" "+s.StartRating.String())
		assert.Equal(t, tables.NextDown, s.StartRating.Op())
		assert.False(t, testkit.Cautioned(s.Cautions, ref(s.StartLimit), "already stands"))
	}
}
