import { maximumText } from '../../format/maximumText.ts';
import { coverageRows } from '../../format/measuredCoverage.ts';
import { derivedLines, intervalAssumptions } from '../../format/intervalText.ts';
import { formatInterval, formatReadings, formatSpan, timeAt } from '../../format/axisTime.ts';
import { cautions } from '../../format/cautions.ts';
import { noteSentence } from '../../format/dialectText.ts';
import { equationLines, estimateLines, intervalShown, signSentence } from '../../format/equationText.ts';
import {
  candidateName,
  coefficientName,
  estimatorName,
  levelName,
  orderNotation,
  transformName,
} from '../../format/notation.ts';
import { counted, formatFixed, formatNumber, formatWithUncertainty } from '../../format/numbers.ts';
import { axesOf, changeText } from '../../format/repairText.ts';
import { standingSentence, verdictSentence } from '../../format/verdictText.ts';
import { warningText } from '../../format/warningText.ts';
import { failureText } from '../../format/failureText.ts';
import type { Block, Report, Section } from './report.ts';
import type { ReportInput } from './reportInput.ts';
import { readingFacts } from './readingFacts.ts';

/** Predicted readings printed at most. */
const mostPredicted = 24;

/** A dossier's content from a fit and the inputs that made it. */
export function buildReport(input: ReportInput): Report {
  const { record, fit, judgement } = input;
  const { standing } = judgement.verdict;
  return {
    title: `${record.name}: ${candidateName(fit.candidate)}`,
    subtitle: `Noise model of a logged record${input.example ? ' (invented example)' : ''}, ${input.madeAt.toISOString().slice(0, 16).replace('T', ' ')} UTC`,
    standing,
    standingWords: standingSentence(standing),
    sections: [
      verdictSection(input),
      recordSection(input),
      modelSection(input),
      evidenceSection(input),
      ...(input.prediction === null ? [] : [predictionSection(input)]),
      searchSection(input),
      { heading: 'Cautions', blocks: [{ kind: 'list', items: cautions }] },
    ],
    foot: `Lagwright ${fit.coreVersion} · file ${input.fileHash.slice(0, 12)} · readings ${fit.seriesHash.slice(0, 12)} · seed ${fit.seed}`,
  };
}

function verdictSection({ judgement, record }: ReportInput): Section {
  const items = judgement.verdict.items.map((item) => {
    const { says, tryNext } = verdictSentence(item, record.series.axis);
    const weight = item.weight === 'supports' ? 'for it' : item.weight;
    return `${weight}: ${says}${tryNext === '' ? '' : ` ${tryNext}`}`;
  });
  return { heading: 'Verdict', blocks: [{ kind: 'list', items }] };
}

function recordSection(input: ReportInput): Section {
  const { record, fit, fileName, fileHash, repairs } = input;
  const { series, notes } = record;
  const gaps = series.values.reduce((sum, value) => sum + (Number.isNaN(value) ? 1 : 0), 0);
  return {
    heading: 'Record',
    blocks: [
      {
        kind: 'facts',
        rows: [
          ['File', fileName],
          ['Fingerprint of the file', fileHash],
          ['Fingerprint of the readings', fit.seriesHash],
          ['Quantity', series.unit === '' ? record.name : `${record.name}, in ${series.unit}`],
          [
            'Readings',
            `${counted(series.values.length - gaps, 'reading')}, ${formatInterval(series.axis)}; ${gaps === 0 ? 'no gaps' : `${counted(gaps, 'place')} without a reading, kept as gaps`}`,
          ],
          ['Fit window', formatSpan(series.axis, fit.window)],
          ...(repairs.length === 0 ? [['Repairs', 'none'] as const] : rawFacts(input)),
          ...readingFacts(input.dialect),
        ],
      },
      ...(notes.length === 0 ? [] : [{ kind: 'list' as const, items: notes.map(noteSentence) }]),
      ...repairBlocks(input),
      {
        kind: 'figure',
        name: 'record',
        caption: 'The record, gaps hatched; beneath it the standardised innovations, shaded within ±2.',
      },
    ],
  };
}

