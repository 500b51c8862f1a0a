package sim

import "embed"

// Contract is the source of the packages that a law outside the program is
// written with, tests included, by paths below this package. 'wane law new'
// puts them into a law's folder, which then needs no copy of Wane.
//
//go:embed law/*.go law/lawtest/*.go num/*.go num/*.s
//go:embed physics/constant/*.go physics/stars/*.go physics/structure/*.go
//go:embed rpc/*.go rpc/wire/*.go
var Contract embed.FS
