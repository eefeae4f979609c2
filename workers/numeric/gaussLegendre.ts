/** Nodes, ascending, and weights of a quadrature rule. */
export interface Quadrature {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

const MOST_STEPS = 20;

/**
 * Gauss–Legendre quadrature: Σ w_i f(x_i) is exact for polynomials up to degree 2n − 1.
 *
 * Method: Newton steps in the angle θ, x = cos θ, from Tricomi's approximation of the zeros (Abramowitz & Stegun 22.7.10, 22.16.6, 25.4.29).
 * P_n comes from its three-term recurrence written in differences and 1 − x = 2 sin²(θ/2), so that the crowded nodes near the ends lose
 * no digits; O(n²).
 *
 * @param n number of nodes, whole, ≥ 1; @param from, to ends of the interval, −1 and 1 when left out
 * @returns n nodes inside the interval and their weights, whose sum is to − from
 * @throws RangeError where n is not a whole number ≥ 1
 * @example n = 2: ±1/√3, weights 1
 */
export function gaussLegendre(n: number, from = -1, to = 1): Quadrature {
  if (!Number.isInteger(n) || n < 1)
    throw new RangeError(`The number of nodes must be a whole number ≥ 1; it is ${n}.`);
  const nodes = new Float64Array(n);
  const weights = new Float64Array(n);
  const middle = 0.5 * (from + to);
  const half = 0.5 * (to - from);
  for (let i = 0; i < (n + 1) >> 1; i++) {
    const first = (Math.PI * (i + 0.75)) / (n + 0.5);
    let angle = first + (n - 1) / (8 * n * n * n * Math.tan(first));
    for (let step = 0; step < MOST_STEPS; step++) {
      const { value, slope } = legendre(n, angle);
      angle -= value / slope;
      // Newton doubles the digits: after a step this small nothing is left to correct.
      if (Math.abs(value / slope) < 1e-9 * angle) break;
    }
    const { slope } = legendre(n, angle);
    const x = 2 * i + 1 === n ? 0 : Math.cos(angle);
    nodes[i] = middle - half * x;
    nodes[n - 1 - i] = middle + half * x;
    weights[i] = weights[n - 1 - i] = (2 * half) / (slope * slope);
  }
  return { nodes, weights };
}

/** P_n(cos θ) and its derivative with respect to θ. */
function legendre(n: number, angle: number): { value: number; slope: number } {
  const short = 2 * Math.sin(angle / 2) ** 2;
  let value = 1;
  let difference = -short;
  for (let k = 1; k < n; k++) {
    value += difference;
    difference = (k * difference - (2 * k + 1) * short * value) / (k + 1);
  }
  value += difference;
  return { value, slope: (n * (difference - short * value)) / Math.sin(angle) };
}
