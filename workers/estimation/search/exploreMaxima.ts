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

const OPTIONS: ClimbOptions = { maximumIterations: 120, gain: 1e-8 };
/** Screened random starts for each coefficient, up to so many coefficients: beyond, random starts are hopeless. */
const RANDOM_PER_COEFFICIENT = 12;
const MOST_RANDOM = 8;
/** Starts climbed from: an autoregression has hardly ever a second maximum, mixed models have several. */
const CLIMBED_PURE = 3;
const CLIMBED = 6;
const CLIMBED_PER_COEFFICIENT = 2;
const CLIMBED_MOST = 22;
/** Starts climbed from within the admissible set where all else left it. */
const FENCED = 5;

/**
 * The quick answer: the highest of the given starts is climbed from, and the end put on the unit circle where it ran
 * there.
 */
export function climbFromBest(terrain: Terrain, starts: readonly Float64Array[]): Exploration {
  const survey = new Survey(terrain);
  const ranked = survey.screen(starts);
  for (const { x } of ranked.slice(0, 2)) {
    survey.climbFrom(x);
    if (survey.hasAdmissible()) break;
  }
  return survey.report(ranked.map(({ x }) => x));
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
  const k = space.dimension;
  const mixed = space.faces().length > 0;
  const scattered = Array.from({ length: mixed ? RANDOM_PER_COEFFICIENT * Math.min(k, MOST_RANDOM) : k }, () =>
    Float64Array.from({ length: k }, (_, i) => (space.isPartial(i) ? 1.9 : 0.6) * (random.uniform() - 0.5)),
  );
  const ranked = survey.screen([...climbAlways, ...starts, ...scattered]);
  const chosen = spread(
    ranked.map(({ x }) => x),
    mixed ? Math.min(CLIMBED_MOST, CLIMBED + CLIMBED_PER_COEFFICIENT * k) : CLIMBED_PURE,
  );
  for (const x of [...climbAlways, ...chosen]) survey.climbFrom(x);
  for (const face of space.faces()) survey.searchFace(face.coordinate, face.value);
  return survey.report(chosen);
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
  private readonly found: { landing: Landing; reached: number; admissible: boolean }[] = [];
  private starts = 0;
  private iterations = 0;
  private evaluations = 0;

  constructor(terrain: Terrain) {
    this.terrain = terrain;
  }

  /** Starts inside the space with their ln L, highest first. */
  screen(starts: readonly Float64Array[]): { x: Float64Array; height: number }[] {
    const height = heightOf(this.terrain);
    this.evaluations += starts.length;
    return starts
      .map((x) => ({ x, height: height(x) }))
      .filter(({ height }) => Number.isFinite(height))
      .sort((one, other) => other.height - one.height);
  }

  climbFrom(x: Float64Array): void {
    this.climbWith(x, new Int8Array(x.length));
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
      this.climbWith(start, held);
    }
  }

  private climbWith(start: Float64Array, held: Int8Array): void {
    const best = this.found.reduce(
      (most, { landing, admissible }) => (admissible ? Math.max(most, landing.logLikelihood) : most),
      -Infinity,
    );
    const end = climb(this.terrain, start, held, { ...OPTIONS, best });
    this.add(end.hopeless ? end : settleOnFace(this.terrain, end, OPTIONS));
  }

  hasAdmissible(): boolean {
    return this.found.some(({ admissible }) => admissible);
  }

  /**
   * The maxima met. Where every climb left the admissible set (models with pairs of roots to spare do that), `starts`
   * are climbed from once more within it, so that there is an answer: the model without the pairs is always there.
   */
  report(starts: readonly Float64Array[]): Exploration {
    for (const x of starts.slice(0, FENCED)) {
      if (this.hasAdmissible()) break;
      this.add(climb(this.terrain, x, new Int8Array(x.length), { ...OPTIONS, fenced: true }));
    }
    const summits = [...this.found].sort((one, other) => other.landing.logLikelihood - one.landing.logLikelihood);
    return { summits, starts: this.starts, iterations: this.iterations, evaluations: this.evaluations };
  }

  private add(landing: Landing): void {
    this.starts++;
    this.iterations += landing.iterations;
    this.evaluations += landing.evaluations;
    if (landing.hopeless || !Number.isFinite(landing.logLikelihood)) return;
    const height = heightOf(this.terrain);
    // Climbs given up on the way to the circle have no end of their own: they count as one.
    const lost = landing.status === 'abandoned';
    const known = this.found.find((other) =>
      lost ? other.landing.status === 'abandoned' : samePlace(height, other.landing, landing),
    );
    if (known !== undefined) {
      known.reached++;
      if (landing.logLikelihood > known.landing.logLikelihood) known.landing = landing;
      known.admissible = this.isAdmissible(known.landing);
      return;
    }
    const end = isMaximumAcross(this.terrain, landing) ? landing : this.climbOff(landing);
    if (end !== null) this.found.push({ landing: end, reached: 1, admissible: this.isAdmissible(end) });
  }

  private isAdmissible({ status, x }: Landing): boolean {
    const { space, season } = this.terrain;
    return status !== 'abandoned' && space.place(x) && isAdmissible(space.coefficients, season);
  }

  /** From a point on a face that is higher inside: the interior maximum beside it, or null where that is known. */
  private climbOff(landing: Landing): Landing | null {
    const free = new Int8Array(landing.x.length);
    const inside = landing.x.map((x, i) => (landing.held[i] === 0 ? x : 0.98 * x));
    const end = climb(this.terrain, inside, free, OPTIONS);
    this.iterations += end.iterations;
    this.evaluations += end.evaluations;
    const height = heightOf(this.terrain);
    const known = this.found.some((other) => samePlace(height, other.landing, end));
    return known || !(end.logLikelihood >= landing.logLikelihood) ? null : end;
  }
}

/** ln L at coordinates, −∞ outside. */
function heightOf({ space, height }: Terrain): (x: Float64Array) => number {
  return (x) => (space.place(x) ? height(space.coefficients) : -Infinity);
}
