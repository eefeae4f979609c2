import type { Fit } from '../contract/fit.ts';
import type { SweepRanking } from '../contract/selection.ts';
import { isNested } from '../estimation/neighbourStarts.ts';
import { comparisonGroups } from './comparisonGroups.ts';

/** A larger fit with a cancelling pair that gains less than this in ln L says nothing that the smaller does not. */
const NOTHING_NEW = 1;
/** Differences in AICc within which fits are about as good (Burnham & Anderson 2002, §2.6). */
const NEAR = 2;

/**
 * The standing of a sweep's fits, and which of them are the same model twice.
 *
 * A fit with an AR and an MA root that cancel within their uncertainty is folded into a nested one whose ln L is less than 1 below. The groups
 * and weights are of all fits that are not folded; indices are those of `fits`.
 */
export function rankSweep(fits: readonly Fit[]): SweepRanking {
  const folded = fits.flatMap((fit, index) => {
    const cancels = fit.warnings.some(({ code }) => code === 'commonFactor' || code === 'spuriousPair');
    if (!cancels) return [];
    const into = fits
      .map((other, at) => ({ other, at }))
      .filter(
        ({ other, at }) =>
          at !== index &&
          other.parameterCount < fit.parameterCount &&
          fit.logLikelihood - other.logLikelihood < NOTHING_NEW &&
          isNested(other.candidate, fit.candidate),
      )
      .sort((one, two) => one.other.parameterCount - two.other.parameterCount)[0];
    return into === undefined ? [] : [{ index, into: into.at }];
  });
  const gone = new Set(folded.map(({ index }) => index));
  const kept = fits.map((fit, index) => ({ fit, index })).filter(({ index }) => !gone.has(index));
  const groups = comparisonGroups(kept.map(({ fit }) => fit)).map((group) => ({
    ...group,
    members: group.members.map((member) => ({ ...member, index: kept[member.index]!.index })),
  }));
  const members = groups[0]?.members ?? [];
  const by = groups[0]?.weightBy ?? 'aic';
  return {
    groups,
    folded,
    near: members.filter(({ differences }) => (differences[by] ?? Infinity) <= NEAR).length,
    weight: members[0]?.weight ?? 0,
  };
}
