package syntax

import (
	"strings"

	"epure/lang/source"
)

// A line that the grammar refuses is explained from three things: its first token,
// the first token that fits nothing, and what stands before that. The words of the
// grammar's own error are never shown; they speak of rules nobody has seen.

// explain reports why the row of tokens fails at an index, which is their number
// when the row stops too early.
func (c *converter) explain(failed int) {
	if c.openHole(failed) {
		return
	}
	if failed == 0 {
		c.badStart()
		return
	}
	if c.what == "statement" && c.row[0].kind == kindKeyword && c.explainHead(failed) {
		return
	}
	switch {
	case failed < len(c.row) && c.misplaced(failed):
	case c.wantsValue(failed):
		c.missingValue(failed)
	case failed == len(c.row):
		c.stopsEarly()
	default:
		c.leftOver(failed)
	}
}

// openHole reports a text before an index in which a hole is not closed: a quote
// inside the hole has ended the text, and what follows makes no sense.
func (c *converter) openHole(failed int) bool {
	for _, t := range c.row[:failed] {
		if t.kind != kindText {
			continue
		}
		inner := c.src[t.start+t.open : t.end-t.shut]
		if n := strings.LastIndexByte(inner, '{'); n >= 0 && !strings.Contains(inner[n:], "}") && (n == 0 || inner[n-1] != '\\') {
			c.holeNotClosed(t.start + t.open + n)
			return true
		}
	}
	return false
}

// tokenAt returns the token at an index; past the end, an empty one after the last.
func (c *converter) tokenAt(i int) token {
	if i < len(c.row) {
		return c.row[i]
	}
	end := 0
	if len(c.row) > 0 {
		end = c.row[len(c.row)-1].end
	}
	return token{kind: kindEnd, start: end, end: end}
}

// badStart reports a line whose first token begins nothing.
func (c *converter) badStart() {
	t := c.tokenAt(0)
	if c.what != "statement" {
		c.add(c.error("missing-value", t.start, t.end, "%s begins no value", c.quote(t)).
			Because("a value begins with a number, a name, a text, `(` or `-`"))
		return
	}
	switch {
	case t.kind == kindWord && c.tokenAt(1).is("="):
		c.add(c.error("reserved-word", t.start, t.end, "%s is a word of the language and cannot be a name", c.quote(t)))
	case t.kind == kindWord:
		c.add(c.error("reserved-word", t.start, t.end, "%s is a word of the language and begins no statement", c.quote(t)).
			Because("it stands before the value of a clause"))
	default:
		c.add(c.error("bad-statement", t.start, t.end, "%s begins no statement", c.quote(t)).
			Because("a statement begins with a name, a form, or one of given, verify, take, case"))
	}
}

// quote returns a token as diagnostics show it.
func (c *converter) quote(t token) string {
	if t.kind == kindEnd {
		return "the end of the line"
	}
	return source.Quote(c.src[t.start:t.end])
}

// explainHead explains what the fixed words of given, take and case want.
func (c *converter) explainHead(failed int) bool {
	switch head := c.row[0].text; {
	case head == "given" && failed <= 2:
		c.wantHead(failed, []string{"name", "="}, "given NAME = VALUE")
	case head == "take" && failed <= 3:
		c.wantHead(failed, []string{"name", "from", "text"}, "take NAME from \"file\"")
	case head == "case" && failed == 1:
		c.wantHead(failed, []string{"name"}, "case \"NAME\" CLAUSE VALUE …")
	case head == "case" && failed == 2 && c.row[1].is("from"):
		c.wantHead(failed, []string{"from", "text"}, "case from \"file\"")
	case head == "case" && failed == 2 && failed == len(c.row):
		t := c.row[1]
		c.add(c.error("empty-case", t.end, t.end, "this case sets nothing").
			Because("after the name stand the givens and their values, `case \"DN 50\" foot 50 mm`"))
	default:
		return false
	}
	return true
}

