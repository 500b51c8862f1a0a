package rpc

import (
	"os/exec"
	"syscall"

	"golang.org/x/sys/unix"
)

// apart puts a process into a group of its own, so that the terminal's Ctrl-C
// reaches the host alone, and lets it die with the thread that starts it.
func apart(c *exec.Cmd) {
	c.SysProcAttr = &syscall.SysProcAttr{Setpgid: true, Pdeathsig: syscall.SIGKILL}
}

// awaitEnd returns when the process has ended, but leaves it in the table of
// processes, so that nobody else can get its number yet.
func awaitEnd(pid int) {
	for unix.Waitid(unix.P_PID, pid, nil, unix.WEXITED|unix.WNOWAIT, nil) == unix.EINTR {
	}
}
