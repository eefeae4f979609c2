import type { RootPoint } from '../../../workers/contract/diagnostics.ts';
import type { Axis } from '../../../workers/contract/series.ts';
import { formatReadings } from '../../format/axisTime.ts';
import { formatNumber } from '../../format/numbers.ts';

const most = 12;

/** Inverse roots of both polynomials: how long each lasts and at what period it swings, in the record's own time. */
export function RootTable({ roots, axis }: { readonly roots: readonly RootPoint[]; readonly axis: Axis }) {
  if (roots.length === 0) return <p className="quiet">No AR or MA coefficients: nothing lasts.</p>;
  return (
    <table>
      <caption>Inverse roots</caption>
      <thead>
        <tr>
          <th scope="col">part</th>
          <th scope="col" className="number">
            modulus
          </th>
          <th scope="col">period</th>
          <th scope="col" title="time in which its effect falls to 1/e">
            time constant
          </th>
        </tr>
      </thead>
      <tbody>
        {roots.slice(0, most).map((root, i) => (
          <tr key={i}>
            <th scope="row">{root.polynomial === 'ar' ? 'AR' : 'MA'}</th>
            <td className="number">{formatNumber(root.modulus, 3)}</td>
            <td>{root.period === Infinity ? 'none' : formatReadings(axis, root.period)}</td>
            <td>{root.timeConstant === Infinity ? 'endless' : formatReadings(axis, root.timeConstant)}</td>
          </tr>
        ))}
        {roots.length > most && (
          <tr>
            <td colSpan={4}>and {roots.length - most} more of the season</td>
          </tr>
        )}
      </tbody>
    </table>
  );
}
