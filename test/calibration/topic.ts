/** One line of a calibration table; `goal` null where the figure is reported without one. */
export interface Row {
  readonly name: string;
  readonly design: string;
  readonly goal: readonly [low: number, high: number] | null;
  readonly observed: number;
  readonly standardError: number;
}

/**
 * One claim of the program measured by simulation. Designs are run in parallel threads, so a design and an outcome are plain
 * data; everything random follows from the seed of the replicate.
 */
export interface Topic<Design = unknown, Outcome = unknown> {
  readonly name: string;
  /** How many replicates of each design are run when the command does not say. */
  readonly replicates: number;
  readonly designs: readonly Design[];
  /** Part of the replicates that a design is run with, where it is not all of them. */
  readonly share?: (design: Design) => number;
  /** A short name of the design for the progress line. */
  describe(design: Design): string;
  /** One replicate: simulates and measures. */
  run(design: Design, seed: number): Outcome;
  /** The lines of the table that the outcomes of one design give. */
  rows(design: Design, outcomes: readonly Outcome[]): Row[];
}

/** A share with its binomial standard error. */
export function shareRow(name: string, design: string, goal: Row['goal'], hits: number, of: number): Row {
  const observed = hits / of;
  // Wilson's centre keeps the error of a share of 0 or 1 from being nothing.
  const centre = (hits + 2) / (of + 4);
  return { name, design, goal, observed, standardError: Math.sqrt((centre * (1 - centre)) / of) };
}
