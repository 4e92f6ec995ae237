package build

import (
	"os"
	"testing"

	"epure/cmd/internal/host/hosttest"
)

// BenchmarkStages runs one example as `check` (all, composed, nothing written) and as `draw`.
func BenchmarkStages(b *testing.B) {
	text, err := os.ReadFile("../../../examples/roof-flashing.epure")
	if err != nil {
		b.Fatal(err)
	}
	w := hosttest.New(map[string]string{"a.epure": string(text)})
	for _, job := range []struct {
		name string
		job  Job
	}{
		{"evaluate", Job{All: true}},
		{"check", Job{All: true, Compose: true}},
		{"draw", Job{Compose: true, Formats: []string{"svg", "pdf"}}},
	} {
		b.Run(job.name, func(b *testing.B) {
			for b.Loop() {
				u := Load(&w.Host, "a.epure")
				u.Run(job.job, &w.Host)
				if u.Failed() {
					b.Fatal(u.Bag.Sorted())
				}
			}
		})
	}
}
