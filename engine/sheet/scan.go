package sheet

import (
	"strings"
	"unicode"
	"unicode/utf8"
)

// line is one line of the text.
type line struct {
	number     int    // counted from 1
	column     int    // of body, counted from 1
	body       string // without indentation, note and blanks at the end
	note       string // without `#` and the blanks around it
	noteColumn int    // of `#`, 0 where there is none
	noteLength int    // from `#` to the end, in characters
	start, end int    // in bytes of the text, without the line's end
	indented   bool
	long       bool // longer than MostLine
}

// empty says that there is nothing on the line, not even a note.
func (l *line) empty() bool { return l.body == "" && l.noteColumn == 0 }

// nextLine reads the line that starts at the byte start and gives where the
// next one starts.
func nextLine(text string, start, number int) (line, int) {
	end, next := len(text), len(text)
	if i := strings.IndexByte(text[start:], '\n'); i >= 0 {
		end, next = start+i, start+i+1
	}
	if end > start && text[end-1] == '\r' {
		end--
	}
	l := line{number: number, start: start, end: end}
	raw := text[start:end]
	body := strings.TrimLeftFunc(raw, unicode.IsSpace)
	l.indented = len(body) < len(raw)
	l.column = 1 + utf8.RuneCountInString(raw[:len(raw)-len(body)])
	body = strings.TrimRightFunc(body, unicode.IsSpace)
	if len(raw) > MostLine && l.column-1+utf8.RuneCountInString(body) > MostLine {
		l.long = body != ""
		l.body = body
		return l, next
	}
	if at := noteStart(body); at >= 0 {
		l.noteColumn = l.column + utf8.RuneCountInString(body[:at])
		l.noteLength = utf8.RuneCountInString(body[at:])
		l.note = strings.TrimSpace(body[at+1:])
		body = strings.TrimRightFunc(body[:at], unicode.IsSpace)
	}
	l.body = body
	return l, next
}

// noteStart gives where the note of a line begins, or -1. A `#` inside of a
// quoted text belongs to the text, and one inside of square brackets that
// close on the line to what the brackets hold. Quotes and brackets that do
// not close hide no note.
func noteStart(body string) int {
	if strings.IndexByte(body, '#') < 0 {
		return -1
	}
	first := -1 // a `#` inside of brackets that may still close
	depth := 0
	quotes := true
	for i := 0; i < len(body); i++ {
		switch body[i] {
		case '"':
			// Inside of brackets it may be the second of arc.
			if !quotes || depth > 0 {
				break
			}
			if end := quoteEnd(body, i); end > 0 {
				i = end - 1
			} else {
				quotes = false
			}
		case '[':
			depth++
		case ']':
			if depth > 0 {
				depth--
				if depth == 0 {
					first = -1
				}
			}
		case '#':
			if depth == 0 {
				return i
			}
			if first < 0 {
				first = i
			}
		}
	}
	return first
}

// quoteEnd gives the end, behind the closing quote, of the quoted text that
// starts at pos, or -1 where it does not close on its line. A backslash takes
// the next character into the text.
func quoteEnd(text string, pos int) int {
	for i := pos + 1; i < len(text); i++ {
		switch text[i] {
		case '\\':
			i++
		case '\n':
			return -1
		case '"':
			return i + 1
		}
	}
	return -1
}

// squeeze makes every run of blanks outside of quotes one blank.
func squeeze(text string) string {
	plain := true
	for i := 0; i < len(text); i++ {
		c := text[i]
		if c >= utf8.RuneSelf || c < ' ' || c == ' ' && (i == 0 || i+1 == len(text) || text[i+1] == ' ') {
			plain = false
			break
		}
	}
	if plain {
		return text
	}
	out := make([]byte, 0, len(text))
	var unclosed [3]bool
	blank := false
	for i := 0; i < len(text); {
		c := text[i]
		if kind := strings.IndexByte("\"'`", c); kind >= 0 && !unclosed[kind] {
			end := -1
			if c == '"' {
				end = quoteEnd(text, i)
			} else if n := strings.IndexByte(text[i+1:], c); n >= 0 {
				end = i + n + 2
			}
			if end < 0 {
				unclosed[kind] = true
				end = i + 1
			}
			if blank && len(out) > 0 {
				out = append(out, ' ')
			}
			blank = false
			out = append(out, text[i:end]...)
			i = end
			continue
		}
		r, size := rune(c), 1
		if c >= utf8.RuneSelf {
			r, size = utf8.DecodeRuneInString(text[i:])
		}
		if unicode.IsSpace(r) {
			blank = true
		} else {
			if blank && len(out) > 0 {
				out = append(out, ' ')
			}
			blank = false
			out = append(out, text[i:i+size]...)
		}
		i += size
	}
	return string(out)
}

// numberEnd gives the end of the stretch at pos that stands where a number is
// meant: a sign, then letters, digits, points, `_` and commas between digits,
// and a sign inside of an exponent.
func numberEnd(text string, pos int, commas bool) int {
	i := pos
	if r, size := utf8.DecodeRuneInString(text[i:]); r == '+' || r == '-' || r == minusSign {
		i += size
	}
	if strings.HasPrefix(text[i:], "∞") {
		return i + len("∞")
	}
	digits := false
	for i < len(text) {
		r, size := utf8.DecodeRuneInString(text[i:])
		switch {
		case '0' <= r && r <= '9':
			digits = true
		case r == '.' || r == '_' || unicode.IsLetter(r) || unicode.IsDigit(r):
		case r == ',' && commas && digits && i+1 < len(text) && '0' <= text[i+1] && text[i+1] <= '9':
		case (r == '+' || r == '-' || r == minusSign) && digits && (text[i-1] == 'e' || text[i-1] == 'E'):
			if i+size >= len(text) || text[i+size] < '0' || text[i+size] > '9' {
				return i
			}
		default:
			return i
		}
		i += size
	}
	return i
}

// minusSign is U+2212, which looks like the minus of numbers.
const minusSign = '\u2212'

// isNumber says whether a text has the form of a number: a sign, digits with
// at most one point, and an exponent.
func isNumber(text string) bool {
	i := 0
	if i < len(text) && (text[i] == '+' || text[i] == '-') {
		i++
	}
	digits, points := 0, 0
	for ; i < len(text); i++ {
		if text[i] == '.' {
			points++
		} else if '0' <= text[i] && text[i] <= '9' {
			digits++
		} else {
			break
		}
	}
	if digits == 0 || points > 1 {
		return false
	}
	if i == len(text) {
		return true
	}
	if text[i] != 'e' && text[i] != 'E' {
		return false
	}
	i++
	if i < len(text) && (text[i] == '+' || text[i] == '-') {
		i++
	}
	if i == len(text) {
		return false
	}
	for ; i < len(text); i++ {
		if text[i] < '0' || text[i] > '9' {
			return false
		}
	}
	return true
}
