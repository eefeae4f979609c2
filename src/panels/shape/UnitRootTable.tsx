import type { Shape, UnitRootTest } from '../../../workers/contract/shape.ts';
import { counted, formatFixed, formatPValue } from '../../format/numbers.ts';
import { differencingName, outcomeSentences } from '../../format/shapeText.ts';

/** Both unit-root tests with their opposite hypotheses, and what they say together. */
export function UnitRootTable({ shape }: { readonly shape: Shape }) {
  const { unitRoots, order } = shape;
  if (unitRoots === null)
    return (
      <div>
        <h3>A unit root or not</h3>
        <p className="quiet">Too few readings in a row for these tests.</p>
      </div>
    );
  const { constant, trend, averaged } = unitRoots;
  const rows: readonly (readonly [string, UnitRootTest, string])[] = [
    ['about a constant', constant.dickeyFuller, 'a unit root'],
    ['about a constant', constant.kpss, 'stationary'],
    ['about a line', trend.dickeyFuller, 'a unit root'],
    ['about a line', trend.kpss, 'stationary'],
  ];
  return (
    <div>
      <h3>A unit root or not, in {differencingName(order)}</h3>
      <div className="scroll" role="region" aria-label="Unit-root tests" tabIndex={0}>
        <table>
          <caption>Two tests whose hypotheses are opposite. They advise, they do not vote.</caption>
          <thead>
            <tr>
              <th scope="col">test</th>
              <th scope="col">hypothesis</th>
              <th scope="col" className="number">
                statistic
              </th>
              <th scope="col" className="number">
                at 5 %
              </th>
              <th scope="col">p</th>
              <th scope="col">hypothesis is</th>
            </tr>
          </thead>
          <tbody>
            {rows.map(([about, test, hypothesis]) => {
              const against = hypothesis === 'a unit root';
              return (
                <tr key={about + hypothesis}>
                  <th scope="row">
                    {against ? 'Dickey–Fuller' : 'KPSS'}, {counted(test.lags, 'lag')}
                  </th>
                  <td>
                    {hypothesis}, {about}
                  </td>
                  <td className="number">{formatFixed(test.statistic, against ? 2 : 3)}</td>
                  <td className="number">{formatFixed(test.critical[1], against ? 2 : 3)}</td>
                  <td>{pText(test)}</td>
                  <td>{test.rejects ? <strong>rejected</strong> : 'kept'}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
      <p className="outcome">
        <span>About a constant:</span> {outcomeSentences[constant.outcome]}
      </p>
      <p className="outcome">
        <span>About a line:</span> {outcomeSentences[trend.outcome]}
      </p>
      <p className="quiet small">
        Lags of the Dickey–Fuller regression by least AIC up to 12(n/100)^¼, at most 24; bandwidth of KPSS 12(n/100)^¼.
        Critical values: MacKinnon 2010; exact limit laws.
        {averaged > 1 ? ` Tested on means of ${averaged} readings.` : ''}
      </p>
    </div>
  );
}

/** Dickey–Fuller has critical values only: its p lies between two of them. */
function pText({ statistic, critical, pValue }: UnitRootTest): string {
  if (!Number.isNaN(pValue)) return formatPValue(pValue);
  if (statistic < critical[0]) return '< 0.01';
  if (statistic < critical[1]) return '0.01–0.05';
  return statistic < critical[2] ? '0.05–0.10' : '> 0.10';
}
