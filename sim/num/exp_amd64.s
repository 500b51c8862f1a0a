//go:build !purego

#include "textflag.h"

// func expLanes(dst, src []float64, table *[128]expEntry, c *expNumbers) (done int)
//
// Eight elements a turn. Comments name the
// variables of expReduce, expSeries and scaled.
TEXT ·expLanes(SB), NOSPLIT, $0-72
	MOVQ dst_base+0(FP), DI
	MOVQ src_base+24(FP), SI
	MOVQ src_len+32(FP), CX
	MOVQ table+48(FP), R8
	MOVQ c+56(FP), DX
	VBROADCASTSD 0(DX), Z16           // steps
	VBROADCASTSD 8(DX), Z17           // high
	VBROADCASTSD 16(DX), Z18          // low
	VBROADCASTSD 24(DX), Z19          // c1 ...
	VBROADCASTSD 32(DX), Z20
	VBROADCASTSD 40(DX), Z21
	VBROADCASTSD 48(DX), Z22
	VBROADCASTSD 56(DX), Z23          // ... c5
	VBROADCASTSD 64(DX), Z24          // greatest
	VBROADCASTSD 72(DX), Z25          // over
	VBROADCASTSD 80(DX), Z26          // under
	MOVQ $0x4338000000000000, AX
	VPBROADCASTQ AX, Z27              // roundShift
	MOVQ $0x7fffffffffffffff, AX
	VPBROADCASTQ AX, Z28              // all but the sign
	MOVQ $0x7f0, AX
	VPBROADCASTQ AX, Z29              // index times 16 bytes
	MOVQ $0x7ff0000000000000, AX
	VPBROADCASTQ AX, Z30              // +Inf
	MOVQ CX, R15
	SUBQ $8, CX
	JLT  end

block:
	VMOVUPD (SI), Z0            // x
	VMULPD Z16, Z0, Z1
	VADDPD Z27, Z1, Z1                // shifted, whose low bits are k
	VSUBPD Z27, Z1, Z2                // n
	VMULPD Z17, Z2, Z3
	VSUBPD Z3, Z0, Z3
	VMULPD Z18, Z2, Z2
	VSUBPD Z2, Z3, Z3                 // r

	// The rows of the table: bits to Z4, rest to Z5.
	VPSLLQ $4, Z1, Z6
	VPANDQ Z29, Z6, Z6
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

	VPSLLQ $45, Z1, Z1
	VPADDQ Z1, Z4, Z4                 // s
	VMULPD Z3, Z3, Z6                 // r2
	VMULPD Z21, Z3, Z7
	VADDPD Z20, Z7, Z7
	VMULPD Z7, Z6, Z7                 // r2 (c2 + r c3)
	VMULPD Z23, Z3, Z8
	VADDPD Z22, Z8, Z8
	VMULPD Z6, Z6, Z6
	VMULPD Z8, Z6, Z6                 // r2 r2 (c4 + r c5)
	VADDPD Z6, Z7, Z7
	VMULPD Z19, Z3, Z3
	VADDPD Z7, Z3, Z3                 // p
	VADDPD Z3, Z5, Z5
	VMULPD Z5, Z4, Z5
	VADDPD Z5, Z4, Z4

	VPANDQ Z28, Z0, Z1
	VCMPPD $0x15, Z24, Z1, K2         // not |x| < greatest
	KORTESTB K2, K2
	JNZ  far

store:
	VMOVUPD Z4, (DI)
	ADDQ $64, SI
	ADDQ $64, DI
	SUBQ $8, CX
	JGE  block

end:
	SUBQ CX, R15                      // CX is what is left, less 8
	SUBQ $8, R15
	MOVQ R15, done+64(FP)
	VZEROUPPER
	RET

far:
	VCMPPD $0x1e, Z25, Z0, K3         // x > over
	VCMPPD $0x11, Z26, Z0, K4         // x < under
	KORB K3, K4, K5
	KXORB K2, K5, K5
	KORTESTB K5, K5
	JNZ  end
	VMOVAPD Z30, K3, Z4
	VPXORQ Z4, Z4, K4, Z4
	JMP  store
