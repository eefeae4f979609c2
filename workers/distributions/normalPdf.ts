/**
 * Density of the standard normal, exp(−x²/2)/√(2π).
 *
 * @param x any number
 * @returns 0 at the infinities, NaN for NaN
 * @example normalPdf(0) = 0.3989422804014327
 */
export function normalPdf(x: number): number {
  return Math.exp(-0.5 * x * x) / Math.sqrt(2 * Math.PI);
}
