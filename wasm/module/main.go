// Command module is the engine as a WebAssembly module for hosts in any
// language. It is built with
//
//	GOOS=wasip1 GOARCH=wasm go build -buildmode=c-shared ./wasm/module
//
// and exports the functions that wasm/abi/MODULE.md describes. It imports
// nothing but the WASI start-up calls; the host gives it no file, clock,
// network or environment.
package main

func main() {}
