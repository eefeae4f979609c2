import { normalUpperTail } from '../distributions/normalUpperTail.ts';
import type { Fit } from '../contract/fit.ts';

/** A coefficient that the record does not show to differ from 0. */
export interface NeedlessCoefficient {
  readonly name: string;
  readonly estimate: number;
  readonly standardError: number;
  /** Two-sided, normal. */
  readonly p: number;
}

/**
 * Coefficients that could be left out, by estimate over standard error.
 *
 * Method: two-sided normal (Wald) test. Of each ARMA factor only the highest lag is judged: a lower one may be near 0 in a model of the right
 * order. Level and regression coefficients are each judged.
 *
 * @param fit with standard errors; none gives an empty list; @param size of the test, such as 0.05
 * @returns least needed first
 */
export function needlessCoefficients(
  { names, parameters, standardErrors, candidate }: Fit,
  size: number,
): NeedlessCoefficient[] {
  if (standardErrors === null) return [];
  const { zeroLags, level } = candidate;
  const factors = [
    { values: parameters.ar, held: zeroLags.ar },
    { values: parameters.ma, held: zeroLags.ma },
    { values: parameters.seasonalAr, held: zeroLags.seasonalAr },
    { values: parameters.seasonalMa, held: zeroLags.seasonalMa },
  ];
  // Estimated coefficients in the order of `names`, each with whether it is judged.
  const entries = factors.flatMap(({ values, held }) =>
    values.flatMap((estimate, i) => (held.includes(i + 1) ? [] : [{ estimate, judged: i === values.length - 1 }])),
  );
  if (level !== 'none') entries.push({ estimate: parameters.mean, judged: true });
  entries.push(...parameters.regression.map((estimate) => ({ estimate, judged: true })));
  return entries
    .flatMap(({ estimate, judged }, i) => {
      const standardError = standardErrors[i]!;
      const p = 2 * normalUpperTail(Math.abs(estimate) / standardError);
      return judged && p > size ? [{ name: names[i]!, estimate, standardError, p }] : [];
    })
    .sort((one, other) => other.p - one.p);
}
