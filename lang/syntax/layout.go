package syntax

// The layout cuts the tokens into logical lines and nests the blocks. Three rules
// of the language make the lines: a statement goes on over a line that is indented
// deeper than its own first line, or while a round bracket is open; `{` ends its
// line; `}` stands alone. A line that surely begins a statement (`given …`, `x =`)
// ends the one before it in any case, so that a bracket, a brace or an indentation
// that is wrong spoils one statement and not the rest of the file.

// maxBlocks bounds how deep blocks are nested. The language has one level.
const maxBlocks = 32

// layout builds the statements of a file.
type layout struct {
	*parser
	stack   []*block // the blocks that are open; the first is the file
	skipped int      // open blocks that are too deep to be kept
}

// block is an open block.
type block struct {
	owner    Statement // *Sentence, *Bad or nil: then its statements go to the block outside
	open     token     // its brace
	column   int       // of the owner
	implicit bool      // its brace is missing
	list     []Statement
	columns  []int // of the statements in list
}

func (b *block) add(s Statement, column int) {
	b.list = append(b.list, s)
	b.columns = append(b.columns, column)
}

func (l *layout) top() *block { return l.stack[len(l.stack)-1] }

// statements returns the statements of the file.
func (l *layout) statements() []Statement {
	l.stack = []*block{{column: -1}}
	for i := 0; i < len(l.tokens); {
		switch l.tokens[i].kind {
		case kindClose:
			i = l.closing(i)
		case kindOpen:
			i = l.lonelyBrace(i)
		default:
			i = l.line(i)
		}
	}
	for len(l.stack) > 1 {
		l.notClosed()
	}
	return l.stack[0].list
}

// line reads the logical line that begins at i and returns where the next begins.
func (l *layout) line(i int) int {
	first := l.tokens[i]
	for l.top().implicit && first.column <= l.top().column {
		l.pop(first.start)
	}
	end, missing := l.lineEnd(i)
	s := l.statement(l.tokens[i:end])
	l.top().add(s, first.column)
	switch {
	case end < len(l.tokens) && l.tokens[end].kind == kindOpen && !l.tokens[end].first:
		l.push(s, l.tokens[end], first.column, false)
		return l.afterBrace(end)
	case missing:
		l.push(s, l.tokens[end-1], first.column, true)
	}
	return end
}

// lineEnd returns the index after the logical line that begins at i. missing says
// that a block follows whose brace is missing.
func (l *layout) lineEnd(i int) (end int, missing bool) {
	depth, base := 0, l.tokens[i].column
	for j := i; j < len(l.tokens); j++ {
		t := l.tokens[j]
		switch {
		case t.kind == kindOpen || t.kind == kindClose:
			return j, false
		case j > i && t.first && depth > 0 && l.begins(j, base):
			return j, false
		case j > i && t.first && depth == 0 && t.column <= base:
			return j, false
		case j > i && t.first && depth == 0 && l.definite(j) && !l.waiting(i, j):
			return j, l.deeper(i, j)
		case t.is("("):
			depth++
		case t.is(")"):
			depth = max(0, depth-1)
		}
	}
	return len(l.tokens), false
}

// definite says whether the token at j begins a statement and can be nothing else.
func (l *layout) definite(j int) bool {
	t := l.tokens[j]
	return t.kind == kindKeyword || t.kind == kindName && j+1 < len(l.tokens) && l.tokens[j+1].is("=")
}

// begins says whether the first token of a line begins a statement although a
// bracket is open: a name before a name, a word or a text cannot stand in one.
func (l *layout) begins(j, base int) bool {
	if l.definite(j) {
		return true
	}
	if l.tokens[j].column > base || l.tokens[j].kind != kindName || j+1 >= len(l.tokens) || l.tokens[j+1].first {
		return false
	}
	switch l.tokens[j+1].kind {
	case kindName, kindWord, kindText:
		return true
	}
	return false
}

// waiting says whether the line from i to j is a verify without its comparison,
// which may go on with `x =`.
func (l *layout) waiting(i, j int) bool {
	if !l.tokens[i].is("verify") || l.tokens[j].kind == kindKeyword {
		return false
	}
	for _, t := range l.tokens[i:j] {
		if t.is("=") || t.is("<") || t.is(">") || t.is("<=") || t.is(">=") {
			return false
		}
	}
	return true
}

// deeper reports the line at j, which is indented deeper than the one at i but
// begins a statement. It returns whether the brace of a block is missing, which is
// so when a closing one follows.
func (l *layout) deeper(i, j int) (missing bool) {
	base, t, last := l.tokens[i].column, l.tokens[j], l.tokens[j-1]
	for k := j; k < len(l.tokens); k++ {
		if next := l.tokens[k]; next.first && next.column <= base {
			missing = next.kind == kindClose
			break
		}
	}
	if missing {
		l.add(l.error("missing-brace", last.end, last.end, "the line above a block ends in `{`").
			WithLabelledFix(l.span(last.end, last.end), " {", "write `{` at the end of this line"))
		return true
	}
	number, _ := l.parser.file.Source.Position(last.start)
	l.add(l.error("unexpected-indent", t.start, l.tokens[j].end, "this line is indented deeper than the statement above").
		Because("a line that is indented deeper goes on with the statement above").
		WithLabelledFix(l.span(l.parser.file.Source.LineStart(number+1), t.start), "", "write it as far left as the line above").
		WithNote(l.span(l.tokens[i].start, l.tokens[i].end), "the statement above begins here"))
	return false
}

