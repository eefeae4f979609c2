/** A pivot or coefficient below this is rounding. */
const NOTHING = 1e-9;

/**
 * Starting values of a differenced record estimated from the readings so far, by recursive least squares in square-root
 * information form (Givens rotations; Golub & Van Loan, Matrix Computations, 4th ed., §6.5).
 *
 * The filter carries the record and one column for each starting value with the same gains; the innovation of the record given
 * all earlier readings is its error less the columns' errors times the least-squares estimate from those readings.
 */
export class RunningStart {
  private readonly R: Float64Array;
  private readonly z: Float64Array;

  /** @param flat number of starting values, d + sD */
  constructor(private readonly flat: number) {
    this.R = new Float64Array(flat * flat);
    this.z = new Float64Array(flat);
  }

  /**
   * Error of a reading against what is known so far, and its variance for unit σ²; null where the readings so far do not
   * fix what it rests on.
   *
   * @param errors of the record, then of the columns; @param variance of the filter for known starting values
   */
  predict(errors: Float64Array, variance: number): { error: number; variance: number } | null {
    const { flat, R, z } = this;
    if (flat === 0) return { error: errors[0]!, variance };
    const scale = 1 / Math.sqrt(variance);
    const u = this.scaledRow(errors, scale);
    let size = 0;
    for (const value of u) size = Math.max(size, Math.abs(value));
    let error = errors[0]! * scale;
    let spread = 1;
    for (let k = 0; k < flat; k++) {
      const pivot = R[k * flat + k]!;
      if (Math.abs(pivot) < NOTHING) {
        if (Math.abs(u[k]!) > NOTHING * (1 + size)) return null;
        continue;
      }
      const w = u[k]! / pivot;
      for (let j = k; j < flat; j++) u[j]! -= w * R[k * flat + j]!;
      error -= w * z[k]!;
      spread += w * w;
    }
    return { error: error / scale, variance: variance * spread };
  }

  /** Takes a reading into the estimate. */
  learn(errors: Float64Array, variance: number): void {
    const { flat, R, z } = this;
    const scale = 1 / Math.sqrt(variance);
    const row = this.scaledRow(errors, scale);
    let right = errors[0]! * scale;
    for (let k = 0; k < flat; k++) {
      if (row[k] === 0) continue;
      const pivot = R[k * flat + k]!;
      const length = Math.hypot(pivot, row[k]!);
      const c = pivot / length;
      const s = row[k]! / length;
      for (let j = k; j < flat; j++) {
        const a = R[k * flat + j]!;
        const b = row[j]!;
        R[k * flat + j] = c * a + s * b;
        row[j] = c * b - s * a;
      }
      const a = z[k]!;
      z[k] = c * a + s * right;
      right = c * right - s * a;
    }
  }

  private scaledRow(errors: Float64Array, scale: number): Float64Array {
    return Float64Array.from({ length: this.flat }, (_, k) => errors[1 + k]! * scale);
  }
}
