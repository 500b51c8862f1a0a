//go:build unix && !linux

package rpc

import (
	"os/exec"
	"syscall"
)

// apart puts a process into a group of its own, so that the terminal's Ctrl-C
// reaches the host alone. That the host is gone it must notice by itself.
func apart(c *exec.Cmd) {
	c.SysProcAttr = &syscall.SysProcAttr{Setpgid: true}
}

// awaitEnd leaves the waiting to Wait.
func awaitEnd(int) {}
