import { readFileSync } from 'node:fs';

interface SeriesFile {
  readonly title: string;
  readonly citation: string;
  readonly checksum: {
    readonly n: number;
    readonly observed: number;
    readonly sum: number;
    readonly sumOfSquares: number;
  };
  readonly values: readonly (number | null)[];
}

export type PublishedName =
  | 'airline'
  | 'colour'
  | 'dowJones'
  | 'gasUk'
  | 'lakeHuron'
  | 'lew'
  | 'lottery'
  | 'luteinisingHormone'
  | 'lynx'
  | 'mavro'
  | 'michelson'
  | 'newHaven'
  | 'nile'
  | 'nottingham'
  | 'overshorts'
  | 'presidents'
  | 'sales'
  | 'seriesA'
  | 'seriesB'
  | 'seriesD'
  | 'seriesE'
  | 'seriesF';

/** A short published series (test/reference/series), NaN for gaps; refused where it does not meet its checksum. */
export function publishedSeries(name: PublishedName): Float64Array {
  const url = new URL(`../reference/series/${name}.json`, import.meta.url);
  const { checksum, values } = JSON.parse(readFileSync(url, 'utf8')) as SeriesFile;
  const observed = values.filter((value) => value !== null);
  const sum = observed.reduce((total, value) => total + value, 0);
  const squares = observed.reduce((total, value) => total + value * value, 0);
  const near = (one: number, other: number) => Math.abs(one - other) <= 1e-12 * Math.abs(other);
  const sound =
    values.length === checksum.n &&
    observed.length === checksum.observed &&
    near(sum, checksum.sum) &&
    near(squares, checksum.sumOfSquares);
  if (!sound) throw new Error(`The published series ${name} does not meet its checksum.`);
  return Float64Array.from(values, (value) => value ?? NaN);
}
