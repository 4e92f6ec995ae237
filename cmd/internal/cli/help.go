package cli

import (
	"fmt"
	"slices"
	"strings"
	"unicode/utf8"

	"epure/lang/catalogue"
	"epure/lang/manual"
)

// The help is made from the same tables as the reading of the arguments.

// help prints the help of the call's verb, or of the whole program.
func (s *session) help() error {
	var b strings.Builder
	if s.call.Verb == "" {
		programHelp(&b)
	} else {
		verbHelp(&b, s.call.Verb)
	}
	_, err := s.data.WriteString(b.String())
	return err
}

func programHelp(b *strings.Builder) {
	b.WriteString("epure draws technical geometry from text: exact, measured, proved.\n\nCommands\n")
	var rows [][2]string
	for _, c := range catalogue.Commands {
		rows = append(rows, [2]string{"epure " + c.Name + " " + c.Args, c.Help})
	}
	columns(b, rows)
	b.WriteString("\nOptions\n")
	optionHelp(b, "")
	b.WriteString("\nA file named `-` is standard input.\n")
	exitHelp(b)
}

func verbHelp(b *strings.Builder, verb string) {
	for _, c := range catalogue.Commands {
		if c.Name == verb {
			fmt.Fprintf(b, "epure %s %s\n\n%s\n", c.Name, c.Args, c.Help)
		}
	}
	b.WriteString("\nOptions\n")
	optionHelp(b, verb)
	exitHelp(b)
}

// optionHelp lists the options of a verb, or of all.
func optionHelp(b *strings.Builder, verb string) {
	var rows [][2]string
	for _, o := range catalogue.Options {
		switch {
		case verb == "":
			rows = append(rows, [2]string{o.Name, o.Help + " (" + strings.Join(o.Verbs, ", ") + ")"})
		case slices.Contains(o.Verbs, verb):
			rows = append(rows, [2]string{o.Name, o.Help})
		}
	}
	columns(b, append(rows, [2]string{"--help", "Print this."}))
}

func exitHelp(b *strings.Builder) {
	b.WriteString("\nExit status\n")
	var rows [][2]string
	for _, e := range manual.ExitStatuses() {
		rows = append(rows, [2]string{fmt.Sprint(e.Status), e.Help})
	}
	columns(b, rows)
}

// columns prints rows with their second column aligned.
func columns(b *strings.Builder, rows [][2]string) {
	wide := 0
	for _, r := range rows {
		wide = max(wide, utf8.RuneCountInString(r[0]))
	}
	for _, r := range rows {
		fmt.Fprintf(b, "  %s%s  %s\n", r[0], strings.Repeat(" ", wide-utf8.RuneCountInString(r[0])), r[1])
	}
}
