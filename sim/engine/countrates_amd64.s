//go:build !purego

#include "textflag.h"

// Offsets in countRates.
#define rates 0
#define slows 6144
#define weight 12288
#define number 12296
#define first 12304
#define rate0 12312
#define slope 12336
#define series 12360

DATA steps<>+0(SB)/8, $0.0
DATA steps<>+8(SB)/8, $1.0
DATA steps<>+16(SB)/8, $2.0
DATA steps<>+24(SB)/8, $3.0
DATA steps<>+32(SB)/8, $4.0
DATA steps<>+40(SB)/8, $5.0
DATA steps<>+48(SB)/8, $6.0
DATA steps<>+56(SB)/8, $7.0
DATA steps<>+64(SB)/8, $8.0
GLOBL steps<>(SB), RODATA|NOPTR, $72

// The rates of one clock and their inverses: Z2 is lnNear, k the clock.
#define CLOCK(k) \
	VMULPD.BCST (slope+8*k)(DI), Z2, Z3; \
	VMULPD Z3, Z3, Z4;                   \ // x2
	VMULPD Z20, Z3, Z5;                  \
	VADDPD Z16, Z5, Z5;                  \
	VMULPD Z22, Z3, Z6;                  \
	VADDPD Z21, Z6, Z6;                  \
	VMULPD Z6, Z4, Z6;                   \
	VADDPD Z6, Z5, Z5;                   \
	VMULPD Z5, Z4, Z5;                   \
	VADDPD Z23, Z3, Z3;                  \
	VADDPD Z5, Z3, Z3;                   \
	VMULPD.BCST (rate0+8*k)(DI), Z3, Z3; \
	VMOVUPD Z3, (rates+2048*k)(DI)(AX*8); \
	VDIVPD Z3, Z23, Z3;                  \
	VMOVUPD Z3, (slows+2048*k)(DI)(AX*8)

// func countRatesBlocks(c *countRates, n int)
TEXT ·countRatesBlocks(SB), NOSPLIT, $0-16
	MOVQ c+0(FP), DI
	MOVQ n+8(FP), CX
	XORQ AX, AX
	VBROADCASTSD (series+0)(DI), Z16  // 1/2
	VBROADCASTSD (series+8)(DI), Z17  // 1/3
	VBROADCASTSD (series+16)(DI), Z18 // 1/4
	VBROADCASTSD (series+24)(DI), Z19 // 1/5
	VBROADCASTSD (series+32)(DI), Z20 // 1/6
	VBROADCASTSD (series+40)(DI), Z21 // 1/24
	VBROADCASTSD (series+48)(DI), Z22 // 1/120
	VBROADCASTSD (series+56)(DI), Z23 // 1
	VBROADCASTSD weight(DI), Z24
	VBROADCASTSD number(DI), Z25
	VBROADCASTSD steps<>+64(SB), Z26  // 8
	VBROADCASTSD first(DI), Z0
	VSUBPD steps<>+0(SB), Z0, Z0      // objects left

block:
	VMULPD Z24, Z0, Z1
	VSUBPD Z25, Z1, Z1
	VDIVPD Z25, Z1, Z1                // x
	VMULPD Z1, Z1, Z2                 // x2
	VMULPD Z17, Z1, Z3
	VSUBPD Z3, Z16, Z3
	VMULPD Z19, Z1, Z4
	VSUBPD Z4, Z18, Z4
	VMULPD Z4, Z2, Z4
	VADDPD Z4, Z3, Z3
	VMULPD Z3, Z2, Z3
	VSUBPD Z3, Z1, Z2                 // lnNear(x)
	CLOCK(0)
	CLOCK(1)
	CLOCK(2)
	VSUBPD Z26, Z0, Z0
	ADDQ $8, AX
	CMPQ AX, CX
	JLT  block
	VZEROUPPER
	RET
