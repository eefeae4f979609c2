import type { Criteria } from '../contract/fit.ts';

/**
 * Information criteria from one ln L.
 *
 * Sources: Akaike 1974, IEEE TAC 19, 716–723; Hurvich & Tsai 1989, Biometrika 76, 297–307 (AICc); Schwarz 1978, Ann.
 * Stat. 6, 461–464 (BIC); Hannan & Quinn 1979, JRSS B 41, 190–195.
 *
 * @param logLikelihood natural logarithm, all constants kept
 * @param parameterCount k: every estimated coefficient, level, regression coefficients, an estimated λ and σ²
 * @param readings N, the readings the likelihood is of
 * @returns AIC −2L + 2k; AICc −2L + 2kN/(N − k − 1), null where N − k − 1 ≤ 0; BIC −2L + k ln N; HQ −2L + 2k ln ln N
 */
export function criteriaOf(logLikelihood: number, parameterCount: number, readings: number): Criteria {
  const deviance = -2 * logLikelihood;
  const room = readings - parameterCount - 1;
  return {
    aic: deviance + 2 * parameterCount,
    aicc: room > 0 ? deviance + (2 * parameterCount * readings) / room : null,
    bic: deviance + parameterCount * Math.log(readings),
    hq: deviance + 2 * parameterCount * Math.log(Math.log(readings)),
  };
}
