package catalogue

// Forms is every form, in the order of the manual.
var Forms = concat(lineForms, outlineForms, solidForms, flatForms, sphereForms, copyForms, groupForms, curveForms, blockForms, viewForms, markForms)

func concat(families ...[]Form) []Form {
	var all []Form
	for _, f := range families {
		all = append(all, f...)
	}
	return all
}

// The chapters of the manual.
const (
	chLines    = "Lines and planes"
	chOutlines = "Outlines"
	chSolids   = "Solids and parts"
	chCurves   = "Curves and developments"
	chBlocks   = "Sheets and figures"
	chViews    = "Views"
	chMarks    = "Dimensions, lettering, tables"
)

var lineForms = []Form{
	{
		Word: "line", Chapter: chLines, Kind: KLine,
		Help: "A straight line through two points, or through one point along a direction.",
		More: "A line through two points has ends. `along` also takes another line.",
		Clauses: []Clause{
			{Word: "through", Takes: []Kind{KPoint}, Max: 2, Needed: true, Help: "The points that it goes through."},
			{Word: "along", Takes: []Kind{KDirection, KPoint, KLine}, Max: 1, Help: "Its direction, when `through` has one point."},
		},
		Measures: []Measure{
			{Name: "true_length", Kind: KLength, Help: "The distance between its ends."},
			{Name: "inclination", Kind: KAngle, Help: "The angle to the ground, 0° to 90°."},
			{Name: "bearing", Kind: KAngle, Help: "The direction in plan, from rightward anticlockwise, 0° to 360°."},
			{Name: "horizontal_trace", Kind: KPoint, Help: "Where it meets the ground."},
			{Name: "vertical_trace", Kind: KPoint, Help: "Where it meets the frontal plane."},
		},
		Example: "L = line through (10 mm, 20 mm, 30 mm), (110 mm, 80 mm, 90 mm)\nM = line through (0, 0, 0) along (1, 2, 2)\n", Subject: "L",
	},
	{
		Word: "plane", Chapter: chLines, Kind: KPlane,
		Help: "A plane, stated by three points, by a normal, by two directions, or by its slope.",
		More: "`tilt` is the angle to the ground and `facing` the direction in which it falls; an upright plane faces its normal. " +
			"The normal is turned upward, except that a stated `normal` stays as it is, and that of an upright plane through points or along directions follows the right-hand rule in the order written. " +
			"A plane laid along a generator is known to be parallel to it: its section can be a parabola by construction.",
		Clauses: []Clause{
			{Word: "through", Takes: []Kind{KPoint}, Max: 3, Needed: true, Help: "One point of it, or three."},
			{Word: "normal", Takes: []Kind{KDirection, KPoint, KLine}, Max: 1, Help: "A direction square to it."},
			{Word: "along", Takes: []Kind{KDirection, KPoint, KLine}, Max: 2, Help: "Two directions that lie in it."},
			{Word: "tilt", Takes: []Kind{KAngle, KRatio}, Max: 1, Help: "The angle to the ground, 0° to 90°, or a slope such as 1:2, rise to run."},
			{Word: "facing", Takes: []Kind{KAngle}, Max: 1, Help: "The direction in plan in which it falls."},
		},
		Choices: []Choice{{Ways: [][]string{{}, {"normal"}, {"along"}, {"tilt", "facing"}}}},
		Measures: []Measure{
			{Name: "normal", Kind: KDirection, Help: "The unit normal."},
			{Name: "tilt", Kind: KAngle, Help: "The angle to the ground, 0° to 90°."},
			{Name: "facing", Kind: KAngle, Help: "The direction in plan in which it falls; a level plane has none."},
			{Name: "horizontal_trace", Kind: KLine, Help: "The line in which it meets the ground."},
			{Name: "vertical_trace", Kind: KLine, Help: "The line in which it meets the frontal plane."},
		},
		Example: "P = plane through (0, 0, 60 mm) tilt 35° facing 0°\nQ = plane through (0, 0, 0), (100 mm, 0, 0), (0, 80 mm, 40 mm)\nR = plane through (0, 0, 50 mm) normal (1, 0, 2)\nT = plane through (0, 0, 10 mm) along rightward, (0, 1, 1)\n", Subject: "P",
	},
}

var turned = []Clause{
	{Word: "at", Takes: []Kind{KPoint}, Max: 1, Default: "the origin", Help: "The centre of its base."},
	{Word: "axis", Takes: []Kind{KDirection, KPoint, KLine}, Max: 1, Default: "upward", Help: "The direction from its base to its apex or top; a line gives the place of the base too."},
}

