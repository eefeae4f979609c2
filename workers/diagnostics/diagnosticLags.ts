/** Lags looked at without a season. */
const PLAIN = 24;
/** Products the correlogram may cost: about half a second. */
const MOST_PRODUCTS = 4e8;

/**
 * Number of lags to judge innovations by.
 *
 * At most a quarter of the innovations (Box & Jenkins, Time Series Analysis, §2.1.5), otherwise 24, or two seasons and a little where there is a
 * season; held so that a long record with a long season does not take seconds.
 *
 * @param innovations number of innovations; @param season readings in a season, 0 for none
 * @param asked lags asked for, which only the number of innovations limits
 * @returns at least 1 where there are two innovations or more, otherwise 0
 */
export function diagnosticLags(innovations: number, season: number, asked?: number): number {
  const most = Math.max(0, innovations - 1);
  if (asked !== undefined) return Math.min(asked, most);
  const affordable = Math.max(PLAIN, Math.floor(MOST_PRODUCTS / Math.max(innovations, 1)));
  const wanted = Math.max(PLAIN, 2 * season + Math.min(season, 4));
  return Math.min(wanted, affordable, Math.max(1, Math.floor(innovations / 4)), most);
}
