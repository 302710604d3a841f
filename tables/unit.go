package tables

// A Unit is the unit of a [Figure].
type Unit uint8

// The units. The zero Unit is a plain number.
const (
	Plain Unit = iota
	Ampere
	Volt
	Percent
	Horsepower
	Kilowatt
	Celsius
	KVAPerHorsepower
	Metre
	Inch
	Millimetre
	SquareInch
	SquareMillimetre
	OhmPerKft
	OhmPerKm
	Kiloampere
	Second
)

var unitSymbols = [...]string{"", "A", "V", "%", "hp", "kW", "°C", "kVA/hp", "m", "in", "mm", "in²", "mm²", "Ω/kft", "Ω/km", "kA", "s"}

// String returns the unit's symbol, "" for a plain number.
func (u Unit) String() string {
	if int(u) < len(unitSymbols) {
		return unitSymbols[u]
	}
	return ""
}

// MarshalText is [Unit.String].
func (u Unit) MarshalText() ([]byte, error) { return []byte(u.String()), nil }
