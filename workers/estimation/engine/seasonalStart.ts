import type { Factors } from '../../model/expandPolynomials.ts';
import { dot } from './fastEngine.ts';
import { SeasonalPrior } from './seasonalPrior.ts';
import { SeasonalResponse } from './seasonalResponse.ts';
import { smallInverse } from './smallInverse.ts';

/**
 * What the unknown past does to the exact likelihood of a multiplicative seasonal model, without a matrix of the season's length.
 *
 * The innovations started from nothing are e⁰ = e − Dα − Rγ (see `SeasonalPrior`). D, the response of 1/Θ(Bˢ), moves each phase of the
 * season alone, so that D′D is one M×M block a phase, of two kinds; R, the response of Φ(Bˢ)/Θ(Bˢ)/θ(B), has only g columns, each the one
 * before delayed. With B₀ = I + D Cov(α) D′ and Q = [D Cov(α, γ), R] the covariance of e⁰ is B₀ + QJQ′, J = [0, I; I, Cov(γ)], hence
 * ln |V| = ln |B₀| + ln |det(J⁻¹ + Q′B₀⁻¹Q)| and V⁻¹ = B₀⁻¹ − B₀⁻¹Q (J⁻¹ + Q′B₀⁻¹Q)⁻¹ Q′B₀⁻¹, with
 * B₀⁻¹ = I − D E D′ and E = Cov(α)(I + D′D Cov(α))⁻¹ (the identities of Sylvester and Woodbury; Golub & Van Loan, section 2.1.4).
 * O(n·(g + M)) beside the recursions.
 */
export class SeasonalStart {
  readonly prior: SeasonalPrior;
  readonly g: number;
  /** s·M, the length of α. */
  readonly size: number;
  logDeterminant = 0;
  /** (J⁻¹ + Q′B₀⁻¹Q)⁻¹, 2g×2g. */
  readonly inner: Float64Array;
  /** Q′B₀⁻¹Q, 2g×2g. */
  readonly gram: Float64Array;
  readonly response: SeasonalResponse;
  private readonly folded: Float64Array[];
  /** E and (I + D′D Cov(α))⁻¹ of the phases with one season more, then of the others. */
  private readonly kinds: readonly { E: Float64Array; Z: Float64Array; gram: Float64Array }[];
  /** Phases with one season more. */
  private readonly fuller: number;

  /** @param n readings, at least s·(max(P, Q) + 1); s > max(p, q) */
  constructor(
    private readonly n: number,
    p: number,
    q: number,
    P: number,
    Q: number,
    private readonly s: number,
  ) {
    this.prior = new SeasonalPrior(p, q, P, Q, s);
    const { g, M } = this.prior;
    this.g = g;
    this.size = s * M;
    this.inner = new Float64Array(4 * g * g);
    this.gram = new Float64Array(4 * g * g);
    this.response = new SeasonalResponse(n, s, g, M);
    this.folded = Array.from({ length: g }, () => new Float64Array(this.size));
    this.fuller = n % s;
    const square = () => new Float64Array(M * M);
    this.kinds = [0, 1].map(() => ({ E: square(), Z: square(), gram: square() }));
  }

  /** False where the AR part is not stationary, or another engine must do. */
  prepare(factors: Factors): boolean {
    if (!this.prior.set(factors)) return false;
    this.response.set(factors);
    this.fillKinds();
    const [full, other] = this.kinds;
    const { g, s, fuller } = this;
    this.logDeterminant = this.blocks(full!) * fuller + this.blocks(other!) * (s - fuller);
    if (g === 0) return Number.isFinite(this.logDeterminant);
    for (let l = 0; l < g; l++) this.response.foldOwn(l, this.folded[l]!);
    this.fillGram();
    const { regular } = this.prior;
    const matrix = this.gram.slice();
    for (let i = 0; i < g; i++) {
      for (let j = 0; j < g; j++) matrix[i * 2 * g + j]! -= regular[i * g + j]!;
      matrix[i * 2 * g + g + i]! += 1;
      matrix[(g + i) * 2 * g + i]! += 1;
    }
    this.logDeterminant += smallInverse(matrix, 2 * g, this.inner);
    return Number.isFinite(this.logDeterminant);
  }

  /** R′x of padded values. */
  correlate(x: Float64Array, pad: number, result: Float64Array): void {
    for (let l = 0; l < this.g; l++) result[l] = this.response.against(x, pad + l, this.n - l);
  }

  /** a′E b over all phases. */
  weighted(a: Float64Array, b: Float64Array): number {
    let sum = 0;
    this.eachBlock((r, c, kind, from, to) => {
      const value = kind.E[r * this.prior.M + c]!;
      let part = 0;
      for (let i = r * this.s + from, j = c * this.s + from, k = from; k < to; k++, i++, j++) part += a[i]! * b[j]!;
      sum += value * part;
    });
    return sum;
  }

  /** Q′B₀⁻¹x from D′x and R′x (2g values): Cov(γ, α) Z D′x, then R′x − R′D E D′x. */
  reduce(byPhase: Float64Array, byResponse: Float64Array, result: Float64Array): void {
    const { g, size } = this;
    if (g === 0) return;
    const shrunk = this.shrink(byPhase);
    const { mixed } = this.prior;
    for (let l = 0; l < g; l++) {
      result[l] = dot(mixed.subarray(l * size), shrunk, 0, size);
      result[g + l] = byResponse[l]! - this.weighted(this.folded[l]!, byPhase);
    }
  }

