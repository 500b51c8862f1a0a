package ensemble

import (
	"context"
	"errors"
	"fmt"
	"runtime"
	"sync"
	"sync/atomic"
)

// Finished is what came of a run of many realisations.
type Finished[T any] struct {
	// Results are those of the finished realisations, in ascending order;
	// Realisations are their numbers. Unless Interrupted, that is 0 .. n-1.
	Results      []T
	Realisations []int
	// Interrupted says that the context ended before all were finished.
	Interrupted bool
}

// Each runs do for realisations 0 .. n-1 on several workers and returns the
// results in the order of realisations: if do is a function of the
// realisation alone, they do not depend on the number of workers.
//
// newWorker makes one worker's workspace, which only that worker uses.
// Workers below 1 stands for one per processor. Realisations are handed out in
// ascending order to whoever is free. progress, which may be nil, is called by
// one worker at a time, after each realisation.
//
// The first error stops the run: no further realisation is handed out, those
// under way are finished, and the error of the lowest realisation is
// returned, whatever the order in which they failed. The end of the context is
// no error: what is finished is returned as such. A do that watches the
// context itself may give up by returning its error. All workers have returned
// when Each does.
func Each[W, T any](ctx context.Context, n, workers int, newWorker func() W,
	do func(worker W, realisation int) (T, error), progress func(done, total int)) (Finished[T], error) {
	if workers < 1 {
		workers = runtime.GOMAXPROCS(0)
	}
	n = max(n, 0)
	workers = min(workers, n)
	p := pool[T]{results: make([]T, n), errs: make([]error, n), finished: make([]bool, n), progress: progress}
	var group sync.WaitGroup
	for range workers {
		group.Go(func() {
			w := newWorker()
			for ctx.Err() == nil && !p.failed.Load() {
				r := int(p.next.Add(1)) - 1
				if r >= n {
					return
				}
				result, err := do(w, r)
				p.finish(ctx, r, result, err)
			}
		})
	}
	group.Wait()
	return p.collect()
}

// pool is the shared state of a run. Each element of its slices is written by
// the worker that has the realisation, and read when all have returned.
type pool[T any] struct {
	next     atomic.Int64
	failed   atomic.Bool
	results  []T
	errs     []error
	finished []bool

	mu       sync.Mutex
	done     int
	progress func(done, total int)
}

func (p *pool[T]) finish(ctx context.Context, r int, result T, err error) {
	if err != nil {
		if ctx.Err() == nil || !errors.Is(err, ctx.Err()) {
			p.errs[r] = err
			p.failed.Store(true)
		}
		return
	}
	p.results[r], p.finished[r] = result, true
	if p.progress == nil {
		return
	}
	p.mu.Lock()
	defer p.mu.Unlock()
	p.done++
	p.progress(p.done, len(p.results))
}

func (p *pool[T]) collect() (Finished[T], error) {
	for r, err := range p.errs {
		if err != nil {
			return Finished[T]{}, fmt.Errorf("ensemble: realisation %d: %w", r, err)
		}
	}
	var f Finished[T]
	for r, ok := range p.finished {
		if ok {
			f.Results = append(f.Results, p.results[r])
			f.Realisations = append(f.Realisations, r)
		}
	}
	f.Interrupted = len(f.Results) < len(p.results)
	return f, nil
}
