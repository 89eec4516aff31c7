/** Remembers what a pure computation gave for a key: with it and without it every answer is the same. */
export type Memory<T> = (key: string, compute: () => T) => T;

/** A memory that keeps the `limit` results asked for last. */
export function createMemory<T>(limit: number): Memory<T> {
  const kept = new Map<string, { readonly value: T }>();
  return (key, compute) => {
    const found = kept.get(key) ?? { value: compute() };
    // A map lists its keys in the order of their coming: what is asked for moves to the end.
    kept.delete(key);
    kept.set(key, found);
    if (kept.size > limit) {
      const oldest = kept.keys().next();
      if (oldest.done !== true) kept.delete(oldest.value);
    }
    return found.value;
  };
}
