/** A stream of random numbers that its seed determines completely. */
export interface Random {
  /** Uniform on the open interval (0, 1), 32 bits. */
  uniform(): number;
  /** Standard normal. */
  normal(): number;
  /** Whole number 0 … n − 1, each equally likely. */
  integer(n: number): number;
  /** Student t with df degrees of freedom, not scaled to unit variance. */
  studentT(df: number): number;
  /** Laplace with mean 0 and variance 1. */
  laplace(): number;
  /** An independent stream; the same label gives the same stream whatever was drawn before. */
  fork(label: number): Random;
}

/**
 * Random numbers from a seed.
 *
 * Method: xoshiro128** (Blackman & Vigna 2021, ACM Trans. Math. Softw. 47, 36), state filled by splitmix32; normals by Marsaglia's polar
 * method (1964, SIAM Review 6, 260–264); Student t by Bailey's (1994, Math. Comp. 62, 779–781).
 *
 * @param seed any number; its 32 low bits and the 21 above them count
 * @example createRandom(1).uniform() is the same on every machine
 */
export function createRandom(seed: number): Random {
  const low = seed >>> 0;
  const high = Math.floor(Math.abs(seed) / 4294967296) >>> 0;
  const s = new Uint32Array(4);
  let mix = (low ^ Math.imul(high, 0x9e3779b1)) >>> 0;
  for (let i = 0; i < 4; i++) {
    mix = (mix + 0x9e3779b9) >>> 0;
    let z = mix;
    z = Math.imul(z ^ (z >>> 16), 0x85ebca6b);
    z = Math.imul(z ^ (z >>> 13), 0xc2b2ae35);
    s[i] = (z ^ (z >>> 16)) >>> 0;
  }
  const next = (): number => {
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
  const uniform = () => (next() + 0.5) / 4294967296;
  let spare = NaN;
  const normal = (): number => {
    if (!Number.isNaN(spare)) {
      const kept = spare;
      spare = NaN;
      return kept;
    }
    for (;;) {
      const u = 2 * uniform() - 1;
      const v = 2 * uniform() - 1;
      const w = u * u + v * v;
      if (w >= 1 || w === 0) continue;
      const scale = Math.sqrt((-2 * Math.log(w)) / w);
      spare = v * scale;
      return u * scale;
    }
  };
  return {
    uniform,
    normal,
    integer: (n) => Math.floor(uniform() * n),
    studentT: (df) => {
      for (;;) {
        const u = 2 * uniform() - 1;
        const v = 2 * uniform() - 1;
        const w = u * u + v * v;
        if (w < 1 && w > 0) return u * Math.sqrt((df * (w ** (-2 / df) - 1)) / w);
      }
    },
    laplace: () => {
      const u = uniform() - 0.5;
      return (-Math.sign(u) * Math.log1p(-2 * Math.abs(u))) / Math.SQRT2;
    },
    fork: (label) => createRandom((low ^ Math.imul(label + 1, 0x85ebca6b)) >>> 0),
  };
}