function rawFacts({ repairs, raw }: ReportInput): (readonly [string, string])[] {
  return [
    ['Repairs', `${counted(repairs.length, 'repair')}, listed below; the file is unchanged`],
    ...(raw === undefined ? [] : [['Fingerprint before repairs', raw.series.hash] as const]),
  ];
}

/** Every repair in the order it is replayed, with its reason and when it was made. */
function repairBlocks({ repairs, raw, record }: ReportInput): Block[] {
  if (repairs.length === 0) return [];
  const axes = axesOf((raw ?? record).series.axis, repairs);
  const items = repairs.map((repair, index) => {
    const why = repair.why === '' ? 'no reason given' : repair.why;
    return `Repair ${index + 1}: ${changeText(repair, axes[index]!)}. Why: ${why} (${repair.at.slice(0, 16).replace('T', ' ')} UTC).`;
  });
  return [{ kind: 'list', items }];
}

function modelSection(input: ReportInput): Section {
  const { fit, judgement, view, record } = input;
  const intervals = input.intervals?.ok === true ? input.intervals.value : null;
  const { equation } = judgement.evidence;
  const { unit } = record.series;
  const { candidate, criteria } = fit;
  const [first, ...rest] = equationLines(fit, equation, unit);
  return {
    heading: 'Model',
    blocks: [
      { kind: 'paragraph', text: first ?? '', strong: true },
      ...rest.map((text) => ({ kind: 'paragraph' as const, text })),
      {
        kind: 'table',
        head: ['coefficient', 'estimate', 'interval', 'standard error', 'unit'],
        rows: estimateLines(fit, equation, view.signs, unit, intervals).map((line) => [
          line.name,
          line.value,
          line.interval,
          line.uncertainty,
          line.unit,
        ]),
        numbers: [1, 2, 3],
      },
      ...intervalBlocks(input),
      { kind: 'paragraph', text: `${signSentence(view.signs)}.` },
      {
        kind: 'facts',
        rows: [
          ['Orders', orderNotation(candidate.order)],
          ['Level', levelName(candidate.level)],
          ['Transform', transformName(candidate.transform)],
          ['Estimator', estimatorName(candidate.estimator)],
          ['ln L', `${formatFixed(fit.logLikelihood, 4)} (natural logarithm, all constants kept)`],
          ['AIC', formatFixed(criteria.aic, 3)],
          ['AICc', formatFixed(criteria.aicc, 3)],
          ['BIC', formatFixed(criteria.bic, 3)],
          ['Parameters counted', `${fit.parameterCount}, σ² among them`],
          ['Readings used', formatNumber(fit.readingsUsed, 9)],
        ],
      },
    ],
  };
}

/** What the intervals say of derived quantities, what they assume, and what simulation said of them. */
function intervalBlocks({ intervals, checks, view, record }: ReportInput): Block[] {
  if (intervals === null) return [];
  if (!intervals.ok) return [{ kind: 'paragraph', text: failureText(intervals.failure).what }];
  const derived = derivedLines(intervals.value, record.series.axis);
  const [first] = coverageRows;
  return [
    ...(derived.length === 0
      ? []
      : [
          {
            kind: 'table' as const,
            head: ['follows from them', 'value', 'interval', ''],
            rows: derived.map(({ name, value, interval, note }) => [name, value, interval, note]),
            numbers: [1, 2],
          },
        ]),
    {
      kind: 'list',
      items: [
        ...intervalAssumptions(intervals.value),
        ...(first === undefined ? [] : [measuredSentence()]),
        ...checks.map(
          (check) =>
            `${coefficientName(check.about)} checked by simulation (likelihood ratio, ${check.replicates} records at each of ${check.tried.length} values, seed ${check.seed}): ${intervalShown(check.about, view.signs, check)}.`,
        ),
      ],
    },
  ];
}

