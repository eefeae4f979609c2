import { beforeEach, describe, expect, test } from 'vitest';
import type { CoreClient } from '../../../src/workerClient/clients.ts';
import { createActions } from '../../../src/state/actions/createActions.ts';
import { envelopeOf } from '../../../src/state/envelopes.ts';
import { initialState } from '../../../src/state/initialState.ts';
import type { Platform } from '../../../src/state/actions/platform.ts';
import { activeRows, progressCounts, sortedRows } from '../../../src/state/selectors.ts';
import { plainCandidate, plausibleSeason, startingCandidates } from '../../../src/state/startingCandidates.ts';
import { createStore, type Store } from '../../../src/state/store.ts';
import { modellingApi } from '../../../workers/entry/modellingApi.ts';
import { joinFiles } from '../../../workers/reading/files/joinFiles.ts';
import { readRecord } from '../../../workers/reading/readRecord.ts';
import { readWorkbook } from '../../../workers/reading/workbook/readWorkbook.ts';
import type { Fit } from '../../../workers/contract/fit.ts';
import type { Result } from '../../../workers/contract/result.ts';
import { publishedSeries } from '../../helpers/publishedSeries.ts';

const csv = (values: ArrayLike<number>) =>
  ['time,level', ...Array.from(values, (value, t) => `${1875 + t}-01-01,${value}`)].join('\n');

/** The core on this thread, a macrotask later, as a worker would answer. */
function directClient(hold: { fits: (() => void)[] | null }): CoreClient {
  const later = async <T>(make: () => T): Promise<T> => {
    await new Promise<void>((resolve) => {
      if (hold.fits === null) setTimeout(resolve, 0);
      else hold.fits.push(resolve);
    });
    return make();
  };
  return {
    fit: (_key, request) => later<Result<Fit>>(() => modellingApi.fit(request)),
    diagnose: (_key, request) => Promise.resolve(modellingApi.diagnose(request)),
    predict: (_key, request) => Promise.resolve(modellingApi.predict(request)),
    shape: (_key, request) => Promise.resolve(modellingApi.shape(request)),
    compare: (_key, fits) => Promise.resolve(modellingApi.compare(fits)),
    inspect: (series, notes) => Promise.resolve(modellingApi.inspect(series, notes)),
    repair: (raw, repairs, columns) => Promise.resolve(modellingApi.repair(raw, repairs, columns)),
    workers: 1,
    planSweep: (_key, range, like, workers) => Promise.resolve(modellingApi.planSweep(range, like, workers)),
    sweep: (_key, request, report) => Promise.resolve(modellingApi.sweep(request, report)),
    rankSweep: (_key, fits) => Promise.resolve(modellingApi.rankSweep(fits)),
    intervals: (_key, request) => Promise.resolve(modellingApi.intervals(request)),
    invert: (_key, request, progress) => Promise.resolve(modellingApi.invert(request, progress)),
    read: (request) => Promise.resolve(readRecord(request)),
    join: (request) => Promise.resolve(joinFiles(request)),
    workbook: (request) => readWorkbook(request),
    abort: () => undefined,
    abortReading: () => undefined,
    abortAll: () => undefined,
    pending: () => 0,
  };
}

const copied: string[] = [];
const platform: Platform = {
  pageAddress: () => 'http://localhost/',
  copy: (text) => {
    copied.push(text);
    return Promise.resolve(true);
  },
  download: () => undefined,
  exampleByName: () => Promise.resolve(null),
  exampleByHash: () => Promise.resolve(null),
};

const until = async (store: Store, holds: () => boolean) => {
  for (let i = 0; i < 600 && !holds(); i += 1) await new Promise((resolve) => setTimeout(resolve, 5));
  if (!holds()) throw new Error(`never came about: ${JSON.stringify(store.get().notices)}`);
};

let store: Store;
let app: ReturnType<typeof createActions>;
const hold: { fits: (() => void)[] | null } = { fits: null };
const allDone = () =>
  activeRows(store.get()).length > 0 && progressCounts(activeRows(store.get())).done === activeRows(store.get()).length;

beforeEach(async () => {
  hold.fits = null;
  store = createStore({ ...initialState, opening: false });
  app = createActions(store, directClient(hold), platform);
  await app.actions.openText(csv(publishedSeries('lakeHuron')), 'lake.csv');
  app.actions.acceptArrival();
  await until(store, allDone);
});

