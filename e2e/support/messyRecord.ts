/** What was done to the record below, by index, so that a test can ask for it. */
export const mess = {
  codes: [60, 61, 200],
  frozenFrom: 120,
  frozenLength: 16,
  spike: 260,
  linesFrom: 300,
  linesTo: 420,
  every: 6,
};

/**
 * An invented record as a plant system exports it at its worst: semicolons, decimal commas, a units row, −999 for lost readings, a
 * value below a detection limit, a probe that stood still, two hours drawn as straight lines, one wild reading. 480 readings
 * every minute: z_t = 0.7 z_{t−1} + e_t with e uniform, from a linear congruential generator (Park & Miller 1988, Commun. ACM 31, 1192).
 */
export function messyCsv(): string {
  let state = 20_240_313;
  const uniform = () => (state = (48_271 * state) % 2_147_483_647) / 2_147_483_647;
  let z = 0;
  const values = Array.from({ length: 480 }, () => (z = 0.7 * z + (uniform() - 0.5) * 2)).map((one) => 24 + one);
  const { codes, frozenFrom, frozenLength, spike, linesFrom, linesTo, every } = mess;
  values.fill(values[frozenFrom]!, frozenFrom, frozenFrom + frozenLength);
  values[spike]! += 9;
  for (let t = linesFrom; t < linesTo; t += every)
    for (let k = 1; k < every; k += 1) values[t + k] = values[t]! + ((values[t + every]! - values[t]!) * k) / every;
  const cell = (value: number, t: number) =>
    codes.includes(t) ? '-999' : t === 10 ? '<0,05' : value.toFixed(3).replace('.', ',');
  const two = (value: number) => String(value).padStart(2, '0');
  const rows = values.map((value, t) => `13.03.2024 ${two(Math.floor(t / 60))}:${two(t % 60)};${cell(value, t)}`);
  return ['time;acidity', ';mmol/L', ...rows, ''].join('\r\n');
}
