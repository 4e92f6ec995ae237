package catalogue

const drawnExample = "K = cone diameter 240 mm height 260 mm\nP = plane through (35 mm, 0, 0) along K.generator(180°), rearward\n" +
	"B = part of K above P\nS = section of K by P\nD = development of B seam 180° divisions 12\n"

// ShowWords are the words of `show` and `without`, each with what it draws.
var ShowWords = []Builtin{
	{Name: "hidden", Help: "hidden edges and outlines, dashed (drawn unless taken away)"},
	{Name: "centres", Help: "centre lines (drawn unless taken away)"},
	{Name: "projectors", Help: "the projection lines to the view that this one comes from"},
	{Name: "cutting_planes", Help: "the cutting planes seen edge-on, with their names"},
	{Name: "generators", Help: "the generators of the even divisions"},
	{Name: "numbers", Help: "the numbers of the generators"},
	{Name: "focal_spheres", Help: "the focal spheres and their circles of contact"},
	{Name: "focus", Help: "the foci"},
	{Name: "axis", Help: "the axis of the conic"},
	{Name: "directrix", Help: "the directrices"},
	{Name: "hatching", Help: "hatching of the cut face"},
}

func showWords() []string {
	var words []string
	for _, w := range ShowWords {
		words = append(words, w.Name)
	}
	return words
}

var drawable = []Kind{KSolid, KGroup, KPlane, KLine, KSection, KSphere, KPoint}

var (
	scaleClause = Clause{Word: "scale", Takes: []Kind{KRatio}, Words: []string{"auto"}, Max: 1, Default: "auto", Help: "The scale, as 1:5, or auto for the largest of ISO 5455 at which everything fits."}
	angleClause = Clause{Word: "projection", Words: []string{"first", "third"}, Max: 1, Default: "first", Help: "First-angle or third-angle projection."}
	placeClause = Clause{Word: "at", Takes: []Kind{KPlace}, Max: 1, Default: "arranged", Help: "The place of its lower left corner on paper, in mm from the lower left of the drawing space."}
	ownScale    = Clause{Word: "scale", Takes: []Kind{KRatio}, Max: 1, Default: "the block's", Help: "A scale of its own, written under the view."}
	fromClause  = Clause{Word: "from", Takes: []Kind{KView}, Max: 1, Help: "The view that it is aligned with or folded from."}
	showClause  = Clause{Word: "show", Words: showWords(), Repeat: true, Help: "Construction to draw besides."}
	lessClause  = Clause{Word: "without", Words: showWords(), Repeat: true, Help: "What to leave out that would be drawn."}
	onClause    = Clause{Word: "on", Takes: []Kind{KView}, Max: 1, Needed: true, Help: "The view."}
)

func viewClauses(first ...Clause) []Clause {
	return append(first, fromClause, placeClause, ownScale, showClause, lessClause)
}

func textField(word, help string) Clause {
	return Clause{Word: word, Takes: []Kind{KText}, Max: 1, Help: help}
}

var sheetBlocks = []string{"sheet", "figure"}

