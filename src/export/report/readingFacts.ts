import type { Dialect } from '../../../workers/contract/dialect.ts';
import { delimiterName, stampName } from '../../format/dialectText.ts';

/** How the file was read, in a few rows. */
export function readingFacts(dialect: Dialect): (readonly [string, string])[] {
  const { delimiter, decimal, timeColumn, stamp, valueColumn, encoding, preambleLines } = dialect;
  const time =
    timeColumn === null ? 'none' : `column ${timeColumn + 1}${stamp === null ? '' : `, ${stampName(stamp)}`}`;
  return [
    [
      'Read as',
      `${encoding}, columns parted by ${delimiterName(delimiter)}, decimal ${decimal === ',' ? 'comma' : 'point'}${preambleLines > 0 ? `, ${preambleLines} lines before the table` : ''}`,
    ],
    ['Time', time],
    ['Readings from', `column ${valueColumn + 1}`],
  ];
}