var solidFeatures = []Measure{
	{Name: "volume", Kind: KVolume, Help: "The volume."},
	{Name: "lateral_area", Kind: KArea, Help: "The area of the curved face."},
	{Name: "base_area", Kind: KArea, Help: "The area of what there is of the base."},
	{Name: "top_area", Kind: KArea, Help: "The area of what there is of the top; zero for a cone with an apex."},
	{Name: "area", Kind: KArea, Help: "The area of all faces."},
	{Name: "centroid", Kind: KPoint, Help: "The centre of the volume."},
	{Name: "axis", Kind: KLine, Help: "The axis, from base to apex or top."},
	{Name: "side", Kind: KFace, Help: "The curved face."},
}

var (
	faceOf  = Measure{Name: "face", Kind: KFace, Args: []Arg{{Name: "on", Takes: origins}}, Help: "The face that lies on a plane, or that came from a solid or from one of its faces.", Example: "$.face($.side)"}
	edgeOf  = Measure{Name: "edge", Kind: KEdge, Args: []Arg{{Name: "of", Takes: origins}, {Name: "and", Takes: origins}}, Help: "The edge between two faces.", Example: "$.edge($.base, $.side)"}
	origins = []Kind{KPlane, KSolid, KFace}
)

var generator = Measure{Name: "generator", Kind: KLine, Args: []Arg{{Name: "at", Takes: []Kind{KAngle}}}, Help: "The generator at an angle about the axis, from the base to the apex or top; on a part, the piece inside the part.", Example: "$.generator(45°)"}

func measures(groups ...[]Measure) []Measure {
	var all []Measure
	for _, g := range groups {
		all = append(all, g...)
	}
	return all
}

