package column

import "runtime"

// inModule says that the code runs in the module, whose machine code builds a
// constant anew at each use and has no cheap way past a branch. Loops that
// suit it better give the same bits.
const inModule = runtime.GOARCH == "wasm"
