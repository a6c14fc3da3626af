/** A flag that one thread raises and another reads between its steps. Native decoders cannot be stopped halfway; the steps between them can. */
import "server-only";

export type CancelFlag = SharedArrayBuffer;

export class Cancelled extends Error {
  constructor() {
    super("the work was cancelled");
    this.name = "Cancelled";
  }
}

export function createCancelFlag(): CancelFlag {
  return new SharedArrayBuffer(Int32Array.BYTES_PER_ELEMENT);
}

export function raiseCancelFlag(flag: CancelFlag): void {
  Atomics.store(new Int32Array(flag), 0, 1);
}

/** Throws `Cancelled` once the flag is up. */
export function stopIfCancelled(flag: CancelFlag): void {
  if (Atomics.load(new Int32Array(flag), 0) !== 0) throw new Cancelled();
}
