package motorcircuit

import "example.org/motorcircuit/internal/jsonin"

// The inputs are read from JSON strictly, and all faults come back joined: each a
// [tables.InputError] with the path of its field, such as
// "circuits[2].circuit.motor.power"; unknown and repeated keys are faults. With an
// error comes the zero value. That a value can be read does not say that it can
// stand: Size, SizeFeeder, SizeGroup, Check and CheckFeeder tell that.

// UnmarshalJSON reads a circuit, for [json.Unmarshal].
func (c *Circuit) UnmarshalJSON(data []byte) error { return fromJSON(data, c) }

// UnmarshalJSON reads a feeder, for [json.Unmarshal].
func (f *Feeder) UnmarshalJSON(data []byte) error { return fromJSON(data, f) }

// UnmarshalJSON reads a group, for [json.Unmarshal].
func (gr *Group) UnmarshalJSON(data []byte) error { return fromJSON(data, gr) }

// UnmarshalJSON reads what is installed of a circuit, for [json.Unmarshal].
func (in *Installed) UnmarshalJSON(data []byte) error { return fromJSON(data, in) }

// UnmarshalJSON reads what is installed of a feeder, for [json.Unmarshal].
func (in *InstalledFeeder) UnmarshalJSON(data []byte) error { return fromJSON(data, in) }

func fromJSON[T any](data []byte, into *T) error {
	var read T
	err := jsonin.Decode(data, &read)
	if err != nil {
		var none T
		read = none
	}
	*into = read
	return err
}
