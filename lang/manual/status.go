package manual

// ExitStatus is one way in which a command ends.
type ExitStatus struct {
	Status int
	Help   string
}

// ExitStatuses returns all of them. The numbers are a promise to scripts.
func ExitStatuses() []ExitStatus {
	return []ExitStatus{
		{0, "What was asked for is done."},
		{1, "A file is wrong or missing, or a `verify` failed."},
		{2, "The command line is wrong: an unknown option, word or given."},
		{3, "The machine failed: a file cannot be written, or the program has an internal fault."},
	}
}
