package tables

import "example.org/motorcircuit/internal/exact"

// A book is the tables of one code. What an edition prints otherwise is chosen
// by the edition where the book takes one. A nil entry is a table that the code
// does not have.
type book struct {
	motors            string // the part of the code that motors stand in
	fullLoad          [motorTableCount]func() *motorTable
	lockedRotor1      func(Edition) *motorTable
	lockedRotor3      func() *motorTable
	duty              func() *dutyTable
	devices           func() *deviceTable
	ceilings          func() *ceilingTable
	instantaneous     func() *instantaneousTable
	ratings           func(Edition, Device) *ratingTable
	overloadUnits     func() *unitsTable
	supplyInsulation  func() *supplyInsulationTable
	raceway           [materialCount]func() *ampacityData
	freeAir           [materialCount]func() *ampacityData
	ambient           func() *ambientTable
	count             func() *countTable
	spacing           func() *countTable
	insulations       func() *insulationTable
	bonding           func(Edition) *bondingTable
	secondaryResistor func() *resistorTable
	dcResistor        func() *resistorTable
	raceways          func() *racewayTable
	dimensions        func() *dimensionTable
	bareAreas         func() map[Size]exact.Num
	smallConductors   func() []smallConductor
}

func (e Edition) book() *book {
	if e.Code() == CEC {
		return &cecBook
	}
	return &necBook
}
