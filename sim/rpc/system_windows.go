package rpc

import (
	"os"
	"os/exec"
	"path/filepath"
	"syscall"
)

// apart puts a process into a group of its own, so that Ctrl-C reaches the
// host alone.
func apart(c *exec.Cmd) {
	c.SysProcAttr = &syscall.SysProcAttr{CreationFlags: syscall.CREATE_NEW_PROCESS_GROUP}
}

func killGroup(p *os.Process) { _ = p.Kill() }

// systemEnv is what a program cannot run without on this system.
func systemEnv() []string {
	var env []string
	for _, key := range []string{"SystemRoot", "TEMP", "USERPROFILE"} {
		if v, ok := os.LookupEnv(key); ok {
			env = append(env, key+"="+v)
		}
	}
	return env
}

// alive tells whether there is such a process.
func alive(pid int) bool {
	p, err := os.FindProcess(pid)
	if err != nil {
		return false
	}
	_ = p.Release()
	return true
}

// tryLock has nothing to do: a file that is open cannot be removed here.
func tryLock(*os.File) (bool, error) { return true, nil }

// renameLocked renames the folder in which a locked file is, which must be
// closed for that.
func renameLocked(lock *os.File, from, to string) (*os.File, error) {
	lock.Close()
	if err := os.Rename(from, to); err != nil {
		return nil, err
	}
	return os.OpenFile(filepath.Join(to, lockName), os.O_RDWR, 0)
}

func killed(*os.ProcessState) bool { return false }

func awaitEnd(int) {}
