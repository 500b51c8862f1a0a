// Package folder reads the folder of a law outside the program: what starts
// it, which files it consists of, and their digest. A law is a folder with a
// law.toml in it, or one executable file.
//
//	name  = "evaporation/my-burden"            # what its card says it is; may be left out
//	start = ["/usr/bin/python3", "law.py"]     # the program and its arguments
//	files = ["tables/*.csv"]                   # what the digest covers besides code; may be left out: everything but caches
//	build = ["go", "build", "-o", ".built/law", "."]   # what makes the program, if it has to be made
//
// A program with a slash in it lies in the folder or is an absolute path; one
// without is looked for in PATH. It is started in the folder, directly and never
// through a shell, and so is the build. In files, * stands for any part of a
// name and ** for any folders; law.toml and files of code (.py, .go, .so, ...) are always
// covered. ".built/" at the start of an argument is the folder of what is built:
// that in the law's own folder, or one in the user's cache folder where the law's
// cannot be written.
package folder
