import { expose } from 'comlink';
import type { WorkbookApi } from '../contract/workerApis.ts';
import { readWorkbook } from '../reading/workbook/readWorkbook.ts';

const api: WorkbookApi = {
  ready: () => true,
  async read(request) {
    try {
      return await readWorkbook(request);
    } catch (error) {
      const message = error instanceof Error ? error.message : String(error);
      return { ok: false, failure: { code: 'internal', message } };
    }
  },
};
expose(api);
