import type { Evidence, VerdictItem } from '../contract/diagnostics.ts';
import type { Warning, WarningCode } from '../contract/fit.ts';
import { coefficientCount } from '../estimation/prepareRecord.ts';
import { extremeInnovations } from './extremeInnovations.ts';
import { jointWhiteness } from './jointWhiteness.ts';
import { needlessCoefficients } from './needlessCoefficients.ts';

/**
 * The rules of the verdict, in the order they are read to a person. Each looks at the evidence and says its sentences as data.
 *
 * Underfit is judged before overfit: while memory is left in the innovations the standard errors are provisional and
 * nothing is concluded from them (common practice).
 */

/** Below this joint p-value the innovations are not white: unsound; between it and `DOUBT` doubtful. */
const CERTAIN = 0.01;
const DOUBT = 0.05;
/** The largest of n right innovations exceeds its limit this often. */
const EXTREME = 0.01;
/** Size of the test of a coefficient, |estimate| < 1.96 standard errors. */
const NEEDLESS = 0.05;

export type Rule = (evidence: Evidence) => VerdictItem[];

/** 1. Is memory left over? */
const whiteness: Rule = ({ fit, portmanteau }) => {
  const joint = jointWhiteness(portmanteau, coefficientCount(fit.candidate), fit.candidate.order.s);
  if (joint === null) {
    const numbers = { readings: fit.readingsUsed, lags: portmanteau.lags.length };
    return [{ reason: 'fewReadings', weight: 'doubtful', numbers, panel: 'lags' }];
  }
  const at = joint.lag - 1;
  const numbers = {
    p: joint.p,
    lags: joint.lags.length,
    lag: joint.lag,
    pAtLag: portmanteau.pValues[at]!,
    statistic: portmanteau.statistics[at]!,
    degreesOfFreedom: portmanteau.degreesOfFreedom[at]!,
  };
  if (joint.p >= DOUBT) return [{ reason: 'white', weight: 'supports', numbers, panel: 'lags' }];
  return [{ reason: 'notWhite', weight: joint.p < CERTAIN ? 'unsound' : 'doubtful', numbers, panel: 'lags' }];
};

/** 2. What the search and the estimates warn of, and where each is seen. */
const WARNING_PANELS: Record<WarningCode, VerdictItem['panel']> = {
  notConverged: 'estimates',
  nearlyDeterministic: 'record',
  overDifferenced: 'roots',
  nearUnitAr: 'roots',
  spuriousPair: 'roots',
  commonFactor: 'roots',
  maOnCircle: 'roots',
  flatLikelihood: 'estimates',
  severalMaxima: 'estimates',
  informationDisagrees: 'estimates',
  covarianceUnavailable: 'estimates',
  fewReadings: 'record',
  digitsLost: 'record',
  quantised: 'record',
};

/** A fit that was not found or a record that is no noise cannot be defended; the others leave a doubt to be named. */
const UNSOUND: ReadonlySet<WarningCode> = new Set(['notConverged', 'nearlyDeterministic']);

const warned: Rule = ({ fit }) =>
  fit.warnings.filter(weighs).map((warning): VerdictItem => {
    const { code, numbers, about = [] } = warning;
    const panel = WARNING_PANELS[code];
    if (code === 'covarianceUnavailable') return { reason: 'noWaldNumbers', weight: 'doubtful', numbers, about, panel };
    if (code === 'fewReadings') return { reason: 'fewReadings', weight: 'doubtful', numbers, about, panel };
    const weight = UNSOUND.has(code) ? 'unsound' : 'doubtful';
    return { reason: 'warning', weight, numbers, about: [code, ...about], panel };
  });

/** A spurious maximum that the search has set aside speaks for the fit at hand, not against it. */
function weighs({ code, numbers }: Warning): boolean {
  return code !== 'spuriousPair' || numbers.excluded !== 1;
}

/** 3. Innovations larger than independent normals would give. */
const extremes: Rule = ({ innovations }) => {
  const found = extremeInnovations(innovations.standardised, EXTREME);
  if (found === null || found.count === 0) return [];
  return [{ reason: 'largeInnovations', weight: 'doubtful', numbers: { ...found }, panel: 'innovations' }];
};

/** 4. Coefficients that could be left out, only where nothing is left over. */
const needless: Rule = ({ fit }) =>
  needlessCoefficients(fit, NEEDLESS).map(({ name, estimate, standardError, p }) => ({
    reason: 'needlessCoefficient',
    weight: 'doubtful',
    numbers: { estimate, standardError, p },
    about: [name],
    panel: 'estimates',
  }));

/**
 * Applies the rules to the evidence on one fit.
 *
 * @returns sentences as data: what makes the fit unsound first, then doubts, then what supports it, each in the order of the rules
 */
export function rules(evidence: Evidence): VerdictItem[] {
  const memory = whiteness(evidence);
  const white = memory.some(({ reason }) => reason === 'white');
  const items = [...memory, ...warned(evidence), ...extremes(evidence), ...(white ? needless(evidence) : [])];
  const rank = { unsound: 0, doubtful: 1, supports: 2 };
  return items.sort((one, other) => rank[one.weight] - rank[other.weight]);
}
