//go:build wasip1

package main

import (
	"plumbrule/engine/formula"
	"plumbrule/engine/sheet"
	"plumbrule/functions"
	"plumbrule/wasm/abi"
)

//go:wasmexport plumbrule_abi
func exportVersion() int32 { return abi.Version }

//go:wasmexport plumbrule_limits
func exportLimits() uint64 {
	order := []string{"text", "line", "statements", "formula", "parts", "cells", "buffer", "rows", "programs", "sessions"}
	return module.document(abi.AppendLimits(module.doc[:0], map[string]int{
		"text": sheet.MostText, "line": sheet.MostLine, "statements": sheet.MostStatements,
		"formula": formula.MostCharacters, "parts": formula.MostParts, "cells": sheet.MostCells,
		"buffer": abi.MostBuffer, "rows": abi.MostRows, "programs": abi.MostPrograms, "sessions": abi.MostSessions,
	}, order))
}

//go:wasmexport plumbrule_reserve
func exportReserve(size int32) (place uint32) {
	defer guard(&place, 0)
	return module.reserve(size)
}

//go:wasmexport plumbrule_release
func exportRelease(place uint32) { module.release(place) }

//go:wasmexport plumbrule_catalogue
func exportCatalogue() (doc uint64) {
	defer guard(&doc, 0)
	return module.document(abi.AppendCatalogue(module.doc[:0], functions.All()))
}

//go:wasmexport plumbrule_compile
func exportCompile(text uint32, length int32, choices uint32, choicesLength int32) (doc uint64) {
	defer guard(&doc, 0)
	sheetText, choiceText := module.bytesAt(text, int(length)), module.bytesAt(choices, int(choicesLength))
	if sheetText == nil || choiceText == nil {
		module.fault = "the text is not in a reserved buffer"
		return 0
	}
	return module.compile(sheetText, choiceText)
}

//go:wasmexport plumbrule_run
func exportRun(program, rows int32, in, out uint32) (code int32) {
	defer guard(&code, int32(abi.Failed))
	return int32(module.run(program, rows, in, out))
}

//go:wasmexport plumbrule_reasons
func exportReasons(program int32) (doc uint64) {
	defer guard(&doc, 0)
	p := module.programs[program]
	if p == nil {
		module.fault = "this program is not open"
		return 0
	}
	return module.document(abi.AppendReasons(module.doc[:0], p.program.Reasons()))
}

//go:wasmexport plumbrule_tallies
func exportTallies(program int32) (doc uint64) {
	defer guard(&doc, 0)
	p := module.programs[program]
	if p == nil {
		module.fault = "this program is not open"
		return 0
	}
	return module.document(abi.AppendTallies(module.doc[:0], p.out.Tallies))
}

//go:wasmexport plumbrule_session
func exportSession(program int32) (session int32) {
	defer guard(&session, 0)
	return module.begin(program)
}

//go:wasmexport plumbrule_update
func exportUpdate(session, changes int32, in, out uint32) (code int32) {
	defer guard(&code, int32(abi.Failed))
	return int32(module.update(session, changes, in, out))
}

//go:wasmexport plumbrule_end
func exportEnd(session int32) { delete(module.sessions, session) }

//go:wasmexport plumbrule_fault
func exportFault() uint64 { return module.document(abi.AppendFault(module.doc[:0], module.fault)) }

//go:wasmexport plumbrule_close
func exportClose(program int32) { module.close(program) }
