package rpc_test

import (
	"testing"

	"github.com/google/go-cmp/cmp"
	"github.com/google/go-cmp/cmp/cmpopts"
	"wane/plugins"
	"wane/sim/law/lawtest"
)

func TestCardsCross(t *testing.T) {
	laws, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	for _, inside := range laws.All() {
		card := inside.Describe()
		outside := open(t, startOf(t, card.Process+"/"+card.Name))
		if diff := cmp.Diff(card, outside.Describe(), cmpopts.EquateEmpty()); diff != "" {
			t.Errorf("%s/%s: inside and outside differ:\n%s", card.Process, card.Name, diff)
		}
		t.Log(outside.Runtime(), outside.Stderr())
	}
}

// TestAnswersCross asks every law every question, inside and outside, in calls
// of all sizes, and compares bits.
func TestAnswersCross(t *testing.T) {
	laws, err := plugins.Builtin()
	if err != nil {
		t.Fatal(err)
	}
	for _, inside := range laws.All() {
		card := inside.Describe()
		for _, rows := range []int{0, 97} { // 0: the usual
			s := startOf(t, card.Process+"/"+card.Name)
			s.Rows, s.OnlyCalls = rows, rows == 0
			outside := open(t, s)
			for _, q := range card.Questions {
				for _, n := range []int{0, 1, 1000, 20000} {
					if rows > 0 && n > 1000 {
						continue // two hundred calls tell no more than ten
					}
					in := lawtest.Rows(inside, q.Name, n)
					want, err1 := inside.Answer(q.Name, in)
					got, err2 := outside.Answer(q.Name, in)
					if err1 != nil || err2 != nil {
						t.Fatalf("%s/%s: %s: inside %v, outside %v", card.Process, card.Name, q.Name, err1, err2)
					}
					if diff := lawtest.Differ(want, got); diff != "" {
						t.Errorf("%s/%s: %s, %d rows in calls of %d: %s", card.Process, card.Name, q.Name, n, rows, diff)
					}
				}
			}
		}
	}
}
