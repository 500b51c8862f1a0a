package rpc

import (
	"bytes"
	"context"
	"errors"
	"fmt"
	"strings"

	"google.golang.org/protobuf/proto"
	"wane/sim/law"
	"wane/sim/rpc/wire"
)

// CardError is everything wrong with the card of an outside law.
type CardError struct {
	Name, ID string // what the person called it; process/name
	Faults   []error
}

func (e *CardError) Error() string {
	text := make([]string, len(e.Faults))
	for i, f := range e.Faults {
		text[i] = "\n  " + f.Error()
	}
	return fmt.Sprintf("law %s (%s): its card cannot be used:%s", e.Name, e.ID, strings.Join(text, ""))
}

// Unwrap gives the faults one by one.
func (e *CardError) Unwrap() []error { return e.Faults }

// Open starts an outside law and judges its card. It lives until Close; once
// ctx is done it answers no more. Open fails when the process does not start or
// does not describe itself, when its card is not the same twice, and with a
// [CardError] when the card is faulty.
func Open(ctx context.Context, s Start) (*Law, error) {
	s.Options = s.Options.withDefaults()
	folder, err := newSocketFolder()
	if err != nil {
		return nil, fmt.Errorf("law %s: %w", s.Name, err)
	}
	l := &Law{start: s, ctx: ctx, folder: folder, log: newLogger(s.Log, s.Name), errs: &tail{}, slots: make(chan struct{}, s.InFlight)}
	if err := l.open(); err != nil {
		_ = l.Close()
		return nil, err
	}
	return l, nil
}

func (l *Law) open() error {
	c, err := startChild(l.ctx, l.start, l.folder.path, l.log, l.errs)
	if err != nil {
		return l.explain(fmt.Errorf("law %s: %w", l.start.Name, err))
	}
	l.child = c
	first, err := l.card1(c)
	if err != nil {
		return err
	}
	again, err := l.card1(c)
	if err != nil {
		return err
	}
	card, faults := cardFromWire(first)
	c.converses(first.Direct, l.folder.path, l.start.InFlight)
	if l.described = canonical(first); !bytes.Equal(l.described, canonical(again)) {
		faults = append(faults, errors.New("card: it is not the same when asked for twice"))
	}
	l.card, l.runtime = card, first.Runtime
	if faults = append(faults, law.CheckCard(card)...); len(faults) > 0 {
		return &CardError{Name: l.start.Name, ID: card.Process + "/" + card.Name, Faults: faults}
	}
	return nil
}

// card1 asks a child for its card once.
func (l *Law) card1(c *child) (*wire.Card, error) {
	card, err := c.describe(l.ctx, l.start.Describing, l.features())
	if err == nil {
		return card, nil
	}
	if l.ctx.Err() != nil {
		return nil, fmt.Errorf("law %s: %w", l.start.Name, l.ctx.Err())
	}
	what := callFault(err, c, l.start.Describing)
	return nil, l.explain(fmt.Errorf("law %s: asked for its card: %s", l.start.Name, what))
}

// canonical is a card as bytes, but for what is another at each start.
func canonical(card *wire.Card) []byte {
	card = proto.CloneOf(card)
	card.Direct = ""
	b, err := proto.MarshalOptions{Deterministic: true}.Marshal(card)
	if err != nil { // only text that is not UTF-8, which cannot have come in
		return nil
	}
	return b
}

// describeRequest says what this host speaks, and its lists of words.
func describeRequest(features []string) *wire.DescribeRequest {
	return &wire.DescribeRequest{Contract: Contract, Features: features, Words: []*wire.WordList{
		{Name: "kind", Words: law.KindWords}, {Name: "place", Words: law.PlaceWords},
		{Name: "origin", Words: law.OriginWords}, {Name: "composition", Words: law.CompositionWords},
	}}
}

func (l *Law) features() []string {
	if l.start.OnlyCalls {
		return nil
	}
	return Features()
}

// explain adds the end of the law's log to an error.
func (l *Law) explain(err error) error {
	return fmt.Errorf("%w%s", err, logged(l.Log()))
}

func logged(log string) string {
	if log == "" {
		return "; its log is empty"
	}
	return "; its log:\n  " + strings.ReplaceAll(log, "\n", "\n  ")
}
