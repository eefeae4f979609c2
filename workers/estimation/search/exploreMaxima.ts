import type { Random } from '../../numeric/random.ts';
import { isAdmissible } from './admissibility.ts';
import { climb, type ClimbOptions, type Landing, type Terrain } from './climb.ts';
import { isMaximumAcross, settleOnFace } from './settleOnFace.ts';
import { samePlace } from './samePlace.ts';

/** A local maximum met by the search. */
export interface Summit {
  readonly landing: Landing;
  readonly reached: number;
  readonly admissible: boolean;
}

export interface Exploration {
  /** Distinct local maxima, highest first. */
  readonly summits: readonly Summit[];
  readonly starts: number;
  readonly iterations: number;
  readonly evaluations: number;
}

const OPTIONS: ClimbOptions = { maximumIterations: 120, gain: 1e-10 };
/** Screened random starts for each coefficient, and how many of all starts are climbed from. */
const RANDOM_PER_COEFFICIENT = 12;
const CLIMBED = 6;
const CLIMBED_PER_COEFFICIENT = 2;

/**
 * The quick answer: the highest of the given starts is climbed from, and the end put on the unit circle where it ran
 * there.
 */
export function climbFromBest(terrain: Terrain, starts: readonly Float64Array[]): Exploration {
  const survey = new Survey(terrain);
  const [best] = survey.screen(starts);
  if (best !== undefined) survey.climbFrom(best.x);
  return survey.report();
}

/**
 * The wide search: given starts and seeded random ones are screened by one evaluation each, the most promising are
 * climbed from, then every face of the MA set is searched from the best ends so far.
 *
 * @param starts coordinates of the starts that have a reason; all of `climbAlways` are climbed from
 * @param random source of the random starts: partial autocorrelations uniform in (−0.95, 0.95)
 */
export function exploreMaxima(
  terrain: Terrain,
  starts: readonly Float64Array[],
  climbAlways: readonly Float64Array[],
  random: Random,
): Exploration {
  const { space } = terrain;
  const survey = new Survey(terrain);
  const scattered = Array.from({ length: RANDOM_PER_COEFFICIENT * space.dimension }, () =>
    Float64Array.from(
      { length: space.dimension },
      (_, i) => (space.isPartial(i) ? 1.9 : 0.6) * (random.uniform() - 0.5),
    ),
  );
  const ranked = survey.screen([...climbAlways, ...starts, ...scattered]);
  const chosen = spread(
    ranked.map(({ x }) => x),
    CLIMBED + CLIMBED_PER_COEFFICIENT * space.dimension,
  );
  for (const x of [...climbAlways, ...chosen]) survey.climbFrom(x);
  for (const face of space.faces()) survey.searchFace(face.coordinate, face.value);
  return survey.report();
}

/** The first `count` of a ranked list, passing over those close to one already chosen. */
function spread(ranked: readonly Float64Array[], count: number): Float64Array[] {
  const chosen: Float64Array[] = [];
  for (const x of ranked) {
    if (chosen.length === count) break;
    if (chosen.every((other) => x.some((value, i) => Math.abs(value - other[i]!) > 0.1))) chosen.push(x);
  }
  return chosen;
}

/** Keeps the maxima met so far and counts the work. */
class Survey {
  private readonly terrain: Terrain;
  private readonly found: { landing: Landing; reached: number }[] = [];
  private starts = 0;
  private iterations = 0;
  private evaluations = 0;

  constructor(terrain: Terrain) {
    this.terrain = terrain;
  }

  /** Starts inside the space with their ln L, highest first. */
  screen(starts: readonly Float64Array[]): { x: Float64Array; height: number }[] {
    const { space, likelihood } = this.terrain;
    const scratch = new Float64Array(space.coefficients.all.length);
    this.evaluations += starts.length;
    return starts
      .map((x) => ({ x, height: space.place(x) ? likelihood(space.coefficients, scratch) : -Infinity }))
      .filter(({ height }) => Number.isFinite(height))
      .sort((one, other) => other.height - one.height);
  }

  climbFrom(x: Float64Array): void {
    const held = new Int8Array(x.length);
    this.add(settleOnFace(this.terrain, climb(this.terrain, x, held, OPTIONS), OPTIONS));
  }

  /** Climbs along one face from the best two ends so far and from the middle; ends that are no maxima are left out. */
  searchFace(coordinate: number, value: 1 | -1): void {
    const ends = [...this.found].sort((one, other) => other.landing.logLikelihood - one.landing.logLikelihood);
    const from = [...ends.slice(0, 2).map(({ landing }) => landing.x), new Float64Array(this.terrain.space.dimension)];
    for (const x of from) {
      const held = new Int8Array(x.length);
      held[coordinate] = value;
      const start = x.slice();
      start[coordinate] = value;
      this.add(settleOnFace(this.terrain, climb(this.terrain, start, held, OPTIONS), OPTIONS));
    }
  }

  report(): Exploration {
    const { space, season } = this.terrain;
    const summits = this.found
      .map(({ landing, reached }) => {
        space.place(landing.x);
        const admissible = landing.status !== 'abandoned' && isAdmissible(space.coefficients, season);
        return { landing, reached, admissible };
      })
      .sort((one, other) => other.landing.logLikelihood - one.landing.logLikelihood);
    return { summits, starts: this.starts, iterations: this.iterations, evaluations: this.evaluations };
  }

  private add(landing: Landing): void {
    this.starts++;
    this.iterations += landing.iterations;
    this.evaluations += landing.evaluations;
    if (!Number.isFinite(landing.logLikelihood)) return;
    const height = heightOf(this.terrain);
    const known = this.found.find((other) => samePlace(height, other.landing, landing));
    if (known !== undefined) {
      known.reached++;
      if (landing.logLikelihood > known.landing.logLikelihood) known.landing = landing;
      return;
    }
    if (landing.held.some((value) => value !== 0) && !isMaximumAcross(this.terrain, landing)) return;
    this.found.push({ landing, reached: 1 });
  }
}

/** ln L at coordinates, −∞ outside. */
function heightOf({ space, likelihood }: Terrain): (x: Float64Array) => number {
  const scratch = new Float64Array(space.coefficients.all.length);
  return (x) => (space.place(x) ? likelihood(space.coefficients, scratch) : -Infinity);
}
