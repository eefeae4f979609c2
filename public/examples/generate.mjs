// Makes the example records and index.json in this folder: node public/examples/generate.mjs
// Everything is simulated from the fixed seeds below; SOURCES.md says how. The same seeds give the same bytes.
import { createHash } from 'node:crypto';
import { writeFileSync } from 'node:fs';

/** xoshiro128** (Blackman and Vigna 2021, doi:10.1145/3460772), its state filled by a Weyl sequence mixed as in MurmurHash3. */
function random(seed) {
  let weyl = seed >>> 0;
  const word = () => {
    weyl = (weyl + 0x9e3779b9) >>> 0;
    let z = weyl;
    z = Math.imul(z ^ (z >>> 16), 0x85ebca6b);
    z = Math.imul(z ^ (z >>> 13), 0xc2b2ae35);
    return (z ^ (z >>> 16)) >>> 0;
  };
  const s = Uint32Array.of(word(), word(), word(), word());
  const turn = (x, k) => ((x << k) | (x >>> (32 - k))) >>> 0;
  return () => {
    const result = Math.imul(turn(Math.imul(s[1], 5) >>> 0, 7), 9) >>> 0;
    const t = (s[1] << 9) >>> 0;
    s[2] ^= s[0];
    s[3] ^= s[1];
    s[1] ^= s[2];
    s[0] ^= s[3];
    s[2] ^= t;
    s[3] = turn(s[3], 11);
    return (result + 0.5) / 4294967296;
  };
}

/** Standard normal numbers by Marsaglia's polar method. */
function normals(seed) {
  const uniform = random(seed);
  let spare = null;
  return () => {
    if (spare !== null) {
      const value = spare;
      spare = null;
      return value;
    }
    for (;;) {
      const [u, v] = [2 * uniform() - 1, 2 * uniform() - 1];
      const r = u * u + v * v;
      if (r > 0 && r < 1) {
        const scale = Math.sqrt((-2 * Math.log(r)) / r);
        spare = v * scale;
        return u * scale;
      }
    }
  };
}

/** z_t = phi z_{t-1} + e_t + theta e_{t-1}, after a burn-in of 500. */
function arma11(n, phi, theta, sigma, normal) {
  const z = [];
  let [before, lastE] = [0, 0];
  for (let t = -500; t < n; t++) {
    const e = sigma * normal();
    before = phi * before + e + theta * lastE;
    lastE = e;
    if (t >= 0) z.push(before);
  }
  return z;
}

const two = (number) => String(number).padStart(2, '0');
const comma = (number, digits) => {
  const [whole, fraction] = number.toFixed(digits).split('.');
  return `${whole.replace(/\B(?=(\d{3})+$)/g, '.')},${fraction}`;
};

function neutralisation() {
  const n = 1008;
  const z = arma11(n, 0.82, 0.35, 0.045, normals(41207));
  const rows = [
    '# Invented example: pH at the outlet of a neutralisation tank; no real plant',
    'time,tank outlet [pH]',
  ];
  for (let t = 0; t < n; t++) {
    if (t >= 388 && t < 402) continue; // the probe was being cleaned
    let value = 7.35 + z[t];
    if (t === 241) value += 0.5; // an air bubble at the probe
    if (t >= 720) value += 0.12; // the probe was calibrated
    const at = new Date(Date.UTC(2025, 2, 3) + t * 600000).toISOString().slice(0, 16);
    rows.push(`${at},${value.toFixed(2)}`);
  }
  return `${rows.join('\n')}\n`;
}

function energy() {
  const n = 406;
  const normal = normals(90533);
  // (1 - 0.4B)(1 - B^7) z_t = (1 - 0.75B^7) e_t from a first week of working days and weekend.
  const week = [19600, 20150, 20300, 20120, 18900, 12400, 11150];
  const burn = 140;
  const e = Array.from({ length: n + burn }, () => 380 * normal());
  const z = week.slice();
  for (let t = 7; t < n + burn; t++) {
    const pull = t >= 8 ? 0.4 * (z[t - 1] - z[t - 8]) : 0;
    z.push(z[t - 7] + pull + e[t] - 0.75 * e[t - 7]);
  }
  const rows = ['Invented example: energy used by a plant that never existed', 'date;energy used', ';kWh'];
  for (let t = 0; t < n; t++) {
    const day = new Date(Date.UTC(2024, 0, 1 + t));
    const date = `${two(day.getUTCDate())}.${two(day.getUTCMonth() + 1)}.${day.getUTCFullYear()}`;
    rows.push(`${date};${comma(z[t + burn], 1)}`);
  }
  return `${rows.join('\r\n')}\r\n`;
}

function assay() {
  const n = 60;
  const z = arma11(n, 0.55, 0, 0.42, normals(7719));
  const rows = ['date,shift start,"concentrate assay, %"'];
  for (let t = 0; t < n; t++) {
    const at = new Date(Date.UTC(2025, 4, 5, 6) + t * 8 * 3600000).toISOString();
    const value = t === 33 ? 'n/a' : (61.8 + z[t]).toFixed(2); // a sample was lost
    rows.push(`${at.slice(0, 10)},${at.slice(11, 16)},${value}`);
  }
  return `${rows.join('\n')}\n`;
}

const examples = [
  {
    file: 'neutralisation-ph.csv',
    title: 'pH of a neutralisation tank, every ten minutes',
    description:
      'Invented example: one week at the tank outlet, with two hours of probe cleaning, an air bubble and a calibration.',
    unit: 'pH',
    text: neutralisation(),
  },
  {
    file: 'daily-energy.csv',
    title: 'Energy use of a plant, daily',
    description:
      'Invented example: 58 weeks of daily energy with a weekly pattern that slowly changes; decimal commas.',
    unit: 'kWh',
    text: energy(),
  },
  {
    file: 'shift-assay.csv',
    title: 'Assay per shift',
    description: 'Invented example: sixty shifts of a laboratory assay, one sample lost.',
    unit: '%',
    text: assay(),
  },
];

const folder = new URL('./', import.meta.url);
const index = examples.map(({ text, ...about }) => {
  writeFileSync(new URL(about.file, folder), text);
  return { ...about, sha: createHash('sha256').update(text, 'utf8').digest('hex').slice(0, 32) };
});
writeFileSync(new URL('index.json', folder), `${JSON.stringify(index, null, 2)}\n`);
