package diag

// buildCodes are the codes of files, composing and writing, in alphabetical order.
func buildCodes() []Entry {
	return []Entry{}
}
