package law

import (
	"errors"
	"sort"

	"plumbrule/engine/problem"
)

// Catalogue holds every law and constant that a sheet may use. It does not
// change once made.
type Catalogue struct {
	laws      []*Law
	byName    map[string]*Law
	constants []Constant
	byConst   map[string]int
}

// NewCatalogue gathers laws and constants. A name that is given twice, or a
// law without a name, source or result, is an error.
func NewCatalogue(laws []*Law, constants []Constant) (*Catalogue, error) {
	c := &Catalogue{byName: make(map[string]*Law, len(laws)), byConst: make(map[string]int, len(constants))}
	for _, l := range laws {
		if l.Name == "" || l.Source == "" || l.Gives == "" {
			return nil, errors.New("law " + l.Name + ": name, source and what it gives must be told")
		}
		if c.byName[l.Name] != nil {
			return nil, errors.New("law " + l.Name + " stands twice in the catalogue")
		}
		c.byName[l.Name] = l
		c.laws = append(c.laws, l)
	}
	sort.Slice(c.laws, func(i, j int) bool {
		if c.laws[i].Group != c.laws[j].Group {
			return c.laws[i].Group < c.laws[j].Group
		}
		return c.laws[i].Name < c.laws[j].Name
	})
	for _, constant := range constants {
		if _, twice := c.byConst[constant.Name]; twice {
			return nil, errors.New("constant " + constant.Name + " stands twice in the catalogue")
		}
		c.byConst[constant.Name] = len(c.constants)
		c.constants = append(c.constants, constant)
	}
	return c, nil
}

// Laws gives every law, sorted by group and name. The slice must not be changed.
func (c *Catalogue) Laws() []*Law { return c.laws }

// Constants gives every constant in the order given. The slice must not be changed.
func (c *Catalogue) Constants() []Constant { return c.constants }

// Law gives the law of that name, or nil.
func (c *Catalogue) Law(name string) *Law { return c.byName[name] }

// Constant gives the constant of that name.
func (c *Catalogue) Constant(name string) (Constant, bool) {
	i, ok := c.byConst[name]
	if !ok {
		return Constant{}, false
	}
	return c.constants[i], true
}

// NearestLaw gives the name of the law most like name, or "".
func (c *Catalogue) NearestLaw(name string) string {
	names := make([]string, len(c.laws))
	for i, l := range c.laws {
		names[i] = l.Name
	}
	return problem.Nearest(name, names)
}

// NearestConstant gives the name of the constant most like name, or "".
func (c *Catalogue) NearestConstant(name string) string {
	names := make([]string, len(c.constants))
	for i, constant := range c.constants {
		names[i] = constant.Name
	}
	return problem.Nearest(name, names)
}

// The usual cautions, one wording each.
const (
	CautionPressure = "Pressure loads can kill. This is a first estimate, not a design calculation: check against the governing pressure vessel code and have it approved by a licensed engineer."
	CautionDiving   = "Not for planning dives or breathing gas: follow the governing diving standard and a qualified diving physician or supervisor."
	CautionVacuum   = "Vacuum chambers can implode and vented gas can burn or suffocate: check against the governing code and have the design approved by a licensed engineer."
)
