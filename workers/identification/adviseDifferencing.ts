import type { AdviceReason, DifferencingLine, Sureness, UnitRootPair } from '../contract/shape.ts';
import { differencingPolynomial } from '../model/differencingPolynomial.ts';
import { differenceRecord } from '../series/differenceRecord.ts';
import { unitRootPair } from './unitRootPair.ts';

/** Lag-one autocorrelation below which a difference was one too many: an MA root at 1 gives −½. */
const TOO_MANY = -0.45;
/** Where no test speaks: differencing must bring the variance below this share. */
const CLEARLY_LESS = 0.6;
/** A root at 1 and one at 0.95 look alike to the tests: only a lag-one autocorrelation above some 0.975 makes a difference a clear matter. */
const WANDERS = 0.05;
/** Where the unit root is rejected too: a shifted level or an event is likelier, unless next to nothing of the variance is left. */
const NEARLY_NOTHING = 0.1;

export interface DifferencingAdvice {
  readonly d: number;
  readonly sureness: Sureness;
  readonly reasons: readonly AdviceReason[];
}

/**
 * How often to difference, given the season.
 *
 * Method: the two unit-root tests about a constant on the seasonally differenced record say whether there is a unit root; the variances of
 * `differencingTable` are held against them, and decide where the tests do not (Box & Jenkins, Time Series Analysis, §6.2.1; a difference too
 * many leaves a lag-one autocorrelation near −½). Repeated on the differences, up to d = 2. Tests advise, they do not vote: where they and the variance
 * disagree the advice says so by its sureness.
 *
 * @param values gaps as NaN; @param D seasonal differences; @param s season
 * @param table of the same record
 */
export function adviseDifferencing(
  values: Float64Array,
  D: number,
  s: number,
  table: readonly DifferencingLine[],
): DifferencingAdvice {
  const line = (d: number) => table.find((one) => one.d === d && one.D === D);
  const reasons: AdviceReason[] = [];
  let sureness: Sureness = 'clear';
  for (let d = 0; d < 2; d++) {
    const here = line(d);
    const next = line(d + 1);
    const pair = unitRootPair(differenceRecord(values, differencingPolynomial({ d, D, s })), 'constant');
    if (pair === null || here === undefined || next === undefined) {
      reasons.push({ about: 'd', code: 'tooFew', numbers: { readings: here?.readings ?? 0 } });
      return { d, sureness: 'open', reasons };
    }
    const falls = next.variance < here.variance;
    reasons.push(outcomeReason(pair, d, D), {
      about: 'd',
      code: falls ? 'varianceFalls' : 'varianceRises',
      numbers: { d: d + 1, before: here.variance, after: next.variance },
    });
    const step = decide(pair, next.variance / here.variance);
    sureness = worse(sureness, step.sureness);
    if (step.more && next.lagOne < TOO_MANY && !falls) {
      reasons.push({ about: 'd', code: 'overDifferenced', numbers: { d: d + 1, lagOne: next.lagOne } });
      return { d, sureness: 'open', reasons };
    }
    if (!step.more) return { d, sureness, reasons };
  }
  return { d: 2, sureness, reasons };
}

function decide(pair: UnitRootPair, ratio: number): { more: boolean; sureness: Sureness } {
  switch (pair.outcome) {
    case 'stationary':
      return { more: false, sureness: ratio > CLEARLY_LESS ? 'clear' : 'likely' };
    case 'unitRoot':
      return { more: ratio < 1, sureness: ratio < WANDERS ? 'clear' : ratio < 1 ? 'likely' : 'open' };
    case 'neither':
      return { more: ratio < NEARLY_NOTHING, sureness: 'open' };
    case 'open':
      return { more: ratio < CLEARLY_LESS, sureness: 'open' };
  }
}

function outcomeReason({ outcome, dickeyFuller, kpss }: UnitRootPair, d: number, D: number): AdviceReason {
  const codes = {
    stationary: 'stationary',
    unitRoot: 'unitRoot',
    neither: 'bothRejected',
    open: 'neitherRejected',
  } as const;
  return {
    about: 'd',
    code: codes[outcome],
    numbers: {
      d,
      D,
      adf: dickeyFuller.statistic,
      adfCritical: dickeyFuller.critical[1],
      kpss: kpss.statistic,
      kpssCritical: kpss.critical[1],
    },
  };
}

const RANKS: readonly Sureness[] = ['clear', 'likely', 'open'];
function worse(one: Sureness, other: Sureness): Sureness {
  return RANKS.indexOf(one) > RANKS.indexOf(other) ? one : other;
}
