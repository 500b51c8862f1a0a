//go:build !purego

#include "textflag.h"

// func steadyBlocks(x, birth, death, s0, s1 []float64, of *steadyNumbers) (done int)
TEXT ·steadyBlocks(SB), NOSPLIT, $0-136
	MOVQ x_base+0(FP), DI
	MOVQ x_len+8(FP), CX
	MOVQ birth_base+24(FP), R8
	MOVQ death_base+48(FP), R9
	MOVQ s0_base+72(FP), R10
	MOVQ s1_base+96(FP), R11
	MOVQ of+120(FP), DX
	VBROADCASTSD 0(DX), Z16           // t0
	VBROADCASTSD 8(DX), Z17           // r0
	VBROADCASTSD 16(DX), Z18          // rate
	VBROADCASTSD 24(DX), Z19          // limit
	XORQ AX, AX
	SUBQ $8, CX
	JLT  end

block:
	VMOVUPD (DI)(AX*8), Z0            // e
	VMOVUPD (R10)(AX*8), Z1           // s0
	VMOVUPD (R11)(AX*8), Z2           // s1
	VMULPD Z19, Z1, Z3
	VMULPD Z19, Z2, Z4
	VCMPPD $0x12, Z3, Z0, K1          // e <= s0 limit
	VCMPPD $0x12, Z4, Z0, K2          // e <= s1 limit
	KORTESTB K1, K2
	JNZ  end
	VMOVUPD (R8)(AX*8), Z3
	VMOVUPD (R9)(AX*8), Z4
	VSUBPD Z16, Z3, Z3
	VSUBPD Z16, Z4, Z4
	VMULPD Z18, Z3, Z3
	VMULPD Z18, Z4, Z4
	VADDPD Z17, Z3, Z3                // b
	VADDPD Z17, Z4, Z4                // d
	VSUBPD Z3, Z4, Z5                 // d - b
	VMULPD Z5, Z1, Z5
	VSUBPD Z5, Z0, Z0                 // e - s0 (d - b)
	VDIVPD Z2, Z0, Z0
	VADDPD Z4, Z0, Z0
	VMOVUPD Z0, (DI)(AX*8)
	ADDQ $8, AX
	CMPQ AX, CX
	JLE  block

end:
	MOVQ AX, done+128(FP)
	VZEROUPPER
	RET
