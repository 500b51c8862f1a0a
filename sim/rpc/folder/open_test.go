package folder

import (
	"bytes"
	"context"
	"errors"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"wane/sim/law"
	"wane/sim/rpc"
)

// deadly is a mass that ends the law's process.
const deadly = 666

// served is what the test binary serves when a test starts it as a law.
type served struct{}

func (served) Describe() law.Card {
	return law.Card{
		Process: "evaporation", Name: "burden", Version: "1", Summary: "for tests", Sources: []string{"assumption"},
		Accepts:   law.Accepts{Kinds: []string{"black-hole", "central-hole"}},
		Questions: []law.Question{{Name: "wear", Inputs: []string{"mass"}}},
	}
}

func (served) Answer(_ string, in law.Batch) (law.Batch, error) {
	rate, heat := in.NewValues(), in.NewValues()
	for i, m := range in.Values("mass") {
		if m == deadly {
			os.Exit(3)
		}
		rate[i], heat[i] = -m, 0
	}
	return in.Answer(law.Numbers("log10_rate", rate), law.Numbers("heat", heat)), nil
}

func TestMain(m *testing.M) {
	if len(os.Args) == 2 && os.Args[1] == "serve" {
		rpc.Serve(served{})
		return
	}
	os.Exit(m.Run())
}

// testBinary is the test's own program.
func testBinary(t *testing.T) string {
	t.Helper()
	name, err := os.Executable()
	if err != nil {
		t.Fatal(err)
	}
	return name
}

// script starts the law by way of a script.
func script(t *testing.T) string {
	return "#!/bin/sh\nexec " + testBinary(t) + " serve\n"
}

// answers opens a law, asks it and closes it.
func answers(t *testing.T, path string, o Options) *Opened {
	t.Helper()
	l, err := Open(context.Background(), path, o)
	if err != nil {
		t.Fatal(err)
	}
	defer l.Close()
	out, err := l.Law.Answer("wear", law.Batch{Rows: 2, Columns: []law.Column{law.Numbers("mass", []float64{1, 10})}})
	if err != nil {
		t.Fatal(err)
	}
	if got := out.Values("log10_rate"); len(got) != 2 || math.Float64bits(got[1]) != math.Float64bits(-10) {
		t.Errorf("answers %v", got)
	}
	return l
}

func TestOpen(t *testing.T) {
	dir := made(t, map[string]string{
		"law.toml": "name = \"evaporation/burden\"\nstart = [\"" + testBinary(t) + "\", \"serve\"]\n",
		"bare*":    script(t), "inside/law.toml": "start = [\"./run\"]\n", "inside/run*": script(t),
	})
	for _, path := range []string{dir, filepath.Join(dir, "bare"), filepath.Join(dir, "inside")} {
		o := answers(t, path, Options{})
		if path == dir && o.Files[len(o.Files)-1].Path != testBinary(t) {
			t.Errorf("the digest does not cover the program: %+v", o.Files)
		}
		if len(o.Digest) != len("sha256:")+64 || len(o.Files) == 0 || len(o.Program.SHA256) != 64 || !filepath.IsAbs(o.Program.Path) {
			t.Errorf("%s: %+v", path, o)
		}
		again := answers(t, path, Options{Digest: o.Digest})
		if again.Digest != o.Digest {
			t.Errorf("%s: digest %s, then %s", path, o.Digest, again.Digest)
		}
	}
}

func TestOpenRefuses(t *testing.T) {
	dir := made(t, map[string]string{
		"law.toml":       "name = \"evaporation/other\"\nstart = [\"" + testBinary(t) + "\", \"serve\"]\n",
		"plain/law.toml": "start = [\"" + testBinary(t) + "\", \"serve\"]\n",
	})
	if _, err := Open(context.Background(), dir, Options{}); err == nil || !strings.HasSuffix(err.Error(), `law.toml:1:8: name: "evaporation/other", but its card says "evaporation/burden"`) {
		t.Errorf("another name: %v", err)
	}
	other := "sha256:" + strings.Repeat("0", 64)
	var changed *Changed
	_, err := Open(context.Background(), filepath.Join(dir, "plain"), Options{Digest: other})
	if !errors.As(err, &changed) || changed.Want != other || !strings.Contains(err.Error(), other) || !strings.Contains(err.Error(), changed.Got) {
		t.Errorf("another digest: %v", err)
	}
}

