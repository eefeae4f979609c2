import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fft } from '../../../workers/numeric/fft.ts';
import { fourierTransform } from '../../../workers/numeric/fourierTransform.ts';

/** By the definition, angles reduced in whole numbers. */
function direct(re: ArrayLike<number>, im: ArrayLike<number>) {
  const n = re.length;
  return Array.from({ length: n }, (_, k) => {
    let real = 0;
    let imaginary = 0;
    for (let t = 0; t < n; t++) {
      const angle = (2 * Math.PI * ((k * t) % n)) / n;
      real += re[t]! * Math.cos(angle) + im[t]! * Math.sin(angle);
      imaginary += im[t]! * Math.cos(angle) - re[t]! * Math.sin(angle);
    }
    return { re: real, im: imaginary };
  });
}

const numbers = fc.integer({ min: -1000, max: 1000 });

describe('discrete Fourier transform', () => {
  it('is its definition at every length', () => {
    const pairs = fc.array(fc.tuple(numbers, numbers), { minLength: 1, maxLength: 130 });
    fc.assert(
      fc.property(pairs, (given) => {
        const re = Float64Array.from(given, ([x]) => x);
        const im = Float64Array.from(given, ([, y]) => y);
        const found = fourierTransform(re, im);
        const size = Math.sqrt(given.reduce((sum, [x, y]) => sum + x * x + y * y, 1));
        direct(re, im).forEach((one, k) => {
          expect(Math.abs(found.re[k]! - one.re)).toBeLessThan(1e-12 * size * given.length);
          expect(Math.abs(found.im[k]! - one.im)).toBeLessThan(1e-12 * size * given.length);
        });
      }),
    );
  });

  it.each([1023, 1024, 9973])('keeps Σ|x|² (Parseval), n = %i', (n) => {
    const x = Float64Array.from({ length: n }, (_, t) => Math.sin(t * t));
    const { re, im } = fourierTransform(x);
    const before = x.reduce((sum, value) => sum + value * value, 0);
    const after = re.reduce((sum, value, k) => sum + value * value + im[k]! ** 2, 0) / n;
    expect(Math.abs(after / before - 1)).toBeLessThan(1e-13);
  });

  it('knows the shortest lengths, and the radix-2 one refuses others', () => {
    expect(fourierTransform(new Float64Array(0)).re).toHaveLength(0);
    expect(Array.from(fourierTransform(Float64Array.of(4)).re)).toEqual([4]);
    expect(() => {
      fft(new Float64Array(3), new Float64Array(3));
    }).toThrow(/power of two/);
    expect(() => {
      fft(new Float64Array(4), new Float64Array(2));
    }).toThrow(/one length/);
    const gap = fourierTransform(Float64Array.of(1, NaN, 2));
    expect(gap.re.every((value) => Number.isNaN(value))).toBe(true);
  });
});
