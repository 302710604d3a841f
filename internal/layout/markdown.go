package layout

import "strings"

// Markdown sets the document in CommonMark with pipe tables. Whatever the texts
// hold, it shows as written and breaks nothing.
func (d *Doc) Markdown() string {
	var b strings.Builder
	b.WriteString("# " + escape(d.Title) + "\n")
	for _, s := range d.Sections {
		b.WriteString("\n## " + escape(join(s.Heading, ": ", s.Chosen)) + "\n")
		if len(s.Rows) > 0 {
			b.WriteByte('\n')
			tableRow(&b, d.Columns)
			b.WriteString("|---:|---|---|---|\n")
			for _, r := range s.Rows {
				tableRow(&b, [4]string{r.Value, r.Name, r.How, r.Rule})
			}
		}
		if len(s.List) > 0 {
			b.WriteByte('\n')
		}
		for _, item := range s.List {
			b.WriteString("- " + first(escape(item)) + "\n")
		}
	}
	return b.String()
}

func tableRow(b *strings.Builder, cells [4]string) {
	for _, cell := range cells {
		b.WriteString("| " + escape(cell) + " ")
	}
	b.WriteString("|\n")
}

var marks = strings.NewReplacer(
	`\`, `\\`, "`", "\\`", "*", `\*`, "_", `\_`, "[", `\[`, "]", `\]`, "<", `\<`, ">", `\>`, "#", `\#`, "|", `\|`, "~", `\~`, "&", `\&`, "!", `\!`)

// escape returns a text on one line, without meaning to Markdown.
func escape(s string) string { return marks.Replace(strings.Join(strings.Fields(s), " ")) }

// first escapes what would begin a list within an item: a bullet, or a number.
func first(s string) string {
	digits := len(s) - len(strings.TrimLeft(s, "0123456789"))
	if rest := s[digits:]; rest != "" && (digits == 0 && strings.ContainsRune("-+=", rune(rest[0])) || digits > 0 && (rest[0] == '.' || rest[0] == ')')) {
		return s[:digits] + `\` + rest
	}
	return s
}
