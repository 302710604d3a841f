package tables

import (
	"sort"

	"example.org/motorcircuit/internal/exact"
)

// StandardRatings returns the standard ampere ratings of a kind of device,
// lowest first: NEC 240.6(A), CEC Table 13 and above it what the trade makes.
func (e Edition) StandardRatings(d Device) []Figure {
	t := e.ratings(d)
	all := make([]Figure, len(t.ratings))
	for i, r := range t.ratings {
		all[i] = t.figure("standard rating", Tabulated, e, r)
	}
	return all
}

// RatingAtOrAbove returns the first standard rating at or above the limit,
// under the rule that allows it; absent if the limit is above every rating.
func (e Edition) RatingAtOrAbove(d Device, limit Figure, name string, rule *Rule) Figure {
	t := e.ratings(d)
	i := sort.Search(len(t.ratings), func(i int) bool { return t.ratings[i] >= limit.value.HundredthsUp() })
	if i == len(t.ratings) {
		return Figure{}
	}
	return t.figure(name, NextUp, e, t.ratings[i], limit).under(e, rule)
}

// RatingAtOrBelow returns the highest standard rating that is not above the
// limit, under the rule that asks for it; absent if the limit is below every
// rating.
func (e Edition) RatingAtOrBelow(d Device, limit Figure, name string, rule *Rule) Figure {
	t := e.ratings(d)
	i := sort.Search(len(t.ratings), func(i int) bool { return exact.New(t.ratings[i], 2).Cmp(limit.value) > 0 })
	if i == 0 {
		return Figure{}
	}
	return t.figure(name, NextDown, e, t.ratings[i-1], limit).under(e, rule)
}

// under puts a rating, which keeps its table as an operand, under a rule.
func (f Figure) under(e Edition, rule *Rule) Figure {
	g := newFigure("standard rating", Tabulated, e, f.rule, f.value, f.unit)
	return newFigure(f.name, f.op, e, rule, f.value, f.unit, append(f.of, g)...)
}

func (e Edition) ratings(d Device) *ratingTable {
	if !e.IsValid() || !d.IsValid() {
		return &ratingTable{}
	}
	return e.book().ratings(e, d)
}

type ratingTable struct {
	ratings []int64 // hundredths of an ampere, rising
	rule    *Rule
	beyond  int64 // ratings above this stand on the trade alone
	trade   *Rule
}

func (t *ratingTable) figure(name string, op Op, e Edition, rating int64, of ...Figure) Figure {
	rule := t.rule
	if rating > t.beyond {
		rule = t.trade
	}
	return newFigure(name, op, e, rule, exact.New(rating, 2), Ampere, of...)
}

const noBound = 1 << 62

// loadRatings reads the ratings that a column marks with 1.
func loadRatings(path, column string, rule *Rule) func() *ratingTable {
	return loaded(func() (*ratingTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		col, err := g.Col(column)
		if err != nil {
			return nil, err
		}
		t := &ratingTable{rule: rule, beyond: noBound}
		for row, cells := range g.Rows {
			h, err := g.Hundredths(row, 0)
			if err != nil {
				return nil, err
			}
			if cells[col] == "1" {
				t.ratings = append(t.ratings, h)
			}
		}
		return t, rising(path, t.ratings)
	})
}

// loadTable13 reads the ratings of CEC Table 13, and adds those of the trade.
func loadTable13(path string, rule *Rule, trade *Rule, more ...int64) func() *ratingTable {
	return loaded(func() (*ratingTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		col, err := g.Col("ocpd_rating_or_setting_a")
		if err != nil {
			return nil, err
		}
		t := &ratingTable{rule: rule, trade: trade}
		for row := range g.Rows {
			h, err := g.Hundredths(row, col)
			if err != nil {
				return nil, err
			}
			t.ratings = append(t.ratings, h)
			t.beyond = h
		}
		for _, amps := range more {
			t.ratings = append(t.ratings, amps*100)
		}
		return t, rising(path, t.ratings)
	})
}
