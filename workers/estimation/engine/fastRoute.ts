import type { Order } from '../../contract/candidate.ts';
import { expandPolynomials, type Factors } from '../../model/expandPolynomials.ts';
import { FastEngine } from './fastEngine.ts';
import { FastGradient } from './fastGradient.ts';
import { GapPulses } from './gapPulses.ts';
import { ProfileGls } from './profileGls.ts';
import { SeasonalEngine } from './seasonalEngine.ts';
import { SeasonalGradient } from './seasonalGradient.ts';

/** A differenced record without gaps, its columns, and what stands for its gaps. */
export interface FastRecord {
  /** Record, flat columns, others; differenced. */
  readonly series: readonly Float64Array[];
  readonly flat: number;
  /** Pulses of further gaps. */
  readonly places: Int32Array;
  readonly differencing: Float64Array;
  readonly readings: number;
}

/** One of the engines without gaps, with the pulses that stand for gaps beside it. */
export interface FastRoute {
  readonly logDeterminant: number;
  /** Evaluates and profiles; null outside the region or where another engine must do. `whole`: a gradient is to follow. */
  evaluate(factors: Factors, whole: boolean): ProfileGls | null;
  /** Writes the gradient where it evaluated last. */
  slopes(factors: Factors, gls: ProfileGls, gradient: Float64Array): void;
}

/** The routes worth trying for an order, the best first: by phases of a long season, then in one piece. Each is made when first wanted. */
export function fastRoutes(record: FastRecord, order: Order): readonly (() => FastRoute)[] {
  const n = record.series[0]!.length;
  const plain = onceMade(() => {
    const p = order.p + order.s * order.P;
    const q = order.q + order.s * order.Q;
    const make = (series: readonly Float64Array[]) => new FastEngine(series, p, q, record.flat);
    return routeOf(record, order, make, {
      evaluate: (engine, factors, whole) => {
        const { ar, ma } = expandPolynomials(factors, order.s);
        return engine.evaluate(ar, ma, whole);
      },
      gradient: (engine, pulses) => new FastGradient(engine, order, record.readings, pulses),
    });
  });
  if (!SeasonalEngine.fits(order, n)) return [plain];
  const byPhase = onceMade(() =>
    routeOf(record, order, (series) => new SeasonalEngine(series, order, record.flat), {
      evaluate: (engine, factors) => engine.evaluate(factors, order.s),
      gradient: (engine, pulses) => new SeasonalGradient(engine, order, record.readings, pulses),
    }),
  );
  return [byPhase, plain];
}

interface Manner<E> {
  readonly evaluate: (engine: E, factors: Factors, whole: boolean) => boolean;
  readonly gradient: (engine: E, pulses: GapPulses | null) => Pick<FastGradient, 'write'>;
}

function routeOf<E extends FastEngine | SeasonalEngine>(
  { series, flat, places, differencing }: FastRecord,
  order: Order,
  make: (series: readonly Float64Array[]) => E,
  manner: Manner<E>,
): FastRoute {
  const engine = make(series);
  const gls = new ProfileGls(series.length, flat);
  const near = onceMade(() => make([new Float64Array(engine.observed)]));
  const degree = order.q + order.s * order.Q;
  const pulses = places.length === 0 ? null : new GapPulses(engine, near, places, differencing, order.s, degree);
  const gradient = onceMade(() => manner.gradient(engine, pulses));
  return {
    get logDeterminant() {
      return (pulses ?? engine).logDeterminant;
    },
    evaluate: (factors, whole) => {
      if (!manner.evaluate(engine, factors, whole || pulses !== null)) return null;
      if (pulses !== null && !pulses.evaluate(factors)) return null;
      return gls.solve((pulses ?? engine).cross) ? gls : null;
    },
    slopes: (factors, solved, result) => gradient().write(factors, solved, result),
  };
}

/** What a call makes, made at the first one. */
function onceMade<T>(make: () => T): () => T {
  let made: { readonly value: T } | null = null;
  return () => (made ??= { value: make() }).value;
}
