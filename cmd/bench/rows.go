package main

import (
	"bufio"
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"math"
	"os"
	"os/exec"
	"path/filepath"
	"strconv"
)

// stream is the sheet of the data file: the density and the dynamic pressure of
// air that streams by, of three known columns.
const stream = `
known h [m]
known T [K]
known v [m/s]
derive rho [kg/m^3] = 1.225[kg/m^3] * exp(-0.0289644[kg/mol] * 9.80665[m/s^2] * h / (nature.R * T))
derive q [Pa] = rho * v^2 / 2
`

// printRows tells how many rows of a CSV file the command evaluates in a second,
// and how many a program by hand does with encoding/csv and strconv. Both write to
// the null device, so that no disk is measured.
func printRows(b *bench, command string, stdout io.Writer) error {
	folder, err := os.MkdirTemp("", "plumbrule-bench-")
	if err != nil {
		return err
	}
	defer os.RemoveAll(folder)
	n := max(1, b.rows/2)
	sheet, data := filepath.Join(folder, "stream.plumb"), filepath.Join(folder, "data.csv")
	if err := os.WriteFile(sheet, []byte(stream), 0o600); err != nil {
		return err
	}
	if err := writeData(data, n); err != nil {
		return err
	}
	var failed error
	null, err := os.OpenFile(os.DevNull, os.O_WRONLY, 0)
	if err != nil {
		return err
	}
	defer null.Close()
	work := line{
		subject: func() {
			run := exec.Command(command, "rows", sheet, data)
			run.Stdout = null
			failed = errors.Join(failed, run.Run())
		},
		against: func() { failed = errors.Join(failed, handRows(data, null)) },
	}
	subject, against, ratio := b.pair(work)
	if failed != nil {
		return fmt.Errorf("rows of a CSV file: %w", failed)
	}
	rows := float64(n)
	fmt.Fprintf(stdout, "%d rows of CSV, 3 known columns, 2 derived: command %.2f million rows a second, by hand with encoding/csv %.2f, ratio %.2f (bar 3)\n",
		n, rows/subject/1e6, rows/against/1e6, 1/ratio)
	return nil
}

// writeData writes the data file. A linear congruence gives the numbers
// (multiplier and increment of Knuth's MMIX, The Art of Computer Programming,
// vol. 2, 3rd ed., section 3.3.4).
func writeData(file string, n int) error {
	f, err := os.Create(file)
	if err != nil {
		return err
	}
	state := uint64(1)
	number := func(low, high float64) float64 {
		state = state*6364136223846793005 + 1442695040888963407
		return low + (high-low)*float64(state>>11)/(1<<53)
	}
	w := bufio.NewWriter(f)
	fmt.Fprintln(w, "h [m],T [K],v [m/s]")
	for range n {
		fmt.Fprintf(w, "%.2f,%.2f,%.3f\n", number(0, 20_000), number(200, 310), number(0, 60))
	}
	return errors.Join(w.Flush(), f.Close())
}

// handRows is the same by hand.
func handRows(data string, out io.Writer) error {
	f, err := os.Open(data)
	if err != nil {
		return err
	}
	defer f.Close()
	r := csv.NewReader(bufio.NewReaderSize(f, 1<<16))
	r.ReuseRecord = true
	header, err := r.Read()
	if err != nil {
		return err
	}
	buffered := bufio.NewWriterSize(out, 1<<16)
	w := csv.NewWriter(buffered)
	if err := w.Write(append(header[:3:3], "rho [kg/m^3]", "q [Pa]")); err != nil {
		return err
	}
	const mg, gas = 0.0289644 * 9.80665, 8.314462618
	var row [5]string
	for {
		record, err := r.Read()
		if errors.Is(err, io.EOF) {
			break
		}
		if err != nil {
			return err
		}
		var x [3]float64
		for i, cell := range record {
			if x[i], err = strconv.ParseFloat(cell, 64); err != nil {
				return err
			}
			row[i] = cell
		}
		rho := 1.225 * math.Exp(-mg*x[0]/(gas*x[1]))
		row[3] = strconv.FormatFloat(rho, 'g', -1, 64)
		row[4] = strconv.FormatFloat(rho*x[2]*x[2]/2, 'g', -1, 64)
		if err := w.Write(row[:]); err != nil {
			return err
		}
	}
	w.Flush()
	return errors.Join(w.Error(), buffered.Flush())
}
