package diag

// buildCodes are the codes of files, composing and writing, in alphabetical order.
func buildCodes() []Entry {
	c := func(code Code, meaning, example string) Entry { return Entry{code, StageBuild, meaning, example} }
	return []Entry{
		c("cannot-fold", "A view cannot be folded from the view that it names.", cone+"s = sheet \"S\" {\n    front = elevation of K\n    aux = view of K along (1, 2, -1) from front\n}\n"),
		c("cannot-read", "A file cannot be read.", ""),
		c("nothing-seen", "A view has nothing to draw.", cone+"s = sheet \"S\" {\n    front = elevation of K\n    top = plan of ground\n}\n"),
		c("not-true", "A dimension is not seen in its true size on that view.", cone+"s = sheet \"S\" {\n    front = elevation of K\n    top = plan of K from front\n    dimension of K.height on top\n}\n"),
		c("off-sheet", "A view stands outside of the drawing space.", cone+"s = sheet \"S\" {\n    front = elevation of K at (5000 mm, 0 mm)\n}\n"),
		c("same-output", "Two drawings would be written under one name.", ""),
		c("sheet-full", "The views do not fit the sheet at the scale that is asked for.", cone+"s = sheet \"S\" size A4 scale 1:1 {\n    front = elevation of K\n    top = plan of K from front\n}\n"),
	}
}
