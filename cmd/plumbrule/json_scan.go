package main

import (
	"bytes"
	"encoding/json"
	"unicode/utf8"
)

// jsonMember is where a member's name and value stand in a line of JSON: the
// name with its quotes.
type jsonMember struct {
	nameFrom, nameTo int32
	from, to         int32
}

// jsonScanner takes lines apart that hold one JSON object each (RFC 8259). It
// allocates nothing for a member.
type jsonScanner struct {
	text []byte
	at   int
	line int

	// The line that was found last.
	begin    int // its number
	from, to int // its text, without blanks around it
	members  []jsonMember
	well     bool // it is an object
}

// next finds the next line that is not blank.
func (s *jsonScanner) next() bool {
	for s.at < len(s.text) {
		end := bytes.IndexByte(s.text[s.at:], '\n')
		if end < 0 {
			end = len(s.text)
		} else {
			end += s.at
		}
		s.from, s.to = s.at, end
		s.begin = s.line
		s.at = min(end+1, len(s.text))
		s.line++
		for s.from < s.to && jsonBlank(s.text[s.from]) {
			s.from++
		}
		for s.to > s.from && jsonBlank(s.text[s.to-1]) {
			s.to--
		}
		if s.from == s.to {
			continue
		}
		s.members = s.members[:0]
		s.well = s.text[s.from] == '{' && json.Valid(s.text[s.from:s.to])
		if s.well {
			s.split()
		}
		return true
	}
	return false
}

func jsonBlank(c byte) bool { return c == ' ' || c == '\t' || c == '\r' || c == '\n' }

// split finds the members of an object that is known to be right.
func (s *jsonScanner) split() {
	i := s.skip(s.from + 1)
	for i < s.to && s.text[i] == '"' {
		var m jsonMember
		m.nameFrom = int32(i)
		i = s.pass(i)
		m.nameTo = int32(i)
		i = s.skip(s.skip(i) + 1) // the colon
		m.from = int32(i)
		i = s.pass(i)
		m.to = int32(i)
		s.members = append(s.members, m)
		i = s.skip(s.skip(i) + 1) // the comma
	}
}

func (s *jsonScanner) skip(i int) int {
	for i < s.to && jsonBlank(s.text[i]) {
		i++
	}
	return i
}

// pass gives the end of the value that begins at i.
func (s *jsonScanner) pass(i int) int {
	depth := 0
	for i < s.to {
		switch c := s.text[i]; c {
		case '"':
			for i++; i < s.to && s.text[i] != '"'; i++ {
				if s.text[i] == '\\' {
					i++
				}
			}
			i++
		case '{', '[':
			depth++
			i++
		case '}', ']':
			if depth == 0 {
				return i
			}
			depth--
			i++
		default:
			if depth == 0 && (c == ',' || jsonBlank(c)) {
				return i
			}
			i++
			if depth == 0 {
				continue // within a number, true, false or null
			}
		}
		if depth == 0 {
			return i
		}
	}
	return i
}

// unquoted gives the text of a JSON string with its quotes. It is a view of the
// string where that has no escapes.
func unquoted(raw []byte) []byte {
	if bytes.IndexByte(raw, '\\') < 0 && utf8.Valid(raw) {
		return raw[1 : len(raw)-1]
	}
	var text string
	if json.Unmarshal(raw, &text) != nil {
		return raw // not reached: the line is valid
	}
	return []byte(text)
}

// appendJSONText appends a text as a JSON string; bytes that are no UTF-8 become
// the replacement character.
func appendJSONText[T string | []byte](to []byte, text T) []byte {
	const digits = "0123456789abcdef"
	to = append(to, '"')
	for i := 0; i < len(text); {
		c := text[i]
		if c < utf8.RuneSelf {
			switch {
			case c == '"' || c == '\\':
				to = append(to, '\\', c)
			case c == '\n':
				to = append(to, '\\', 'n')
			case c == '\r':
				to = append(to, '\\', 'r')
			case c == '\t':
				to = append(to, '\\', 't')
			case c < ' ':
				to = append(to, '\\', 'u', '0', '0', digits[c>>4], digits[c&15])
			default:
				to = append(to, c)
			}
			i++
			continue
		}
		r, size := utf8.DecodeRuneInString(string(text[i:min(len(text), i+utf8.UTFMax)]))
		to = utf8.AppendRune(to, r)
		i += size
	}
	return append(to, '"')
}

// cutLines tells where the last line of a text ends that is whole.
func cutLines(text []byte) int { return bytes.LastIndexByte(text, '\n') + 1 }
