package engine

// Draw numbers within a process's stream. They may never change: a change
// would change every published run.
const (
	drawU      = 0  // the u column of a question
	drawE      = 1  // the e column of a question
	drawPick   = 2  // which word: kind of remnant, outcome of a turning
	drawSize   = 3  // the u column of remain
	drawClock  = 8  // + index of the clock within its law: exponential threshold
	drawDivert = 16 // + index of the clock within the divert question
	drawMeet   = 32 // the u column of meet
	drawSeek   = 64 // + try: which partner
)

// Generations: a change of kind adds one, a merger starts at the next multiple
// of mergerGeneration.
const mergerGeneration = 16
