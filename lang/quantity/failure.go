package quantity

import "fmt"

// Cause says why an operation has no result.
type Cause int8

// The causes.
const (
	Mismatch  Cause = iota + 1 // the kinds do not go together
	WrongKind                  // a function was given the wrong kind
	Exponent                   // the exponent is not a plain number
	NoPower                    // the power or root of this kind does not exist
	ByZero                     // division by zero
	Domain                     // the function has no value there
	TooLarge                   // the result is beyond float64
	Nothing                    // min or max of nothing
)

// Failure is the error of an operation: what was asked of which values, and why
// there is no result. Right is the zero Value for operations of one value.
type Failure struct {
	Op          string // "+", "-", "*", "/", "^", "compare", or a function's name
	Cause       Cause
	Left, Right Value
	Want        Kind // for WrongKind: the kind that the function takes
}

func fail(op string, cause Cause, a, b Value) *Failure {
	return &Failure{Op: op, Cause: cause, Left: a, Right: b}
}

// Error returns one sentence without a full stop.
func (f *Failure) Error() string {
	switch f.Cause {
	case Mismatch:
		return f.mismatch()
	case WrongKind:
		return fmt.Sprintf("`%s` takes %s, not %s", f.Op, f.Want, f.Left.kind)
	case Exponent:
		return fmt.Sprintf("an exponent is a plain number, not %s", f.Right.kind)
	case NoPower:
		if f.Op == "sqrt" {
			return fmt.Sprintf("%s has no square root", f.Left.kind)
		}
		return fmt.Sprintf("%s cannot be raised to the power %s", f.Left.kind, Format(f.Right))
	case ByZero:
		return "division by zero"
	case Domain:
		return f.domain()
	case Nothing:
		return fmt.Sprintf("`%s` needs at least one value", f.Op)
	}
	return fmt.Sprintf("the result of `%s` is too large", f.Op)
}

// mismatch says which kinds do not go together.
func (f *Failure) mismatch() string {
	verb := "be used together in `" + f.Op + "`"
	switch f.Op {
	case "+", "sum":
		verb = "be added"
	case "-":
		return fmt.Sprintf("%s cannot be subtracted from %s", f.Right.kind, f.Left.kind)
	case "*":
		verb = "be multiplied"
	case "/":
		return fmt.Sprintf("%s cannot be divided by %s", f.Left.kind, f.Right.kind)
	case "compare":
		verb = "be compared"
	}
	return fmt.Sprintf("%s and %s cannot %s", f.Left.kind, f.Right.kind, verb)
}

func (f *Failure) domain() string {
	switch f.Op {
	case "^":
		return fmt.Sprintf("%s to the power %s has no value", Format(f.Left), Format(f.Right))
	case "sqrt":
		return fmt.Sprintf("the square root of %s has no value", Format(f.Left))
	case "round":
		return fmt.Sprintf("%s is no step to round to", Format(f.Left))
	case "atan2":
		return "the direction (0, 0) has no angle"
	}
	return fmt.Sprintf("`%s` of %s has no value", f.Op, Format(f.Left))
}

// Why returns the reason: the rule, with the values that broke it. It may be "".
func (f *Failure) Why() string {
	switch f.Cause {
	case Mismatch:
		return f.whyMismatch()
	case WrongKind:
		return fmt.Sprintf("%s is %s", Format(f.Left), f.Left.kind)
	case Exponent:
		return fmt.Sprintf("%s is %s", Format(f.Right), f.Right.kind)
	case NoPower:
		return "lengths have whole powers from -9 to 9, angles only the powers 0 and 1"
	case ByZero:
		if f.Op == "/" {
			return fmt.Sprintf("%s is divided by %s", Format(f.Left), Format(f.Right))
		}
	case Domain:
		return domainRule(f.Op)
	case TooLarge:
		return "numbers go up to about 1.8e308"
	}
	return ""
}

func (f *Failure) whyMismatch() string {
	text := fmt.Sprintf("%s is %s, %s is %s", Format(f.Left), f.Left.kind, Format(f.Right), f.Right.kind)
	switch {
	case f.Op == "*" || f.Op == "/":
		return text + "; lengths have whole powers from -9 to 9, angles only the powers 0 and 1"
	case f.Left.kind == Ratio && f.Right.kind == Number, f.Left.kind == Number && f.Right.kind == Ratio:
		return text + "; write the number as a percentage, 1 as 100 %"
	}
	return text
}

// domainRule says where a function has values.
func domainRule(op string) string {
	switch op {
	case "^":
		return "a negative number has only whole powers"
	case "sqrt":
		return "a negative number has no square root"
	case "tan":
		return "the tangent has no value at 90° and every 180° from there"
	case "asin":
		return "a sine lies between -1 and 1"
	case "acos":
		return "a cosine lies between -1 and 1"
	case "atan2":
		return "rise and run are both zero"
	case "round":
		return "the step must be greater than zero"
	}
	return ""
}
