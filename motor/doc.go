// Package motor describes electric motors and works out what a motor asks of
// its circuit: the currents that a code says to use for conductors, overload
// and short-circuit protection, the locked-rotor current, and the least
// ampacities that follow.
//
// Start with a [Motor] literal and its [Motor.Demand] under an edition of
// package tables. The codes go different ways: the NEC sizes conductors and
// short-circuit devices by its tables and overload by the nameplate; the CEC
// takes the nameplate for everything and its tables as guides. What a code does
// not tabulate is refused, or sized by the nameplate where the code says so.
//
// The figures guide a licensed person; the printed code, local amendments and
// the authority having jurisdiction decide.
package motor
