package schedule

import (
	mc "example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// feederColumns are the columns of the feeders file.
var feederColumns = newLayout("feeders file", "feeder",
	[]column[mc.Feeder]{
		{name: "tag", must: true, set: word(func(f *mc.Feeder) *string { return &f.Tag }), field: "tag"},
		{name: "code", must: true, set: read(func(f *mc.Feeder) textReader { return &f.Edition }), field: "edition"},
	},
	runColumns(func(f *mc.Feeder) *tables.Device { return &f.Device }, func(f *mc.Feeder) *conductor.Wiring { return &f.Wiring }),
	[]column[mc.Feeder]{
		{name: "continuous_load_amps", set: read(func(f *mc.Feeder) textReader { return &f.Continuous }), field: "continuous_load_amperes"},
		{name: "other_load_amps", set: read(func(f *mc.Feeder) textReader { return &f.Other }), field: "other_load_amperes"},
	},
)
