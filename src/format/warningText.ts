import type { Warning } from '../../workers/contract/fit.ts';
import { formatNumber } from './numbers.ts';

/** What a warning says and what to try. */
export interface WarningText {
  readonly says: string;
  readonly tryNext: string;
}

/** The words for every warning; a new code does not compile until it has some. */
export function warningText({ code, numbers, about = [] }: Warning): WarningText {
  const n = (key: string, digits = 3) => formatNumber(numbers[key] ?? NaN, digits);
  switch (code) {
    case 'nearUnitAr':
      return {
        says: `The slowest AR root has modulus ${n('modulus', 4)}, above ${n('limit', 4)}: with ${n('readings', 9)} readings it cannot be told from a unit root, so the mean and every interval hang on that question.`,
        tryNext: 'Try one difference (d = 1) beside this candidate.',
      };
    case 'maOnCircle':
      return {
        says: 'An MA root lies on the unit circle. That is a legal estimate at the edge of its range; no Wald standard error exists there.',
        tryNext:
          (numbers['d'] ?? 0) + (numbers['D'] ?? 0) > 0 ? 'Try one difference fewer.' : 'Try one MA coefficient fewer.',
      };
    case 'overDifferenced':
      return {
        says: `An MA root of modulus ${n('modulus', 4)} undoes a difference: the record is over-differenced (variance ${n('before')} before the last difference, ${n('after')} after it; lag-one correlation ${n('lagOne', 2)}).`,
        tryNext: 'Try one difference fewer, with a mean.',
      };
    case 'commonFactor':
      return {
        says: `An AR and an MA root are ${n('distance')} apart, closer than their uncertainty: they nearly cancel, and neither is well determined.`,
        tryNext: 'Try p and q lower by one.',
      };
    case 'spuriousPair':
      return numbers['excluded'] === 1
        ? {
            says: `A higher likelihood (by ${n('gain')}) was found only where an AR and an MA root cancel on the unit circle. It means nothing and is set aside.`,
            tryNext: 'Choose lower orders.',
          }
        : {
            says: `An AR and an MA root lie ${n('distance')} apart next to the unit circle: in a short record that is usually chance.`,
            tryNext: 'Try p and q lower by one.',
          };
    case 'flatLikelihood':
      return {
        says: 'The likelihood is flat in some direction: the readings do not determine all coefficients.',
        tryNext: 'Choose lower orders.',
      };
    case 'severalMaxima':
      return {
        says: `The likelihood has ${n('count', 2)} maxima within 2 of the best; the next is ${n('gap')} lower in ln L.`,
        tryNext: 'Look at both before you rely on the coefficients.',
      };
    case 'fewReadings':
      return {
        says: `${n('readings', 9)} readings carry ${n('parameters', 3)} parameters; about ${n('wanted', 4)} would be wanted.`,
        tryNext: 'Choose lower orders, or bring a longer record.',
      };
    case 'nearlyDeterministic':
      return {
        says: 'Nearly all of the variance comes from a few readings: it is a blip, not noise.',
        tryNext: 'Look at these readings first.',
      };
    case 'digitsLost':
      return {
        says: `The readings are ${n('ratio', 2)} times larger than their spread: about ${n('digits', 2)} of 16 digits are spent on the offset.`,
        tryNext: 'Export the record with a smaller offset if more digits are needed.',
      };
    case 'covarianceUnavailable':
      return {
        says:
          numbers['onCircle'] === 1
            ? 'No standard errors: the estimate lies on the edge of its range, where the usual theory does not hold.'
            : `No standard errors: the curvature of the likelihood is ${about.includes('flat') ? 'flat' : about.includes('inexact') ? 'not known exactly enough' : 'not that of a maximum'}.`,
        tryNext: 'Choose lower orders.',
      };
    case 'informationDisagrees':
      return {
        says: `Standard errors from the curvature and from theory differ by a factor of ${n('ratio', 2)}: take them as rough.`,
        tryNext: 'Choose lower orders, or rely on the likelihood itself.',
      };
    case 'notConverged':
      return {
        says: `The search did not settle (gradient ${n('gradientNorm', 2)}).`,
        tryNext: 'Fit again; if it stays, choose lower orders.',
      };
    case 'quantised':
      return {
        says: `The readings move in steps of ${n('step')}, ${n('inDeviations', 2)} standard deviations: rounding adds noise that looks like an MA term.`,
        tryNext: 'Ask for the readings with more digits.',
      };
  }
}
