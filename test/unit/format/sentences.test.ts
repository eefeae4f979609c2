import { expect, test } from 'vitest';
import { failureText } from '../../../src/format/failureText.ts';
import { standingSentence, verdictSentence } from '../../../src/format/verdictText.ts';
import { warningText } from '../../../src/format/warningText.ts';
import type { Failure } from '../../../workers/contract/failures.ts';
import type { WarningCode } from '../../../workers/contract/fit.ts';

const axis = { kind: 'seconds', start: 0, step: 600, zone: null } as const;

const failures: Failure[] = [
  { code: 'emptyFile' },
  { code: 'tooFewRows', readings: 3, needed: 8 },
  { code: 'constantColumn', column: 'flow', value: 7 },
  { code: 'badStamp', line: 12, column: 1, text: '31.02.2024', count: 1 },
  { code: 'conditionalWithGaps', gaps: 4 },
  { code: 'linkDamaged', where: 'packing' },
  { code: 'recordMismatch', fileName: 'a.csv', sameFile: false },
  { code: 'columnNotEstimable', column: 'β1', reason: 'annihilated' },
];

test.each(failures.map((failure) => [failure.code, failure] as const))(
  '%s says what and what to do',
  (_code, failure) => {
    const { what, todo } = failureText(failure);
    expect(what.length).toBeGreaterThan(10);
    expect(todo.length).toBeGreaterThan(5);
    expect(`${what} ${todo}`).not.toMatch(/undefined|NaN|–\s*readings/);
  },
);

test('the place is named', () => {
  expect(failureText({ code: 'badStamp', line: 12, column: 1, text: '31.02.2024', count: 1 }).where).toBe(
    'line 12, column 1: “31.02.2024”',
  );
});

const warnings: [WarningCode, Record<string, number>][] = [
  ['nearUnitAr', { modulus: 0.98, limit: 0.93, readings: 100 }],
  ['overDifferenced', { modulus: 0.99, before: 1.2, after: 1.9, lagOne: -0.48 }],
  ['severalMaxima', { count: 2, gap: 0.004 }],
  ['fewReadings', { readings: 20, parameters: 5, wanted: 50 }],
];

test.each(warnings)('%s has its numbers in the sentence', (code, numbers) => {
  const { says, tryNext } = warningText({ code, numbers });
  for (const value of Object.values(numbers)) expect(says).toContain(String(Math.abs(value)).slice(0, 4));
  expect(tryNext.length).toBeGreaterThan(5);
});

test('a verdict sentence dates the reading it speaks of', () => {
  const { says } = verdictSentence(
    {
      reason: 'largeInnovations',
      weight: 'doubtful',
      numbers: { count: 1, largest: 6.1, index: 6, limit: 4.2, p: 0.001 },
      panel: 'innovations',
    },
    axis,
  );
  expect(says).toContain('1970-01-01 01:00');
  expect(says).toContain('1 innovation beyond ±4.20');
  expect(standingSentence('unsound')).toMatch(/do not rely/);
});
