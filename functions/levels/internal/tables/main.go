// Command tables packs the published tables of atomic levels, diatomic
// molecules and ionisation energies in source/ into the compact files of
// data/ that the levels room reads:
//
//	go run ./functions/levels/internal/tables functions/levels
//
// atoms.bin holds, species after species, for each level in ascending order the
// step of its energy from the one before as an unsigned varint, in units of the
// last decimal that the source gives for the species, then one byte: twice the
// degeneracy, plus 1 for a level above the ionisation limit. atoms.txt tells
// the species: name, levels, decimals, ionisation limit in cm^-1.
package main

import (
	"bytes"
	"encoding/binary"
	"encoding/csv"
	"errors"
	"fmt"
	"os"
	"path/filepath"
	"sort"
	"strconv"
	"strings"
)

func main() {
	if len(os.Args) != 2 {
		fmt.Fprintln(os.Stderr, "usage: tables FOLDER-OF-THE-LEVELS-ROOM")
		os.Exit(2)
	}
	files, err := generate(filepath.Join(os.Args[1], "internal", "tables", "source"))
	if err == nil {
		err = write(filepath.Join(os.Args[1], "data"), files)
	}
	if err != nil {
		fmt.Fprintln(os.Stderr, "tables:", err)
		os.Exit(1)
	}
}

func write(folder string, files map[string][]byte) error {
	if err := os.MkdirAll(folder, 0o755); err != nil {
		return err
	}
	for name, content := range files {
		if err := os.WriteFile(filepath.Join(folder, name), content, 0o644); err != nil {
			return err
		}
	}
	return nil
}

// generate gives the content of every file of data/.
func generate(source string) (map[string][]byte, error) {
	files := map[string][]byte{}
	var problems []error
	keep := func(name string, content []byte, err error) {
		files[name] = content
		problems = append(problems, err)
	}
	levels, index, err := packAtoms(source)
	keep("atoms.bin", levels, err)
	keep("atoms.txt", index, nil)
	diatomics, err := packColumns(filepath.Join(source, "diatomic-molecules.csv"),
		"molecule", "state", "ground", "Te", "we", "wexe", "weye", "Be", "alphae", "gammae", "De", "betae",
		"electronic_degeneracy", "symmetry_number", "I1", "I2", "D0_eV")
	keep("diatomics.txt", diatomics, err)
	ionisation, err := packColumns(filepath.Join(source, "ionisation-energies.csv"), "symbol", "IE1_eV", "IE2_eV", "IE3_eV")
	keep("ionisation.txt", ionisation, err)
	return files, errors.Join(problems...)
}

// read gives the rows of a table by column name.
func read(path string) ([]map[string]string, error) {
	file, err := os.Open(path)
	if err != nil {
		return nil, err
	}
	defer file.Close()
	reader := csv.NewReader(file)
	reader.Comment = '#'
	reader.FieldsPerRecord = -1
	records, err := reader.ReadAll()
	if err != nil {
		return nil, err
	}
	var rows []map[string]string
	for _, record := range records[1:] {
		row := map[string]string{}
		for i, name := range records[0] {
			if i < len(record) {
				row[name] = record[i]
			}
		}
		rows = append(rows, row)
	}
	return rows, nil
}

// packColumns gives chosen columns, parted by bars, one row a line.
func packColumns(path string, columns ...string) ([]byte, error) {
	rows, err := read(path)
	var out bytes.Buffer
	for _, row := range rows {
		for i, name := range columns {
			if i > 0 {
				out.WriteByte('|')
			}
			out.WriteString(strings.TrimSpace(row[name]))
		}
		out.WriteByte('\n')
	}
	return out.Bytes(), err
}

type level struct {
	energy     uint64
	degeneracy uint64
	above      byte
}

func packAtoms(source string) (levels, index []byte, err error) {
	rows, err := read(filepath.Join(source, "atomic-levels.csv"))
	if err != nil {
		return nil, nil, err
	}
	limits, err := read(filepath.Join(source, "ionisation-limits.csv"))
	if err != nil {
		return nil, nil, err
	}
	limitOf := map[string]string{}
	for _, row := range limits {
		limitOf[row["species"]] = row["limit_cm-1"]
	}
	var names []string
	of := map[string][]map[string]string{}
	for _, row := range rows {
		name := row["species"]
		if of[name] == nil {
			names = append(names, name)
		}
		of[name] = append(of[name], row)
	}
	var text bytes.Buffer
	for _, name := range names {
		decimals := 0
		for _, row := range of[name] {
			_, after, _ := strings.Cut(row["E_cm-1"], ".")
			decimals = max(decimals, len(after))
		}
		species := make([]level, 0, len(of[name]))
		for _, row := range of[name] {
			l, err := parseLevel(row, decimals)
			if err != nil {
				return nil, nil, fmt.Errorf("%s %s: %w", name, row["E_cm-1"], err)
			}
			species = append(species, l)
		}
		sort.SliceStable(species, func(i, j int) bool { return species[i].energy < species[j].energy })
		last := uint64(0)
		for _, l := range species {
			levels = binary.AppendUvarint(levels, l.energy-last)
			levels = append(levels, byte(2*l.degeneracy)+l.above)
			last = l.energy
		}
		if limitOf[name] == "" {
			return nil, nil, errors.New(name + " has no ionisation limit")
		}
		fmt.Fprintf(&text, "%s|%d|%d|%s\n", name, len(species), decimals, limitOf[name])
	}
	return levels, text.Bytes(), nil
}

func parseLevel(row map[string]string, decimals int) (level, error) {
	whole, part, _ := strings.Cut(row["E_cm-1"], ".")
	energy, err := strconv.ParseUint(whole+part+strings.Repeat("0", decimals-len(part)), 10, 64)
	if err != nil {
		return level{}, err
	}
	degeneracy, err := strconv.ParseUint(row["g"], 10, 7)
	l := level{energy: energy, degeneracy: degeneracy}
	if row["above_limit"] == "yes" {
		l.above = 1
	}
	return l, err
}
