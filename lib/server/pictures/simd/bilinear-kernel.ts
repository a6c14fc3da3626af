/**
 * The inner loop of the warp for three channels, as WebAssembly: all channels of a sample at once in one vector. Byte for byte what
 * `plainSampler` of the core gives, in about a third of the time (`npm run bench`, row "warp").
 */
import "server-only";
import { type Code, f64x2, i8x16, i32, i32x4, loopWhile, v128 } from "./instructions";
import { type Variable, wasmModule } from "./wasm-function";

/** Places x and y travel as one vector of two; they are in steps of 1/256 px from the centre of the photo's first pixel. */
export type BilinearKernel = (
  /** Address of the photo's first byte. */
  photo: number,
  /** Bytes of a photo row. */
  stride: number,
  lastX: number,
  lastY: number,
  /** Address of the first sample to write; three bytes each. */
  out: number,
  /** At least 1. */
  count: number,
  /** The core's `Stepped`, first x, then y. */
  x: number,
  x1: number,
  x2: number,
  x3: number,
  y: number,
  y1: number,
  y2: number,
  y3: number,
) => void;

/** Bytes behind the photo that are read too, with no weight: a row below the last one and the rest of a vector. */
export const bytesReadBehind = (stride: number): number => stride + 8;

/** An index beyond the vector: gives 0. With its highest bit set it costs nothing on x86. */
const none = 0xff;
/** Two neighbours of three bytes each → r r' g g' b b' as sixteen-bit numbers, and two zeros. */
const besideEachOther = v128.const([0, none, 3, none, 1, none, 4, none, 2, none, 5, none, none, none, none, none]);
/** The lowest byte of each of three thirty-two-bit numbers. */
const lowestBytes = v128.const([0, 4, 8, ...new Array<number>(13).fill(none)]);
const zero = v128.const(new Array<number>(16).fill(0));

/** Whole numbers below 2³¹, plus 1.5 · 2⁵²: with this exponent the lower half of a double is the number itself (IEEE 754). Quicker than the conversion. */
const inLowHalves = (whole: Code): Code =>
  f64x2.add(whole, v128.const([...doubleBytes(1.5 * 2 ** 52), ...doubleBytes(1.5 * 2 ** 52)]));
const doubleBytes = (value: number): Uint8Array => new Uint8Array(new Float64Array([value]).buffer);

const pair = (x: Variable, y: Variable): Code => f64x2.replace_lane(1, f64x2.splat(x.get), y.get);

/** value · 2⁸ along, · 2¹⁶ down, as in the core; 32,768 more rounds to the nearest. */
function mixedDown(upper: Code, lower: Code, y: Variable): Code {
  const weight = i32x4.splat(i32.and(y.get, i32.const(255)));
  const sum = i32x4.add(i32x4.shl(upper, i32.const(8)), i32x4.mul(i32x4.sub(lower, upper), weight));
  return i32x4.shr_s(i32x4.add(sum, i32x4.splat(i32.const(32768))), i32.const(16));
}

const bytes = wasmModule({
  parameters: {
    ...({ photo: "i32", stride: "i32", lastX: "f64", lastY: "f64", out: "i32", count: "i32" } as const),
    ...({ x: "f64", x1: "f64", x2: "f64", x3: "f64", y: "f64", y1: "f64", y2: "f64", y3: "f64" } as const),
  },
  locals: {
    ...({ place: "v128", first: "v128", second: "v128", third: "v128", last: "v128", whole: "v128" } as const),
    ...({ atX: "i32", atY: "i32", part: "i32", address: "i32", end: "i32" } as const),
    ...({ weights: "v128", upper: "v128", lower: "v128", sample: "v128" } as const),
  },
  body: (v) => {
    const mixedAlong = (address: Code) =>
      i32x4.dot_i16x8_s(i8x16.swizzle(v128.load64_zero(address), besideEachOther), v.weights.get);
    const pixels = (steps: Variable) => i32.shr_s(steps.get, i32.const(8));
    return [
      v.place.set(pair(v.x, v.y)),
      v.first.set(pair(v.x1, v.y1)),
      v.second.set(pair(v.x2, v.y2)),
      v.third.set(pair(v.x3, v.y3)),
      v.last.set(pair(v.lastX, v.lastY)),
      v.end.set(i32.add(v.out.get, i32.mul(v.count.get, i32.const(3)))),
      loopWhile(
        [
          // In this order what is no number becomes 0.
          v.whole.set(inLowHalves(f64x2.floor(f64x2.pmin(f64x2.pmax(zero, v.place.get), v.last.get)))),
          v.place.set(f64x2.add(v.place.get, v.first.get)),
          v.first.set(f64x2.add(v.first.get, v.second.get)),
          v.second.set(f64x2.add(v.second.get, v.third.get)),
          v.atX.set(i32x4.extract_lane(0, v.whole.get)),
          v.atY.set(i32x4.extract_lane(2, v.whole.get)),
          v.part.set(i32.and(v.atX.get, i32.const(255))),
          v.address.set(
            i32.add(v.photo.get, i32.add(i32.mul(pixels(v.atY), v.stride.get), i32.mul(pixels(v.atX), i32.const(3)))),
          ),
          v.weights.set(i32x4.splat(i32.or(i32.sub(i32.const(256), v.part.get), i32.shl(v.part.get, i32.const(16))))),
          v.upper.set(mixedAlong(v.address.get)),
          v.lower.set(mixedAlong(i32.add(v.address.get, v.stride.get))),
          v.sample.set(i8x16.swizzle(mixedDown(v.upper.get, v.lower.get, v.atY), lowestBytes)),
          v128.store16_lane(0, v.out.get, v.sample.get),
          v128.store8_lane(2, i32.add(v.out.get, i32.const(2)), v.sample.get),
          v.out.set(i32.add(v.out.get, i32.const(3))),
        ],
        i32.lt_s(v.out.get, v.end.get),
      ),
    ];
  },
});

/** False on a processor without vector instructions (before SSE4.1 or NEON). */
export const hasVectors: boolean = WebAssembly.validate(bytes);

let compiled: WebAssembly.Module | undefined;

/** The kernel at work in this memory. */
export function bilinearKernel(memory: WebAssembly.Memory): BilinearKernel {
  compiled ??= new WebAssembly.Module(bytes);
  const { run } = new WebAssembly.Instance(compiled, { host: { memory } }).exports;
  if (typeof run !== "function") throw new Error("the kernel exports no function");
  return run as BilinearKernel;
}
