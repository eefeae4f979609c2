import type { Random } from '../../numeric/random.ts';
import type { Terrain } from './climb.ts';
import { Survey, type Exploration, type Trial } from './survey.ts';

/** Screened random starts for each coefficient, up to so many coefficients: beyond, random starts are hopeless. */
const RANDOM_PER_COEFFICIENT = 12;
const MOST_RANDOM = 8;
/** Starts tried by a few iterations, and how many of these are climbed to the end. */
const TRIED = 10;
const TRIED_PER_COEFFICIENT = 4;
const FINISHED = 5;
/** An autoregression has hardly ever a second maximum. */
const TRIED_PURE = 4;
const FINISHED_PURE = 2;
/** The same for each face of the MA set. */
const TRIED_FACE = 8;
const FINISHED_FACE = 3;
/** Starts the quick answer climbs from, one after the other, until an end is admissible. */
const QUICK = 3;
/** Cosines of the angles that a pair of MA roots on the circle is tried at. */
const ANGLES = Array.from({ length: 24 }, (_, i) => Math.cos((Math.PI * (i + 0.5)) / 24));

/** Coordinates to start from, by where they come from. */
export interface Starts {
  readonly reasoned: readonly Float64Array[];
  readonly oscillating: readonly Float64Array[];
  readonly ridges: readonly Float64Array[];
  /** Parameters handed in, such as those of smaller models. */
  readonly given: readonly Float64Array[];
}

/**
 * The quick answer: the highest of the given starts is climbed from, and the end put on the unit circle where it ran
 * there.
 */
export function climbFromBest(
  terrain: Terrain,
  starts: readonly Float64Array[],
  given: readonly Float64Array[],
): Exploration {
  const survey = new Survey(terrain, true);
  const ranked = survey.screen([...starts, ...given].map(interior));
  for (const trial of ranked.slice(0, QUICK)) {
    survey.finish(trial);
    if (survey.hasAdmissible()) break;
  }
  return survey.report(ranked, given.map(interior));
}

/**
 * The wide search, each stage choosing for the next: all starts are screened by one evaluation each, the most promising
 * tried by a few iterations, the best of these climbed to the end; then every face of the MA set in the same way, from
 * the best ends so far.
 *
 * @param starts see Starts; the best of the reasoned ones and all given ones are climbed from to the end
 * @param random source of the random starts: partial autocorrelations uniform in (−0.95, 0.95)
 */
export function exploreMaxima(terrain: Terrain, starts: Starts, random: Random): Exploration {
  const { space } = terrain;
  const survey = new Survey(terrain);
  const k = space.dimension;
  const faces = space.faces();
  const mixed = faces.length > 0;
  const scattered = Array.from({ length: mixed ? RANDOM_PER_COEFFICIENT * Math.min(k, MOST_RANDOM) : k }, () =>
    Float64Array.from({ length: k }, (_, i) => (space.isPartial(i) ? 1.9 : 0.6) * (random.uniform() - 0.5)),
  );
  const { reasoned, oscillating, ridges, given } = starts;
  const [first] = survey.screen([...reasoned, ...given].map(interior));
  for (const trial of [...(first === undefined ? [] : [first]), ...given.map(interior)]) survey.finish(trial);
  const ranked = survey.screen([...reasoned, ...ridges, ...oscillating, ...scattered].map(interior));
  const size = Math.min(k, MOST_RANDOM);
  survey.explore(
    ranked,
    mixed ? TRIED + TRIED_PER_COEFFICIENT * size : TRIED_PURE,
    mixed ? FINISHED + size : FINISHED_PURE,
  );
  const ends = survey.highest(2);
  for (const { coordinate, value } of faces) {
    const bases = space.isPairFace(coordinate) ? [...ends, ...oscillating] : ends;
    const onFace = [...bases, new Float64Array(k)].flatMap((x) => faceTrials(terrain, x, coordinate, value));
    survey.explore(survey.screen(onFace), TRIED_FACE, FINISHED_FACE);
  }
  return survey.report(ranked, given.map(interior));
}

function interior(x: Float64Array): Trial {
  return { x, held: new Int8Array(x.length) };
}

/**
 * A point moved onto a face; for a pair of roots also at other angles, which the coordinate before it sets: all round, and
 * a few steps of 1/n to either side of its own, for the maxima are that narrow.
 */
function faceTrials({ space, readings }: Terrain, x: Float64Array, coordinate: number, value: 1 | -1): Trial[] {
  const held = new Int8Array(x.length);
  held[coordinate] = value;
  const moved = x.slice();
  moved[coordinate] = value;
  if (!space.isPairFace(coordinate)) return [{ x: moved, held }];
  const here = Math.acos(Math.max(-1, Math.min(1, x[coordinate - 1]!)));
  const beside = [-4, -2, 2, 4].map((steps) => Math.cos(here + (steps * Math.PI) / readings));
  // Pairs at a few steps from a root at 1 or −1 act on the slowest (fastest) movement the record can show.
  const slow = [1, 2, 4].map((steps) => Math.cos((steps * Math.PI) / readings));
  const turned = [...ANGLES, ...beside, ...slow, ...slow.map((cosine) => -cosine)].map((cosine) => {
    const other = moved.slice();
    other[coordinate - 1] = cosine;
    return { x: other, held };
  });
  return [{ x: moved, held }, ...turned];
}
