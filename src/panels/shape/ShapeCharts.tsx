import { useMemo, useState } from 'react';
import type { Axis } from '../../../workers/contract/series.ts';
import type { SeasonalView, Shape } from '../../../workers/contract/shape.ts';
import { Choice } from '../../components/Choice.tsx';
import { memoryFigure } from '../../figures/memoryFigure.ts';
import { periodFigure } from '../../figures/periodFigure.ts';
import { seasonFigure } from '../../figures/seasonFigure.ts';
import { spreadFigure } from '../../figures/spreadFigure.ts';
import { counted, formatNumber, formatPValue } from '../../format/numbers.ts';
import { periodName, viewNames } from '../../format/shapeText.ts';
import { Plot } from '../plot/Plot.tsx';
import { usePalette } from '../plot/usePalette.ts';

const height = 230;

interface ShapeChartsProps {
  readonly shape: Shape;
  readonly axis: Axis;
  readonly unit: string;
  /** Unit of the readings themselves. */
  readonly raw: string;
}

/** Four questions to the record, each a chart with its answer in words. */
export function ShapeCharts({ shape, axis, unit, raw }: ShapeChartsProps) {
  const palette = usePalette();
  const { lags, spectrum, seasonal, spread } = shape;
  const [by, setBy] = useState<SeasonalView['by'] | null>(null);
  const view = seasonal.find((one) => one.by === by) ?? clearest(seasonal);
  const memory = useMemo(() => memoryFigure(lags, palette), [lags, palette]);
  const periods = useMemo(() => periodFigure(spectrum, axis, palette), [spectrum, axis, palette]);
  const season = useMemo(() => (view === null ? null : seasonFigure(view, unit, palette)), [view, unit, palette]);
  const spreads = useMemo(() => spreadFigure(spread, raw, palette), [spread, raw, palette]);
  const few = lags.pairs.reduce((least, count) => Math.min(least, count), Infinity);
  return (
    <div className="look-charts">
      <section aria-labelledby="memory-name">
        <h3 id="memory-name">How long does it remember?</h3>
        <Plot figure={memory} label="Memory" height={height} />
        <p className="quiet small">
          Bars: autocorrelations, dark outside the dotted line; diamonds: partial autocorrelations. Shaded:{' '}
          {formatNumber(100 * lags.coverage, 3)} % of independent readings; dotted: the same if the memory had ended
          before that lag (Bartlett). At least {counted(few, 'pair')} a lag.
        </p>
      </section>
      <section aria-labelledby="periods-name">
        <h3 id="periods-name">Does it repeat?</h3>
        {spectrum.ordinates.length > 0 && <Plot figure={periods} label="Periods" height={height} />}
        <p className="quiet small">
          {spectrum.periods.length === 0
            ? 'No period stands out of the surroundings (shaded). '
            : `Out of the surroundings (shaded): ${spectrum.periods.map((one) => `${periodName(axis, one)} (p ${formatPValue(one.pValue)})`).join(', ')}. `}
          Fisher’s g against independent readings {formatNumber(spectrum.fisher.statistic, 2)}, p{' '}
          {formatPValue(spectrum.fisher.pValue)}.
          {spectrum.averaged > 1 ? ` Of means of ${spectrum.averaged} readings.` : ''}
        </p>
      </section>
      <section aria-labelledby="season-name">
        <div className="panel-head">
          <h3 id="season-name">When is it high?</h3>
          {view !== null && seasonal.length > 1 && (
            <Choice
              label="By"
              value={view.by}
              options={seasonal.map((one) => [one.by, viewNames[one.by]] as const)}
              onChange={(value) => setBy(value as SeasonalView['by'])}
            />
          )}
        </div>
        {view === null || season === null ? (
          <p className="quiet">Fewer than three whole days, weeks, years or seasons: no seasonal view.</p>
        ) : (
          <>
            <Plot figure={season} label="Season" height={height} />
            <p className="quiet small">
              What a reading departs from the mean of its own cycle, before differencing; ± two standard errors over{' '}
              {counted(view.cycles, 'cycle')}. {formatNumber(100 * view.share, 2)} % of the variance within cycles.
            </p>
          </>
        )}
      </section>
      <section aria-labelledby="spread-name">
        <h3 id="spread-name">Does the spread grow with the level?</h3>
        <Plot figure={spreads} label="Spread against level" height={height} />
        <p className="quiet small">
          {spread.means.length} blocks of {spread.block} readings, before transform and differencing.{' '}
          {Number.isNaN(spread.slope)
            ? 'Not all levels are positive, or too few blocks: no power is fitted.'
            : `Spread goes as level to the ${formatNumber(spread.slope, 2)} ± ${formatNumber(spread.slopeError, 1)}.`}
          {spread.lambda === null
            ? ''
            : ` Box–Cox λ ${formatNumber(spread.lambda.value, 2)} (95 %: ${formatNumber(spread.lambda.from, 2)} to ${formatNumber(spread.lambda.to, 2)}).`}
        </p>
      </section>
    </div>
  );
}

function clearest(views: readonly SeasonalView[]): SeasonalView | null {
  return views.reduce<SeasonalView | null>(
    (best, view) => (best === null || view.share > best.share ? view : best),
    null,
  );
}
