import { expect, test } from 'vitest';
import { equationLines, estimateLines, signSentence } from '../../../src/format/equationText.ts';
import { candidateName, coefficientName, orderNotation } from '../../../src/format/notation.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { equationOf } from '../../../workers/model/equationOf.ts';
import { fitCandidate } from '../../../workers/estimation/fitCandidate.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const order = { p: 1, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 };

function fitted(part: Partial<typeof order>, level: 'none' | 'mean' | 'drift') {
  const candidate = candidateOf({ order: { ...order, ...part }, level });
  const fit = fitCandidate({ values: publishedSeries('luteinisingHormone'), candidate, seed: 1 });
  if (!fit.ok) throw new Error(JSON.stringify(fit.failure));
  return { fit: fit.value, equation: equationOf(candidate, fit.value.parameters) };
}

test('notation of orders and candidates', () => {
  expect(orderNotation({ ...order, q: 1, d: 1, Q: 1, D: 1, s: 12 })).toBe('(1,1,1)×(0,1,1)₁₂');
  expect(orderNotation(order)).toBe('(1,0,0)');
  expect(candidateName(candidateOf({ order, level: 'mean', estimator: 'burg' }))).toBe('(1,0,0), with mean, Burg');
  expect(coefficientName('φ12')).toBe('φ₁₂');
});

test('the equation names the mean and the constant, which are not the same', () => {
  // Published: φ .574, mean 2.413 (Venables & Ripley 2002, ch. 14); the constant is 2.413·(1 − .574).
  const { fit, equation } = fitted({}, 'mean');
  const [first, level] = equationLines(fit, equation, 'IU/L');
  expect(first).toBe('zₜ = 0.5739 zₜ₋₁ + 1.028 + eₜ');
  expect(level).toMatch(/^Mean 2\.41329 IU\/L; constant 1\.0282\d IU\/L/);
});

test('differenced records, MA terms and signs', () => {
  const { fit, equation } = fitted({ p: 0, d: 1, q: 1 }, 'none');
  const [first, ...rest] = equationLines(fit, equation, '');
  expect(first).toMatch(/^∇zₜ = eₜ [−+] 0?\.?\d+ eₜ₋₁$|^∇zₜ = eₜ [−+] \d\.\d+ eₜ₋₁$/);
  expect(rest.join(' ')).toContain('No level is estimated');
  const plus = estimateLines(fit, equation, 'plus', '')[0]!.value;
  const minus = estimateLines(fit, equation, 'minus', '')[0]!.value;
  expect(minus.replace('−', '')).toBe(plus.replace('−', ''));
  expect(minus.startsWith('−')).not.toBe(plus.startsWith('−'));
  expect(signSentence('minus')).toContain('1 − Σ θ');
});

test('a value is rounded to its uncertainty, σ last', () => {
  const { fit, equation } = fitted({}, 'mean');
  const lines = estimateLines(fit, equation, 'plus', 'IU/L');
  expect(lines.map(({ name }) => name)).toEqual(['φ₁', 'mean', 'constant', 'σ']);
  expect(lines[0]).toMatchObject({ value: '0.57', uncertainty: '0.12' });
  expect(lines[1]).toMatchObject({ value: '2.41', uncertainty: '0.15', unit: 'IU/L' });
});
