// Package sheet turns the text of a sheet into statements with their places,
// and prints statements back in one canonical layout.
//
// It knows lines, notes, names, numbers, quoted texts, brackets and the order
// of the words of each statement. Formulas and units are kept as text with
// positions: other packages read them. It does not compare statements with
// each other either, so a name that is given twice is not its concern.
//
// Parse reports everything that is wrong and goes on with the next statement.
// A statement that was reported stands in the sheet all the same, with what
// could be read of it, and says so by Faulty: later steps can then know its
// name without reporting what follows from the same slip.
package sheet
