// Package protection sizes what protects and switches a motor circuit: the
// overload setting, the branch-circuit short-circuit and ground-fault device,
// the disconnecting means and the controller.
//
// Each function takes a motor and its demand from package motor, and an
// edition; the rules of each code stand in a file of its name.
//
// The figures guide a licensed person; the printed code, local amendments and
// the authority having jurisdiction decide.
package protection
