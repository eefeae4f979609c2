import type { Axis, Repair, RepairChange, Span } from '../../workers/contract/series.ts';
import { axesOf, gapSpans } from '../format/repairText.ts';

/** Whether it makes a difference which of two neighbouring repairs comes first. */
export function orderMatters(first: Repair, second: Repair): boolean {
  const kinds = [first.kind, second.kind];
  if (kinds.every((kind) => kind === 'scale') || kinds.every((kind) => kind === 'regrid')) return true;
  return kinds.includes('regrid') && kinds.some((kind) => kind === 'gap' || kind === 'gaps');
}

/**
 * The list with one repair exchanged with its neighbour. A gap that changes sides with a regrid keeps its time: before it, it
 * names the readings that fall into its places; behind it, every place it reaches.
 *
 * @param by −1 for the neighbour before, 1 for the one behind
 * @returns the same list where there is no such neighbour
 */
export function moveRepair(raw: Axis, repairs: readonly Repair[], id: string, by: -1 | 1): readonly Repair[] {
  const at = repairs.findIndex((repair) => repair.id === id);
  const low = Math.min(at, at + by);
  const [first, second] = [repairs[low], repairs[low + 1]];
  if (at < 0 || low < 0 || first === undefined || second === undefined) return repairs;
  const { step } = axesOf(raw, repairs)[low]!;
  const swapped = [ahead(second, first, step), behind(first, second, step)];
  return [...repairs.slice(0, low), ...swapped, ...repairs.slice(low + 2)];
}

/** `moved` stood behind `other` and now stands before it. */
function ahead(moved: Repair, other: Repair, step: number): Repair {
  if (other.kind !== 'regrid') return moved;
  const ratio = other.step / step;
  return withSpans(moved, (span) => ({ from: Math.ceil(span.from * ratio), to: Math.ceil(span.to * ratio) }));
}

/** `moved` stood before `other` and now stands behind it. */
function behind(moved: Repair, other: Repair, step: number): Repair {
  if (other.kind !== 'regrid') return moved;
  const ratio = step / other.step;
  return withSpans(moved, (span) => ({ from: Math.floor(span.from * ratio), to: Math.ceil(span.to * ratio) }));
}

function withSpans(repair: Repair, move: (span: Span) => Span): Repair {
  if (repair.kind !== 'gap' && repair.kind !== 'gaps') return repair;
  const runs: number[] = [];
  let end = 0;
  for (const { from, to } of gapSpans(repair).map(move)) {
    if (to <= end) continue;
    const begin = Math.max(from, end);
    // Stretches that now touch become one.
    if (begin === end && runs.length > 0) runs[runs.length - 1]! += to - begin;
    else runs.push(begin - end, to - begin);
    end = to;
  }
  const { id, at, why } = repair;
  const [from = 0, length = 1] = runs;
  const change: RepairChange =
    repair.kind === 'gap' ? { kind: 'gap', from, to: from + length } : { kind: 'gaps', runs };
  return { id, at, why, ...change };
}
