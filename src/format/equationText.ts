import type { Equation } from '../../workers/contract/diagnostics.ts';
import type { SignConvention } from '../../workers/contract/envelope.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import { coefficientName } from './notation.ts';
import { formatNumber, formatWithUncertainty, subscript, superscript } from './numbers.ts';

/** One estimated coefficient as it is printed in the sign convention in use. */
export interface EstimateLine {
  readonly name: string;
  readonly value: string;
  readonly uncertainty: string;
  readonly unit: string;
}

/** What a convention does to a stored coefficient: stored signs are z_t = Σ φz + e_t + Σ θe. */
function shownSign(name: string, signs: SignConvention): 1 | -1 {
  const ma = name.startsWith('θ') || name.startsWith('Θ');
  const ar = name.startsWith('φ') || name.startsWith('Φ');
  if (signs === 'minus' && ma) return -1;
  return signs === 'polynomial' && ar ? -1 : 1;
}

export function signSentence(signs: SignConvention): string {
  return {
    plus: 'Signs: φ(B) = 1 − Σ φᵢBⁱ and θ(B) = 1 + Σ θⱼBʲ',
    minus: 'Signs: φ(B) = 1 − Σ φᵢBⁱ and θ(B) = 1 − Σ θⱼBʲ',
    polynomial: 'Signs: φ(B) = 1 + Σ φᵢBⁱ and θ(B) = 1 + Σ θⱼBʲ, coefficients as they stand in the polynomials',
  }[signs];
}

/** Estimates in the order of the fit, then the constant and σ; a value is rounded to its uncertainty. */
export function estimateLines(fit: Fit, equation: Equation, signs: SignConvention, unit: string): EstimateLine[] {
  const { parameters, names, standardErrors } = fit;
  const free = (values: readonly number[], held: readonly number[]) => values.filter((_, i) => !held.includes(i + 1));
  const { zeroLags, level, order } = fit.candidate;
  const values = [
    ...free(parameters.ar, zeroLags.ar),
    ...free(parameters.ma, zeroLags.ma),
    ...free(parameters.seasonalAr, zeroLags.seasonalAr),
    ...free(parameters.seasonalMa, zeroLags.seasonalMa),
    ...(level === 'none' ? [] : [parameters.mean]),
    ...parameters.regression,
  ];
  const lines = names.map((name, i): EstimateLine => {
    const shown = formatWithUncertainty(shownSign(name, signs) * values[i]!, standardErrors?.[i] ?? null);
    const ofLevel = name === 'mean' || name === 'drift';
    return {
      name: coefficientName(name),
      ...shown,
      unit: ofLevel ? (name === 'drift' ? `${unit} per step`.trim() : unit) : '',
    };
  });
  const tail: EstimateLine[] = [];
  if (level !== 'none' && order.p + order.P > 0)
    tail.push({ name: 'constant', value: formatNumber(equation.constant, 5), uncertainty: '', unit });
  tail.push({ name: 'σ', value: formatNumber(Math.sqrt(parameters.innovationVariance), 4), uncertainty: '', unit });
  return [...lines, ...tail];
}

/** The fitted difference equation in numbers, then what its level is: mean and constant both named. */
export function equationLines(fit: Fit, equation: Equation, unit: string): string[] {
  const { order, level } = fit.candidate;
  const record = differenced(fit);
  const ar = terms(equation.ar, (lag) => `${record}${lagged(lag)}`);
  const ma = terms(equation.ma, (lag) => `e${lagged(lag)}`);
  const constant = level === 'none' || equation.constant === 0 ? '' : signed(equation.constant, ar === '');
  const right = `${ar}${constant === '' ? '' : `${ar === '' ? '' : ' '}${constant}`}`;
  const lines = [`${record}ₜ = ${right}${right === '' ? '' : ' + '}eₜ${ma === '' ? '' : ` ${leading(ma)}`}`];
  const own = unit === '' ? '' : ` ${unit}`;
  if (level !== 'none') {
    const word = level === 'mean' ? 'Mean' : 'Drift (mean of the differenced record)';
    lines.push(
      `${word} ${formatNumber(equation.mean, 6)}${own}; constant ${formatNumber(equation.constant, 6)}${own}: the constant is the ${level} times φ(1), not the ${level}.`,
    );
  } else lines.push('No level is estimated: mean and constant are both 0.');
  if (order.d + order.D > 0) lines.push(`${record}ₜ is the record differenced.`);
  return lines;
}

function differenced({ candidate: { order, transform } }: Fit): string {
  const nabla = order.d === 0 ? '' : `∇${order.d > 1 ? superscript(order.d) : ''}`;
  const seasonal = order.D === 0 ? '' : `∇${subscript(order.s)}${order.D > 1 ? superscript(order.D) : ''}`;
  const base = transform.kind === 'none' ? 'z' : transform.kind === 'log' ? 'ln z' : 'z⁽λ⁾';
  return `${nabla}${seasonal}${base}`;
}

function lagged(lag: number): string {
  return `ₜ₋${subscript(lag)}`;
}

function terms(coefficients: Float64Array, name: (lag: number) => string): string {
  const parts: string[] = [];
  coefficients.forEach((value, i) => {
    if (value !== 0) parts.push(`${signed(value, parts.length === 0)} ${name(i + 1)}`);
  });
  return parts.join(' ');
}

function signed(value: number, first: boolean): string {
  const size = formatNumber(Math.abs(value), 4);
  if (first) return value < 0 ? `−${size}` : size;
  return value < 0 ? `− ${size}` : `+ ${size}`;
}

/** The first MA term after e_t needs a sign of its own. */
function leading(ma: string): string {
  return ma.startsWith('−') ? `− ${ma.slice(1)}` : `+ ${ma}`;
}
