import type { Fit } from '../contract/fit.ts';
import type { Comparability, ComparisonGroup, Standing } from '../contract/selection.ts';
import { comparabilityKey } from './comparabilityKey.ts';
import { criteriaDifferences } from './criteriaDifferences.ts';

/**
 * Fits sorted into groups that may be compared by criteria, with differences and weights within each.
 *
 * @param fits in any order; @param searchedEvents for each fit, see `comparabilityKey`
 * @returns the largest group first (of equal ones that with the earlier fit), and within a group the best first
 */
export function comparisonGroups(
  fits: readonly Fit[],
  searchedEvents: readonly (readonly string[])[] = [],
): ComparisonGroup[] {
  const byKey = new Map<string, { index: number; comparability: Comparability }[]>();
  fits.forEach((fit, index) => {
    const comparability = comparabilityKey(fit, searchedEvents[index]);
    const group = byKey.get(comparability.key);
    if (group) group.push({ index, comparability });
    else byKey.set(comparability.key, [{ index, comparability }]);
  });
  // Sorting is stable: of equally large groups the one met first stays first.
  const groups = [...byKey.values()].sort((one, other) => other.length - one.length);
  return groups.map((group) => {
    const { weightBy, entries } = criteriaDifferences(group.map(({ index }) => fits[index]!.criteria));
    const members: Standing[] = group.map((one, i) => ({ ...one, ...entries[i]! }));
    members.sort((one, other) => (one.differences[weightBy] ?? Infinity) - (other.differences[weightBy] ?? Infinity));
    const { comparability } = group[0]!;
    return {
      key: comparability.key,
      differsIn: differing(comparability, groups[0]![0]!.comparability),
      weightBy,
      members,
    };
  });
}

function differing(one: Comparability, other: Comparability): ComparisonGroup['differsIn'] {
  const parts: ComparisonGroup['differsIn'][number][] = [];
  // Differencing spends readings, so that their number differs with it: that is not a second reason.
  const sameDifferencing = one.d === other.d && one.D === other.D && one.s === other.s;
  const record = ({ readings }: Comparability) => readings.slice(0, readings.lastIndexOf(':'));
  if (record(one) !== record(other) || (sameDifferencing && one.readings !== other.readings)) parts.push('readings');
  if (!sameDifferencing) parts.push('differencing');
  if (one.likelihood !== other.likelihood) parts.push('likelihood');
  if (one.events !== other.events) parts.push('events');
  return parts;
}
