// Package motorcircuit sizes electric-motor circuits under the electrical code
// in force, checks those that are installed, and shows the reason for every number.
//
// Fill a [Circuit] and call [Size]. The [Result] holds the design currents, the
// conductors, the overload setting, the short-circuit device, the
// disconnecting means, the controller, the bonding conductor and, with a length
// and a raceway, the fill, the voltage drop and the fault duty; each number is a
// [tables.Figure] that knows how it was worked out and which rule or table
// decided it. Printed, a result is a derivation that an inspector can follow; as
// JSON, it feeds other software; [Result.Quantities] feeds a takeoff.
//
// [SizeFeeder] sizes the feeder of several circuits, [SizeGroup] judges several
// motors on one branch circuit, [SizeShared] sizes several circuits in one
// raceway, and [Compare] sizes one circuit under several editions.
//
// [Check] and [CheckFeeder] hold what is installed against the same rules and
// return findings with their margins; [Reverse] and [ReverseFeeder] tell what else
// it would carry. Every input reads itself from JSON and every result writes
// itself as JSON, text and Markdown.
//
// Editions covered: NFPA 70 (NEC) of 2017, 2020 and 2023; CSA C22.1 (CEC, Part
// I) of 2021 and 2024. What a code does not tabulate is refused, never guessed.
//
// The packages below do each step alone: tables (editions, citations, figures,
// the published tables), motor (currents), conductor (sizes, taps, bonding,
// raceway, voltage drop), protection (overload, devices, switches). All
// functions are pure and safe for concurrent use.
//
// The figures are an aid to design. They do not replace the printed code, local
// amendments, equipment markings, the judgement of a licensed person or the
// decision of the authority having jurisdiction.
package motorcircuit
