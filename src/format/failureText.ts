import type { BadCandidateReason, Failure, LinkFailure, ReadingFailure } from '../../workers/contract/failures.ts';
import { counted, formatNumber } from './numbers.ts';
import { repairReasonText } from './repairText.ts';
import { readingFailureText } from './readingFailureText.ts';

/** What happened, where, and what to do. `where` may be empty. */
export interface FailureText {
  readonly what: string;
  readonly where: string;
  readonly todo: string;
}

const say = (what: string, where: string, todo: string): FailureText => ({ what, where, todo });

const badReasons: Record<BadCandidateReason, string> = {
  notAWholeNumber: 'must be a whole number',
  negative: 'may not be negative',
  tooLarge: 'is larger than a fit can carry',
  seasonTooShort: 'must be at least 2 readings long',
  seasonMissing: 'is needed for seasonal orders',
  meanWithDifferencing: 'differencing takes the mean away: choose drift or none',
  driftWithoutDifferencing: 'drift needs differencing: choose mean or none',
  zeroLagOutOfRange: 'holds a lag at zero that the order does not have, or its highest one',
  parameterLength: 'does not have one value for every coefficient',
  variance: 'must be above zero',
  window: 'lies outside the record',
  nonstationary: 'is not stationary',
  eventOutside: 'lies outside the record',
  transform: 'is not a number',
};

/** The words for every expected failure; a new code does not compile until it has some. */
export function failureText(failure: Failure): FailureText {
  switch (failure.code) {
    case 'internal':
      return say(
        'Something went wrong inside the program.',
        failure.message,
        'Your work is kept. Try again; if it happens again, save the session as a file and report it.',
      );
    case 'cancelled':
      return say('Cancelled.', '', 'Fit again when you like.');
    case 'workerDied':
      return say('A background worker ended unexpectedly.', failure.reason, 'Your work is kept. Fit again.');
    case 'timeout':
      return say(
        `A background worker did not answer within ${failure.seconds} s.`,
        '',
        'Reload the page; the session is kept.',
      );
    case 'notFinite':
      return say(
        'The record holds an infinite value.',
        `${failure.what}, reading ${failure.index + 1}`,
        'Make it a gap in the file, or read the cell as a gap word.',
      );
    case 'badCandidate':
      return say(
        `This candidate cannot be fitted: ${failure.field} ${badReasons[failure.reason]}.`,
        failure.field,
        'Change that setting in the row.',
      );
    case 'tooFewReadings':
      return say(
        `Too few readings: ${failure.readings} for ${counted(failure.coefficients, 'parameter')}; at least ${failure.needed} are needed.`,
        '',
        'Choose lower orders, or bring a longer record.',
      );
    case 'noVariation':
      return say(
        `The ${failure.afterDifferencing ? 'differenced ' : ''}record does not vary: every value is ${formatNumber(failure.value, 6)}.`,
        '',
        'There is no noise to model. Check that the right column was taken.',
      );
    case 'deterministic':
      return say(
        'After differencing nothing but rounding is left: the record is a line, not noise.',
        `spread ${formatNumber(failure.spread, 3)}, resolution ${formatNumber(failure.resolution, 3)}`,
        'A totaliser or set value was probably taken. Difference less, or take another column.',
      );
    case 'conditionalWithGaps':
      return say(
        `The conditional estimator needs a record without gaps; this one has ${failure.gaps}.`,
        '',
        'Choose the exact likelihood, which uses the readings there are. Nothing is interpolated.',
      );
    case 'estimatorNeedsPureAr':
      return say(
        'This estimator is for pure autoregressions.',
        failure.estimator,
        'Set q, P and Q to 0, or choose the exact likelihood.',
      );
    case 'estimatorNeedsNoGaps':
      return say(
        `This estimator needs a record without gaps; this one has ${failure.gaps}.`,
        failure.estimator,
        'Choose the exact likelihood.',
      );
    case 'transformDomain':
      return say(
        `The transform needs readings above zero; ${failure.count} are not.`,
        `first: reading ${failure.index + 1} = ${formatNumber(failure.value, 5)}`,
        'Leave the transform out, or shift the readings.',
      );
    case 'columnNotEstimable': {
      const why = {
        annihilated: 'differencing takes it away entirely',
        inGap: 'it acts only where there are no readings',
        collinear: 'it cannot be told from the inputs before it',
      }[failure.reason];
      return say(
        `The input ${failure.column} cannot be estimated: ${why}.`,
        failure.column,
        'Take it out of the candidate.',
      );
    }
    case 'columnMissing':
      return say(
        `The input column ${failure.column} is not in the record.`,
        failure.column,
        'Read the file again with that column, or take the input out.',
      );
    case 'columnLength':
      return say(
        `The input column ${failure.column} has ${failure.length} values; ${failure.needed} are needed.`,
        failure.column,
        'Give its values for the whole stretch.',
      );
    case 'columnGap':
      return say(
        `The input column ${failure.column} has no value where there is a reading.`,
        `reading ${failure.index + 1}`,
        'Fill that value in the file, or take the input out.',
      );
    case 'searchFailed':
      return say(
        `No maximum of the likelihood was found from ${counted(failure.starts, 'start')}.`,
        '',
        'Choose lower orders.',
      );
    case 'noAdmissibleMaximum':
      return say(
        'The likelihood has its maximum only where an AR and an MA root cancel on the unit circle.',
        `ln L ${formatNumber(failure.logLikelihood, 6)}`,
        'Such a fit means nothing. Choose lower orders.',
      );
    case 'startingValuesLost':
      return say(
        `The gaps leave ${failure.observed} readings to fix ${failure.needed} starting values.`,
        '',
        'Difference less, or bring a longer record.',
      );
    case 'intervalsNotExact':
      return say(
        'Intervals need a fit by the exact likelihood.',
        failure.estimator,
        'Choose the exact likelihood for this candidate.',
      );
    case 'intervalsUnreliable':
      return say(
        'No reliable interval: the parameter points that carry weight are too few.',
        `${formatNumber(failure.drawn, 9)} points, worth ${formatNumber(Math.round(failure.effectiveSize), 9)}; ${failure.needed} are needed`,
        'Choose lower orders, or check one parameter by simulation.',
      );
    case 'noSuchParameter':
      return say('The fit has no such parameter.', failure.name, 'Fit the candidate again.');
    case 'repairRefused':
      return say(
        `A repair cannot be made: ${repairReasonText(failure)}.`,
        `repair ${failure.place} (${failure.id})`,
        'Nothing was changed. Remove or correct that repair, then try again.',
      );
    default:
      return isLinkFailure(failure) ? linkText(failure) : readingFailureText(failure);
  }
}

