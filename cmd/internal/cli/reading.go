package cli

import (
	"fmt"
	"strconv"
	"strings"

	"epure/eval/scene"
	"epure/geom/vec"
	"epure/lang/quantity"
)

// reading is a value as it is printed: the same numbers for people, for JSON
// and for tables. Exactly one of number, text, yes and coordinates is in use,
// by the kind.
type reading struct {
	kind        string // "number", "length", "area" ... as in the JSON
	unit        string // "mm", "mm²", "°" ...; "" for none
	number      float64
	text        string
	yes         bool
	coordinates []coordinates
}

// coordinates are the numbers of a point or a direction. Those of a line or a
// plane have names.
type coordinates struct {
	name   string
	unit   string
	values []float64
}

// read returns the reading of a value; ok is false for a value that is a thing
// with measures of its own and no number.
func read(v scene.Value) (r reading, ok bool) {
	switch v := v.(type) {
	case scene.Quantity:
		return readQuantity(v.Value), true
	case scene.Text:
		return reading{kind: "text", text: string(v)}, true
	case scene.YesNo:
		return reading{kind: "yes or no", yes: bool(v)}, true
	case scene.Triple:
		kind, unit := coordinateKind(v.Of, "point", "direction")
		return reading{kind: kind, unit: unit, coordinates: []coordinates{triple("", unit, v.V)}}, true
	case scene.Pair:
		kind, unit := coordinateKind(v.Of, "place", "direction")
		return reading{kind: kind, unit: unit, coordinates: []coordinates{{unit: unit, values: []float64{plain(v.V.X), plain(v.V.Y)}}}}, true
	case *scene.Line:
		return readLine(v), true
	case *scene.Plane:
		return reading{kind: "plane", unit: "mm", coordinates: []coordinates{
			triple("through", "mm", v.F.O), triple("normal", "", v.F.Z)}}, true
	}
	return reading{}, false
}

// readLine shows the ends of a line that has them.
func readLine(l *scene.Line) reading {
	r := reading{kind: "line", unit: "mm", coordinates: []coordinates{
		triple("through", "mm", l.Through), triple("along", "", l.Along)}}
	if l.Ends {
		r.coordinates = append(r.coordinates, triple("from", "mm", l.From), triple("to", "mm", l.To))
	}
	return r
}

// readQuantity names the kind and unit of a quantity: mm to a power, degrees,
// or a bare number; a ratio is a number, 20 % is 0.2.
func readQuantity(v quantity.Value) reading {
	r := reading{number: plain(v.Float())}
	switch v.Kind() {
	case quantity.Number, quantity.Zero:
		r.kind = "number"
	case quantity.Ratio:
		r.kind = "ratio"
	case quantity.Length:
		r.kind, r.unit = "length", "mm"
	case quantity.Area:
		r.kind, r.unit = "area", "mm²"
	case quantity.Volume:
		r.kind, r.unit = "volume", "mm³"
	case quantity.Angle:
		r.kind, r.unit = "angle", "°"
	default:
		r.kind, r.unit = strings.TrimPrefix(v.Kind().String(), "a "), oddUnit(v.Kind())
	}
	return r
}

// oddUnit spells the unit of a kind that has no name of its own.
func oddUnit(k quantity.Kind) string {
	length, angle := k.Powers()
	var unit []string
	if length != 0 {
		unit = append(unit, fmt.Sprintf("mm^%d", length))
	}
	if angle != 0 {
		unit = append(unit, "°")
	}
	return strings.Join(unit, "·")
}

// coordinateKind tells points from directions. (0, 0, 0) without a unit goes
// for both and is printed as a point.
func coordinateKind(of quantity.Kind, point, direction string) (kind, unit string) {
	if of == quantity.Number {
		return direction, ""
	}
	return point, "mm"
}

func triple(name, unit string, v vec.V3) coordinates {
	return coordinates{name: name, unit: unit, values: []float64{plain(v.X), plain(v.Y), plain(v.Z)}}
}

// plain turns a negative zero into zero.
func plain(x float64) float64 {
	if x == 0 {
		return 0
	}
	return x
}

// decimal writes the shortest decimal that reads back to the same float64.
func decimal(x float64) string {
	s := strconv.FormatFloat(x, 'f', -1, 64)
	if e := strconv.FormatFloat(x, 'e', -1, 64); len(s) > maxPlain && len(e) < len(s) {
		return e
	}
	return s
}

// maxPlain is the longest decimal, in bytes, that is written without an exponent:
// sign, point and the 17 figures of a float64, with room for five zeros.
const maxPlain = 24

// String writes the reading for people.
func (r reading) String() string {
	switch {
	case r.kind == "text":
		return strconv.Quote(r.text)
	case r.kind == "yes or no":
		return yesNo(r.yes)
	case r.coordinates == nil:
		return withUnit(decimal(r.number), r.unit)
	}
	var parts []string
	for _, c := range r.coordinates {
		parts = append(parts, strings.TrimPrefix(c.name+" ", " ")+withUnit("("+strings.Join(c.decimals(), ", ")+")", c.unit))
	}
	return strings.Join(parts, "  ")
}

func (c coordinates) decimals() []string {
	var out []string
	for _, x := range c.values {
		out = append(out, decimal(x))
	}
	return out
}

func withUnit(figures, unit string) string {
	switch unit {
	case "":
		return figures
	case "°":
		return figures + unit
	}
	return figures + " " + unit
}

func yesNo(yes bool) string {
	if yes {
		return "yes"
	}
	return "no"
}
