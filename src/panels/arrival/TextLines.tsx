import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { Sniffed } from '../../../workers/contract/reading.ts';
import { Choice } from '../../components/Choice.tsx';
import { CommitField } from '../../components/CommitField.tsx';
import {
  cellsSentence,
  encodingName,
  marksSentence,
  partsSentence,
  tableSentence,
  thousandsName,
} from '../../format/arrivalText.ts';
import { delimiterName } from '../../format/dialectText.ts';
import { counted } from '../../format/numbers.ts';
import type { Arrival } from '../../state/appState.ts';
import { useActions } from '../../state/useApp.ts';
import { Told } from './Told.tsx';

const encodings = ['utf-8', 'windows-1252', 'utf-16le', 'utf-16be'] as const;
const delimiters = [',', ';', '\t', '|', ' '] as const;
const thousands = [',', '.', ' ', "'"] as const;
const none = 'none';

/** How the text is written: encoding or sheet, cells, numbers, the rows above the table. */
export function TextLines({ sniffed, arrival }: { readonly sniffed: Sniffed; readonly arrival: Arrival }) {
  const actions = useActions();
  const { dialect } = sniffed;
  const change = (settings: Partial<Dialect>) => void actions.changeDialect(settings);
  const { sheets, parts, files } = arrival;
  return (
    <ul className="plain">
      {parts.length > 1 && <li className="told">{partsSentence(parts)}</li>}
      {sheets.length > 0 && (
        <Told sentence={`Read from the sheet “${dialect.sheet ?? ''}”, one of ${sheets.length} in the workbook.`}>
          <Choice
            label="Sheet"
            value={dialect.sheet ?? ''}
            options={sheets.map(({ name, rows, numbers }) => [
              name,
              `${name} (${counted(rows, 'row')}, ${counted(numbers, 'number')})`,
            ])}
            onChange={(sheet) => change({ sheet })}
          />
        </Told>
      )}
      {sheets.length === 0 && (
        <>
          <Told
            sentence={
              files.length > 0
                ? `Letters are encoded in ${encodingName(dialect.encoding)}.`
                : 'Pasted text: its encoding is settled.'
            }
          >
            {files.length > 0 && (
              <Choice
                label="Encoding"
                value={dialect.encoding}
                options={encodings.map((one) => [one, encodingName(one)] as const)}
                onChange={(encoding) => change({ encoding: encoding as Dialect['encoding'] })}
              />
            )}
          </Told>
          <Told sentence={cellsSentence(dialect)}>
            <Choice
              label="Columns parted by"
              value={dialect.delimiter}
              options={delimiters.map((one) => [one, delimiterName(one)] as const)}
              onChange={(value) => change({ delimiter: value as Dialect['delimiter'] })}
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
          </Told>
        </>
      )}
      <Told sentence={marksSentence(dialect)}>
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
          label="Thousands mark"
          value={dialect.thousands ?? none}
          options={[
            [none, 'none'],
            ...thousands.filter((mark) => mark !== dialect.decimal).map((mark) => [mark, thousandsName(mark)] as const),
          ]}
          onChange={(value) => change({ thousands: value === none ? null : (value as Dialect['thousands']) })}
        />
      </Told>
      <Told sentence={tableSentence(dialect)}>
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
        <CommitField
          label="Lines before the table"
          kind="number"
          min={0}
          max={1000}
          value={String(dialect.preambleLines)}
          onCommit={(value) => change({ preambleLines: Math.max(0, Math.round(Number(value)) || 0) })}
        />
      </Told>
    </ul>
  );
}
