package diag

// Code names a diagnostic. Codes are only ever added: programs and people look
// for them, so none changes its meaning or its spelling. A code is fine enough
// that two faults with different ways out have different codes.
type Code string

// Stage is the part of the program that makes a diagnostic, and thereby the one
// whose tests run the example of the code.
type Stage int8

// The stages, in the order in which a file meets them.
const (
	StageSyntax Stage = iota + 1
	StageCheck
	StageEval
	StageBuild // files, tables of cases, outputs
)

// Entry is what is known about a code: one sentence for the manual, and a
// complete source that provokes it.
type Entry struct {
	Code    Code
	Stage   Stage
	Meaning string
	Example string
}

// Codes returns the table of all codes. To add one, add a row here; a test runs
// the example, another looks that no code stands twice.
func Codes() []Entry { return append(syntaxCodes(), laterCodes()...) }

// Examples returns the rows of one stage.
func Examples(stage Stage) []Entry {
	var out []Entry
	for _, e := range Codes() {
		if e.Stage == stage {
			out = append(out, e)
		}
	}
	return out
}

// Lookup returns the row of a code; ok is false when there is none.
func Lookup(code Code) (e Entry, ok bool) {
	for _, e := range Codes() {
		if e.Code == code {
			return e, true
		}
	}
	return Entry{}, false
}

// syntaxCodes are the codes of reading a file, in alphabetical order.
func syntaxCodes() []Entry {
	const s = StageSyntax
	return []Entry{
		{"bad-angle", s, "An angle in degrees, minutes and seconds is not written as one.", "a = 35°75′\n"},
		{"bad-escape", s, "A backslash in a text stands before something that needs none.", "t = note \"50\\% more\"\n"},
		{"bad-fraction", s, "A fraction is written with a unit other than in and ft, or without a unit.", "a = 50/3 mm\n"},
		{"bad-hole", s, "A hole in a text is empty, is not closed or holds more than one expression.", "t = note \"slant {}\"\n"},
		{"bad-name", s, "What is to be defined is not a plain name.", "K.slant = 3 mm\n"},
		{"bad-number", s, "The digits do not make a number.", "a = 1.2.3 mm\n"},
		{"bad-statement", s, "The line cannot be read as a statement.", "take hood from \"hood.epure\" now\n"},
		{"block-not-closed", s, "A block has no closing brace.", "s = sheet \"Hood\" {\n    plan of K\n"},
		{"bracket-not-closed", s, "A round bracket is opened and not closed.", "a = (b + 2 mm\nb = 3 mm\n"},
		{"decimal-comma", s, "A number is written with a decimal comma.", "a = 12,5 mm\n"},
		{"double-equals", s, "Two equals signs stand where one is meant.", "verify 1 == 1\n"},
		{"empty-case", s, "A case sets nothing.", "case \"DN 50\"\n"},
		{"hidden-character", s, "A character that cannot be seen stands in the source.", "a = 3\u200b mm\n"},
		{"look-alike", s, "A character only looks like the one that is meant.", "a = 3 mm − 2 mm\n"},
		{"misplaced-brace", s, "A brace stands where none may: `{` ends its line, `}` stands alone.", "s = sheet \"Hood\" { plan of K\n}\n"},
		{"misplaced-comparison", s, "A comparison stands outside of verify.", "a = 3 mm < 4 mm\n"},
		{"misplaced-equals", s, "An equals sign stands where none is needed.", "K = cone radius = 50 mm height 80 mm\n"},
		{"missing-brace", s, "The line above a block does not end in `{`.", "s = sheet \"Hood\"\n    p = plan of K\n}\n"},
		{"missing-comparison", s, "A verify line compares nothing.", "verify 3 mm\n"},
		{"missing-name", s, "A name is missing.", "given = 3 mm\n"},
		{"missing-operator", s, "Two values stand side by side with nothing between them.", "a = 3 mm 4 mm\n"},
		{"missing-path", s, "The name of a file, a text in quotes, is missing.", "take hood from hood\n"},
		{"missing-value", s, "A value is missing.", "K = cone radius 50 mm height\n"},
		{"missing-word", s, "A word of the statement is missing.", "given a 3 mm\n"},
		{"no-effect", s, "A line states a value and gives it no name.", "3 mm + 4 mm\n"},
		{"not-callable", s, "Something that is not a name is followed by brackets.", "a = 3 (4)\n"},
		{"not-plain-text", s, "A text that names a file or a case has a hole.", "take hood from \"{a}.epure\"\n"},
		{"not-text", s, "The file is not a text.", "a = 3 mm\x00\n"},
		{"not-utf-8", s, "The text is not in UTF-8.", "# M\xfcnchen\n"},
		{"power-of-quantity", s, "A power right after a unit takes the number with it.", "a = 50 mm^2\n"},
		{"reserved-word", s, "A word of the language stands where a name is needed.", "of = 3 mm\n"},
		{"stray-brace", s, "A closing brace has no opening one.", "a = 3 mm\n}\n"},
		{"stray-bracket", s, "A closing bracket has no opening one.", "a = 3 mm)\n"},
		{"stray-character", s, "A character means nothing here.", "a = 3 mm;\n"},
		{"text-not-closed", s, "A text has no closing quote.", "t = note \"Pattern seen from outside\n"},
		{"too-deep", s, "Brackets, powers or blocks are nested too deep.", "a = " + nested(300) + "\n"},
		{"too-long", s, "A statement is too long.", "a = 1" + many(1<<15) + "\n"},
		{"too-many", s, "There are more diagnostics than anybody will read.", manyLines(200)},
		{"unexpected-indent", s, "A statement is indented deeper than the one above.", "a = 3 mm\n    b = 4 mm\n"},
		{"unknown-unit", s, "A word after a number is not a unit.", "a = 12 MM\n"},
	}
}
