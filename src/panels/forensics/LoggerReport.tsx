import type { Inspection } from '../../state/appState.ts';
import type { Series } from '../../../workers/contract/series.ts';
import { failureText } from '../../format/failureText.ts';
import { findingText, offerReason, offerText, untestedSentence } from '../../format/findingText.ts';
import { useActions } from '../../state/useApp.ts';

/** Each thing found in the record: a sentence, its places, its effect on a model, and what can be done. */
export function LoggerReport({
  inspection,
  series,
}: {
  readonly inspection: Inspection | null;
  readonly series: Series;
}) {
  const actions = useActions();
  if (inspection === null) return <p className="quiet">The readings are being looked at.</p>;
  const { answer } = inspection;
  if (!answer.ok) return <p className="quiet">{failureText(answer.failure).what}</p>;
  const { findings, untested } = answer.value;
  const left = untestedSentence(untested);
  return (
    <>
      {findings.length === 0 && (
        <p className="quiet">
          No sign of codes, frozen or drawn readings, wild ones, steps or changes of noise, interval or clock.
        </p>
      )}
      <ul className="findings">
        {findings.map((finding) => {
          const { says, where, effect, advice } = findingText(finding, series.axis, series.unit);
          return (
            <li key={finding.code}>
              <p className="says">{says}</p>
              {where !== '' && <p className="where">{where}</p>}
              <p>
                {effect} {advice}
              </p>
              <p className="offers">
                {finding.offered.map((change) => (
                  <button
                    type="button"
                    key={JSON.stringify([change.kind, change.kind === 'regrid' ? change.rule : ''])}
                    onClick={() => void actions.repair(change, offerReason(finding))}
                  >
                    {offerText(finding, change, series.axis)}
                  </button>
                ))}
              </p>
            </li>
          );
        })}
      </ul>
      {left !== '' && <p className="quiet">{left}</p>}
    </>
  );
}
