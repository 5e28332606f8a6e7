# Plumbrule: the two commands of a newcomer are "make run" and "make test".

MODULE := build/plumbrule.wasm
COMMAND := build/plumbrule
SHEET := testdata/sheets/mooring.plumb
STATICCHECK := honnef.co/go/tools/cmd/staticcheck@v0.8.2

.PHONY: run test module command conformance bench check fuzz clean

run: module command
	$(COMMAND) run --compare $(MODULE) $(SHEET)

test: module
	go test ./...

module:
	@mkdir -p build
	GOOS=wasip1 GOARCH=wasm go build -trimpath -ldflags="-s -w" -buildmode=c-shared -o $(MODULE) ./wasm/module

command:
	@mkdir -p build
	go build -trimpath -o $(COMMAND) ./cmd/plumbrule

conformance: module
	go run ./cmd/conformance -module $(MODULE) testdata/conformance

bench: module
	go run ./cmd/bench -module $(MODULE)

check:
	@unformatted=$$(gofmt -l .); if [ -n "$$unformatted" ]; then echo "gofmt would change:"; echo "$$unformatted"; exit 1; fi
	go vet ./...
	GOOS=wasip1 GOARCH=wasm go vet ./wasm/module
	go run $(STATICCHECK) ./...

fuzz:
	go test ./engine/sheet -run '^$$' -fuzz FuzzParse -fuzztime 30s
	go test ./engine/unit -run '^$$' -fuzz FuzzParse -fuzztime 30s
	go test ./engine -run '^$$' -fuzz FuzzCompile -fuzztime 30s

clean:
	rm -rf build