var blockForms = []Form{
	{
		Word: "titles", Chapter: chBlocks, Kind: KTitles,
		Help: "The fields of a title block (ISO 7200), to be shared by sheets.",
		More: "Fields that are not given stay empty; with no `status` the sheet says NOT ISSUED.",
		Clauses: []Clause{
			textField("owner", "The legal owner."), textField("number", "The identification number."), textField("revision", "The revision index."),
			textField("date", "The date of issue, as 2026-03-31."), textField("department", "The responsible department."), textField("reference", "The technical reference."),
			textField("creator", "Who made it."), textField("approval", "Who approved it."), textField("document_type", "The type of document."),
			textField("status", "The document status, as Released."), textField("supplement", "The supplementary title."), textField("language", "The language code, as en."),
			textField("material", "The material."), textField("tolerance", "The general tolerances."), textField("sheet", "The number of this sheet."), textField("sheets", "The number of sheets."),
		},
		Example: drawnExample + "T = titles owner \"Demonstration works\" number \"EX-001\" revision \"A\" date \"2026-03-31\" department \"Drawing office\" reference \"Desk 4\"\n" +
			"    creator \"A. Draughtsman\" approval \"B. Checker\" document_type \"Part drawing\" status \"Released\" supplement \"Demonstration\" language \"en\"\n" +
			"    material \"Sheet 1.0\" tolerance \"ISO 2768-m\" sheet \"1\" sheets \"1\"\nhood = sheet \"Rain hood\" titles T {\n    front = elevation of B\n}\n",
		Subject: "T",
	},
	{
		Word: "sheet", Chapter: chBlocks, Kind: Kind{Class: Block}, Text: Must, Block: true,
		Help: "A drawing sheet with frame and title block.",
		More: "The file is named after the block. Views arrange themselves by the projection method.",
		Clauses: []Clause{
			{Word: "size", Words: []string{"A4", "A3", "A2", "A1", "A0"}, Max: 1, Default: "A3", Help: "The size of ISO 5457."},
			{Word: "upright", Takes: []Kind{KYesNo}, Max: 1, Default: "yes for A4, otherwise no", Help: "Whether the long side stands upright."},
			scaleClause, angleClause,
			{Word: "titles", Takes: []Kind{KTitles}, Max: 1, Help: "The fields of the title block."},
		},
		Example: drawnExample + "T = titles owner \"Demonstration works\" number \"EX-001\"\nhood = sheet \"Rain hood\" size A4 upright no scale 1:5 projection third titles T {\n    front = elevation of B faint K\n    top = plan of B from front\n}\n",
		Subject: "hood",
	},
	{
		Word: "figure", Chapter: chBlocks, Kind: Kind{Class: Block}, Text: Must, Block: true,
		Help: "A cropped drawing for a manual, without frame and title block.",
		Clauses: []Clause{
			{Word: "width", Takes: []Kind{KLength}, Max: 1, Help: "The width on paper; with scale auto the drawing fills it."},
			scaleClause, angleClause,
		},
		Example: drawnExample + "cut = figure \"The cut edge\" width 120 mm scale auto projection first {\n    true_shape of S show focus, axis, directrix\n}\n",
		Subject: "cut",
	},
}

