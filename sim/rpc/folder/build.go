package folder

import (
	"context"
	"errors"
	"fmt"
	"io"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"time"
)

const (
	// noteName is the file beside what is built that says from what.
	noteName = "built-from"
	// longestBuild is how long a build may take.
	longestBuild = 10 * time.Minute
)

// Build builds the law's program, unless it has been built from the same files
// before. It says so on log, if that is not nil. It does nothing for a law that
// is not built.
func (f *Folder) Build(ctx context.Context, log io.Writer) error {
	if len(f.build) == 0 {
		return nil
	}
	sum, _, err := f.Digest()
	if err != nil {
		return err
	}
	place, err := f.builtPlace()
	if err != nil {
		return fmt.Errorf("law %s: build: %w", f.Path, err)
	}
	before := fresh(place, sum)
	if before && !f.hangsOnOthers() {
		return nil
	}
	if log != nil && !before {
		fmt.Fprintf(log, "building law %s\n", f.Path)
	}
	sweep(place)
	work, err := os.MkdirTemp(place, "new-")
	if err != nil {
		return fmt.Errorf("law %s: build: %w", f.Path, err)
	}
	defer os.RemoveAll(work)
	if before { // the go command looks at what is there, and is done at once if it will do
		if err := copyNoted(place, work); err != nil {
			return fmt.Errorf("law %s: build: %w", f.Path, err)
		}
	}
	if err := f.runBuild(ctx, work); err != nil {
		return err
	}
	return f.settle(place, work, sum)
}

// hangsOnOthers tells whether the program is made from files outside the
// folder too, as in Go from those of the module around it. Then the go command
// itself knows best whether anything has changed.
func (f *Folder) hangsOnOthers() bool {
	if filepath.Base(f.build[0]) != "go" {
		return false
	}
	_, err := os.Stat(filepath.Join(f.Dir, "go.mod"))
	return err != nil
}

// builtPlace is the folder for what is built, which it makes: in the law's own
// folder, or in the user's cache folder where the law's cannot be written.
func (f *Folder) builtPlace() (string, error) {
	own := filepath.Join(f.Dir, builtName)
	if err := os.MkdirAll(own, 0o755); err == nil {
		if probe, err := os.MkdirTemp(own, "new-"); err == nil {
			os.Remove(probe)
			return own, nil
		}
	}
	cache, err := os.UserCacheDir()
	if err != nil {
		return "", fmt.Errorf("neither %s nor a cache folder can be written: %w", own, err)
	}
	place := filepath.Join(cache, "wane", "built", sumOf([]File{{Path: f.Dir}})[len("sha256:"):][:16])
	return place, os.MkdirAll(place, 0o700)
}

// runBuild runs the build with its output in the folder work.
func (f *Folder) runBuild(ctx context.Context, work string) error {
	ctx, cancel := context.WithTimeout(ctx, longestBuild)
	defer cancel()
	words := f.arguments(f.build, work)
	cmd := exec.CommandContext(ctx, words[0], words[1:]...)
	cmd.Dir = f.Dir
	cmd.Env = buildEnvironment(os.Environ())
	cmd.WaitDelay = 2 * time.Second
	said, err := cmd.CombinedOutput()
	switch {
	case ctx.Err() == context.DeadlineExceeded:
		return fmt.Errorf("law %s: build: not finished after %v: %s", f.Path, longestBuild, strings.Join(f.build, " "))
	case ctx.Err() != nil:
		return fmt.Errorf("law %s: build: %w", f.Path, ctx.Err())
	case err != nil:
		return fmt.Errorf("law %s: build: %s: %w\n%s", f.Path, strings.Join(f.build, " "), err, tail(string(said), 20))
	}
	return nil
}

// arguments puts the place of what is built into arguments, and the program's
// path in front.
func (f *Folder) arguments(words []string, place string) []string {
	out := make([]string, len(words))
	for i, w := range words {
		if rest, ok := strings.CutPrefix(w, builtPrefix); ok {
			w = filepath.Join(place, filepath.FromSlash(rest))
		}
		out[i] = w
	}
	if strings.Contains(words[0], "/") && !filepath.IsAbs(out[0]) {
		out[0] = f.inDir(out[0])
	}
	return out
}

