import * as v from 'valibot';

/*
 * The one door for sessions from outside: a link, a file, the browser's own store. Everything is checked here and nowhere
 * else; what passes is a complete Envelope of the contract.
 */

const count = v.pipe(v.number(), v.integer(), v.minValue(0), v.maxValue(10_000_000));
const finite = v.pipe(v.number(), v.finite());
const text = (most: number) => v.pipe(v.string(), v.maxLength(most));
const hash = v.pipe(v.string(), v.regex(/^[0-9a-f]{32}$/));
const span = v.pipe(
  v.object({ from: count, to: count }),
  v.check(({ from, to }) => from < to, 'a stretch ends after it begins'),
);
const words = v.pipe(v.array(text(100)), v.maxLength(100));
const nullableColumn = v.nullable(count);

const dialect = v.object({
  encoding: v.picklist(['utf-8', 'utf-16le', 'utf-16be', 'windows-1252']),
  delimiter: v.picklist([',', ';', '\t', '|', ' ']),
  quote: v.nullable(v.picklist(['"', "'"])),
  decimal: v.picklist(['.', ',']),
  thousands: v.nullable(v.picklist([',', '.', ' ', "'"])),
  preambleLines: count,
  header: v.boolean(),
  unitsRow: v.boolean(),
  layout: v.picklist(['wide', 'long']),
  tagColumn: nullableColumn,
  tag: v.nullable(text(200)),
  timeColumn: nullableColumn,
  clockColumn: nullableColumn,
  stampColumns: v.optional(v.nullable(v.pipe(v.array(count), v.minLength(2), v.maxLength(6))), null),
  stamp: v.nullable(
    v.picklist(['iso', 'yearFirst', 'dayFirst', 'monthFirst', 'epochSeconds', 'epochMilliseconds', 'number']),
  ),
  zone: v.nullable(text(80)),
  valueColumn: count,
  status: v.nullable(v.object({ column: count, keep: v.pipe(v.array(text(100)), v.maxLength(50)) })),
  gapWords: words,
  // Sessions written before these fields existed were read with none of the words, the first of repeated times, from text.
  limitWords: v.optional(words, []),
  repeats: v.optional(v.picklist(['first', 'last', 'gap']), 'first'),
  sheet: v.optional(v.nullable(text(100)), null),
  grid: v.nullable(
    v.object({
      kind: v.picklist(['seconds', 'months', 'index']),
      step: v.pipe(finite, v.gtValue(0)),
      rule: v.picklist(['nearest', 'binMean', 'last']),
      tolerance: finite,
    }),
  ),
});

const repairBase = { id: text(60), at: text(40), why: text(500) };
const repair = v.variant('kind', [
  v.object({ ...repairBase, kind: v.literal('gap'), from: count, to: count }),
  v.object({ ...repairBase, kind: v.literal('gaps'), runs: v.pipe(v.array(count), v.maxLength(1_000_000)) }),
  v.object({ ...repairBase, kind: v.literal('scale'), factor: finite, offset: finite, unit: text(60) }),
  v.object({
    ...repairBase,
    kind: v.literal('regrid'),
    step: v.pipe(finite, v.gtValue(0)),
    rule: v.picklist(['nearest', 'binMean', 'last']),
  }),
]);

const order = v.object({ p: count, d: count, q: count, P: count, D: count, Q: count, s: count });
const lags = v.pipe(v.array(count), v.maxLength(100));
const regressor = v.variant('kind', [
  v.object({ kind: v.picklist(['step', 'pulse', 'ramp']), at: count }),
  v.object({ kind: v.literal('harmonic'), period: v.pipe(finite, v.gtValue(0)), k: count }),
  v.object({ kind: v.literal('column'), id: text(200), lag: count }),
]);

/** Settings of one candidate. */
export const candidateSchema = v.object({
  order,
  level: v.picklist(['none', 'mean', 'drift']),
  transform: v.variant('kind', [
    v.object({ kind: v.literal('none') }),
    v.object({ kind: v.literal('log') }),
    v.object({ kind: v.literal('boxCox'), lambda: v.union([finite, v.literal('estimate')]) }),
  ]),
  estimator: v.picklist(['exact', 'conditional', 'yuleWalker', 'burg', 'leastSquares']),
  zeroLags: v.object({ ar: lags, ma: lags, seasonalAr: lags, seasonalMa: lags }),
  regressors: v.pipe(v.array(regressor), v.maxLength(100)),
});

const record = v.object({
  id: text(60),
  fileHash: hash,
  seriesHash: hash,
  dialect,
  repairs: v.pipe(v.array(repair), v.maxLength(2000)),
  window: span,
  holdOut: v.nullable(span),
  candidates: v.pipe(v.array(candidateSchema), v.maxLength(500)),
});

const view = v.object({
  chosen: v.nullable(count),
  sort: v.object({ column: text(40), descending: v.boolean() }),
  columns: v.pipe(v.array(text(40)), v.maxLength(40)),
  signs: v.picklist(['plus', 'minus', 'polynomial']),
  coverage: v.pipe(finite, v.gtValue(0), v.ltValue(1)),
});

/** A whole session of the present version. */
export const envelopeSchema = v.pipe(
  v.object({
    format: v.literal('lagwright-session'),
    version: count,
    records: v.pipe(v.array(record), v.maxLength(50)),
    active: text(60),
    view,
  }),
  v.check(({ records, active }) => records.some(({ id }) => id === active), 'the active record is among the records'),
);

/** What travels in a link: the session, and the readings of the active record where they are few enough. */
export const payloadSchema = v.object({
  envelope: envelopeSchema,
  inline: v.nullable(v.object({ fileName: text(300), text: text(64_000_000) })),
});
