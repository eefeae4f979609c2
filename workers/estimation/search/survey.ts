import { isAdmissible } from './admissibility.ts';
import { climb, type ClimbOptions, type Landing, type Terrain } from './climb.ts';
import { samePlace } from './samePlace.ts';
import { isMaximumAcross, settleOnFace } from './settleOnFace.ts';

/** A point to climb from, with the coordinates held on a face. */
export interface Trial {
  readonly x: Float64Array;
  readonly held: Int8Array;
}

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

const OPTIONS: ClimbOptions = { maximumIterations: 80, gain: 1e-8 };
/** Evaluations after which no new climb is begun: fewer for a long record, whose likelihood has fewer maxima. */
const BUDGET = { most: 3000, least: 400, readings: 3e6 };
/** Iterations of a climb for the quick answer. */
const HASTY = 40;
/** Iterations of a try: most of a climb's gain is in them. */
const TRY = 6;
/** Starts, and ends of tries, closer than this in every coordinate are one. */
const APART_STARTS = 0.1;
const APART_TRIES = 0.03;
/** Rounding of ln L that is not called lower. */
const LEVEL = 1e-9;
/** Starts climbed from within the admissible set where all else left it. */
const FENCED = 3;

/** Keeps the maxima met so far and counts the work. */
export class Survey {
  private readonly terrain: Terrain;
  private readonly found: { landing: Landing; reached: number; admissible: boolean }[] = [];
  private starts = 0;
  private iterations = 0;
  private evaluations = 0;

  private readonly budget: number;
  private readonly options: ClimbOptions;

  /** @param hasty keeps every climb short, for the quick answer */
  constructor(terrain: Terrain, hasty = false) {
    this.terrain = terrain;
    this.options = hasty ? { ...OPTIONS, maximumIterations: HASTY } : OPTIONS;
    this.budget = Math.max(BUDGET.least, Math.min(BUDGET.most, BUDGET.readings / terrain.readings));
  }

  /** Points inside the space, highest first. */
  screen(trials: readonly Trial[]): Trial[] {
    const height = heightOf(this.terrain);
    this.evaluations += trials.length;
    return trials
      .map((trial) => ({ ...trial, height: height(trial.x) }))
      .filter((trial) => Number.isFinite(trial.height))
      .sort((one, other) => other.height - one.height);
  }

  /** Tries the first `tried` of a ranked list by a few iterations and climbs to the end from the best of them. */
  explore(ranked: readonly Trial[], tried: number, finished: number): void {
    if (this.evaluations > this.budget) return;
    const best = this.best();
    const ends = spread(ranked, tried, APART_STARTS)
      .map(({ x, held }) => climb(this.terrain, x, held, { ...OPTIONS, maximumIterations: TRY, best }))
      .filter(({ logLikelihood }) => Number.isFinite(logLikelihood))
      .sort((one, other) => other.logLikelihood - one.logLikelihood);
    for (const end of ends) this.count(end);
    this.starts += ends.length;
    for (const end of spread(ends, finished, APART_TRIES)) if (this.evaluations <= this.budget) this.finish(end);
  }

  /** Climbs to the end, onto the unit circle where it leads there. */
  finish({ x, held }: Trial): void {
    const end = climb(this.terrain, x, held, { ...this.options, best: this.best() });
    this.add(end.hopeless ? end : settleOnFace(this.terrain, end, this.options));
  }

  hasAdmissible(): boolean {
    return this.found.some(({ admissible }) => admissible);
  }

  /** Where the highest ends so far are, at most `count`. */
  highest(count: number): Float64Array[] {
    return this.ranked()
      .slice(0, count)
      .map(({ landing }) => landing.x);
  }

  /**
   * The maxima met. Where every climb left the admissible set (models with pairs of roots to spare do that), `trials`
   * are climbed from once more within it, so that there is an answer: the model without the pairs is always there. The
   * same for a given point, such as a smaller model, that would otherwise be higher than every end.
   */
  report(trials: readonly Trial[], given: readonly Trial[]): Exploration {
    const height = heightOf(this.terrain);
    for (const { x, held } of given) {
      if (this.best() >= height(x) - LEVEL) continue;
      this.add(climb(this.terrain, x, held, { ...this.options, fenced: true }));
    }
    for (const { x, held } of trials.slice(0, FENCED)) {
      if (this.hasAdmissible()) break;
      this.add(climb(this.terrain, x, held, { ...this.options, fenced: true }));
    }
    return { summits: this.ranked(), starts: this.starts, iterations: this.iterations, evaluations: this.evaluations };
  }

  private ranked(): Summit[] {
    return [...this.found].sort((one, other) => other.landing.logLikelihood - one.landing.logLikelihood);
  }

  /** ln L of the highest admissible end so far. */
  private best(): number {
    const heights = this.found.map(({ landing, admissible }) => (admissible ? landing.logLikelihood : -Infinity));
    return Math.max(-Infinity, ...heights);
  }

  private count({ iterations, evaluations }: Landing): void {
    this.iterations += iterations;
    this.evaluations += evaluations;
  }

  private add(landing: Landing): void {
    this.starts++;
    this.count(landing);
    if (landing.hopeless || !Number.isFinite(landing.logLikelihood)) return;
    // Climbs given up on the way to the circle have no end of their own: they count as one.
    const lost = landing.status === 'abandoned';
    const known = this.found.find((other) =>
      lost ? other.landing.status === 'abandoned' : samePlace(this.terrain, other.landing, landing),
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
    this.count(end);
    const known = this.found.some((other) => samePlace(this.terrain, other.landing, end));
    return known || !(end.logLikelihood >= landing.logLikelihood) ? null : end;
  }
}

/** The first `count` of a ranked list, passing over those close to one already chosen. */
function spread<T extends Trial>(ranked: readonly T[], count: number, apart: number): T[] {
  const chosen: T[] = [];
  for (const trial of ranked) {
    if (chosen.length === count) break;
    if (chosen.every(({ x }) => trial.x.some((value, i) => Math.abs(value - x[i]!) > apart))) chosen.push(trial);
  }
  return chosen;
}

/** ln L at coordinates, −∞ outside. */
function heightOf({ space, height }: Terrain): (x: Float64Array) => number {
  return (x) => (space.place(x) ? height(space.coefficients) : -Infinity);
}
