/**
 * The exact Gaussian ln L by the definition, sharing no code with the product: theoretical autocovariances from the linear
 * system of Brockwell & Davis (Time Series: Theory and Methods, 2nd ed., §3.3, third method), the dense covariance of the
 * differenced record and its Cholesky factor. Readings that are missing enter as unknowns with a flat prior: they are integrated out by
 * ∫ N(w; 0, Σ) dy = (2π)^{k/2} |Z′Σ⁻¹Z|^{−1/2} × the density at the best unknowns. O(n³): for tests alone.
 */
export interface OracleModel {
  ar: number[];
  ma: number[];
  /** c_0 = 1, c_1 … of the differencing polynomial; [1] without differencing. */
  differencing: number[];
  variance: number;
}

/** Coefficients of (1 − Σ a_i Bⁱ)(1 − Σ b_j Bˢʲ), as a_i of 1 − Σ a_i Bⁱ; sign −1 gives the MA product of 1 + Σ. */
export function multiplied(plain: number[], seasonal: number[], s: number, sign: 1 | -1): number[] {
  const left = [1, ...plain.map((value) => -sign * value)];
  const right = new Array<number>(seasonal.length * s + 1).fill(0);
  right[0] = 1;
  seasonal.forEach((value, index) => (right[(index + 1) * s] = -sign * value));
  const product = new Array<number>(left.length + right.length - 1).fill(0);
  left.forEach((a, i) => {
    right.forEach((b, j) => {
      product[i + j]! += a * b;
    });
  });
  return product.slice(1).map((value) => -sign * value);
}

export function oracleAutocovariances(ar: number[], ma: number[], most: number): number[] {
  const p = ar.length;
  const theta = [1, ...ma];
  const psi: number[] = [];
  for (let j = 0; j < theta.length; j++) {
    let sum = theta[j]!;
    for (let i = 1; i <= Math.min(p, j); i++) sum += ar[i - 1]! * psi[j - i]!;
    psi.push(sum);
  }
  const right = (k: number) => {
    let sum = 0;
    for (let j = k; j < theta.length; j++) sum += theta[j]! * psi[j - k]!;
    return sum;
  };
  // γ_k − Σ φ_i γ_{|k−i|} = right(k), k = 0…p.
  const rows = Array.from({ length: p + 1 }, (_, k) => {
    const row = new Array<number>(p + 2).fill(0);
    row[k]! += 1;
    for (let i = 1; i <= p; i++) row[Math.abs(k - i)]! -= ar[i - 1]!;
    row[p + 1] = right(k);
    return row;
  });
  const gamma = eliminate(rows);
  for (let k = p + 1; k <= most; k++) {
    let sum = right(k);
    for (let i = 1; i <= p; i++) sum += ar[i - 1]! * gamma[k - i]!;
    gamma.push(sum);
  }
  return gamma.slice(0, most + 1);
}

/** ln L of readings (NaN missing) less given mean function values, with nothing profiled. */
export function oracleLogLikelihood(readings: number[], model: OracleModel): number {
  const c = model.differencing;
  const m = c.length - 1;
  const n = readings.length;
  const size = n - m;
  const missing = readings.flatMap((value, t) => (Number.isNaN(value) ? [t] : []));
  const column = (y: number[]) =>
    Array.from({ length: size }, (_, t) => c.reduce((sum, value, i) => sum + value * y[t + m - i]!, 0));
  const w = column(readings.map((value) => (Number.isNaN(value) ? 0 : value)));
  const gamma = oracleAutocovariances(model.ar, model.ma, size);
  const L = factor(
    Array.from({ length: size }, (_, i) => Array.from({ length: size }, (__, j) => gamma[Math.abs(i - j)]!)),
  );
  const white = (x: number[]) => {
    const y: number[] = [];
    for (let i = 0; i < size; i++) {
      let sum = x[i]!;
      for (let k = 0; k < i; k++) sum -= L[i]![k]! * y[k]!;
      y.push(sum / L[i]![i]!);
    }
    return y;
  };
  let logDeterminant = 0;
  for (let i = 0; i < size; i++) logDeterminant += 2 * Math.log(L[i]![i]!);
  const columns = missing.map((t) => white(column(readings.map((_, u) => (u === t ? 1 : 0)))));
  const record = white(w);
  // Gram–Schmidt, twice over: |Z′Σ⁻¹Z| is the product of the squared lengths that are left.
  let logGram = 0;
  let rank = 0;
  const basis: number[][] = [];
  const project = (x: number[]) => {
    for (let pass = 0; pass < 2; pass++)
      for (const unit of basis) {
        const along = inner(x, unit);
        unit.forEach((value, i) => (x[i]! -= along * value));
      }
    return x;
  };
  for (const x of columns) {
    const whole = inner(x, x);
    const rest = project(x);
    const length = inner(rest, rest);
    if (length < 1e-16 * whole) continue;
    rank += 1;
    logGram += Math.log(length);
    basis.push(rest.map((value) => value / Math.sqrt(length)));
  }
  const rest = project(record);
  const used = size - rank;
  return (
    -0.5 *
    (used * Math.log(2 * Math.PI * model.variance) + logDeterminant + logGram + inner(rest, rest) / model.variance)
  );
}

function inner(a: number[], b: number[]): number {
  return a.reduce((sum, value, i) => sum + value * b[i]!, 0);
}

function factor(matrix: number[][]): number[][] {
  const n = matrix.length;
  const L = Array.from({ length: n }, () => new Array<number>(n).fill(0));
  for (let i = 0; i < n; i++)
    for (let j = 0; j <= i; j++) {
      let sum = matrix[i]![j]!;
      for (let k = 0; k < j; k++) sum -= L[i]![k]! * L[j]![k]!;
      if (i === j && !(sum > 0)) throw new Error('The dense covariance is not positive definite');
      L[i]![j] = i === j ? Math.sqrt(sum) : sum / L[j]![j]!;
    }
  return L;
}

/** Gaussian elimination with row exchanges on an augmented matrix. */
function eliminate(rows: number[][]): number[] {
  const n = rows.length;
  for (let k = 0; k < n; k++) {
    let best = k;
    for (let i = k + 1; i < n; i++) if (Math.abs(rows[i]![k]!) > Math.abs(rows[best]![k]!)) best = i;
    [rows[k], rows[best]] = [rows[best]!, rows[k]!];
    for (let i = k + 1; i < n; i++) {
      const ratio = rows[i]![k]! / rows[k]![k]!;
      for (let j = k; j <= n; j++) rows[i]![j]! -= ratio * rows[k]![j]!;
    }
  }
  const x = new Array<number>(n).fill(0);
  for (let k = n - 1; k >= 0; k--) {
    let sum = rows[k]![n]!;
    for (let j = k + 1; j < n; j++) sum -= rows[k]![j]! * x[j]!;
    x[k] = sum / rows[k]![k]!;
  }
  return x;
}
