package rpc

import (
	"fmt"
	"io"
	"log"
	"sync"
	"time"

	"github.com/hashicorp/go-hclog"
	"github.com/rs/zerolog"
)

// logger is zerolog in the shape that go-plugin logs to. It also forwards what
// a law writes to its standard error, which may be a flood: so it lets through
// a burst of lines, then so many a second, and says how many it left out.
type logger struct {
	to      zerolog.Logger
	name    string
	implied []any
	limit   *limit
}

func newLogger(w io.Writer, name string) *logger {
	to := zerolog.Nop()
	if w != nil {
		to = zerolog.New(zerolog.SyncWriter(w)).Level(zerolog.DebugLevel).With().Timestamp().Str("law", name).Logger()
	}
	return &logger{to: to, limit: &limit{tokens: burst}}
}

// limit is a bucket of tokens, one for each line.
type limit struct {
	mu      sync.Mutex
	tokens  float64
	at      time.Time
	dropped int
}

const (
	burst       = 200.0
	linesSecond = 20.0
	longestLine = 4096 // bytes
)

// take tells whether a line may pass and how many before it could not.
func (l *limit) take(now time.Time) (ok bool, dropped int) {
	l.mu.Lock()
	defer l.mu.Unlock()
	if !l.at.IsZero() {
		l.tokens = min(burst, l.tokens+float64(now.Sub(l.at).Seconds()*linesSecond))
	}
	l.at = now
	if l.tokens < 1 {
		l.dropped++
		return false, 0
	}
	l.tokens--
	dropped, l.dropped = l.dropped, 0
	return true, dropped
}

// levels of the two libraries, which agree but for their numbers.
func zeroLevel(l hclog.Level) zerolog.Level {
	switch l {
	case hclog.Trace:
		return zerolog.TraceLevel
	case hclog.Info:
		return zerolog.InfoLevel
	case hclog.Warn:
		return zerolog.WarnLevel
	case hclog.Error:
		return zerolog.ErrorLevel
	case hclog.Off:
		return zerolog.Disabled
	}
	return zerolog.DebugLevel // also what has no level
}

func (l *logger) Log(level hclog.Level, msg string, args ...any) {
	event := l.to.WithLevel(zeroLevel(level))
	if event == nil || zeroLevel(level) < l.to.GetLevel() {
		return
	}
	ok, dropped := l.limit.take(time.Now())
	if !ok {
		return
	}
	if dropped > 0 {
		l.to.Warn().Int("lines", dropped).Msg("the law logs too much: lines left out")
	}
	if l.name != "" {
		event = event.Str("from", l.name)
	}
	l.pairs(event, l.implied)
	l.pairs(event, args)
	if len(msg) > longestLine {
		msg = msg[:longestLine]
	}
	event.Msg(msg)
}

func (l *logger) pairs(event *zerolog.Event, args []any) {
	for i := 0; i < len(args); i += 2 {
		if i+1 == len(args) {
			event.Str(hclog.MissingKey, fmt.Sprint(args[i]))
			return
		}
		key := fmt.Sprint(args[i])
		if key == "timestamp" {
			key = "said" // the law's own time
		}
		event.Str(key, fmt.Sprint(args[i+1]))
	}
}

func (l *logger) Trace(msg string, args ...any) { l.Log(hclog.Trace, msg, args...) }
func (l *logger) Debug(msg string, args ...any) { l.Log(hclog.Debug, msg, args...) }
func (l *logger) Info(msg string, args ...any)  { l.Log(hclog.Info, msg, args...) }
func (l *logger) Warn(msg string, args ...any)  { l.Log(hclog.Warn, msg, args...) }
func (l *logger) Error(msg string, args ...any) { l.Log(hclog.Error, msg, args...) }

func (l *logger) IsTrace() bool { return l.GetLevel() <= hclog.Trace }
func (l *logger) IsDebug() bool { return l.GetLevel() <= hclog.Debug }
func (l *logger) IsInfo() bool  { return l.GetLevel() <= hclog.Info }
func (l *logger) IsWarn() bool  { return l.GetLevel() <= hclog.Warn }
func (l *logger) IsError() bool { return l.GetLevel() <= hclog.Error }

// GetLevel tells the truth: go-plugin does not look at lines that would be
// thrown away.
func (l *logger) GetLevel() hclog.Level {
	switch l.to.GetLevel() {
	case zerolog.TraceLevel:
		return hclog.Trace
	case zerolog.DebugLevel:
		return hclog.Debug
	case zerolog.InfoLevel:
		return hclog.Info
	case zerolog.WarnLevel:
		return hclog.Warn
	case zerolog.ErrorLevel, zerolog.FatalLevel, zerolog.PanicLevel:
		return hclog.Error
	}
	return hclog.Off
}

func (l *logger) SetLevel(level hclog.Level) { l.to = l.to.Level(zeroLevel(level)) }
func (l *logger) ImpliedArgs() []any         { return l.implied }
func (l *logger) Name() string               { return l.name }

func (l *logger) With(args ...any) hclog.Logger {
	sub := *l
	sub.implied = append(append([]any(nil), l.implied...), args...)
	return &sub
}

func (l *logger) Named(name string) hclog.Logger {
	if l.name != "" {
		name = l.name + "." + name
	}
	return l.ResetNamed(name)
}

func (l *logger) ResetNamed(name string) hclog.Logger {
	sub := *l
	sub.name = name
	return &sub
}

func (l *logger) StandardLogger(o *hclog.StandardLoggerOptions) *log.Logger {
	return log.New(l.StandardWriter(o), "", 0)
}

func (l *logger) StandardWriter(*hclog.StandardLoggerOptions) io.Writer { return l.to }
