/** One WebAssembly function, written in the binary format (specification 2.0, chapter 5) as a module that works in a memory handed to it. */
import "server-only";
import { type Code, unsigned } from "./instructions";

/** Types of values by their codes in the binary format. */
const types = { i32: 0x7f, f64: 0x7c, v128: 0x7b } as const;

type Types = Readonly<Record<string, keyof typeof types>>;

export interface Variable {
  readonly get: Code;
  readonly set: (value: Code) => Code;
}

export interface WasmFunction<Parameters extends Types, Locals extends Types> {
  /** In the order of the call. */
  readonly parameters: Parameters;
  readonly locals: Locals;
  readonly body: (variables: Readonly<Record<keyof Parameters | keyof Locals, Variable>>) => readonly Code[];
}

/** The bytes of a module that imports the memory `host.memory` and exports the function as `run`; it answers nothing. */
export function wasmModule<Parameters extends Types, Locals extends Types>({
  parameters,
  locals,
  body,
}: WasmFunction<Parameters, Locals>): Uint8Array<ArrayBuffer> {
  const names = [...Object.keys(parameters), ...Object.keys(locals)];
  const variables = Object.fromEntries(names.map((name, index) => [name, variableAt(index)]));
  const declared = Object.values(locals).map((type) => [1, types[type]]);
  const end = 0x0b;
  const code = [...list(declared), ...body(variables as Record<keyof Parameters | keyof Locals, Variable>).flat(), end];
  const signature = [0x60, ...list(Object.values(parameters).map((type) => [types[type]])), ...list([])];
  // Memory 0, of one page at least.
  const memory = [...text("host"), ...text("memory"), 0x02, 0x00, 1];
  const run = [...text("run"), 0x00, 0];
  return new Uint8Array([
    ...[0x00, 0x61, 0x73, 0x6d, 1, 0, 0, 0],
    ...section(1, [signature]),
    ...section(2, [memory]),
    ...section(3, [[0]]),
    ...section(7, [run]),
    ...section(10, [[...unsigned(code.length), ...code]]),
  ]);
}

function variableAt(index: number): Variable {
  return { get: [0x20, ...unsigned(index)], set: (value) => [...value, 0x21, ...unsigned(index)] };
}

const list = (items: readonly Code[]): Code => [...unsigned(items.length), ...items.flat()];

const text = (name: string): Code => list([...Buffer.from(name, "utf8")].map((byte) => [byte]));

function section(id: number, items: readonly Code[]): Code {
  const content = list(items);
  return [id, ...unsigned(content.length), ...content];
}
