import { describe, expect, it } from 'vitest';
import { checkPlaces } from '../../../workers/reading/grid/checkPlaces.ts';
import { fillGrid } from '../../../workers/reading/grid/fillGrid.ts';
import { findGrid, type Grid } from '../../../workers/reading/grid/findGrid.ts';
import { placeOnGrid } from '../../../workers/reading/grid/placeOnGrid.ts';

const utc = (iso: string) => Date.parse(`${iso}Z`) / 1000;
const base = utc('2024-05-01T08:00');
const after = (...minutes: number[]) => Float64Array.from(minutes, (minute) => base + 60 * minute);

describe('findGrid', () => {
  it('finds the interval through gaps, and where it starts', () => {
    const found = findGrid(after(3, 13, 23, 53, 63, 73, 83, 143), true, null)!;
    expect(found.grid).toMatchObject({ kind: 'seconds', step: 600 });
    expect([found.start, found.places, found.bad]).toEqual([base + 180, 15, 0]);
  });

  it('finds the interval of a clock behind stamps that jitter, and sets the grid on whole minutes', () => {
    const jitter = [4, -7, 11, -2, 0, 9, -12, 5, -3, 8, -6, 2];
    const times = Float64Array.from(jitter, (seconds, k) => base + 600 * k + seconds);
    expect(findGrid(times, true, null)).toMatchObject({ start: base, grid: { step: 600 }, bad: 0, places: 12 });
  });

  it('follows a clock that runs slow when a record is long', () => {
    const times = Float64Array.from({ length: 20_000 }, (_, k) => Math.round(base + 600.05 * k));
    const found = findGrid(times, true, null)!;
    expect(found.grid.step).toBeCloseTo(600.05, 4);
    expect([found.bad, found.places]).toEqual([0, 20_000]);
  });

  it('takes the shorter interval where the sampling changed', () => {
    const times = Float64Array.from([
      ...after(0, 10, 20, 30, 40, 50),
      ...after(...Array.from({ length: 60 }, (_, k) => 60 + k)),
    ]);
    expect(findGrid(times, true, null)).toMatchObject({ grid: { step: 60 }, bad: 0, places: 120 });
  });

  it('is not misled by a few readings logged twice, a second apart', () => {
    const times = Float64Array.from(
      [...after(0, 10, 20, 30, 40, 50, 60, 70, 80, 90), base + 1201, base + 3001].sort((a, b) => a - b),
    );
    expect(findGrid(times, true, null)).toMatchObject({ grid: { step: 600 }, places: 10 });
  });

  it('reads counts with decimals', () => {
    const found = findGrid(
      Float64Array.from({ length: 50 }, (_, k) => Number((0.1 * k).toFixed(1))),
      false,
      null,
    )!;
    expect(found.grid.kind).toBe('index');
    expect(found.grid.step).toBeCloseTo(0.1, 12);
    expect(found.places).toBe(50);
  });

  it.each([
    ['first days', (k: number) => Date.UTC(2020, k, 1), 1],
    ['last days', (k: number) => Date.UTC(2020, k + 1, 0), 1],
    [
      'the thirtieth, and the end of February',
      (k: number) => Date.UTC(2020, k + 1, 0) - (new Date(Date.UTC(2020, k + 1, 0)).getUTCDate() > 30 ? 864e5 : 0),
      1,
    ],
    ['quarters', (k: number) => Date.UTC(2020, 3 * k, 1, 6), 3],
    ['years', (k: number) => Date.UTC(2000 + k, 6, 1), 12],
    ['days that vary', (k: number) => Date.UTC(2020, k, 10 + ((k * 7) % 5)), 1],
  ])('knows months by %s', (_, stamp, step) => {
    const times = Float64Array.from({ length: 14 }, (__, k) => stamp(k) / 1000);
    expect(findGrid(times, true, null)!.grid).toMatchObject({ kind: 'months', step });
    expect(findGrid(times, true, null)!.places).toBe(14);
  });

  it('keeps four-week periods apart from months', () => {
    const times = Float64Array.from({ length: 14 }, (_, k) => base + k * 28 * 86400);
    expect(findGrid(times, true, null)!.grid).toMatchObject({ kind: 'seconds', step: 28 * 86400 });
  });

  it('needs two stamps', () => {
    expect(findGrid(Float64Array.of(base, base, NaN), true, null)).toBeNull();
  });
});

describe('placing by each rule', () => {
  const times = after(0, 4, 9, 10, 11, 19, 30);
  const values = Float64Array.of(1, 2, 3, 4, 5, NaN, 7);
  const lay = (rule: Grid['rule'], tolerance = 0.25) => {
    const found = findGrid(times, true, { kind: 'seconds', step: 600, rule, tolerance })!;
    const placement = placeOnGrid(times, values, found);
    return { found, placement, filled: [...fillGrid(values, placement, rule)] };
  };

  it('nearest within the tolerance; the nearest of several stays', () => {
    const { filled, placement } = lay('nearest');
    expect(filled).toEqual([1, 4, NaN, 7]);
    expect([placement.offGridCount, placement.duplicateCount]).toEqual([1, 2]);
    expect(placement.offGrid).toEqual([1]);
  });

  it('mean of the bin, stamped with its beginning', () => {
    // [0, 10): 1, 2, 3; [10, 20): 4, 5 and a gap; [20, 30): none; [30, 40): 7.
    const { filled, found } = lay('binMean');
    expect(found.start).toBe(base);
    expect(filled).toEqual([2, 4.5, NaN, 7]);
  });

  it('last value of the bin, stamped with its end', () => {
    // (−10, 0]: 1; (0, 10]: 2, 3, 4; (10, 20]: 5 and a gap behind it; (20, 30]: 7.
    expect(lay('last').filled).toEqual([1, 4, 5, 7]);
  });

  it('of two equal stamps the first stays, unless it is a gap', () => {
    const twice = after(0, 10, 10, 20, 20);
    const readings = Float64Array.of(1, 2, 3, NaN, 5);
    const found = findGrid(twice, true, null)!;
    const placement = placeOnGrid(twice, readings, found);
    expect([...fillGrid(readings, placement, 'nearest')]).toEqual([1, 2, 5]);
    expect(placement.duplicates).toEqual([2, 4]);
  });
});

describe('checkPlaces', () => {
  it('names the row of a stamp far from all others, also where the grid would be affordable', () => {
    const daily = Float64Array.from({ length: 200 }, (_, k) => base + k * 86400);
    expect(checkPlaces(daily, findGrid(daily, true, null)!)).toBeNull();
    daily[57] = utc('2204-06-27T08:00');
    const tooLong = checkPlaces(daily, findGrid(daily, true, null)!)!;
    expect(tooLong.row).toBe(57);
    expect(tooLong.limit).toBeLessThan(tooLong.places);
  });

  it('lets a pause between two campaigns stand', () => {
    const times = Float64Array.from({ length: 200 }, (_, k) => base + (k < 100 ? k : k + 3000) * 3600);
    expect(checkPlaces(times, findGrid(times, true, null)!)).toBeNull();
  });
});
