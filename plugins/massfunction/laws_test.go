package massfunction

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestSalpeter(t *testing.T)       { lawtest.Run(t, Salpeter()) }
func TestChabrier(t *testing.T)       { lawtest.Run(t, Chabrier()) }
func TestChabrierSystem(t *testing.T) { lawtest.Run(t, ChabrierSystem()) }
