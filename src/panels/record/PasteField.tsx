import { useRef, useState } from 'react';
import { useActions } from '../../state/useApp.ts';

/** Takes a pasted record or a session link from any origin. */
export function PasteField() {
  const actions = useActions();
  const [text, setText] = useState('');
  const details = useRef<HTMLDetailsElement>(null);
  return (
    <details className="drawer" ref={details}>
      <summary>Paste</summary>
      <form
        className="drawer-body"
        onSubmit={(event) => {
          event.preventDefault();
          if (text.trim() === '') return;
          void actions.openText(text, 'pasted text');
          setText('');
          if (details.current !== null) details.current.open = false;
        }}
      >
        <label>
          Rows from a spreadsheet or a file, or a session link
          <textarea rows={6} value={text} onChange={(event) => setText(event.target.value)} />
        </label>
        <button type="submit" className="main-action">
          Read it
        </button>
      </form>
    </details>
  );
}
