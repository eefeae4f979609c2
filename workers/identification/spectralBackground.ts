/** Ordinates on each side that make the surroundings of one, as a share of its place, and at least and at most this many. */
const SHARE = 0.25;
const LEAST = 12;
const MOST = 200;

/** Relative variance of the median of N exponentials times N: 1/ln² 2 (its asymptotic variance is 1/N, Cramér 1946, §28.5). */
const MEDIAN_VARIANCE = 1 / Math.LN2 ** 2;

/** Expectation of each ordinate, and how well it is known: as well as the mean of `ordinates` exponentials. */
export interface SpectralBackground {
  readonly expected: Float64Array;
  readonly ordinates: Float64Array;
}

/**
 * What the surroundings of each periodogram ordinate would give without a period: its expectation under a smooth spectrum.
 *
 * Method: the ordinates are first flattened by the spectrum of the first-order autoregression with their own lag-one autocorrelation (which Σ I cos ω gives), so that
 * a steep spectrum has no slope left within a window; the background is the median of the flattened ordinates within w places on either side, divided
 * by ln 2, the median of a standard exponential, times the autoregression's spectrum. A line is a few ordinates, which a median does not see. The
 * window is 0.25 k at place k, between 12 and 200; beyond the ends the spectrum is continued by reflection, as it is even. Our own
 * combination of known steps; common practice for lines on a coloured background.
 *
 * @param ordinates I(k/n), k = 1…m
 * @returns arrays of length m
 * @example ordinates all equal to c: expectation c/ln 2
 */
export function spectralBackground(ordinates: Float64Array): SpectralBackground {
  const m = ordinates.length;
  let total = 0;
  let cosine = 0;
  for (let i = 0; i < m; i++) {
    total += ordinates[i]!;
    cosine += ordinates[i]! * Math.cos((Math.PI * (i + 1)) / m);
  }
  const phi = total > 0 ? Math.max(-0.999, Math.min(0.999, cosine / total)) : 0;
  const inverse = Float64Array.from(
    { length: m },
    (_, i) => 1 - 2 * phi * Math.cos((Math.PI * (i + 1)) / m) + phi * phi,
  );
  const flat = ordinates.map((value, i) => value * inverse[i]!);
  const result = new Float64Array(m);
  // The median moves slowly: it is found at some places and interpolated between them.
  let from = 0;
  let before = medianAbout(flat, 0);
  result[0] = before;
  while (from < m - 1) {
    const to = Math.min(m - 1, from + Math.max(1, Math.floor(widthAt(from) / 4)));
    const after = medianAbout(flat, to);
    for (let i = from + 1; i <= to; i++) result[i] = before + ((after - before) * (i - from)) / (to - from);
    from = to;
    before = after;
  }
  return {
    expected: result.map((value, i) => value / Math.LN2 / inverse[i]!),
    // Reflected ordinates count once.
    ordinates: result.map((_, i) => {
      const width = widthAt(i);
      return (Math.min(m - 1, i + width) - Math.max(0, i - width) + 1) / MEDIAN_VARIANCE;
    }),
  };
}

function widthAt(place: number): number {
  return Math.min(MOST, Math.max(LEAST, Math.floor(SHARE * place)));
}

function medianAbout(flat: Float64Array, at: number): number {
  const m = flat.length;
  const width = widthAt(at);
  const window: number[] = [];
  for (let i = at - width; i <= at + width; i++) {
    // Place −1 is frequency 0, which has no ordinate; place −2 mirrors place 0.
    const folded = i < 0 ? -i - 2 : i >= m ? 2 * m - 2 - i : i;
    if (folded >= 0 && folded < m) window.push(flat[folded]!);
  }
  window.sort((a, b) => a - b);
  const half = window.length >> 1;
  return window.length % 2 === 1 ? window[half]! : 0.5 * (window[half - 1]! + window[half]!);
}
