/**
 * The instructions that the bilinear kernel is made of, under the names and with the opcodes of the WebAssembly specification 2.0
 * (5.4.7 numeric, 5.4.9 vector instructions). Each takes the code of its operands and gives code that leaves the result on the stack.
 */
import "server-only";

export type Code = readonly number[];

/** Whole numbers in the binary format's LEB128: seven bits a byte, the lowest first. */
export function unsigned(value: number): Code {
  return value < 128 ? [value] : [(value & 127) | 128, ...unsigned(value >>> 7)];
}

function signed(value: number): Code {
  const rest = value >> 7;
  const low = value & 127;
  const ends = (rest === 0 && low < 64) || (rest === -1 && low >= 64);
  return ends ? [low] : [low | 128, ...signed(rest)];
}

type Instruction = (...operands: readonly Code[]) => Code;

const scalar =
  (opcode: number): Instruction =>
  (...operands) => [...operands.flat(), opcode];

const vector =
  (opcode: number, ...immediates: readonly number[]): Instruction =>
  (...operands) => [...operands.flat(), 0xfd, ...unsigned(opcode), ...immediates];

/** Loads and stores name an alignment (2⁰: none is promised) and an offset. */
const anywhere = [0, 0] as const;

export const i32 = {
  const: (value: number): Code => [0x41, ...signed(value)],
  lt_s: scalar(0x48),
  add: scalar(0x6a),
  sub: scalar(0x6b),
  mul: scalar(0x6c),
  and: scalar(0x71),
  or: scalar(0x72),
  shl: scalar(0x74),
  shr_s: scalar(0x75),
};

export const v128 = {
  const: (bytes: readonly number[]): Code => [0xfd, 0x0c, ...bytes],
  /** Eight bytes from memory, then eight zeros. */
  load64_zero: vector(0x5d, ...anywhere),
  store8_lane: (lane: number, ...operands: readonly Code[]) => vector(0x58, ...anywhere, lane)(...operands),
  store16_lane: (lane: number, ...operands: readonly Code[]) => vector(0x59, ...anywhere, lane)(...operands),
};

export const i8x16 = {
  /** Bytes of the first vector in the order of the second; an index of 16 or more gives 0. */
  swizzle: vector(0x0e),
};

export const i32x4 = {
  splat: vector(0x11),
  extract_lane: (lane: number, operand: Code) => vector(0x1b, lane)(operand),
  shl: vector(0xab),
  shr_s: vector(0xac),
  add: vector(0xae),
  sub: vector(0xb1),
  mul: vector(0xb5),
  /** Products of the sixteen-bit lanes, added in pairs. */
  dot_i16x8_s: vector(0xba),
};

export const f64x2 = {
  splat: vector(0x14),
  replace_lane: (lane: number, ...operands: readonly Code[]) => vector(0x22, lane)(...operands),
  floor: vector(0x75),
  add: vector(0xf0),
  /** b < a ? b : a */
  pmin: vector(0xf6),
  /** a < b ? b : a */
  pmax: vector(0xf7),
};

/** Runs its body again as long as the condition at its end holds. */
export function loopWhile(body: readonly Code[], condition: Code): Code {
  return [0x03, 0x40, ...body.flat(), ...condition, 0x0d, 0, 0x0b];
}
