/** What is left of the cross products when flat columns are integrated out and the rest profiled. */
export interface Profile {
  /** Residual sum of squares in the metric V⁻¹. */
  rss: number;
  /** ln |F′V⁻¹F| of the flat columns that the record sees. */
  flatLogDeterminant: number;
  /** Coefficients of the profiled columns. */
  readonly beta: Float64Array;
  /** Coefficients of all columns, flat ones first; 0 for a flat column the record does not see. */
  readonly weights: Float64Array;
  /** X′V⁻¹X of the profiled columns after the flat ones, row-major. */
  readonly information: Float64Array;
}

/** A pivot smaller than this part of its diagonal: the column is not seen by the record (a season never observed). */
const UNSEEN = 1e-9;

/**
 * Generalised least squares from cross products.
 *
 * Method: Cholesky of the flat block, then of the profiled one, then the record's row (the Cholesky form of GLS); the square
 * of the last pivot is the residual sum of squares.
 *
 * @param cross row-major symmetric a′V⁻¹b, count²: the record first, then `flat` columns, then the profiled ones
 * `solve` returns false where the profiled columns are collinear in this metric or nothing is left of the record.
 */
export class ProfileGls {
  readonly profile: Profile;
  private readonly factor: Float64Array;
  private readonly order: readonly number[];

  constructor(
    private readonly count: number,
    private readonly flat: number,
  ) {
    const k = count - 1 - flat;
    this.profile = {
      rss: 0,
      flatLogDeterminant: 0,
      beta: new Float64Array(k),
      weights: new Float64Array(count - 1),
      information: new Float64Array(k * k),
    };
    this.factor = new Float64Array(count * count);
    this.order = [...Array.from({ length: count - 1 }, (_, i) => i + 1), 0];
  }

  /** Sets `profile` from the cross products. */
  solve(cross: Float64Array): boolean {
    const { count, flat, factor: L, order, profile } = this;
    const k = count - 1 - flat;
    profile.flatLogDeterminant = 0;
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) {
        let sum = cross[order[i]! * count + order[j]!]!;
        const diagonal = sum;
        for (let l = 0; l < j; l++) sum -= L[i * count + l]! * L[j * count + l]!;
        if (j < i) {
          const pivot = L[j * count + j]!;
          L[i * count + j] = pivot === 0 ? 0 : sum / pivot;
        } else if (i < flat) {
          const seen = sum > UNSEEN * diagonal;
          L[i * count + i] = seen ? Math.sqrt(sum) : 0;
          if (seen) profile.flatLogDeterminant += Math.log(sum);
        } else if (i < count - 1) {
          if (!(sum > 0)) return false;
          L[i * count + i] = Math.sqrt(sum);
        } else profile.rss = sum;
      }
    }
    for (let i = 0; i < count - 1; i++) profile.weights[i] = L[(count - 1) * count + i]!;
    this.unwind(profile.weights, count - 1);
    for (let i = 0; i < k; i++) profile.beta[i] = profile.weights[flat + i]!;
    for (let i = 0; i < k; i++) {
      for (let j = 0; j < k; j++) {
        let sum = 0;
        for (let l = 0; l <= Math.min(i, j); l++)
          sum += L[(flat + i) * count + flat + l]! * L[(flat + j) * count + flat + l]!;
        profile.information[i * k + j] = sum;
      }
    }
    return profile.rss > 0;
  }

  /**
   * Weights of the flat columns in their k-th combination of unit length in the metric V⁻¹, orthogonal to those before it; null where the
   * record does not see column k. The sum over k of d(b′V⁻¹b) is d ln |F′V⁻¹F|.
   */
  flatCombination(k: number): Float64Array | null {
    if (this.factor[k * this.count + k] === 0) return null;
    const weights = new Float64Array(this.flat);
    weights[k] = 1;
    this.unwind(weights, this.flat);
    return weights;
  }

  /** x = L′⁻¹ x over the first n columns; those not seen get 0. */
  private unwind(x: Float64Array, n: number): void {
    const { factor: L, count } = this;
    for (let i = n - 1; i >= 0; i--) {
      const pivot = L[i * count + i]!;
      let sum = x[i]!;
      for (let j = i + 1; j < n; j++) sum -= L[j * count + i]! * x[j]!;
      x[i] = pivot === 0 ? 0 : sum / pivot;
    }
  }
}
