package engine_test

import (
	"context"
	"fmt"

	"plumbrule/engine"
	"plumbrule/functions"
)

// A form that a person fills in changes one number at a time.
func ExampleProgram_NewSession() {
	const text = `
known depth   [m]   = 100
known density [kg/m^3] = 1000
known width   [m]   = 2
derive pressure [kPa] = head_pressure(depth, density)
derive half     [m]   = width / 2
`
	ctx := context.Background()
	program, err := engine.Compile(text, functions.All())
	if err != nil {
		fmt.Println(err)
		return
	}
	session, err := program.NewSession(ctx)
	if err != nil {
		fmt.Println(err)
		return
	}
	defer session.Close()
	show := func() {
		changed, err := session.Update(ctx)
		if err != nil {
			fmt.Println(err)
			return
		}
		for _, e := range changed {
			entry := &program.Describe().Entries[e]
			value, state, _ := session.Entry(e)
			fmt.Printf("%s = %.5g %s, %v\n", entry.Name, entry.Scale.FromSI(value), entry.Unit, state)
		}
	}
	show() // the first update computes everything
	fmt.Println("depth: 200 m")
	if err := session.Set(program.Describe().KnownIndex("depth"), 200); err != nil {
		fmt.Println(err)
	}
	show()
	// Output:
	// pressure = 980.66 kPa, sound
	// half = 1 m, sound
	// depth: 200 m
	// pressure = 1961.3 kPa, sound
}
