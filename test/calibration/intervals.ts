import type { Parameters } from '../../workers/contract/candidate.ts';
import type { Interval } from '../../workers/contract/uncertainty.ts';
import { fitCandidate } from '../../workers/estimation/fitCandidate.ts';
import { prepareLikelihood } from '../../workers/estimation/prepareLikelihood.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { simulateRecord } from '../../workers/model/simulateRecord.ts';
import { createRandom } from '../../workers/numeric/random.ts';
import { integratedIntervals } from '../../workers/uncertainty/integratedIntervals.ts';
import { shareRow, type Row, type Topic } from './topic.ts';

interface Design {
  readonly ar: number;
  readonly ma: number;
  readonly n: number;
  /** Designs of the grid have goals; the others are reported. */
  readonly grid: boolean;
}

/** Of one simulated record; null: no interval was given. */
interface Outcome {
  readonly fitted: boolean;
  /** Whether each interval held the truth: mean, φ, θ, σ. */
  readonly integrated: readonly boolean[] | null;
  readonly wald: readonly boolean[] | null;
  /** Length of the mean's interval over that with known parameters. */
  readonly ratio: number;
}

const NAMES = ['mean', 'φ', 'θ', 'σ'] as const;
const GOALS: readonly Row['goal'][] = [
  [0.94, 0.985],
  [0.94, 0.995],
  [0.93, 0.985],
  [0.93, 0.985],
];
const COVERAGE = 0.95;
const NORMAL = 1.959963984540054;
const LENGTHS = [50, 100, 200, 500];

const candidate = candidateOf({ order: { p: 1, d: 0, q: 1, P: 0, D: 0, Q: 0, s: 0 }, level: 'mean' });

function designs(pairs: readonly (readonly [number, number])[], grid: boolean): Design[] {
  return pairs.flatMap(([ar, ma]) => LENGTHS.map((n) => ({ ar, ma, n, grid })));
}

/** Coverage of the intervals of ARMA(1,1) with estimated mean over repeated normal records, mean 0 and σ = 1. */
export const topic: Topic<Design, Outcome> = {
  name: 'intervals',
  replicates: 10_000,
  designs: [
    ...designs(
      [
        [0.5, 0.3],
        [0.9, -0.4],
        [0.95, 0.3],
      ],
      true,
    ),
    ...designs(
      [
        [0, 0],
        [0.5, -0.5],
        [0.9, -0.8],
        [0.98, 0.3],
      ],
      false,
    ),
  ],
  share: ({ grid }) => (grid ? 1 : 0.1),
  describe: ({ ar, ma, n }) => `(${ar}, ${ma}) n=${n}`,
  run: ({ ar, ma, n }, seed) => {
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
    if (!fitted.ok) return { fitted: false, integrated: null, wald: null, ratio: NaN };
    const fit = fitted.value;
    const truth = [0, ar, ma, 1];
    const found = integratedIntervals({ fit, values, coverage: COVERAGE, seed: 1 });
    const holds = ({ lower, upper }: Pick<Interval, 'lower' | 'upper'>, i: number) =>
      lower <= truth[i]! && truth[i]! <= upper;
    const order = (list: readonly Interval[], sigma: Interval) => [list[2]!, list[0]!, list[1]!, sigma];
    const own = found.ok ? order(found.value.coefficients, found.value.sigma) : null;
    const { standardErrors, parameters } = fit;
    const sigma = Math.sqrt(parameters.innovationVariance);
    const centres = [parameters.mean, parameters.ar[0]!, parameters.ma[0]!, sigma];
    const errors = standardErrors && [
      standardErrors[2]!,
      standardErrors[0]!,
      standardErrors[1]!,
      sigma / Math.sqrt(2 * n),
    ];
    return {
      fitted: true,
      integrated: own && own.map(holds),
      wald:
        errors && centres.map((c, i) => holds({ lower: c - NORMAL * errors[i]!, upper: c + NORMAL * errors[i]! }, i)),
      ratio: own === null ? NaN : (own[0]!.upper - own[0]!.lower) / (2 * NORMAL * knownError(values, at)),
    };
  },
  rows: (design, outcomes) => {
    const name = topic.describe(design);
    const given = outcomes.filter(({ integrated }) => integrated !== null);
    const wald = outcomes.filter((outcome) => outcome.wald !== null);
    const count = (list: readonly Outcome[], which: 'integrated' | 'wald', i: number) =>
      list.filter((outcome) => outcome[which]![i]!).length;
    return [
      ...NAMES.flatMap((what, i) => [
        shareRow(
          `${what}: integrated, where given`,
          name,
          design.grid ? GOALS[i]! : null,
          count(given, 'integrated', i),
          given.length,
        ),
        shareRow(`${what}: integrated, refusals as misses`, name, null, count(given, 'integrated', i), outcomes.length),
        shareRow(`${what}: ± 1.96 standard errors, where given`, name, null, count(wald, 'wald', i), wald.length),
      ]),
      shareRow('integrated refused', name, null, outcomes.length - given.length, outcomes.length),
      shareRow('± standard errors refused', name, null, outcomes.length - wald.length, outcomes.length),
      medianRow(
        'mean: median length over known parameters',
        name,
        design.grid ? [0, 2.5] : null,
        given.map(({ ratio }) => ratio),
      ),
    ];
  },
};

/** Standard error of the mean by generalised least squares with every parameter known. */
function knownError(values: Float64Array, at: Parameters): number {
  const prepared = prepareLikelihood({ values, candidate });
  if (!prepared.ok) throw new Error(prepared.failure.code);
  const { betaInformation, innovationVariance } = prepared.value.concentrated(at);
  return Math.sqrt(at.innovationVariance / (betaInformation[0]! * innovationVariance));
}

function medianRow(name: string, design: string, goal: Row['goal'], values: readonly number[]): Row {
  const sorted = values.toSorted((a, b) => a - b);
  const at = (p: number) => sorted[Math.round(p * (sorted.length - 1))] ?? NaN;
  // Standard error of a median from the quartiles, as for a normal sample.
  return {
    name,
    design,
    goal,
    observed: at(0.5),
    standardError: (1.2533 * (at(0.75) - at(0.25))) / 1.349 / Math.sqrt(sorted.length),
  };
}