var solidForms = []Form{
	{
		Word: "cone", Chapter: chSolids, Kind: Kind{Class: Solid, Type: "cone"},
		Help: "A right circular cone, or with a top radius a frustum.",
		More: "Angles about a vertical axis start rightward and run anticlockwise seen from above; about any other axis they start at its top line and run anticlockwise looking against the axis.",
		Clauses: append([]Clause{
			{Word: "radius", Takes: []Kind{KLength}, Max: 1, Help: "The radius of the base."},
			{Word: "diameter", Takes: []Kind{KLength}, Max: 1, Help: "The diameter of the base."},
			{Word: "height", Takes: []Kind{KLength}, Max: 1, Needed: true, Help: "The height along the axis."},
			{Word: "top_radius", Takes: []Kind{KLength}, Max: 1, Help: "The radius of the top of a frustum."},
			{Word: "top_diameter", Takes: []Kind{KLength}, Max: 1, Help: "The diameter of the top of a frustum."},
		}, turned...),
		Choices: []Choice{{Ways: [][]string{{"radius"}, {"diameter"}}}, {Ways: [][]string{{}, {"top_radius"}, {"top_diameter"}}}},
		Measures: measures([]Measure{
			{Name: "height", Kind: KLength, Help: "The height along the axis."},
			{Name: "radius", Kind: KLength, Help: "The radius of the base."},
			{Name: "diameter", Kind: KLength, Help: "The diameter of the base."},
			{Name: "top_radius", Kind: KLength, Help: "The radius of the top; zero for a cone with an apex."},
			{Name: "top_diameter", Kind: KLength, Help: "The diameter of the top; zero for a cone with an apex."},
			{Name: "slant", Kind: KLength, Help: "The length of a generator of the whole cone or frustum."},
			{Name: "half_angle", Kind: KAngle, Help: "The angle between the axis and a generator."},
			{Name: "apex", Kind: KPoint, Help: "The apex; of a frustum, where its generators meet."},
		}, solidFeatures, []Measure{
			{Name: "base", Kind: KCircle, Help: "The base."},
			{Name: "top", Kind: KCircle, Help: "The top of a frustum."},
			generator, faceOf, edgeOf,
		}),
		Example: "K = cone diameter 240 mm height 260 mm\nF = cone radius 60 mm top_radius 30 mm height 80 mm at (200 mm, 0, 0)\n" +
			"G = cone radius 2 in top_diameter 1 in height 3 1/2 in at (300 mm, 0, 50 mm) axis (1, 0, 1)\n", Subject: "F",
	},
	{
		Word: "cylinder", Chapter: chSolids, Kind: Kind{Class: Solid, Type: "cylinder"},
		Help: "A right circular cylinder.",
		More: "With `axis` a line that has ends, the cylinder runs from end to end and needs neither `at` nor `height`.",
		Clauses: append([]Clause{
			{Word: "radius", Takes: []Kind{KLength}, Max: 1, Help: "The radius."},
			{Word: "diameter", Takes: []Kind{KLength}, Max: 1, Help: "The diameter."},
			{Word: "height", Takes: []Kind{KLength}, Max: 1, Default: "the length of the axis line", Help: "The length along the axis."},
		}, turned...),
		Choices: []Choice{{Ways: [][]string{{"radius"}, {"diameter"}}}},
		Measures: measures([]Measure{
			{Name: "height", Kind: KLength, Help: "The length along the axis."},
			{Name: "radius", Kind: KLength, Help: "The radius."},
			{Name: "diameter", Kind: KLength, Help: "The diameter."},
		}, solidFeatures, []Measure{
			{Name: "base", Kind: KCircle, Help: "The base."},
			{Name: "top", Kind: KCircle, Help: "The top."},
			generator, faceOf, edgeOf,
		}),
		Example: "C = cylinder diameter 150 mm height 400 mm at (0, 0, -100 mm)\nH = line through (0, 0, 0), (300 mm, 0, 0)\nD = cylinder radius 40 mm axis H\n", Subject: "C",
	},
	{
		Word: "part", Chapter: chSolids, Kind: Kind{Class: Solid, Type: "part"},
		Help: "What is left of a solid on one side of planes.",
		More: "`above` and `below` compare z, `left_of` and `right_of` x, `in_front_of` and `behind` y, at one place; a plane that is upright to that direction cannot be used with them, and the message offers the pair that can. Several planes may stand in one clause, and parts may be cut again.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KSolid}, Max: 1, Needed: true, Help: "The solid."},
			{Word: "above", Takes: []Kind{KPlane}, Repeat: true, Help: "Keep what has the larger z."},
			{Word: "below", Takes: []Kind{KPlane}, Repeat: true, Help: "Keep what has the smaller z."},
			{Word: "left_of", Takes: []Kind{KPlane}, Repeat: true, Help: "Keep what has the smaller x."},
			{Word: "right_of", Takes: []Kind{KPlane}, Repeat: true, Help: "Keep what has the larger x."},
			{Word: "in_front_of", Takes: []Kind{KPlane}, Repeat: true, Help: "Keep what has the smaller y."},
			{Word: "behind", Takes: []Kind{KPlane}, Repeat: true, Help: "Keep what has the larger y."},
		},
		Choices: []Choice{{Any: true, Ways: [][]string{{"above"}, {"below"}, {"left_of"}, {"right_of"}, {"in_front_of"}, {"behind"}}}},
		Measures: measures(solidFeatures, []Measure{
			generator,
			{Name: "face", Kind: KFace, Args: faceOf.Args, Help: faceOf.Help, Example: "B.face(P)"},
			{Name: "edge", Kind: KEdge, Args: edgeOf.Args, Help: edgeOf.Help, Example: "B.edge(K.side, P)"},
			{Name: "corner", Kind: KPoint, Args: []Arg{{Name: "of", Takes: origins}, {Name: "and", Takes: origins}, {Name: "and", Takes: origins}}, Help: "The corner between three faces.", Example: "E.corner(Q, R, K.base)"},
		}),
		Example: "K = cone diameter 240 mm height 260 mm\nP = plane through (0, 0, 120 mm) tilt 30° facing 0°\nQ = plane through (70 mm, 0, 0) normal rightward\nR = plane through (0, 20 mm, 0) normal rearward\n" +
			"B = part of K below P left_of Q\nA = part of K above P\nC = part of K right_of Q behind R\nD = part of K in_front_of R\nE = part of K left_of Q behind R\n", Subject: "B",
	},
}

