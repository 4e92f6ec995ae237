package diag

// laterCodes are the codes of the stages after the syntax.
func laterCodes() []Entry {
	return append(append(checkCodes(), evalCodes()...), buildCodes()...)
}

const cone = "K = cone diameter 240 mm height 260 mm\n"

// checkCodes are the codes of finding out what the words mean, in alphabetical order.
func checkCodes() []Entry {
	c := func(code Code, meaning, example string) Entry { return Entry{code, StageCheck, meaning, example} }
	return []Entry{
		c("clause-conflict", "Two clauses stand together that exclude each other.", "K = cone radius 20 mm diameter 40 mm height 60 mm\n"),
		c("cycle", "Names depend on each other in a ring, so none of them can be worked out.", "a = b + 1 mm\nb = 2*a\n"),
		c("missing-clause", "A form lacks a clause that it needs.", "K = cone diameter 240 mm\n"),
		c("missing-text", "A form lacks the text in quotes that it needs.", cone+"s = sheet size A4 {\n    elevation of K\n}\n"),
		c("name-taken", "A name is given to two things, or is a word of the language.", "a = 1 mm\na = 2 mm\n"),
		c("needs-name", "A thing outside of blocks has no name, so nothing could use it.", "cone diameter 240 mm height 260 mm\n"),
		c("not-a-block", "Something opens a block with { that takes none.", "K = cone diameter 240 mm height 260 mm {\n}\n"),
		c("not-a-function", "Something stands before brackets that takes nothing in brackets.", "a = 3 mm\nb = a(2)\n"),
		c("not-a-measure", "A dimension is asked for that is not a measure of a thing.", cone+"s = sheet \"S\" {\n    front = elevation of K\n    dimension of 30 mm on front\n}\n"),
		c("not-constant", "The power of a length is not a written number, so the kind of the result is not known.", "n = 2\na = (3 mm)^n\n"),
		c("not-yet", "A statement of the language that this version does not carry out.", "take hood from \"hood.epure\"\n"),
		c("repeated-clause", "A clause stands twice that may stand once.", "K = cone diameter 240 mm height 260 mm height 280 mm\n"),
		c("too-many-values", "A clause has more values than it takes.", "K = cone diameter 240 mm, 200 mm height 260 mm\n"),
		c("unexpected-text", "A text stands behind a form that takes none.", "K = cone \"hood\" diameter 240 mm height 260 mm\n"),
		c("unknown-clause", "A form has no clause of that name.", "K = cone diametre 240 mm height 260 mm\n"),
		c("unknown-form", "There is no form of that name.", "K = coen diameter 240 mm height 260 mm\n"),
		c("unknown-function", "There is no function of that name.", "a = sine(30°)\n"),
		c("unknown-measure", "A thing has no measure of that name.", cone+"a = K.hieght\n"),
		c("unknown-name", "Nothing has that name here.", "a = 2*foot\n"),
		c("unknown-word", "A clause does not take that word.", cone+"s = sheet \"S\" size A7 {\n    elevation of K\n}\n"),
		c("wrong-count", "There are too many or too few points, arguments or coordinates.", "P = plane through (0, 0, 0)\nb = atan2(1 mm)\n"),
		c("wrong-kind", "A value is of another kind than its place takes.", "a = 3 mm + 2°\n"),
		c("wrong-place", "A statement stands inside a block that belongs outside, or the other way round.", cone+"front = elevation of K\n"),
	}
}

