package rpc

import (
	"context"
	"encoding/binary"
	"errors"
	"fmt"
	"io"
	"net"
	"os"
	"path/filepath"
	"time"

	"google.golang.org/grpc/codes"
	"google.golang.org/grpc/status"
)

// direct is the feature of a bare socket for batches and results. A call of
// grpc wakes four goroutines on each side, which for a batch of a few rows is
// ten times the work; here each side wakes one.
const direct = "direct"

// frame reads and writes messages on one connection, each after its length.
type frame struct {
	conn   connection
	buffer []byte
}

type connection interface {
	io.ReadWriteCloser
	SetDeadline(time.Time) error
}

const frameHead = 4 // bytes of the length

func newFrame(conn connection) *frame {
	if u, ok := conn.(*net.UnixConn); ok {
		_ = u.SetWriteBuffer(window) // as much as the system allows: a batch should go out in one piece
	}
	return &frame{conn: conn, buffer: make([]byte, 16<<10)}
}

func (f *frame) write(message []byte) error {
	var head [frameHead]byte
	binary.LittleEndian.PutUint32(head[:], uint32(len(message)))
	parts := net.Buffers{head[:], message}
	if len(message) == 0 {
		parts = parts[:1]
	}
	_, err := parts.WriteTo(f.conn)
	return err
}

// read returns a message that is good until the next one is read.
func (f *frame) read() ([]byte, error) {
	got, err := io.ReadAtLeast(f.conn, f.buffer, frameHead)
	if err != nil {
		return nil, err
	}
	size := int(binary.LittleEndian.Uint32(f.buffer))
	end := frameHead + size
	switch {
	case size > largestMessage:
		return nil, fmt.Errorf("rpc: a message of %d bytes, want at most %d", size, largestMessage)
	case got > end:
		return nil, errors.New("rpc: more than one message")
	case end > len(f.buffer):
		larger := make([]byte, end+end/4)
		copy(larger, f.buffer[:got])
		f.buffer = larger
	}
	if _, err := io.ReadFull(f.conn, f.buffer[got:end]); errors.Is(err, io.EOF) {
		return nil, io.ErrUnexpectedEOF
	} else if err != nil {
		return nil, err
	}
	return f.buffer[frameHead:end], nil
}

// serveDirect answers at a socket in the folder for sockets and returns its
// path; empty if there can be none.
func (s *server) serveDirect() string {
	dir := os.Getenv("PLUGIN_UNIX_SOCKET_DIR")
	if dir == "" {
		return ""
	}
	at, err := net.Listen("unix", filepath.Join(dir, fmt.Sprintf("%s-%d", direct, os.Getpid())))
	if err != nil {
		fmt.Fprintln(s.stderr, err) // grpc is still there
		return ""
	}
	go func() {
		for {
			conn, err := at.Accept()
			if err != nil {
				return
			}
			go s.converse(newFrame(conn))
		}
	}()
	return at.Addr().String()
}

// converse answers batch after batch until the host hangs up.
func (s *server) converse(f *frame) {
	defer f.conn.Close()
	for {
		message, err := f.read()
		if err != nil {
			return
		}
		seq, result, err := s.answer(message)
		if err != nil {
			result = encodeError(&s.memory, seq, err.Error())
		}
		err = f.write(result.buffer.ReadOnlyData())
		result.buffer.Free()
		if err != nil {
			return
		}
	}
}

// answerDirect is answer through the law's own socket. Its errors are those
// that grpc would give.
func (c *child) answerDirect(ctx context.Context, within time.Duration, batch *encoded, read func([]byte) error) error {
	var f *frame
	select {
	case f = <-c.idle:
	default:
		conn, err := net.DialTimeout("unix", c.direct, within)
		if err != nil {
			return directFault(err)
		}
		f = newFrame(conn)
	}
	if err := f.conn.SetDeadline(time.Now().Add(within)); err != nil {
		f.conn.Close()
		return directFault(err)
	}
	stop := context.AfterFunc(ctx, func() { f.conn.Close() })
	message, err := f.exchange(batch)
	if !stop() || err != nil {
		f.conn.Close()
		return directFault(err)
	}
	err = read(message)
	select {
	case c.idle <- f:
	default:
		f.conn.Close()
	}
	return err
}

func (f *frame) exchange(batch *encoded) ([]byte, error) {
	if err := f.write(batch.buffer.ReadOnlyData()); err != nil {
		return nil, err
	}
	return f.read()
}

func directFault(err error) error {
	if errors.Is(err, os.ErrDeadlineExceeded) {
		return status.Error(codes.DeadlineExceeded, "no answer in time")
	}
	return status.Errorf(codes.Unavailable, "%v", err)
}

// converses accepts the law's own socket, if it is where it should be.
func (c *child) converses(socket, folder string, most int) {
	inside, err := filepath.Rel(folder, socket)
	if socket == "" || err != nil || !filepath.IsLocal(inside) {
		return
	}
	c.direct, c.idle = socket, make(chan *frame, most)
}

// hangUp closes the connections that nobody uses.
func (c *child) hangUp() {
	for {
		select {
		case f := <-c.idle:
			f.conn.Close()
		default:
			return
		}
	}
}
