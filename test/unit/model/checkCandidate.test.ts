import { expect, test } from 'vitest';
import type { Candidate, Order } from '../../../workers/contract/candidate.ts';
import { candidateOf } from '../../../workers/model/candidateOf.ts';
import { checkCandidate } from '../../../workers/model/checkCandidate.ts';

const order = (part: Partial<Order>): Order => ({ p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0, ...part });
const none = { ar: [], ma: [], seasonalAr: [], seasonalMa: [] };

test.each<[string, Partial<Candidate> & { order: Order }, string, string]>([
  ['half an order', { order: order({ p: 0.5 }) }, 'p', 'notAWholeNumber'],
  ['a negative order', { order: order({ q: -1 }) }, 'q', 'negative'],
  ['an order beyond reason', { order: order({ p: 999 }) }, 'p', 'tooLarge'],
  ['a season of one', { order: order({ P: 1, s: 1 }) }, 's', 'seasonTooShort'],
  ['seasonal orders without a season', { order: order({ Q: 1 }) }, 's', 'seasonMissing'],
  ['a mean that differencing annihilates', { order: order({ d: 1 }), level: 'mean' }, 'level', 'meanWithDifferencing'],
  ['a drift of nothing', { order: order({ p: 1 }), level: 'drift' }, 'level', 'driftWithoutDifferencing'],
  [
    'the highest lag held at zero',
    { order: order({ p: 2 }), zeroLags: { ...none, ar: [2] } },
    'zeroLags.ar',
    'zeroLagOutOfRange',
  ],
  [
    'a lag beyond the order',
    { order: order({ q: 2 }), zeroLags: { ...none, ma: [3] } },
    'zeroLags.ma',
    'zeroLagOutOfRange',
  ],
  [
    'a step behind the record',
    { order: order({}), regressors: [{ kind: 'step', at: 50 }] },
    'regressors.step',
    'eventOutside',
  ],
  [
    'a harmonic faster than every second reading',
    { order: order({}), regressors: [{ kind: 'harmonic', period: 6, k: 4 }] },
    'regressors.harmonic',
    'seasonTooShort',
  ],
  [
    'a power that is no number',
    { order: order({}), transform: { kind: 'boxCox', lambda: NaN } },
    'transform',
    'transform',
  ],
])('%s is refused with its field and reason', (_name, part, field, reason) => {
  expect(checkCandidate(candidateOf(part), 50)).toEqual({
    ok: false,
    failure: { code: 'badCandidate', field, reason },
  });
});

test('closed-form estimators are for pure AR', () => {
  const made = checkCandidate(candidateOf({ order: order({ p: 1, q: 1 }), estimator: 'burg' }));
  expect(made).toEqual({ ok: false, failure: { code: 'estimatorNeedsPureAr', estimator: 'burg' } });
});

test('order and level are enough; what is sound comes back unchanged', () => {
  const candidate = candidateOf({ order: order({ p: 1, d: 0, q: 1 }), level: 'mean' });
  expect(candidate).toEqual({
    order: order({ p: 1, q: 1 }),
    level: 'mean',
    transform: { kind: 'none' },
    estimator: 'exact',
    zeroLags: none,
    regressors: [],
  });
  expect(checkCandidate(candidate)).toEqual({ ok: true, value: candidate });
});
