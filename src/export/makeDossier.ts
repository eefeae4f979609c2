import { lagFigure } from '../figures/lagFigure.ts';
import { predictionFigure, recordFigure } from '../figures/recordFigure.ts';
import { lightPalette } from './lightPalette.ts';
import { writePdf } from './pdf/writePdf.ts';
import { buildReport } from './report/buildReport.ts';
import type { ReportInput } from './report/reportInput.ts';

/** The dossier of a fit as a PDF. The figures are those of the page, in the light theme. */
export async function makeDossier(input: ReportInput): Promise<Blob> {
  const palette = lightPalette();
  const { series, name } = input.record;
  const { evidence } = input.judgement;
  const figures = {
    record: recordFigure({ series, name, evidence, prediction: null, events: input.fit.candidate.regressors }, palette),
    lags: lagFigure(evidence, palette),
    prediction: input.prediction === null ? null : predictionFigure(series, name, input.prediction, palette),
  };
  return writePdf(buildReport(input), figures, palette);
}
