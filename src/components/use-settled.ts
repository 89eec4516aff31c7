import { useEffect, useState } from 'react';

/** The value once it has rested for a while: for what is read and not watched, as a table behind a curve that is being slid. */
export function useSettled<T>(value: T, rest_ms: number): T {
  const [settled, setSettled] = useState(value);
  const rests = Object.is(settled, value);
  useEffect(() => {
    if (rests) return undefined;
    const timer = setTimeout(() => setSettled(value), rest_ms);
    return () => clearTimeout(timer);
  }, [value, rests, rest_ms]);
  return settled;
}
