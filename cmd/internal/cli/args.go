package cli

import (
	"fmt"
	"slices"
	"strings"

	"epure/cmd/internal/build"
	"epure/lang/catalogue"
	"epure/lang/spell"
)

// The arguments are read by the tables catalogue.Commands and catalogue.Options,
// from which the help and the manual are made too. Options may stand anywhere
// after the verb; `--` ends them.

// Call is a command line, understood.
type Call struct {
	Verb     string
	Help     bool
	Files    []string
	Names    []string // things to measure, the word to explain
	Settings []build.Setting
	Folder   string   // to write into
	Formats  []string // to write, in the order of build.Formats
	JSON     bool
	CSV      bool
}

// defaultFolder is where outputs go.
const defaultFolder = "drawings"

// usageError is a wrong command line, in one line.
type usageError struct{ text string }

func (e *usageError) Error() string { return e.text }

func usage(format string, args ...any) error { return &usageError{fmt.Sprintf(format, args...)} }

// reader reads the arguments.
type reader struct {
	call     Call
	operands []string
	rest     []string
}

// parse understands the arguments. isFile tells files from names.
func parse(args []string, isFile func(string) bool) (Call, error) {
	if len(args) == 0 {
		return Call{}, usage("say what to do: write `epure draw FILE`, or `epure --help` for all commands")
	}
	r := &reader{call: Call{Folder: defaultFolder, Formats: []string{"svg", "pdf"}}, rest: args[1:]}
	if isHelp(args[0]) || args[0] == "help" {
		r.call.Help = true
		if len(r.rest) > 0 && isVerb(r.rest[0]) {
			r.call.Verb = r.rest[0]
		}
		return r.call, nil
	}
	if !isVerb(args[0]) {
		return r.call, unknownVerb(args[0])
	}
	r.call.Verb = args[0]
	if err := r.options(); err != nil || r.call.Help {
		return r.call, err
	}
	return r.call, r.sort(isFile)
}

func isHelp(arg string) bool { return arg == "--help" || arg == "-h" }

func isVerb(word string) bool { return slices.Contains(verbs(), word) }

func verbs() []string {
	var out []string
	for _, c := range catalogue.Commands {
		out = append(out, c.Name)
	}
	return out
}

func unknownVerb(word string) error {
	if strings.HasSuffix(word, build.Extension) {
		return usage("say what to do with %s: write `epure draw %s`", word, word)
	}
	if near, ok := spell.Nearest(word, verbs()); ok {
		return usage("there is no command `%s`: write `%s`", word, near)
	}
	return usage("there is no command `%s`: there are %s", word, strings.Join(verbs(), ", "))
}

// options goes through the arguments after the verb.
func (r *reader) options() error {
	for len(r.rest) > 0 {
		arg := r.rest[0]
		r.rest = r.rest[1:]
		switch {
		case arg == "--":
			r.operands = append(r.operands, r.rest...)
			r.rest = nil
		case isHelp(arg):
			r.call.Help = true
			return nil
		case len(arg) > 1 && arg[0] == '-':
			if err := r.option(arg); err != nil {
				return err
			}
		default:
			r.operands = append(r.operands, arg)
		}
	}
	return nil
}

// option reads one option, as `--name`, `--name value`, `--name=value`, `-o value` or `-ovalue`.
func (r *reader) option(arg string) error {
	name, value, joined := strings.Cut(arg, "=")
	if !strings.HasPrefix(arg, "--") && len(arg) > 2 {
		name, value, joined = arg[:2], strings.TrimPrefix(arg[2:], "="), true
	}
	o, ok := optionNamed(name)
	if !ok || !slices.Contains(o.Verbs, r.call.Verb) {
		return r.unknownOption(name, ok)
	}
	_, what, takes := strings.Cut(o.Name, " ")
	switch {
	case takes && !joined && len(r.rest) == 0:
		return usage("`%s` needs a value: write `%s %s`", name, name, what)
	case takes && !joined:
		value, r.rest = r.rest[0], r.rest[1:]
	case !takes && joined:
		return usage("`%s` takes no value", name)
	}
	return r.set(name, value)
}

