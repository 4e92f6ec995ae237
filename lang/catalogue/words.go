package catalogue

// Functions is every function, in the order of the manual.
var Functions = []Function{
	{Name: "sin", Params: []Param{{"angle", []Kind{KAngle}}}, Kind: KNumber, Help: "The sine.", Example: "sin(30°)"},
	{Name: "cos", Params: []Param{{"angle", []Kind{KAngle}}}, Kind: KNumber, Help: "The cosine.", Example: "cos(60°)"},
	{Name: "tan", Params: []Param{{"angle", []Kind{KAngle}}}, Kind: KNumber, Help: "The tangent.", Example: "tan(45°)"},
	{Name: "asin", Params: []Param{{"x", []Kind{KNumber, KRatio}}}, Kind: KAngle, Help: "The angle with the sine x, -90° to 90°.", Example: "asin(1/2)"},
	{Name: "acos", Params: []Param{{"x", []Kind{KNumber, KRatio}}}, Kind: KAngle, Help: "The angle with the cosine x, 0° to 180°.", Example: "acos(1/2)"},
	{Name: "atan", Params: []Param{{"x", []Kind{KNumber, KRatio}}}, Kind: KAngle, Help: "The angle with the tangent x, -90° to 90°.", Example: "atan(1:2)"},
	{Name: "atan2", Params: []Param{{"y", nil}, {"x", nil}}, Kind: KAngle, Help: "The angle of the point (x, y), -180° to 180°; both of one kind.", Example: "atan2(30 mm, 40 mm)"},
	{Name: "sqrt", Params: []Param{{"x", nil}}, Rule: HalfPower, Help: "The square root; of an area a length.", Example: "sqrt((3 mm)^2 + (4 mm)^2)"},
	{Name: "abs", Params: []Param{{"x", nil}}, Rule: Same, Help: "The size without the sign.", Example: "abs(3 mm - 5 mm)"},
	{Name: "min", Params: []Param{{"x", nil}}, Many: true, Rule: Same, Help: "The smallest.", Example: "min(3 mm, 5 mm, 4 mm)"},
	{Name: "max", Params: []Param{{"x", nil}}, Many: true, Rule: Same, Help: "The largest.", Example: "max(3 mm, 5 mm, 4 mm)"},
	{Name: "sum", Params: []Param{{"x", nil}}, Many: true, Rule: Same, Help: "The sum.", Example: "sum(3 mm, 5 mm, 4 mm)"},
	{Name: "count", Params: []Param{{"x", nil}}, Many: true, Kind: KNumber, Help: "How many there are.", Example: "count(3 mm, 5 mm)"},
	{Name: "round", Params: []Param{{"x", nil}, {"step", nil}}, Rule: Same, Help: "The nearest multiple of the step, halves away from zero.", Example: "round(17.3 mm, 0.5 mm)"},
	{Name: "distance", Params: []Param{{"a", []Kind{KPoint, KLine, KPlane}}, {"b", []Kind{KPoint, KLine, KPlane}}}, Kind: KLength, Help: "The shortest distance between points, lines (taken without ends) and planes.", Example: "distance((0, 0, 0), (30 mm, 40 mm, 0))"},
	{Name: "angle", Params: []Param{{"a", []Kind{KDirection, KPoint, KLine, KPlane}}, {"b", []Kind{KDirection, KPoint, KLine, KPlane}}}, Kind: KAngle, Help: "The angle between directions, 0° to 180°; with a line or plane among them, 0° to 90°.", Example: "angle(rightward, (1, 1, 0))"},
	{Name: "midpoint", Params: []Param{{"a", []Kind{KPoint}}, {"b", []Kind{KPoint}}}, Kind: KPoint, Help: "The point halfway.", Example: "midpoint((0, 0, 0), (30 mm, 40 mm, 0))"},
	{Name: "unit", Params: []Param{{"a", []Kind{KDirection, KPoint, KLine}}}, Rule: UnitOf, Kind: KDirection, Help: "The direction of length one.", Example: "unit((3, 4, 0))"},
	{Name: "dot", Params: []Param{{"a", []Kind{KDirection, KPoint}}, {"b", []Kind{KDirection, KPoint}}}, Rule: OfTriples, Kind: KNumber, Help: "The scalar product.", Example: "dot((1, 2, 3), (4, 5, 6))"},
	{Name: "cross", Params: []Param{{"a", []Kind{KDirection, KPoint}}, {"b", []Kind{KDirection, KPoint}}}, Rule: UnitOf, Kind: KDirection, Help: "The direction square to both, by the right-hand rule, its length the product's.", Example: "cross(rightward, rearward)"},
}

