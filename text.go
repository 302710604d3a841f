package motorcircuit

import (
	"fmt"
	"io"
	"slices"
	"strings"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// String returns the derivation as text: what was asked, each figure with how
// it came about and the rule behind it, the choices made, and the cautions.
func (r Result) String() string {
	var b strings.Builder
	r.write(&b)
	return b.String()
}

// WriteTo writes the text of [Result.String].
func (r Result) WriteTo(w io.Writer) (int64, error) {
	n, err := io.WriteString(w, r.String())
	return int64(n), err
}

func (r *Result) write(b *strings.Builder) {
	c := &r.Circuit
	fmt.Fprintf(b, "%s: %s, under %s\n", oneLine(c.Tag), describe(r), c.Edition.Standard())
	for s := range sectionCount {
		lines := r.section(nil, s)
		chosen := r.chosen(s)
		if !slices.ContainsFunc(lines, func(f *tables.Figure) bool { return !f.IsZero() }) && chosen == "" {
			continue
		}
		fmt.Fprintf(b, "\n%s", s)
		if chosen != "" {
			fmt.Fprintf(b, ": %s", chosen)
		}
		b.WriteByte('\n')
		for _, f := range lines {
			if !f.IsZero() {
				writeFigure(b, *f)
			}
		}
		for _, x := range r.selections(s) {
			b.WriteString(whySmallerFails(x))
		}
	}
	writeCautions(b, r.Cautions)
}

// writeFigure writes one line of a derivation: the value, what it is, how it
// came about and the rules behind it.
func writeFigure(b *strings.Builder, f tables.Figure) {
	fmt.Fprintf(b, "%12s  %s: %s%s\n", f, oneLine(f.Name()), f.How(), refs(f))
}

func writeCautions(b *strings.Builder, cautions []tables.Caution) {
	b.WriteString("\nCautions\n")
	for _, caution := range cautions {
		fmt.Fprintf(b, "  - %s", caution.Text)
		if cite := ref(caution.Cite); cite != "" {
			b.WriteString(" " + cite)
		}
		b.WriteByte('\n')
	}
}

// ref prints a citation without its edition, which the heading names.
func ref(c tables.Citation) string {
	if c.IsZero() {
		return ""
	}
	c.Edition = 0
	return "[" + c.String() + "]"
}

// refs prints the rule that decided a figure and those that its percents,
// factors and ratings were read from.
func refs(f tables.Figure) string {
	cites := []tables.Citation{f.Citation()}
	for _, g := range f.Operands() {
		if c := g.Citation(); (g.Op() == tables.Tabulated || g.Op() == tables.Stated) && !c.IsZero() && !slices.Contains(cites, c) {
			cites = append(cites, c)
		}
	}
	var texts []string
	for _, c := range cites {
		if !c.IsZero() {
			c.Edition = 0
			texts = append(texts, c.String())
		}
	}
	if len(texts) == 0 {
		return ""
	}
	return " [" + strings.Join(texts, "; ") + "]"
}

func describe(r *Result) string {
	m := &r.Circuit.Motor
	parts := []string{m.Kind.Name()}
	if !m.Power.IsZero() {
		parts = append(parts, m.Power.String())
	}
	parts = append(parts, fmt.Sprintf("%d V", m.Voltage))
	if n := m.PhaseCount(); n > 0 && m.Kind != motor.SinglePhase {
		parts = append(parts, fmt.Sprintf("%d-phase", n))
	}
	if m.Duty.Kind != tables.Continuous {
		parts = append(parts, strings.ReplaceAll(m.Duty.Kind.String(), "_", "-")+" duty")
	}
	if m.Starting != 0 {
		parts = append(parts, startings[m.Starting])
	}
	if m.Use != motor.Ordinary {
		parts = append(parts, strings.ReplaceAll(m.Use.String(), "_", " "))
	}
	if m.Bypass {
		parts = append(parts, "with bypass")
	}
	if n := len(m.Nameplate.Windings); n > 0 {
		parts = append(parts, fmt.Sprintf("%d speeds", n))
	}
	return strings.Join(parts, ", ")
}

// startings words the ways to start a motor.
var startings = map[motor.Starting]string{
	motor.WyeDelta: "wye-delta start", motor.PartWinding: "part-winding start", motor.Autotransformer: "autotransformer start",
	motor.Resistor: "resistor or reactor start", motor.SoftStarter: "soft starter", motor.Drive: "on an adjustable-speed drive",
}

// chosen says what a section comes to.
func (r *Result) chosen(s Section) string {
	if runs := r.selections(s); len(runs) > 0 {
		texts := make([]string, len(runs))
		for i, x := range runs {
			texts[i] = wires(x)
		}
		return strings.Join(texts, "; ")
	}
	switch s {
	case OverloadProtection:
		if r.Overload.Limit.IsZero() {
			return "none"
		}
		return "set at not more than " + r.Overload.Limit.String()
	case ShortCircuitDevice:
		if x := &r.ShortCircuit; !x.Rating.IsZero() {
			return x.Rating.String() + " " + x.Device.Name()
		}
		return r.ShortCircuit.Device.Name() + " set at not more than " + r.ShortCircuit.Limit.String()
	case DisconnectingMeans:
		return rating(r.Disconnect.Amperes, r.Disconnect.Horsepower, r.Disconnect.Cite)
	case ControllerRating:
		return rating(r.Controller.Amperes, r.Controller.Horsepower, r.Controller.Cite)
	case BondingConductor:
		return fmt.Sprintf("%v %v, %s", r.Bonding.Size, r.Bonding.Material, r.Bonding.Why)
	case RacewayFill:
		name := r.Raceway.Name(r.Circuit.Edition)
		if flexible := r.Flexible.Name(r.Circuit.Edition); flexible != "" {
			name = strings.TrimPrefix(name+", at the motor "+flexible, ", ")
		}
		return name
	}
	return ""
}

func rating(amps tables.Figure, p tables.Power, cite tables.Citation) string {
	hp := strings.TrimSpace(p.String() + " " + ref(cite))
	switch {
	case amps.IsZero() && p.IsZero():
		return ""
	case amps.IsZero():
		return "at least " + hp
	case p.IsZero():
		return "at least " + amps.String()
	}
	return "at least " + amps.String() + " and " + hp
}

func wires(s *conductor.Selection) string {
	if s.IsZero() {
		return ""
	}
	text := fmt.Sprintf("%v %v %s", s.Size, s.Material, s.Insulation)
	if s.Sets > 1 {
		text = fmt.Sprintf("%d in parallel, each %s", s.Sets, text)
	}
	return text + ", " + strings.ReplaceAll(s.Run.String(), "_", " ") + ", " + s.Location.String()
}

// whySmallerFails says why the next smaller size does not do.
func whySmallerFails(x *conductor.Selection) string {
	switch small := x.Smaller; {
	case small.Size == 0:
		return ""
	case small.Ampacity.IsZero():
		return fmt.Sprintf("%12s  next smaller size, fails: %s %s\n", small.Size, small.Why, ref(small.Cite))
	default:
		return fmt.Sprintf("%12s  next smaller size, fails: carries %v, %s\n", small.Size, small.Ampacity, small.Ampacity.How())
	}
}

// oneLine returns a caller's text on one line, "-" if there is none.
func oneLine(s string) string {
	if s = strings.Join(strings.Fields(s), " "); s == "" {
		return "-"
	}
	return s
}
