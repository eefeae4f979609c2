import { symmetricEigen } from '../numeric/matrix.ts';
import type { ResidualSpread } from './residualSpread.ts';

/** An eigenvalue this small is rounding. */
const NOTHING = 1e-10;

/**
 * Weights of the chi-squares (1 degree of freedom each) that Σ_{k≤m} n r̂_k² is a sum of, asymptotically.
 *
 * Method: the eigenvalues of I − QQ′ over the first m lags (Box & Pierce 1970; Ljung 1986, Biometrika 73, 725–730): 1 − g with g those of the
 * small matrix Q′Q, and 1 for the rest.
 *
 * @param spread over at least m lags; @param lags m ≥ 1
 * @returns weights in (0, 1], zeros left out; their sum is m − tr Q′Q
 */
export function quadraticWeights({ rank, basis }: ResidualSpread, lags: number): Float64Array {
  const gram = new Float64Array(rank * rank);
  for (let k = 0; k < lags; k++)
    for (let a = 0; a < rank; a++)
      for (let b = 0; b < rank; b++) gram[a * rank + b]! += basis[k * rank + a]! * basis[k * rank + b]!;
  // Of Q′Q at most `lags` eigenvalues differ from 0, and QQ′ has the same ones.
  const own = rank === 0 ? [] : Array.from(symmetricEigen({ n: rank, values: gram }).values);
  const taken = own.sort((one, other) => other - one).slice(0, lags);
  const weights = [...new Array<number>(lags - taken.length).fill(1), ...taken.map((g) => 1 - Math.min(g, 1))];
  return Float64Array.from(weights.filter((weight) => weight > NOTHING));
}
