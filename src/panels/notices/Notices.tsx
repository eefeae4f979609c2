import { failureText } from '../../format/failureText.ts';
import { useActions, useAppState } from '../../state/useApp.ts';

/** Messages that stay until dismissed: what happened, where, what to do. */
export function Notices() {
  const actions = useActions();
  const notices = useAppState((state) => state.notices);
  return (
    <div className="notices" role="status" aria-live="polite">
      {notices.map(({ id, tone, failure, text }) => {
        const words = failure === null ? null : failureText(failure);
        return (
          <div key={id} className={`notice ${tone}`}>
            <p>
              {words === null ? text : <strong>{words.what}</strong>}
              {words !== null && [text, words.where].filter((part) => part !== '').length > 0 && (
                <span className="where"> {[text, words.where].filter((part) => part !== '').join(' · ')}</span>
              )}
              {words !== null && <span> {words.todo}</span>}
            </p>
            <button type="button" onClick={() => actions.dismissNotice(id)}>
              Dismiss
            </button>
          </div>
        );
      })}
    </div>
  );
}
