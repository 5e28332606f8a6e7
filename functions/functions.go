// Package functions is the catalogue of every law and constant.
package functions

import (
	"sync"

	"plumbrule/engine/law"
	"plumbrule/functions/air"
	"plumbrule/functions/fluid"
	"plumbrule/functions/levels"
	"plumbrule/functions/nature"
)

// All gives the catalogue of every law and constant. It is made once and does
// not change.
func All() *law.Catalogue { return catalogue() }

var catalogue = sync.OnceValue(func() *law.Catalogue {
	var laws []*law.Law
	for _, room := range [][]*law.Law{nature.Laws(), fluid.Laws(), air.Laws(), levels.Laws()} {
		laws = append(laws, room...)
	}
	c, err := law.NewCatalogue(laws, nature.Constants())
	if err != nil {
		// A law that stands twice is found by the catalogue's test before it
		// can reach a host; a host then finds no laws rather than a crash.
		c, _ = law.NewCatalogue(nil, nil)
	}
	return c
})
