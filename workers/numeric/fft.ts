/**
 * Discrete Fourier transform of a length that is a power of two, in place: X_k = Σ_t x_t exp(−2πi kt/n).
 *
 * Method: radix-2 decimation in time with bit reversal (Cooley & Tukey 1965, Math. Comp. 19, 297–301); every twiddle factor from its own
 * sine and cosine, not from a recurrence, so that the error grows as log n.
 *
 * @param re real parts, length n = 2ᵐ, overwritten; @param im imaginary parts, overwritten
 * @throws RangeError where the lengths differ or are no power of two
 * @example (1, 0, 0, 0) gives (1, 1, 1, 1)
 */
export function fft(re: Float64Array, im: Float64Array): void {
  const n = re.length;
  if (im.length !== n || n === 0 || (n & (n - 1)) !== 0)
    throw new RangeError(
      `Real and imaginary parts must have one length, a power of two; they have ${n} and ${im.length}.`,
    );
  for (let i = 1, j = 0; i < n; i++) {
    let bit = n >> 1;
    for (; (j & bit) !== 0; bit >>= 1) j ^= bit;
    j ^= bit;
    if (i < j) {
      [re[i], re[j]] = [re[j]!, re[i]!];
      [im[i], im[j]] = [im[j]!, im[i]!];
    }
  }
  const cosines = Float64Array.from({ length: n >> 1 }, (_, k) => Math.cos((2 * Math.PI * k) / n));
  const sines = Float64Array.from({ length: n >> 1 }, (_, k) => Math.sin((2 * Math.PI * k) / n));
  for (let size = 2; size <= n; size *= 2) {
    const half = size >> 1;
    const stride = n / size;
    for (let start = 0; start < n; start += size) {
      for (let k = 0; k < half; k++) {
        const c = cosines[k * stride]!;
        const s = sines[k * stride]!;
        const low = start + k;
        const high = low + half;
        const real = re[high]! * c + im[high]! * s;
        const imaginary = im[high]! * c - re[high]! * s;
        re[high] = re[low]! - real;
        im[high] = im[low]! - imaginary;
        re[low]! += real;
        im[low]! += imaginary;
      }
    }
  }
}
