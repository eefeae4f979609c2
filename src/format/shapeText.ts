import type { Order } from '../../workers/contract/candidate.ts';
import type { Axis } from '../../workers/contract/series.ts';
import type {
  AdviceReason,
  NamedPeriod,
  SeasonalView,
  Shape,
  Sureness,
  UnitRootOutcome,
} from '../../workers/contract/shape.ts';
import { formatReadings } from './axisTime.ts';
import { candidateName } from './notation.ts';
import { counted, formatFixed, formatNumber, formatPValue, subscript } from './numbers.ts';

const PARTS = ['', '', 'half ', 'a third of ', 'a quarter of ', 'a fifth of ', 'a sixth of '];
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const DAYS = ['Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat', 'Sun'];

/** A period in the record's own time: "a day", "half a year", "3.3 readings". */
export function periodName(axis: Axis, { calendar, period }: Pick<NamedPeriod, 'calendar' | 'period'>): string {
  if (calendar === null) return formatReadings(axis, Number(period.toPrecision(3)));
  const { name, harmonic } = calendar;
  const whole = name === 'shift' ? 'a shift of 8 hours' : name === 'hour' ? 'an hour' : `a ${name}`;
  return `${PARTS[harmonic] ?? ''}${whole}`;
}

/** ∇ with its powers: "∇∇₁₂", "the record itself". */
export function differencingName({ d, D, s }: Pick<Order, 'd' | 'D' | 's'>): string {
  const plain = d === 0 ? '' : d === 1 ? '∇' : '∇²';
  const seasonal = D === 0 ? '' : `∇${subscript(s)}`;
  return plain + seasonal === '' ? 'the record itself' : plain + seasonal;
}

/** What to try, in one sentence without its reasons. */
export function adviceHeadline({ advice }: Shape): string {
  const first = advice.candidates[0];
  if (first === undefined) return 'Nothing can be advised on so few readings.';
  const open = [
    ...(advice.sureness.d === 'open' ? ['the differencing'] : []),
    ...(advice.sureness.season === 'open' ? ['the season'] : []),
    ...(advice.sureness.transform === 'open' ? ['the transform'] : []),
    ...(advice.sureness.orders === 'open' ? ['the orders'] : []),
  ];
  const doubt = open.length === 0 ? '' : `; open: ${open.join(', ')}`;
  return `Try ${candidateName(first)} first${doubt}.`;
}

export function surenessWord(sureness: Sureness): string {
  return { clear: 'clear', likely: 'likely', open: 'open' }[sureness];
}

export const aboutNames: Readonly<Record<AdviceReason['about'], string>> = {
  s: 'Season',
  D: 'Season',
  d: 'Differencing',
  transform: 'Transform',
  orders: 'Orders',
  level: 'Level',
};

