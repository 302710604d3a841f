package layout_test

import (
	"regexp"
	"strings"
	"testing"
	"unicode/utf8"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/layout"
)

func sample() *layout.Doc {
	return &layout.Doc{
		Title:   "P-1: pump, under the code",
		Columns: [4]string{"Value", "What", "How", "Rule"},
		Sections: []layout.Section{
			{Heading: "Conductors", Chosen: "4 AWG copper", Rows: []layout.Row{
				{"81.25 A", "least ampacity", "65 A × 125 %", "430.22"},
				{"a value of more than twelve", "name", "", ""},
				{"", "a remark", "", ""},
			}},
			{Heading: "Empty"},
			{Heading: "Cautions", List: []string{"one thing", "30 °C is taken"}},
		},
	}
}

func TestText(t *testing.T) {
	assert.Equal(t, `P-1: pump, under the code

Conductors: 4 AWG copper
     81.25 A  least ampacity: 65 A × 125 % [430.22]
a value of more than twelve  name
              a remark

Empty

Cautions
  - one thing
  - 30 °C is taken
`, sample().Text(0))
}

func TestTextWrapped(t *testing.T) {
	d := &layout.Doc{Title: "a title that is a good deal longer than forty characters", Sections: []layout.Section{
		{Heading: "Section", Rows: []layout.Row{{"30 °C", "ambient", "of the air around the conductors", "4-004"}, {"1 A", strings.Repeat("x", 60), "and on", ""}}},
		{Heading: "List", List: []string{"something that one ought to know before the work begins"}},
	}}
	want := `a title that is a good deal longer than
  forty characters

Section
       30 °C  ambient: of the air around
              the conductors [4-004]
         1 A  xxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxx:
              and on

List
  - something that one ought to know
    before the work begins
`
	assert.Equal(t, want, d.Text(40))
	assert.Equal(t, want, d.Text(1), "the narrowest is 40")
	assert.Equal(t, want, d.Text(-5))
	assert.NotEqual(t, want, d.Text(60))
}

func TestMarkdown(t *testing.T) {
	assert.Equal(t, `# P-1: pump, under the code

## Conductors: 4 AWG copper

| Value | What | How | Rule |
|---:|---|---|---|
| 81.25 A | least ampacity | 65 A × 125 % | 430.22 |
| a value of more than twelve | name |  |  |
|  | a remark |  |  |

## Empty

## Cautions

- one thing
- 30 °C is taken
`, sample().Markdown())
}

// Whatever a text holds shows as written: CommonMark lets a backslash stand before
// any mark of punctuation (CommonMark 0.31, 2.4), and a pipe in a table needs one.
func TestMarkdownEscapes(t *testing.T) {
	hostile := "a|b *c* _d_ `e` <b> [f](g) \\ # & ~~h~~ !i\n# j"
	d := &layout.Doc{Title: hostile, Sections: []layout.Section{{Heading: hostile, Rows: []layout.Row{{hostile, hostile, hostile, hostile}}, List: []string{"- k", "+ l", "1. m", "2) n", "12 o", "-"}}}}
	text := d.Markdown()
	one := `a\|b \*c\* \_d\_ ` + "\\`e\\`" + ` \<b\> \[f\](g) \\ \# \& \~\~h\~\~ \!i \# j`
	assert.Contains(t, text, "# "+one+"\n\n## "+one+"\n")
	assert.Contains(t, text, "| "+one+" | "+one+" | "+one+" | "+one+" |\n")
	assert.Contains(t, text, "\n- \\- k\n- \\+ l\n- 1\\. m\n- 2\\) n\n- 12 o\n- \\-\n")
}

var bare = regexp.MustCompile(`(^|[^\\])((\\\\)*)\|`)

// FuzzLayout: no line is wider than asked but for a word that is; no words are lost;
// in Markdown no text makes lines or cells of its own.
func FuzzLayout(f *testing.F) {
	f.Add("title", "heading", "81.25 A", "least ampacity", "65 A × 125 %", 60)
	f.Add("a|b\n# c", "", "°°°°°°°°°°°°°", "\\|", "`", 1)
	f.Add("\xff", "\t", " ", "-", "1.", -1)
	f.Fuzz(func(t *testing.T, title, heading, value, name, how string, width int) {
		d := &layout.Doc{Title: title, Sections: []layout.Section{{Heading: heading, Rows: []layout.Row{{value, name, how, how}}, List: []string{how, title}}}}
		text := d.Text(width)
		if width != 0 {
			limit := max(width, layout.LeastWidth)
			for line := range strings.SplitSeq(text, "\n") {
				require.True(t, utf8.RuneCountInString(line) <= limit || utf8.RuneCountInString(value) > 11 || longWord(line, limit), "%q", line)
			}
			if !strings.Contains(title+heading+value+name+how, "\n") {
				require.Equal(t, strings.Fields(d.Text(0)), strings.Fields(text))
			}
		}
		lines := strings.Split(d.Markdown(), "\n")
		require.Len(t, lines, 11)
		require.Len(t, bare.FindAllString(lines[6], -1), 5, "%q", lines[6])
	})
}

func longWord(line string, limit int) bool {
	for _, word := range strings.Fields(line) {
		if utf8.RuneCountInString(word) > limit-16 {
			return true
		}
	}
	return false
}