// buildEnvironment keeps what a compiler needs, and nothing that would lead it
// to other sources than those of the folder.
func buildEnvironment(all []string) []string {
	keep := map[string]bool{"PATH": true, "HOME": true, "USER": true, "LANG": true, "TMPDIR": true, "XDG_CACHE_HOME": true, "SSL_CERT_FILE": true,
		"GOCACHE": true, "GOPATH": true, "GOMODCACHE": true, "GOPROXY": true, "GONOSUMDB": true, "GOSUMDB": true,
		"GOPRIVATE": true, "GONOPROXY": true, "GOTOOLCHAIN": true, "GOROOT": true, "GOENV": true, "HTTPS_PROXY": true, "HTTP_PROXY": true, "NO_PROXY": true}
	var out []string
	for _, e := range all {
		if name, _, ok := strings.Cut(e, "="); ok && keep[name] {
			out = append(out, e)
		}
	}
	return append(out, "GOWORK=off")
}

// settle moves what was built to its place, each file in one step, so that
// another process may build or start the same law meanwhile.
func (f *Folder) settle(place, work, sum string) error {
	entries, err := os.ReadDir(work)
	if err != nil {
		return fmt.Errorf("law %s: build: %w", f.Path, err)
	}
	if program := f.Start[0]; strings.HasPrefix(program, builtPrefix) {
		if _, err := os.Stat(f.arguments([]string{program}, work)[0]); err != nil {
			return fmt.Errorf("law %s: build: it made no %s, which start names", f.Path, program)
		}
	}
	var note strings.Builder
	fmt.Fprintln(&note, sum)
	for _, e := range entries {
		if !e.Type().IsRegular() {
			return fmt.Errorf("law %s: build: it made %s%s, which is no file", f.Path, builtPrefix, e.Name())
		}
		digest, err := HashFile(filepath.Join(work, e.Name()))
		if err == nil {
			err = os.Rename(filepath.Join(work, e.Name()), filepath.Join(place, e.Name()))
		}
		if err != nil {
			return fmt.Errorf("law %s: build: %w", f.Path, err)
		}
		fmt.Fprintf(&note, "%s %s\n", digest, e.Name())
	}
	written := filepath.Join(work, noteName)
	err = os.WriteFile(written, []byte(note.String()), 0o644)
	if err == nil {
		err = os.Rename(written, filepath.Join(place, noteName))
	}
	if err != nil {
		return fmt.Errorf("law %s: build: %w", f.Path, err)
	}
	return nil
}

// noted reads the note beside what was built: from which sources, and which
// files with which digests.
func noted(place string) (sum string, files []File) {
	note, err := os.ReadFile(filepath.Join(place, noteName))
	if err != nil {
		return "", nil
	}
	lines := strings.Split(strings.TrimSpace(string(note)), "\n")
	for _, l := range lines[1:] {
		digest, name, _ := strings.Cut(l, " ")
		files = append(files, File{filepath.Base(name), digest})
	}
	return lines[0], files
}

// fresh tells whether what lies in a place was built from these sources, and
// is still what was built.
func fresh(place, sum string) bool {
	from, files := noted(place)
	if from != sum || len(files) == 0 {
		return false
	}
	for _, f := range files {
		if got, err := HashFile(filepath.Join(place, f.Path)); err != nil || got != f.SHA256 {
			return false
		}
	}
	return true
}

// copyNoted copies what was built.
func copyNoted(place, to string) error {
	_, files := noted(place)
	for _, f := range files {
		in, err := os.Open(filepath.Join(place, f.Path))
		if err != nil {
			return err
		}
		out, err := os.OpenFile(filepath.Join(to, f.Path), os.O_CREATE|os.O_EXCL|os.O_WRONLY, 0o755)
		if err == nil {
			_, err = io.Copy(out, in)
			err = errors.Join(err, out.Close())
		}
		if err = errors.Join(err, in.Close()); err != nil {
			return err
		}
	}
	return nil
}

// sweep removes what builds that were killed have left.
func sweep(place string) {
	entries, _ := os.ReadDir(place)
	for _, e := range entries {
		info, err := e.Info()
		if err == nil && e.IsDir() && strings.HasPrefix(e.Name(), "new-") && time.Since(info.ModTime()) > 2*longestBuild {
			os.RemoveAll(filepath.Join(place, e.Name()))
		}
	}
}

// tail is the last lines of a text.
func tail(text string, lines int) string {
	all := strings.Split(strings.TrimSpace(text), "\n")
	return strings.Join(all[max(0, len(all)-lines):], "\n")
}
