import { useEffect, useState } from 'react';

/** A value once it has stayed the same for a while: what a live preview asks for while somebody types. */
export function useSettled<T>(value: T, waitMs = 400): T {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), waitMs);
    return () => clearTimeout(timer);
  }, [value, waitMs]);
  return settled;
}
