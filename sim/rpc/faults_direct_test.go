//go:build linux

package rpc_test

import (
	"context"
	"testing"
	"time"

	"wane/sim/law"
	"wane/sim/rpc"
)

// Faults at the socket that a law may offer for batches: what is no message is
// a process to be replaced, and in the end a fault that is named.
func TestFaultsOfDirectSockets(t *testing.T) {
	leavesNothing(t)
	for fault, words := range map[string][]string{
		"direct-outside": nil, // is not gone to: calls will do
		"direct-missing": {"the connection broke off: ", "no such file or directory", "it had been started again 2 times before", "made by hand"},
		"direct-closed":  {"the connection broke off: ", "it had been started again 2 times before"},
		"direct-cut":     {"the connection broke off: unexpected EOF", "it had been started again 2 times before"},
		"direct-huge":    {"a message of 4294967295 bytes, want at most 67108864"},
		"direct-two":     {"more than one message"},
		"direct-silent":  {"no answer within 400ms", "it had been started again 2 times before"},
		"direct-garbage": {"a message that cannot be read"},
	} {
		t.Run(fault, func(t *testing.T) {
			t.Parallel()
			s := faulty(t, fault, hole)
			s.Answering = 400 * time.Millisecond
			if words == nil {
				s.Answering = 0
			}
			l, err := rpc.Open(context.Background(), s)
			if err != nil {
				t.Fatal(err)
			}
			defer l.Close()
			within(t, 2*soon, func() {
				_, err = law.NewUse(l).Ask("wear", holes(5))
				if words != nil {
					says(t, err, append([]string{"law ./my-burden (evaporation/black-body): question wear: "}, words...)...)
				} else if err != nil {
					t.Error(err)
				}
			})
		})
	}
}
