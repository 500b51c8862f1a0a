package rpc

import (
	"sync"

	"google.golang.org/grpc/mem"
)

// shelf is the memory of messages. It keeps what it lends, where the pool of
// grpc loses it at every collection and clears it before it lends it: most of
// what a batch of many rows would cost.
type shelf struct {
	mu   sync.Mutex
	free []*[]byte
}

var _ mem.BufferPool = (*shelf)(nil)

// onShelf is how many messages are kept: one for every call in flight, and its
// answer.
const onShelf = 16

// Get lends memory of a length, which holds anything.
func (s *shelf) Get(length int) *[]byte {
	b := s.best(length)
	if b == nil {
		b = new([]byte)
	}
	if cap(*b) < length {
		*b = make([]byte, length+length/4)
	}
	*b = (*b)[:length]
	return b
}

// best is the smallest that is long enough, or any if none is; nil if there is
// none at all.
func (s *shelf) best(length int) *[]byte {
	s.mu.Lock()
	defer s.mu.Unlock()
	found := -1
	for i, f := range s.free {
		if found < 0 || cap(*f) >= length && (cap(*s.free[found]) < length || cap(*f) < cap(*s.free[found])) {
			found = i
		}
	}
	if found < 0 {
		return nil
	}
	b, last := s.free[found], len(s.free)-1
	s.free[found] = s.free[last]
	s.free = s.free[:last]
	return b
}

// Put takes it back.
func (s *shelf) Put(b *[]byte) {
	s.mu.Lock()
	defer s.mu.Unlock()
	if len(s.free) < onShelf {
		s.free = append(s.free, b)
	}
}
