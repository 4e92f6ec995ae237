package build

import (
	"fmt"

	"epure/lang/catalogue"
	"epure/lang/quantity"
)

// Given is a `given` line of a file: what the command line may set.
type Given struct {
	Name string
	Kind catalogue.Kind
}

// Setting is one NAME=VALUE of the command line.
type Setting struct {
	Name, Text string
	Value      quantity.Value
}

// ReadSetting reads the value of a setting: one literal quantity, as it would
// stand in a file. The error is one sentence, with what to write when that is known.
func ReadSetting(name, text string) (Setting, error) {
	literal, wrong := quantity.Parse(text)
	if wrong == nil {
		return Setting{Name: name, Text: text, Value: literal.Value}, nil
	}
	err := fmt.Errorf("the value of `%s`: %s", name, wrong.Text)
	if wrong.Write != "" {
		err = fmt.Errorf("%w; write `%s`", err, wrong.Write)
	}
	return Setting{}, err
}

// For returns the value of a setting for a given, or an error when it is of
// another kind. The literal 0 goes for any.
func (s Setting) For(g Given) (quantity.Value, error) {
	if g.Kind.Class == catalogue.Unknown {
		return s.Value, nil
	}
	if g.Kind.Class != catalogue.Quantity {
		return s.Value, fmt.Errorf("`%s` is no quantity and cannot be set", s.Name)
	}
	v, ok := s.Value.As(g.Kind.Of)
	if !ok {
		return v, fmt.Errorf("`%s` is %s; `%s` is %s", s.Name, g.Kind.Of, s.Text, s.Value.Kind())
	}
	return v, nil
}
