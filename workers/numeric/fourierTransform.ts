import { fft } from './fft.ts';

/**
 * Discrete Fourier transform of any length: X_k = Σ_t x_t exp(−2πi kt/n), k = 0…n − 1.
 *
 * Method: Bluestein's chirp transform (1970, IEEE Trans. Audio Electroacoust. 18, 451–455) on a radix-2 transform; the chirp's angle is
 * reduced modulo 2n in whole numbers, so that it keeps its digits at any length.
 *
 * @param re real parts, length n; @param im imaginary parts, 0 when left out
 * @returns new arrays of length n; empty for n = 0
 * @example (1, 1, 1) gives (3, 0, 0)
 */
export function fourierTransform(re: Float64Array, im?: Float64Array): { re: Float64Array; im: Float64Array } {
  const n = re.length;
  if (n < 2) return { re: re.slice(), im: im?.slice() ?? new Float64Array(n) };
  if ((n & (n - 1)) === 0) {
    const result = { re: re.slice(), im: im?.slice() ?? new Float64Array(n) };
    fft(result.re, result.im);
    return result;
  }
  let size = 1;
  while (size < 2 * n - 1) size *= 2;
  const cosine = new Float64Array(n);
  const sine = new Float64Array(n);
  for (let t = 0, square = 0; t < n; t++) {
    cosine[t] = Math.cos((Math.PI * square) / n);
    sine[t] = Math.sin((Math.PI * square) / n);
    // (t + 1)² mod 2n without forming t².
    square = (square + 2 * t + 1) % (2 * n);
  }
  const a = { re: new Float64Array(size), im: new Float64Array(size) };
  const b = { re: new Float64Array(size), im: new Float64Array(size) };
  for (let t = 0; t < n; t++) {
    const x = re[t]!;
    const y = im?.[t] ?? 0;
    a.re[t] = x * cosine[t]! + y * sine[t]!;
    a.im[t] = y * cosine[t]! - x * sine[t]!;
    b.re[t] = cosine[t]!;
    b.im[t] = sine[t]!;
    if (t > 0) {
      b.re[size - t] = cosine[t]!;
      b.im[size - t] = sine[t]!;
    }
  }
  fft(a.re, a.im);
  fft(b.re, b.im);
  // The product, conjugated, so that a second forward transform is the inverse one.
  for (let k = 0; k < size; k++) {
    const real = a.re[k]! * b.re[k]! - a.im[k]! * b.im[k]!;
    a.im[k] = -(a.re[k]! * b.im[k]! + a.im[k]! * b.re[k]!);
    a.re[k] = real;
  }
  fft(a.re, a.im);
  const result = { re: new Float64Array(n), im: new Float64Array(n) };
  for (let k = 0; k < n; k++) {
    const real = a.re[k]! / size;
    const imaginary = -a.im[k]! / size;
    result.re[k] = real * cosine[k]! + imaginary * sine[k]!;
    result.im[k] = imaginary * cosine[k]! - real * sine[k]!;
  }
  return result;
}
