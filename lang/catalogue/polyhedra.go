package catalogue

var outlineMeasures = []Measure{
	{Name: "area", Kind: KArea, Help: "The area inside."},
	{Name: "perimeter", Kind: KLength, Help: "The length round."},
	{Name: "centroid", Kind: KPoint, Help: "The centre of the area."},
}

var (
	onPlane = Clause{Word: "on", Takes: []Kind{KPlane}, Max: 1, Default: "ground", Help: "The plane in which it lies; (0, 0) is the point that the plane goes through."}
	centred = Clause{Word: "centre", Takes: []Kind{KPlace}, Max: 1, Default: "(0, 0)", Help: "Its centre in the plane."}
)

var outlineForms = []Form{
	{
		Word: "rectangle", Chapter: chOutlines, Kind: Kind{Class: Outline, Type: "rectangle"},
		Help: "A rectangle.",
		Clauses: []Clause{
			{Word: "width", Takes: []Kind{KLength}, Max: 1, Needed: true, Help: "The size along x of the plane."},
			{Word: "depth", Takes: []Kind{KLength}, Max: 1, Needed: true, Help: "The size along y of the plane."},
			centred, onPlane,
		},
		Measures: outlineMeasures,
		Example:  "P = plane through (0, 0, 50 mm) normal upward\nR = rectangle width 80 mm depth 60 mm centre (10 mm, 0) on P\n", Subject: "R",
	},
	{
		Word: "regular", Chapter: chOutlines, Kind: Kind{Class: Outline, Type: "regular"},
		Help: "A regular polygon.",
		Clauses: []Clause{
			{Word: "sides", Takes: []Kind{KNumber}, Max: 1, Needed: true, Help: "The number of sides, 3 to 60."},
			{Word: "radius", Takes: []Kind{KLength}, Max: 1, Help: "The distance from its centre to a corner."},
			{Word: "across_flats", Takes: []Kind{KLength}, Max: 1, Help: "Twice the distance from its centre to a side."},
			{Word: "first", Takes: []Kind{KAngle}, Max: 1, Default: "0°", Help: "The angle of the first corner, from x of the plane anticlockwise."},
			centred, onPlane,
		},
		Choices:  []Choice{{Ways: [][]string{{"radius"}, {"across_flats"}}}},
		Measures: outlineMeasures,
		Example:  "H = regular sides 6 across_flats 40 mm first 30° centre (10 mm, 20 mm) on ground\nT = regular sides 3 radius 30 mm\n", Subject: "H",
	},
	{
		Word: "outline", Chapter: chOutlines, Kind: KOutline,
		Help: "A polygon through corners; it closes itself.",
		More: "The corners may run either way round. Sides must not cross or touch each other.",
		Clauses: []Clause{
			{Word: "through", Takes: []Kind{KPlace}, Needed: true, Help: "The corners (x, y) in the plane."},
			onPlane,
		},
		Measures: outlineMeasures,
		Example:  "L = outline through (0, 0), (80 mm, 0), (80 mm, 20 mm), (20 mm, 20 mm), (20 mm, 60 mm), (0, 60 mm) on ground\n", Subject: "L",
	},
}

var polyhedronMeasures = []Measure{
	{Name: "volume", Kind: KVolume, Help: "The volume."},
	{Name: "lateral_area", Kind: KArea, Help: "The area of the sides."},
	{Name: "base_area", Kind: KArea, Help: "The area of the base."},
	{Name: "top_area", Kind: KArea, Help: "The area of the top; zero for a pyramid with an apex."},
	{Name: "area", Kind: KArea, Help: "The area of all faces."},
	{Name: "centroid", Kind: KPoint, Help: "The centre of the volume."},
	{Name: "height", Kind: KLength, Help: "The height, square to the base."},
	{Name: "axis", Kind: KLine, Help: "The line from the centre of the base to the apex or to the centre of the top."},
	{Name: "base", Kind: KFace, Help: "The base."},
	{Name: "top", Kind: KFace, Help: "The top of a prism or frustum.", Example: "T.top"},
	{Name: "face", Kind: KFace, Args: faceOf.Args, Help: faceOf.Help, Example: "$.face($.base)"},
}

var sphereForms = []Form{
	{
		Word: "sphere", Chapter: chSolids, Kind: Kind{Class: Solid, Type: "sphere"},
		Help: "A sphere.",
		Clauses: []Clause{
			{Word: "radius", Takes: []Kind{KLength}, Max: 1, Help: "The radius."},
			{Word: "diameter", Takes: []Kind{KLength}, Max: 1, Help: "The diameter."},
			{Word: "centre", Takes: []Kind{KPoint}, Max: 1, Default: "the origin", Help: "The centre."},
		},
		Choices: []Choice{{Ways: [][]string{{"radius"}, {"diameter"}}}},
		Measures: []Measure{
			{Name: "radius", Kind: KLength, Help: "The radius."},
			{Name: "diameter", Kind: KLength, Help: "The diameter."},
			{Name: "centre", Kind: KPoint, Help: "The centre."},
			{Name: "volume", Kind: KVolume, Help: "The volume."},
			{Name: "area", Kind: KArea, Help: "The area."},
			{Name: "centroid", Kind: KPoint, Help: "The centre of the volume."},
			{Name: "side", Kind: KFace, Help: "The curved face."},
		},
		Example: "S = sphere radius 40 mm centre (0, 0, 50 mm)\nT = sphere diameter 2 in\n", Subject: "S",
	},
}

