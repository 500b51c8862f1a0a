// Command wane-law serves one of the laws that are built into wane as a law
// outside of it:
//
//	wane-law evaporation/page
//
// It is a template for laws of one's own, and the proof that an answer does
// not depend on which side of the wire it was found on.
package main

import (
	"fmt"
	"io"
	"os"
	"strings"

	"wane/plugins"
	"wane/sim/rpc"
)

func main() {
	if len(os.Args) == 2 && (os.Args[1] == "-h" || os.Args[1] == "--help") {
		help(os.Stdout)
		return
	}
	if len(os.Args) != 2 {
		help(os.Stderr)
		os.Exit(2)
	}
	laws, err := plugins.Builtin()
	if err != nil {
		fmt.Fprintf(os.Stderr, "wane-law: %v\n", err)
		os.Exit(1)
	}
	if process, name, ok := strings.Cut(os.Args[1], "/"); ok {
		if l, known := laws.Find(process, name); known {
			rpc.Serve(l)
			return
		}
	}
	fmt.Fprintf(os.Stderr, "wane-law: no law %q; wane-law --help lists them\n", os.Args[1])
	os.Exit(2)
}

func help(w io.Writer) {
	laws, err := plugins.Builtin()
	if err != nil {
		fmt.Fprintf(os.Stderr, "wane-law: %v\n", err)
		os.Exit(1)
	}
	var list strings.Builder
	for _, l := range laws.All() {
		c := l.Describe()
		fmt.Fprintf(&list, "  %-34s %s\n", c.Process+"/"+c.Name, c.Summary)
	}
	fmt.Fprintf(w, "Serves a law that is built into wane as a law outside of it. Wane starts it; by hand it does nothing.\n\n"+
		"Usage:\n  wane-law PROCESS/NAME\n\nLaws:\n%s", list.String())
}