  /** Z x, phase by phase, Z = (I + D′D Cov(α))⁻¹: D′B₀⁻¹ of what has D′ = x. */
  shrink(x: Float64Array): Float64Array {
    return this.apply('Z', x);
  }

  /** −[D, R]′V⁻¹x from D′x and Q′B₀⁻¹x: what the likelihood wants of α and γ. */
  pull(byPhase: Float64Array, reduced: Float64Array): { alpha: Float64Array; gamma: Float64Array } {
    const { g, size, inner, gram } = this;
    const { mixed } = this.prior;
    const y = new Float64Array(2 * g);
    for (let i = 0; i < 2 * g; i++) for (let j = 0; j < 2 * g; j++) y[i]! += inner[i * 2 * g + j]! * reduced[j]!;
    const rest = byPhase.slice();
    const cross = new Float64Array(size);
    for (let l = 0; l < g; l++) for (let i = 0; i < size; i++) cross[i]! += mixed[l * size + i]! * y[l]!;
    const moved = this.apply('gram', cross);
    for (let i = 0; i < size; i++) {
      rest[i]! -= moved[i]!;
      for (let l = 0; l < g; l++) rest[i]! -= this.folded[l]![i]! * y[g + l]!;
    }
    const alpha = this.shrink(rest).map((value) => -value);
    const gamma = new Float64Array(g);
    for (let l = 0; l < g; l++) {
      let sum = reduced[g + l]!;
      for (let j = 0; j < 2 * g; j++) sum -= gram[j * 2 * g + g + l]! * y[j]!;
      gamma[l] = -sum;
    }
    return { alpha, gamma };
  }

  private apply(name: 'Z' | 'gram', x: Float64Array): Float64Array {
    const { s, size } = this;
    const { M } = this.prior;
    const result = new Float64Array(size);
    this.eachBlock((r, c, kind, from, to) => {
      const value = kind[name][r * M + c]!;
      for (let i = r * s + from, j = c * s + from, k = from; k < to; k++, i++, j++) result[i]! += value * x[j]!;
    });
    return result;
  }

  private eachBlock(
    visit: (
      r: number,
      c: number,
      kind: { E: Float64Array; Z: Float64Array; gram: Float64Array },
      from: number,
      to: number,
    ) => void,
  ): void {
    const { s, fuller } = this;
    const { M } = this.prior;
    for (let r = 0; r < M; r++) {
      for (let c = 0; c < M; c++) {
        visit(r, c, this.kinds[0]!, 0, fuller);
        visit(r, c, this.kinds[1]!, fuller, s);
      }
    }
  }

  private fillKinds(): void {
    const { M } = this.prior;
    const { n, s } = this;
    const { seasonal: h, seasons } = this.response;
    this.kinds.forEach(({ gram }, which) => {
      const count = Math.floor(n / s) + (which === 0 ? 1 : 0);
      for (let r = 0; r < M; r++) {
        for (let c = 0; c <= r; c++) {
          let sum = 0;
          for (let j = r; j < count && j - r < seasons; j++) sum += h[j - r]! * (j - c < seasons ? h[j - c]! : 0);
          gram[r * M + c] = sum;
          gram[c * M + r] = sum;
        }
      }
    });
  }

  /** Sets E and Z of a kind and returns ln |I + D′D Cov(α)|. */
  private blocks({ E, Z, gram }: { E: Float64Array; Z: Float64Array; gram: Float64Array }): number {
    const { M, seasonal: C } = this.prior;
    const matrix = new Float64Array(M * M);
    for (let i = 0; i < M; i++) {
      for (let j = 0; j < M; j++) {
        let sum = i === j ? 1 : 0;
        for (let k = 0; k < M; k++) sum += gram[i * M + k]! * C[k * M + j]!;
        matrix[i * M + j] = sum;
      }
    }
    const logDeterminant = smallInverse(matrix, M, Z);
    for (let i = 0; i < M; i++) {
      for (let j = 0; j < M; j++) {
        let sum = 0;
        for (let k = 0; k < M; k++) sum += C[i * M + k]! * Z[k * M + j]!;
        E[i * M + j] = sum;
      }
    }
    return logDeterminant;
  }

  /** Q′B₀⁻¹Q. */
  private fillGram(): void {
    const { g, size, gram, folded } = this;
    const { mixed } = this.prior;
    const products = new Float64Array(g * g);
    this.response.products(products);
    for (let l = 0; l < g; l++) {
      const own = mixed.subarray(l * size, (l + 1) * size);
      const shrunk = this.apply('gram', own);
      const inner = this.shrink(shrunk);
      for (let v = 0; v < g; v++) {
        gram[l * 2 * g + v] = dot(mixed.subarray(v * size), inner, 0, size);
        const cross = dot(own, this.shrink(folded[v]!), 0, size);
        gram[l * 2 * g + g + v] = cross;
        gram[(g + v) * 2 * g + l] = cross;
        const product = l >= v ? products[l * g + v]! : products[v * g + l]!;
        gram[(g + l) * 2 * g + g + v] = product - this.weighted(folded[l]!, folded[v]!);
      }
    }
  }
}
