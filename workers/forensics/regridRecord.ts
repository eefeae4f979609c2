import type { Axis, Repair } from '../contract/series.ts';

/** Largest distance from a place, as a fraction of the new step, that `nearest` accepts: the same as on reading a file. */
export const TOLERANCE = 0.25;
/** Fractions of a step below this are rounding of the stamps. */
const ROUNDING = 1e-6;

type Rule = Extract<Repair, { kind: 'regrid' }>['rule'];

/**
 * Puts readings on a coarser grid with the same first place.
 *
 * Method by rule. `nearest`: the reading nearest to each place within a quarter of the step, the earlier of equals.
 * `binMean`: mean of the readings observed in [k·step, (k + 1)·step), stamped with its beginning. `last`: the last reading
 * observed in ((k − 1)·step, k·step], stamped with its end. A place that no reading reaches is a gap.
 *
 * @param values n readings, gaps as NaN; @param axis of `values`; @param step new step in the unit of the axis, not below the old
 * @returns a new array; its axis is that of `values` with the new step
 */
export function regridRecord(values: Float64Array, axis: Axis, step: number, rule: Rule): Float64Array {
  const n = values.length;
  const turns = (t: number) => (t * axis.step) / step;
  const placeOf = (t: number) => {
    if (rule === 'nearest') return Math.round(turns(t));
    return rule === 'binMean' ? Math.floor(turns(t) + ROUNDING) : Math.ceil(turns(t) - ROUNDING);
  };
  const places = rule === 'nearest' ? Math.floor(turns(n - 1) + TOLERANCE) + 1 : placeOf(n - 1) + 1;
  const result = new Float64Array(places).fill(NaN);
  const held = new Float64Array(places);
  for (let t = 0; t < n; t++) {
    const value = values[t]!;
    const place = placeOf(t);
    if (Number.isNaN(value) || place >= places) continue;
    const empty = Number.isNaN(result[place]!);
    if (rule === 'last') result[place] = value;
    else if (rule === 'binMean') {
      held[place]!++;
      result[place] = empty ? value : result[place]! + (value - result[place]!) / held[place]!;
    } else {
      const off = Math.abs(turns(t) - place);
      if (off > TOLERANCE || (!empty && off >= held[place]! - ROUNDING)) continue;
      result[place] = value;
      held[place] = off;
    }
  }
  return result;
}
