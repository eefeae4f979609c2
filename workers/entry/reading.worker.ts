import { expose, transfer } from 'comlink';
import type { ReadAnswer } from '../contract/reading.ts';
import type { ReadingApi } from '../contract/workerApis.ts';
import { joinFiles } from '../reading/files/joinFiles.ts';
import { readRecord } from '../reading/readRecord.ts';

/** The record's arrays move to the page instead of being copied. */
function withTransfers(answer: ReadAnswer): ReadAnswer {
  if (answer.record === null) return answer;
  const arrays = [answer.record.series.values, ...Object.values(answer.record.columns)];
  return transfer(answer, [...new Set(arrays.map(({ buffer }) => buffer))]);
}

const api: ReadingApi = {
  ready: () => true,
  join(request) {
    try {
      return joinFiles(request);
    } catch (error) {
      const message = error instanceof Error ? error.message : String(error);
      return { ok: false, failure: { code: 'internal', message } };
    }
  },
  read(request, progress) {
    try {
      return withTransfers(readRecord(request, progress));
    } catch (error) {
      const message = error instanceof Error ? error.message : String(error);
      return { sniffed: null, record: null, failure: { code: 'internal', message } };
    }
  },
};
expose(api);
// The row parser installs a message handler of its own in a worker; messages here are Comlink's alone.
globalThis.onmessage = null;
