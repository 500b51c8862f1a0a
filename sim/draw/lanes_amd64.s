//go:build !purego

#include "textflag.h"

// MIX is mix of every element of x.
#define MIX(x) \
	VPSRLQ $30, x, Z2; \
	VPXORQ Z2, x, x; \
	VPMULLQ Z19, x, x; \
	VPSRLQ $27, x, Z2; \
	VPXORQ Z2, x, x; \
	VPMULLQ Z20, x, x; \
	VPSRLQ $31, x, Z2; \
	VPXORQ Z2, x, x

// BEGIN spreads the arguments that both functions have.
#define BEGIN \
	MOVQ dst_base+0(FP), DI; \
	MOVQ dst_len+8(FP), CX; \
	VPBROADCASTQ name+24(FP), Z16; \
	VPBROADCASTQ turned+32(FP), Z17; \
	MOVQ c+40(FP), DX; \
	VPADDQ 0(DX), Z16, Z16; \        // the names of eight objects
	VPBROADCASTQ 64(DX), Z18; \      // to the next eight
	VPBROADCASTQ 72(DX), Z19; \      // finalFirst
	VPBROADCASTQ 80(DX), Z20; \      // finalSecond
	VBROADCASTSD 88(DX), Z21; \      // nearlyHalf
	VBROADCASTSD 96(DX), Z22         // unit53

// func uniformLanes(dst []float64, name, turned uint64, c *laneNumbers)
TEXT ·uniformLanes(SB), NOSPLIT, $0-48
	BEGIN
	SUBQ $8, CX
	JLT  end

block:
	VMOVDQA64 Z16, Z0
	VPADDQ Z18, Z16, Z16
	MIX(Z0)
	VPXORQ Z17, Z0, Z0                // z
	MIX(Z0)                           // b
	VPSRLQ $11, Z0, Z0
	VCVTQQ2PD Z0, Z0
	VADDPD Z21, Z0, Z0
	VMULPD Z22, Z0, Z0
	VMOVUPD Z0, (DI)
	ADDQ $64, DI
	SUBQ $8, CX
	JGE  block

end:
	VZEROUPPER
	RET

// func exponentialLanes(dst []float64, name, turned uint64, c *laneNumbers, table *[256]layer, outside *[stride / lanes]uint8)
TEXT ·exponentialLanes(SB), NOSPLIT, $0-64
	BEGIN
	VPBROADCASTQ 104(DX), Z23         // the bits of a layer, times 16
	MOVQ table+48(FP), R8
	MOVQ outside+56(FP), SI
	SUBQ $8, CX
	JLT  end

block:
	VMOVDQA64 Z16, Z0
	VPADDQ Z18, Z16, Z16
	MIX(Z0)
	VPXORQ Z17, Z0, Z0                // z
	MIX(Z0)                           // b

	// The rows of the table: inside to Z4, width to Z5.
	VPSLLQ $4, Z0, Z6
	VPANDQ Z23, Z6, Z6
	VPMOVQW Z6, X6
	VMOVQ X6, AX
	VPEXTRQ $1, X6, BX
	MOVWLZX AX, R9
	SHRQ $16, AX
	MOVWLZX AX, R10
	SHRQ $16, AX
	MOVWLZX AX, R11
	SHRQ $16, AX
	MOVWLZX BX, R12
	SHRQ $16, BX
	MOVWLZX BX, R13
	SHRQ $16, BX
	MOVWLZX BX, DX
	SHRQ $16, BX
	VMOVUPD (R8)(R9*1), X6
	VMOVUPD (R8)(R10*1), X7
	VINSERTF64X2 $1, (R8)(R11*1), Z6, Z6
	VINSERTF64X2 $1, (R8)(AX*1), Z7, Z7
	VINSERTF64X2 $2, (R8)(R12*1), Z6, Z6
	VINSERTF64X2 $2, (R8)(R13*1), Z7, Z7
	VINSERTF64X2 $3, (R8)(DX*1), Z6, Z6
	VINSERTF64X2 $3, (R8)(BX*1), Z7, Z7
	VUNPCKLPD Z7, Z6, Z4
	VUNPCKHPD Z7, Z6, Z5

	VPSRLQ $11, Z0, Z0                // j
	VPCMPUQ $5, Z4, Z0, K1            // not j < inside
	KMOVB K1, (SI)
	INCQ SI
	VCVTQQ2PD Z0, Z0
	VADDPD Z21, Z0, Z0
	VMULPD Z5, Z0, Z0
	VMOVUPD Z0, (DI)
	ADDQ $64, DI
	SUBQ $8, CX
	JGE  block

end:
	VZEROUPPER
	RET
