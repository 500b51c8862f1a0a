package engine

import (
	"context"
	"runtime"
	"testing"
)

// TestMemoryPerObject holds a workspace to the bytes per object that DEVELOPERS.md
// promises: a class runs a million objects on an ordinary laptop.
func TestMemoryPerObject(t *testing.T) {
	const n = 500_000
	setup, err := toySetup(n, 1)
	if err != nil {
		t.Fatal(err)
	}
	m, err := Compile(setup)
	if err != nil {
		t.Fatal(err)
	}
	var before, after runtime.MemStats
	runtime.GC()
	runtime.ReadMemStats(&before)
	w := m.NewWorkspace()
	for r := range 2 {
		if _, err := w.Run(context.Background(), uint64(r)); err != nil {
			t.Fatal(err)
		}
	}
	runtime.GC()
	runtime.ReadMemStats(&after)
	runtime.KeepAlive(w)
	if per := float64(after.HeapAlloc-before.HeapAlloc) / n; per > 110 {
		t.Errorf("%.0f bytes an object, want at most 110", per)
	} else {
		t.Logf("%.0f bytes an object", per)
	}
}

// TestNoAllocationPerEvent: a realisation allocates by the chunk and by the
// refresh, never by the object or the event.
func TestNoAllocationPerEvent(t *testing.T) {
	const n = 200_000
	setup, err := toySetup(n, 1)
	if err != nil {
		t.Fatal(err)
	}
	m, err := Compile(setup)
	if err != nil {
		t.Fatal(err)
	}
	w := m.NewWorkspace()
	realisation, events := uint64(0), int64(0)
	run := func() {
		o, err := w.Run(context.Background(), realisation)
		if err != nil {
			t.Fatal(err)
		}
		realisation++
		events = o.Events
	}
	run() // takes the memory that every later run uses
	run()
	if allocations := testing.AllocsPerRun(3, run); allocations > 0.05*float64(events) {
		t.Errorf("%.0f allocations in %d events", allocations, events)
	}
}
