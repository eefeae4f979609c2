import type { PreviewRow, Sniffed } from '../../../workers/contract/reading.ts';
import { formatReading } from '../../format/numbers.ts';

const troubles: Record<PreviewRow['trouble'], string> = {
  none: '',
  badStamp: 'time not read',
  badValue: 'no number: gap',
  belowLimit: 'below the limit: gap',
  leftOut: 'left out by its status',
  ragged: 'cells missing or too many',
  duplicate: 'place was taken already',
  reversed: 'earlier than the row before',
  offGrid: 'off the interval',
};

/** The first rows, and those with most trouble, as they stand in the file and as they were read. */
export function PreviewTable({ sniffed }: { readonly sniffed: Sniffed }) {
  const { columns, dialect, first, worst } = sniffed;
  const rows = [...first.map((row) => ({ row, group: 'first' })), ...worst.map((row) => ({ row, group: 'worst' }))];
  return (
    <div className="scroll" role="region" aria-label="Preview" tabIndex={0}>
      <table className="preview">
        <caption>First rows{worst.length > 0 ? ', then those with trouble' : ''}</caption>
        <thead>
          <tr>
            <th scope="col">line</th>
            {columns.map(({ index, name, unit, role }) => (
              <th key={index} scope="col" className={index === dialect.valueColumn ? 'taken' : undefined}>
                {name === '' ? `column ${index + 1}` : name}
                {unit !== '' && <span className="unit"> {unit}</span>}
                <span className="role">{index === dialect.valueColumn ? 'readings' : role}</span>
              </th>
            ))}
            <th scope="col">read as</th>
            <th scope="col">trouble</th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ row, group }) => (
            <tr key={`${group}${row.line}`}>
              <td className="number">{row.line}</td>
              {columns.map(({ index }) => (
                <td key={index} className={index === dialect.valueColumn ? 'taken' : undefined}>
                  {row.cells[index] ?? ''}
                </td>
              ))}
              <td className="number">{formatReading(row.value)}</td>
              <td>{troubles[row.trouble]}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