// wantHead reports that the token at failed is not what stands there.
func (c *converter) wantHead(failed int, wants []string, shape string) {
	t, want := c.tokenAt(failed), wants[failed-1]
	reason := "the line reads " + source.Quote(shape)
	switch {
	case want == "name" && (t.kind == kindWord || t.kind == kindKeyword):
		c.add(c.error("reserved-word", t.start, t.end, "%s is a word of the language and cannot be a name", c.quote(t)).Because(reason))
	case want == "name":
		c.add(c.error("missing-name", t.start, t.end, "a name is missing after %s", c.quote(c.row[failed-1])).Because(reason))
	case want == "text":
		c.add(c.error("missing-path", t.start, t.end, "a text in double quotes is missing after %s", c.quote(c.row[failed-1])).Because(reason))
	default:
		end := c.row[failed-1].end
		c.add(c.error("missing-word", t.start, t.end, "`%s` is missing after %s", want, c.quote(c.row[failed-1])).Because(reason).
			WithLabelledFix(c.span(end, end), " "+want, "write `"+want+"`"))
	}
}

// misplaced reports tokens that can stand in few places, whatever is before them.
func (c *converter) misplaced(failed int) bool {
	t, before := c.row[failed], c.row[failed-1]
	d := c.error("bad-statement", t.start, t.end, "")
	switch {
	case t.kind == kindKeyword:
		d.Text = c.quote(t) + " begins a statement and stands first in its line"
	case t.is("nearest") && c.what != "hole":
		d.Text = "`nearest` rounds in the holes of texts and as a clause"
		d.Reason = "elsewhere `round(x, step)` rounds"
	case t.is("=") && before.kind == kindName && c.what == "statement" && c.wantsValue(failed):
		d.Code, d.Text = "misplaced-equals", "a clause takes its value without `=`"
		d = d.WithFix(d.Span, "")
	case t.is("=") && c.definesOther(failed):
		whole := c.cover(c.row[:failed])
		d.Code, d.Span, d.Text = "bad-name", whole, source.Quote(whole.Text())+" cannot be defined"
		d.Reason = "only a plain name stands before `=`; values are compared in `verify` lines"
	case t.is("="):
		d.Code, d.Text = "misplaced-equals", "`=` has no place here"
		d.Reason = "a line defines one name, or compares two values after `verify`"
	case t.is("<") || t.is(">") || t.is("<=") || t.is(">="):
		d.Code, d.Text = "misplaced-comparison", c.quote(t)+" has no place here"
		d.Reason = "a `verify` line makes one comparison, and nothing else makes any"
	default:
		return false
	}
	c.add(d)
	return true
}

// definesOther says whether what stands before the = at an index would be a value
// and not a name.
func (c *converter) definesOther(at int) bool {
	if c.what != "statement" || c.row[0].kind == kindKeyword {
		return false
	}
	for _, t := range c.row[:at] {
		if t.is("=") {
			return false
		}
	}
	return !c.wantsValue(at) && !c.inClause(at)
}

// wantsValue says whether a value must come at an index: after an operator, an
// open bracket, a comma, a word, or the name of a clause.
func (c *converter) wantsValue(at int) bool { complete, _ := c.walk(at); return !complete }

// inClause says whether a clause was begun before an index.
func (c *converter) inClause(at int) bool { _, clause := c.walk(at); return clause }

// walk goes over the tokens before an index. complete says that a value has ended
// there: a name after a complete value is the word of a clause.
func (c *converter) walk(at int) (complete, clause bool) {
	for i, t := range c.row[:at] {
		switch {
		case t.kind == kindQuantity || t.kind == kindText || t.is(")"):
			complete = true
		case t.kind == kindName && i > 0 && c.row[i-1].is("."):
			complete = true
		case t.kind == kindName:
			clause = clause || complete
			complete = !complete
		default:
			clause = clause || t.kind == kindWord && complete
			complete = false
		}
	}
	return complete, clause
}

