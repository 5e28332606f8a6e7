package main

import "bytes"

// csvCell is where a cell's text stands in a record: between its quotes where
// it has some.
type csvCell struct {
	from, to int32
	doubled  bool // quotes inside of it are written twice
}

// csvScanner takes text apart into records after RFC 4180. It allocates
// nothing for a cell. Lines that are quite empty are no records; a quote may
// stand only around a whole cell; lines may end with a carriage return.
type csvScanner struct {
	text []byte
	at   int // the next record begins here
	line int // and in this line

	// The record that was found last.
	cells    []csvCell
	from, to int  // its text, without the line's end
	begin    int  // the line it begins in
	torn     bool // a quote stands where none belongs; cells are those before it
	open     bool // the text ended before the record's line did
}

// next finds the next record. A torn record ends with the line in which it
// went wrong, so that the records after it are found.
func (s *csvScanner) next() bool {
	text := s.text
	i := s.at
	for i < len(text) {
		if text[i] == '\n' {
			i++
		} else if text[i] == '\r' && (i+1 == len(text) || text[i+1] == '\n') {
			i = min(i+2, len(text))
		} else {
			break
		}
		s.line++
	}
	s.cells, s.from, s.begin, s.torn, s.open = s.cells[:0], i, s.line, false, false
	if i >= len(text) {
		s.at, s.to, s.open = i, i, true
		return false
	}
	for {
		if i < len(text) && text[i] == '"' {
			end, doubled, lines := quoted(text, i+1)
			s.line += lines
			after := end + 1
			switch {
			case after < len(text) && text[after] == ',':
				s.cells = append(s.cells, csvCell{int32(i + 1), int32(end), doubled})
				i = after + 1
				continue
			case end < len(text) && lineEnd(text, after):
				s.cells = append(s.cells, csvCell{int32(i + 1), int32(end), doubled})
				return s.end(after)
			}
			return s.tear(min(after, len(text)))
		}
		from := i
		for i < len(text) && text[i] != ',' && text[i] != '\n' && text[i] != '"' {
			i++
		}
		switch {
		case i < len(text) && text[i] == ',':
			s.cells = append(s.cells, csvCell{from: int32(from), to: int32(i)})
			i++
		case i < len(text) && text[i] == '"':
			return s.tear(i)
		default:
			to := i
			if to > from && text[to-1] == '\r' {
				to--
			}
			s.cells = append(s.cells, csvCell{from: int32(from), to: int32(to)})
			return s.end(to)
		}
	}
}

// quoted finds the quote that closes a cell which begins at from; where none
// does it gives the text's length. lines counts the line ends in between.
func quoted(text []byte, from int) (end int, doubled bool, lines int) {
	i := from
	for {
		n := bytes.IndexByte(text[i:], '"')
		if n < 0 {
			return len(text), doubled, bytes.Count(text[from:], []byte{'\n'})
		}
		i += n
		if i+1 < len(text) && text[i+1] == '"' {
			doubled = true
			i += 2
			continue
		}
		return i, doubled, bytes.Count(text[from:i], []byte{'\n'})
	}
}

// lineEnd says whether a line ends here, or the text.
func lineEnd(text []byte, i int) bool {
	return i == len(text) || text[i] == '\n' || text[i] == '\r' && (i+1 == len(text) || text[i+1] == '\n')
}

// end closes a record before its line's end.
func (s *csvScanner) end(to int) bool {
	s.to = to
	if to < len(s.text) && s.text[to] == '\r' {
		to++
	}
	s.open = to >= len(s.text)
	s.at = min(to+1, len(s.text))
	if !s.open {
		s.line++
	}
	return true
}

// tear closes a record whose quotes are wrong somewhere before i.
func (s *csvScanner) tear(i int) bool {
	s.torn = true
	n := bytes.IndexByte(s.text[i:], '\n')
	if n < 0 {
		s.to, s.at, s.open = len(s.text), len(s.text), true
		return true
	}
	s.to, s.at = i+n, i+n+1
	s.line++
	return true
}

// value gives a cell's text; buffer takes it where quotes have to be undoubled.
func (s *csvScanner) value(c csvCell, buffer []byte) (value, used []byte) {
	raw := s.text[c.from:c.to]
	if !c.doubled {
		return raw, buffer
	}
	from := len(buffer)
	for i := 0; i < len(raw); i++ {
		buffer = append(buffer, raw[i])
		if raw[i] == '"' {
			i++ // the second of two
		}
	}
	return buffer[from:], buffer
}

// cutRecords tells where the last record of a text ends that is whole.
func cutRecords(text []byte) int {
	end := 0
	var s csvScanner
	for {
		n := bytes.IndexByte(text[end:], '"')
		if n < 0 {
			return end + bytes.LastIndexByte(text[end:], '\n') + 1
		}
		// Up to the line of the quote each line is a record.
		end += bytes.LastIndexByte(text[end:end+n], '\n') + 1
		s.text, s.at = text[end:], 0
		if !s.next() || s.open {
			return end
		}
		end += s.at
	}
}
