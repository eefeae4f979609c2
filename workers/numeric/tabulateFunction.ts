/**
 * A smooth function tabulated once, for sums that need it a million times.
 *
 * Method: values on an even grid, cubic through the four nearest (Abramowitz & Stegun 25.2.13): error of the order of the fourth power of the
 * step times f⁗/40.
 *
 * @param f defined on the whole interval
 * @param from @param to ends, from < to
 * @param cells ≥ 4
 * @returns f between the ends, its end values outside
 */
export function tabulateFunction(
  f: (x: number) => number,
  from: number,
  to: number,
  cells: number,
): (x: number) => number {
  const step = (to - from) / cells;
  const table = Float64Array.from({ length: cells + 1 }, (_, i) => f(from + i * step));
  return (x) => {
    const place = (x - from) / step;
    if (!(place > 0)) return Number.isNaN(x) ? NaN : table[0]!;
    if (place >= cells) return table[cells]!;
    const i = Math.min(cells - 2, Math.max(1, Math.floor(place)));
    const u = place - i;
    const [a, b, c, d] = [table[i - 1]!, table[i]!, table[i + 1]!, table[i + 2]!];
    return b + u * (c - a / 3 - b / 2 - d / 6) + u * u * ((a + c) / 2 - b) + u * u * u * ((d - a) / 6 + (b - c) / 2);
  };
}
