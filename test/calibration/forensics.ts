import type { Order } from '../../workers/contract/candidate.ts';
import type { FindingCode } from '../../workers/contract/forensics.ts';
import type { Series } from '../../workers/contract/series.ts';
import { inspectRecord } from '../../workers/forensics/inspectRecord.ts';
import { simulateRecord } from '../../workers/model/simulateRecord.ts';
import { createRandom, type Random } from '../../workers/numeric/random.ts';
import { shareRow, type Row, type Topic } from './topic.ts';

/** What is done to a clean record. Sizes are in standard deviations of the innovations (σ) or of the record (σ_X). */
type Harm =
  | { readonly kind: 'none' }
  /** A share of the readings is kept at random, the ends always; straight lines between, rounded to `step` σ where above 0. */
  | { readonly kind: 'lines'; readonly kept: number; readonly step: number }
  /** Every k-th reading is kept. */
  | { readonly kind: 'everyOther'; readonly k: number }
  | { readonly kind: 'frozen'; readonly length: number }
  | { readonly kind: 'outlier'; readonly size: number }
  | { readonly kind: 'step'; readonly size: number }
  | { readonly kind: 'variance'; readonly factor: number }
  | { readonly kind: 'sentinel' }
  | { readonly kind: 'clipped'; readonly at: number }
  | { readonly kind: 'averaged'; readonly window: number };

interface Design {
  readonly n: number;
  readonly ar: readonly number[];
  readonly ma: readonly number[];
  /** Smallest step in innovation standard deviations, 0 for unrounded readings. */
  readonly lsb: number;
  readonly harm: Harm;
}

type Outcome = readonly FindingCode[];

const lengths = [200, 1000, 10_000];
const clean: Pick<Design, 'ar' | 'ma' | 'lsb'>[] = [
  ...[0, 0.5, 0.8, 0.95].flatMap((phi) =>
    [0, 0.1, 0.5, 1, 2].map((lsb) => ({ ar: phi === 0 ? [] : [phi], ma: [], lsb })),
  ),
  ...[0, 1, 2].map((lsb) => ({ ar: [0.8], ma: [0.4], lsb })),
  ...[0, 1].map((lsb) => ({ ar: [0.9], ma: [-0.5], lsb })),
  ...[0, 1].map((lsb) => ({ ar: [1.3, -0.6], ma: [], lsb })),
  ...[0, 1].map((lsb) => ({ ar: [], ma: [0.8], lsb })),
  { ar: [], ma: [-0.9], lsb: 0 },
];
const plain = { ar: [0.7], ma: [], lsb: 0 };
const harms: Pick<Design, 'ar' | 'ma' | 'lsb' | 'harm'>[] = [
  ...[0.14, 0.3, 0.54].flatMap((kept) =>
    [0, 0.05].map((step) => ({ ...plain, harm: { kind: 'lines' as const, kept, step } })),
  ),
  { ...plain, harm: { kind: 'everyOther', k: 5 } },
  { ...plain, harm: { kind: 'frozen', length: 12 } },
  { ...plain, lsb: 0.25, harm: { kind: 'frozen', length: 12 } },
  { ...plain, harm: { kind: 'outlier', size: 8 } },
  { ...plain, lsb: 0.5, harm: { kind: 'outlier', size: 8 } },
  { ...plain, harm: { kind: 'step', size: 3 } },
  { ...plain, harm: { kind: 'variance', factor: 4 } },
  { ...plain, harm: { kind: 'sentinel' } },
  { ...plain, harm: { kind: 'clipped', at: 1.3 } },
  { ...plain, harm: { kind: 'averaged', window: 5 } },
  { ...plain, lsb: 1, harm: { kind: 'none' } },
  { ...plain, lsb: 2, harm: { kind: 'none' } },
];

/** The item that a harm should be reported as. */
function expectedOf({ harm, lsb }: Design): FindingCode | null {
  const codes = {
    lines: 'interpolated',
    everyOther: 'interpolated',
    frozen: 'frozen',
    outlier: 'outlier',
    step: 'levelStep',
    variance: 'varianceChange',
    sentinel: 'sentinel',
    clipped: 'clipped',
    averaged: 'averaged',
  } as const;
  if (harm.kind !== 'none') return codes[harm.kind];
  return lsb > 0.5 ? 'quantised' : null;
}

/** Coarse rounding is true of a record rounded that coarsely, and may be reported from half an innovation on. */
function isFalse(code: FindingCode, design: Design): boolean {
  return code !== expectedOf(design) && !(code === 'quantised' && design.lsb >= 0.5);
}

function described({ n, ar, ma, lsb, harm }: Design): string {
  const model = `AR(${ar.join(', ')})${ma.length > 0 ? ` MA(${ma.join(', ')})` : ''}`;
  const rounded = lsb > 0 ? `, rounded to ${lsb} σ` : '';
  const { kind, ...rest } = harm;
  const what = kind === 'none' ? '' : `, ${kind} ${Object.values(rest).join(' ')}`;
  return `n ${n}, ${model}${rounded}${what}`;
}

