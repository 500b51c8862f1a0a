//go:build !purego

#include "textflag.h"

DATA eight<>+0(SB)/4, $0
DATA eight<>+4(SB)/4, $1
DATA eight<>+8(SB)/4, $2
DATA eight<>+12(SB)/4, $3
DATA eight<>+16(SB)/4, $4
DATA eight<>+20(SB)/4, $5
DATA eight<>+24(SB)/4, $6
DATA eight<>+28(SB)/4, $7
GLOBL eight<>(SB), RODATA|NOPTR, $32

// func aloneBlocks(a *alone, n int)
TEXT ·aloneBlocks(SB), NOSPLIT, $0-16
	MOVQ a+0(FP), DI
	MOVQ n+8(FP), CX
	MOVQ 0(DI), SI                    // lead
	MOVQ 8(DI), R8                    // other
	MOVQ 16(DI), R9
	VBROADCASTSD 24(DI), Z16          // now
	VBROADCASTSD 32(DI), Z17
	VBROADCASTSD 40(DI), Z18
	VBROADCASTSD 48(DI), Z19          // rho
	VBROADCASTSD 56(DI), Z20
	MOVQ 64(DI), R10                  // place
	MOVQ 72(DI), R11                  // left
	MOVQ 80(DI), R12                  // stage
	MOVQ 88(DI), R13                  // keys
	MOVQ 96(DI), BX                   // ids
	MOVQ 104(DI), DX                  // rest
	MOVQ 112(DI), AX                  // first
	VMOVQ AX, X1
	VPBROADCASTD X1, Y1
	VPADDD eight<>(SB), Y1, Y1        // ids
	MOVL $8, AX
	VMOVQ AX, X2
	VPBROADCASTD X2, Y2
	MOVQ $0x7ff0000000000000, AX
	VPBROADCASTQ AX, Z22              // never
	XORQ R15, R15

block:
	MOVQ (R10)(R15*1), AX
	XORQ 136(DI), AX                  // bound
	ORQ  (R11)(R15*1), AX
	JNZ  other
	MOVQ (R12)(R15*1), AX
	XORQ 144(DI), AX                  // second stage
	JNZ  other
	VMOVUPD (SI)(R15*8), Z3           // reading
	VSUBPD Z16, Z3, Z4                // soon
	VCMPPD $0x11, Z22, Z4, K1         // soon < never
	VMOVUPD (R8)(R15*8), Z5
	VSUBPD Z17, Z5, Z5
	VMULPD Z19, Z4, Z6
	VCMPPD $0x1e, Z6, Z5, K1, K1      // left > rho soon
	VMOVUPD (R9)(R15*8), Z5
	VSUBPD Z18, Z5, Z5
	VMULPD Z20, Z4, Z6
	VCMPPD $0x1e, Z6, Z5, K1, K1
	VCOMPRESSPD Z3, K1, Z3
	VMOVUPD Z3, (R13)
	VPCOMPRESSD Z1, K1, Z4
	VMOVDQU Y4, (BX)
	KMOVB K1, AX
	POPCNTL AX, R14
	LEAQ (R13)(R14*8), R13
	LEAQ (BX)(R14*4), BX
	XORL $0xff, AX
	JZ   next
	KMOVB AX, K2
	VPCOMPRESSD Z1, K2, Z4
	VMOVDQU Y4, (DX)
	POPCNTL AX, R14
	LEAQ (DX)(R14*4), DX
	JMP  next

other:
	VMOVDQU Y1, (DX)
	ADDQ $32, DX

next:
	VPADDD Y2, Y1, Y1
	ADDQ $8, R15
	CMPQ R15, CX
	JLT  block
	SUBQ 88(DI), R13
	SHRQ $3, R13
	MOVQ R13, 120(DI)                 // taken
	SUBQ 104(DI), DX
	SHRQ $2, DX
	MOVQ DX, 128(DI)                  // remain
	VZEROUPPER
	RET