var viewForms = []Form{
	{
		Word: "elevation", Chapter: chViews, Kind: KView, Text: Maybe, Within: sheetBlocks,
		Help: "A view on an upright plane, looking rearward unless said otherwise.",
		Clauses: viewClauses(
			Clause{Word: "of", Takes: drawable, Needed: true, Help: "What is drawn: solids, planes, lines, sections, focal spheres, points."},
			Clause{Word: "faint", Takes: []Kind{KSolid, KGroup}, Help: "Solids drawn thin behind, as before cutting."},
			Clause{Word: "along", Takes: []Kind{KDirection, KPoint, KLine}, Max: 1, Default: "rearward", Help: "The direction of sight; level."}),
		Example: drawnExample + "hood = sheet \"Rain hood\" scale 1:5 {\n    front = elevation \"Front\" of B, P faint K at (30 mm, 150 mm) scale 1:5 show cutting_planes, focal_spheres without hidden\n    left = elevation of B along rightward from front\n}\n",
		Subject: "front",
	},
	{
		Word: "plan", Chapter: chViews, Kind: KView, Text: Maybe, Within: sheetBlocks,
		Help: "The view from above.",
		Clauses: viewClauses(
			Clause{Word: "of", Takes: drawable, Needed: true, Help: "What is drawn."},
			Clause{Word: "faint", Takes: []Kind{KSolid, KGroup}, Help: "Solids drawn thin behind, as before cutting."}),
		Example: drawnExample + "hood = sheet \"Rain hood\" {\n    front = elevation of B\n    top = plan of B, S.focus faint K from front show projectors, generators, numbers without centres\n}\nsecond = sheet \"Plan alone\" {\n    plan of B at (40 mm, 60 mm) scale 1:5\n}\n",
		Subject: "top",
	},
	{
		Word: "view", Chapter: chViews, Kind: KView, Text: Maybe, Within: sheetBlocks,
		Help: "An auxiliary view along any direction.",
		Clauses: viewClauses(
			Clause{Word: "of", Takes: drawable, Needed: true, Help: "What is drawn."},
			Clause{Word: "along", Takes: []Kind{KDirection, KPoint, KLine}, Max: 1, Needed: true, Help: "The direction of sight."},
			Clause{Word: "faint", Takes: []Kind{KSolid, KGroup}, Help: "Solids drawn thin behind, as before cutting."}),
		Example: drawnExample + "hood = sheet \"Rain hood\" scale 1:5 {\n    front = elevation of B\n    aux = view \"On the cut\" of B along (1, 0, -1) faint K from front show hidden without centres\n    view of B along (1, 2, -1) at (200 mm, 100 mm) scale 1:10\n}\n",
		Subject: "aux",
	},
	{
		Word: "section_view", Chapter: chViews, Kind: KView, Text: Maybe, Within: sheetBlocks,
		Help: "What lies behind a cutting plane, with the cut faces hatched, looking against the plane's normal.",
		More: "Neighbouring solids are hatched the opposite way. Hidden lines are left out unless asked for. On the view that it comes `from`, the plane is drawn with its name and arrows that show the direction of sight.",
		Clauses: viewClauses(
			Clause{Word: "of", Takes: []Kind{KSolid, KGroup}, Needed: true, Help: "The solids."},
			Clause{Word: "by", Takes: []Kind{KPlane}, Max: 1, Needed: true, Help: "The cutting plane."}),
		Example: drawnExample + "M = plane through (0, 0, 0) normal frontward\nhood = sheet \"Rain hood\" {\n    top = plan of B\n    sec = section_view of B by M from top show hidden without centres\n}\nsecond = sheet \"Alone\" {\n    section_view \"M–M\" of B by M at (40 mm, 60 mm) scale 1:5\n}\n",
		Subject: "sec",
	},
	{
		Word: "pictorial", Chapter: chViews, Kind: KView, Text: Maybe, Within: sheetBlocks,
		Help: "A pictorial view of ISO 5456-3, from the right, in front and above.",
		More: "Lengths along the axes keep their size; in a dimetric and a cabinet view those from front to back are halved. Hidden lines and centre lines are drawn only when asked for, and nothing is dimensioned on it.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KSolid, KGroup, KLine, KSection, KPoint}, Needed: true, Help: "What is drawn: solids, lines, sections, points."},
			{Word: "as", Words: []string{"isometric", "dimetric", "cavalier", "cabinet", "planometric"}, Max: 1, Default: "isometric", Help: "The kind."},
			{Word: "faint", Takes: []Kind{KSolid, KGroup}, Help: "Solids drawn thin behind, as before cutting."},
			placeClause, ownScale, showClause, lessClause,
		},
		Example: drawnExample + "hood = sheet \"Rain hood\" {\n    pic = pictorial \"Isometric view\" of B as isometric faint K show hidden without centres\n    pictorial of B as cabinet\n}\nsecond = sheet \"Oblique\" {\n    pictorial of B as planometric at (40 mm, 60 mm) scale 1:5\n}\n",
		Subject: "pic",
	},
	{
		Word: "true_shape", Chapter: chViews, Kind: KView, Text: Maybe, Within: sheetBlocks,
		Help: "A section seen square to its plane.",
		Clauses: viewClauses(
			Clause{Word: "of", Takes: []Kind{KSection}, Max: 1, Needed: true, Help: "The section."}),
		Example: drawnExample + "hood = sheet \"Rain hood\" {\n    front = elevation of B\n    cut = true_shape \"The cut\" of S from front show focus, axis, directrix, hatching without centres\n}\nsecond = sheet \"Cut alone\" {\n    true_shape of S at (40 mm, 60 mm) scale 1:2\n}\n",
		Subject: "cut",
	},
	{
		Word: "pattern", Chapter: chViews, Kind: KView, Text: Maybe, Within: sheetBlocks,
		Help: "A development, laid flat.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KPattern}, Max: 1, Needed: true, Help: "The development."},
			placeClause, ownScale, showClause, lessClause,
		},
		Example: drawnExample + "flat = sheet \"Pattern\" size A2 {\n    p = pattern \"Hood\" of D show generators, numbers without centres\n}\nsecond = sheet \"Pattern alone\" {\n    pattern of D at (20 mm, 80 mm) scale 1:5\n}\n",
		Subject: "p",
	},
}

