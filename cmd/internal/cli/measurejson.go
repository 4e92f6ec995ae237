package cli

import (
	"bytes"
	"encoding/json"

	"epure/cmd/internal/build"
	"epure/eval/scene"
)

// The JSON form keeps things and measures in the order of the file, which a Go
// map would lose; so objects are written member by member.

// object is a JSON object with its members in order.
type object []member

type member struct {
	name  string
	value any
}

// MarshalJSON writes the members in order.
func (o object) MarshalJSON() ([]byte, error) {
	var b bytes.Buffer
	b.WriteByte('{')
	for i, m := range o {
		if i > 0 {
			b.WriteByte(',')
		}
		name, err := marshal(m.name)
		if err != nil {
			return nil, err
		}
		value, err := marshal(m.value)
		if err != nil {
			return nil, err
		}
		b.Write(name)
		b.WriteByte(':')
		b.Write(value)
	}
	b.WriteByte('}')
	return b.Bytes(), nil
}

// marshal writes a value without the escapes that HTML would need.
func marshal(v any) ([]byte, error) {
	var b bytes.Buffer
	e := json.NewEncoder(&b)
	e.SetEscapeHTML(false)
	if err := e.Encode(v); err != nil {
		return nil, err
	}
	return bytes.TrimRight(b.Bytes(), "\n"), nil
}

// jsonScene is the object of one file and case.
func jsonScene(u *build.Unit, s *scene.Scene, want selection) object {
	things := object{}
	for _, t := range s.Things {
		if t.Name == "" || !want.thing(t.Name) {
			continue
		}
		measures := object{}
		for _, m := range t.Measures {
			if r, ok := read(m.Value); ok && want.measure(t.Name, m.Name) {
				measures = append(measures, member{m.Name, r.json()})
			}
		}
		things = append(things, member{t.Name, object{{"form", t.Form}, {"measures", measures}}})
	}
	return object{{"file", u.Name}, {"case", s.Case}, {"things", things}, {"verify", jsonVerifies(s)}}
}

// json is the object of a value.
func (r reading) json() object {
	o := object{{"value", r.jsonValue()}, {"kind", r.kind}}
	if r.unit != "" {
		o = append(o, member{"unit", r.unit})
	}
	return o
}

func (r reading) jsonValue() any {
	switch {
	case r.kind == "text":
		return r.text
	case r.kind == "yes or no":
		return r.yes
	case r.coordinates == nil:
		return r.number
	case r.coordinates[0].name == "":
		return r.coordinates[0].values
	}
	o := object{}
	for _, c := range r.coordinates {
		o = append(o, member{c.name, c.values})
	}
	return o
}

func jsonVerifies(s *scene.Scene) []object {
	out := []object{}
	for _, v := range s.Verify {
		o := object{{"source", v.Source}, {"holds", v.Holds}}
		if line, _ := v.Span.Position(); line > 0 {
			o = append(o, member{"line", line})
		}
		if v.Text != "" {
			o = append(o, member{"text", v.Text})
		}
		o = append(o, member{"op", v.Op})
		o = appendReading(o, "left", v.Left)
		o = appendReading(o, "right", v.Right)
		if v.Within != nil {
			o = append(o, member{"within", readQuantity(*v.Within).json()})
		}
		if v.Difference != nil {
			o = append(o, member{"difference", readQuantity(*v.Difference).json()})
		}
		if v.Corner != "" {
			o = append(o, member{"corner", v.Corner})
		}
		out = append(out, o)
	}
	return out
}

func appendReading(o object, name string, v scene.Value) object {
	if r, ok := read(v); ok {
		return append(o, member{name, r.json()})
	}
	return o
}
