/**
 * Which readings fix the starting values of a differenced record with gaps.
 *
 * Every record with ∇ᵈ∇ₛᴰ y = 0 is a combination of d + sD starting values; a reading that is not yet determined by those
 * before it is spent on them, all others are used. Method: Gram–Schmidt on the rows of that dependence, in time order.
 *
 * @param values the record, gaps as NaN; @param differencing c_0…c_m₀
 * @returns `rank` ≤ m₀, and `spent[t]` 1 for the readings that raised it
 */
export function startingValues(values: Float64Array, differencing: Float64Array): { rank: number; spent: Uint8Array } {
  const size = differencing.length - 1;
  const spent = new Uint8Array(values.length);
  const basis: Float64Array[] = [];
  const rows: Float64Array[] = Array.from({ length: size }, (_, k) => {
    const unit = new Float64Array(size);
    unit[k] = 1;
    return unit;
  });
  // rows[k] is the dependence of the value k + 1 steps back.
  for (let t = 0; t < values.length && basis.length < size; t++) {
    const now = new Float64Array(size);
    for (let i = 1; i <= size; i++) {
      const c = differencing[i]!;
      if (c !== 0) for (let k = 0; k < size; k++) now[k]! -= c * rows[i - 1]![k]!;
    }
    rows.pop();
    rows.unshift(now);
    if (Number.isNaN(values[t]!)) continue;
    const rest = independentPart(now, basis);
    if (rest === null) continue;
    basis.push(rest);
    spent[t] = 1;
  }
  return { rank: basis.length, spent };
}

/** The part of a vector outside a space given by an orthonormal basis, normalised; null where nothing is left of it. */
function independentPart(vector: Float64Array, basis: readonly Float64Array[]): Float64Array | null {
  const rest = vector.slice();
  const whole = Math.hypot(...vector);
  for (let pass = 0; pass < 2; pass++) {
    for (const unit of basis) {
      let along = 0;
      for (let k = 0; k < rest.length; k++) along += rest[k]! * unit[k]!;
      for (let k = 0; k < rest.length; k++) rest[k]! -= along * unit[k]!;
    }
  }
  const length = Math.hypot(...rest);
  if (!(length > 1e-9 * whole)) return null;
  return rest.map((value) => value / length);
}
