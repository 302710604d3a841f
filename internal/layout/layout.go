// Package layout sets derivations and reports as text for a terminal and as
// Markdown, from one description.
package layout

import (
	"strings"
	"unicode/utf8"
)

// A Doc is a title and sections.
type Doc struct {
	Title    string
	Columns  [4]string // headings of the rows in Markdown
	Sections []Section
}

// A Section is rows, or a list, under a heading.
type Section struct {
	Heading string
	Chosen  string // what the section comes to; often ""
	Rows    []Row
	List    []string
}

// A Row is a value with what it is, how it came about and the rules behind it. A
// remark has a name alone.
type Row struct{ Value, Name, How, Rule string }

// LeastWidth is the narrowest text: anything less is taken for it.
const LeastWidth = 40

// valueWidth is the width of the column of values.
const valueWidth = 12

// Text sets the document in lines of at most so many characters, but for words
// that are longer; 0 leaves the lines as long as they are.
func (d *Doc) Text(width int) string {
	if width != 0 {
		width = max(width, LeastWidth)
	}
	w := writer{width: width}
	w.line("", "  ", d.Title)
	for _, s := range d.Sections {
		w.WriteByte('\n')
		w.line("", "  ", join(s.Heading, ": ", s.Chosen))
		for _, r := range s.Rows {
			pad := strings.Repeat(" ", max(0, valueWidth-utf8.RuneCountInString(r.Value)))
			w.line(pad+r.Value+"  ", strings.Repeat(" ", valueWidth+2), r.text())
		}
		for _, item := range s.List {
			w.line("  - ", "    ", item)
		}
	}
	return w.String()
}

func (r *Row) text() string {
	text := join(r.Name, ": ", r.How)
	if r.Rule != "" {
		text += " [" + r.Rule + "]"
	}
	return text
}

// join puts a separator between two texts if there is a second.
func join(a, separator, b string) string {
	if b == "" {
		return a
	}
	return a + separator + b
}

// A writer writes lines.
type writer struct {
	strings.Builder
	width int
}

// line writes text after a prefix, and what does not fit below it under an indent.
func (w *writer) line(prefix, indent, text string) {
	line := prefix
	if w.width == 0 {
		line += text
	} else {
		used, empty := utf8.RuneCountInString(prefix), true
		for _, word := range strings.Fields(text) {
			n := utf8.RuneCountInString(word)
			switch {
			case empty:
			case used+1+n <= w.width:
				line += " "
				used++
			default:
				w.end(line)
				line, used = indent, utf8.RuneCountInString(indent)
			}
			line, used, empty = line+word, used+n, false
		}
	}
	w.end(line)
}

func (w *writer) end(line string) {
	w.WriteString(strings.TrimRight(line, " "))
	w.WriteByte('\n')
}
