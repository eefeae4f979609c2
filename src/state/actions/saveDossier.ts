import type { Platform } from './platform.ts';
import type { Store } from '../store.ts';
import { chosenRow, intervalsOf } from '../selectors.ts';
import { activeRecord, note, trouble, withNotice } from '../updates.ts';

/** Writes the dossier of the chosen candidate; the PDF library is loaded only now. */
export async function saveDossier(store: Store, platform: Platform): Promise<void> {
  const state = store.get();
  const record = activeRecord(state);
  const row = chosenRow(state);
  if (record?.source.kind !== 'loaded' || row?.progress.kind !== 'fitted' || row.progress.judgement === null) {
    store.set((now) => withNotice(now, note('Choose a fitted candidate first: the dossier is written for it.')));
    return;
  }
  const { fit, judgement } = row.progress;
  const { source } = record;
  try {
    const { makeDossier } = await import('../../export/makeDossier.ts');
    const prediction = state.prediction?.fit === fit ? state.prediction.prediction : null;
    const content = await makeDossier({
      fileName: source.fileName,
      fileHash: record.fileHash,
      example: source.example,
      dialect: record.dialect,
      repairs: record.repairs,
      record: source.record,
      raw: source.raw,
      fit,
      judgement,
      prediction,
      intervals: intervalsOf(state, fit),
      checks: state.checks.flatMap(({ fit: own, answer }) =>
        own === fit && answer?.ok === true ? [answer.value] : [],
      ),
      view: state.view,
      madeAt: new Date(),
    });
    const stem = source.fileName.replace(/\.[^.]*$/, '');
    platform.download(`${stem}-dossier.pdf`, content);
    store.set((now) => withNotice(now, note('Dossier saved.')));
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    store.set((now) => withNotice(now, trouble({ code: 'internal', message }, 'dossier')));
  }
}
