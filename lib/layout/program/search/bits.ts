/** Sets of small whole numbers as bits, for unions and meets over many shapes. */
export type Bits = Uint32Array;

export const noBits = (size: number): Bits => new Uint32Array((size + 31) >>> 5);

export function allBits(size: number): Bits {
  return noBits(size).fill(0xffff_ffff);
}

export function setBit(bits: Bits, index: number): void {
  bits[index >>> 5] = (bits[index >>> 5] ?? 0) | (1 << (index & 31));
}

export const hasBit = (bits: Bits, index: number): boolean => ((bits[index >>> 5] ?? 0) & (1 << (index & 31))) !== 0;

export function addAll(bits: Bits, others: Bits): void {
  for (let i = 0; i < bits.length; i++) bits[i] = (bits[i] ?? 0) | (others[i] ?? 0);
}

/** Adds what both have in common. */
export function addShared(bits: Bits, a: Bits, b: Bits): void {
  for (let i = 0; i < bits.length; i++) bits[i] = (bits[i] ?? 0) | ((a[i] ?? 0) & (b[i] ?? 0));
}

export function keepOnly(bits: Bits, others: Bits): void {
  for (let i = 0; i < bits.length; i++) bits[i] = (bits[i] ?? 0) & (others[i] ?? 0);
}

export function countBits(bits: Bits): number {
  let count = 0;
  for (const word of bits) {
    let left = word - ((word >>> 1) & 0x5555_5555);
    left = (left & 0x3333_3333) + ((left >>> 2) & 0x3333_3333);
    count += (((left + (left >>> 4)) & 0x0f0f_0f0f) * 0x0101_0101) >>> 24;
  }
  return count;
}
