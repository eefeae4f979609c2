import type { SparsePolynomial } from '../../model/expandPolynomials.ts';

/** A starting value that enters a reading by less than this part of its largest effect does not enter it. */
const NOTHING = 1e-9;

/**
 * The starting values of a differenced record that no reading has fixed yet, as directions of the predictor state: the record's
 * d + sD values before its start, with a flat prior.
 *
 * Method: the exact diffuse start with the infinite part of the covariance as AA′ (Koopman 1997, J. Am. Stat. Assoc. 92, 1630–1638;
 * de Jong 1991, Ann. Stat. 19, 1073–1083). A reading that they enter by a = z′A ≠ 0 is spent on one direction: rotated so that it alone enters,
 * it is fixed, and the flat density of the reading is 1/|a|. Directions that no reading ever meets stay, and nothing depends on them.
 */
export class StartingDirections {
  /** Columns of A, by place. */
  private columns: Float64Array[] = [];

  constructor(
    private readonly m: number,
    private readonly differencing: Float64Array,
  ) {}

  get left(): number {
    return this.columns.length;
  }

  /** At the start of the record: what each value before it puts into the readings ahead, φ(B) applied to −Σ c_i y_{t−i}. */
  begin(ar: SparsePolynomial): void {
    const c = this.differencing;
    const flat = c.length - 1;
    this.columns = Array.from({ length: flat }, (_, k) => {
      const direct = Float64Array.from({ length: this.m }, (__, t) => (t + k < flat ? -c[t + k + 1]! : 0));
      const column = direct.slice();
      for (let i = 0; i < ar.lags.length; i++)
        for (let t = ar.lags[i]!; t < this.m; t++) column[t]! -= ar.values[i]! * direct[t - ar.lags[i]!]!;
      return column;
    });
  }

  /** Whether any direction enters the reading at hand. */
  enter(head: number): boolean {
    for (const column of this.columns) if (this.matters(column, head)) return true;
    return false;
  }

  /**
   * Takes out the direction that a reading fixes, if one enters it; what enters by rounding alone is set to nothing.
   *
   * @returns the direction, divided by its effect on the reading, and the logarithm of that; null where none enters
   */
  fix(head: number): { direction: Float64Array; logEffect: number } | null {
    let pivot = -1;
    this.columns.forEach((column, k) => {
      if (!this.matters(column, head)) column[head] = 0;
      else if (pivot < 0) pivot = k;
      else rotate(this.columns[pivot]!, column, head);
    });
    if (pivot < 0) return null;
    const [direction] = this.columns.splice(pivot, 1);
    const effect = direction![head]!;
    for (let b = 0; b < this.m; b++) direction![b]! /= effect;
    return { direction: direction!, logEffect: Math.log(Math.abs(effect)) };
  }

  /** Over a gap: shift + α z′. After a reading the shift alone is left, a turn of the places. */
  pass(head: number, alpha: SparsePolynomial): void {
    const { m } = this;
    for (const column of this.columns) {
      const first = column[head]!;
      column[head] = 0;
      if (first === 0) continue;
      for (let i = 0; i < alpha.lags.length; i++) column[(head + alpha.lags[i]!) % m]! += alpha.values[i]! * first;
    }
  }

  private matters(column: Float64Array, head: number): boolean {
    const first = Math.abs(column[head]!);
    if (first === 0) return false;
    let largest = 0;
    for (const value of column) largest = Math.max(largest, Math.abs(value));
    return first > NOTHING * largest;
  }
}

/** Turns two columns in their plane so that `other` is nothing at the head. */
function rotate(pivot: Float64Array, other: Float64Array, head: number): void {
  const length = Math.hypot(pivot[head]!, other[head]!);
  const c = pivot[head]! / length;
  const s = other[head]! / length;
  for (let b = 0; b < pivot.length; b++) {
    const p = pivot[b]!;
    const q = other[b]!;
    pivot[b] = c * p + s * q;
    other[b] = c * q - s * p;
  }
  other[head] = 0;
}
