import type { Maximum } from '../../workers/contract/fit.ts';
import { counted, formatFixed, formatNumber, subscript } from './numbers.ts';

/** One maximum of the likelihood: its height, where it is, and how often the search ended there. */
export function maximumText({ logLikelihood, parameters, reached, boundary }: Maximum): string {
  const part = (letter: string, values: readonly number[]) =>
    values.map((value, i) => `${letter}${subscript(i + 1)} ${formatNumber(value, 3)}`);
  const { ar, ma, seasonalAr, seasonalMa } = parameters;
  const at = [...part('φ', ar), ...part('θ', ma), ...part('Φ', seasonalAr), ...part('Θ', seasonalMa)];
  const place = at.length === 0 ? '' : ` at ${at.slice(0, 6).join(', ')}${at.length > 6 ? ' …' : ''}`;
  return `${formatFixed(logLikelihood, 3)}${place}; reached ${reached === 1 ? 'once' : counted(reached, 'time')}${boundary ? ', an MA root on the circle' : ''}`;
}