var copyForms = []Form{
	{
		Word: "copy", Chapter: chSolids, Kind: KSolid, KindOf: "of",
		Help: "A solid or part once more, somewhere else.",
		More: "It is mirrored first, then turned, then moved. It has the measures of the solid that it copies; its faces carry its own name, and what a plane cut is still named after the plane. Angles about its axis start where those of any solid do.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KSolid}, Max: 1, Needed: true, Help: "The solid or part."},
			{Word: "mirror", Takes: []Kind{KPlane}, Max: 1, Help: "A plane in which it is mirrored: the opposite hand."},
			{Word: "turn", Takes: []Kind{KAngle}, Max: 1, Help: "The angle by which it is turned, anticlockwise looking against the line."},
			{Word: "about", Takes: []Kind{KLine}, Max: 1, Help: "The line about which it is turned."},
			{Word: "at", Takes: []Kind{KPoint}, Max: 1, Help: "Where the centre of its base comes to lie."},
		},
		Choices: []Choice{{Ways: [][]string{{}, {"turn", "about"}}}, {Any: true, Ways: [][]string{{"mirror"}, {"turn"}, {"at"}}}},
		Example: "K = cone diameter 240 mm height 260 mm\nP = plane through (0, 0, 120 mm) tilt 30° facing 0°\nB = part of K below P\nL = line through (300 mm, 0, 0) along upward\n" +
			"M = copy of B mirror side\nT = copy of B turn 120° about L\nN = copy of K at (0, 400 mm, 0)\nF = copy of B mirror frontal turn 90° about L at (0, 0, 50 mm)\n", Subject: "M",
	},
}

var groupMeasures = []Measure{
	{Name: "count", Kind: KNumber, Help: "How many there are."},
	{Name: "volume", Kind: KVolume, Help: "The volume of all of them together."},
}

var groupForms = []Form{
	{
		Word: "ring", Chapter: chSolids, Kind: Kind{Class: Group, Type: "ring"},
		Help: "A solid or part several times, evenly round a line; the first where it is.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KSolid}, Max: 1, Needed: true, Help: "The solid or part."},
			{Word: "count", Takes: []Kind{KNumber}, Max: 1, Needed: true, Help: "How many, 2 to 1000."},
			{Word: "about", Takes: []Kind{KLine}, Max: 1, Needed: true, Help: "The line round which they stand."},
		},
		Measures: groupMeasures,
		Example:  "C = cylinder diameter 20 mm height 30 mm at (60 mm, 0, 0)\nL = line through (0, 0, 0) along upward\nR = ring of C count 6 about L\n", Subject: "R",
	},
	{
		Word: "row", Chapter: chSolids, Kind: Kind{Class: Group, Type: "row"},
		Help: "A solid or part several times, step by step; the first where it is.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KSolid}, Max: 1, Needed: true, Help: "The solid or part."},
			{Word: "count", Takes: []Kind{KNumber}, Max: 1, Needed: true, Help: "How many, 2 to 1000."},
			{Word: "step", Takes: []Kind{KPoint}, Max: 1, Needed: true, Help: "From one to the next, (x, y, z)."},
		},
		Measures: groupMeasures,
		Example:  "C = cylinder diameter 20 mm height 30 mm\nR = row of C count 4 step (50 mm, 0, 10 mm)\n", Subject: "R",
	},
}

var flatForms = []Form{
	{
		Word: "prism", Chapter: chSolids, Kind: Kind{Class: Solid, Type: "prism"},
		Help: "A prism on an outline.",
		Clauses: []Clause{
			{Word: "on", Takes: []Kind{KOutline}, Max: 1, Needed: true, Help: "The outline of its base."},
			{Word: "height", Takes: []Kind{KLength}, Max: 1, Needed: true, Help: "The height, square to the base."},
			{Word: "along", Takes: []Kind{KDirection, KPoint, KLine}, Max: 1, Default: "square to the base", Help: "The direction of its edges, on the side of the plane's normal."},
		},
		Measures: polyhedronMeasures,
		Example:  "R = rectangle width 80 mm depth 60 mm\nT = prism on R height 40 mm along (1, 0, 2)\n", Subject: "T",
	},
	{
		Word: "pyramid", Chapter: chSolids, Kind: Kind{Class: Solid, Type: "pyramid"},
		Help: "A pyramid on an outline, or with `top_height` a frustum of one.",
		Clauses: []Clause{
			{Word: "on", Takes: []Kind{KOutline}, Max: 1, Needed: true, Help: "The outline of its base."},
			{Word: "height", Takes: []Kind{KLength}, Max: 1, Help: "The height of the apex over the centre of the base."},
			{Word: "apex", Takes: []Kind{KPoint}, Max: 1, Help: "The apex, on the side of the plane's normal."},
			{Word: "top_height", Takes: []Kind{KLength}, Max: 1, Help: "The height at which it is cut off, level with the base."},
		},
		Choices:  []Choice{{Ways: [][]string{{"height"}, {"apex"}}}},
		Measures: append(append([]Measure(nil), polyhedronMeasures...), Measure{Name: "apex", Kind: KPoint, Help: "The apex; of a frustum, where its edges meet."}),
		Example:  "R = rectangle width 80 mm depth 60 mm\nY = pyramid on R height 100 mm\nT = pyramid on R apex (20 mm, 10 mm, 100 mm) top_height 40 mm\n", Subject: "Y",
	},
}
