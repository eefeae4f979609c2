import type { Fit } from '../contract/fit.ts';
import type { Hypothesis } from './heldMaximum.ts';
import type { Coefficients } from './heldSpace.ts';

const FACTORS: Readonly<Record<string, keyof Coefficients>> = { φ: 'ar', θ: 'ma', Φ: 'seasonalAr', Θ: 'seasonalMa' };

/** A parameter of a fit that may be put to the test. */
export interface Target {
  readonly estimate: number;
  /** Its standard error, where the fit gives one. */
  readonly spread: number | null;
  readonly at: (value: number) => Hypothesis;
}

/** The parameter with a name of `Fit.names`; null for any other name. */
export function hypothesisAbout(fit: Fit, name: string): Target | null {
  const place = fit.names.indexOf(name);
  if (place < 0) return null;
  const spread = fit.standardErrors?.[place] ?? null;
  const found = coefficientNamed(name);
  if (found !== null) {
    const estimate = fit.parameters[found.factor][found.lag - 1]!;
    return { estimate, spread, at: (value) => ({ kind: 'coefficient', ...found, value }) };
  }
  const free = fit.names.filter((other) => coefficientNamed(other) !== null).length;
  const column = place - free;
  const level = fit.candidate.level === 'none' ? 0 : 1;
  const estimate = column < level ? fit.parameters.mean : fit.parameters.regression[column - level]!;
  return { estimate, spread, at: (value) => ({ kind: 'column', column, value }) };
}

/** Values a parameter can take: |c_j| of a stationary or invertible polynomial is at most the binomial (p over j). */
export function rangeOf(fit: Fit, name: string): { readonly lower: number; readonly upper: number } {
  const found = coefficientNamed(name);
  if (found === null) return { lower: -Infinity, upper: Infinity };
  const p = fit.parameters[found.factor].length;
  let most = 1;
  for (let j = 1; j <= found.lag; j++) most = (most * (p - j + 1)) / j;
  return { lower: -most, upper: most };
}

function coefficientNamed(name: string): { readonly factor: keyof Coefficients; readonly lag: number } | null {
  const factor = FACTORS[name.charAt(0)];
  const lag = Number(name.slice(1));
  return factor === undefined || !Number.isInteger(lag) || lag < 1 ? null : { factor, lag };
}
