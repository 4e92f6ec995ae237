package main

import (
	"io"
	"os"

	"epure/lang/check"
	"epure/lang/diag"
	"epure/lang/source"
	"epure/lang/syntax"
)

func main() {
	b, _ := io.ReadAll(os.Stdin)
	var bag diag.Bag
	check.Check(syntax.Parse(source.New("x.epure", b), &bag), &bag)
	diag.WriteText(os.Stdout, bag.Sorted(), diag.Style{})
}
