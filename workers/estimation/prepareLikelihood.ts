import type { Factors } from '../model/expandPolynomials.ts';
import { expandPolynomials } from '../model/expandPolynomials.ts';
import type { Parameters } from '../contract/candidate.ts';
import type { Result } from '../contract/result.ts';
import { differenceRecord } from '../series/differenceRecord.ts';
import { conditionalLikelihood, type Conditional } from './engine/conditionalLikelihood.ts';
import type { Engine } from './engine/engine.ts';
import { fastRoutes, type FastRoute } from './engine/fastRoute.ts';
import { GapFilter } from './engine/gapFilter.ts';
import { numericGradient } from './engine/numericGradient.ts';
import { ProfileGls } from './engine/profileGls.ts';
import { scaledBeta } from './scaledBeta.ts';
import { columnsForGaps, withoutGaps } from './engine/columnsForGaps.ts';
import { prepareRecord, type PreparedRecord, type PrepareRequest } from './prepareRecord.ts';

/** ln L with level, regression and σ² profiled out, and their values there, in the record's own units. */
export interface Concentrated {
  readonly logLikelihood: number;
  /** Mean or drift first, then the regression coefficients. */
  readonly beta: Float64Array;
  readonly innovationVariance: number;
  /** X′V⁻¹X/σ², row-major: the information on `beta` for known coefficients. */
  readonly betaInformation: Float64Array;
}

/** A record and candidate made ready: everything that does not depend on the coefficients is done. */
export interface PreparedLikelihood {
  readonly readingsUsed: number;
  readonly engine: Engine['kind'];
  readonly columnNames: readonly string[];
  readonly scale: number;
  readonly centre: number;
  readonly logJacobian: number;
  readonly prepared: PreparedRecord;
  /** −Infinity outside the stationary region. */
  readonly concentrated: (factors: Factors) => Concentrated;
  /** ln L; writes its gradient by φ, θ, Φ, Θ in this order. */
  readonly concentratedWithGradient: (factors: Factors, gradient: Float64Array) => number;
  /** Level and regression where the gradient was taken last, in the record's own units. */
  readonly lastBeta: () => Float64Array;
  /** Conditional sum of squares and what it implies; only without gaps. */
  readonly conditional: (factors: Factors) => Conditional;
  /** Exact ln L at fixed parameters, nothing profiled. */
  readonly atParameters: (at: Parameters) => number;
}

/**
 * Prepares the exact Gaussian likelihood of a record under a candidate's order, level and regressors.
 *
 * ln L is that of the record with a flat prior on its d + sD starting values, all constants kept, in the units of the
 * readings (the transform's Jacobian summed over the readings used). The engine is chosen by the record and the cost: without gaps, or
 * with gaps whose pulses do not all meet, the fast one, by phases of the season where that is long; else the filter, with differencing with its diffuse start. Where rounding would eat
 * the fast one's answer the filter takes over.
 *
 * @param request values (gaps as NaN), a checked candidate, window, covariates by name, λ
 * @returns see PreparedLikelihood; failures as `prepareRecord`
 */
