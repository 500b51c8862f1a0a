package scenario

import (
	"math"
	"strings"
	"testing"
)

// No file makes the decoder panic, every refusal says where, and what is
// accepted is written out as a scenario that is read back as the same.
func FuzzLoad(f *testing.F) {
	for _, s := range []string{
		reach, "base = \"reach\"", "[galaxy]\nobjects = 0x10\nradius = '1 pc'", "a.b.c = {d = [1, [2], {e = 1}]}",
		"base = \"reach\"\n[populations.p]\nkinds = [\"star\"]\ntemperature = \"> 1.1 floor\"",
		"base = \"reach\"\nuntil = \"10^(10^26) yr\"\n[laws]\ninfall = \"none\"", "[[x]]\n[x]\n[x.y", "\xef\xbb\xbfseed = 1", "x = 1979-05-27",
	} {
		f.Add(s, "nucleon-decay=stable", "galaxy.radius=8kpc")
	}
	reg := registry(f)
	f.Fuzz(func(t *testing.T, text, choice, set string) {
		s, _, err := Load(files(text), "x.toml", reg, defaults(), Overrides{Laws: []string{choice}, Sets: []string{set}})
		if err != nil {
			for _, x := range err.(Faults) {
				if x.Message == "" || x.File == "" || (x.Line == 0) != (x.Column == 0) {
					t.Errorf("a fault that says nothing: %+v", x)
				}
			}
			return
		}
		again, _, err := Load(files(s.Text()), "x.toml", reg, nil, Overrides{})
		if err != nil || again.Digest != s.Digest {
			t.Errorf("not read back: %v\n%s", err, s.Text())
		}
	})
}

// No comparison makes the reader panic; what it accepts is a positive number.
func FuzzCondition(f *testing.F) {
	for _, s := range []string{"> 798 K", "<5K", "> 1.1 floor", "> 2 times the floor", "> 1e-6 Lsun", ">", "> floor", "> 1e400 K", "< 0.1 eV"} {
		f.Add("temperature", s)
		f.Add("luminosity", s)
	}
	f.Fuzz(func(t *testing.T, what, text string) {
		w, err := ParseWarmth(what, text)
		if err == nil && !(w.Value > 0 && w.Value <= math.MaxFloat64) {
			t.Errorf("%q: %v", text, w.Value)
		}
		if err != nil && err.Error() == "" {
			t.Errorf("%q: an empty message", text)
		}
	})
}

// A file of the largest size, of nothing but faults, is refused in few words
// and in time that grows with its size, not with its square (which would take
// this test past its limit).
func TestLargestFaultyFile(t *testing.T) {
	for name, text := range map[string]string{
		"keys":   strings.Repeat("a", 60) + " = 1\n",
		"tables": "[x]\n",
		"line":   "y=1,",
		"deep":   "a = " + strings.Repeat("[", 9000) + strings.Repeat("]", 9000) + "\n",
		"list":   "1,",
		"dots":   "a.",
		"syntax": "= \n",
	} {
		text = strings.Repeat(text, maxFile/len(text))
		switch name {
		case "list":
			text = "a = [" + text[:maxFile-10] + "]"
		case "line":
			text = "a = {" + text[:maxFile-20] + "y=1}"
		}
		t.Run(name, func(t *testing.T) {
			_, _, err := Load(files(text), "x.toml", registry(t), defaults(), Overrides{})
			if err == nil || len(err.Error()) > 400_000 {
				t.Errorf("%.200v", err)
			}
		})
	}
}
