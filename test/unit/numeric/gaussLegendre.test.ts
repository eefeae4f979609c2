import { describe, expect, it } from 'vitest';
import { gaussLegendre } from '../../../workers/numeric/gaussLegendre.ts';

/** Abramowitz & Stegun, table 25.4: positive nodes and their weights, 15 decimals. */
const table: [number, number[], number[]][] = [
  [1, [0], [2]],
  [2, [0.577350269189626], [1]],
  [5, [0, 0.538469310105683, 0.906179845938664], [0.568888888888889, 0.478628670499366, 0.236926885056189]],
  [
    10,
    [0.148874338981631, 0.433395394129247, 0.679409568299024, 0.865063366688985, 0.973906528517172],
    [0.295524224714753, 0.269266719309996, 0.219086362515982, 0.149451349150581, 0.066671344308688],
  ],
];

describe('gaussLegendre', () => {
  it.each(table)('n = %i as tabulated', (n, nodes, weights) => {
    const rule = gaussLegendre(n);
    const middle = n >> 1;
    nodes.forEach((node, i) => {
      expect(Math.abs(rule.nodes[middle + i]! - node)).toBeLessThan(1e-15);
      expect(Math.abs(rule.nodes[n - 1 - middle - i]! + node)).toBeLessThan(1e-15);
      expect(Math.abs(rule.weights[middle + i]! - weights[i]!)).toBeLessThan(1e-15);
    });
  });

  it.each([3, 40, 199, 2000])('n = %i integrates the highest exact power, which lives at the end nodes', (n) => {
    const { nodes, weights } = gaussLegendre(n, 0, 1);
    // ∫₀¹ x^{2n−1} dx = 1/2n; a node near 1 off by one unit in the last place moves it by (2n − 1)ε.
    let sum = 0;
    nodes.forEach((x, i) => (sum += weights[i]! * x ** (2 * n - 1)));
    expect(Math.abs(sum * 2 * n - 1)).toBeLessThan(2 * n * 2.3e-16 + 1e-14);
    expect(Math.abs(weights.reduce((total, weight) => total + weight, 0) - 1)).toBeLessThan(1e-13);
  });

  it('takes any interval, nodes ascending inside it', () => {
    const { nodes, weights } = gaussLegendre(12, 2, 5);
    let sum = 0;
    nodes.forEach((x, i) => (sum += weights[i]! / x));
    expect(Math.abs(sum - Math.log(2.5))).toBeLessThan(1e-12);
    expect([...nodes]).toEqual([...nodes].sort((a, b) => a - b));
    expect(nodes[0]).toBeGreaterThan(2);
    expect(nodes[11]).toBeLessThan(5);
  });

  it.each([0, -1, 2.5, NaN])('refuses n = %d', (n) => {
    expect(() => gaussLegendre(n)).toThrow(/whole number/);
  });
});
