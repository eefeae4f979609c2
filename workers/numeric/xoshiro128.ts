/**
 * Generator of 32 random bits at a time.
 *
 * Method: xoshiro128** 1.1 (Blackman & Vigna 2021, ACM Trans. Math. Softw. 47, 36; doi:10.1145/3460772), period 2¹²⁸ − 1.
 *
 * @param state four words, not all 0; advanced in place
 * @returns a function that gives the next whole number 0 … 2³² − 1
 * @example from the state (1, 2, 3, 4): 11520, 0, 5927040, …
 */
export function xoshiro128(state: Uint32Array): () => number {
  const s = state;
  return () => {
    const product = Math.imul(s[1]!, 5);
    const result = Math.imul((product << 7) | (product >>> 25), 9) >>> 0;
    const t = s[1]! << 9;
    s[2]! ^= s[0]!;
    s[3]! ^= s[1]!;
    s[1]! ^= s[2]!;
    s[0]! ^= s[3]!;
    s[2]! ^= t;
    s[3] = (s[3]! << 11) | (s[3]! >>> 21);
    return result;
  };
}
