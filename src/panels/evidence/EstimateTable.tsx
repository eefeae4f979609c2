import type { Equation } from '../../../workers/contract/diagnostics.ts';
import type { SignConvention } from '../../../workers/contract/envelope.ts';
import type { Fit } from '../../../workers/contract/fit.ts';
import type { Series } from '../../../workers/contract/series.ts';
import { estimateLines, intervalShown } from '../../format/equationText.ts';
import { failureText } from '../../format/failureText.ts';
import { derivedLines } from '../../format/intervalText.ts';
import { estimatorName } from '../../format/notation.ts';
import { intervalsOf } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';

interface EstimateTableProps {
  readonly fit: Fit;
  readonly equation: Equation;
  readonly signs: SignConvention;
  readonly series: Series;
}

/** Estimates with their intervals, then what follows from them; each parameter's interval can be checked by simulation. */
export function EstimateTable({ fit, equation, signs, series }: EstimateTableProps) {
  const answer = useAppState((state) => intervalsOf(state, fit));
  const coverage = useAppState((state) => state.view.coverage);
  const intervals = answer?.ok === true ? answer.value : null;
  const exact = fit.candidate.estimator === 'exact';
  return (
    <table>
      <caption>Estimates, {estimatorName(fit.candidate.estimator)}</caption>
      <thead>
        <tr>
          <th scope="col">coefficient</th>
          <th scope="col" className="number">
            estimate
          </th>
          {exact && (
            <th scope="col" className="number">
              {Math.round(100 * (intervals?.coverage ?? coverage))} % interval
            </th>
          )}
          <th scope="col" className="number">
            standard error
          </th>
          <th scope="col">unit</th>
        </tr>
      </thead>
      <tbody>
        {estimateLines(fit, equation, signs, series.unit, intervals).map((line) => (
          <tr key={line.name}>
            <th scope="row">{line.name}</th>
            <td className="number">{line.value}</td>
            {exact && (
              <td className="number">
                {line.interval === '' ? (answer === null ? '…' : '–') : line.interval}
                {line.about !== null && <Check fit={fit} about={line.about} name={line.name} signs={signs} />}
              </td>
            )}
            <td className="number">{line.uncertainty}</td>
            <td>{line.unit}</td>
          </tr>
        ))}
      </tbody>
      {intervals !== null && (
        <tbody>
          {derivedLines(intervals, series.axis).map(({ name, value, interval, note }) => (
            <tr key={name}>
              <th scope="row">{name}</th>
              <td className="number">{value}</td>
              <td className="number">{interval}</td>
              <td colSpan={2} className="quiet small">
                {note}
              </td>
            </tr>
          ))}
        </tbody>
      )}
      {answer !== null && !answer.ok && (
        <tbody>
          <tr>
            <td colSpan={5} className="quiet">
              {failureText(answer.failure).what} {failureText(answer.failure).todo}
            </td>
          </tr>
        </tbody>
      )}
    </table>
  );
}

interface CheckProps {
  readonly fit: Fit;
  readonly about: string;
  readonly name: string;
  readonly signs: SignConvention;
}

/** The interval of one parameter by simulation: asked for, under way, or there. */
function Check({ fit, about, name, signs }: CheckProps) {
  const actions = useActions();
  const check = useAppState((state) => state.checks.find((one) => one.fit === fit && one.about === about));
  if (check === undefined)
    return (
      <button
        type="button"
        className="edit"
        aria-label={`Check ${name} by simulation`}
        title="inverts the likelihood-ratio test, its law simulated at each value tried"
        onClick={() => actions.checkInterval(about)}
      >
        check
      </button>
    );
  if (check.answer === null)
    return (
      <span className="small check-line">
        <progress max={1} value={check.fraction} aria-label={`Simulating ${name}`} />
        <button type="button" className="edit" onClick={() => actions.stopCheck(about)}>
          stop
        </button>
      </span>
    );
  return (
    <span className="small quiet check-line">
      {check.answer.ok
        ? `simulated ${intervalShown(about, signs, check.answer.value)}`
        : failureText(check.answer.failure).what}
    </span>
  );
}
