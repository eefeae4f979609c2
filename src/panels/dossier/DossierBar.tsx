import { useState } from 'react';
import { chosenRow } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';

/** What leaves the page, on the person's word only: the dossier, the session link, the session file. */
export function DossierBar() {
  const actions = useActions();
  const row = useAppState(chosenRow);
  const [inline, setInline] = useState(false);
  const [writing, setWriting] = useState(false);
  const ready = row?.progress.kind === 'fitted' && row.progress.judgement !== null;
  return (
    <section className="station" aria-label="Dossier">
      <div className="panel-head">
        <h2>Dossier and link</h2>
        <button
          type="button"
          className="main-action"
          disabled={!ready || writing}
          onClick={() => {
            setWriting(true);
            void actions.saveDossier().finally(() => setWriting(false));
          }}
        >
          {writing ? 'Writing …' : 'Save dossier'}
        </button>
        <button type="button" onClick={() => void actions.copySessionLink(inline)}>
          Copy session link
        </button>
        <label className="check">
          <input type="checkbox" checked={inline} onChange={(event) => setInline(event.target.checked)} />
          include the readings
        </label>
        <button type="button" onClick={() => void actions.saveSessionFile()}>
          Save session file
        </button>
      </div>
      <p className="quiet">
        The link holds settings and candidates behind its #, which no browser sends anywhere; the readings only if you
        include them. Without them a colleague needs the same file, whose fingerprint is checked.
      </p>
    </section>
  );
}
