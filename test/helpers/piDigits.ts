/** The first digits of π, 3 first, by Machin's formula π/4 = 4 arctan(1/5) − arctan(1/239) in whole numbers. */
export function piDigits(count: number): Float64Array {
  const guard = 20;
  const unit = 10n ** BigInt(count + guard);
  const arctanOfReciprocal = (x: bigint) => {
    let power = unit / x;
    let sum = power;
    for (let k = 3n, sign = -1n; power > 0n; k += 2n, sign = -sign) {
      power /= x * x;
      sum += (sign * power) / k;
    }
    return sum;
  };
  const digits = (4n * (4n * arctanOfReciprocal(5n) - arctanOfReciprocal(239n))).toString();
  return Float64Array.from({ length: count }, (_, t) => Number(digits[t]));
}
