// Package conductor chooses the conductors of a circuit: from amperes asked for
// to a size, by insulation, termination temperature, ambient, conductors
// together, material and parallel sets, with the reason for each step.
//
// Start with a [Wiring] literal and [Wiring.Select]; for the conductors that
// enter a motor's terminal box under the CEC, [Wiring.SelectMotorSupply]. The
// package knows no motors: it is asked for amperes.
//
// The figures guide a licensed person; the printed code, local amendments and
// the authority having jurisdiction decide.
package conductor