function measuredSentence(): string {
  const range = (column: number) => {
    const values = coverageRows.map((row) => Number(row[column]));
    return `${Math.min(...values).toFixed(1)} to ${Math.max(...values).toFixed(1)} %`;
  };
  return `Measured coverage of nominal 95 % intervals over ${coverageRows.length} designs (ARMA(1,1) with estimated mean, n 50 to 500): mean ${range(3)}, φ ${range(4)}, θ ${range(5)}, σ ${range(6)}.`;
}

function evidenceSection({ judgement, record }: ReportInput): Section {
  const { roots } = judgement.evidence;
  const { axis } = record.series;
  return {
    heading: 'Evidence',
    blocks: [
      {
        kind: 'figure',
        name: 'lags',
        caption:
          'Residual correlogram with the band for residuals of a fitted model (95 %), and Ljung–Box p-values up to each lag, degrees of freedom reduced by the coefficients; shaded under 0.05.',
      },
      ...(roots.length === 0
        ? []
        : [
            {
              kind: 'table' as const,
              head: ['inverse root', 'modulus', 'period', 'time constant'],
              rows: roots
                .slice(0, 12)
                .map(({ polynomial, modulus, period, timeConstant }) => [
                  polynomial === 'ar' ? 'AR' : 'MA',
                  formatNumber(modulus, 3),
                  period === Infinity ? 'none' : formatReadings(axis, period),
                  timeConstant === Infinity ? 'endless' : formatReadings(axis, timeConstant),
                ]),
              numbers: [1],
            },
          ]),
    ],
  };
}

function predictionSection({ prediction, record }: ReportInput): Section {
  if (prediction === null) return { heading: 'Prediction', blocks: [] };
  const { axis, values } = record.series;
  const rows = Array.from(prediction.median.subarray(0, mostPredicted), (median, h) => {
    const spread = (prediction.upper[h]! - prediction.lower[h]!) / 4;
    const show = (value: number) => formatWithUncertainty(value, spread).value;
    return [timeAt(axis, values.length + h), show(median), show(prediction.lower[h]!), show(prediction.upper[h]!)];
  });
  const coverage = Math.round(100 * prediction.coverage);
  return {
    heading: 'Prediction',
    blocks: [
      {
        kind: 'figure',
        name: 'prediction',
        caption: `Predicted readings with a ${coverage} % band from the innovations alone: parameters are taken as known, innovations as normal.`,
      },
      { kind: 'table', head: ['time', 'predicted', 'from', 'to'], rows, numbers: [1, 2, 3] },
      ...(prediction.horizon > mostPredicted
        ? [{ kind: 'paragraph' as const, text: `The first ${mostPredicted} of ${prediction.horizon}.` }]
        : []),
    ],
  };
}

function searchSection({ fit }: ReportInput): Section {
  const { outcome, warnings } = fit;
  const maxima = outcome.maxima.filter(({ admissible }) => admissible);
  return {
    heading: 'How it was found',
    blocks: [
      {
        kind: 'facts',
        rows: [
          [
            'Search',
            outcome.status === 'closedForm'
              ? 'closed form, no search'
              : `${counted(outcome.starts, 'start')}, ${counted(outcome.evaluations, 'evaluation')}, ended ${outcome.status}`,
          ],
          [
            'Maxima within 2 of the best in ln L',
            maxima.length === 0 ? 'none: closed form' : maxima.map(maximumText).join(' · '),
          ],
          ['Seed', String(fit.seed)],
          ['Core', fit.coreVersion],
        ],
      },
      ...(warnings.length === 0
        ? []
        : [
            {
              kind: 'list' as const,
              items: warnings.map((warning) => {
                const { says, tryNext } = warningText(warning);
                return `${says} ${tryNext}`;
              }),
            },
          ]),
    ],
  };
}
