//go:build unix

package rpc

import (
	"errors"
	"os"
	"syscall"
)

// killGroup ends a process and all that it has started.
func killGroup(p *os.Process) {
	_ = syscall.Kill(-p.Pid, syscall.SIGKILL)
	_ = p.Kill()
}

// systemEnv is what a program cannot run without on this system.
func systemEnv() []string { return nil }

// alive tells whether there is such a process.
func alive(pid int) bool {
	return pid > 0 && !errors.Is(syscall.Kill(pid, 0), syscall.ESRCH)
}

// tryLock locks a file for as long as it is open here, unless someone else has.
func tryLock(f *os.File) (bool, error) {
	err := syscall.Flock(int(f.Fd()), syscall.LOCK_EX|syscall.LOCK_NB)
	return err == nil, err
}

// renameLocked renames the folder in which a locked file is.
func renameLocked(lock *os.File, from, to string) (*os.File, error) {
	return lock, os.Rename(from, to)
}

// killed tells whether the process was ended by SIGKILL.
func killed(s *os.ProcessState) bool {
	w, ok := s.Sys().(syscall.WaitStatus)
	return ok && w.Signaled() && w.Signal() == syscall.SIGKILL
}
