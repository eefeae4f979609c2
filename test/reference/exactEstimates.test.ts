import { describe, expect, it } from 'vitest';
import type { Candidate, Level, Order } from '../../workers/contract/candidate.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import { fitCandidate } from '../../workers/estimation/fitCandidate.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { publishedSeries, type PublishedName } from '../helpers/publishedSeries.ts';

/**
 * Exact maximum likelihood to 11 digits: an independent dense Gaussian likelihood in 34-digit arithmetic, maximised by
 * Newton steps; standard errors from its observed information (SOURCES.md). Published values that agree with them:
 * luteinising hormone in Venables & Ripley 2002, chapter 14; Nile in Durbin & Koopman, chapter 2; log airline in the
 * NIST/SEMATECH e-Handbook 6.4.4.10; colour in Cryer & Chan, chapter 7; overshorts in Brockwell & Davis, table 6.2.
 */
interface Case {
  readonly name: string;
  readonly series: PublishedName;
  readonly order: Partial<Order>;
  readonly level: Level;
  readonly prepare?: (values: Float64Array) => Float64Array;
  readonly transform?: Candidate['transform'];
  readonly coefficients: readonly number[];
  readonly mean?: number;
  readonly variance: number;
  readonly logLikelihood: number;
  readonly errors: readonly number[];
  readonly criteria: readonly [aic: number, aicc: number, bic: number, hq: number];
}

const differences = (values: Float64Array) => values.slice(1).map((value, i) => value - values[i]!);
const logs = (values: Float64Array) => values.map(Math.log);

const CASES: readonly Case[] = [
  {
    name: 'Lake Huron AR(1)',
    series: 'lakeHuron',
    order: { p: 1 },
    level: 'mean',
    coefficients: [0.837556601503],
    mean: 579.115084383,
    variance: 0.509286365518,
    logLikelihood: -106.597974697,
    errors: [0.05386067, 0.4239929],
    criteria: [219.1959494, 219.4512685, 226.9508518, 222.3326475],
  },
  {
    name: 'Lake Huron AR(2)',
    series: 'lakeHuron',
    order: { p: 2 },
    level: 'mean',
    coefficients: [1.04361876584, -0.249502382086],
    mean: 579.047256665,
    variance: 0.478820571607,
    logLikelihood: -103.633222534,
    errors: [0.09828806, 0.1007669, 0.331874],
    criteria: [215.2664451, 215.6965526, 225.606315, 219.4487092],
  },
  {
    name: 'Lake Huron ARMA(1,1)',
    series: 'lakeHuron',
    order: { p: 1, q: 1 },
    level: 'mean',
    coefficients: [0.744898580753, 0.320589394392],
    mean: 579.05545074,
    variance: 0.474939849413,
    logLikelihood: -103.245260626,
    errors: [0.07770864, 0.1135296, 0.3500976],
    criteria: [214.4905213, 214.9206288, 224.8303912, 218.6727854],
  },
  {
    name: 'luteinising hormone AR(1)',
    series: 'luteinisingHormone',
    order: { p: 1 },
    level: 'mean',
    coefficients: [0.573924388379],
    mean: 2.41328560775,
    variance: 0.19748955163,
    logLikelihood: -29.3791623863,
    errors: [0.1162056, 0.1466116],
    criteria: [64.75832477, 65.30377932, 70.37192781, 66.87971356],
  },
  {
    name: 'luteinising hormone AR(3)',
    series: 'luteinisingHormone',
    order: { p: 3 },
    level: 'mean',
    coefficients: [0.644801330687, -0.0633820180429, -0.219796359886],
    mean: 2.39311936511,
    variance: 0.178660320701,
    logLikelihood: -27.0924110595,
    errors: [0.1393997, 0.1667266, 0.1420786, 0.09626041],
    criteria: [64.18482212, 65.61339355, 73.54082717, 67.7204701],
  },
  {
    name: 'Series A (0,1,1)',
    series: 'seriesA',
    order: { d: 1, q: 1 },
    level: 'none',
    coefficients: [-0.69938426578],
    variance: 0.100731487588,
    logLikelihood: -53.5086903194,
    errors: [0.06451058],
    criteria: [111.0173806, 111.0795568, 117.57361, 113.6716565],
  },
  {
    name: 'Series F AR(2)',
    series: 'seriesF',
    order: { p: 2 },
    level: 'mean',
    coefficients: [-0.340707244799, 0.187336903572],
    mean: 51.2262958122,
    variance: 112.716266562,
    logLikelihood: -264.828656243,
    errors: [0.1217836, 0.1223339, 1.100756],
    criteria: [537.6573125, 538.2726971, 546.6512935, 541.2298314],
  },
  {
    name: 'overshorts MA(1), the higher of two maxima',
    series: 'overshorts',
    order: { q: 1 },
    level: 'mean',
    coefficients: [-0.847272422724],
    mean: -4.77980623605,
    variance: 2020.04441287,
    logLikelihood: -298.422122177,
    errors: [0.1205123, 1.02663],
    criteria: [602.8442444, 603.2970745, 608.9733982, 605.2262424],
  },
  {
    name: 'colour AR(1)',
    series: 'colour',
    order: { p: 1 },
    level: 'mean',
    coefficients: [0.570546056069],
    mean: 74.3292996546,
    variance: 24.8340690628,
    logLikelihood: -106.073545469,
    errors: [0.1435383, 1.915082],
    criteria: [218.1470909, 218.9212845, 222.8131351, 219.7578087],
  },
  {
    name: 'Nile (0,1,1)',
    series: 'nile',
    order: { d: 1, q: 1 },
    level: 'none',
    coefficients: [-0.732942513454],
    variance: 20599.8670386,
    logLikelihood: -632.545625103,
    errors: [0.1143227],
    criteria: [1269.09125, 1269.21625, 1274.28149, 1271.19123],
  },
  {
    name: 'log airline (0,1,1)×(0,1,1)₁₂',
    series: 'airline',
    order: { d: 1, q: 1, D: 1, Q: 1, s: 12 },
    level: 'none',
    prepare: logs,
    coefficients: [-0.401823128721, -0.556936502416],
    variance: 0.0013480989945,
    logLikelihood: 244.696486833,
    errors: [0.08964465, 0.0731051],
    criteria: [-483.3929737, -483.2039973, -474.7673817, -479.8880102],
  },
  {
    name: 'Dow Jones differences AR(1)',
    series: 'dowJones',
    order: { p: 1 },
    level: 'mean',
    prepare: differences,
    coefficients: [0.447818429115],
    mean: 0.120357939041,
    variance: 0.145453124437,
    logLikelihood: -35.1459728836,
    errors: [0.1051989, 0.07809087],
    criteria: [76.29194577, 76.62071289, 83.32336203, 79.1044505],
  },
  {
    name: 'luteinising hormone ARMA(1,1)',
    series: 'luteinisingHormone',
    order: { p: 1, q: 1 },
    level: 'mean',
    coefficients: [0.452200156248, 0.198169175431],
    mean: 2.41007665725,
    variance: 0.192312136152,
    logLikelihood: -28.7620331972,
    errors: [0.1769373, 0.1705204, 0.1357509],
    criteria: [65.52406639, 66.45429895, 73.00887044, 68.35258478],
  },
];

