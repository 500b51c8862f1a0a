package main

import (
	"encoding/binary"
	"fmt"
	"io"
	"net"
	"os"
	"path/filepath"
	"sync"
	"time"

	"google.golang.org/protobuf/proto"
	"wane/sim/rpc/wire"
)

// Faults at the socket that a law may offer besides its calls.
func init() {
	for word, h := range map[string]handmade{
		"direct-missing": {socket: "nothing"},
		"direct-outside": {socket: "../../elsewhere"}, // not gone to: no fault
		"direct-closed":  {direct: func(c net.Conn) { c.Close() }},
		"direct-silent":  {direct: func(net.Conn) { time.Sleep(forever) }},
		"direct-huge":    {direct: sends(func([]byte) []byte { return []byte{0xff, 0xff, 0xff, 0xff, 1, 2} })},
		"direct-cut":     {direct: sends(func(b []byte) []byte { return b[:len(b)-5] })},
		"direct-two":     {direct: sends(func(b []byte) []byte { return append(b, b...) })},
		"direct-garbage": {direct: sends(func(b []byte) []byte { clear(b[4:]); return b })},
	} {
		h.hello = greeting
		byHand[word] = h
	}
}

var listening sync.Once

// listen opens the socket, if there is to be one, and returns its path.
func (h handmade) listen(dir string) string {
	if h.socket != "" {
		return filepath.Join(dir, h.socket)
	}
	if h.direct == nil {
		return ""
	}
	path := filepath.Join(dir, fmt.Sprintf("bare-%d", os.Getpid()))
	listening.Do(func() {
		at, err := net.Listen("unix", path)
		if err != nil {
			panic(err)
		}
		go func() {
			for {
				if c, err := at.Accept(); err == nil {
					go h.direct(c)
				}
			}
		}()
	})
	return path
}

// sends answers a batch with a spoilt message, then hangs up.
func sends(spoil func([]byte) []byte) func(net.Conn) {
	return func(c net.Conn) {
		defer c.Close()
		var head [4]byte
		if _, err := io.ReadFull(c, head[:]); err != nil {
			return
		}
		message := make([]byte, binary.LittleEndian.Uint32(head[:]))
		if _, err := io.ReadFull(c, message); err != nil {
			return
		}
		var b wire.Batch
		if err := proto.Unmarshal(message, &b); err != nil {
			return
		}
		zeros := make([]byte, 8*b.Rows)
		answer, err := proto.Marshal(&wire.Result{Seq: b.Seq, Rows: b.Rows, Names: []string{"log10_rate", "heat"}, Columns: [][]byte{zeros, zeros}})
		if err != nil {
			return
		}
		_, _ = c.Write(spoil(append(binary.LittleEndian.AppendUint32(nil, uint32(len(answer))), answer...)))
	}
}
