package ensemble

import (
	"context"
	"errors"
	"runtime"
	"slices"
	"strings"
	"sync/atomic"
	"testing"
	"time"
)

func TestResultsDoNotDependOnWorkers(t *testing.T) {
	const n = 100
	for _, workers := range []int{0, 1, 2, 8, 1000} {
		type space struct{ busy atomic.Bool }
		last := 0
		got, err := Each(t.Context(), n, workers, func() *space { return new(space) },
			func(w *space, r int) (int, error) {
				if !w.busy.CompareAndSwap(false, true) {
					t.Error("one workspace used by two at once")
				}
				defer w.busy.Store(false)
				for range (n - r) % 7 {
					runtime.Gosched()
				}
				return r * r, nil
			},
			func(done, total int) {
				if done != last+1 || total != n {
					t.Errorf("progress %d of %d after %d", done, total, last)
				}
				last = done
			})
		if err != nil || got.Interrupted || len(got.Results) != n || last != n {
			t.Fatalf("%d workers: %d results, interrupted %v, progress %d: %v", workers, len(got.Results), got.Interrupted, last, err)
		}
		for r, v := range got.Results {
			if v != r*r || got.Realisations[r] != r {
				t.Fatalf("%d workers: result %d is %d of realisation %d", workers, r, v, got.Realisations[r])
			}
		}
	}
}

func TestNothingToDo(t *testing.T) {
	for _, n := range []int{0, -1} {
		got, err := Each(t.Context(), n, 4, func() int { return 0 }, func(int, int) (int, error) { return 0, nil }, nil)
		if err != nil || len(got.Results) != 0 || got.Interrupted {
			t.Errorf("n = %d: %+v, %v", n, got, err)
		}
	}
}

// Realisation 3 fails late, after 4 has failed: its error is the one.
func TestErrorOfTheLowest(t *testing.T) {
	three := errors.New("three")
	fourFailed := make(chan bool)
	var ran atomic.Int64
	_, err := Each(t.Context(), 1000, 2, func() int { return 0 }, func(_, r int) (int, error) {
		ran.Add(1)
		switch r {
		case 3:
			<-fourFailed
			return 0, three
		case 4:
			close(fourFailed)
			return 0, errors.New("four")
		}
		return r, nil
	}, nil)
	if !errors.Is(err, three) || !strings.Contains(err.Error(), "realisation 3") {
		t.Errorf("got %v, want the error of realisation 3", err)
	}
	if ran.Load() > 10 {
		t.Errorf("%d realisations ran after the failure of 3 and 4", ran.Load()-5)
	}
}

func TestInterrupted(t *testing.T) {
	before := runtime.NumGoroutine()
	for _, givesUp := range []bool{false, true} {
		ctx, cancel := context.WithCancel(t.Context())
		got, err := Each(ctx, 50, 3, func() int { return 0 }, func(_, r int) (int, error) {
			switch {
			case r == 20:
				cancel()
			case givesUp && ctx.Err() != nil:
				return 0, ctx.Err()
			}
			return r + 1, nil
		}, nil)
		cancel()
		if err != nil || !got.Interrupted || len(got.Results) < 18 || len(got.Results) == 50 {
			t.Fatalf("%d results, interrupted %v: %v", len(got.Results), got.Interrupted, err)
		}
		if !slices.IsSorted(got.Realisations) {
			t.Errorf("realisations out of order: %v", got.Realisations)
		}
		for i, r := range got.Realisations {
			if got.Results[i] != r+1 {
				t.Errorf("result %d does not belong to realisation %d", got.Results[i], r)
			}
		}
	}
	for deadline := time.Now().Add(5 * time.Second); runtime.NumGoroutine() > before; {
		if time.Now().After(deadline) {
			t.Fatalf("%d goroutines, %d before", runtime.NumGoroutine(), before)
		}
		time.Sleep(time.Millisecond)
	}
}
