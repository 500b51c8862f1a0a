package rpc

import (
	"fmt"
	"os"
	"path/filepath"
	"strconv"
	"strings"
)

// Each law gets a folder of its own for its sockets, wane-law-PID-RANDOM, which
// none but its owner can enter. The host holds a lock on a file in it for as
// long as it lives: a folder that nobody locks, of a host that is gone, is
// swept away by the next.
const (
	folderPrefix = "wane-law-"
	lockName     = "lock"
)

// socketFolder is such a folder.
type socketFolder struct {
	path string
	lock *os.File
}

// temporary is where socket folders are: the place for temporary files, unless
// its name is so long that the path of a socket would not fit (107 bytes).
func temporary() string {
	if dir := os.TempDir(); len(dir) <= 40 {
		return dir
	}
	if info, err := os.Stat("/tmp"); err == nil && info.IsDir() {
		return "/tmp"
	}
	return os.TempDir()
}

func newSocketFolder() (*socketFolder, error) {
	base := temporary()
	sweep(base)
	// It gets the name by which it can be swept only once it is locked.
	unlocked, err := os.MkdirTemp(base, ".wane-law-")
	if err != nil {
		return nil, fmt.Errorf("rpc: a folder for sockets: %w", err)
	}
	path := filepath.Join(base, folderPrefix+strconv.Itoa(os.Getpid())+"-"+strings.TrimPrefix(filepath.Base(unlocked), ".wane-law-"))
	lock, err := os.OpenFile(filepath.Join(unlocked, lockName), os.O_CREATE|os.O_RDWR, 0o600)
	if err == nil {
		if _, err = tryLock(lock); err == nil {
			lock, err = renameLocked(lock, unlocked, path)
		}
	}
	if err != nil {
		if lock != nil {
			lock.Close()
		}
		os.RemoveAll(unlocked)
		return nil, fmt.Errorf("rpc: a folder for sockets: %w", err)
	}
	return &socketFolder{path, lock}, nil
}

func (f *socketFolder) remove() {
	f.lock.Close() // first: an open file cannot be removed everywhere
	os.RemoveAll(f.path)
}

// sweep removes the folders of hosts that died without doing so.
func sweep(base string) {
	stale, _ := filepath.Glob(filepath.Join(base, folderPrefix+"*-*"))
	for _, path := range stale {
		pid, err := strconv.Atoi(strings.SplitN(filepath.Base(path)[len(folderPrefix):], "-", 2)[0])
		if err != nil || alive(pid) {
			continue
		}
		lock, err := os.OpenFile(filepath.Join(path, lockName), os.O_RDWR, 0)
		if err != nil {
			continue // someone else's
		}
		free, _ := tryLock(lock)
		lock.Close()
		if free {
			os.RemoveAll(path)
		}
	}
}
