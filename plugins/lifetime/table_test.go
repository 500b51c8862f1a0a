package lifetime

import (
	"testing"

	"wane/sim/law/lawtest"
)

func TestTable(t *testing.T) { lawtest.Run(t, Table()) }
