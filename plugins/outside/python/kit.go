// Package python holds the kit with which a law is written in Python, as the
// files that a law's folder needs. The kit itself is read in wanelaw/.
package python

import (
	"embed"
	"os"
)

// Kit holds wanelaw/*.py.
//
//go:embed wanelaw/*.py
var Kit embed.FS

//go:generate sh -c "cd ../../../sim/rpc/wire && /usr/bin/protoc --python_out=../../../plugins/outside/python/wanelaw law.proto"
//go:generate /usr/bin/python3 testdata/make_tables.py

// Copy writes the kit into a law's folder, as wanelaw/*.py. It overwrites
// nothing.
func Copy(folder string) error { return os.CopyFS(folder, Kit) }
