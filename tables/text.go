package tables

import "strings"

// TextOf returns the text form of a value of a small enumeration, "" outside of
// it. It serves the enumerations of the whole library.
func TextOf[T ~uint8](v T, texts []string) string {
	if int(v) < len(texts) {
		return texts[v]
	}
	return ""
}

// ReadText sets v to the value whose text form is given; no text is the zero
// value. Words may be parted by spaces or hyphens too, and letter case does not
// matter. An error is an [*InputError] for the field.
func ReadText[T ~uint8](v *T, field string, text []byte, texts []string) error {
	*v = 0
	if len(text) == 0 {
		return nil
	}
	s := strings.ToLower(strings.TrimSpace(string(text)))
	s = strings.NewReplacer(" ", "_", "-", "_").Replace(s)
	var want []string
	for i, t := range texts {
		if t == s && t != "" {
			*v = T(i)
			return nil
		}
		if t != "" {
			want = append(want, t)
		}
	}
	return &InputError{Field: field, Value: clip(string(text)), Want: "one of " + strings.Join(want, ", ")}
}

// readOr sets v to what a parser reads; no text is the zero value, "not given".
func readOr[T any](v *T, text []byte, parse func(string) (T, error)) (err error) {
	var none T
	if *v = none; len(text) > 0 {
		*v, err = parse(string(text))
	}
	return err
}
