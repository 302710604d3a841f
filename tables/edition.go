package tables

import (
	"slices"
	"strings"
)

// A Code is a family of electrical codes.
type Code uint8

// The families of codes. The zero Code is none.
const (
	NEC Code = iota + 1 // NFPA 70, the National Electrical Code (USA)
	CEC                 // CSA C22.1, the Canadian Electrical Code, Part I
)

// String returns the family's usual short name.
func (c Code) String() string {
	switch c {
	case NEC:
		return "NEC"
	case CEC:
		return "CEC"
	}
	return ""
}

// An Edition is one edition of one code. The zero Edition is none: what the
// law decides has no default. Its text form ("NEC-2023") is stable.
type Edition uint8

// The editions that the library knows. See [Editions].
const (
	NEC2017 Edition = iota + 1 // NFPA 70-2017
	NEC2020                    // NFPA 70-2020
	NEC2023                    // NFPA 70-2023
	CEC2021                    // CSA C22.1:21, 25th edition
	CEC2024                    // CSA C22.1:24, 26th edition
)

type editionInfo struct {
	text     string // stable text form
	standard string // as the trade cites it
	code     Code
	gap      string // what of its text was not read, "" if all that is used here
}

var editions = [...]editionInfo{
	NEC2017: {"NEC-2017", "NFPA 70-2017", NEC, "Article 430 of this edition was read from 430.72(B) on and otherwise through quotations; its other rules are taken as in 2020 and 2023"},
	NEC2020: {"NEC-2020", "NFPA 70-2020", NEC, "Article 430 of this edition was read from 430.36 on; its earlier sections are taken as in 2008 and 2023, which agree"},
	NEC2023: {"NEC-2023", "NFPA 70-2023", NEC, ""},
	CEC2021: {"CEC-2021", "CSA C22.1:21", CEC, "the motor and ampacity tables were read on pages of the 2024 edition or of an undated one and are taken to be the same in this edition"},
	CEC2024: {"CEC-2024", "CSA C22.1:24", CEC, "Section 28 of this edition was read in part; the rest is taken as in 2021"},
}

func (e Edition) info() editionInfo {
	if e.IsValid() {
		return editions[e]
	}
	return editionInfo{}
}

// Editions returns every edition, oldest first within each code.
func Editions() []Edition {
	all := make([]Edition, 0, len(editions)-1)
	for e := range Edition(len(editions)) {
		if e.IsValid() {
			all = append(all, e)
		}
	}
	return all
}

// editionNames returns the text forms of [Editions], for messages.
func editionNames() string {
	names := make([]string, 0, len(editions))
	for _, e := range Editions() {
		names = append(names, e.String())
	}
	return strings.Join(names, ", ")
}

// ParseEdition reads an edition's text form; letter case does not matter. An
// error is an [*InputError].
func ParseEdition(s string) (Edition, error) {
	i := slices.IndexFunc(editions[:], func(x editionInfo) bool { return x.text != "" && strings.EqualFold(x.text, s) })
	if i < 0 {
		return 0, &InputError{Field: "edition", Value: clip(s), Want: "one of " + editionNames()}
	}
	return Edition(i), nil
}

// IsValid reports whether e is one of [Editions].
func (e Edition) IsValid() bool { return e > 0 && int(e) < len(editions) }

// Check returns an [*InputError] unless e is one of [Editions].
func (e Edition) Check() error {
	if e.IsValid() {
		return nil
	}
	return &InputError{Field: "edition", Value: e.String(), Want: "one of " + editionNames()}
}

// String returns the text form, "" for the zero Edition.
func (e Edition) String() string { return e.info().text }

// Standard returns the edition's own name as the trade cites it, such as
// "NFPA 70-2023" or "CSA C22.1:21".
func (e Edition) Standard() string { return e.info().standard }

// Code returns the family that e belongs to.
func (e Edition) Code() Code { return e.info().code }

// Gap says what of the edition's text could not be read for this library and
// was taken from its neighbours; "" if nothing.
func (e Edition) Gap() string { return e.info().gap }

// MarshalText returns the text form.
func (e Edition) MarshalText() ([]byte, error) { return []byte(e.String()), nil }

// UnmarshalText is [ParseEdition]; no text is "not given".
func (e *Edition) UnmarshalText(text []byte) error { return readOr(e, text, ParseEdition) }
