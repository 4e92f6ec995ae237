package pdf

import (
	"bytes"
	"math"
	"testing"

	"github.com/pdfcpu/pdfcpu/pkg/api"
	"github.com/pdfcpu/pdfcpu/pkg/pdfcpu/model"
)

// The second route for the document's structure: pdfcpu's strict validation.
// It stands behind a tag because the module file does not list all that pdfcpu
// imports; drop the tag when it does.

func TestValidInStrictMode(t *testing.T) {
	conf := model.NewDefaultConfiguration()
	conf.ValidationMode = model.ValidationStrict
	ctx, err := api.ReadValidateAndOptimize(bytes.NewReader(write(t, sample())), conf)
	if err != nil {
		t.Fatal(err)
	}
	if ctx.Title != "Hood ⌀ é (1)" || ctx.Author != "N. N." || ctx.XRefTable.CreationDate != "D:20240229000000+00'00'" {
		t.Errorf("title %q, author %q, date %q", ctx.Title, ctx.Author, ctx.XRefTable.CreationDate)
	}
	if p := ctx.ViewerPref; p == nil || p.PrintScaling == nil || p.PrintScaling.String() != "None" {
		t.Error("printing may scale the page")
	}
	dims, err := ctx.PageDims()
	if err != nil || math.Abs(dims[0].Width-1190.5512) > 1e-4 || math.Abs(dims[0].Height-841.8898) > 1e-4 {
		t.Errorf("page %v (%v), want A3: 1190.5512 by 841.8898 (420 and 297 times 72/25.4)", dims, err)
	}
}
