/**
 * Long work in slices: a generator that yields the share done, 0..1, after each short piece of work, so that whoever runs it can report
 * progress, let others in between, and stop. What is too short to tell shares yields 0.
 */
export type Slices<Value> = Generator<number, Value, void>;

/** A part of some work, in its place among the whole: its 0..1 becomes `start` to `start + share`. */
export function* inShare<Value>(slices: Slices<Value>, start: number, share: number): Slices<Value> {
  for (let slice = slices.next(); ; slice = slices.next()) {
    if (slice.done) return slice.value;
    yield start + share * slice.value;
  }
}

/** All of it at once. */
export function runSlices<Value>(slices: Slices<Value>): Value {
  for (let slice = slices.next(); ; slice = slices.next()) if (slice.done) return slice.value;
}
