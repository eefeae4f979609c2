import type { Shape } from '../../../workers/contract/shape.ts';
import { differencingName } from '../../format/shapeText.ts';
import { formatFixed, formatNumber } from '../../format/numbers.ts';

/** Variance and lag-one correlation for each differencing, so that a difference too many is seen. */
export function DifferencingTable({ shape, unit }: { readonly shape: Shape; readonly unit: string }) {
  const { differencing, advice, order } = shape;
  const season = order.s > 1 ? order.s : advice.order.s;
  const least = Math.min(...differencing.map(({ variance }) => variance));
  const most = Math.max(...differencing.map(({ variance }) => variance));
  // Bars on a logarithmic scale: variances differ by powers of ten.
  const reach = Math.log(most / least);
  const square = shape.transform.kind === 'log' ? '' : unit === '' ? '' : ` (${unit})²`;
  return (
    <div>
      <h3>How often to difference</h3>
      <div className="scroll" role="region" aria-label="Variance for each differencing" tabIndex={0}>
        <table>
          <caption>
            The least variance is marked. A lag-one correlation near −0.5 or below is one difference too many.
          </caption>
          <thead>
            <tr>
              <th scope="col">series</th>
              <th scope="col" className="number">
                variance{square}
              </th>
              <th scope="col" aria-hidden="true" />
              <th scope="col" className="number">
                r at lag 1
              </th>
              {season > 1 && (
                <th scope="col" className="number">
                  r at lag {season}
                </th>
              )}
            </tr>
          </thead>
          <tbody>
            {differencing.map(({ d, D, variance, lagOne, lagSeason }) => (
              <tr key={`${d} ${D}`} className={d === advice.order.d && D === advice.order.D ? 'advised' : undefined}>
                <th scope="row">
                  {differencingName({ d, D, s: season })}
                  {d === advice.order.d && D === advice.order.D && <span className="sureness">advised</span>}
                </th>
                <td className="number">
                  {variance === least && <span className="least">least </span>}
                  {formatNumber(variance, 4)}
                </td>
                <td className="bar-cell" aria-hidden="true">
                  <span
                    className="variance-bar"
                    style={{ width: `${reach > 0 ? 4 + (96 * Math.log(variance / least)) / reach : 4}%` }}
                  />
                </td>
                <td className={lagOne < -0.45 ? 'number too-many' : 'number'}>{formatFixed(lagOne, 2)}</td>
                {season > 1 && <td className="number">{formatFixed(lagSeason, 2)}</td>}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </div>
  );
}
