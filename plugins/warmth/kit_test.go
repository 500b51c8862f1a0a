package warmth_test

import (
	"testing"

	"wane/plugins/warmth"
	"wane/sim/law/lawtest"
)

func TestKitDarkMatter(t *testing.T) { lawtest.Run(t, warmth.DarkMatter()) }

func TestKitNone(t *testing.T) { lawtest.Run(t, warmth.None()) }
