// Command faulty is an outside law with a fault: a built-in law that does one
// thing wrong.
//
//	faulty FAULT process/name FOLDER
//
// FAULT is a word and what it needs, with colons between ("crash:2:1"). In
// FOLDER it counts how often it was started, and makes a file "now" when the
// fault begins.
package main

import (
	"fmt"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"time"

	"wane/plugins"
	"wane/sim/law"
	"wane/sim/rpc"
)

func main() {
	if len(os.Args) != 4 {
		fmt.Fprintln(os.Stderr, "usage: faulty FAULT process/name FOLDER")
		os.Exit(2)
	}
	words := strings.Split(os.Args[1], ":")
	word, more := words[0], words[1:]
	f := &faulty{Law: builtin(os.Args[2]), fault: word, more: more, folder: os.Args[3], start: started(os.Args[3])}
	if fault, ok := beforeServing[word]; ok {
		f.begins()
		fault(f)
		return
	}
	if serve, ok := byHand[word]; ok {
		serveByHand(f, serve)
		return
	}
	rpc.Serve(f)
}

func builtin(id string) law.Law {
	if id == "vacuum-decay/steady" {
		return steady{}
	}
	laws, err := plugins.Builtin()
	if err != nil {
		panic(err)
	}
	process, name, _ := strings.Cut(id, "/")
	l, ok := laws.Find(process, name)
	if !ok {
		panic("no law " + id)
	}
	return l
}

// started counts this start, from 1 on.
func started(folder string) int {
	for n := 1; ; n++ {
		f, err := os.OpenFile(filepath.Join(folder, "start-"+strconv.Itoa(n)), os.O_CREATE|os.O_EXCL|os.O_WRONLY, 0o600)
		if os.IsExist(err) {
			continue
		}
		if err != nil {
			panic(err)
		}
		fmt.Fprintln(f, os.Getpid())
		f.Close()
		return n
	}
}

// begins tells who waits for it that the fault begins.
func (f *faulty) begins() {
	if err := os.WriteFile(filepath.Join(f.folder, "now"), nil, 0o600); err != nil {
		panic(err)
	}
}

// forever is longer than any test.
const forever = 5 * time.Minute

func (f *faulty) number(i int) int {
	if i >= len(f.more) {
		return 0
	}
	n, err := strconv.Atoi(f.more[i])
	if err != nil {
		panic(err)
	}
	return n
}

// beforeServing are faults of a process that never serves.
var beforeServing = map[string]func(*faulty){
	"exit": func(f *faulty) {
		fmt.Fprintln(os.Stderr, "the tables are not where they were")
		os.Exit(f.number(0))
	},
	"panics-at-start": func(*faulty) { panic("the tables are empty") },
	"silent":          func(*faulty) { fmt.Fprintln(os.Stderr, "reading the tables"); time.Sleep(forever) },
	"prints-first": func(f *faulty) {
		fmt.Println("loading the tables ...")
		rpc.Serve(f)
	},
	"prints-bytes": func(f *faulty) {
		os.Stdout.Write([]byte{0xff, 0xfe, 0, 1, 2, '|', '|', '\n'})
		rpc.Serve(f)
	},
	"prints-endlessly": func(*faulty) {
		for line := make([]byte, 1<<16); ; {
			if _, err := os.Stdout.Write(line); err != nil {
				os.Exit(1)
			}
		}
	},
	"other-cookie": func(*faulty) {
		if os.Getenv("ANOTHER_HOST") != "its cookie" {
			fmt.Fprintln(os.Stderr, "this program is a part of another one and is not meant to be started directly")
			os.Exit(1)
		}
	},
	"no-socket": func(f *faulty) {
		fmt.Println("1|1|unix|/nonexistent/law.sock|grpc")
		time.Sleep(forever)
	},
	"no-path": func(f *faulty) {
		fmt.Println("1|1|unix")
		time.Sleep(forever)
	},
}
