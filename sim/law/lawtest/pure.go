package lawtest

import (
	"fmt"
	"math"
	"reflect"
	"sync"

	"wane/sim/law"
)

// checkCard finds what is wrong with the card.
func (k *kit) checkCard() {
	for _, f := range law.CheckCard(k.card) {
		k.found("card", "", "%v", f)
	}
	if k.card.Formula == "" || k.card.Domain == "" {
		k.found("card", "", "formula and domain must be given")
	}
}

func (k *kit) checkDescribe() {
	for range 3 {
		if again := k.law.Describe(); !reflect.DeepEqual(again, k.card) {
			k.found("describe", "", "the card differs later: %+v, then %+v", k.card, again)
			return
		}
	}
}

// checkAnswer finds answers on plausible rows that break the rules. The checks
// that compare answers make sense only if there are any: it tells.
func (k *kit) checkAnswer(q law.Question) bool {
	if _, err := k.ask(q.Name, k.plausible(q, 1000)); err != nil {
		k.wrong("answer", q.Name, "", err)
		return false
	}
	return true
}

// checkShapes asks about few and many rows.
func (k *kit) checkShapes(q law.Question) {
	out, err := k.direct(q.Name, k.plausible(q, 0))
	switch {
	case err != nil:
		k.found("shapes", q.Name, "no rows: %v", err)
	case out.Rows != 0 || len(out.Columns) != len(k.card.Outputs(q.Name)):
		k.found("shapes", q.Name, "no rows: %d rows of %d columns, want 0 of %d", out.Rows, len(out.Columns), len(k.card.Outputs(q.Name)))
	}
	for _, n := range []int{1, 2, 1000, 16384} {
		if _, err := k.ask(q.Name, k.plausible(q, n)); err != nil {
			k.wrong("shapes", q.Name, fmt.Sprintf("%d rows: ", n), err)
		}
	}
	k.checkMany(q)
}

// most is how many rows may come in one batch.
const most = 65536

// checkMany asks about as many rows as may come, a few over and over: each is
// answered as it is alone.
func (k *kit) checkMany(q law.Question) {
	few := k.plausible(q, 1000)
	want, err := k.ask(q.Name, few)
	if err != nil {
		return // reported before
	}
	want = pick(want, upTo(0, want.Rows))
	rows := upTo(0, most)
	for i := range rows {
		rows[i] %= few.Rows
	}
	out, err := k.ask(q.Name, pick(few, rows))
	if err != nil {
		k.wrong("shapes", q.Name, fmt.Sprintf("%d rows: ", most), err)
	} else if d := differ(pick(want, rows), out); d != "" {
		k.found("rows", q.Name, "asked %d rows, then those over and over up to %d: %s", few.Rows, most, d)
	}
}

// checkPure asks the same batch again: at once, after other batches, and in
// many goroutines at a time. What the law reads must be left as it was.
func (k *kit) checkPure(q law.Question) {
	in := k.plausible(q, 100)
	kept := pick(in, upTo(0, in.Rows))
	first, err := k.ask(q.Name, in)
	if err != nil {
		k.found("answer", q.Name, "%v", err)
		return
	}
	if d := differ(kept, in); d != "" {
		k.found("input", q.Name, "the law wrote to what it reads: %s", d)
		in = kept
	}
	first = pick(first, upTo(0, first.Rows)) // the law may lend what it keeps
	again := func(when string) {
		out, err := k.ask(q.Name, in)
		if err != nil {
			k.found("pure", q.Name, "%s: %v", when, err)
		} else if d := differ(first, out); d != "" {
			k.found("pure", q.Name, "%s: %s", when, d)
		}
	}
	again("asked twice")
	for _, other := range k.card.Questions {
		batch := k.plausible(other, 400)
		for low := 0; low < batch.Rows; low += 37 {
			if _, err := k.ask(other.Name, pick(batch, upTo(low, min(low+37, batch.Rows)))); err != nil {
				break // reported where it belongs
			}
		}
	}
	again("asked after other batches")
	if d := k.together(q.Name, in, first); d != "" {
		k.found("pure", q.Name, "asked in many goroutines: %s", d)
	}
}

// together asks one batch in several goroutines at a time.
func (k *kit) together(question string, in, want law.Batch) string {
	const many, times = 4, 5
	var wait sync.WaitGroup
	said := make([]string, many)
	for g := range many {
		wait.Go(func() {
			for range times {
				out, err := k.ask(question, in)
				if err != nil {
					said[g] = err.Error()
				} else if d := differ(want, out); d != "" {
					said[g] = d
				}
			}
		})
	}
	wait.Wait()
	for _, s := range said {
		if s != "" {
			return s
		}
	}
	return ""
}

// checkUnset lends the law memory full of rubbish.
func (k *kit) checkUnset(q law.Question) {
	in := k.plausible(q, 100)
	want, err := k.ask(q.Name, in)
	if err != nil {
		return // reported before
	}
	for _, rubbish := range []float64{math.NaN(), 0.25} {
		var arena law.Arena
		values, words := arena.Values(64*in.Rows), arena.Words(64*in.Rows)
		for i := range values {
			values[i], words[i] = rubbish, uint8(i%5)
		}
		arena.Reset()
		out, err := k.ask(q.Name, in.With(&arena))
		if err != nil {
			k.found("unset", q.Name, "in lent memory: %v", err)
		} else if d := differ(want, out); d != "" {
			k.found("unset", q.Name, "in new memory, then in lent memory: %s", d)
		}
	}
}

// pieces is how many are asked about at most, since each may take a
// millisecond.
const pieces = 200

// checkRows asks a batch in pieces, shuffled and doubled.
func (k *kit) checkRows(q law.Question) {
	in := k.plausible(q, 1000)
	want, err := k.ask(q.Name, in)
	if err != nil {
		return // reported before
	}
	want = pick(want, upTo(0, want.Rows))
	compare := func(how string, want, out law.Batch, err error) {
		if err != nil {
			k.wrong("rows", q.Name, how+": ", err)
			return
		}
		switch d := differ(want, out); {
		case d == "":
		case reordered(want, out):
			k.found("order", q.Name, "asked whole, then %s: the same values in other rows: %s", how, d)
		default:
			k.found("rows", q.Name, "asked whole, then %s: %s", how, d)
		}
	}
	for _, size := range []int{1, 7, 64} {
		var out law.Batch
		rows := min(in.Rows, pieces*size)
		for low := 0; low < rows && err == nil; low += size {
			var piece law.Batch
			if piece, err = k.ask(q.Name, pick(in, upTo(low, min(low+size, rows)))); err == nil {
				out = appended(out, piece)
			}
		}
		compare(fmt.Sprintf("in pieces of %d", size), pick(want, upTo(0, rows)), out, err)
	}
	order := random("shuffle").Perm(in.Rows)
	back := make([]int, in.Rows)
	for i, row := range order {
		back[row] = i
	}
	out, err := k.ask(q.Name, pick(in, order))
	if err == nil {
		out = pick(out, back)
	}
	compare("shuffled and put back", want, out, err)
	out, err = k.ask(q.Name, appended(appended(law.Batch{}, in), in))
	if err == nil {
		want = appended(appended(law.Batch{}, want), want)
	}
	compare("twice over in one batch", want, out, err)
}
