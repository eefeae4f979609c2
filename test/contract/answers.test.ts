import { describe, expect, it } from 'vitest';
import type { Result } from '../../workers/contract/result.ts';
import { modellingApi } from '../../workers/entry/modellingApi.ts';
import { ownBuffers } from '../../workers/entry/ownBuffers.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { readRecord } from '../../workers/reading/readRecord.ts';
import { publishedSeries } from '../helpers/publishedSeries.ts';

const valueOf = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(JSON.stringify(result.failure));
  return result.value;
};
const order = { p: 1, d: 0, q: 0, P: 0, D: 0, Q: 0, s: 0 };
const candidate = candidateOf({ order, level: 'mean' });
const values = publishedSeries('presidents');
const fit = valueOf(modellingApi.fit({ values, candidate, seed: 1 }));

/** What crosses arrives equal and with its own prototypes: nothing in it is more than plain data. */
const crosses = (answer: unknown) => {
  expect(structuredClone(answer)).toEqual(answer);
  const walk = (value: unknown): void => {
    if (typeof value === 'function' || typeof value === 'symbol') throw new Error('No function or symbol may cross.');
    if (typeof value !== 'object' || value === null || ArrayBuffer.isView(value)) return;
    const prototype: unknown = Object.getPrototypeOf(value);
    expect(prototype === Object.prototype || prototype === Array.prototype).toBe(true);
    Object.values(value).forEach(walk);
  };
  walk(answer);
};

describe('answers of the modelling worker', () => {
  it('a fit crosses', () => crosses(modellingApi.fit({ values, candidate, seed: 1 })));

  it('a judgement crosses', () => {
    const answer = modellingApi.diagnose({ fit, values, coverage: 0.95 });
    expect(answer.ok).toBe(true);
    crosses(answer);
  });

  it('a prediction crosses', () => {
    const answer = modellingApi.predict({ fit, values, horizon: 8, coverage: 0.9 });
    expect(answer.ok).toBe(true);
    crosses(answer);
  });

  it('a report, a repaired record and a refusal cross', () => {
    const axis = { kind: 'index', start: 1, step: 1, zone: null } as const;
    const series = { values, axis, unit: '', hash: '' };
    const report = modellingApi.inspect(series);
    expect(report.ok).toBe(true);
    crosses(report);
    const gap = { id: 'm', at: '', why: '', kind: 'gap', from: 3, to: 5 } as const;
    const repaired = modellingApi.repair(series, [gap], { other: values });
    expect(repaired.ok).toBe(true);
    crosses(repaired);
    const refused = modellingApi.repair(series, [{ ...gap, to: 5000 }]);
    expect(refused.ok).toBe(false);
    crosses(refused);
  });

  it('a comparison and a failure cross', () => {
    crosses(modellingApi.compare([fit, fit]));
    const failed = modellingApi.fit({ values: values.subarray(0, 3), candidate, seed: 1 });
    expect(failed.ok).toBe(false);
    crosses(failed);
  });

  it('every array is handed over once, and the answer survives the transfer', () => {
    const answer = modellingApi.diagnose({ fit, values, coverage: 0.95 });
    const buffers = ownBuffers(answer);
    expect(new Set(buffers).size).toBe(buffers.length);
    expect(buffers).not.toContain(values.buffer);
    const copy = structuredClone(answer);
    expect(structuredClone(answer, { transfer: buffers })).toEqual(copy);
  });
});

describe('answers of the reading worker', () => {
  it('a record and a refusal cross', () => {
    const rows = Array.from({ length: 30 }, (_, t) => `2024-03-01 00:${String(t).padStart(2, '0')};7,${t % 10}`);
    const read = readRecord({ text: ['time;pH', ...rows].join('\n'), fileName: 'ph.csv', settings: {} });
    expect(read.record?.series.values.length).toBe(30);
    crosses(read);
    const refused = readRecord({ text: '', fileName: 'empty.csv', settings: {} });
    expect(refused.failure).not.toBeNull();
    crosses(refused);
  });
});

describe('the door of the modelling worker', () => {
  it('refuses infinities with their place, in readings and covariates', () => {
    const bad = values.with(7, -Infinity);
    expect(modellingApi.fit({ values: bad, candidate, seed: 1 })).toEqual({
      ok: false,
      failure: { code: 'notFinite', what: 'values', index: 7 },
    });
    const columns = { feed: new Float64Array(values.length).fill(Infinity, 3, 4) };
    expect(modellingApi.diagnose({ fit, values, columns, coverage: 0.95 })).toEqual({
      ok: false,
      failure: { code: 'notFinite', what: 'feed', index: 3 },
    });
  });

  it('turns a throw into a failure with its message', () => {
    const broken = { ...fit, parameters: null as never };
    const answer = modellingApi.predict({ fit: broken, values, horizon: 2, coverage: 0.95 });
    expect(answer).toMatchObject({ ok: false, failure: { code: 'internal' } });
  });

  it('answers that it is ready', () => expect(modellingApi.ready()).toBe(true));
});