// push opens a block.
func (l *layout) push(s Statement, open token, column int, implicit bool) {
	b := &block{owner: s, open: open, column: column, implicit: implicit}
	switch s := s.(type) {
	case *Sentence:
		s.HasBlock = true
	case *Bad:
		s.HasBlock = true
	default:
		b.owner = nil
		l.add(l.error("misplaced-brace", open.start, open.end, "this statement opens no block"))
	}
	if len(l.stack) <= maxBlocks {
		l.stack = append(l.stack, b)
		return
	}
	if l.skipped++; l.skipped == 1 {
		l.add(l.error("too-deep", open.start, open.end, "blocks are nested more than %d deep", maxBlocks))
	}
}

// pop closes the block on top; end is where its text ends.
func (l *layout) pop(end int) {
	b := l.top()
	l.stack = l.stack[:len(l.stack)-1]
	at := l.span(b.open.start, end)
	switch owner := b.owner.(type) {
	case *Sentence:
		owner.Block, owner.BlockAt = b.list, at
	case *Bad:
		owner.Block, owner.BlockAt = b.list, at
	default:
		for i, s := range b.list {
			l.top().add(s, b.columns[i])
		}
	}
}

// afterBrace reports what follows a brace in its line and returns the next index.
func (l *layout) afterBrace(i int) int {
	next := i + 1
	if next >= len(l.tokens) || l.tokens[next].first {
		return next
	}
	t := l.tokens[next]
	rule := "`{` ends its line"
	if l.tokens[i].kind == kindClose {
		rule = "`}` stands alone in its line"
	}
	l.add(l.error("misplaced-brace", t.start, t.end, "%s", rule).
		WithLabelledFix(l.span(t.start, t.start), "\n", "begin a new line here"))
	if t.kind == kindClose {
		return l.close(next)
	}
	return next
}

// closing reads a closing brace and returns the next index.
func (l *layout) closing(i int) int {
	if t := l.tokens[i]; !t.first && l.tokens[i-1].kind != kindClose && l.tokens[i-1].kind != kindOpen {
		l.add(l.error("misplaced-brace", t.start, t.end, "`}` stands alone in its line").
			WithLabelledFix(l.span(t.start, t.start), "\n", "begin a new line here"))
	}
	return l.close(i)
}

func (l *layout) close(i int) int {
	t := l.tokens[i]
	switch {
	case l.skipped > 0:
		l.skipped--
	case len(l.stack) == 1:
		l.add(l.error("stray-brace", t.start, t.end, "this brace closes nothing").WithFix(l.span(t.start, t.end), ""))
	default:
		l.pop(t.end)
	}
	return l.afterBrace(i)
}

// lonelyBrace reads an opening brace that begins a line.
func (l *layout) lonelyBrace(i int) int {
	t := l.tokens[i]
	d := l.error("misplaced-brace", t.start, t.end, "`{` ends the line of its sentence")
	if i > 0 && l.tokens[i-1].kind != kindClose && l.tokens[i-1].kind != kindOpen {
		end := l.tokens[i-1].end
		d = d.WithLabelledFix(l.span(end, t.end), " {", "write it at the end of the line above")
	}
	l.add(d)
	l.push(l.lastOwner(t), t, t.column, false)
	return l.afterBrace(i)
}

// lastOwner returns the last statement if a block can be given to it, else a Bad
// statement for the brace.
func (l *layout) lastOwner(brace token) Statement {
	b := l.top()
	if len(b.list) > 0 {
		switch s := b.list[len(b.list)-1].(type) {
		case *Sentence:
			if !s.HasBlock {
				return s
			}
		case *Bad:
			if !s.HasBlock {
				return s
			}
		}
	}
	bad := &Bad{At: l.span(brace.start, brace.end)}
	b.add(bad, brace.column)
	return bad
}

// notClosed reports the block on top, which has no closing brace. Statements from
// the first one that is not indented deeper than its owner are taken to stand
// behind it.
func (l *layout) notClosed() {
	b := l.top()
	cut := len(b.list)
	for i, column := range b.columns {
		if column <= b.column {
			cut = i
			break
		}
	}
	rest, columns := b.list[cut:], b.columns[cut:]
	b.list = b.list[:cut]
	if !b.implicit {
		d := l.error("block-not-closed", b.open.start, b.open.end, "this block is not closed").
			Because("a `}` alone in a line closes it")
		if len(rest) > 0 {
			d = d.WithNote(rest[0].Span(), "the block seems to end before this line")
		}
		l.add(d)
	}
	end := b.open.end
	if cut > 0 {
		end = b.list[cut-1].Span().End
	}
	l.pop(end)
	for i, s := range rest {
		l.top().add(s, columns[i])
	}
}
