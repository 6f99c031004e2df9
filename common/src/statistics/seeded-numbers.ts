/**
 * Stream of 32-bit whole numbers from a seed: a Weyl step of the golden ratio, mixed as in the finaliser of
 * MurmurHash3 (public domain). For scrambling and shuffling, not for secrets.
 */
export function seededWholeNumbers(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x9e3779b9) >>> 0;
    let mixed = state;
    mixed = Math.imul(mixed ^ (mixed >>> 16), 0x85ebca6b);
    mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
    return (mixed ^ (mixed >>> 16)) >>> 0;
  };
}
