//go:build !purego

#include "textflag.h"

// func logLanes(dst, src []float64, table *[128]logEntry, c *logNumbers) (done int)
//
// Eight elements a turn. Comments name the
// variables of logReduce, logSplit, logSeries and largeAndSmall.
TEXT ·logLanes(SB), NOSPLIT, $0-72
	MOVQ dst_base+0(FP), DI
	MOVQ src_base+24(FP), SI
	MOVQ src_len+32(FP), CX
	MOVQ table+48(FP), R8
	MOVQ c+56(FP), DX
	VPBROADCASTQ 0(DX), Z16           // leastBits
	VPBROADCASTQ 8(DX), Z17           // normalBits
	VPBROADCASTQ 16(DX), Z18          // logOffset
	VPBROADCASTQ 24(DX), Z19          // the bits of an exponent
	VPBROADCASTQ 32(DX), Z20          // highMask
	VPBROADCASTQ 40(DX), Z21          // the bits of an index, times 32
	VBROADCASTSD 48(DX), Z22          // 1
	VBROADCASTSD 56(DX), Z23          // -1/2
	VBROADCASTSD 64(DX), Z24          // 1/3
	VBROADCASTSD 72(DX), Z25          // -1/4
	VBROADCASTSD 80(DX), Z26          // 1/5
	VBROADCASTSD 88(DX), Z27          // -1/6
	VBROADCASTSD 96(DX), Z28          // 1/7
	VBROADCASTSD 104(DX), Z29         // log 2, high
	VBROADCASTSD 112(DX), Z30         // log 2, low
	VBROADCASTSD 120(DX), Z11         // log e, high; 0 to the base e
	VBROADCASTSD 128(DX), Z12         // log e, low
	VBROADCASTSD 136(DX), Z13         // log e
	VMOVDQU64 144(DX), Z14            // turns rows into the first two columns
	VMOVDQU64 208(DX), Z15            // and into the other two
	MOVQ 120(DX), R14
	MOVQ CX, R15
	SUBQ $8, CX
	JLT  end

block:
	VMOVUPD (SI), Z0            // x
	VPSUBQ Z16, Z0, Z1
	VPCMPUQ $5, Z17, Z1, K2           // not normal
	VPSUBQ Z18, Z0, Z1                // from

	// The rows of the table: inverse to Z2, high to Z3, low to Z4.
	MOVWLZX 5(SI), R9
	SUBL $0xe5f0, R9
	ANDL $0xfe0, R9
	MOVWLZX 13(SI), R10
	SUBL $0xe5f0, R10
	ANDL $0xfe0, R10
	MOVWLZX 21(SI), R11
	SUBL $0xe5f0, R11
	ANDL $0xfe0, R11
	MOVWLZX 29(SI), AX
	SUBL $0xe5f0, AX
	ANDL $0xfe0, AX
	MOVWLZX 37(SI), R12
	SUBL $0xe5f0, R12
	ANDL $0xfe0, R12
	MOVWLZX 45(SI), R13
	SUBL $0xe5f0, R13
	ANDL $0xfe0, R13
	MOVWLZX 53(SI), DX
	SUBL $0xe5f0, DX
	ANDL $0xfe0, DX
	MOVWLZX 61(SI), BX
	SUBL $0xe5f0, BX
	ANDL $0xfe0, BX
	VMOVUPD (R8)(R9*1), Y2
	VMOVUPD (R8)(R10*1), Y3
	VMOVUPD (R8)(R11*1), Y4
	VMOVUPD (R8)(AX*1), Y5
	VINSERTF64X4 $1, (R8)(R12*1), Z2, Z2
	VINSERTF64X4 $1, (R8)(R13*1), Z3, Z3
	VINSERTF64X4 $1, (R8)(DX*1), Z4, Z4
	VINSERTF64X4 $1, (R8)(BX*1), Z5, Z5
	VUNPCKLPD Z3, Z2, Z6
	VUNPCKLPD Z5, Z4, Z8
	VUNPCKHPD Z3, Z2, Z3
	VUNPCKHPD Z5, Z4, Z5
	VMOVAPD Z6, Z2
	VPERMT2PD Z8, Z14, Z2
	VPERMT2PD Z5, Z14, Z3
	VMOVAPD Z6, Z4
	VPERMT2PD Z8, Z15, Z4

	VPANDQ Z19, Z1, Z5
	VPSUBQ Z5, Z0, Z6                 // z
	VPANDQ Z20, Z6, Z5                // its high part
	VSUBPD Z5, Z6, Z6                 // its low part
	VPSRAQ $52, Z1, Z1
	VCVTQQ2PD Z1, Z1                  // k
	VMULPD Z2, Z5, Z5
	VSUBPD Z22, Z5, Z5                // a
	VMULPD Z2, Z6, Z6                 // b
	VADDPD Z6, Z5, Z7                 // r
	VMULPD Z7, Z7, Z8                 // r2
	VMULPD Z28, Z7, Z9
	VADDPD Z27, Z9, Z9
	VMULPD Z9, Z8, Z9                 // r2 (-1/6 + r/7)
	VMULPD Z26, Z7, Z10
	VADDPD Z25, Z10, Z10
	VADDPD Z9, Z10, Z9
	VMULPD Z9, Z8, Z9                 // r2 (-1/4 + r/5 + ...)
	VMULPD Z24, Z7, Z7
	VADDPD Z23, Z7, Z7
	VADDPD Z9, Z7, Z7
	VMULPD Z7, Z8, Z7                 // ln(1 + r) - r

	VMULPD Z30, Z1, Z8
	VADDPD Z4, Z8, Z8                 // k log 2 + low, the low parts
	VMULPD Z29, Z1, Z1
	VADDPD Z3, Z1, Z1                 // w
	TESTQ R14, R14
	JNZ  ten
	VADDPD Z8, Z6, Z6
	VADDPD Z6, Z7, Z6                 // small

sum:
	VADDPD Z5, Z1, Z2
	VSUBPD Z2, Z1, Z1
	VADDPD Z5, Z1, Z1
	VADDPD Z6, Z1, Z1
	VADDPD Z1, Z2, Z4
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

ten:
	VADDPD Z7, Z6, Z6
	VMULPD Z13, Z6, Z6
	VMULPD Z12, Z5, Z7
	VADDPD Z8, Z7, Z7
	VADDPD Z7, Z6, Z6                 // small
	VMULPD Z11, Z5, Z5                // a times the high part
	JMP  sum

far:
	VPXORQ Z1, Z1, Z1
	VCMPPD $0, Z1, Z0, K3             // 0 gives -Inf
	MOVQ $0x7ff0000000000000, AX
	VPBROADCASTQ AX, Z1
	VPCMPEQQ Z1, Z0, K4               // +Inf gives +Inf
	KORB K3, K4, K5
	KXORB K2, K5, K5
	KORTESTB K5, K5
	JNZ  end
	VMOVAPD Z1, K4, Z4
	MOVQ $0xfff0000000000000, AX
	VPBROADCASTQ AX, Z1
	VMOVAPD Z1, K3, Z4
	JMP  store
