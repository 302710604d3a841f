package tables_test

import (
	"encoding/json"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// Rules made up for these tests.
var (
	ruleA = tables.Rule{Ref: "rule A"}
	ruleB = tables.Rule{Ref: "rule B", Mark: tables.MarkB}
	ruleC = tables.Rule{Ref: "rule C", Mark: tables.MarkC}
)

func percent(rule *tables.Rule, coef int64, places int) tables.Figure {
	return tables.StatedFigure("percent", tables.NEC2023, rule, tables.Percent, coef, places)
}

// flc50 is 65 A, NFPA 70-2023 Table 430.250, 50 hp at 460 V.
func flc50(t *testing.T) tables.Figure {
	t.Helper()
	f, err := tables.NEC2023.FullLoadCurrent(tables.InductionTable, hp("50"), 460)
	require.NoError(t, err)
	return f
}

func TestProductOf(t *testing.T) {
	f := tables.ProductOf("least ampacity", tables.NEC2023, &ruleA, flc50(t), percent(&ruleA, 125, 0))
	assert.Equal(t, "81.25 A", f.String())
	assert.Equal(t, "81.25", f.Text())
	assert.Equal(t, tables.Ampere, f.Unit())
	assert.Equal(t, tables.Product, f.Op())
	assert.Equal(t, "table current 65 A × 125 %", f.How())
	assert.Equal(t, "NFPA 70-2023 rule A", f.Citation().String())
	// The first factor's percent stays a percent: 80 % of 91 % is 72.8 %.
	g := tables.ProductOf("both factors", tables.NEC2023, &ruleA, percent(&ruleA, 80, 0), percent(&ruleA, 91, 0))
	assert.Equal(t, "72.8 %", g.String())
	// A plain factor counts whole: 65 A × 0.91.
	ratio := tables.Must(tables.ParseRatio("0.91")).Figure("ambient factor")
	assert.Equal(t, "59.15 A", tables.ProductOf("corrected", tables.NEC2023, &ruleA, flc50(t), ratio).String())
	// Exact, past the ordinary range: 999999999.999999 squared, by hand.
	big := amps("999999999.999999")
	assert.True(t, decimal.RequireFromString("999999999999998000.000000000001").Equal(
		tables.ProductOf("square", tables.NEC2023, nil, big, big).Value()))
}

func TestSumOf(t *testing.T) {
	f := tables.SumOf("feeder", tables.NEC2023, &ruleA, flc50(t), amps("0.005"), amps("14"))
	assert.Equal(t, "79.005 A", f.String())
	assert.Equal(t, "table current 65 A + current 0.005 A + current 14 A", f.How())
	assert.Equal(t, tables.Sum, f.Op())
	assert.Len(t, f.Operands(), 3)
	f.Operands()[0] = tables.Figure{}
	assert.Equal(t, "65 A", f.Operands()[0].String(), "a copy is handed out")
}

func TestLargestAndSmallest(t *testing.T) {
	var none tables.Figure
	f := tables.LargestOf("base", tables.NEC2023, &ruleA, none, amps("40"), amps("65"), amps("50"))
	assert.Equal(t, "65 A", f.String())
	assert.Equal(t, "the largest of current 40 A, current 65 A, current 50 A", f.How())
	assert.Len(t, f.Operands(), 3, "absent ones are left out")
	g := tables.SmallestOf("limit", tables.NEC2023, &ruleA, amps("65"), none, amps("40"))
	assert.Equal(t, "40 A", g.String())
	assert.Equal(t, "the smallest of current 65 A, current 40 A", g.How())
	assert.Equal(t, "65 A", tables.LargestOf("base", tables.NEC2023, &ruleA, amps("65"), amps("40"), amps("50")).String(), "the first")
	assert.Equal(t, "40 A", tables.SmallestOf("limit", tables.NEC2023, &ruleA, amps("40"), amps("65"), amps("50")).String(), "the first")
	assert.True(t, tables.LargestOf("none", tables.NEC2023, &ruleA, none, none).IsZero())
	assert.True(t, tables.SmallestOf("none", tables.NEC2023, &ruleA).IsZero())
	assert.Equal(t, "0 A", tables.SmallestOf("zero is a number", tables.NEC2023, &ruleA, amps("1"), amps("0")).String())
}

func TestRaisedTo(t *testing.T) {
	floor := tables.StatedFigure("floor", tables.CEC2024, &ruleB, tables.Ampere, 15, 0)
	same := amps("19.25")
	assert.Equal(t, same, tables.RaisedTo("device", tables.CEC2024, &ruleA, same, floor, "15 A always stands"))
	f := tables.RaisedTo("device", tables.CEC2024, &ruleA, amps("5.25"), floor, "15 A always stands")
	assert.Equal(t, "15 A", f.String())
	assert.Equal(t, "raised from current 5.25 A, 15 A always stands", f.How())
	assert.Equal(t, tables.AtLeast, f.Op())
}

func TestAsAndStandIn(t *testing.T) {
	f := flc50(t).As("design current", tables.NEC2023, &ruleC)
	assert.Equal(t, "design current", f.Name())
	assert.Equal(t, "65 A", f.String())
	assert.Equal(t, "NFPA 70-2023 rule C", f.Citation().String())
	assert.Equal(t, "the table current 65 A", f.How())
	assert.Equal(t, tables.MarkC, f.Mark())
	assert.True(t, tables.Figure{}.As("x", tables.NEC2023, &ruleA).IsZero(), "absent stays absent")
	g := flc50(t).StandIn("nameplate current", tables.NEC2023, nil)
	assert.Equal(t, tables.Assumed, g.Op())
	assert.Equal(t, "assumed from table current 65 A", g.How())
	assert.Equal(t, "nameplate current", g.Name())
}

func TestQuotientOf(t *testing.T) {
	f := tables.QuotientOf("table ampacity", tables.NEC2023, &ruleA, amps("100"), percent(&ruleA, 80, 0), tables.Must(tables.ParseRatio("0.91")).Figure("ambient factor"))
	assert.Equal(t, "137.37 A", f.String(), "100 ÷ 0.728 = 137.3626, rounded up")
	assert.Equal(t, "current 100 A ÷ 80 % ÷ 0.91, rounded up to 0.01", f.How())
	assert.Equal(t, "125 A", tables.QuotientOf("even", tables.NEC2023, &ruleA, amps("100"), percent(&ruleA, 80, 0)).String())
}

// TestMarks: a figure is as sure as the weakest of its rule and operands.
func TestMarks(t *testing.T) {
	a, b, c := percent(&ruleA, 100, 0), percent(&ruleB, 100, 0), percent(&ruleC, 100, 0)
	for _, tt := range []struct {
		f    tables.Figure
		want tables.Mark
	}{
		{a, tables.MarkA}, {b, tables.MarkB}, {c, tables.MarkC},
		{tables.ProductOf("p", tables.NEC2023, &ruleA, a, b), tables.MarkB},
		{tables.ProductOf("p", tables.NEC2023, &ruleC, a, b), tables.MarkC},
		{tables.SumOf("s", tables.NEC2023, nil, b, tables.ProductOf("p", tables.NEC2023, &ruleA, a, c)), tables.MarkC},
		{tables.LargestOf("l", tables.NEC2023, &ruleA, a, c), tables.MarkC},
		{b.As("b", tables.NEC2023, &ruleA), tables.MarkB},
		{c.StandIn("c", tables.NEC2023, nil), tables.MarkC},
		{amps("1"), tables.MarkA},
		{flc50(t), tables.MarkA},
	} {
		assert.Equal(t, tt.want, tt.f.Mark(), "%v %s", tt.f, tt.f.Name())
	}
}

// TestTableMarks holds the marks of figures against those of data/README.md.
func TestTableMarks(t *testing.T) {
	first := func(f tables.Figure, err error) tables.Mark {
		t.Helper()
		require.NoError(t, err)
		require.False(t, f.IsZero())
		return f.Mark()
	}
	ampere := func(e tables.Edition, run tables.Run, m tables.Material) tables.Mark {
		table, err := e.Ampacities(run, m)
		return first(table.Ampacity(tables.Sizes()[8], 75), err)
	}
	forty := tables.Must(tables.ParseTemperature("40"))
	n, c := tables.NEC2023, tables.CEC2024
	assert.Equal(t, tables.MarkA, first(n.FullLoadCurrent(tables.SinglePhaseTable, hp("1"), 230)))
	assert.Equal(t, tables.MarkA, first(n.LockedRotorCurrent(3, hp("1"), 230)))
	assert.Equal(t, tables.MarkB, first(n.OverloadUnits(3)))
	assert.Equal(t, tables.MarkA, ampere(n, tables.InRaceway, tables.Copper))
	assert.Equal(t, tables.MarkB, ampere(n, tables.InFreeAir, tables.Copper))
	assert.Equal(t, tables.MarkB, first(n.AmbientFactor(90, forty)))
	assert.Equal(t, tables.MarkA, first(n.CountFactor(4)))
	assert.Equal(t, tables.MarkB, first(c.FullLoadCurrent(tables.InductionTable, hp("1"), 575)))
	assert.Equal(t, tables.MarkB, first(c.FullLoadCurrent(tables.SynchronousTable, hp("30"), 575)))
	assert.Equal(t, tables.MarkA, first(c.FullLoadCurrent(tables.SinglePhaseTable, hp("1"), 230)))
	assert.Equal(t, tables.MarkC, first(c.FullLoadCurrent(tables.DirectCurrentTable, hp("1"), 240)))
	assert.Equal(t, tables.MarkC, first(c.SupplyInsulation("H", true)))
	assert.Equal(t, tables.MarkA, ampere(c, tables.InRaceway, tables.Aluminum))
	assert.Equal(t, tables.MarkC, ampere(c, tables.InFreeAir, tables.Aluminum))
	assert.Equal(t, tables.MarkB, first(c.AmbientFactor(90, forty)))
	assert.Equal(t, tables.MarkA, first(c.SpacingFactor(3)))
	ratings := c.StandardRatings(tables.InverseTimeBreaker)
	assert.Equal(t, tables.MarkB, ratings[0].Mark())
	assert.Equal(t, tables.MarkC, ratings[len(ratings)-1].Mark())
}

// TestCitations: depth first, each once.
func TestCitations(t *testing.T) {
	inner := tables.ProductOf("inner", tables.NEC2023, &ruleB, flc50(t), percent(&ruleC, 125, 0))
	outer := tables.SumOf("outer", tables.NEC2023, &ruleA, inner, flc50(t), percent(&ruleA, 1, 0), amps("1"))
	var got []string
	for _, c := range outer.Citations() {
		got = append(got, c.String())
	}
	assert.Equal(t, []string{"NFPA 70-2023 rule A", "NFPA 70-2023 rule B", "NFPA 70-2023 Table 430.250", "NFPA 70-2023 rule C"}, got)
}

func TestFigureWords(t *testing.T) {
	assert.Equal(t, "from the table, 50 hp, 460 V", flc50(t).How())
	assert.Equal(t, "as the rule says", percent(&ruleA, 125, 0).How())
	assert.Equal(t, "as the rule says, on the nameplate", percent(&ruleA, 125, 0).WithNote("on the nameplate").How())
	up := tables.NEC2023.RatingAtOrAbove(tables.InverseTimeBreaker, amps("162.5"), "breaker", &ruleA)
	assert.Equal(t, "the first standard rating at or above current 162.5 A", up.How())
	down := tables.NEC2023.RatingAtOrBelow(tables.InverseTimeBreaker, amps("162.5"), "breaker", &ruleA)
	assert.Equal(t, "the highest standard rating not above current 162.5 A", down.How())
	for op, want := range map[tables.Op]string{tables.Given: "given", tables.Tabulated: "tabulated", tables.NextUp: "next_standard_up", tables.AtLeast: "at_least", 200: ""} {
		text, err := op.MarshalText()
		require.NoError(t, err)
		assert.Equal(t, want, string(text))
	}
	for u, want := range map[tables.Unit]string{tables.Plain: "", tables.Ampere: "A", tables.KVAPerHorsepower: "kVA/hp", 200: ""} {
		assert.Equal(t, want, u.String())
	}
}

// TestOperandWords: currents and temperatures go by name, percents and factors
// by what they are for.
func TestOperandWords(t *testing.T) {
	count, err := tables.NEC2023.CountFactor(6)
	require.NoError(t, err)
	ambient, err := tables.NEC2023.AmbientFactor(90, tables.Must(tables.ParseTemperature("40")))
	require.NoError(t, err)
	f := tables.ProductOf("corrected ampacity", tables.NEC2023, &ruleA, amps("95"), count, ambient, tables.Must(tables.ParseRatio("0.5")).Figure("ratio"))
	assert.Equal(t, "current 95 A × 80 % (4 to 6 conductors) × 0.91 (ambient factor) × 0.5", f.How())
	assert.Equal(t, "34.58 A", f.String())
}

// TestFromMemory: the citations of mark C that a figure rests on, each once.
func TestFromMemory(t *testing.T) {
	c := percent(&ruleC, 125, 0)
	assert.Empty(t, flc50(t).FromMemory())
	f := tables.SumOf("sum", tables.CEC2024, &ruleA, tables.ProductOf("p", tables.NEC2023, &ruleB, flc50(t), c), c)
	require.Len(t, f.FromMemory(), 1)
	assert.Equal(t, "NFPA 70-2023 rule C", f.FromMemory()[0].String())
}

func TestWholeAndIsOne(t *testing.T) {
	f := tables.Whole("parallel sets", tables.Plain, 2)
	assert.Equal(t, "2", f.String())
	assert.Equal(t, tables.Given, f.Op())
	assert.False(t, f.IsOne())
	assert.True(t, tables.Whole("parallel sets", tables.Plain, 1).IsOne())
	assert.True(t, percent(&ruleA, 100, 0).IsOne())
	assert.False(t, percent(&ruleA, 1, 0).IsOne(), "1 % is not one")
}

func TestFigureZero(t *testing.T) {
	var f tables.Figure
	assert.True(t, f.IsZero())
	assert.Empty(t, f.String()+f.Text()+f.Name()+f.Note())
	text, err := json.Marshal(f)
	require.NoError(t, err)
	assert.Equal(t, "null", string(text))
}

func TestFigureJSON(t *testing.T) {
	f := tables.ProductOf("least ampacity", tables.NEC2023, &ruleA, flc50(t), percent(&ruleA, 125, 0))
	text, err := json.Marshal(f)
	require.NoError(t, err)
	assert.Equal(t, `{"name":"least ampacity","value":"81.25","unit":"A","op":"product","how":"table current 65 A × 125 %",`+
		`"cites":["NFPA 70-2023 rule A","NFPA 70-2023 Table 430.250"]}`, string(text))
	text, err = json.Marshal(tables.Must(tables.ParseRatio("0.9")).Figure("power factor"))
	require.NoError(t, err)
	assert.Equal(t, `{"name":"power factor","value":"0.9","op":"given","how":"as given"}`, string(text), "no unit, no citation")
}

// A difference is exact, of one unit, below zero too.
func TestDifferenceOf(t *testing.T) {
	for _, tt := range []struct{ whole, part, want string }{{"81.25", "65", "16.25 A"}, {"65", "81.25", "-16.25 A"}, {"7.6", "7.6", "0 A"}, {"0.000001", "0.000002", "-0.000001 A"}} {
		f := tables.DifferenceOf("margin", 0, nil, amps(tt.whole), amps(tt.part))
		assert.Equal(t, tt.want, f.String())
		assert.Equal(t, tables.Difference, f.Op())
		assert.Contains(t, f.How(), tt.whole+" A − ")
		assert.Len(t, f.Operands(), 2)
	}
}

// Found step by step; and a number of percent that a caller gives.
func TestStepAndPercentFigures(t *testing.T) {
	rule := tables.Rule{Ref: "trial", Outside: true}
	f := tables.StepFigure("longest run", tables.NEC2023, &rule, tables.Metre, 1532, 1)
	assert.Equal(t, "153.2 m found step by step [trial]", f.String()+" "+f.How()+" ["+f.Citation().String()+"]")
	assert.Equal(t, "2.5 %", tables.PercentFigure("limit", tables.Must(tables.ParseRatio("2.5"))).String())
	assert.True(t, tables.PercentFigure("limit", tables.Ratio{}).IsZero())
}

// Quantities of figures, and figures of sizes and powers: a third has no decimal
// and is told to be rounded. Areas by NFPA 70 Chapter 9 Table 8.
func TestFiguresOfInputs(t *testing.T) {
	assert.Equal(t, "81.25 A", tables.CurrentAtMost(amps("81.25")).String())
	product := tables.ProductOf("setting", 0, nil, amps("50.123457"), tables.StatedFigure("of the current", 0, nil, tables.Percent, 115, 0))
	assert.Equal(t, "57.64197555 A", product.String())
	assert.Equal(t, "57.641975 A", tables.CurrentAtMost(product).String())
	assert.Equal(t, "57.641976 A", tables.CurrentAtLeast(product).String())
	assert.Equal(t, "81.25 A", tables.CurrentAtLeast(amps("81.25")).String())
	assert.True(t, tables.CurrentAtMost(tables.Figure{}).IsZero())
	assert.Equal(t, "110 °C", tables.TemperatureOf(tables.Whole("rating", tables.Celsius, 110)).String())
	assert.True(t, tables.TemperatureOf(tables.Figure{}).IsZero())
	for text, want := range map[string]string{"6 AWG": "13.3 mm²", "1/0": "53.49 mm²", "500": "253 mm²", "16 mm²": "16 mm²"} {
		f := tables.Must(tables.ParseSize(text)).Figure("conductor")
		assert.Equal(t, want, f.String())
		assert.Equal(t, text == "16 mm²", f.Citation().IsZero())
	}
	assert.True(t, tables.Size(0).Figure("conductor").IsZero())
	for text, want := range map[string]string{"7-1/2 hp": "7.5 hp", "30 kW": "30 kW", "1/3 hp": "0.333333 hp", "1/6 hp": "0.166666 hp"} {
		f := tables.Must(tables.ParsePower(text)).Figure("rating")
		assert.Equal(t, want, f.String())
		assert.Equal(t, want[:2] == "0.", f.Note() != "")
	}
	assert.True(t, tables.Power{}.Figure("rating").IsZero())
}

// A share in percent is rounded up: 2 ÷ 3 is 66.67 %. A figure of another name is
// the same otherwise, and none stays none.
func TestPercentOfAndRenamed(t *testing.T) {
	rule := tables.Rule{Ref: "a rule"}
	f := tables.PercentOf("fill", tables.NEC2023, &rule, amps("2"), amps("3"))
	assert.Equal(t, "66.67 %", f.String())
	assert.Equal(t, tables.QuotientUp, f.Op())
	g := f.Renamed("share")
	assert.Equal(t, "share", g.Name())
	assert.Equal(t, f.How()+f.Citation().String(), g.How()+g.Citation().String())
	assert.True(t, tables.Figure{}.Renamed("share").IsZero())
	assert.Contains(t, tables.FromMemory(f.Citation()).String(), "[NFPA 70-2023 a rule]")
	assert.Contains(t, tables.FromMemory(f.Citation()).Text, "from memory")
}
