import type { Finding } from '../contract/forensics.ts';
import { kolmogorovUpperTail } from '../distributions/kolmogorovUpperTail.ts';
import type { Whitened } from './whitenRecord.ts';

const CHANCE = 3e-4;
/** A change of the standard deviation by less does no harm worth a line, however sure it is in a long record. */
const RATIO = 1.4;
/** Sizes are cut off here, in robust standard deviations, so that one wild reading is no change of variance. */
const CUT = 4;

/**
 * A change of the size of the innovations.
 *
 * Method: cumulative sums of |e_t|, as in the iterated sums of squares of Inclán & Tiao (1994, J. Am. Stat. Assoc. 89, 913–923) with the
 * spread of the summands estimated (Sansó, Aragó & Carrion 2004, Rev. Econ. Financ. 4, 32–53); |e| for e² since its tails are shorter. The
 * largest distance from a straight line, over s√n, follows Kolmogorov's law where nothing changes.
 *
 * @param whitened of the record without outliers and steps
 * @returns a finding placed at the first reading of the later stretch, or null; `numbers`: ratio (of standard deviations, later to
 *   earlier), p
 */
export function findVarianceChange({ innovations, scale }: Whitened): Finding | null {
  const index: number[] = [];
  const sizes: number[] = [];
  innovations.forEach((e, t) => {
    if (Number.isNaN(e)) return;
    index.push(t);
    sizes.push(Math.min(Math.abs(e) / scale, CUT));
  });
  const n = sizes.length;
  const mean = sizes.reduce((sum, one) => sum + one, 0) / n;
  let [along, most, at] = [0, 0, 0];
  sizes.forEach((one, i) => {
    along += one - mean;
    if (Math.abs(along) > most && i + 1 < n) [most, at] = [Math.abs(along), i + 1];
  });
  if (at === 0) return null;
  const meanOf = (part: readonly number[]) => part.reduce((sum, one) => sum + one, 0) / part.length;
  const parts = [sizes.slice(0, at), sizes.slice(at)] as const;
  const spread = Math.sqrt(sizes.reduce((sum, one) => sum + (one - mean) ** 2, 0) / n);
  const p = kolmogorovUpperTail(most / (spread * Math.sqrt(n)));
  const ratio = meanOf(parts[1]) / meanOf(parts[0]);
  if (!(p < CHANCE) || Math.max(ratio, 1 / ratio) < RATIO) return null;
  const from = index[at]!;
  return {
    code: 'varianceChange',
    count: 1,
    places: [{ from, to: from + 1 }],
    numbers: { ratio, p },
    effect: 'intervalsWrong',
    offered: [],
  };
}
