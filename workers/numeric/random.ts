import { xoshiro128 } from './xoshiro128.ts';

/** A stream of random numbers that its seed determines completely. */
export interface Random {
  /** Uniform on the open interval (0, 1), 32 bits. */
  uniform(): number;
  /** Standard normal. */
  normal(): number;
  /** Whole number 0 … n − 1, n ≤ 2³², each equally likely to within n/2³². */
  integer(n: number): number;
  /** Student t with df degrees of freedom, not scaled to unit variance. */
  studentT(df: number): number;
  /** Laplace with mean 0 and variance 1. */
  laplace(): number;
  /** An independent stream by a whole-number label; the same label gives the same stream whatever was drawn before. */
  fork(label: number): Random;
}

/**
 * Random numbers from a seed.
 *
 * Method: xoshiro128** (see `xoshiro128`), state filled by splitmix32; normals by Marsaglia's polar method (1964, SIAM Review 6, 260–264);
 * Student t by Bailey's (1994, Math. Comp. 62, 779–781). A fork mixes its label into all 128 bits of the state its parent began with,
 * so that forks of forks differ whatever the order of the labels.
 *
 * @param seed any number; its 32 low bits and the 21 above them count
 * @example createRandom(1).uniform() is the same on every machine
 */
export function createRandom(seed: number): Random {
  const high = Math.floor(Math.abs(seed) / 4294967296) >>> 0;
  let state = ((seed >>> 0) ^ Math.imul(high, PRIME)) >>> 0;
  return randomFrom(
    Uint32Array.from({ length: 4 }, () => {
      state = (state + WEYL) >>> 0;
      return scramble(state);
    }),
  );
}

/** The golden section of 2³², and the prime next to it. */
const WEYL = 0x9e3779b9;
const PRIME = 0x9e3779b1;

/** The finalizer of MurmurHash3 (Appleby, public domain): a bijection of 32 bits in which every input bit stirs every output bit. */
function scramble(bits: number): number {
  let z = Math.imul(bits ^ (bits >>> 16), 0x85ebca6b);
  z = Math.imul(z ^ (z >>> 13), 0xc2b2ae35);
  return (z ^ (z >>> 16)) >>> 0;
}

function forked(beginning: Uint32Array, label: number): Random {
  let mix = scramble((label >>> 0) ^ Math.imul(Math.floor(Math.abs(label) / 4294967296), PRIME));
  return randomFrom(beginning.map((word) => (mix = scramble((mix ^ word) + WEYL))));
}

function randomFrom(beginning: Uint32Array): Random {
  const next = xoshiro128(beginning.slice());
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
    fork: (label) => forked(beginning, label),
  };
}
