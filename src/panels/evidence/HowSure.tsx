import type { Fit } from '../../../workers/contract/fit.ts';
import { coverageColumns, coverageRows, coverageSource } from '../../format/measuredCoverage.ts';
import { intervalAssumptions } from '../../format/intervalText.ts';
import { intervalsOf } from '../../state/selectors.ts';
import { useAppState } from '../../state/useApp.ts';

/** What the intervals assume, and how often they were right when the truth was known. */
export function HowSure({ fit }: { readonly fit: Fit }) {
  const answer = useAppState((state) => intervalsOf(state, fit));
  if (answer?.ok !== true) return null;
  return (
    <details className="how-sure">
      <summary>How sure is this?</summary>
      {intervalAssumptions(answer.value).map((sentence) => (
        <p key={sentence} className="quiet">
          {sentence}
        </p>
      ))}
      <div className="scroll" role="region" aria-label="Measured coverage" tabIndex={0}>
        <table>
          <caption>{coverageSource}</caption>
          <thead>
            <tr>
              {coverageColumns.map((name) => (
                <th key={name} scope="col" className="number">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {coverageRows.map((row) => (
              <tr key={row.join()}>
                {row.map((cell, i) => (
                  <td key={coverageColumns[i]} className="number">
                    {cell}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
