const QUARTER = 900;

/** Offsets of an IANA zone from UTC in seconds, remembered by quarter of an hour (no zone changes its clock in between). */
class ZoneOffsets {
  private readonly known = new Map<number, number>();
  private readonly clock: Intl.DateTimeFormat;

  constructor(zone: string) {
    this.clock = new Intl.DateTimeFormat('en-US', {
      timeZone: zone,
      hourCycle: 'h23',
      year: 'numeric',
      month: 'numeric',
      day: 'numeric',
      hour: 'numeric',
      minute: 'numeric',
      second: 'numeric',
    });
  }

  at(utc: number): number {
    const quarter = Math.floor(utc / QUARTER);
    let offset = this.known.get(quarter);
    if (offset === undefined) {
      offset = this.compute(quarter * QUARTER);
      this.known.set(quarter, offset);
    }
    return offset;
  }

  private compute(utc: number): number {
    const part: Record<string, number> = {};
    for (const { type, value } of this.clock.formatToParts(utc * 1000)) part[type] = Number(value);
    const shown = Date.UTC(
      part['year']!,
      part['month']! - 1,
      part['day'],
      part['hour'],
      part['minute'],
      part['second'],
    );
    return shown / 1000 - utc;
  }
}

/** Whether the platform knows an IANA zone by this name. */
export function isZone(zone: string): boolean {
  try {
    return new Intl.DateTimeFormat('en-US', { timeZone: zone }).resolvedOptions().timeZone !== '';
  } catch {
    return false;
  }
}

/** True times, and the rows where the clock was changed: `missing` stamps name times the clock skipped. */
export interface Resolved {
  readonly times: Float64Array;
  readonly twice: readonly number[];
  readonly missing: readonly number[];
}

/**
 * True epoch seconds of local stamps in a zone with clock changes.
 *
 * Method: a local time t belongs to the instant t − o for every offset o of the zone near it that holds at t − o. The hour
 * that exists twice goes to its first pass until the stamps turn back, then to the second; a time that the clock skipped
 * is refused.
 *
 * @param local seconds shown by the clock, in the order of the file, NaN where unreadable
 * @param zone IANA name known to the platform
 * @returns instants, NaN where the local time does not exist, and rows in the doubled and in the skipped hour
 */
export function resolveZone(local: Float64Array, zone: string): Resolved {
  const offsets = new ZoneOffsets(zone);
  const times = new Float64Array(local.length).fill(NaN);
  const [twice, missing]: [number[], number[]] = [[], []];
  let before = -Infinity;
  for (let row = 0; row < local.length; row++) {
    const shown = local[row]!;
    if (Number.isNaN(shown)) continue;
    const early = shown - offsets.at(shown - 86400);
    const late = shown - offsets.at(shown + 86400);
    const [earlyHolds, lateHolds] = [early + offsets.at(early) === shown, late + offsets.at(late) === shown];
    if (!earlyHolds && !lateHolds) {
      missing.push(row);
      continue;
    }
    let instant = earlyHolds ? early : late;
    if (earlyHolds && lateHolds && early !== late) {
      twice.push(row);
      const [first, second] = [Math.min(early, late), Math.max(early, late)];
      instant = first > before ? first : second;
    }
    times[row] = instant;
    before = instant;
  }
  return { times, twice, missing };
}
