// Wane works out when the populations of a galaxy fade in the far future.
package main

import (
	"os"

	"wane/cmd/internal/cli"
)

func main() { os.Exit(cli.Standard().Main(os.Args[1:])) }
