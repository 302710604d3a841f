// Package phasor is the library's physics of circuits in steady state, in
// float64: voltage drop, starting dip and fault current along a run. What the
// codes reckon exactly is not here.
package phasor

import "math"

// A Run is a run of conductors: its resistance and reactance in ohms, one
// conductor from end to end.
type Run struct{ R, X float64 }

// Drop returns the share of the sending voltage that is lost along a run to a
// load of constant current at a lagging power factor: the exact form of IEEE
// 141-1993, 3.11. Volts is line to line for three phases and the line voltage
// otherwise, where the current goes out and back. It returns +Inf if the run
// cannot deliver the current.
func Drop(volts float64, threePhase bool, amps, pf float64, run Run) float64 {
	volts, run = perLoop(volts, threePhase, run)
	sin := math.Sqrt(1 - pf*pf)
	along := amps * (run.R*pf + run.X*sin)
	across := amps * (run.X*pf - run.R*sin)
	if math.Abs(across) >= volts {
		return math.Inf(1)
	}
	return (volts + along - math.Sqrt(volts*volts-across*across)) / volts
}

// Dip returns the share of the sending voltage that is lost along a run to a
// motor with its rotor locked, as a constant impedance that draws amps at the
// given power factor at full voltage.
func Dip(volts float64, threePhase bool, amps, pf float64, run Run) float64 {
	volts, run = perLoop(volts, threePhase, run)
	z := volts / amps
	r, x := z*pf, z*math.Sqrt(1-pf*pf)
	return 1 - z/math.Hypot(r+run.R, x+run.X)
}

// Fault returns the bolted fault current at the end of a run, from that at its
// beginning: three-phase, or line to line of a single-phase circuit. XR is the
// source's ratio of reactance to resistance; 0 takes a source of reactance alone,
// which gives the most current.
func Fault(volts float64, threePhase bool, source, xr float64, run Run) float64 {
	volts, run = perLoop(volts, threePhase, run)
	z := volts / source
	r, x := 0.0, z
	if xr > 0 {
		r = z / math.Hypot(1, xr)
		x = r * xr
	}
	return volts / math.Hypot(r+run.R, x+run.X)
}

// perLoop brings a circuit to one loop: to neutral for three phases, out and
// back otherwise.
func perLoop(volts float64, threePhase bool, run Run) (float64, Run) {
	if threePhase {
		return volts / math.Sqrt(3), run
	}
	return volts, Run{2 * run.R, 2 * run.X}
}
