//go:build !purego

#include "textflag.h"

// func withinLanes(values []float64, low, high float64) (done int)
TEXT ·withinLanes(SB), NOSPLIT, $0-48
	MOVQ values_base+0(FP), SI
	MOVQ values_len+8(FP), CX
	VBROADCASTSD low+24(FP), Z1
	VBROADCASTSD high+32(FP), Z2
	MOVQ CX, R15
	SUBQ $8, CX
	JLT  end

block:
	VMOVUPD (SI), Z0
	VCMPPD $0x1d, Z1, Z0, K1          // value >= low
	VCMPPD $0x12, Z2, Z0, K1, K1      // and value <= high
	KORTESTB K1, K1
	JCC  end                          // not all eight
	ADDQ $64, SI
	SUBQ $8, CX
	JGE  block

end:
	SUBQ CX, R15                      // CX is what is left, less 8
	SUBQ $8, R15
	MOVQ R15, done+40(FP)
	VZEROUPPER
	RET
