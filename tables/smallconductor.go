package tables

import "example.org/motorcircuit/internal/exact"

// SmallConductorLimit returns the greatest device that would protect a small
// conductor outside of motor circuits, to which it does not apply: NEC
// 240.4(D), CEC Rule 14-104(2). Absent for sizes that have none.
func (e Edition) SmallConductorLimit(m Material, s Size) Figure {
	if !e.IsValid() {
		return Figure{}
	}
	for _, r := range e.book().smallConductors() {
		if r.material == m && r.size == s && r.rule.In(e).Ref != "" {
			return newFigure("small-conductor limit", Stated, e, r.rule, r.limit, Ampere)
		}
	}
	return Figure{}
}

type smallConductor struct {
	material Material
	size     Size
	limit    exact.Num
	rule     *Rule
}

// loadSmallConductors reads size, material and limit; copper-clad aluminum has
// rows of its own, which the library's aluminum does not take.
func loadSmallConductors(path string, rule func(row []string) *Rule) func() []smallConductor {
	return loaded(func() ([]smallConductor, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		materials := map[string]Material{"cu": Copper, "al": Aluminum, "al_or_cca": Aluminum}
		var list []smallConductor
		for row, cells := range g.Rows {
			material, ok := materials[cells[1]]
			if !ok {
				continue
			}
			size, err := ParseSize(cells[0])
			if err != nil {
				return nil, err
			}
			limit, err := g.Hundredths(row, 2)
			if err != nil {
				return nil, err
			}
			list = append(list, smallConductor{material, size, exact.New(limit, 2), rule(cells)})
		}
		return list, nil
	})
}
