import type { Judgement } from '../../workers/contract/diagnostics.ts';
import type { View } from '../../workers/contract/envelope.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import type { Prediction } from '../../workers/contract/prediction.ts';
import type { RecordState, Source } from '../state/appState.ts';

export interface DossierInput {
  readonly record: RecordState;
  readonly source: Extract<Source, { kind: 'loaded' }>;
  readonly fit: Fit;
  readonly judgement: Judgement;
  readonly prediction: Prediction | null;
  readonly view: View;
  readonly madeAt: Date;
  readonly page: string;
}

export function makeDossier(input: DossierInput): Promise<Blob> {
  return Promise.reject(new Error(input.page));
}
