import type { Sniffed } from '../../../workers/contract/reading.ts';
import { Choice } from '../../components/Choice.tsx';
import { columnName, statusSentence } from '../../format/arrivalText.ts';
import { useActions } from '../../state/useApp.ts';
import { Told } from './Told.tsx';

const none = 'none';

/** The status column: which of its cells keep a row, each with its count. */
export function StatusLine({ sniffed }: { readonly sniffed: Sniffed }) {
  const actions = useActions();
  const { dialect, columns } = sniffed;
  const { status } = dialect;
  const possible = columns.filter(
    ({ index, cells }) => cells !== undefined && index !== dialect.valueColumn && index !== dialect.tagColumn,
  );
  if (possible.length === 0) return null;
  const cells = columns.find(({ index }) => index === status?.column)?.cells ?? [];
  const onColumn = (value: string) => {
    const all = columns.find(({ index }) => String(index) === value)?.cells ?? [];
    const keep = all.map(({ text }) => text);
    void actions.changeDialect({ status: value === none ? null : { column: Number(value), keep } });
  };
  const toggle = (text: string, kept: boolean) => {
    if (status === null) return;
    const keep = kept ? [...status.keep, text] : status.keep.filter((word) => word !== text);
    void actions.changeDialect({ status: { ...status, keep } });
  };
  return (
    <Told sentence={statusSentence(sniffed)}>
      <Choice
        label="Status column"
        value={status === null ? none : String(status.column)}
        options={[[none, 'none'], ...possible.map(({ index }) => [String(index), columnName(columns, index)] as const)]}
        onChange={onColumn}
      />
      {status !== null && (
        <fieldset className="checks" aria-label="Rows kept">
          {cells.map(({ text, count }) => (
            <label key={text} className="check">
              <input
                type="checkbox"
                checked={status.keep.includes(text)}
                onChange={(event) => toggle(text, event.target.checked)}
              />
              {text === '' ? 'empty' : text} ({count})
            </label>
          ))}
        </fieldset>
      )}
    </Told>
  );
}
