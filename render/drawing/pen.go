package drawing

// Line widths and types, after ISO 128-2:2020 and its list of uses for
// mechanical drawings (ISO 128-24 numbering). Two widths are used on a sheet,
// 2 : 1, and a third for lettering; a Group names the three.

// Group is a line group of ISO 128-2: the widths in mm of wide and narrow
// lines, and of lettering and graphical symbols.
type Group struct{ Wide, Narrow, Text float64 }

// Group05 returns the line group for sheets up to A2.
func Group05() Group { return Group{0.5, 0.25, 0.35} }

// Group07 returns the line group for A1 and A0.
func Group07() Group { return Group{0.7, 0.35, 0.5} }

// largeSheet is the longer side in mm from which group 0.7 is used. It lies
// between A2 (594) and A1 (841).
const largeSheet = 700

// GroupFor returns the line group for a sheet of width by height mm.
func GroupFor(width, height float64) Group {
	if max(width, height) > largeSheet {
		return Group07()
	}
	return Group05()
}

// Visible draws visible edges and outlines (01.2).
func (g Group) Visible() Pen { return Pen{g.Wide, Continuous} }

// Hidden draws hidden edges and outlines (02.1).
func (g Group) Hidden() Pen { return Pen{g.Narrow, Dashed} }

// Thin draws dimensions, projectors, construction, generators, bend lines,
// hatching and imaginary intersections (01.1).
func (g Group) Thin() Pen { return Pen{g.Narrow, Continuous} }

// Centre draws centre lines and axes of symmetry (04.1).
func (g Group) Centre() Pen { return Pen{g.Narrow, LongDashDot} }

// Cutting draws the ends and bends of a cutting plane (04.2). Between them the
// plane is drawn with Centre.
func (g Group) Cutting() Pen { return Pen{g.Wide, LongDashDot} }

// Former draws outlines that are no longer there (05.1).
func (g Group) Former() Pen { return Pen{g.Narrow, LongDashTwoDot} }

// Symbol draws graphical symbols and the lines of tables and title blocks.
func (g Group) Symbol() Pen { return Pen{g.Text, Continuous} }

// Pen returns the pen for a role; Lettering has none.
func (g Group) Pen(r Role) Pen {
	switch r {
	case VisibleEdge, PatternEdge:
		return g.Visible()
	case HiddenEdge:
		return g.Hidden()
	case CentreLine:
		return g.Centre()
	case CuttingPlane:
		return g.Cutting()
	case FormerShape:
		return g.Former()
	case Furniture:
		return g.Symbol()
	case Lettering:
		return Pen{}
	}
	return g.Thin()
}
