package house

import (
	"sync"
	"testing"
)

// tree reads the sources once for all tests of the package.
var tree = sync.OnceValues(func() ([]Source, error) {
	top, err := Top()
	if err != nil {
		return nil, err
	}
	return Sources(top)
})

// sources returns the Go files of the house.
func sources(t *testing.T) []Source {
	t.Helper()
	all, err := tree()
	if err != nil {
		t.Fatal(err)
	}
	if len(all) < 100 {
		t.Fatalf("only %d Go files found: the rules would be checked against nothing", len(all))
	}
	return all
}

// top returns the top folder.
func top(t *testing.T) string {
	t.Helper()
	folder, err := Top()
	if err != nil {
		t.Fatal(err)
	}
	return folder
}
