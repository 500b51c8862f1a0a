package cli

import (
	"io"
	"sync"
	"time"

	"github.com/vbauerster/mpb/v8"
	"github.com/vbauerster/mpb/v8/decor"
)

// patience is how long a run may take before it shows a bar.
const patience = time.Second

// bar is a progress bar on a terminal that appears once a run lasts longer
// than one has patience for. Its zero value shows nothing.
type bar struct {
	mu          sync.Mutex
	out         io.Writer // nil: never shown
	what        string    // is counted
	begun       time.Time
	progress    *mpb.Progress
	line        *mpb.Bar
	done, total int
	closed      bool
	timer       *time.Timer
}

// newBar is a bar that counts realisations.
func newBar(w io.Writer, quiet bool) *bar { return newBarOf("realisations", w, quiet) }

func newBarOf(what string, w io.Writer, quiet bool) *bar {
	b := &bar{begun: time.Now(), what: what}
	if !quiet && isTerminal(w) {
		b.out = w
		b.timer = time.AfterFunc(patience, b.show)
	}
	return b
}

// set says how far the run is. It may be called from any goroutine.
func (b *bar) set(done, total int) {
	b.mu.Lock()
	defer b.mu.Unlock()
	b.done, b.total = max(b.done, done), total
	if b.line != nil {
		b.line.SetCurrent(int64(b.done))
	}
}

func (b *bar) show() {
	b.mu.Lock()
	defer b.mu.Unlock()
	if b.closed || b.total == 0 {
		if !b.closed {
			b.timer.Reset(patience / 4)
		}
		return
	}
	b.progress = mpb.New(mpb.WithOutput(b.out), mpb.WithWidth(60))
	b.line = b.progress.New(int64(b.total), mpb.BarStyle().Lbound("[").Filler("=").Tip(">").Padding(" ").Rbound("]"),
		mpb.BarRemoveOnComplete(),
		mpb.PrependDecorators(decor.CountersNoUnit("%d of %d "+b.what+" ")),
		mpb.AppendDecorators(decor.NewElapsed(decor.ET_STYLE_GO, b.begun)))
	b.line.SetCurrent(int64(b.done))
}

// close takes the bar off the terminal.
func (b *bar) close() {
	b.mu.Lock()
	b.closed = true
	if b.timer != nil {
		b.timer.Stop()
	}
	progress, line := b.progress, b.line
	b.mu.Unlock()
	if line == nil {
		return
	}
	line.Abort(true)
	progress.Wait()
}
