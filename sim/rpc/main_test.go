package rpc_test

import (
	"context"
	"os"
	"strings"
	"testing"

	"wane/plugins"
	"wane/sim/law"
	"wane/sim/rpc"
)

// childLaw names the law that this test binary serves when it is started again
// as an outside law.
const childLaw = "WANE_TEST_LAW"

// faultyFolder is what the tests of faults build.
var faultyFolder string

func TestMain(m *testing.M) {
	if name := os.Getenv(childLaw); name != "" {
		rpc.Serve(served(name))
		return
	}
	code := m.Run()
	os.RemoveAll(faultyFolder)
	os.Exit(code)
}

func served(name string) law.Law {
	laws, err := plugins.Builtin()
	if err != nil {
		panic(err)
	}
	process, name, _ := strings.Cut(name, "/")
	l, ok := laws.Find(process, name)
	if !ok {
		panic("no law " + name)
	}
	return l
}

// startOf starts a law of the list as an outside law.
func startOf(t testing.TB, name string) rpc.Start {
	t.Helper()
	self, err := os.Executable()
	if err != nil {
		t.Fatal(err)
	}
	return rpc.Start{Name: "./" + name, Args: []string{self}, Env: []string{childLaw + "=" + name}}
}

func open(t testing.TB, s rpc.Start) *rpc.Law {
	t.Helper()
	l, err := rpc.Open(context.Background(), s)
	if err != nil {
		t.Fatal(err)
	}
	t.Cleanup(func() {
		if err := l.Close(); err != nil {
			t.Error(err)
		}
	})
	return l
}
