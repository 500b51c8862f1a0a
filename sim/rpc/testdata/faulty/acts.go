package main

import (
	"bytes"
	"fmt"
	"os"
	"os/exec"
	"sync/atomic"
	"syscall"
	"time"
)

// acts are faults of a process in the middle of an answer.
var acts = map[string]func(){
	"nothing": func() {},
	"crash": func() {
		fmt.Fprintln(os.Stderr, "a table has a hole in it")
		os.Exit(3)
	},
	"exit-0": func() {
		fmt.Fprintln(os.Stderr, "good night")
		os.Exit(0)
	},
	"fatal": func() { // a panic that nobody can catch
		go func() { panic("lost in the tables") }()
		time.Sleep(forever)
	},
	"panic": func() { var table []float64; fmt.Fprintln(os.Stderr, table[len(os.Args)]) },
	"hang":  func() { fmt.Fprintln(os.Stderr, "thinking"); time.Sleep(forever) },
	"spin": func() {
		fmt.Fprintln(os.Stderr, "spinning")
		for spinning.Load() {
		}
	},
	"stop": func() {
		fmt.Fprintln(os.Stderr, "stopping")
		_ = syscall.Kill(os.Getpid(), syscall.SIGSTOP)
		time.Sleep(10 * time.Millisecond)
	},
	"killed": func() {
		fmt.Fprintln(os.Stderr, "eating")
		_ = syscall.Kill(os.Getpid(), syscall.SIGKILL)
		time.Sleep(forever)
	},
	"balloon": func() {
		fmt.Fprintln(os.Stderr, "eating")
		limit := syscall.Rlimit{Cur: 3 << 30, Max: 3 << 30}
		if err := syscall.Setrlimit(syscall.RLIMIT_AS, &limit); err != nil {
			panic(err)
		}
		for size := 1 << 24; ; size *= 2 {
			eaten = append(eaten, make([]byte, size))
		}
	},
	"print": func() { // past what catches it
		_, _ = syscall.Write(1, []byte("hello\n"))
		_, _ = syscall.Write(1, bytes.Repeat([]byte("hello "), 30_000))
		fmt.Println("a word on standard output")
	},
	"flood": func() {
		_, _ = os.Stderr.Write(bytes.Repeat([]byte("and "), 1<<18))
		for range 2000 {
			fmt.Fprintln(os.Stderr, "a line in a flood")
		}
	},
	"offspring": func() {
		c := exec.Command("sleep", "300")
		c.Stdout, c.Stderr = os.Stdout, os.Stderr
		if err := c.Start(); err != nil {
			panic(err)
		}
	},
}

var (
	spinning atomic.Bool
	eaten    [][]byte
)

func init() { spinning.Store(true) }
