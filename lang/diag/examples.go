package diag

import "strings"

// Some examples of codes are long because the fault is a length.

// nested returns n brackets round a number.
func nested(n int) string { return strings.Repeat("(", n) + "1" + strings.Repeat(")", n) }

// many returns n times "+1".
func many(n int) string { return strings.Repeat("+1", n) }

// manyLines returns n lines with a fault in each.
func manyLines(n int) string { return strings.Repeat("a = \n", n) }