const linkCodes: readonly string[] = [
  'exampleMissing',
  'linkForeign',
  'linkDamaged',
  'linkTooLarge',
  'linkNewer',
  'recordMismatch',
] satisfies LinkFailure['code'][];

function isLinkFailure(failure: LinkFailure | ReadingFailure): failure is LinkFailure {
  return linkCodes.includes(failure.code);
}

function linkText(failure: LinkFailure): FailureText {
  switch (failure.code) {
    case 'exampleMissing':
      return say('The example could not be loaded.', failure.name, 'Open a record of your own.');
    case 'linkForeign':
      return say(
        'The address does not end in a session link of this program.',
        'behind the # of the address',
        'Ask for the link again, or open a record.',
      );
    case 'linkDamaged':
      return say(
        'The session link is damaged.',
        failure.where === 'packing' ? 'it was cut or changed on its way' : `at ${failure.where}`,
        'Mail programs cut long links: ask for the session as a file. The page works as usual.',
      );
    case 'linkTooLarge':
      return say(
        `The session link is too long (${failure.characters} characters).`,
        `limit ${failure.limit}`,
        'Ask for the session as a file.',
      );
    case 'linkNewer':
      return say(
        `The session link was made by a newer version (format ${failure.version}; this page knows up to ${failure.known}).`,
        '',
        'Reload the page to get the newest version.',
      );
    case 'recordMismatch':
      return say(
        failure.sameFile
          ? 'This is the file of the session, but read differently: the readings are not the same.'
          : 'This record is not the one the session was made with.',
        failure.fileName,
        'The candidates of the session were fitted to it all the same; their numbers will differ. Undo to go back.',
      );
  }
}
