import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { Sniffed } from '../../../workers/contract/reading.ts';
import { Choice } from '../../components/Choice.tsx';
import { delimiterName, stampName } from '../../format/dialectText.ts';
import { useActions } from '../../state/useApp.ts';

const delimiters = [',', ';', '\t', '|', ' '] as const;
const stamps = ['iso', 'yearFirst', 'dayFirst', 'monthFirst', 'epochSeconds', 'epochMilliseconds', 'number'] as const;
const none = 'none';

/** A control for everything that was detected; a change reads the file again. */
export function DialectControls({ sniffed }: { readonly sniffed: Sniffed }) {
  const actions = useActions();
  const { dialect, columns, tags } = sniffed;
  const change = (settings: Partial<Dialect>) => void actions.changeDialect(settings);
  const columnOptions = columns.map(
    ({ index, name }) => [String(index), name === '' ? `column ${index + 1}` : name] as const,
  );
  return (
    <div className="controls">
      <Choice
        label="Readings from"
        value={String(dialect.valueColumn)}
        options={columnOptions}
        onChange={(value) => change({ valueColumn: Number(value) })}
      />
      <Choice
        label="Time from"
        value={dialect.timeColumn === null ? none : String(dialect.timeColumn)}
        options={[[none, 'no time'], ...columnOptions]}
        onChange={(value) =>
          change(value === none ? { timeColumn: null, clockColumn: null, stamp: null } : { timeColumn: Number(value) })
        }
      />
      {dialect.timeColumn !== null && (
        <Choice
          label="Times written"
          value={dialect.stamp ?? 'iso'}
          options={stamps.map((stamp) => [stamp, stampName(stamp)] as const)}
          onChange={(stamp) => change({ stamp: stamp as Dialect['stamp'] })}
        />
      )}
      {tags !== undefined && tags.length > 0 && (
        <Choice
          label="Tag"
          value={dialect.tag ?? ''}
          options={tags.map((tag) => [tag, tag] as const)}
          onChange={(tag) => change({ tag })}
        />
      )}
      <Choice
        label="Columns parted by"
        value={dialect.delimiter}
        options={delimiters.map((one) => [one, delimiterName(one)] as const)}
        onChange={(value) => change({ delimiter: value as Dialect['delimiter'] })}
      />
      <Choice
        label="Decimal mark"
        value={dialect.decimal}
        options={[
          ['.', 'point'],
          [',', 'comma'],
        ]}
        onChange={(value) => change({ decimal: value as Dialect['decimal'] })}
      />
      <Choice
        label="Quotes"
        value={dialect.quote ?? none}
        options={[
          ['"', 'double'],
          ["'", 'single'],
          [none, 'none'],
        ]}
        onChange={(value) => change({ quote: value === none ? null : (value as '"' | "'") })}
      />
      <label className="check">
        <input
          type="checkbox"
          checked={dialect.header}
          onChange={(event) => change({ header: event.target.checked })}
        />
        Header row
      </label>
      <label className="check">
        <input
          type="checkbox"
          checked={dialect.unitsRow}
          onChange={(event) => change({ unitsRow: event.target.checked })}
        />
        Units row
      </label>
      <label className="field">
        Lines before the table
        <input
          type="number"
          min={0}
          max={1000}
          value={dialect.preambleLines}
          onChange={(event) => change({ preambleLines: Math.max(0, event.target.valueAsNumber || 0) })}
        />
      </label>
      <p className="quiet">Text encoding {dialect.encoding.toUpperCase()}</p>
    </div>
  );
}
