package rpc

import (
	"bytes"
	"encoding/binary"
	"io"
	"path/filepath"
	"strings"
	"testing"
	"time"
)

// pipe is one end of a connection in memory.
type pipe struct {
	*io.PipeReader
	to *io.PipeWriter
}

func (p pipe) Write(b []byte) (int, error) { return p.to.Write(b) }
func (p pipe) SetDeadline(time.Time) error { return nil }

func (p pipe) Close() error {
	p.to.Close()
	return p.PipeReader.Close()
}

func pipes() (here, there pipe) {
	r1, w1 := io.Pipe()
	r2, w2 := io.Pipe()
	return pipe{r1, w2}, pipe{r2, w1}
}

// TestFrames sends messages of all sizes through a connection and back.
func TestFrames(t *testing.T) {
	here, there := pipes()
	defer here.Close()
	go func() {
		f := newFrame(there)
		for {
			m, err := f.read()
			if err != nil || f.write(m) != nil {
				return
			}
		}
	}()
	f := newFrame(here)
	for _, n := range []int{0, 1, 100, 16<<10 - frameHead, 16 << 10, 1 << 20, 3} {
		sent := bytes.Repeat([]byte{byte(n), 7}, n)[:n]
		if err := f.write(sent); err != nil {
			t.Fatal(err)
		}
		got, err := f.read()
		if err != nil || !bytes.Equal(got, sent) {
			t.Fatalf("%d bytes: got %d, %v", n, len(got), err)
		}
	}
}

// TestWrongFrames: what is no message ends the conversation, and memory is not
// taken for a length alone.
func TestWrongFrames(t *testing.T) {
	length := func(n uint32) []byte { return binary.LittleEndian.AppendUint32(nil, n) }
	for name, x := range map[string]struct {
		bytes []byte
		want  string
	}{
		"huge":      {length(1 << 31), "want at most"},
		"two":       {append(length(1), 1, 2, 3), "more than one message"},
		"cut":       {append(length(3), 1), io.ErrUnexpectedEOF.Error()},
		"cut short": {[]byte{1, 0}, io.ErrUnexpectedEOF.Error()},
		"nothing":   {nil, io.EOF.Error()},
	} {
		here, there := pipes()
		go func() {
			_, _ = there.Write(x.bytes)
			there.Close()
		}()
		if _, err := newFrame(here).read(); err == nil || !strings.Contains(err.Error(), x.want) {
			t.Errorf("%s: %v, want %s", name, err, x.want)
		}
		here.Close()
	}
}

// TestWhereSocketsMayBe: a law cannot make the host talk to a socket of
// someone else's.
func TestWhereSocketsMayBe(t *testing.T) {
	folder := t.TempDir()
	for path, want := range map[string]bool{
		filepath.Join(folder, "plugin-dir1", "direct"):     true,
		filepath.Join(folder, "..", "elsewhere", "direct"): false,
		"/run/direct": false, "direct": false, "": false,
	} {
		var c child
		if c.converses(path, folder, 2); (c.direct != "") != want {
			t.Errorf("socket %q in folder %s: accepted: %v, want %v", path, folder, !want, want)
		}
	}
}
