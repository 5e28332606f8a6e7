package abi

import (
	"plumbrule/engine/law"
)

// AppendCatalogue appends every law and constant as JSON.
func AppendCatalogue(dst []byte, c *law.Catalogue) []byte {
	w := writer{text: dst}
	w.open('{')
	w.key("laws")
	w.open('[')
	for _, l := range c.Laws() {
		w.law(l)
	}
	w.close(']')
	w.key("constants")
	w.open('[')
	for _, constant := range c.Constants() {
		w.open('{')
		w.string("name", constant.Name)
		w.string("meaning", constant.Meaning)
		w.number("value", constant.Value)
		w.number("uncertainty", constant.Uncertainty)
		w.string("unit", constant.Unit)
		w.string("source", constant.Source)
		w.close('}')
	}
	w.close(']')
	w.close('}')
	return w.text
}

func typeWord(t law.Type) string {
	switch t {
	case law.List:
		return "list"
	case law.Text:
		return "text"
	case law.Made:
		return "made"
	}
	return "number"
}

func (w *writer) law(l *law.Law) {
	w.open('{')
	w.string("name", l.Name)
	w.string("group", l.Group)
	w.string("gives", l.Gives)
	w.key("parameters")
	w.open('[')
	for i := range l.Parameters {
		p := &l.Parameters[i]
		w.open('{')
		w.string("name", p.Name)
		w.string("meaning", p.Meaning)
		w.string("type", typeWord(p.Type))
		w.string("unit", p.Unit)
		w.string("made", p.Made)
		w.string("valid", p.Valid.Text(p.Unit))
		w.string("finite", p.Finite.Text(p.Unit))
		w.string("default", p.Default)
		w.strings("choices", p.Choices)
		w.close('}')
	}
	w.close(']')
	w.string("result_type", typeWord(l.Result.Type))
	w.string("result_unit", l.Result.Unit)
	w.string("result_made", l.Result.Made)
	w.string("equation", l.Equation)
	w.string("source", l.Source)
	w.string("caution", l.Caution)
	w.string("refusal", l.Refusal)
	w.key("examples")
	w.open('[')
	for _, example := range l.Examples {
		w.open('{')
		w.string("formula", example.Formula)
		w.string("gives", example.Gives)
		w.close('}')
	}
	w.close(']')
	w.close('}')
}
