import type { VerdictItem } from '../../workers/contract/diagnostics.ts';
import type { WarningCode } from '../../workers/contract/fit.ts';
import type { Axis } from '../../workers/contract/series.ts';
import { timeAt } from './axisTime.ts';
import { coefficientName } from './notation.ts';
import { counted, formatNumber, formatPValue } from './numbers.ts';
import { warningText } from './warningText.ts';

/** One sentence of the verdict in words, with what to try where it fails. */
export interface VerdictSentence {
  readonly says: string;
  readonly tryNext: string;
}

const plain = (says: string, tryNext = ''): VerdictSentence => ({ says, tryNext });

/** p with its sign of comparison, for the middle of a sentence. */
function pPhrase(p: number): string {
  const text = formatPValue(p);
  return text.startsWith('<') ? `p ${text}` : `p = ${text}`;
}

/** The sentence for one item; numbers as the core gives them. */
export function verdictSentence(item: VerdictItem, axis: Axis): VerdictSentence {
  const { numbers, about = [] } = item;
  const n = (key: string, digits = 3) => formatNumber(numbers[key] ?? NaN, digits);
  switch (item.reason) {
    case 'white':
      return plain(
        `No memory is left in the innovations (joint ${pPhrase(numbers['p'] ?? NaN)} over ${n('lags', 3)} lags).`,
      );
    case 'notWhite':
      return plain(
        `Memory is left in the innovations (joint ${pPhrase(numbers['p'] ?? NaN)}; loudest up to lag ${n('lag', 4)}). Standard errors are provisional until it is modelled.`,
        'Try one more AR or MA coefficient, or a season.',
      );
    case 'warning': {
      const [code, ...rest] = about;
      const words = warningText({ code: code as WarningCode, numbers, about: rest });
      return plain(words.says, words.tryNext);
    }
    case 'noWaldNumbers': {
      const words = warningText({ code: 'covarianceUnavailable', numbers, about });
      return plain(words.says, words.tryNext);
    }
    case 'largeInnovations':
      return plain(
        `${counted(numbers['count'] ?? 0, 'innovation')} beyond ±${n('limit', 3)} standard deviations, the largest ${n('largest', 3)} at ${timeAt(axis, numbers['index'] ?? 0)}: independent normal readings would seldom give that.`,
        'Look at that reading: a spike there hides misfit and widens every limit.',
      );
    case 'needlessCoefficient':
      return plain(
        `${coefficientName(about[0] ?? '')} = ${n('estimate')} ± ${n('standardError', 2)} may be 0 (${pPhrase(numbers['p'] ?? NaN)}).`,
        'Try the candidate without it.',
      );
    case 'fewReadings':
      return plain(
        numbers['parameters'] === undefined
          ? `${n('readings', 9)} readings are too few to say whether memory is left.`
          : warningText({ code: 'fewReadings', numbers }).says,
        'Choose lower orders, or bring a longer record.',
      );
  }
}

/** The standing in a sentence. */
export function standingSentence(standing: 'sound' | 'doubtful' | 'unsound'): string {
  return {
    sound: 'Sound: nothing found speaks against it.',
    doubtful: 'Doubtful: usable only with the doubts below in mind.',
    unsound: 'Unsound: do not rely on its numbers.',
  }[standing];
}