// Builtins is every built-in name.
var Builtins = []Builtin{
	{"pi", KNumber, "Half the girth of a circle of radius 1."},
	{"yes", KYesNo, "Yes."},
	{"no", KYesNo, "No."},
	{"rightward", KDirection, "(1, 0, 0)"},
	{"leftward", KDirection, "(-1, 0, 0)"},
	{"rearward", KDirection, "(0, 1, 0), away from someone who looks at the front elevation."},
	{"frontward", KDirection, "(0, -1, 0)"},
	{"upward", KDirection, "(0, 0, 1)"},
	{"downward", KDirection, "(0, 0, -1)"},
	{"ground", KPlane, "The level plane through the origin."},
	{"frontal", KPlane, "The upright plane through the origin that faces front; its normal is frontward."},
	{"side", KPlane, "The upright plane through the origin that faces right; its normal is rightward."},
}

// Reserved are the words that cannot be names: the statement words and those
// that begin a clause nearly everywhere.
var Reserved = []string{"given", "verify", "take", "case", "of", "by", "at", "on", "to", "from", "through", "along", "about", "above", "below", "within", "nearest", "show"}

// Statements is every statement word, with an example that stands alone.
var Statements = []Form{
	{Word: "given", Help: "A value that the command line may set.", More: "`from` and `to` are the allowed range; `tolerance t` makes every verify hold at the nominal value and at every corner of the tolerances, and names the corner that fails.",
		Example: "given foot = 240 mm \"diameter at the foot\" from 100 mm to 400 mm tolerance 2 mm\n"},
	{Word: "verify", Help: "A condition that must hold; the run fails with its words and both values when it does not.", More: "`=` without `within` allows 1e-9 of the larger side. Texts may be compared with `=`.",
		Example: "K = cone diameter 240 mm height 260 mm\nverify K.slant < 300 mm \"must come out of a 300 mm strip\"\nverify K.slant = 286.4 mm within 0.1 mm\nverify K.slant <= 290 mm\nverify K.slant > 280 mm\nverify K.slant >= 280 mm\n"},
}

// Option is one option of a command.
type Option struct {
	Name  string // "--given name=value"
	Help  string
	Verbs []string
}

// Command is one command.
type Command struct {
	Name, Args, Help string
}

// Commands is every command.
var Commands = []Command{
	{"draw", "FILE…", "Write the sheets and figures of the files."},
	{"watch", "FILE…", "Draw, and draw again whenever a file that was read is saved, until interrupted."},
	{"check", "FILE…", "Find all mistakes and run every verify; write nothing."},
	{"measure", "FILE [NAME…]", "Print the measures of all things, or of the named ones."},
	{"explain", "[WORD]", "Print the reference entry of a form, clause, measure, function, name, command or message code."},
}

// Options is every option.
var Options = []Option{
	{"--given NAME=VALUE", "Set a given, as --given foot=250mm; may be repeated.", []string{"draw", "watch", "check", "measure"}},
	{"-o DIR", "Write into this folder instead of `drawings`.", []string{"draw", "watch"}},
	{"--as LIST", "Write these of svg, pdf, png; svg,pdf when not given.", []string{"draw", "watch"}},
	{"--json", "Print JSON, one object a line.", []string{"check", "measure", "draw"}},
	{"--csv", "Print comma-separated values.", []string{"measure"}},
}