/** One reason as a sentence with its numbers. */
export function reasonSentence({ code, numbers }: AdviceReason, axis: Axis): string {
  const n = (name: string) => numbers[name] ?? NaN;
  const show = (name: string, digits = 3) => formatNumber(n(name), digits);
  const r = (name: string) => formatFixed(n(name), 2);
  const tests = `(Dickey–Fuller ${r('adf')} against ${r('adfCritical')}, KPSS ${r('kpss')} against ${r('kpssCritical')} at 5 %)`;
  const base = n('D') > 0 ? 'the seasonal difference' : 'the record';
  const of = [base, `the first difference of ${base}`, `the second difference of ${base}`][n('d')] ?? base;
  const nth = n('d') === 2 ? 'A second' : 'A first';
  switch (code) {
    case 'unitRoot':
      return `Both tests see a unit root in ${of} ${tests}.`;
    case 'stationary':
      return `Both tests see a stationary series in ${of} ${tests}.`;
    case 'bothRejected':
      return `Both tests reject their hypothesis for ${of} ${tests}: a shifted level or a long memory does that.`;
    case 'neitherRejected':
      return `Neither test rejects for ${of} ${tests}: too little to tell.`;
    case 'varianceFalls':
      return `${nth} difference lowers the variance from ${show('before')} to ${show('after')}.`;
    case 'varianceRises':
      return `${nth} difference would raise the variance from ${show('before')} to ${show('after')}.`;
    case 'overDifferenced':
      return `It would leave a lag-one correlation of ${r('lagOne')}: one difference too many.`;
    case 'tooFew':
      return `${counted(n('readings'), 'reading')} are too few for the unit-root tests.`;
    case 'noSeason':
      return 'No period stands out of the periodogram.';
    case 'periodStands':
      return `A period of ${formatReadings(axis, Number(n('period').toPrecision(5)))} stands out: its strongest line has ${formatNumber(100 * n('share'), 2)} % of the variance, p ${formatPValue(n('pValue'))}.`;
    case 'lagSeason':
      return `Differences are correlated at lag ${show('s', 4)}: r = ${r('r')}.`;
    case 'seasonPersists':
      return `At lag ${show('s', 4)} the differences have r = ${r('r')}, above ½: a seasonal difference lowers the variance.`;
    case 'seasonFixed':
      return `At lag ${show('s', 4)} the differences have r = ${r('r')}, not above ½: a seasonal difference would not lower the variance.`;
    case 'seasonTooLong':
      return `A season of ${show('period', 5)} readings is too long for seasonal coefficients: its harmonics are entered as inputs.`;
    case 'seasonNotWhole':
      return `${show('period', 4)} readings are no whole number: its harmonics are entered as inputs.`;
    case 'spreadGrows':
      return `The spread grows as the ${show('slope', 2)} ± ${show('error', 1)} power of the level, over levels that differ ${show('ratio', 2)}-fold.`;
    case 'spreadEven':
      return `The spread does not clearly grow with the level (power ${show('slope', 2)} ± ${show('error', 1)}).`;
    case 'levelsAlike':
      return `Levels differ only ${show('ratio', 3)}-fold: a transform would bend nothing to speak of.`;
    case 'notPositive':
      return 'Readings are not all positive: no logarithm or power.';
    case 'lambda':
      return `Box–Cox λ ${r('value')}, 95 % interval ${r('from')} to ${r('to')}.`;
    case 'white':
      return `No correlation stands out up to lag ${show('lags', 2)}.`;
    case 'partialsEnd':
      return `Partial correlations end after lag ${show('lag', 2)}: an autoregression of that order.`;
    case 'correlationsEnd':
      return `Correlations end after lag ${show('lag', 2)}: a moving average of that order.`;
    case 'bothDecay':
      return `Correlations reach lag ${show('correlationLag', 2)}, partial ones lag ${show('partialLag', 2)}: a mixture, or more structure than orders describe.`;
    case 'seasonalMemory':
      return `At the season, lag ${show('s', 4)}, r = ${r('r')} is left.`;
    case 'drift':
      return `Differences have a mean of ${show('mean', 3)} ± ${show('error', 1)}: a drift.`;
  }
}

/** What the two tests say together. */
export const outcomeSentences: Readonly<Record<UnitRootOutcome, string>> = {
  stationary: 'Unit root rejected, stationarity kept: no further difference.',
  unitRoot: 'Unit root kept, stationarity rejected: difference once more.',
  neither: 'Both rejected: neither describes it. Look for a shifted level, an event or a long memory.',
  open: 'Neither rejected: the record is too short or too noisy for these tests to tell.',
};

/** Names of the places of a seasonal view. */
export function placeName({ by, places }: SeasonalView, place: number): string {
  if (by === 'hour') return `${String(place).padStart(2, '0')}:00`;
  if (by === 'weekday') return DAYS[place] ?? '';
  if (by === 'month') return places === 12 ? (MONTHS[place] ?? '') : String(place + 1);
  return String(place + 1);
}

export const viewNames: Readonly<Record<SeasonalView['by'], string>> = {
  hour: 'hour of the day',
  weekday: 'day of the week',
  month: 'month of the year',
  phase: 'place in the season',
};
