/** β∞, β₁, β₂, β₃ at 1, 5 and 10 %. */
const SURFACES = {
  constant: [
    [-3.43035, -6.5393, -16.786, -79.433],
    [-2.86154, -2.8903, -4.234, -40.04],
    [-2.56677, -1.5384, -2.809, 0],
  ],
  trend: [
    [-3.95877, -9.0531, -28.428, -134.155],
    [-3.41049, -4.3904, -9.036, -45.374],
    [-3.12705, -2.5856, -3.925, -22.38],
  ],
} as const;

/**
 * Critical values of the Dickey–Fuller t-ratio at 1, 5 and 10 %.
 *
 * Method: response surface β∞ + β₁/T + β₂/T² + β₃/T³ (MacKinnon 2010, Critical values for cointegration tests, Queen's Economics Department working
 * paper 1227, table 2, N = 1).
 *
 * @param trend deterministic part of the regression; @param rows T ≥ 1, rows of the regression; Infinity gives the limit
 * @example constant, T = 100: −2.8909 at 5 %
 */
export function dickeyFullerCritical(trend: 'constant' | 'trend', rows: number): readonly [number, number, number] {
  const at = (level: 0 | 1 | 2) => {
    const [limit, first, second, third] = SURFACES[trend][level];
    const x = 1 / rows;
    return limit + x * (first + x * (second + x * third));
  };
  return [at(0), at(1), at(2)];
}
