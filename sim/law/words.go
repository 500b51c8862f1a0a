package law

// Kinds that every run knows. A law may add others (Card.Kinds).
const (
	Star = iota
	BrownDwarf
	WhiteDwarf
	NeutronStar
	BlackHole
	CentralHole
	StandardKinds // how many there are
)

// Places an object can be in.
const (
	Bound = iota
	Adrift
	Central
)

// Origins of an object.
const (
	Founded = iota
	Merged
)

// Compositions: what an object is mainly made of.
const (
	Hydrogen = iota
	Helium
	CarbonOxygen
	OxygenNeon
	Iron
	Neutrons
	Pure // a black hole: mass and nothing else
)

// KindWords, PlaceWords, OriginWords and CompositionWords are the word lists
// that the codes above index.
var (
	KindWords        = []string{"star", "brown-dwarf", "white-dwarf", "neutron-star", "black-hole", "central-hole"}
	PlaceWords       = []string{"bound", "adrift", "central"}
	OriginWords      = []string{"founded", "merged"}
	CompositionWords = []string{"hydrogen", "helium", "carbon-oxygen", "oxygen-neon", "iron", "neutrons", "pure"}
)

// Gone is what an object becomes when it ceases to exist.
const Gone = "gone"
