package sheet

import (
	"unicode"
	"unicode/utf8"
)

// Words gives the statement words.
func Words() []string {
	return []string{"title", "known", "derive", "law", "require", "table", "vary", "seek", "correlate", "draw"}
}

// Reserved says why a word cannot be a name, or gives "" where it can be one.
func Reserved(word string) string {
	switch word {
	case "title", "known", "derive", "law", "require", "table", "vary", "seek", "correlate", "draw":
		return "it is a statement word"
	case "valid", "within":
		return "it is a word of statements"
	case "true", "false":
		return "it is a truth value"
	case "and", "or", "not":
		return "it is an operator of formulas"
	case "if", "else", "in", "let", "matches", "contains", "startsWith", "endsWith", "nil":
		return "it is a reserved word of formulas"
	case "nature":
		return "it holds the constants of nature"
	}
	return ""
}

// IsName says whether a text is a well-formed name: a letter or `_`, then
// letters, digits and `_`. It may still be reserved.
func IsName(text string) bool {
	return text != "" && nameEnd(text, 0) == len(text)
}

func isWord(word string) bool {
	switch word {
	case "title", "known", "derive", "law", "require", "table", "vary", "seek", "correlate", "draw":
		return true
	}
	return false
}

// nameEnd gives where the name that starts at pos ends, or pos where none does.
func nameEnd(text string, pos int) int {
	end := pos
	for end < len(text) {
		c := text[end]
		size := 1
		switch {
		case c == '_' || 'a' <= c && c <= 'z' || 'A' <= c && c <= 'Z':
		case '0' <= c && c <= '9':
			if end == pos {
				return pos
			}
		case c < utf8.RuneSelf:
			return end
		default:
			var r rune
			r, size = utf8.DecodeRuneInString(text[end:])
			if !unicode.IsLetter(r) && (end == pos || !unicode.IsDigit(r)) {
				return end
			}
		}
		end += size
	}
	return end
}

// firstName gives the name that a text begins with, or "".
func firstName(text string) string { return text[:nameEnd(text, 0)] }
