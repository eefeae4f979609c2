const PRIMES = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37];

/** Coordinates that have a prime of their own; further ones must be filled at random. */
export const haltonDimensions = PRIMES.length;

/**
 * One point of Halton's sequence, which fills the unit cube more evenly than random points do: its first N points leave no box much
 * emptier than its volume.
 *
 * Method: coordinate j is the radical inverse of the index in the j-th prime base (Halton 1960, Numer. Math. 2, 84–90,
 * doi:10.1007/BF01386213), shifted modulo 1 (Cranley & Patterson 1976, SIAM J. Numer. Anal. 13, 904–914), so that a mean over the points is
 * unbiased over random shifts.
 *
 * @param index ≥ 1
 * @param shift one number of [0, 1) a coordinate, at most 12
 * @param point receives as many values in [0, 1)
 * @example index 1, 2, 3 without shift in base 2: 1/2, 1/4, 3/4
 */
export function haltonPoint(index: number, shift: ArrayLike<number>, point: Float64Array): void {
  if (shift.length > PRIMES.length)
    throw new RangeError(`Halton points have at most ${PRIMES.length} coordinates, not ${shift.length}.`);
  for (let j = 0; j < shift.length; j++) {
    const base = PRIMES[j]!;
    let inverse = 0;
    let place = 1 / base;
    for (let rest = index; rest > 0; rest = Math.floor(rest / base), place /= base) inverse += (rest % base) * place;
    const sum = inverse + shift[j]!;
    point[j] = sum >= 1 ? sum - 1 : sum;
  }
}
