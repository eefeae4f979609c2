import type { Candidate } from '../../../workers/contract/candidate.ts';
import type { Verdict, VerdictItem } from '../../../workers/contract/diagnostics.ts';
import type { Axis } from '../../../workers/contract/series.ts';
import { candidateName } from '../../format/notation.ts';
import { standingSentence, verdictSentence } from '../../format/verdictText.ts';

const panelNames: Record<VerdictItem['panel'], string> = {
  record: 'record',
  innovations: 'innovations',
  lags: 'lags',
  estimates: 'estimates',
  roots: 'roots',
};

/** Where a panel is on the page: the innovations hang beneath the record. */
const places: Record<VerdictItem['panel'], string> = {
  record: 'panel-record',
  innovations: 'panel-record',
  lags: 'panel-lags',
  estimates: 'panel-estimates',
  roots: 'panel-roots',
};

interface VerdictPanelProps {
  readonly candidate: Candidate;
  readonly verdict: Verdict;
  readonly axis: Axis;
}

/** The standing, then sentences with numbers, most important first, each with the panel it rests on. */
export function VerdictPanel({ candidate, verdict, axis }: VerdictPanelProps) {
  const { standing, items } = verdict;
  return (
    <>
      <h2>
        <span className="quiet">{candidateName(candidate)}</span>
        <span className={`standing-word ${standing}`}>{standingSentence(standing)}</span>
      </h2>
      <ul className="reasons">
        {items.map((item, i) => {
          const { says, tryNext } = verdictSentence(item, axis);
          return (
            <li key={i} className={item.weight}>
              <span className="weight">{item.weight === 'supports' ? 'for it' : item.weight}</span>
              <span>
                {says} {tryNext !== '' && <em>{tryNext}</em>}{' '}
                <a href={`#${places[item.panel]}`} onClick={(event) => goTo(event, places[item.panel])}>
                  see {panelNames[item.panel]}
                </a>
              </span>
            </li>
          );
        })}
      </ul>
    </>
  );
}

/** Moves to a panel without touching the address, whose hash belongs to session links. */
function goTo(event: { preventDefault(): void }, id: string): void {
  event.preventDefault();
  const panel = document.getElementById(id);
  panel?.scrollIntoView({ block: 'center' });
  panel?.classList.add('pointed-at');
  setTimeout(() => panel?.classList.remove('pointed-at'), 1600);
}
