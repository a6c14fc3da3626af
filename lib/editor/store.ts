/** A value with listeners, in the shape that `useSyncExternalStore` asks for. The value is immutable; setting the same one tells nobody. */
export interface Store<Value> {
  readonly get: () => Value;
  readonly set: (next: Value) => void;
  /** Returns the way to stop listening. */
  readonly subscribe: (listener: () => void) => () => void;
}

export function createStore<Value>(initial: Value): Store<Value> {
  let value = initial;
  const listeners = new Set<() => void>();
  return {
    get: () => value,
    set(next) {
      if (Object.is(next, value)) return;
      value = next;
      for (const listener of [...listeners]) listener();
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
