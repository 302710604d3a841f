package schedule

import (
	"bytes"
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"strings"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/tables"
)

// A priceList is unit prices by kind and item.
type priceList map[priced]decimal.Decimal

type priced struct{ kind, item string }

// openPrices reads the prices file of a name, or the program's sample.
func (p program) openPrices(name string, onSample bool, stdin io.Reader) (priceList, error) {
	if name == "" {
		if p.prices == "" || !onSample {
			return nil, nil
		}
		return readPrices(strings.NewReader(p.prices))
	}
	r, closeInput, err := openFile(name, stdin)
	if err != nil {
		return nil, err
	}
	defer closeInput()
	list, err := readPrices(r)
	if err != nil {
		return nil, fmt.Errorf("prices file %s: %w", name, err)
	}
	return list, nil
}

// readPrices reads the columns kind, item and unit_price, in any order.
func readPrices(r io.Reader) (priceList, error) {
	text, err := io.ReadAll(r)
	if err != nil {
		return nil, err
	}
	rows, err := csv.NewReader(bytes.NewReader(bytes.TrimPrefix(text, []byte("\uFEFF")))).ReadAll()
	if err != nil {
		return nil, err
	}
	if len(rows) == 0 {
		return nil, errors.New("no header: want the columns kind, item and unit_price")
	}
	at := map[string]int{}
	for i, name := range rows[0] {
		name = strings.ToLower(strings.TrimSpace(name))
		if _, twice := at[name]; twice {
			return nil, fmt.Errorf("the header names column %s twice", clip(name))
		}
		at[name] = i
	}
	for _, name := range []string{"kind", "item", "unit_price"} {
		if _, ok := at[name]; !ok {
			return nil, fmt.Errorf("no column %s", name)
		}
	}
	list := priceList{}
	for i, row := range rows[1:] {
		key := priced{strings.TrimSpace(row[at["kind"]]), strings.TrimSpace(row[at["item"]])}
		text := strings.TrimSpace(row[at["unit_price"]])
		price, err := tables.ParseRatio(text)
		if err != nil {
			return nil, fmt.Errorf("row %d: unit_price %q: want a plain decimal, 0 or more", i+2, clip(text))
		}
		if _, twice := list[key]; twice {
			return nil, fmt.Errorf("row %d: %s %q has a price already", i+2, key.kind, key.item)
		}
		list[key] = price.Decimal()
	}
	return list, nil
}
