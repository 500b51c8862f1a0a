package engine_test

import (
	"fmt"
	"os"
	"strconv"
	"testing"
	"time"

	"pgregory.net/rapid"

	"wane/sim/engine"
)

type catcher struct{ msg string }

func (c *catcher) Helper() {}
func (c *catcher) Fatalf(f string, a ...any) {
	c.msg = fmt.Sprintf(f, a...)
	panic(c)
}

func TestZZ(t *testing.T) {
	from, _ := strconv.Atoi(os.Getenv("FROM"))
	to, _ := strconv.Atoi(os.Getenv("TO"))
	bad := 0
	for i := from; i < to && bad < 4; i++ {
		start := time.Now()
		gen := rapid.Custom(func(t *rapid.T) engine.Setup { return scenario(t) })
		s := gen.Example(i)
		if os.Getenv("SHOW") != "" {
			for _, u := range s.Set.All() {
				fmt.Printf("%s %v %+v\n", u.ID(), u.Card.Clocks, u.Law)
			}
			fmt.Printf("%+v\n", s)
		}
		fmt.Fprintf(os.Stderr, "%d n=%d ", i, s.Objects)
		func() {
			defer func() {
				if p := recover(); p != nil {
					if c, ok := p.(*catcher); ok {
						bad++
						m := c.msg
						if len(m) > 1500 {
							m = m[:1500]
						}
						t.Errorf("%d: %s", i, m)
						return
					}
					panic(p)
				}
			}()
			compare(&catcher{}, s, 1)
		}()
		fmt.Fprintln(os.Stderr, time.Since(start).Round(time.Millisecond))
	}
}