// missingValue reports that a value is missing at an index.
func (c *converter) missingValue(failed int) {
	t, before := c.tokenAt(failed), c.row[failed-1]
	what := "a value is missing after " + c.quote(before)
	reason := ""
	switch {
	case before.is("."):
		what, reason = "the name of a measure or a part is missing after the dot", "for example `K.slant`"
	case before.is("(") && t.is(")"):
		what, reason = "these brackets are empty", ""
	case before.is("nearest") || before.is("within") && c.row[0].is("verify"):
	case before.kind == kindName || before.kind == kindWord && failed > 1:
		what = "the clause " + c.quote(before) + " has no value"
	}
	switch {
	case t.kind == kindWord:
		reason = c.quote(t) + " is a word of the language and never a name"
	case t.kind == kindSign && reason == "" && !(before.is("(") && t.is(")")):
		reason = c.quote(t) + " begins no value"
	}
	c.add(c.error("missing-value", t.start, t.end, "%s", what).Because(reason))
}

// stopsEarly reports a line that could end but for something that is missing.
func (c *converter) stopsEarly() {
	end := c.tokenAt(len(c.row)).start
	if c.row[0].is("verify") {
		c.add(c.error("missing-comparison", end, end, "this line compares nothing").
			Because("after `verify` stand two values with one of = < <= > >= between them"))
		return
	}
	c.add(c.error("bad-statement", end, end, "the line stops too early"))
}

// leftOver reports a token after a complete value that goes on with nothing.
func (c *converter) leftOver(failed int) {
	t, before := c.row[failed], c.row[failed-1]
	d := c.error("missing-operator", t.start, t.end, "nothing stands between %s and %s", c.quote(before), c.quote(t))
	switch {
	case c.what == "hole":
		d.Code, d.Text = "bad-hole", c.quote(t)+" is one too many in this hole"
		d.Reason = "a hole has one value, then perhaps `nearest` and a step"
	case c.row[0].is("verify") && (t.kind == kindName || t.kind == kindWord) && !c.compares(failed):
		d.Code, d.Text = "missing-comparison", "a comparison is missing before "+c.quote(t)
		d.Reason = "after `verify` stand two values with one of = < <= > >= between them"
	case c.row[0].is("verify"), c.row[0].is("take"), c.row[0].is("case"), c.what == "expression":
		d.Code, d.Text = "bad-statement", c.quote(t)+" is one too many"
		d.Reason = c.shape()
	case failed > 1 && before.kind == kindName && c.row[failed-2].is(","):
		comma := c.row[failed-2]
		d.Reason = "a comma goes on with the values of a clause; the next clause needs none"
		d = d.WithFix(c.span(comma.start, comma.end), "")
	case before.kind == kindQuantity && t.kind == kindQuantity && c.isGroup(t):
		d.Reason = "the digits of a number are written without blanks"
		d = d.WithLabelledFix(c.span(before.end, t.start), "", "leave out the blank")
	case before.kind == kindText && t.kind == kindText:
		d.Reason = "a form has one text"
	default:
		d.Reason = "an operator, a comma or a clause word is missing"
	}
	c.add(d)
}

// isGroup says whether a quantity begins with three digits, as thousands do.
func (c *converter) isGroup(t token) bool {
	n := len(t.text) - len(strings.TrimLeft(t.text, "0123456789"))
	return n == 3
}

// compares says whether there is a comparison before an index.
func (c *converter) compares(at int) bool {
	for _, t := range c.row[:at] {
		if t.is("=") || t.is("<") || t.is(">") || t.is("<=") || t.is(">=") {
			return true
		}
	}
	return false
}

// shape returns how a line with the first word of this one reads.
func (c *converter) shape() string {
	if c.what != "statement" {
		return "one value is wanted"
	}
	switch c.row[0].text {
	case "verify":
		return "the line reads `verify A = B within STEP \"reason\"`"
	case "take":
		return "the line reads `take NAME from \"file\"`"
	}
	return "the line reads `case \"NAME\" CLAUSE VALUE …` or `case from \"file\"`"
}
