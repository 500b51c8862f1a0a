package lawtest

import (
	"strings"
	"testing"
)

// distant says how soon it may act.
type distant struct {
	fake
	soonest float64
}

func (d distant) Soonest() float64 { return d.soonest }

// TestDistant: no wait may be shorter than the law says.
func TestDistant(t *testing.T) {
	Run(t, distant{turning(), 1300})
	found := Check(distant{turning(), 1500})
	if len(found) == 0 {
		t.Error("waits shorter than the law says are not found")
	}
	for _, f := range found {
		if f.Question != "foretell" || !strings.Contains(f.Detail, "no wait is shorter than 10^1500 yr") {
			t.Errorf("found %v", f)
		}
	}
}
