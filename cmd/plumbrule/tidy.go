package main

import (
	"context"
	"io"

	"github.com/spf13/cobra"

	"plumbrule/engine"
)

func (a *app) tidyCommand() *cobra.Command {
	const form = "tidy SHEET"
	var write, check bool
	c := &cobra.Command{
		Use:   form,
		Short: "print a sheet in the canonical layout",
		Long: `Prints a sheet in the canonical layout, with every note kept. SHEET may be - for
standard input. The formulas are not checked: run does that.`,
		Args: atLeast(1, 1, form),
		RunE: func(c *cobra.Command, arguments []string) error {
			if write && check {
				return usage("--write and --check exclude each other", "leave one of the two out")
			}
			if write && arguments[0] == "-" {
				return usage("standard input cannot be written", "name a file, or leave --write out")
			}
			return a.tidy(c.Context(), arguments[0], write, check)
		},
	}
	c.Flags().BoolVarP(&write, "write", "w", false, "replace the file instead of printing it")
	c.Flags().BoolVar(&check, "check", false, "print nothing; exit with status 1 if the layout differs")
	return c
}

func (a *app) tidy(ctx context.Context, file string, write, check bool) error {
	text, err := a.readSheet(file)
	if err != nil {
		return err
	}
	tidied, err := engine.Tidy(text)
	if err != nil {
		return ofSheet(err, shownFile(file), text)
	}
	switch {
	case check && tidied != text:
		return newFault(statusMissed, shownFile(file)+" is not in the canonical layout", "plumbrule tidy prints it so")
	case check, write && tidied == text:
		return nil
	case write:
		// A link stays a link: the file that it leads to is replaced.
		target, err := resolved(file)
		if err != nil {
			return cannot("write", file, err)
		}
		return a.replace(ctx, target, func(w io.Writer) error {
			_, err := io.WriteString(w, tidied)
			return err
		})
	}
	if _, err := io.WriteString(a.stdout, tidied); err != nil {
		return unreadable("cannot write standard output: " + err.Error())
	}
	return nil
}
