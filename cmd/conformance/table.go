package main

import (
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"math"
	"os"
	"strconv"
	"strings"
)

// row is one published number.
type row struct {
	line     int
	id       string
	formula  string
	expected float64
	unit     string
	halfUnit float64
	why      string

	failure string  // why it failed, empty where it passed
	error   float64 // |computed − printed| in half-units
	bits    uint64  // of the computed value, in SI
	done    bool
}

var columns = []string{"id", "formula", "expected", "unit", "half_unit", "source", "provenance", "why"}

var provenances = map[string]bool{"published": true, "memory": true, "computed": true, "common practice": true}

// halfOfLastDigit gives half a unit of the last digit of a printed number.
func halfOfLastDigit(printed string) float64 {
	digits, exponent, _ := strings.Cut(strings.ToLower(printed), "e")
	power, _ := strconv.Atoi(strings.TrimPrefix(exponent, "+"))
	if _, behind, ok := strings.Cut(digits, "."); ok {
		power -= len(behind)
	}
	return 0.5 * math.Pow(10, float64(power))
}

// readTable reads a conformance table. A column that is missing or unknown, a
// row without a source or with a tolerance that is no number is an error.
func readTable(path string) ([]*row, error) {
	file, err := os.Open(path)
	if err != nil {
		return nil, err
	}
	defer file.Close()
	reader := csv.NewReader(file)
	reader.FieldsPerRecord = len(columns)
	header, err := reader.Read()
	if err != nil {
		return nil, fmt.Errorf("%s: %w", path, err)
	}
	if strings.Join(header, ",") != strings.Join(columns, ",") {
		return nil, fmt.Errorf("%s: the columns are %s, not %s", path, strings.Join(columns, ","), strings.Join(header, ","))
	}
	var table []*row
	seen := map[string]bool{}
	for {
		record, err := reader.Read()
		if errors.Is(err, io.EOF) {
			if len(table) == 0 {
				return nil, fmt.Errorf("%s: the table has no rows", path)
			}
			return table, nil
		}
		if err != nil {
			return nil, fmt.Errorf("%s: %w", path, err)
		}
		line, _ := reader.FieldPos(0)
		r := &row{line: line, id: record[0], formula: record[1], unit: record[3], why: record[7]}
		r.expected, err = strconv.ParseFloat(record[2], 64)
		if err != nil {
			return nil, fmt.Errorf("%s:%d: expected: %w", path, line, err)
		}
		r.halfUnit, err = strconv.ParseFloat(record[4], 64)
		if err != nil || r.halfUnit <= 0 {
			return nil, fmt.Errorf("%s:%d: half_unit is not a positive number", path, line)
		}
		if r.why == "" && record[6] != "common practice" && r.halfUnit > halfOfLastDigit(record[2])*(1+1e-9) {
			return nil, fmt.Errorf("%s:%d: %s: half_unit is wider than half a unit of the last printed digit: why", path, line, r.id)
		}
		if seen[r.id] || r.id == "" {
			return nil, fmt.Errorf("%s:%d: the id %q is missing or stands twice", path, line, r.id)
		}
		if record[5] == "" || !provenances[record[6]] {
			return nil, fmt.Errorf("%s:%d: a row names its source and its provenance", path, line)
		}
		seen[r.id] = true
		table = append(table, r)
	}
}
