package conform

// check is one thing that is judged.
type check struct {
	word   string
	passed string // what holds if nothing was found
	advice string // what to do otherwise
}

// checks are all that is judged, in the order in which it is told.
var checks = []check{
	{"folder", "the folder is in order and its program is there",
		"correct law.toml, or what the build says; 'wane law new' makes a folder that is in order"},
	{"start", "starts and shows a card",
		"start it by hand and read what it says; law.toml says how it is started"},
	{"by-hand", "started by hand it says what it is and ends",
		"let main call nothing but serve: the kit then says so and ends with exit code 1"},
	{"card", "the card is in order",
		"correct the card as the text says; 'wane laws' of a built-in law of this process shows one that is in order"},
	{"units", "the units of the parameters are known",
		"write units as VOUnits does: yr, solMass, K, km/s; empty for a pure number"},
	{"describe", "the card is the same each time",
		"make the card a constant, of nothing that changes"},
	{"answer", "answers keep the rules",
		"keep to the rule for every row: never is +Inf, zero is -Inf where a log10 is answered, and nothing is NaN"},
	{"chances", "chances are 0 to 1 and sum to 1",
		"let the last chance be 1 minus the others, and none be below 0"},
	{"shapes", "0, 1, 2, 1000, 16384 and 65536 rows are answered",
		"use operations on whole columns that hold for no rows, for one and for 65536"},
	{"pure", "the same rows give the same bits, whatever was asked before or meanwhile",
		"keep nothing between calls: no counter, clock, file or random number; chance comes in as the columns u and e"},
	{"input", "what it reads is left as it was",
		"copy a column before changing it"},
	{"unset", "every row of every column is set",
		"set each row of a new column: its memory holds anything at first"},
	{"rows", "a row's answer depends on that row alone: split, shuffled and doubled alike",
		"use of other rows nothing: no sum, mean, greatest, count or position; " +
			"in Python take wanelaw's exp and log, since numpy's may differ in the last bit with the place in an array"},
	{"order", "answers come in the order of the rows",
		"do not sort, or put the rows back into the order in which they came"},
	{"monotone", "quantiles rise with the draw, cooling never warms, hazards never fall",
		"look at the formula at the place named: a wrong sign, a branch that does not meet its neighbour, or rounding"},
	{"size", "answers are of the size that their units let expect",
		"look at the unit: waits, dates and ages are log10 of years, temperatures log10 of K, masses solMass, power W"},
	{"domain", "the corners of every column and parameter are answered",
		"treat the corner by itself: mass next to 0 or at 1e20 solMass, age 0 (-Inf as log10), u next to 0 and 1, each end of a parameter"},
	{"foretell", "what is foretold is the integral of what is worn",
		"answer log10 of the integral dM/rate from the mass down to the next threshold; or leave foretell off the card: the engine then integrates wear"},
	{"parameter", "every parameter changes something",
		"use the parameter, or take it off the card"},
	{"fresh", "a new process shows the same card and gives the same bits",
		"take nothing from the clock, the process number, the environment or the order of a hash table"},
	{"crash", "it neither crashed nor hung",
		"read the end of its log; the text of another failure may say over which rows it happened"},
	{"speed", "answers fast enough", "work on whole columns at once, not row by row, and read files before serving"},
	{"end", "ends when told to, and leaves nothing behind",
		"start no process or thread of your own, write no file, and let serve return"},
}

func known(word string) check {
	for _, c := range checks {
		if c.word == word {
			return c
		}
	}
	return check{}
}
