import type { Fit } from '../../workers/contract/fit.ts';
import type { SweepMode, SweepRanking } from '../../workers/contract/selection.ts';
import { candidateName } from './notation.ts';
import { counted, formatFixed } from './numbers.ts';

interface Swept {
  readonly fits: readonly Fit[];
  readonly size: number;
  readonly failed: number;
  readonly passedOver: number;
  readonly mode: SweepMode;
}

/** Largest share of the weight at which the best of a sweep is called clear, and the number near it at which it is not. */
const CLEAR = 0.8;

/** How clear the winner of a sweep is, and what became of the rest. */
export function sweepSentence({ fits, size, failed, passedOver, mode }: Swept, ranking: SweepRanking): string {
  const best = ranking.groups[0]?.members[0];
  if (best === undefined) return 'No candidate of the range could be fitted.';
  const name = candidateName(fits[best.index]!.candidate);
  const share = `${formatFixed(100 * ranking.weight, 0)} % of the weight`;
  const choice =
    ranking.weight >= CLEAR
      ? `${name} stands clear, with ${share}.`
      : ranking.near === 1
        ? `${name} comes first with ${share}; none other is within 2.`
        : `${name} comes first with ${share}, but ${counted(ranking.near, 'candidate')} stand within 2: the record does not settle which.`;
  const rest = [
    mode === 'walk'
      ? `walked through ${fits.length} of ${size}, neighbour by neighbour`
      : `${counted(fits.length, 'candidate')} fitted of ${size}`,
    ...(passedOver > 0 ? [`${passedOver} passed over as hopeless`] : []),
    ...(failed > 0 ? [`${failed} could not be fitted`] : []),
    ...(ranking.folded.length > 0 ? [`${ranking.folded.length} with cancelling roots folded into smaller ones`] : []),
  ];
  return `${choice} ${rest.join(', ').replace(/^./u, (first) => first.toUpperCase())}.`;
}
