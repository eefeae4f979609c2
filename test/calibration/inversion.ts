import type { Parameters } from '../../workers/contract/candidate.ts';
import { fitCandidate } from '../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { simulateRecord } from '../../workers/model/simulateRecord.ts';
import { createRandom } from '../../workers/numeric/random.ts';
import { testValue } from '../../workers/uncertainty/testInversion.ts';
import { shareRow, type Topic } from './topic.ts';

interface Design {
  readonly ar: number;
  readonly ma: number;
  readonly n: number;
  readonly about: 'φ1' | 'mean';
}

const candidate = candidateOf({ order: { p: 1, d: 0, q: 1, P: 0, D: 0, Q: 0, s: 0 }, level: 'mean' });
const pairs = [
  [0.5, 0.3],
  [0.9, -0.4],
  [0.95, 0.3],
] as const;

/** Coverage of intervals by test inversion: how often the simulated test keeps the true value, at 5 %. */
export const topic: Topic<Design, boolean | null> = {
  name: 'inversion',
  replicates: 1000,
  designs: pairs.flatMap(([ar, ma]) =>
    [50, 200].flatMap((n) => (['φ1', 'mean'] as const).map((about) => ({ ar, ma, n, about }))),
  ),
  describe: ({ ar, ma, n, about }) => `(${ar}, ${ma}) n=${n} ${about}`,
  run: ({ ar, ma, n, about }, seed) => {
    const at: Parameters = {
      ar: [ar],
      ma: [ma],
      seasonalAr: [],
      seasonalMa: [],
      mean: 0,
      regression: [],
      innovationVariance: 1,
    };
    const values = simulateRecord({ order: candidate.order, at, length: n, random: createRandom(seed) });
    const fitted = fitCandidate({ values, candidate, seed: 1 });
    if (!fitted.ok) return null;
    const tested = testValue({ fit: fitted.value, values, about, seed, replicates: 199 }, about === 'φ1' ? ar : 0);
    return tested.ok ? tested.value.p > 0.05 : null;
  },
  rows: (design, outcomes) => {
    const given = outcomes.filter((kept) => kept !== null);
    const name = topic.describe(design);
    return [
      shareRow('true value kept', name, [0.93, 0.985], given.filter(Boolean).length, given.length),
      shareRow('no test', name, null, outcomes.length - given.length, outcomes.length),
    ];
  },
};
