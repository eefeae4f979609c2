/** A column's name and unit taken from its heading. */
export interface Heading {
  readonly name: string;
  readonly unit: string;
}

const bracketed = /^(.*?)\s*[[(]([^\])]{1,20})[\])]\s*$/u;
/** Quantity calculus (ISO 80000-1): `T / K` heads a column of numbers T/K. */
const quotient = /^(.+?) \/ ?\(?([^()\s][^()]{0,18})\)?$/u;
const behindComma = /^(.+), ([^\s,]{1,12})$/u;

const known = new Set(
  (
    '% ‰ ph ppm ppb ppmv c °c degc f °f degf k bar mbar barg bara pa hpa kpa mpa psi psig atm mmhg m mm cm km µm um m² m2 m³ ' +
    'm3 m³/h m3/h nm³/h nm3/h l ml l/s l/min l/h kg g mg µg t kg/h t/h kg/s kg/m³ kg/m3 g/l mg/l µg/l mol mol/l mmol/l h min s ms d ' +
    'v mv kv a ma w kw mw kwh mwh wh j kj mj gj hz khz rpm 1/min n nm knm db lx ntu µs/cm us/cm ms/cm m/s m/s² – - 1 iu/l ' +
    'pcs st stk ppt s/m cp mpas pa·s w/m² kj/kg €/mwh yr mo dy hr mn sec ft'
  ).split(' '),
);

/** Whether a text looks like the unit of a column: bracketed, known, or a product or quotient of short words. */
export function looksLikeUnit(text: string): boolean {
  const bare = text
    .trim()
    .replace(/^[[(](.*)[\])]$/u, '$1')
    .trim();
  if (bare === '') return false;
  if (bare.length < text.trim().length) return true;
  if (known.has(bare.toLowerCase().replace(/^#/u, ''))) return true;
  return bare.length <= 12 && /[°%‰µμ²³/·^]/u.test(bare) && !/\s/u.test(bare);
}

/**
 * Name and unit of a column from its heading (and the units row, if there is one).
 *
 * Method: brackets at the end (`Flow [m³/h]`, `Flow (m³/h)`), the quotient notation of ISO 80000-1 (`T / K`), a known unit
 * behind a comma.
 *
 * @param heading text of the header cell; @param unitCell text of the units row, empty where there is none
 * @param index column counted from 0, for columns without a heading
 * @returns the name, never empty, and the unit, which may be
 */
export function headingName(heading: string, unitCell: string, index: number): Heading {
  const text = heading.trim().replace(/\s+/gu, ' ');
  const below = unitCell
    .trim()
    .replace(/^[[(](.*)[\])]$/u, '$1')
    .trim();
  const fallback = `column ${index + 1}`;
  if (text === '') return { name: fallback, unit: below };
  if (below !== '') return { name: text, unit: below };
  const inBrackets = bracketed.exec(text);
  if (inBrackets !== null)
    return { name: inBrackets[1]! === '' ? fallback : inBrackets[1]!, unit: inBrackets[2]!.trim() };
  const divided = quotient.exec(text);
  if (divided !== null) return { name: divided[1]!, unit: divided[2]!.trim() };
  const behind = behindComma.exec(text);
  if (behind !== null && looksLikeUnit(behind[2]!)) return { name: behind[1]!, unit: behind[2]! };
  return { name: text, unit: '' };
}
