package folder

import (
	"bytes"
	"io/fs"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"unicode/utf8"
)

// programs finds faults of the programs that start and build name.
func (f *Folder) programs() Faults {
	var faults Faults
	if len(f.Start) > 0 {
		program := f.Start[0]
		switch built := strings.HasPrefix(program, builtPrefix); {
		case built && len(f.build) == 0:
			faults = append(faults, f.at("start", 0, "start: %s is to be built, but build does not say how", program))
		case built: // not there before it is built
		default:
			if why := f.badProgram(program); why != "" {
				faults = append(faults, f.at("start", 0, "start: %s", why))
			}
		}
		for i, a := range f.Start {
			if strings.HasPrefix(a, "../") || strings.Contains(a, "/../") && !filepath.IsAbs(a) {
				faults = append(faults, f.at("start", i, "start: %s leads outside the law's folder", a))
			}
		}
	}
	if len(f.build) > 0 {
		if why := f.badProgram(f.build[0]); why != "" {
			faults = append(faults, f.at("build", 0, "build: %s", why))
		}
	}
	return faults
}

// badProgram tells why a program cannot be started, in words that name it.
func (f *Folder) badProgram(program string) string {
	if !strings.Contains(program, "/") {
		if _, err := exec.LookPath(program); err != nil {
			why := "no program " + program + " in PATH"
			if _, err := os.Stat(filepath.Join(f.Dir, program)); err == nil {
				why += " (that of the folder is written ./" + program + ")"
			}
			return why
		}
		return ""
	}
	name := f.inDir(program)
	info, err := os.Stat(name)
	switch {
	case err != nil:
		return "no program " + program
	case info.IsDir():
		return program + " is a folder: want a program"
	case info.Mode()&0o111 == 0:
		return program + " is not executable (chmod +x makes it so)"
	}
	if filepath.IsAbs(program) {
		return ""
	}
	if real, err := filepath.EvalSymlinks(name); err == nil && !within(f.Dir, real) {
		return program + " is a link that leads outside the law's folder"
	}
	_, why := kindOf(name, program)
	return why
}

// inDir is a path of the folder as the system wants it.
func (f *Folder) inDir(name string) string {
	if filepath.IsAbs(name) {
		return name
	}
	return filepath.Join(f.Dir, filepath.FromSlash(name))
}

// within tells whether a path lies in a folder; both without links.
func within(dir, name string) bool {
	rel, err := filepath.Rel(dir, name)
	return err == nil && rel != ".." && !strings.HasPrefix(rel, ".."+string(filepath.Separator))
}

// lookAtBare finds what is wrong with a file that is to be a law by itself.
func (f *Folder) lookAtBare(info fs.FileInfo) error {
	if !info.Mode().IsRegular() {
		return one(f.Path, "want a law's folder or an executable file")
	}
	name := filepath.Join(f.Dir, f.bare)
	text, why := kindOf(name, f.Path)
	switch {
	case text == plainText && info.Mode()&0o111 == 0:
		return one(f.Path, "no law: it is a text file (want a law's folder or an executable file)")
	case info.Mode()&0o111 == 0:
		return one(f.Path, "not executable (chmod +x makes it so)")
	case text == plainText:
		return one(f.Path, "no law: it is a text file that names no interpreter in its first line")
	case text == emptyFile:
		return one(f.Path, "no law: the file is empty")
	case why != "":
		return one(f.Path, "%s", strings.TrimPrefix(why, f.Path+": "))
	}
	return nil
}

// What a file is, as far as its beginning tells.
const (
	binary   = iota
	scripted // names its interpreter
	plainText
	emptyFile
)

// kindOf looks at the beginning of a file, and tells, in words that name it,
// why it could not be started.
func kindOf(file, shown string) (kind int, why string) {
	f, err := os.Open(file)
	if err != nil {
		return binary, shown + ": " + reason(err).Error()
	}
	defer f.Close()
	head := make([]byte, 512)
	n, _ := f.Read(head)
	head = head[:n]
	if n == 0 {
		return emptyFile, shown + ": the file is empty"
	}
	line, ok := bytes.CutPrefix(head, []byte("#!"))
	if !ok {
		for len(head) > 0 && n == 512 && !utf8.Valid(head) && len(head) > 508 {
			head = head[:len(head)-1] // a letter may have been cut
		}
		if utf8.Valid(head) && !bytes.ContainsRune(head, 0) {
			return plainText, shown + ": a text file that names no interpreter in its first line"
		}
		return binary, ""
	}
	line, _, _ = bytes.Cut(line, []byte("\n"))
	words := strings.Fields(string(line))
	if len(words) == 0 {
		return scripted, shown + ": names no interpreter after #!"
	}
	if _, err := os.Stat(words[0]); err != nil || !filepath.IsAbs(words[0]) {
		return scripted, shown + ": its interpreter " + words[0] + " is missing"
	}
	if filepath.Base(words[0]) == "env" && len(words) > 1 && !strings.HasPrefix(words[1], "-") {
		if _, err := exec.LookPath(words[1]); err != nil {
			return scripted, shown + ": its interpreter " + words[1] + " is missing: it is not in PATH"
		}
	}
	return scripted, ""
}