var markForms = []Form{
	{
		Word: "dimension", Chapter: chMarks, Kind: Kind{Class: Mark}, Within: sheetBlocks,
		Help: "A dimension on a view: a measure of a thing, or the distance between two points.",
		More: "The figure comes from the geometry and cannot be typed. What is not seen true on the view is an error that names a view where it is.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KLength, KAngle}, Max: 1, Measured: true, Help: "A measure, as K.height or K.base.diameter."},
			{Word: "through", Takes: []Kind{KPoint}, Max: 2, Help: "Two points."},
			onClause,
			{Word: "nearest", Takes: []Kind{KLength, KAngle}, Max: 1, Default: "0.1 mm, 0.1°", Help: "The step to which the figure is rounded; its unit is the unit of the figure."},
		},
		Choices: []Choice{{Ways: [][]string{{"of"}, {"through"}}}},
		Example: drawnExample + "hood = sheet \"Rain hood\" {\n    front = elevation of B\n    dimension of K.height on front nearest 1 mm\n    dimension through K.apex, S.vertex on front\n}\n",
	},
	{
		Word: "label", Chapter: chMarks, Kind: Kind{Class: Mark}, Text: Must, Within: sheetBlocks,
		Help: "A short text beside a point of one or more views.",
		Clauses: []Clause{
			{Word: "at", Takes: []Kind{KPoint}, Max: 1, Needed: true, Help: "The point."},
			{Word: "on", Takes: []Kind{KView}, Needed: true, Help: "The views."},
		},
		Example: drawnExample + "hood = sheet \"Rain hood\" {\n    front = elevation of B\n    label \"V\" at S.vertex on front\n}\n",
	},
	{
		Word: "note", Chapter: chMarks, Kind: Kind{Class: Mark}, Text: Must, Within: sheetBlocks,
		Help:    "A text on the sheet.",
		Clauses: []Clause{placeClause},
		Example: drawnExample + "hood = sheet \"Rain hood\" {\n    front = elevation of B\n    note \"Slant {K.slant nearest 0.1 mm}.\"\n    note \"Material by others.\" at (20 mm, 100 mm)\n}\n",
	},
	{
		Word: "table", Chapter: chMarks, Kind: Kind{Class: Mark}, Text: Maybe, Within: sheetBlocks,
		Help: "A table: of a development its true lengths, of other things their measures.",
		Clauses: []Clause{
			{Word: "of", Takes: []Kind{KPattern, KSolid, KSection, KSphere, KPlane, KLine}, Needed: true, Help: "The things."},
			placeClause,
			{Word: "nearest", Takes: []Kind{KLength}, Max: 1, Default: "0.1 mm", Help: "The step to which lengths are rounded; its unit is the unit of the table."},
		},
		Example: drawnExample + "hood = sheet \"Rain hood\" {\n    front = elevation of B\n    table \"True lengths\" of D nearest 0.5 mm\n    table of S at (20 mm, 60 mm)\n}\n",
	},
}
