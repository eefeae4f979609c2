import type { DiagnoseRequest, Evidence } from '../contract/diagnostics.ts';
import type { Failure } from '../contract/failures.ts';
import type { Result } from '../contract/result.ts';
import { autocorrelation } from '../identification/autocorrelation.ts';
import { partialAutocorrelation } from '../identification/partialAutocorrelation.ts';
import { coefficientCount } from '../estimation/prepareRecord.ts';
import { equationOf } from '../model/equationOf.ts';
import { rootPoints } from '../model/rootPoints.ts';
import { diagnosticLags } from './diagnosticLags.ts';
import { innovationsOf } from './innovationsOf.ts';
import { portmanteau } from './portmanteau.ts';
import { residualCorrelogram } from './residualCorrelogram.ts';
import { residualSpread } from './residualSpread.ts';

/** Impulse responses are kept this long at most; they have died out or lie on the circle by then. */
const LONGEST_RESPONSE = 20_000;

/**
 * Everything computed to accept or reject one fit.
 *
 * Correlations and portmanteau are those of the standardised innovations, each divided by its own standard deviation, taken about zero: under
 * the model they are exactly independent with variance 1, at the start of the record and after gaps too.
 *
 * @param request fit, whole record, covariates, coverage of the bands in (0, 1), largest lag; `portmanteauLaw`: see `portmanteau`
 * @returns failures name a bad setting, or what the record lacks for the fit
 */
export function diagnoseFit(request: DiagnoseRequest): Result<Evidence> {
  const refusal = refuse(request);
  if (refusal !== null) return { ok: false, failure: refusal };
  const { fit, values, columns, coverage } = request;
  const { candidate, parameters } = fit;
  const found = innovationsOf(fit, values, columns);
  if (!found.ok) return found;
  const innovations = found.value;
  const standardised = stretch(innovations.standardised);
  const lags = diagnosticLags(fit.readingsUsed, candidate.order.s, request.lags);
  const { correlations, pairs, observed } = autocorrelation(standardised, lags, 'zero');
  const partials = partialAutocorrelation(correlations);
  const size = { length: standardised.length, observed, pairs };
  const spread = residualSpread(candidate, parameters, lags, Math.min(fit.readingsUsed, LONGEST_RESPONSE));
  return {
    ok: true,
    value: {
      fit,
      innovations,
      correlogram: residualCorrelogram(correlations, size, spread, coverage),
      partial: residualCorrelogram(partials, size, spread, coverage),
      portmanteau: portmanteau({
        method: 'ljungBox',
        correlations,
        size,
        coefficients: coefficientCount(candidate),
        ...(request.portmanteauLaw === 'weighted' ? { spread } : {}),
      }),
      roots: rootPoints(parameters, candidate.order),
      equation: equationOf(candidate, parameters),
    },
  };
}

/** From the first innovation to the last. */
function stretch(values: Float64Array): Float64Array {
  let from = 0;
  let to = values.length;
  while (from < to && Number.isNaN(values[from]!)) from++;
  while (to > from && Number.isNaN(values[to - 1]!)) to--;
  return values.subarray(from, to);
}

function refuse({ fit, values, coverage, lags }: DiagnoseRequest): Failure | null {
  const bad = (field: string, reason: 'notAWholeNumber' | 'negative' | 'tooLarge' | 'window'): Failure => ({
    code: 'badCandidate',
    field,
    reason,
  });
  if (!(coverage > 0)) return bad('coverage', 'negative');
  if (!(coverage < 1)) return bad('coverage', 'tooLarge');
  if (lags !== undefined && !Number.isInteger(lags)) return bad('lags', 'notAWholeNumber');
  if (lags !== undefined && lags < 1) return bad('lags', 'negative');
  return fit.window.to > values.length ? bad('window', 'window') : null;
}