var curveForms = []Form{
	{
		Word: "section", Chapter: chCurves, Kind: KSection,
		Help: "The section of a solid by a plane: the whole conic, and what of it lies inside the solid.",
		More: "Measures of the conic are those of the whole curve; `area`, `length` and `perimeter` are of what lies inside the solid, and `perimeter` counts chords where `length` does not. Focus, vertex and directrix of one number belong together, the higher first, then the one further right; where there is one, no number is needed. `latus_rectum` is the whole chord through a focus.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KSolid}, Max: 1, Needed: true, Help: "The solid."},
			{Word: "by", Takes: []Kind{KPlane}, Max: 1, Needed: true, Help: "The cutting plane."},
		},
		Measures: []Measure{
			{Name: "kind", Kind: KText, Help: "circle, ellipse, parabola, hyperbola, point, line, two lines, or polygon for a solid with plane faces only."},
			{Name: "eccentricity", Kind: KNumber, Help: "The eccentricity; 0 for a circle, 1 for a parabola."},
			{Name: "focus", Kind: KPoint, Args: number, Help: "A focus.", Example: "S.focus(1)"},
			{Name: "vertex", Kind: KPoint, Args: number, Help: "A vertex on the major axis.", Example: "S.vertex(1)"},
			{Name: "directrix", Kind: KLine, Args: number, Help: "A directrix.", Example: "S.directrix(1)"},
			{Name: "centre", Kind: KPoint, Help: "The centre; a parabola has none."},
			{Name: "axis", Kind: KLine, Help: "The axis through the foci."},
			{Name: "semi_major", Kind: KLength, Help: "Half the major axis; of a hyperbola, half the distance between the vertices."},
			{Name: "semi_minor", Kind: KLength, Help: "Half the minor axis; of a hyperbola, half the conjugate axis."},
			{Name: "linear_eccentricity", Kind: KLength, Help: "The distance from centre to focus."},
			{Name: "focal_length", Kind: KLength, Help: "The distance from a parabola's vertex to its focus.", Example: "T.focal_length"},
			{Name: "latus_rectum", Kind: KLength, Help: "The chord through a focus square to the axis."},
			{Name: "asymptote_angle", Kind: KAngle, Help: "The angle between a hyperbola's axis and its asymptotes.", Example: "U.asymptote_angle"},
			{Name: "angle", Kind: KAngle, Help: "The angle between the lines of a section in two lines.", Example: "V.angle"},
			{Name: "radius", Kind: KLength, Help: "The radius of a circle.", Example: "W.radius"},
			{Name: "area", Kind: KArea, Help: "The area inside the solid."},
			{Name: "length", Kind: KLength, Help: "The length of the curve inside the solid."},
			{Name: "perimeter", Kind: KLength, Help: "The length of the outline inside the solid, chords counted."},
			{Name: "centroid", Kind: KPoint, Help: "The centre of the area inside the solid."},
			{Name: "point", Kind: KPoint, Args: []Arg{{Name: "at", Takes: []Kind{KAngle}}}, Help: "The point on the solid's generator at an angle.", Example: "S.point(90°)"},
		},
		Example: "K = cone diameter 240 mm height 260 mm\n" +
			"S = section of K by plane_e\nplane_e = plane through (0, 0, 120 mm) tilt 30° facing 0°\n" +
			"T = section of K by plane_p\nplane_p = plane through (35 mm, 0, 0) along K.generator(180°), rearward\n" +
			"U = section of K by plane_h\nplane_h = plane through (40 mm, 0, 0) normal rightward\n" +
			"V = section of K by plane_l\nplane_l = plane through K.apex normal frontward\n" +
			"W = section of K by plane_c\nplane_c = plane through (0, 0, 100 mm) normal upward\n", Subject: "S",
	},
	{
		Word: "focal_sphere", Chapter: chCurves, Kind: KSphere,
		Help: "A sphere that touches a cone or cylinder all round and the cutting plane in a focus of the section.",
		More: "A parabola has one, an ellipse or hyperbola two: `which` tells them apart by the height of their centres.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KSolid}, Max: 1, Needed: true, Help: "The cone or cylinder."},
			{Word: "touching", Takes: []Kind{KPlane}, Max: 1, Needed: true, Help: "The cutting plane."},
			{Word: "which", Words: []string{"upper", "lower"}, Max: 1, Help: "The one with the higher or the lower centre."},
		},
		Measures: []Measure{
			{Name: "centre", Kind: KPoint, Help: "The centre, on the axis."},
			{Name: "radius", Kind: KLength, Help: "The radius."},
			{Name: "touch", Kind: KPoint, Help: "Where it touches the plane: a focus."},
			{Name: "ring", Kind: KCircle, Help: "The circle in which it touches the surface."},
		},
		Example: "K = cone diameter 240 mm height 260 mm\nP = plane through (0, 0, 120 mm) tilt 30° facing 0°\nG = focal_sphere of K touching P which upper\n", Subject: "G",
	},
	{
		Word: "development", Chapter: chCurves, Kind: KPattern,
		Help: "The curved face of a solid or part, unrolled.",
		More: "A cone has its apex at (0, 0) and the seam along +x; a cylinder has its girth level from the seam at x = 0 and the axis up. It is seen from outside unless `up inside`, which is the exact mirror. Numbers count the even divisions, 1 at the seam; extremes between them are stations of their own and are not counted.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KSolid}, Max: 1, Needed: true, Help: "The solid or part."},
			{Word: "face", Takes: []Kind{KFace}, Max: 1, Default: "the curved face", Help: "The face to unroll."},
			{Word: "seam", Takes: []Kind{KAngle, KLine}, Max: 1, Default: "0°", Help: "The generator at which it is opened, or its angle."},
			{Word: "divisions", Takes: []Kind{KNumber}, Max: 1, Default: "12", Help: "The number of even divisions of the whole turn, 3 to 360."},
			{Word: "up", Words: []string{"outside", "inside"}, Max: 1, Default: "outside", Help: "The side that faces the reader."},
		},
		Measures: []Measure{
			{Name: "area", Kind: KArea, Help: "The area of the pattern."},
			{Name: "width", Kind: KLength, Help: "The extent along x."},
			{Name: "height", Kind: KLength, Help: "The extent along y."},
			{Name: "cut_length", Kind: KLength, Help: "The length of the whole outline, both seam edges counted."},
			{Name: "sector", Kind: KAngle, Help: "The angle of a cone's pattern at the apex.", Example: "E.sector"},
			{Name: "outer_radius", Kind: KLength, Help: "The greatest distance from a cone's apex.", Example: "E.outer_radius"},
			{Name: "inner_radius", Kind: KLength, Help: "The least distance from a cone's apex.", Example: "E.inner_radius"},
			{Name: "girth", Kind: KLength, Help: "The length round a cylinder; on a cone the arc at the outer radius."},
			{Name: "stepped_girth", Kind: KLength, Help: "The same when the divisions are stepped off as chords."},
			{Name: "step_loss", Kind: KLength, Help: "By how much stepping off chords falls short."},
			{Name: "deviation", Kind: KLength, Help: "The largest miss of its points, folded back, from the solid."},
			{Name: "count", Kind: KNumber, Help: "The number of separate pieces."},
			{Name: "true_length", Kind: KLength, Args: []Arg{{Name: "at", Takes: []Kind{KNumber, KAngle}}}, Help: "The length of a generator inside the part: by the number of its division, or by its angle.", Example: "D.true_length(3)"},
			{Name: "flat", Kind: KPlace, Args: []Arg{{Name: "of", Takes: []Kind{KPoint}}}, Help: "Where a point of the face lies on the pattern.", Example: "D.flat((75 mm, 0, 0))"},
		},
		Example: "C = cylinder diameter 150 mm height 400 mm\nP = plane through (0, 0, 250 mm) tilt 35° facing 0°\nB = part of C below P\n" +
			"D = development of B seam 180° divisions 16 up inside\nF = development of C face C.side\nK = cone diameter 240 mm height 260 mm\nE = development of K seam K.generator(90°)\n", Subject: "D",
	},
}

