package python_test

import (
	"bytes"
	"os"
	"os/exec"
	"strings"
	"testing"
)

// interpreter is Debian's, which sees Debian's libraries.
const interpreter = "/usr/bin/python3"

// needs runs a program that a test needs, and skips the test without it, or
// fails it where nothing may be missing.
func needs(t testing.TB, name string, args ...string) {
	t.Helper()
	if out, err := exec.Command(name, args...).CombinedOutput(); err != nil {
		if os.Getenv("WANE_REQUIRE") == "1" {
			t.Fatalf("%s %s: %v\n%s", name, strings.Join(args, " "), err, out)
		}
		t.Skipf("%s %s: %v", name, strings.Join(args, " "), err)
	}
}

func needsNumpy(t testing.TB) {
	t.Helper()
	needs(t, interpreter, "-c", "import numpy")
}

func needsAll(t testing.TB) {
	t.Helper()
	needs(t, interpreter, "-c", "import numpy, grpc, google.protobuf")
}

// python runs a script with the kit in reach and returns what it prints.
func python(t testing.TB, stdin []byte, args ...string) []byte {
	t.Helper()
	cmd := exec.Command(interpreter, append([]string{"-B"}, args...)...)
	cmd.Env = append(os.Environ(), "PYTHONPATH=.")
	cmd.Stdin = bytes.NewReader(stdin)
	var said bytes.Buffer
	cmd.Stderr = &said
	out, err := cmd.Output()
	if err != nil {
		t.Fatalf("%s: %v\n%s", strings.Join(args, " "), err, said.String())
	}
	return out
}

// TestKit runs the kit's own tests, those that serve a law included.
func TestKit(t *testing.T) {
	needsAll(t)
	cmd := exec.Command(interpreter, "-B", "-m", "unittest", "discover", "-s", "testdata", "-p", "test_*.py")
	cmd.Env = append(os.Environ(), "PYTHONPATH=.")
	out, err := cmd.CombinedOutput()
	if err != nil || !bytes.Contains(out, []byte("\nOK")) {
		t.Errorf("%v\n%s", err, out)
	}
}

// TestNoPip holds the kit to Debian's three packages and the standard library.
func TestNoPip(t *testing.T) {
	needsNumpy(t)
	out := python(t, nil, "-c", `
import ast, pathlib, sys
free = set(sys.stdlib_module_names) | {"numpy", "grpc", "google"}
for f in pathlib.Path("wanelaw").glob("*.py"):
    ast.parse(f.read_text(), feature_version=(3, 9))
    for n in ast.walk(ast.parse(f.read_text())):
        names = [a.name for a in n.names] if isinstance(n, ast.Import) else [n.module] if isinstance(n, ast.ImportFrom) and not n.level else []
        print(*[f"{f} imports {m}\n" for m in names if m.split(".")[0] not in free], end="")
`)
	if len(out) > 0 {
		t.Errorf("%s", out)
	}
}

// TestTables holds the tables of exact.py to those of package num.
func TestTables(t *testing.T) {
	needs(t, interpreter, "-c", "")
	want, err := os.ReadFile("wanelaw/exact_tables.py")
	if err != nil {
		t.Fatal(err)
	}
	if got := python(t, nil, "testdata/make_tables.py", "-"); !bytes.Equal(got, want) {
		t.Error("wanelaw/exact_tables.py is not what go generate makes of package num")
	}
}

// TestMessages holds law_pb2.py to law.proto.
func TestMessages(t *testing.T) {
	needsAll(t)
	needs(t, "protoc", "--version")
	set := t.TempDir() + "/set"
	if out, err := exec.Command("protoc", "--descriptor_set_out="+set, "--proto_path=../../../sim/rpc/wire", "law.proto").CombinedOutput(); err != nil {
		t.Fatalf("protoc: %v\n%s", err, out)
	}
	out := python(t, nil, "-c", `
import sys
from google.protobuf import descriptor_pb2
from wanelaw import law_pb2
made = descriptor_pb2.FileDescriptorSet.FromString(open(sys.argv[1], "rb").read()).file[0]
kept = descriptor_pb2.FileDescriptorProto.FromString(law_pb2.DESCRIPTOR.serialized_pb)
for f in made, kept:
    for m in f.message_type:
        for x in m.field:
            x.ClearField("json_name")
print("same" if made == kept else "other")
`, set)
	if string(out) != "same\n" {
		t.Errorf("wanelaw/law_pb2.py is not what go generate makes of law.proto: %s", out)
	}
}