/** A record as a logger would have left it. */
export function harmedRecord(design: Design, random: Random): Float64Array {
  const { n, ar, ma, lsb, harm } = design;
  const order: Order = { p: ar.length, d: 0, q: ma.length, P: 0, D: 0, Q: 0, s: 0 };
  const at = {
    ar: [...ar],
    ma: [...ma],
    seasonalAr: [],
    seasonalMa: [],
    mean: 40,
    regression: [],
    innovationVariance: 1,
  };
  const extra = harm.kind === 'averaged' ? harm.window - 1 : 0;
  let values = simulateRecord({ order, at, length: n + extra, random });
  const deviation = Math.sqrt(values.reduce((sum, value) => sum + (value - 40) ** 2, 0) / values.length);
  const place = Math.floor(n * (0.2 + 0.6 * random.uniform()));
  if (harm.kind === 'variance')
    values = values.map((value, t) => (t >= n / 2 ? 40 + (value - 40) * Math.sqrt(harm.factor) : value));
  if (harm.kind === 'step') values = values.map((value, t) => (t >= place ? value + harm.size * deviation : value));
  if (harm.kind === 'outlier') values[place]! += random.uniform() < 0.5 ? -harm.size : harm.size;
  if (harm.kind === 'clipped') values = values.map((value) => Math.min(value, 40 + harm.at * deviation));
  if (harm.kind === 'averaged')
    values = Float64Array.from(
      { length: n },
      (_, t) => values.subarray(t, t + harm.window).reduce((sum, value) => sum + value, 0) / harm.window,
    );
  if (lsb > 0) values = values.map((value) => Math.round(value / lsb) * lsb);
  if (harm.kind === 'frozen') values.fill(values[place]!, place, place + harm.length);
  if (harm.kind === 'sentinel') for (let i = 0; i < 3; i++) values[random.integer(n)] = -999;
  if (harm.kind === 'lines' || harm.kind === 'everyOther') {
    const isKept = (t: number) =>
      t === 0 || t === n - 1 || (harm.kind === 'lines' ? random.uniform() < harm.kept : t % harm.k === 0);
    const step = harm.kind === 'lines' ? harm.step : 0;
    drawLines(values, isKept);
    if (step > 0) values = values.map((value) => Math.round(value / step) * step);
  }
  return values;
}

function drawLines(values: Float64Array, isKept: (t: number) => boolean): void {
  let before = 0;
  for (let t = 1; t < values.length; t++) {
    if (!isKept(t)) continue;
    for (let k = before + 1; k < t; k++)
      values[k] = values[before]! + ((values[t]! - values[before]!) * (k - before)) / (t - before);
    before = t;
  }
}

function seriesOf(values: Float64Array): Series {
  return { values, axis: { kind: 'index', start: 1, step: 1, zone: null }, unit: '', hash: '' };
}

const items: readonly FindingCode[] = [
  'sentinel',
  'clipped',
  'frozen',
  'interpolated',
  'quantised',
  'outlier',
  'levelStep',
  'varianceChange',
  'averaged',
];

/**
 * Forensic items: hits on harmed records and false alarms on clean ones. Goals: any false alarm on under 2 % of clean records of a
 * length; straight lines with at most 54 % of the readings kept are found in over 95 %.
 */
export const topic: Topic<Design, Outcome> = {
  name: 'forensics',
  replicates: 500,
  designs: lengths.flatMap((n) => [
    ...clean.map((one): Design => ({ ...one, n, harm: { kind: 'none' } })),
    ...harms.map((one): Design => ({ ...one, n })),
  ]),
  describe: described,
  run(design, seed) {
    const report = inspectRecord(seriesOf(harmedRecord(design, createRandom(seed))));
    if (!report.ok) throw new Error(report.failure.code);
    return report.value.findings.map(({ code }) => code);
  },
  rows(design, outcomes): Row[] {
    const name = described(design);
    const expected = expectedOf(design);
    const share = (holds: (codes: Outcome) => boolean) => outcomes.filter(holds).length;
    const any = share((codes) => codes.some((code) => isFalse(code, design)));
    const lines = design.harm.kind === 'lines' || design.harm.kind === 'everyOther';
    const rows: Row[] = [];
    if (expected !== null)
      rows.push(
        shareRow(
          `${expected}: found`,
          name,
          lines ? [0.95, 1] : null,
          share((codes) => codes.includes(expected)),
          outcomes.length,
        ),
      );
    if (design.harm.kind === 'none') {
      rows.push(shareRow('any false alarm', name, [0, 0.02], any, outcomes.length));
      for (const item of items) {
        const count = share((codes) => codes.includes(item));
        if (count > 0 && isFalse(item, design))
          rows.push(shareRow(`${item}: false alarm`, name, null, count, outcomes.length));
      }
    }
    return rows;
  },
};