export function prepareLikelihood(request: PrepareRequest): Result<PreparedLikelihood> {
  const made = prepareRecord(request);
  if (!made.ok) return made;
  const prepared = made.value;
  const { order } = request.candidate;
  const { s } = order;
  const p = order.p + s * order.P;
  const q = order.q + s * order.Q;
  const { record, columns, differencing, scale, readingsUsed } = prepared;
  const difference = (one: Float64Array) => (differencing.length > 1 ? differenceRecord(one, differencing) : one);
  const differenced = [record, ...columns].map(difference);
  const missing = columnsForGaps(record, differencing.length - 1, columns.length);
  const routes =
    missing === null
      ? []
      : fastRoutes(
          {
            series: [withoutGaps(record), ...missing.columns, ...columns].map(difference),
            flat: missing.columns.length,
            places: missing.places,
            differencing,
            readings: readingsUsed,
          },
          order,
        );
  let filter: GapFilter | null = null;
  let filterGls: ProfileGls | null = null;
  const slow = (): [GapFilter, ProfileGls] => {
    filter ??=
      prepared.gaps === 0
        ? new GapFilter(differenced, p, q, Float64Array.of(1))
        : new GapFilter([record, ...columns], p, q, differencing);
    filterGls ??= new ProfileGls(filter.count, filter.flat);
    return [filter, filterGls];
  };
  const constant = readingsUsed * Math.log(scale) - prepared.logJacobian;
  /** Where the likelihood was evaluated last. */
  let current: Pick<Engine, 'logDeterminant'>;
  let route: FastRoute | null = null;

  /** Evaluates and profiles; null outside the region. `whole`: a gradient is to follow. */
  const at = (factors: Factors, whole = false): ProfileGls | null => {
    for (const make of routes) {
      route = make();
      current = route;
      const gls = route.evaluate(factors, whole);
      if (gls !== null) return gls;
    }
    route = null;
    const { ar, ma } = expandPolynomials(factors, s);
    const [engine, gls] = slow();
    current = engine;
    return engine.evaluate(ar, ma) && gls.solve(engine.cross) ? gls : null;
  };
  const height = (gls: ProfileGls | null): number => {
    if (gls === null) return -Infinity;
    const { rss, flatLogDeterminant } = gls.profile;
    const spread = Math.log((2 * Math.PI * rss) / readingsUsed) + 1;
    return -0.5 * (readingsUsed * spread + current.logDeterminant + flatLogDeterminant) - constant;
  };
  let lastBeta = new Float64Array(columns.length);

  const value: PreparedLikelihood = {
    readingsUsed,
    engine: routes.length > 0 ? 'fast' : slow()[0].kind,
    columnNames: prepared.columnNames,
    scale,
    centre: prepared.centre,
    logJacobian: prepared.logJacobian,
    prepared,
    concentrated: (factors) => {
      const gls = at(factors);
      return describe(prepared, gls, height(gls));
    },
    concentratedWithGradient: (factors, gradient) => {
      const gls = at(factors, true);
      const value = height(gls);
      if (gls !== null) lastBeta = ownBeta(prepared, gls);
      if (gls === null) gradient.fill(0);
      else if (route !== null) route.slopes(factors, gls, gradient);
      else numericGradient(factors, (near) => height(at(near)), value, readingsUsed, gradient);
      return value;
    },
    lastBeta: () => lastBeta,
    conditional: (factors) => conditionalLikelihood(prepared, differenced, expandPolynomials(factors, s)),
    atParameters: (parameters) => {
      const gls = at(parameters);
      if (gls === null) return -Infinity;
      const rss = fixedSumOfSquares(gls, scaledBeta(prepared, parameters));
      const variance = parameters.innovationVariance / scale ** 2;
      const { flatLogDeterminant } = gls.profile;
      const spread = readingsUsed * Math.log(2 * Math.PI * variance) + rss / variance;
      return -0.5 * (spread + current.logDeterminant + flatLogDeterminant) - constant;
    },
  };
  return { ok: true, value };
}

/** Σ over the GLS sum of squares and the distance of `beta` from its optimum: no cancellation near the optimum. */
function fixedSumOfSquares(gls: ProfileGls, beta: Float64Array): number {
  const { profile } = gls;
  const k = beta.length;
  let sum = profile.rss;
  for (let i = 0; i < k; i++)
    for (let j = 0; j < k; j++)
      sum += (beta[i]! - profile.beta[i]!) * profile.information[i * k + j]! * (beta[j]! - profile.beta[j]!);
  return sum;
}

/** Level and regression in the record's own units. */
function ownBeta({ columnCentres, columnScales, scale, centre, columnNames }: PreparedRecord, gls: ProfileGls) {
  const own = gls.profile.beta.map((value, i) => (value * scale) / columnScales[i]!);
  if (columnNames[0] === 'mean') {
    own[0]! += centre;
    for (let i = 1; i < own.length; i++) own[0]! -= own[i]! * columnCentres[i]!;
  }
  return own;
}

function describe(prepared: PreparedRecord, gls: ProfileGls | null, logLikelihood: number): Concentrated {
  const k = prepared.columns.length;
  if (gls === null)
    return {
      logLikelihood,
      beta: new Float64Array(k),
      innovationVariance: NaN,
      betaInformation: new Float64Array(k * k),
    };
  const { columnCentres, columnScales, scale, readingsUsed, columnNames } = prepared;
  const { rss, information } = gls.profile;
  const variance = rss / readingsUsed;
  // In the readings' units; a centred column shifts the mean, so the information on the mean's row is carried over.
  const betaInformation = new Float64Array(k * k);
  for (let i = 0; i < k; i++)
    for (let j = 0; j < k; j++)
      betaInformation[i * k + j] =
        (information[i * k + j]! * columnScales[i]! * columnScales[j]!) / (variance * scale * scale);
  if (columnNames[0] === 'mean') uncentre(betaInformation, columnCentres, k);
  return { logLikelihood, beta: ownBeta(prepared, gls), innovationVariance: variance * scale * scale, betaInformation };
}

/** Information on (mean, β) from that on (mean + Σ β c, β): A′IA with A the identity and c in the first row. */
function uncentre(information: Float64Array, centres: readonly number[], k: number): void {
  for (let i = 1; i < k; i++) for (let j = 0; j < k; j++) information[i * k + j]! += centres[i]! * information[j]!;
  for (let j = 1; j < k; j++) for (let i = 0; i < k; i++) information[i * k + j]! += centres[j]! * information[i * k]!;
}
