import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Envelope } from '../../../workers/contract/envelope.ts';
import { decodePayload, decodeSession, hashOf } from '../../../src/sessionUrl/decodeSession.ts';
import { encodeSession } from '../../../src/sessionUrl/encodeSession.ts';
import { deflate, toBase64Url } from '../../../src/sessionUrl/bytes.ts';

const hash = '0123456789abcdef0123456789abcdef';
const envelope: Envelope = {
  format: 'lagwright-session',
  version: 1,
  records: [
    {
      id: 'r1',
      fileHash: hash,
      seriesHash: hash,
      dialect: {
        encoding: 'utf-8',
        delimiter: ';',
        quote: '"',
        decimal: ',',
        thousands: null,
        preambleLines: 2,
        header: true,
        unitsRow: false,
        layout: 'wide',
        tagColumn: null,
        tag: null,
        timeColumn: 0,
        clockColumn: null,
        stampColumns: null,
        stamp: 'dayFirst',
        zone: null,
        valueColumn: 1,
        status: null,
        gapWords: ['n/a'],
        limitWords: ['bdl'],
        repeats: 'last',
        sheet: null,
        grid: { kind: 'seconds', step: 600, rule: 'nearest', tolerance: 0.1 },
      },
      repairs: [{ id: 'a', at: '2024-05-01T00:00:00Z', why: 'spike', kind: 'gap', from: 3, to: 4 }],
      window: { from: 0, to: 100 },
      holdOut: null,
      candidates: [
        {
          order: { p: 1, d: 0, q: 1, P: 0, D: 0, Q: 0, s: 0 },
          level: 'mean',
          transform: { kind: 'boxCox', lambda: 'estimate' },
          estimator: 'exact',
          zeroLags: { ar: [], ma: [], seasonalAr: [], seasonalMa: [] },
          regressors: [{ kind: 'step', at: 40 }],
        },
      ],
    },
  ],
  active: 'r1',
  view: {
    chosen: 0,
    sort: { column: 'aicc', descending: false },
    columns: ['lnL'],
    signs: 'plus',
    coverage: 0.95,
  },
};

test('what is written is read back, with and without the readings', async () => {
  for (const inline of [null, { fileName: 'pH µ.csv', text: 'time;pH\n1;7,1' }]) {
    const decoded = await decodeSession(await encodeSession({ envelope, inline }));
    expect(decoded).toEqual({ ok: true, value: { envelope, inline } });
  }
});

test('a session written before parts of stamps, limit words, repeats and sheets still opens, and is read as it was', () => {
  const [record] = envelope.records;
  const newer = new Set(['stampColumns', 'limitWords', 'repeats', 'sheet']);
  const dialect = Object.fromEntries(Object.entries(record!.dialect).filter(([field]) => !newer.has(field)));
  const old = { ...envelope, records: [{ ...record!, dialect }] };
  const decoded = decodePayload(JSON.stringify({ envelope: old, inline: null }));
  if (!decoded.ok) throw new Error(JSON.stringify(decoded.failure));
  expect(decoded.value.envelope.records[0]!.dialect).toEqual({
    ...record!.dialect,
    stampColumns: null,
    limitWords: [],
    repeats: 'first',
    sheet: null,
  });
});

test('any candidate orders and texts survive the link', async () => {
  await fc.assert(
    fc.asyncProperty(fc.nat(40), fc.nat(3), fc.string(), async (p, d, why) => {
      const [record] = envelope.records;
      const [candidate] = record!.candidates;
      const changed: Envelope = {
        ...envelope,
        records: [
          {
            ...record!,
            repairs: [{ ...record!.repairs[0]!, why }],
            candidates: [{ ...candidate!, order: { ...candidate!.order, p, d } }],
          },
        ],
      };
      const decoded = await decodeSession(await encodeSession({ envelope: changed, inline: null }));
      expect(decoded).toEqual({ ok: true, value: { envelope: changed, inline: null } });
    }),
    { numRuns: 50 },
  );
});

describe('damaged and foreign links are told apart and never throw', () => {
  test('a hash that is not ours', async () => {
    expect(await decodeSession('#section-3')).toEqual({ ok: false, failure: { code: 'linkForeign' } });
  });
  test('any damage', async () => {
    const good = await encodeSession({ envelope, inline: null });
    await fc.assert(
      fc.asyncProperty(fc.nat(good.length - 4), fc.string({ minLength: 1, maxLength: 3 }), async (at, junk) => {
        const bad = good.slice(0, at + 3) + junk + good.slice(at + 3 + junk.length);
        const decoded = await decodeSession(bad);
        if (!decoded.ok) expect(['linkForeign', 'linkDamaged', 'linkNewer']).toContain(decoded.failure.code);
      }),
      { numRuns: 200 },
    );
  });
  test('a newer version says so', () => {
    const decoded = decodePayload(JSON.stringify({ envelope: { ...envelope, version: 99 }, inline: null }));
    expect(decoded).toEqual({ ok: false, failure: { code: 'linkNewer', version: 99, known: 1 } });
  });
  test('a field of the wrong kind is named', () => {
    const wrong = { ...envelope, view: { ...envelope.view, coverage: 2 } };
    const decoded = decodePayload(JSON.stringify({ envelope: wrong, inline: null }));
    expect(decoded).toEqual({ ok: false, failure: { code: 'linkDamaged', where: 'envelope.view.coverage' } });
  });
  test('a small link that would inflate to much more is refused while reading', async () => {
    const bomb = 's1.' + toBase64Url(await deflate('0'.repeat(20_000_000)));
    expect(bomb.length).toBeLessThan(40_000);
    expect(await decodeSession(bomb)).toEqual({ ok: false, failure: { code: 'linkDamaged', where: 'packing' } });
  });
});

test('a link from any origin is known by its hash alone', () => {
  expect(hashOf('  https://elsewhere.example/tool/index.html#s1.abc ')).toBe('s1.abc');
  expect(hashOf('s1.abc')).toBe('s1.abc');
  expect(hashOf('time,value\n1,2')).toBeNull();
});