/** Equal to about the last digit printed: `digits` significant ones, one unit of the last allowed. */
function expectDigits(actual: number | null | undefined, printed: number, digits: number): void {
  expect(actual).toBeTypeOf('number');
  expect(Math.abs(actual! - printed) / Math.abs(printed)).toBeLessThan(1.01 * 10 ** (1 - digits));
}

const allCoefficients = ({ parameters }: Fit) => [
  ...parameters.ar,
  ...parameters.ma,
  ...parameters.seasonalAr,
  ...parameters.seasonalMa,
];

describe.each(CASES)('$name', (given) => {
  const raw = publishedSeries(given.series);
  const values = given.prepare?.(raw) ?? raw;
  const order = { p: 0, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0, ...given.order };
  const fitted = (effort: 'first' | 'thorough') => {
    const result = fitCandidate({ values, candidate: candidateOf({ order, level: given.level }), seed: 1, effort });
    if (!result.ok) throw new Error(JSON.stringify(result.failure));
    return result.value;
  };

  it.each(['first', 'thorough'] as const)('is reproduced by the %s search', (effort) => {
    const fit = fitted(effort);
    const estimates = allCoefficients(fit);
    expect(estimates).toHaveLength(given.coefficients.length);
    given.coefficients.forEach((value, i) => expectDigits(estimates[i], value, 10));
    if (given.mean !== undefined) expectDigits(fit.parameters.mean, given.mean, 11);
    expectDigits(fit.parameters.innovationVariance, given.variance, 10);
    expectDigits(fit.logLikelihood, given.logLikelihood, 11);
    given.errors.forEach((value, i) => expectDigits(fit.standardErrors?.[i], value, 6));
    const { aic, aicc, bic, hq } = fit.criteria;
    [aic, aicc, bic, hq].forEach((value, i) => expectDigits(value, given.criteria[i]!, 10));
  });
});