var number = []Arg{{Name: "number", Takes: []Kind{KNumber}, Optional: true}}

// Types are the features that members give and that no form makes.
var Types = []Type{
	{
		Name: "circle", Help: "A round end of a solid, or a circle of contact.",
		Measures: []Measure{
			{Name: "diameter", Kind: KLength, Help: "The diameter."},
			{Name: "radius", Kind: KLength, Help: "The radius."},
			{Name: "centre", Kind: KPoint, Help: "The centre."},
			{Name: "normal", Kind: KDirection, Help: "The unit normal, out of the solid."},
			{Name: "area", Kind: KArea, Help: "The area of the whole disc."},
			{Name: "perimeter", Kind: KLength, Help: "The length of the whole circle."},
		},
		Example: "K = cone diameter 240 mm height 260 mm\n", Subject: "K.base",
	},
	{
		Name: "face", Help: "A face of a solid.",
		Measures: []Measure{{Name: "area", Kind: KArea, Help: "The area."}},
		Example:  "K = cone diameter 240 mm height 260 mm\n", Subject: "K.side",
	},
	{
		Name: "edge", Help: "An edge of a solid.",
		Measures: []Measure{{Name: "length", Kind: KLength, Help: "The length of all its pieces."}},
		Example:  "K = cone diameter 240 mm height 260 mm\nP = plane through (0, 0, 120 mm) tilt 30° facing 0°\nB = part of K below P\n", Subject: "B.edge(K.side, P)",
	},
}
