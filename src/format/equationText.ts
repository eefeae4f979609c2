import type { Equation } from '../../workers/contract/diagnostics.ts';
import type { SignConvention } from '../../workers/contract/envelope.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import type { IntegratedIntervals, Interval } from '../../workers/contract/uncertainty.ts';
import { intervalEnds } from './intervalText.ts';
import { coefficientName } from './notation.ts';
import { formatNumber, formatWithUncertainty, subscript, superscript } from './numbers.ts';

/** One estimated coefficient as it is printed in the sign convention in use. */
export interface EstimateLine {
  readonly name: string;
  readonly value: string;
  readonly uncertainty: string;
  /** The interval that holds near boundaries too; empty where there is none. */
  readonly interval: string;
  readonly unit: string;
  /** Its name in the fit; null for σ and the constant, which follow from others. */
  readonly about: string | null;
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

/** An interval in the sign convention in use. */
export function intervalShown(
  name: string,
  signs: SignConvention,
  interval: Pick<Interval, 'lower' | 'upper'>,
): string {
  const { lower, upper } = interval;
  return shownSign(name, signs) === 1 ? intervalEnds(lower, upper) : intervalEnds(-upper, -lower);
}

/**
 * Estimates in the order of the fit, then the constant and σ; a value is rounded to its uncertainty.
 *
 * @param intervals null before they are known, or where there are none
 */
export function estimateLines(
  fit: Fit,
  equation: Equation,
  signs: SignConvention,
  unit: string,
  intervals: IntegratedIntervals | null = null,
): EstimateLine[] {
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
    const interval = intervals?.coefficients[i];
    const spread = standardErrors?.[i] ?? (interval === undefined ? null : (interval.upper - interval.lower) / 4);
    const { value } = formatWithUncertainty(shownSign(name, signs) * values[i]!, spread);
    const { uncertainty } = formatWithUncertainty(values[i]!, standardErrors?.[i] ?? null);
    const ofLevel = name === 'mean' || name === 'drift';
    return {
      name: coefficientName(name),
      value,
      uncertainty,
      interval: interval === undefined ? '' : intervalShown(name, signs, interval),
      about: name,
      unit: ofLevel ? (name === 'drift' ? `${unit} per step`.trim() : unit) : '',
    };
  });
  const tail: EstimateLine[] = [];
  if (level !== 'none' && order.p + order.P > 0)
    tail.push(
      derived(
        'constant',
        equation.constant,
        5,
        unit,
        intervals?.derived.find(({ about }) => about === 'constant'),
      ),
    );
  tail.push(derived('σ', Math.sqrt(parameters.innovationVariance), 4, unit, intervals?.sigma));
  return [...lines, ...tail];
}

function derived(
  name: string,
  value: number,
  digits: number,
  unit: string,
  interval: Interval | undefined,
): EstimateLine {
  const ends = interval === undefined ? '' : intervalEnds(interval.lower, interval.upper);
  return { name, value: formatNumber(value, digits), uncertainty: '', interval: ends, unit, about: null };
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
