package cli

// Exit codes.
const (
	ExitOK          = 0
	ExitFailed      = 1
	ExitBadInput    = 2
	ExitCheckFails  = 3
	ExitInterrupted = 130
)

const exitCodes = `
Exit codes:
  0 ok, 1 the run failed, 2 bad input, 3 a check does not hold, 130 interrupted
`

// fault is an error with the exit code it leads to. A nil err prints nothing.
type fault struct {
	code int
	err  error
}

func (f *fault) Error() string {
	if f.err == nil {
		return ""
	}
	return f.err.Error()
}

func (f *fault) Unwrap() error { return f.err }

// failed is the fault of a run or a law, not of the input.
func failed(err error) error { return &fault{ExitFailed, err} }

// bad is a fault of the input that is explained well enough by itself.
func bad(err error) error { return &fault{ExitBadInput, err} }
