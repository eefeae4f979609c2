import { describe, expect, it } from 'vitest';
import { partsSentence, stepText, timingSentence, wordsOf, wordsText } from '../../../src/format/arrivalText.ts';

// The sentences are our own; expected by reading them.
const grid = { kind: 'seconds', step: 600, rule: 'nearest', tolerance: 0.25 } as const;
const still = { kind: 'seconds', jitter: 0, offGrid: 0, repeats: 0, crowded: 0, reversals: 0, offers: [] } as const;

describe('what was found is said in one sentence', () => {
  it('of regular stamps', () => {
    const timing = { ...still, intervals: [{ interval: 600, count: 9 }], count: 9, regular: 9 };
    expect(timingSentence(timing, grid)).toBe('9 of 9 intervals are 10 minutes.');
  });
  it('of stamps that are not', () => {
    const intervals = [
      { interval: 600, count: 7 },
      { interval: 1200, count: 2 },
    ];
    const timing = { ...still, intervals, count: 9, regular: 7, jitter: 0.08, repeats: 1, reversals: 2 };
    expect(timingSentence(timing, grid)).toBe(
      '7 of 9 intervals are 10 minutes; commonest 10 minutes × 7, 20 minutes × 2; jitter up to 8 % of a step, 1 repeated time, 2 steps back in time.',
    );
  });
  it('of several files', () => {
    const parts = [
      { fileName: 'a.csv', line: 1, ownLine: 1 },
      { fileName: 'b.csv', line: 40, ownLine: 3 },
    ];
    expect(partsSentence(parts)).toContain('a.csv from line 1, b.csv from line 40 (its line 3)');
  });
  it('of steps', () => {
    expect(stepText({ kind: 'months', step: 3 })).toBe('3 months');
    expect(stepText({ kind: 'index', step: 0.1 })).toBe('0.1');
  });
});

it('words typed in one line are told apart, and none stands twice', () => {
  expect(wordsOf(' n/a ;; -999; n/a;no data ')).toEqual(['n/a', '-999', 'no data']);
  expect(wordsOf(wordsText(['a b', '-']))).toEqual(['a b', '-']);
});
