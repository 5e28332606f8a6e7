// Package unit is the room for dimensions, units and kinds: it reads unit
// text, writes it back in one canonical form, and converts numbers to and from
// coherent SI units.
//
// Three ideas are kept apart. A Dimension says what may be added to what. A
// Unit is a way to write a number of some dimension: a factor and, for a
// temperature scale, an offset. A Kind catches what dimensions cannot: a gauge
// pressure is no absolute pressure, a point on a temperature scale is no
// difference.
//
// Every named unit is one entry of the tables in table_*.go: its symbol, its
// definition in terms of other units, and the source of that definition. The
// factor is computed from the definition, so what is listed is what is used.
// Factors are composed exactly, as powers of two, five, pi and odd integers,
// and rounded once, at the end, to the nearest float64.
//
// Where a symbol of the published tables means two things, the tables take the
// one that SI or common use gives it and choose another word for the other:
//
//	A      ampere; the ångström is Å or angstrom
//	b      barn; but mb is refused: mbar or mbarn
//	D      debye; the permeability is darcy
//	G      gauss
//	gal    gallon (U.S.); the acceleration is Gal
//	P      poise; pica and point are written out
//	ph     phot
//	rad    radian; the absorbed dose is rad_dose
//	u      unified atomic mass unit; before another symbol it is micro
//	a      refused: are or yr
//	ly     refused: lightyear (or l.y.) or langley
//	R      refused: roentgen, rev or degR
//	r, '   not known: rev, arcmin
//	st     refused: stere or stone; the stokes is St
//	AT     also ton_assay
//
// at, ct, ft, pt and qt are the technical atmosphere, the carat, the foot, the
// pint and the quart, not tonnes with a prefix.
package unit
