import type { Transform } from '../contract/candidate.ts';
import type { AdviceReason, SpreadAgainstLevel, Sureness } from '../contract/shape.ts';

/** A transform bends nothing to speak of where the highest level is less than this many times the lowest. */
const BENDS = 1.5;
/** t-ratio and size of a slope worth a transform. */
const STANDS = 2.5;
const WORTH = 0.25;

export interface TransformAdvice {
  readonly transform: Transform;
  readonly sureness: Sureness;
  readonly reasons: readonly AdviceReason[];
}

/**
 * Which transform to try first.
 *
 * Method: a spread that grows with the level, seen in the slope of `spreadAgainstLevel`, calls for the power that `boxCoxLambda` gives, rounded to the nearest of
 * −1, −½, 0 (the logarithm), ½ within its interval (Box & Cox 1964, J. R. Stat. Soc. B 26, §4, advise a simple power near λ̂).
 *
 * @param spread with its λ
 * @returns no transform where readings are not all positive, levels hardly differ, or the spread does not grow
 */
export function adviseTransform(spread: SpreadAgainstLevel): TransformAdvice {
  const { slope, slopeError, levelRatio, lambda } = spread;
  const none = (sureness: Sureness, reason: Omit<AdviceReason, 'about'>): TransformAdvice => ({
    transform: { kind: 'none' },
    sureness,
    reasons: [{ about: 'transform', ...reason }],
  });
  if (lambda === null || Number.isNaN(levelRatio)) return none('clear', { code: 'notPositive', numbers: {} });
  if (levelRatio < BENDS) return none('clear', { code: 'levelsAlike', numbers: { ratio: levelRatio } });
  const stands = slope / slopeError;
  const { value, from, to } = lambda;
  if (!(stands > STANDS && slope > WORTH) || (from <= 1 && to >= 1)) {
    const sureness = stands > STANDS || to < 1 ? 'open' : 'clear';
    return none(sureness, { code: 'spreadEven', numbers: { slope, error: slopeError } });
  }
  const simple = [0, 0.5, -0.5, -1].filter((power) => power >= from && power <= to);
  const power = nearest(simple.length > 0 ? simple : [-1, -0.5, 0, 0.5, 1], value);
  return {
    transform: power === 0 ? { kind: 'log' } : power === 1 ? { kind: 'none' } : { kind: 'boxCox', lambda: power },
    sureness: stands > 4 && simple.length > 0 ? 'clear' : 'likely',
    reasons: [
      { about: 'transform', code: 'spreadGrows', numbers: { slope, error: slopeError, ratio: levelRatio } },
      { about: 'transform', code: 'lambda', numbers: { value, from, to } },
    ],
  };
}

function nearest(powers: readonly number[], value: number): number {
  return powers.reduce((best, power) => (Math.abs(power - value) < Math.abs(best - value) ? power : best));
}
