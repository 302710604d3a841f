// Package tables holds the published tables that motor circuits are sized by:
// motor full-load and locked-rotor currents, duty and device percentages,
// standard ratings, ampacities and their corrections, insulations and sizes, for
// several editions of two codes.
//
// # Looking something up
//
// Everything starts from an [Edition]. Its methods return the printed entry as a
// [Figure], which carries the table's citation under that edition's number:
//
//	amperes, err := tables.NEC2023.FullLoadCurrent(tables.InductionTable, tables.Must(tables.ParseHP("50")), 460)
//	// 65 A, NFPA 70-2023 Table 430.250
//
//	table, err := tables.CEC2024.Ampacities(tables.InRaceway, tables.Copper)
//	size := table.AtLeast(need, 75, least, most)
//
// What a table does not print is a [*NotTabulatedError] that says what it does
// print; nothing is interpolated, extrapolated or guessed. A value that cannot
// stand is an [*InputError]. With an error comes the zero value. Where a blank
// is an ordinary answer, such as an ampacity that a table leaves out, the figure
// is absent: [Figure.IsZero].
//
// # Editions
//
// [Editions] lists them: NFPA 70 of 2017, 2020 and 2023 (the NEC) and CSA C22.1
// of 2021 and 2024 (the CEC, Part I). [Edition.Gap] says what of an edition's
// text could not be read and was taken from its neighbours. Section numbers move
// between editions; each citation has the number of its own.
//
// # Figures
//
// A [Figure] is exact: values are decimals, and rounding happens only where a
// rule asks for it. Package functions such as [ProductOf], [SumOf] and
// [LargestOf] make figures from figures and keep the operands, so that
// [Figure.How] and [Figure.Citations] tell how a number came about.
//
// # Marks
//
// The tables were transcribed from public copies, and each carries a [Mark]:
// [MarkA] if two or more independent copies agree, [MarkB] if one copy was read,
// [MarkC] if it stands on memory. A figure has the weakest mark of all that it
// rests on, and [Figure.FromMemory] names the tables and rules of mark C.
// data/README.md lists every table with its source, editions and mark.
//
// # Cautions
//
// The tables restate published facts and are no substitute for the printed code.
// Codes are amended by states, provinces and cities. A licensed person and the
// authority having jurisdiction decide.
//
// Tables are read and checked on first use and never change after. All functions
// may be called from several goroutines at once.
package tables
