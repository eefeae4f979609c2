import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fitCandidate } from '../../workers/estimation/fitCandidate.ts';
import { hashValues } from '../../workers/series/hashValues.ts';
import { FROZEN_RECORDS, frozenRecord } from './frozen/frozenRecord.ts';
import { widestSearch } from './frozen/widestSearch.ts';

/**
 * The frozen set: 1 000 simulated records, each with the highest ln L that any search ever run on it has found
 * (frozen/best.json: index, fingerprint of the record, ln L). `npm run frozen -- from to climbs` runs more of it, with
 * so many climbs of the widest search to improve the stored values by.
 */
interface Best {
  readonly index: number;
  readonly hash: string;
  readonly logLikelihood: number;
}

const FILE = new URL('./frozen/best.json', import.meta.url);
const stored = existsSync(FILE) ? (JSON.parse(readFileSync(FILE, 'utf8')) as Best[]) : [];
const byIndex = new Map(stored.map((best) => [best.index, best]));
/** Below the best by less than this in ln L counts as found. */
const FOUND = 1e-3;
const IN_SUITE = 40;

function ours(index: number) {
  const { values, candidate } = frozenRecord(index);
  const result = fitCandidate({ values, candidate, seed: index });
  const few = candidate.order.p + candidate.order.q + candidate.order.P + candidate.order.Q <= 3;
  const hash = hashValues(values);
  if (!result.ok) throw new Error(`Record ${index}: ${JSON.stringify(result.failure)}`);
  return { values, candidate, few, hash, logLikelihood: result.value.logLikelihood };
}

function tally(rows: readonly { few: boolean; found: boolean }[]) {
  const share = (few: boolean) => {
    const own = rows.filter((row) => row.few === few);
    return { records: own.length, found: own.filter((row) => row.found).length };
  };
  return { upToThree: share(true), above: share(false) };
}

const from = Number(process.env['FROZEN_FROM'] ?? -1);

function storedRecords() {
  it('the stored records are found within 0.001 in ln L: 99 in 100 up to three coefficients, 95 in 100 above', () => {
    const short = stored.filter(({ index }) => frozenRecord(index).values.length <= 250).slice(0, IN_SUITE);
    expect(short).toHaveLength(IN_SUITE);
    const rows = short.map(({ index, hash, logLikelihood }) => {
      const mine = ours(index);
      expect(mine.hash).toBe(hash);
      return { few: mine.few, found: mine.logLikelihood > logLikelihood - FOUND };
    });
    const { upToThree, above } = tally(rows);
    expect(upToThree.found).toBeGreaterThanOrEqual(Math.floor(0.99 * upToThree.records));
    expect(above.found).toBeGreaterThanOrEqual(Math.floor(0.95 * above.records));
  });
}

function searchByCommand() {
  it('a stretch of it is searched and improved', { timeout: 24 * 3600_000 }, () => {
    const to = Math.min(FROZEN_RECORDS, Number(process.env['FROZEN_TO'] ?? FROZEN_RECORDS));
    const climbs = Number(process.env['FROZEN_CLIMBS'] ?? 0);
    const rows = [];
    for (let index = from; index < to; index++) {
      const { values, candidate, few, hash, logLikelihood } = ours(index);
      const known = byIndex.get(index);
      if (known !== undefined && known.hash !== hash) throw new Error(`Record ${index} is not the one stored.`);
      const wide = climbs > 0 ? widestSearch(values, candidate, climbs, index + 1) : -Infinity;
      const best = Math.max(wide, logLikelihood, known?.logLikelihood ?? -Infinity);
      byIndex.set(index, { index, hash, logLikelihood: best });
      const found = logLikelihood > best - FOUND;
      rows.push({ few, found });
      if (!found) {
        const { p, q, P, Q, s } = candidate.order;
        console.log(
          `record ${index}, n ${values.length}, (${p},${q})(${P},${Q})${s}: ${(best - logLikelihood).toFixed(4)} below`,
        );
      }
    }
    const sorted = [...byIndex.values()].sort((one, other) => one.index - other.index);
    writeFileSync(FILE, `[\n${sorted.map((best) => `  ${JSON.stringify(best)}`).join(',\n')}\n]\n`);
    console.log(JSON.stringify({ from, to, climbs, ...tally(rows) }));
    expect(rows).toHaveLength(to - from);
  });
}

describe('the frozen set', from < 0 ? storedRecords : searchByCommand);
