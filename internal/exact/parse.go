package exact

import "errors"

// Errors of Parse. Callers word them for the field at hand.
var (
	ErrSyntax = errors.New("not a plain decimal")
	ErrPlaces = errors.New("more than six places")
	ErrLarge  = errors.New("more than nine digits before the point")
)

// Parse reads a plain unsigned decimal such as "65", "7.6" or ".5": ASCII
// digits with at most one point, at most nine digits before it and six after.
func Parse(s string) (Num, error) {
	var coef int64
	whole, places, seen, point := 0, 0, false, false
	for i := 0; i < len(s); i++ {
		switch c := s[i]; {
		case c == '.' && !point:
			point = true
		case c < '0' || c > '9':
			return Num{}, ErrSyntax
		default:
			seen = true
			if point {
				places++
			} else if whole > 0 || c != '0' {
				whole++
			}
			if places > 6 {
				return Num{}, ErrPlaces
			}
			if whole > 9 {
				return Num{}, ErrLarge
			}
			coef = coef*10 + int64(c-'0')
		}
	}
	if !seen || s[len(s)-1] == '.' {
		return Num{}, ErrSyntax
	}
	return lowest(coef, uint8(places)), nil
}
