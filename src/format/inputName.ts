import type { Candidate, Regressor } from '../../workers/contract/candidate.ts';
import type { Axis } from '../../workers/contract/series.ts';
import { formatReadings, timeAt } from './axisTime.ts';
import { counted } from './numbers.ts';

/** An event or covariate of a candidate in words. */
export function inputName(regressor: Regressor, axis: Axis): string {
  switch (regressor.kind) {
    case 'step':
      return `step from ${timeAt(axis, regressor.at)} on`;
    case 'pulse':
      return `pulse at ${timeAt(axis, regressor.at)}`;
    case 'ramp':
      return `ramp rising from ${timeAt(axis, regressor.at)} on`;
    case 'harmonic':
      return `harmonic ${regressor.k} of ${formatReadings(axis, regressor.period)}`;
    case 'column':
      return regressor.lag === 0
        ? `column ${regressor.id}`
        : `column ${regressor.id}, ${counted(regressor.lag, 'reading')} earlier`;
  }
}

/** Lags held at zero as they are typed: numbers with commas between. Null where the text is something else. */
export function lagsFrom(text: string): number[] | null {
  const parts = text.split(/[\s,;]+/u).filter((part) => part !== '');
  const lags = parts.map(Number);
  return lags.every((lag) => Number.isInteger(lag) && lag > 0) ? [...new Set(lags)].sort((a, b) => a - b) : null;
}

/** Lags held at zero of orders that a candidate still has: the highest lag of a factor is never one of them. */
export function fittingZeroLags({ order, zeroLags }: Pick<Candidate, 'order' | 'zeroLags'>): Candidate['zeroLags'] {
  const below = (lags: readonly number[], most: number) => lags.filter((lag) => lag < most);
  return {
    ar: below(zeroLags.ar, order.p),
    ma: below(zeroLags.ma, order.q),
    seasonalAr: below(zeroLags.seasonalAr, order.P),
    seasonalMa: below(zeroLags.seasonalMa, order.Q),
  };
}
