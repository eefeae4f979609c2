import { useRef } from 'react';
import { useActions } from '../../state/useApp.ts';
import { examples } from './exampleList.ts';

/** The invented examples that come with the page. */
export function Examples() {
  const actions = useActions();
  const details = useRef<HTMLDetailsElement>(null);
  return (
    <details className="drawer" ref={details}>
      <summary>Examples</summary>
      <ul className="drawer-body plain">
        {examples.map(({ file, title }) => (
          <li key={file}>
            <button
              type="button"
              onClick={() => {
                if (details.current !== null) details.current.open = false;
                void actions.openExample(file);
              }}
            >
              {title}
            </button>
          </li>
        ))}
        <li className="quiet">All three are invented; no real plant.</li>
      </ul>
    </details>
  );
}