// evalCodes are the codes of working things out, in alphabetical order.
func evalCodes() []Entry {
	c := func(code Code, meaning, example string) Entry { return Entry{code, StageEval, meaning, example} }
	return []Entry{
		c("bad-arithmetic", "A calculation has no result, as a division by zero.", "a = 3 mm/(2 - 2)\n"),
		c("bad-outline", "An outline crosses, touches or folds back on itself.", "L = outline through (0, 0), (10 mm, 0), (0, 10 mm), (10 mm, 10 mm)\n"),
		c("cannot-unroll", "A curved face cannot be laid flat, as one of which nothing is left.", "C = cylinder radius 50 mm height 20 mm\nP = plane through (20 mm, 0, 0) normal rightward\nQ = plane through (-20 mm, 0, 0) normal rightward\nR = plane through (0, 20 mm, 0) normal rearward\nT = plane through (0, -20 mm, 0) normal rearward\nB = part of C left_of P right_of Q in_front_of R behind T\nD = development of B\n"),
		c("directions-parallel", "Two directions that should fix a plane are parallel.", "P = plane through (0, 0, 0) along rightward, leftward\n"),
		c("needs-number", "A section has two of what was asked for, so a number is needed.", cone+"P = plane through (0, 0, 120 mm) tilt 30° facing 0°\nS = section of K by P\na = S.focus\n"),
		c("no-dimension", "A measure has no place on a view where a dimension could stand.", cone+"P = plane through (0, 0, 120 mm) tilt 30° facing 0°\nS = section of K by P\ns = sheet \"S\" {\n    front = elevation of K\n    dimension of S.perimeter on front\n}\n"),
		c("no-direction", "A direction is needed and (0, 0, 0) has none.", "L = line through (0, 0, 0) along (0, 0, 0)\n"),
		c("no-focal-sphere", "No sphere touches the solid all round and the plane.", cone+"P = plane through K.apex normal frontward\nG = focal_sphere of K touching P\n"),
		c("no-such-feature", "A face, edge, corner or generator that is asked for is not there.", cone+"P = plane through (0, 0, 120 mm) normal upward\nB = part of K above P\na = B.face(K.base)\n"),
		c("no-such-measure", "A thing has no such measure because of what it is, as the centre of a parabola.", cone+"P = plane through (35 mm, 0, 0) along K.generator(180°), rearward\nS = section of K by P\na = S.centre\n"),
		c("no-such-side", "A side word has no meaning for a plane that is upright to it.", cone+"P = plane through (20 mm, 0, 0) normal rightward\nB = part of K above P\n"),
		c("not-a-cone", "The top of a frustum is as wide as its base.", "K = cone radius 20 mm top_radius 20 mm height 60 mm\n"),
		c("not-a-generator", "A seam is a line that is no generator of the solid.", cone+"L = line through (0, 0, 0), (0, 0, 10 mm)\nD = development of K seam L\n"),
		c("not-curved", "A face that is flat already cannot be unrolled.", cone+"D = development of K face K.base\n"),
		c("not-level", "An elevation looks along a direction that is not level.", cone+"s = sheet \"S\" {\n    elevation of K along (0, 1, -1)\n}\n"),
		c("not-on-face", "A point does not lie on the face that a development unrolls.", cone+"D = development of K\na = D.flat((0, 0, 0))\n"),
		c("not-positive", "A size is zero or negative.", "K = cone diameter 0 mm height 260 mm\n"),
		c("nothing-left", "Nothing of a solid lies on the side that is kept.", cone+"P = plane through (0, 0, 300 mm) normal upward\nB = part of K above P\n"),
		c("out-of-range", "A value lies outside of the range that is allowed.", "given foot = 240 mm from 100 mm to 200 mm\n"),
		c("plane-misses", "A plane does not meet the solid that it should cut.", cone+"P = plane through (0, 0, 300 mm) normal upward\nS = section of K by P\n"),
		c("points-coincide", "Two points that should differ are the same.", "L = line through (0, 0, 0), (0, 0, 0)\n"),
		c("points-in-line", "Three points that should fix a plane lie in one line.", "P = plane through (0, 0, 0), (1 mm, 1 mm, 0), (3 mm, 3 mm, 0)\n"),
		c("several-features", "A feature is asked for and several fit.", cone+"a = K.face(K)\n"),
		c("too-many-tolerances", "More givens have a tolerance than corners can be tried.", tolerances()),
		c("wrong-side", "A prism or pyramid would leave the plane of its base on the side away from the normal.", "R = rectangle width 80 mm depth 60 mm\nY = pyramid on R apex (0, 0, -50 mm)\n"),
		c("verify-fails", "A condition of the file does not hold.", cone+"verify K.slant < 250 mm \"must come out of a 250 mm strip\"\n"),
	}
}

// tolerances is a file with eleven tolerances.
func tolerances() string {
	text := ""
	for _, n := range "abcdefghijk" {
		text += "given " + string(n) + " = 10 mm tolerance 1 mm\n"
	}
	return text + "verify a > 0 mm\n"
}
