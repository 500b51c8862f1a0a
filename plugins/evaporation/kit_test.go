package evaporation_test

import (
	"testing"

	"wane/plugins/evaporation"
	"wane/sim/law/lawtest"
)

func TestKitPage(t *testing.T) { lawtest.Run(t, evaporation.Page()) }

func TestKitBlackBody(t *testing.T) { lawtest.Run(t, evaporation.BlackBody()) }
