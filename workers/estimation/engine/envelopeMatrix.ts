/** A pivot smaller than this part of its diagonal element: the readings do not tell these values apart. */
const UNSEEN = 1e-9;

/**
 * A symmetric positive definite matrix within its envelope: of row i the places first[i]…i are stored, what is left of them is nothing.
 *
 * Methods: Cholesky within the envelope, which does not fill in beyond it (George & Liu 1981, Computer Solution of Large Sparse Positive
 * Definite Systems, section 4.3); the elements of the inverse within the envelope by the recursion of Takahashi, Fagan & Chen 1973 (as in
 * Erisman & Tinney 1975, Comm. ACM 18, 177–179, doi:10.1145/360680.360704).
 */
export class EnvelopeMatrix {
  readonly rows: readonly Float64Array[];

  /** @param first first stored place of each row, at most its own number and not above that of any later row that meets it */
  constructor(readonly first: Int32Array) {
    this.rows = Array.from(first, (from, i) => new Float64Array(i - from + 1));
  }

  /** A = LL′ in place; false where a pivot is nothing beside its diagonal element. */
  factor(): boolean {
    const { rows, first } = this;
    for (let i = 0; i < rows.length; i++) {
      const row = rows[i]!;
      const from = first[i]!;
      for (let j = from; j < i; j++) {
        const other = rows[j]!;
        const start = Math.max(from, first[j]!);
        let sum = row[j - from]!;
        for (let k = start - from, l = start - first[j]!; k < j - from; k++, l++) sum -= row[k]! * other[l]!;
        row[j - from] = sum / other[j - first[j]!]!;
      }
      const diagonal = row[i - from]!;
      let sum = diagonal;
      for (let k = 0; k < i - from; k++) sum -= row[k]! * row[k]!;
      if (!(sum > UNSEEN * diagonal)) return false;
      row[i - from] = Math.sqrt(sum);
    }
    return true;
  }

  /** ln |A| of a factored matrix. */
  logDeterminant(): number {
    let sum = 0;
    for (const row of this.rows) sum += 2 * Math.log(row[row.length - 1]!);
    return sum;
  }

  /** L⁻¹x in place. */
  forward(x: Float64Array): void {
    const { rows, first } = this;
    for (let i = 0; i < rows.length; i++) {
      const row = rows[i]!;
      const from = first[i]!;
      let sum = x[i]!;
      for (let k = from; k < i; k++) sum -= row[k - from]! * x[k]!;
      x[i] = sum / row[i - from]!;
    }
  }

  /** L′⁻¹x in place. */
  backward(x: Float64Array): void {
    const { rows, first } = this;
    for (let i = rows.length - 1; i >= 0; i--) {
      const row = rows[i]!;
      const from = first[i]!;
      const value = x[i]! / row[i - from]!;
      x[i] = value;
      for (let k = from; k < i; k++) x[k]! -= row[k - from]! * value;
    }
  }

  /** Elements of A⁻¹ within the envelope, from the factor. */
  inverseWithin(): EnvelopeMatrix {
    const { rows, first } = this;
    const n = rows.length;
    const result = new EnvelopeMatrix(first);
    // Rows below j whose envelope reaches column j.
    const below: number[][] = Array.from({ length: n }, () => []);
    for (let i = 0; i < n; i++)
      for (let j = first[i]!; j < i; j++) if (rows[i]![j - first[i]!] !== 0) below[j]!.push(i);
    const at = (i: number, j: number) => (i >= j ? result.rows[i]![j - first[i]!]! : result.rows[j]![i - first[j]!]!);
    for (let j = n - 1; j >= 0; j--) {
      const pivot = rows[j]![j - first[j]!]!;
      const column = below[j]!;
      const weights = column.map((l) => rows[l]![j - first[l]!]! / pivot);
      for (const i of column) {
        let sum = 0;
        for (let k = 0; k < column.length; k++) sum -= weights[k]! * at(column[k]!, i);
        result.rows[i]![j - first[i]!] = sum;
      }
      let sum = 1 / (pivot * pivot);
      for (let k = 0; k < column.length; k++) sum -= weights[k]! * at(column[k]!, j);
      result.rows[j]![j - first[j]!] = sum;
    }
    return result;
  }

  /** tr(A·B) for a B with the same envelope. */
  traceWith({ rows: others }: EnvelopeMatrix): number {
    let sum = 0;
    this.rows.forEach((row, i) => {
      const other = others[i]!;
      const last = row.length - 1;
      for (let k = 0; k < last; k++) sum += 2 * row[k]! * other[k]!;
      sum += row[last]! * other[last]!;
    });
    return sum;
  }
}
