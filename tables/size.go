package tables

import (
	"cmp"
	"slices"
	"strings"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/internal/exact"
)

// A Size is a conductor size: a name of the AWG and kcmil series from 18 AWG
// to 2000 kcmil, or a standard metric cross-section. Sizes are names, not
// numbers; the zero Size is "not given". Sizes are comparable with == and
// ordered by [Size.Cmp].
type Size uint8

// The AWG and kcmil sizes stand at 1 and up, the metric ones at metricBase and up.
const metricBase = 100

var awgNames = [...]string{
	"18", "16", "14", "12", "10", "8", "6", "4", "3", "2", "1", "1/0", "2/0", "3/0", "4/0",
	"250", "300", "350", "400", "500", "600", "700", "750", "800", "900", "1000", "1250", "1500", "1750", "2000",
}

const firstKcmil = 16 // 250 kcmil

// metricNames are the cross-sections of IEC 60228 in mm².
var metricNames = [...]string{
	"0.5", "0.75", "1", "1.5", "2.5", "4", "6", "10", "16", "25", "35", "50", "70", "95",
	"120", "150", "185", "240", "300", "400", "500", "630", "800", "1000",
}

// ParseSize reads a size as the trade writes it: "14", "14 AWG", "#14",
// "No. 14", "1/0", "00", "250", "250 kcmil", "250 MCM", "16 mm²", "16 mm2". A
// bare number is AWG or kcmil. An error is an [*InputError].
func ParseSize(s string) (Size, error) {
	name := strings.ToLower(strings.TrimSpace(s))
	series, metric := "", false
	for _, suffix := range []string{"awg", "kcmil", "mcm", "mm²", "mm2"} {
		if cut, ok := strings.CutSuffix(name, suffix); ok {
			name, series, metric = strings.TrimSpace(cut), suffix, strings.HasPrefix(suffix, "mm")
			break
		}
	}
	if metric {
		if i := slices.Index(metricNames[:], name); i >= 0 {
			return Size(metricBase + i), nil
		}
		return 0, sizeError(s)
	}
	for _, prefix := range []string{"#", "no."} {
		if cut, ok := strings.CutPrefix(name, prefix); ok {
			name = strings.TrimSpace(cut)
			break
		}
	}
	if n := len(name); n >= 1 && n <= 4 && strings.Trim(name, "0") == "" {
		name = string(rune('0'+n)) + "/0"
	}
	if i := slices.Index(awgNames[:], name); i >= 0 {
		size := Size(1 + i)
		if kcmil := size >= firstKcmil; series == "" || kcmil == (series != "awg") {
			return size, nil
		}
	}
	return 0, sizeError(s)
}

func sizeError(s string) error {
	return &InputError{Field: "size", Value: clip(s),
		Want: `a size from 18 AWG to 4/0 AWG, 250 to 2000 kcmil or 0.5 to 1000 mm², such as "4", "1/0", "250 kcmil" or "16 mm²"`}
}

// Sizes returns the AWG and kcmil sizes, smallest first.
func Sizes() []Size {
	all := make([]Size, len(awgNames))
	for i := range all {
		all[i] = Size(1 + i)
	}
	return all
}

// IsMetric reports whether s is a cross-section in mm².
func (s Size) IsMetric() bool { return s >= metricBase && int(s) < metricBase+len(metricNames) }

// IsValid reports whether s is a size.
func (s Size) IsValid() bool { return s > 0 && int(s) <= len(awgNames) || s.IsMetric() }

// Name returns the bare size as the trade writes it: "4", "1/0", "250", "16"
// for 16 mm²; "" for the zero Size.
func (s Size) Name() string {
	switch {
	case s.IsMetric():
		return metricNames[s-metricBase]
	case s.IsValid():
		return awgNames[s-1]
	}
	return ""
}

// String returns the size with its series: "4 AWG", "250 kcmil", "16 mm²".
func (s Size) String() string {
	switch {
	case !s.IsValid():
		return ""
	case s.IsMetric():
		return s.Name() + " mm²"
	case s >= firstKcmil:
		return s.Name() + " kcmil"
	}
	return s.Name() + " AWG"
}

// Smaller returns the next smaller size of the series of s, 0 if s is the smallest.
func (s Size) Smaller() Size {
	if !s.IsValid() || s == metricBase || s == 1 {
		return 0
	}
	return s - 1
}

// Larger returns the next larger size of the series of s, 0 if s is the largest.
func (s Size) Larger() Size {
	if next := s + 1; s.IsValid() && next.IsValid() && next.IsMetric() == s.IsMetric() {
		return next
	}
	return 0
}

// Area returns the cross-section in mm²: for AWG and kcmil sizes that of NFPA
// 70, Chapter 9 Table 8; 0 for the zero Size.
func (s Size) Area() decimal.Decimal {
	switch {
	case s.IsMetric():
		return decimal.RequireFromString(s.Name())
	case s.IsValid():
		return sizeAreas()[s].Decimal()
	}
	return decimal.Decimal{}
}

// Figure returns the cross-section of s as a figure of the given name: for AWG and
// kcmil sizes that of NFPA 70, Chapter 9 Table 8. It is absent for the zero Size.
func (s Size) Figure(name string) Figure {
	switch {
	case s.IsMetric():
		n, _ := exact.Parse(s.Name())
		return newFigure(name, Given, 0, nil, n, SquareMillimetre).WithNote(s.String())
	case s.IsValid():
		return newFigure(name, Tabulated, 0, &necTable8, sizeAreas()[s], SquareMillimetre).WithNote(s.String())
	}
	return Figure{}
}

// CircularMils returns the cross-section of an AWG or kcmil size in circular
// mils, NFPA 70 Chapter 9 Table 8; 0 for other sizes.
func (s Size) CircularMils() decimal.Decimal { return sizeMils()[s].Decimal() }

// Cmp compares sizes by cross-section: -1, 0 or 1. The zero Size is smallest.
func (s Size) Cmp(t Size) int {
	if s.IsMetric() != t.IsMetric() {
		return s.Area().Cmp(t.Area())
	}
	return cmp.Compare(s, t)
}

// MarshalText is [Size.String].
func (s Size) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// UnmarshalText is [ParseSize]; no text is "not given".
func (s *Size) UnmarshalText(text []byte) error {
	return readOr(s, text, ParseSize)
}

var (
	sizeAreas = loaded(func() (map[Size]exact.Num, error) {
		return bySize("nec/conductor_standard_sizes.csv", "area_mm2", every)
	})
	sizeMils = loaded(func() (map[Size]exact.Num, error) {
		return bySize("nec/conductor_standard_sizes.csv", "area_cmil", every)
	})
)
