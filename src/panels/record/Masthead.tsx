import { useRef } from 'react';
import { activeRecord } from '../../state/selectors.ts';
import { useActions, useAppState } from '../../state/useApp.ts';
import { ThemeSwitch } from '../../components/ThemeSwitch.tsx';
import { PasteField } from './PasteField.tsx';
import { Examples } from './Examples.tsx';

/** Name of the program and what can be done with records: open, paste, examples, forget, undo. */
export function Masthead() {
  const actions = useActions();
  const record = useAppState(activeRecord);
  const undoDepth = useAppState((state) => state.undoDepth);
  const redoDepth = useAppState((state) => state.redoDepth);
  const input = useRef<HTMLInputElement>(null);

  return (
    <header className="masthead">
      <h1>Lagwright</h1>
      <div className="tools">
        <button type="button" className="main-action" onClick={() => input.current?.click()}>
          Open record
        </button>
        <input
          ref={input}
          className="unseen"
          type="file"
          multiple
          accept=".csv,.tsv,.txt,.dat,.prn,.asc,.log,.json,.xlsx,text/*"
          aria-label="Record file"
          tabIndex={-1}
          onChange={(event) => {
            const files = [...(event.target.files ?? [])];
            if (files.length > 0) void actions.openFiles(files);
            event.target.value = '';
          }}
        />
        <PasteField />
        <Examples />
        {record !== null && (
          <button type="button" onClick={actions.forgetRecord}>
            Forget record
          </button>
        )}
        <span className="spring" />
        <button type="button" onClick={actions.undo} disabled={undoDepth === 0}>
          Undo
        </button>
        <button type="button" onClick={actions.redo} disabled={redoDepth === 0}>
          Redo
        </button>
        <ThemeSwitch />
      </div>
    </header>
  );
}
