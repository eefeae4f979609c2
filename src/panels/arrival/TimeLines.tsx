import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { Sniffed } from '../../../workers/contract/reading.ts';
import { Choice } from '../../components/Choice.tsx';
import { columnName, stampPartName, timeSentence } from '../../format/arrivalText.ts';
import { stampName } from '../../format/dialectText.ts';
import { useActions } from '../../state/useApp.ts';
import { GridLine } from './GridLine.tsx';
import { Told } from './Told.tsx';

const stamps = ['iso', 'yearFirst', 'dayFirst', 'monthFirst', 'epochSeconds', 'epochMilliseconds', 'number'] as const;
const none = 'none';
const apart = 'apart';
const zones: readonly string[] = Intl.supportedValuesOf('timeZone');

/** Columns for the parts of the stamp that are there already, and one more. */
function PartChoices({ sniffed, columns }: { readonly sniffed: Sniffed; readonly columns: readonly number[] }) {
  const actions = useActions();
  const options = sniffed.columns.map(({ index }) => [String(index), columnName(sniffed.columns, index)] as const);
  const shown = Math.min(6, columns.length + 1);
  return Array.from({ length: shown }, (_, part) => (
    <Choice
      key={part}
      label={`Column of the ${stampPartName(part)}`}
      value={part < columns.length ? String(columns[part]) : none}
      options={part < 2 ? options : [[none, 'none'], ...options]}
      onChange={(value) => {
        const stampColumns = value === none ? columns.slice(0, part) : columns.with(part, Number(value));
        const added = part === columns.length && value !== none ? [...columns, Number(value)] : stampColumns;
        void actions.changeDialect({ stampColumns: added, timeColumn: added[0] ?? null });
      }}
    />
  ));
}

/** Where time stands, how it is written, and the grid laid under it. */
export function TimeLines({ sniffed }: { readonly sniffed: Sniffed }) {
  const actions = useActions();
  const { dialect, columns } = sniffed;
  const { timeColumn, stampColumns } = dialect;
  const change = (settings: Partial<Dialect>) => void actions.changeDialect(settings);
  const options = columns.map(({ index }) => [String(index), columnName(columns, index)] as const);
  const others = options.filter(([index]) => index !== String(timeColumn));
  const onTime = (value: string) => {
    if (value === none) change({ timeColumn: null, clockColumn: null, stampColumns: null, stamp: null, grid: null });
    else if (value === apart)
      change({ stampColumns: [0, 1, 2].filter((j) => j < columns.length), timeColumn: 0, stamp: 'yearFirst' });
    else change({ timeColumn: Number(value), stampColumns: null });
  };
  return (
    <ul className="plain">
      <Told sentence={timeSentence(sniffed)}>
        <Choice
          label="Time from"
          value={stampColumns !== null ? apart : timeColumn === null ? none : String(timeColumn)}
          options={[
            [none, 'no time'],
            ...(columns.length > 2 ? [[apart, 'year, month, day apart'] as const] : []),
            ...options,
          ]}
          onChange={onTime}
        />
        {stampColumns !== null && <PartChoices sniffed={sniffed} columns={stampColumns} />}
        {timeColumn !== null && (
          <>
            {(stampColumns === null || stampColumns.length <= 3) && (
              <Choice
                label="Time of day from"
                value={dialect.clockColumn === null ? none : String(dialect.clockColumn)}
                options={[[none, 'the same column'], ...others]}
                onChange={(value) => change({ clockColumn: value === none ? null : Number(value) })}
              />
            )}
            {stampColumns === null && (
              <Choice
                label="Times written"
                value={dialect.stamp ?? 'iso'}
                options={stamps.map((stamp) => [stamp, stampName(stamp)] as const)}
                onChange={(stamp) => change({ stamp: stamp as Dialect['stamp'] })}
              />
            )}
            {dialect.stamp !== 'number' && (
              <Choice
                label="Clock"
                value={dialect.zone ?? none}
                options={[
                  [none, 'plant clock as logged'],
                  ['UTC', 'UTC'],
                  ...zones.filter((zone) => zone !== 'UTC').map((zone) => [zone, zone] as const),
                ]}
                onChange={(zone) => change({ zone: zone === none ? null : zone })}
              />
            )}
          </>
        )}
      </Told>
      {timeColumn !== null && sniffed.timing != null && <GridLine sniffed={sniffed} timing={sniffed.timing} />}
    </ul>
  );
}
