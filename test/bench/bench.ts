import type { Level, Order } from '../../workers/contract/candidate.ts';
import { fitCandidate } from '../../workers/estimation/fitCandidate.ts';
import { prepareLikelihood } from '../../workers/estimation/prepareLikelihood.ts';
import { candidateOf } from '../../workers/model/candidateOf.ts';
import { createRandom } from '../../workers/numeric/random.ts';

interface Setting {
  readonly name: string;
  readonly n: number;
  readonly gaps: number;
  readonly order: Order;
  readonly level: Level;
}

const order = (p: number, d: number, q: number, P = 0, D = 0, Q = 0, s = 0): Order => ({ p, d, q, P, D, Q, s });

const engines: readonly Setting[] = [
  { name: 'fast, (1,0,1)', n: 100_000, gaps: 0, order: order(1, 0, 1), level: 'none' },
  { name: 'fast, (1,0,1) with mean', n: 100_000, gaps: 0, order: order(1, 0, 1), level: 'mean' },
  { name: 'filter, (1,0,1), 10 % gaps', n: 100_000, gaps: 0.1, order: order(1, 0, 1), level: 'none' },
  { name: 'fast, (1,0,1)×(1,0,1)₁₂', n: 100_000, gaps: 0, order: order(1, 0, 1, 1, 0, 1, 12), level: 'none' },
  { name: 'fast, (0,1,1)×(0,1,1)₁₆₈', n: 100_000, gaps: 0, order: order(0, 1, 1, 0, 1, 1, 168), level: 'none' },
];

const fits: readonly Setting[] = [
  { name: '(1,0,0) mean', n: 60, gaps: 0, order: order(1, 0, 0), level: 'mean' },
  { name: '(1,0,1) mean', n: 500, gaps: 0, order: order(1, 0, 1), level: 'mean' },
  { name: '(1,0,1) mean', n: 1000, gaps: 0, order: order(1, 0, 1), level: 'mean' },
  { name: '(1,0,1) mean, 10 % gaps', n: 1000, gaps: 0.1, order: order(1, 0, 1), level: 'mean' },
  { name: '(0,1,1)', n: 1000, gaps: 0, order: order(0, 1, 1), level: 'none' },
  { name: '(0,1,1), 1 % gaps', n: 1000, gaps: 0.01, order: order(0, 1, 1), level: 'none' },
  { name: '(2,0,2) mean', n: 1000, gaps: 0, order: order(2, 0, 2), level: 'mean' },
  { name: '(4,0,4) mean', n: 1000, gaps: 0, order: order(4, 0, 4), level: 'mean' },
  { name: '(1,0,0)×(0,1,1)₇', n: 400, gaps: 0, order: order(1, 0, 0, 0, 1, 1, 7), level: 'none' },
  { name: '(0,1,1)×(0,1,1)₁₂', n: 500, gaps: 0, order: order(0, 1, 1, 0, 1, 1, 12), level: 'none' },
  { name: '(0,1,1)×(0,1,1)₁₂, 4 % gaps', n: 500, gaps: 0.04, order: order(0, 1, 1, 0, 1, 1, 12), level: 'none' },
  { name: '(1,0,1)×(0,1,1)₂₄', n: 8760, gaps: 0, order: order(1, 0, 1, 0, 1, 1, 24), level: 'none' },
  { name: '(1,0,1) mean', n: 525_600, gaps: 0, order: order(1, 0, 1), level: 'mean' },
];

/** An ARMA(1,1) record with a wave where the setting has a season; the same on every machine. */
function recordOf({ n, gaps, order: { s } }: Setting): Float64Array {
  const random = createRandom(20240501);
  let x = 0;
  let last = 0;
  return Float64Array.from({ length: n }, (_, t) => {
    const e = random.normal();
    x = 0.8 * x + e + 0.3 * last;
    last = e;
    const wave = s > 0 ? 2 * Math.sin((2 * Math.PI * t) / s) : 0;
    return random.uniform() < gaps && t > 0 ? NaN : x + wave;
  });
}

/** Median time of a call in milliseconds, after a warm-up of a fifth of the calls. */
function timed(call: () => void, budget: number): number {
  const first = performance.now();
  call();
  const once = performance.now() - first;
  const repeats = Math.max(3, Math.min(400, Math.floor(budget / Math.max(once, 0.01))));
  for (let i = 0; i < repeats / 5; i += 1) call();
  const times = Array.from({ length: repeats }, () => {
    const from = performance.now();
    call();
    return performance.now() - from;
  });
  return times.sort((a, b) => a - b)[Math.floor(repeats / 2)]!;
}

/** A bare recurrence of the same order and dependence: one value after the other, nothing exact about the start. */
function bareChain(values: Float64Array): () => number {
  return () => {
    let e = 0;
    let before = 0;
    let sum = 0;
    for (let t = 0; t < values.length; t += 1) {
      const z = values[t]!;
      e = z - 0.8 * before - 0.3 * e;
      before = z;
      sum += e * e;
    }
    return sum;
  };
}

const factors = ({ order: o }: Setting) => ({
  ar: Array.from({ length: o.p }, (_, i) => (i === 0 ? 0.8 : 0)),
  ma: Array.from({ length: o.q }, (_, i) => (i === 0 ? 0.3 : 0)),
  seasonalAr: Array.from({ length: o.P }, () => 0.3),
  seasonalMa: Array.from({ length: o.Q }, () => -0.5),
});

/** Times everything; `print` gets the table line by line and the JSON object last. */
export function bench(print: (line: string) => void): void {
  const rows: object[] = [];
  const bareValues = recordOf(engines[0]!);
  const bare = (timed(bareChain(bareValues), 400) * 1e6) / bareValues.length;
  print(`bare recurrence            ${bare.toFixed(2)} ns a reading`);
  print('one evaluation of ln L     ns a reading   times the bare recurrence');
  for (const setting of engines) {
    const prepared = prepareLikelihood({ values: recordOf(setting), candidate: candidateOf(setting) });
    if (!prepared.ok) throw new Error(prepared.failure.code);
    const at = factors(setting);
    const ns = (timed(() => prepared.value.concentrated(at), 1500) * 1e6) / setting.n;
    print(`${setting.name.padEnd(34)} ${ns.toFixed(2).padStart(8)} ${(ns / bare).toFixed(2).padStart(8)}`);
    rows.push({ kind: 'evaluation', name: setting.name, n: setting.n, nsPerReading: ns, bare });
  }
  print('whole fit, first answer with standard errors        n       ms   in evaluations');
  for (const setting of fits) {
    const values = recordOf(setting);
    const candidate = candidateOf(setting);
    const prepared = prepareLikelihood({ values, candidate });
    if (!prepared.ok) throw new Error(prepared.failure.code);
    const evaluation = timed(() => prepared.value.concentrated(factors(setting)), 200);
    const ms = timed(() => {
      if (!fitCandidate({ values, candidate, seed: 1, effort: 'first' }).ok) throw new Error(setting.name);
    }, 1500);
    print(
      `${setting.name.padEnd(40)} ${String(setting.n).padStart(12)} ${ms.toFixed(2).padStart(9)} ${(ms / evaluation).toFixed(0).padStart(8)}`,
    );
    rows.push({ kind: 'fit', name: setting.name, n: setting.n, milliseconds: ms, evaluations: ms / evaluation });
  }
  const memory = process.memoryUsage();
  print(`resident memory at the end ${(memory.rss / 1e6).toFixed(0)} MB`);
  print(JSON.stringify({ rows, residentBytes: memory.rss }));
}