describe('a record and its candidates', () => {
  test('three starting candidates are fitted and the best of the largest group is chosen', async () => {
    await until(store, () => store.get().view.chosen !== null);
    const rows = activeRows(store.get());
    expect(rows).toHaveLength(3);
    const chosen = rows[store.get().view.chosen!]!;
    expect(chosen.candidate.order).toMatchObject({ p: 1, q: 1 });
    // Brockwell & Davis, Introduction to Time Series and Forecasting, example 5.2.5: AICC 212.77 with the mean removed; ln L −103.245 with it estimated.
    expect(chosen.progress.kind === 'fitted' && chosen.progress.fit.logLikelihood).toBeCloseTo(-103.24526, 4);
  });

  test('a change refits its row only and keeps the old result in grey until the new one is there', async () => {
    const [first, second] = activeRows(store.get());
    hold.fits = [];
    app.actions.changeCandidate(first!.id, { level: 'none' });
    const [changed, other] = activeRows(store.get());
    expect(changed!.grey?.fit.candidate.level).toBe('mean');
    expect(other).toBe(second);
    const release = hold.fits;
    hold.fits = null;
    release.forEach((go) => go());
    await until(store, allDone);
    expect(activeRows(store.get())[0]!.grey).toBeNull();
  });

  test('a late answer for settings that have changed since is dropped', async () => {
    const [first] = activeRows(store.get());
    hold.fits = [];
    app.actions.changeCandidate(first!.id, { level: 'none' });
    app.actions.changeCandidate(first!.id, { order: { ...first!.candidate.order, p: 3 } });
    const [late, right] = hold.fits;
    hold.fits = null;
    right!();
    await until(store, allDone);
    late!();
    await new Promise((resolve) => setTimeout(resolve, 50));
    const { progress } = activeRows(store.get())[0]!;
    expect(progress.kind === 'fitted' && progress.fit.candidate.order.p).toBe(3);
  });

  test('undo and redo cover candidates, not the view', async () => {
    const [first] = activeRows(store.get());
    app.actions.removeCandidate(first!.id);
    app.actions.changeView({ signs: 'minus' });
    expect(activeRows(store.get())).toHaveLength(2);
    app.actions.undo();
    expect(activeRows(store.get())).toHaveLength(3);
    expect(store.get().view.signs).toBe('minus');
    app.actions.redo();
    expect(activeRows(store.get())).toHaveLength(2);
    await until(store, allDone);
  });

  test('the same candidate twice is refused in words; an illegal one fails with the reason', async () => {
    app.actions.addCandidate(activeRows(store.get())[0]!.candidate);
    expect(activeRows(store.get())).toHaveLength(3);
    expect(store.get().notices.at(-1)?.text).toMatch(/already in the table/);
    app.actions.addCandidate(plainCandidate({ p: 2, P: 1 }, 'mean'));
    await until(store, () => progressCounts(activeRows(store.get())).failed === 1);
    const { progress } = activeRows(store.get())[3]!;
    expect(progress.kind === 'failed' && progress.failure).toMatchObject({
      code: 'badCandidate',
      reason: 'seasonMissing',
    });
  });

  test('rows sort by any column, those without a value last', () => {
    const rows = activeRows(store.get());
    const by = (column: string, descending: boolean) =>
      sortedRows(rows, { column, descending }, store.get().comparison).map(({ row }) =>
        row.progress.kind === 'fitted' ? row.progress.fit.logLikelihood : NaN,
      );
    const up = by('lnL', false);
    expect([...up].sort((a, b) => a - b)).toEqual(up);
    expect(by('lnL', true)).toEqual([...up].reverse());
  });
});

