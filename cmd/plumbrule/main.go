// Command plumbrule evaluates sheets: it prints one as a table, runs a data
// file through one, explains a number, and lists the laws and units that
// sheets may use.
//
// The rules of its voice: results go to standard output, everything else to
// standard error. An error begins with "plumbrule: ", or with FILE:LINE:COLUMN
// where it has a place; it has no capital and no full stop, names the file and
// the line, and what to do about it stands on an indented line of its own. A
// command that has nothing to say says nothing.
package main

import (
	"context"
	"errors"
	"io"
	"os"
	"os/signal"

	"github.com/spf13/cobra"

	"plumbrule/engine/law"
	"plumbrule/functions"
)

func main() { os.Exit(doMain(os.Args[1:], os.Stdin, os.Stdout, os.Stderr)) }

// The exit statuses.
const (
	statusWell        = 0
	statusMissed      = 1   // a requirement is missed, or an entry has no number
	statusProblems    = 2   // a sheet has problems, or a file cannot be read or written
	statusUsage       = 64  // the command line is wrong (EX_USAGE of BSD sysexits.h)
	statusInterrupted = 130 // 128 and the number of the interrupt signal
)

const longHelp = `Plumbrule evaluates sheets: texts with known quantities, derived quantities and
requirements, in units that are checked before the first number is computed.

Exit status:
    0   all well
    1   a requirement is missed, or an entry is refused or waits
        (rows: some row is refused or waits; tidy --check: the layout differs)
    2   the sheet has problems, or a file cannot be read or written
   64   the command line is wrong
  130   interrupted

What is wrong with a sheet is printed to standard error as
FILE:LINE:COLUMN: message, with the line of the sheet and what to write
instead; in one line with --brief; as JSON with --json.`

// app is one call of the command: where it reads and writes, and the flags
// that all commands share.
type app struct {
	stdin     io.Reader
	stdout    io.Writer
	stderr    io.Writer
	catalogue *law.Catalogue
	brief     bool
	json      bool
	// Data files are cut into stretches of about so many bytes, or so many rows
	// where the data is not text.
	blockBytes, blockRows int
}

// doMain runs one command line and gives its exit status. An interrupt from
// the keyboard cancels the run.
func doMain(arguments []string, stdin io.Reader, stdout, stderr io.Writer) int {
	ctx, stop := signal.NotifyContext(context.Background(), os.Interrupt)
	defer stop()
	return doContext(ctx, arguments, stdin, stdout, stderr)
}

// doContext is doMain under a context of the caller's.
func doContext(ctx context.Context, arguments []string, stdin io.Reader, stdout, stderr io.Writer) int {
	a := &app{stdin: stdin, stdout: stdout, stderr: stderr, catalogue: functions.All(), blockBytes: blockBytes, blockRows: blockRows}
	return a.execute(ctx, arguments)
}

// execute runs one command line and gives its exit status.
func (a *app) execute(ctx context.Context, arguments []string) int {
	root := a.rootCommand()
	root.SetArgs(arguments)
	root.SetIn(a.stdin)
	root.SetOut(a.stdout)
	root.SetErr(a.stderr)
	err := root.ExecuteContext(ctx)
	if err == nil {
		return statusWell
	}
	if ctx.Err() != nil && errors.Is(err, ctx.Err()) {
		err = &fault{message: "interrupted", status: statusInterrupted}
	}
	return a.report(err)
}

func (a *app) rootCommand() *cobra.Command {
	root := &cobra.Command{
		Use:           "plumbrule",
		Short:         "evaluate sheets of formulas with units",
		Long:          longHelp,
		SilenceErrors: true,
		SilenceUsage:  true,
		Args:          cobra.ArbitraryArgs,
	}
	root.RunE = func(_ *cobra.Command, arguments []string) error {
		if len(arguments) == 0 {
			return usage("a command is missing", "plumbrule --help lists the commands")
		}
		var names []string
		for _, c := range root.Commands() {
			names = append(names, c.Name())
		}
		return usage("unknown command '"+arguments[0]+"'", suggest(arguments[0], names), "plumbrule --help lists the commands")
	}
	root.PersistentFlags().BoolVar(&a.brief, "brief", false, "print each problem in one line")
	root.PersistentFlags().BoolVar(&a.json, "json", false, "print results, and what is wrong, as JSON")
	root.SetFlagErrorFunc(func(c *cobra.Command, err error) error {
		return usage(err.Error(), c.CommandPath()+" --help lists the flags")
	})
	root.AddCommand(a.runCommand(), a.rowsCommand(), a.explainCommand(), a.tidyCommand(), a.lawsCommand(), a.unitsCommand())
	return root
}

// atLeast checks the number of arguments; most < 0 stands for any number.
func atLeast(least, most int, form string) cobra.PositionalArgs {
	return func(c *cobra.Command, arguments []string) error {
		switch {
		case len(arguments) < least:
			return usage(c.Name()+" needs more arguments", "write "+c.Root().Name()+" "+form)
		case most >= 0 && len(arguments) > most:
			return usage(c.Name()+" takes no argument '"+arguments[most]+"'", "write "+c.Root().Name()+" "+form)
		}
		return nil
	}
}