func optionNamed(name string) (catalogue.Option, bool) {
	for _, o := range catalogue.Options {
		if word, _, _ := strings.Cut(o.Name, " "); word == name {
			return o, true
		}
	}
	return catalogue.Option{}, false
}

func (r *reader) unknownOption(name string, elsewhere bool) error {
	if elsewhere {
		return usage("`%s` takes no `%s`: see `epure %s --help`", r.call.Verb, name, r.call.Verb)
	}
	known := []string{"--help"}
	for _, o := range catalogue.Options {
		if slices.Contains(o.Verbs, r.call.Verb) {
			word, _, _ := strings.Cut(o.Name, " ")
			known = append(known, word)
		}
	}
	if near, ok := spell.Nearest(name, known); ok {
		return usage("there is no option `%s`: write `%s`", name, near)
	}
	return usage("there is no option `%s`: `%s` takes %s", name, r.call.Verb, strings.Join(known, ", "))
}

// set stores the value of an option.
func (r *reader) set(name, value string) error {
	switch name {
	case "--given":
		return r.given(value)
	case "--as":
		return r.formats(value)
	case "-o":
		if value == "" {
			return usage("`-o` needs the name of a folder")
		}
		r.call.Folder = value
	case "--json":
		r.call.JSON = true
	case "--csv":
		r.call.CSV = true
	default:
		return usage("the option `%s` has no effect", name)
	}
	if r.call.JSON && r.call.CSV {
		return usage("`--json` and `--csv` exclude each other")
	}
	return nil
}

func (r *reader) given(text string) error {
	name, value, ok := strings.Cut(text, "=")
	name = strings.TrimSpace(name)
	if !ok || name == "" {
		return usage("`--given` takes NAME=VALUE, as `--given foot=250mm`")
	}
	for _, s := range r.call.Settings {
		if s.Name == name {
			return usage("`--given %s` stands twice", name)
		}
	}
	s, err := build.ReadSetting(name, value)
	if err != nil {
		return usage("%s", err)
	}
	r.call.Settings = append(r.call.Settings, s)
	return nil
}

// formats reads the list of `--as`. The order in which they stand has no effect.
func (r *reader) formats(list string) error {
	wanted := strings.Split(list, ",")
	for _, w := range wanted {
		if slices.Contains(build.Formats(), w) {
			continue
		}
		if near, ok := spell.Nearest(w, build.Formats()); ok {
			return usage("there is no output `%s`: write `%s`", w, near)
		}
		return usage("there is no output `%s`: there are %s", w, strings.Join(build.Formats(), ", "))
	}
	r.call.Formats = nil
	for _, f := range build.Formats() {
		if slices.Contains(wanted, f) {
			r.call.Formats = append(r.call.Formats, f)
		}
	}
	return nil
}

// sort tells files from names among the operands, and counts them.
func (r *reader) sort(isFile func(string) bool) error {
	c := &r.call
	switch c.Verb {
	case "explain":
		c.Names = r.operands
		if len(c.Names) > 1 {
			return usage("`explain` takes one word")
		}
		return nil
	case "measure":
		for _, o := range r.operands {
			if o == build.Stdin || strings.HasSuffix(o, build.Extension) || isFile(o) {
				c.Files = append(c.Files, o)
			} else {
				c.Names = append(c.Names, o)
			}
		}
	default:
		c.Files = r.operands
	}
	c.Files = distinct(c.Files)
	switch {
	case len(c.Files) == 0 && len(c.Names) > 0:
		return usage("`%s` is no file: write `epure measure FILE %s`", c.Names[0], c.Names[0])
	case len(c.Files) == 0:
		return usage("`%s` needs a file: write `epure %s FILE`", c.Verb, c.Verb)
	case c.Verb == "watch" && slices.Contains(c.Files, build.Stdin):
		return usage("`watch` cannot watch standard input")
	}
	return nil
}

// distinct drops what was given before.
func distinct(files []string) []string {
	var out []string
	for _, f := range files {
		if !slices.Contains(out, f) {
			out = append(out, f)
		}
	}
	return out
}
