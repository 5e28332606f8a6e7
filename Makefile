# Plumbrule: the two commands of a newcomer are "make run" and "make test".

MODULE := build/plumbrule.wasm
COMMAND := build/plumbrule
SHEET := testdata/sheets/mooring.plumb
# The packages on the way to a result.
RESULTS := ./engine/column ./engine/formula ./engine/law ./engine/plan ./engine/unit ./functions/air ./functions/fluid ./functions/levels ./functions/nature
STATICCHECK := honnef.co/go/tools/cmd/staticcheck@v0.8.2

.PHONY: run test module command conformance same-bits bench check fuzz clean

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

# The same results to the last bit: for amd64 without and with fused
# multiply-add instructions, through the module, and for arm64 where qemu-user
# can run it.
same-bits: module
	@mkdir -p build/bits
	@fused=$$( (GOAMD64=v3 go build -gcflags=-S $(RESULTS); GOARCH=arm64 go build -gcflags=-S $(RESULTS)) 2>&1 | grep -E 'FN?M(ADD|SUB)[0-9]*S?D\s' | grep -oE '[a-z_]+\.go:[0-9]+' | sort -u); if [ -n "$$fused" ]; then echo "the compiler fuses a product with a sum in:"; echo "$$fused"; exit 1; fi
	go run ./cmd/samebits testdata/conformance > build/bits/amd64
	GOAMD64=v3 go run ./cmd/samebits testdata/conformance > build/bits/amd64-v3
	go run ./cmd/samebits -module $(MODULE) testdata/conformance > build/bits/module
	@rm -f build/bits/arm64
	if command -v qemu-aarch64 >/dev/null; then GOARCH=arm64 go build -o build/bits/samebits-arm64 ./cmd/samebits && qemu-aarch64 build/bits/samebits-arm64 testdata/conformance > build/bits/arm64; else echo "arm64 is left out: qemu-aarch64 is not installed"; fi
	@cat build/bits/amd64
	@cd build/bits && for other in amd64-v3 module arm64; do if [ -e $$other ]; then cmp amd64 $$other && echo "$$other: the same bits as amd64" || exit 1; fi; done

bench: module command
	go run ./cmd/bench -module $(MODULE) -command $(COMMAND)

check:
	@unformatted=$$(gofmt -l .); if [ -n "$$unformatted" ]; then echo "gofmt would change:"; echo "$$unformatted"; exit 1; fi
	go vet ./...
	GOOS=wasip1 GOARCH=wasm go vet ./wasm/module
	go run $(STATICCHECK) ./...

fuzz:
	go test ./engine/sheet -run '^$$' -fuzz FuzzParse -fuzztime 30s
	go test ./engine/formula -run '^$$' -fuzz FuzzParse -fuzztime 30s
	go test ./engine/unit -run '^$$' -fuzz FuzzParse -fuzztime 30s
	go test ./cmd/plumbrule -run '^$$' -fuzz FuzzCSV -fuzztime 30s
	go test ./cmd/plumbrule -run '^$$' -fuzz FuzzJSONLines -fuzztime 30s
	go test ./engine -run '^$$' -fuzz FuzzCompile -fuzztime 30s

clean:
	rm -rf build