// A law is built when it has not been, or when its files have changed, or when
// somebody has touched what was built; and not otherwise.
func TestBuild(t *testing.T) {
	dir := made(t, map[string]string{
		"law.toml": "start = [\".built/law\"]\nbuild = [\"/bin/cp\", \"source\", \".built/law\"]\n", "source*": script(t),
	})
	builds := func() bool {
		var log bytes.Buffer
		answers(t, dir, Options{Log: &log})
		return strings.Contains(log.String(), "building")
	}
	if !builds() {
		t.Error("not built at first")
	}
	if builds() {
		t.Error("built though nothing has changed")
	}
	if err := os.WriteFile(filepath.Join(dir, "source"), []byte(script(t)+"# more\n"), 0o755); err != nil {
		t.Fatal(err)
	}
	if !builds() {
		t.Error("not built though its source has changed")
	}
	if err := os.WriteFile(filepath.Join(dir, ".built", "law"), []byte("#!/bin/sh\nexit 1\n"), 0o755); err != nil {
		t.Fatal(err)
	}
	if !builds() {
		t.Error("not built though what was built has been replaced")
	}
	entries, _ := os.ReadDir(filepath.Join(dir, ".built"))
	if len(entries) != 2 {
		t.Errorf(".built holds %v, want the program and the note", entries)
	}
}

func TestBuildFails(t *testing.T) {
	for build, want := range map[string]string{
		`"/bin/cp", "nothing", ".built/law"`: "exit status 1\n/bin/cp: cannot stat 'nothing'",
		`"/bin/true"`:                        "it made no .built/law, which start names",
	} {
		dir := made(t, map[string]string{"law.toml": "start = [\".built/law\"]\nbuild = [" + build + "]\n"})
		if _, err := Open(context.Background(), dir, Options{}); err == nil || !strings.Contains(err.Error(), want) {
			t.Errorf("%s: %v, want %s", build, err, want)
		}
	}
}

// A folder that cannot be written is built in the user's cache.
func TestBuildElsewhere(t *testing.T) {
	dir := made(t, map[string]string{
		"law.toml": "start = [\".built/law\"]\nbuild = [\"/bin/cp\", \"source\", \".built/law\"]\n", "source*": script(t),
		".built": "in the way",
	})
	cache := t.TempDir()
	t.Setenv("XDG_CACHE_HOME", cache)
	t.Setenv("HOME", cache)
	if o := answers(t, dir, Options{}); strings.HasPrefix(o.Program.Path, dir) {
		t.Errorf("started %s", o.Program.Path)
	}
}

// The law that runs is the law whose digest was taken.
func TestChangedMeanwhile(t *testing.T) {
	dir := made(t, map[string]string{"law.toml": "start = [\"./run\"]\n", "run*": "#!/bin/sh\necho '# more' >> law.toml\nexec " + testBinary(t) + " serve\n"})
	var changed *Changed
	if _, err := Open(context.Background(), dir, Options{}); !errors.As(err, &changed) {
		t.Errorf("a law that changes as it starts: %v", err)
	}
}

// A law whose files have been replaced is not started again.
func TestReplacedWhileRunning(t *testing.T) {
	dir := made(t, map[string]string{"law.toml": "start = [\"./run\"]\n", "run*": script(t)})
	l, err := Open(context.Background(), dir, Options{})
	if err != nil {
		t.Fatal(err)
	}
	defer l.Close()
	if err := os.WriteFile(filepath.Join(dir, "run"), []byte(script(t)+"# another\n"), 0o755); err != nil {
		t.Fatal(err)
	}
	ask := func(mass float64) error {
		_, err := l.Law.Answer("wear", law.Batch{Rows: 1, Columns: []law.Column{law.Numbers("mass", []float64{mass})}})
		return err
	}
	if err := ask(1); err != nil {
		t.Errorf("the law that still runs: %v", err)
	}
	sum, _, err := (&Folder{Path: dir, Dir: dir, Start: []string{"./run"}}).Digest()
	if err != nil {
		t.Fatal(err)
	}
	if err := ask(deadly); err == nil || !strings.Contains(err.Error(), "has changed: its digest was "+l.Digest+" and is "+sum) {
		t.Errorf("a law that was replaced: %v", err)
	}
}

// Compiled code that lies about is not read.
func TestBytecode(t *testing.T) {
	t.Setenv("XDG_CACHE_HOME", t.TempDir())
	for name, want := range map[string]string{"a.txt": "PYTHONDONTWRITEBYTECODE=1", "kit/__pycache__/x.pyc": "PYTHONPYCACHEPREFIX="} {
		f, err := Read(made(t, map[string]string{"law.toml": shellToml, "law.sh": "", name: ""}))
		if err != nil {
			t.Fatal(err)
		}
		if env := f.environment(); !strings.HasPrefix(env[0], want) {
			t.Errorf("%s: %v, want %s", name, env, want)
		}
	}
}
