package rpc

import (
	"bytes"
	"io"
)

// greeting hands on the first line of what a law prints, which says where it
// listens; whatever it prints after that goes to its log. Nothing that a law
// prints can block it, or be taken for part of the protocol.
type greeting struct {
	from io.ReadCloser
	log  io.Writer
	over bool
	ends func() // waits a moment for the process to end
}

func (g *greeting) Read(p []byte) (int, error) {
	if g.over {
		if _, err := io.Copy(g.log, g.from); err != nil {
			return 0, err
		}
		return 0, io.EOF
	}
	n, err := g.from.Read(p)
	if end := bytes.IndexByte(p[:n], '\n'); end >= 0 {
		g.over = true
		_, _ = g.log.Write(p[end+1 : n])
		n = end + 1
	}
	if err != nil && !g.over {
		g.ends() // it does, most likely, and how is worth knowing: who sees this will kill it
	}
	return n, err
}

func (g *greeting) Close() error { return g.from.Close() }