describe('repairs', () => {
  const numbers = () =>
    activeRows(store.get()).map(({ progress }) => (progress.kind === 'fitted' ? progress.fit.logLikelihood : null));
  const record = () => store.get().records[0]!;
  const source = () => {
    const { source: own } = record();
    if (own.kind !== 'loaded') throw new Error('no readings');
    return own;
  };

  test('the report is made on arrival and again for the repaired record; fits are made again; undo gives back all', async () => {
    await until(store, () => store.get().forensics !== null);
    const before = { numbers: numbers(), hash: record().seriesHash, raw: source().raw.series.values.slice() };
    expect(store.get().forensics!.seriesHash).toBe(before.hash);
    await app.actions.repair({ kind: 'gap', from: 10, to: 13 }, 'test');
    expect(record().repairs).toMatchObject([{ kind: 'gap', from: 10, to: 13, why: 'test' }]);
    expect(source().record.series.values[11]).toBeNaN();
    await until(store, () => allDone() && store.get().forensics?.seriesHash === record().seriesHash);
    expect(numbers()).not.toEqual(before.numbers);
    expect(
      activeRows(store.get()).every(
        ({ progress }) => progress.kind === 'fitted' && progress.fit.seriesHash === record().seriesHash,
      ),
    ).toBe(true);
    expect(source().raw.series.values).toEqual(before.raw);
    app.actions.undo();
    expect(record().seriesHash).toBe(before.hash);
    expect(numbers()).toEqual(before.numbers);
    expect(source().record.series.values).toEqual(before.raw);
  });

  test('two repairs asked for at once are both made, in order; a refused one is a notice and changes nothing', async () => {
    const scale = app.actions.repair({ kind: 'scale', factor: 0.3048, offset: 0, unit: 'm' }, 'feet to metres');
    await Promise.all([scale, app.actions.repair({ kind: 'gap', from: 0, to: 2 }, '')]);
    expect(record().repairs.map(({ kind }) => kind)).toEqual(['scale', 'gap']);
    expect(source().record.series.unit).toBe('m');
    const kept = record();
    await app.actions.repair({ kind: 'gap', from: 90, to: 200 }, '');
    expect(record()).toBe(kept);
    expect(store.get().notices.at(-1)?.failure).toMatchObject({ code: 'repairRefused', reason: 'outside', place: 3 });
    await app.actions.removeRepair(kept.repairs[0]!.id);
    await app.actions.removeRepair(kept.repairs[1]!.id);
    expect(source().record.series.hash).toBe(source().raw.series.hash);
  });

  test('a regrid takes window, hold-out and events along', async () => {
    const [first] = activeRows(store.get());
    app.actions.changeCandidate(first!.id, { regressors: [{ kind: 'step', at: 40 }] });
    const yearly = source().record.series.axis;
    await app.actions.repair({ kind: 'regrid', step: 2 * yearly.step, rule: 'binMean' }, '');
    expect(record().window).toEqual({ from: 0, to: 49 });
    expect(activeRows(store.get())[0]!.candidate.regressors).toEqual([{ kind: 'step', at: 20 }]);
    app.actions.undo();
    expect(record().window).toEqual({ from: 0, to: 98 });
  });

  test('the link carries repairs; they are replayed on the same file and the numbers are the same', async () => {
    await app.actions.repair({ kind: 'gaps', runs: [10, 3, 20, 1] }, 'frozen');
    await until(store, allDone);
    await app.actions.copySessionLink(false);
    const other = createStore({ ...initialState, opening: false });
    const page = createActions(other, directClient({ fits: null }), platform);
    await page.actions.openText(copied.at(-1)!, 'link');
    await page.actions.openText(csv(publishedSeries('lakeHuron')), 'renamed.csv');
    await until(other, () => progressCounts(activeRows(other.get())).done === 3);
    const opened = other.get().records[0]!;
    expect(opened.repairs).toEqual(record().repairs);
    expect(opened.seriesHash).toBe(record().seriesHash);
    expect(
      activeRows(other.get()).map(({ progress }) => (progress.kind === 'fitted' ? progress.fit.logLikelihood : null)),
    ).toEqual(numbers());
  });

  test('another file does not get them silently', async () => {
    await app.actions.repair({ kind: 'gap', from: 10, to: 13 }, '');
    await app.actions.copySessionLink(false);
    const other = createStore({ ...initialState, opening: false });
    const page = createActions(other, directClient({ fits: null }), platform);
    await page.actions.openText(copied.at(-1)!, 'link');
    await page.actions.openText(csv(publishedSeries('nile')), 'nile.csv');
    page.actions.acceptArrival();
    await until(other, () => other.get().notices.some(({ text }) => /made to another record/.test(text)));
    expect(other.get().records[0]!.repairs).toEqual([]);
    await until(other, () => progressCounts(activeRows(other.get())).done === 3);
  });
});

