package schedule

import (
	"cmp"
	"encoding/csv"
	"fmt"
	"io"
	"slices"
	"strings"
	"text/tabwriter"

	"github.com/shopspring/decimal"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/tables"
)

// RunTakeoff is the program takeoff: it sums what a schedule takes into a bill
// of quantities. Prices is a sample of unit prices, which must not be empty. It
// returns the exit status.
func RunTakeoff(prices string, args []string, stdin io.Reader, stdout, stderr io.Writer) int {
	return program{name: "takeoff", formats: billFormats, prices: prices}.run(args, stdin, stdout, stderr)
}

var billFormats = []format[newOutput]{
	{"text", func(w io.Writer, s settings) output { return &bill{w: w, settings: s, write: (*bill).text} }},
	{"csv", func(w io.Writer, s settings) output { return &bill{w: w, settings: s, write: (*bill).csv} }},
}

// A bill sums the quantities of motors and feeders, and is written at the end.
type bill struct {
	settings
	w       io.Writer
	write   func(*bill) error
	amounts map[billLine]decimal.Decimal
	short   int // motors and feeders without a length
}

// A billLine is what amounts are summed by.
type billLine struct{ kind, item, unit string }

func (b *bill) begin([]string) error {
	b.amounts = map[billLine]decimal.Decimal{}
	return nil
}

func (b *bill) row(a *answer[mc.Result]) error {
	if len(a.faults) > 0 {
		return b.tell(a.entry, a.faults)
	}
	b.add(a.result.Quantities(), a.result.Circuit.Wiring.Length)
	return nil
}

func (b *bill) feeder(a *answer[mc.FeederResult]) error {
	if len(a.faults) > 0 {
		return b.tell(a.entry, a.faults)
	}
	b.add(a.result.Quantities(), a.result.Feeder.Wiring.Length)
	return nil
}

func (b *bill) beginFeeders([]string) error { return nil }

func (b *bill) end(int, int) error {
	if b.feeders {
		return nil // the feeders are still to come
	}
	return b.write(b)
}

func (b *bill) endFeeders(int, int) error { return b.write(b) }

// tell names a row that is left out of the bill.
func (b *bill) tell(e entry, faults []string) error {
	_, err := fmt.Fprintf(b.stderr, "takeoff: %s is left out: %s\n", nameOf(e.tag), strings.Join(faults, "; "))
	return err
}

func (b *bill) add(list []mc.Quantity, length tables.Length) {
	if length.IsZero() {
		b.short++
	}
	for _, q := range list {
		line := billLine{q.Kind, q.Item, q.Unit}
		b.amounts[line] = b.amounts[line].Add(q.Amount)
	}
}

// lines returns the lines of the bill by kind, conductors by size and other items
// by what they are and then by number.
func (b *bill) lines() []billLine {
	lines := make([]billLine, 0, len(b.amounts))
	for line := range b.amounts {
		lines = append(lines, line)
	}
	slices.SortFunc(lines, func(x, y billLine) int {
		xs, ys := sizeIn(x.item), sizeIn(y.item)
		xn, xw := number(x.item)
		yn, yw := number(y.item)
		return cmp.Or(strings.Compare(x.kind, y.kind), xs.Cmp(ys), strings.Compare(xw, yw), xn.Cmp(yn), strings.Compare(x.item, y.item), strings.Compare(x.unit, y.unit))
	})
	return lines
}

// sizeIn returns the conductor size that an item begins with, zero for none.
func sizeIn(item string) tables.Size {
	words := strings.Fields(item)
	if len(words) < 2 {
		return 0
	}
	size, err := tables.ParseSize(words[0] + " " + words[1])
	if err != nil {
		return 0
	}
	return size
}

// number returns the first number of an item, fractions as the trade writes them,
// and the item without it.
func number(item string) (n tables.Power, without string) {
	words := strings.Fields(item)
	for i, word := range words {
		if p, err := tables.ParseHP(word); err == nil {
			return p, strings.Join(slices.Delete(words, i, i+1), " ")
		}
	}
	return tables.Power{}, item
}

// price returns a line's unit price and price, "" where it has none.
func (b *bill) price(line billLine) (unit, price string, sum decimal.Decimal) {
	p, ok := b.prices[priced{line.kind, line.item}]
	if !ok {
		return "", "", decimal.Decimal{}
	}
	sum = p.Mul(b.amounts[line])
	return p.String(), sum.String(), sum
}

// idle counts the prices that no line of the bill has.
func (b *bill) idle() int {
	used := map[priced]bool{}
	for line := range b.amounts {
		used[priced{line.kind, line.item}] = true
	}
	n := 0
	for key := range b.prices {
		if !used[key] {
			n++
		}
	}
	return n
}

func (b *bill) csv() error {
	w := csv.NewWriter(b.w)
	head := []string{"kind", "item", "unit", "amount"}
	if b.prices != nil {
		head = append(head, "unit_price", "price")
	}
	if err := w.Write(head); err != nil {
		return err
	}
	for _, line := range b.lines() {
		row := []string{line.kind, line.item, line.unit, b.amounts[line].String()}
		if b.prices != nil {
			unit, price, _ := b.price(line)
			row = append(row, unit, price)
		}
		if err := w.Write(row); err != nil {
			return err
		}
	}
	w.Flush()
	return w.Error()
}

func (b *bill) text() error {
	w := tabwriter.NewWriter(b.w, 0, 0, 2, ' ', 0)
	total, unpriced := decimal.Decimal{}, 0
	for _, line := range b.lines() {
		fmt.Fprintf(w, "%s\t%s\t%s\t%s", strings.ReplaceAll(line.kind, "_", " "), line.item, b.amounts[line], line.unit)
		if b.prices != nil {
			unit, price, sum := b.price(line)
			fmt.Fprintf(w, "\t%s\t%s", unit, price)
			if total = total.Add(sum); unit == "" {
				unpriced++
			}
		}
		fmt.Fprintln(w)
	}
	if err := w.Flush(); err != nil {
		return err
	}
	if b.prices != nil {
		invented := ""
		if b.sample {
			invented = " (the unit prices of the sample are invented)"
		}
		fmt.Fprintf(b.w, "\ntotal of what has a price, to 0.01: %s%s\n%d lines have none\n", total.StringFixed(2), invented, unpriced)
		if idle := b.idle(); idle > 0 && !b.sample {
			fmt.Fprintf(b.w, "%d prices are of nothing in the bill\n", idle)
		}
	}
	_, err := fmt.Fprintf(b.w, "\n%d motors and feeders have no length: their conductors and raceway are not in the bill\nruns that the code treats apart (to the motor, from slip rings, to resistors, to windings) are not in it either\nfuses are counted in sets, one for each ungrounded conductor\nconductors include %s m each for ends\n", b.short, mc.MakeUp)
	return err
}