describe('links', () => {
  test('a link restores the candidates, asks for the record, knows it, and gives the same numbers', async () => {
    await app.actions.copySessionLink(false);
    const numbers = activeRows(store.get()).map(({ progress }) =>
      progress.kind === 'fitted' ? progress.fit.logLikelihood : null,
    );
    const other = createStore({ ...initialState, opening: false });
    const page = createActions(other, directClient({ fits: null }), platform);
    await page.actions.openText(copied.at(-1)!, 'link');
    expect(activeRows(other.get()).map(({ progress }) => progress.kind)).toEqual(['waiting', 'waiting', 'waiting']);
    await page.actions.openText(csv(publishedSeries('lakeHuron')), 'renamed.csv');
    await until(other, () => progressCounts(activeRows(other.get())).done === 3);
    expect(other.get().arrival).toBeNull();
    expect(
      activeRows(other.get()).map(({ progress }) => (progress.kind === 'fitted' ? progress.fit.logLikelihood : null)),
    ).toEqual(numbers);
    expect(other.get().view).toEqual(store.get().view);
  });

  test('another record is not taken for it silently', async () => {
    await app.actions.copySessionLink(false);
    const other = createStore({ ...initialState, opening: false });
    const page = createActions(other, directClient({ fits: null }), platform);
    await page.actions.openText(copied.at(-1)!, 'link');
    await page.actions.openText(csv(publishedSeries('nile')), 'nile.csv');
    expect(other.get().arrival).not.toBeNull();
    page.actions.acceptArrival();
    expect(other.get().notices.at(-1)?.failure).toMatchObject({ code: 'recordMismatch' });
    await until(other, () => progressCounts(activeRows(other.get())).done === 3);
  });

  test('a damaged link is a notice, and what was open stays', async () => {
    const before = envelopeOf(store.get());
    await app.links.openHash('#s1.AAAA');
    expect(store.get().notices.at(-1)?.failure?.code).toBe('linkDamaged');
    expect(envelopeOf(store.get())).toEqual(before);
  });
});

test('starting candidates follow the sampling interval', () => {
  const daily = { kind: 'seconds', start: 0, step: 86400, zone: null } as const;
  expect(plausibleSeason(daily, 400)).toBe(7);
  expect(plausibleSeason(daily, 20)).toBe(0);
  expect(plausibleSeason({ kind: 'months', start: 0, step: 1, zone: null }, 144)).toBe(12);
  expect(plausibleSeason({ kind: 'index', start: 0, step: 1, zone: null }, 900)).toBe(0);
  expect(startingCandidates(daily, 400)[2]!.order).toMatchObject({ D: 1, s: 7 });
});

describe('a sweep', () => {
  test('accounts for its whole range, ranks it, and leaves the table of candidates alone', async () => {
    const before = activeRows(store.get()).length;
    app.actions.sweep({
      p: [0, 2],
      q: [0, 1],
      P: [0, 0],
      Q: [0, 0],
      d: [0, 1],
      D: [0],
      s: 0,
      levels: ['none', 'mean'],
    });
    await until(store, () => store.get().sweep?.running === false);
    const sweep = store.get().sweep!;
    expect(sweep.size).toBe(18);
    expect(sweep.fits.length + sweep.failed + sweep.passedOver).toBe(18);
    const { groups, folded } = sweep.ranking!;
    expect(groups.flatMap(({ members }) => members).length + folded.length).toBe(sweep.fits.length);
    expect(activeRows(store.get())).toHaveLength(before);
  });
});

describe('the shape of the record', () => {
  test('is described for the differencing asked for, and what it advises is added as one step to undo', async () => {
    const answer = await app.actions.describeShape({ d: 1, D: 0, s: 0 }, { kind: 'none' });
    if (!answer.ok) throw new Error(answer.failure.code);
    expect(answer.value.order).toEqual({ d: 1, D: 0, s: 0 });
    const before = activeRows(store.get()).length;
    app.actions.addCandidates([
      plainCandidate({ p: 1 }, 'mean'),
      plainCandidate({ p: 2 }, 'mean'),
      plainCandidate({ p: 3 }, 'mean'),
    ]);
    // The first is among the starting candidates already.
    expect(activeRows(store.get())).toHaveLength(before + 2);
    expect(activeRows(store.get())[store.get().view.chosen!]!.candidate.order.p).toBe(2);
    await until(store, allDone);
    app.actions.undo();
    expect(activeRows(store.get())).toHaveLength(before);
  });

  test('candidates that are all there change nothing and say so', () => {
    const before = activeRows(store.get());
    app.actions.addCandidates(before.map(({ candidate }) => candidate));
    expect(activeRows(store.get())).toBe(before);
    expect(store.get().notices.at(-1)!.text).toMatch(/already/);
  });
});
