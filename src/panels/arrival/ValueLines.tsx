import type { Dialect } from '../../../workers/contract/dialect.ts';
import type { Sniffed } from '../../../workers/contract/reading.ts';
import { Choice } from '../../components/Choice.tsx';
import { CommitField } from '../../components/CommitField.tsx';
import { columnName, gapSentence, repeatsName, wordsOf, wordsText } from '../../format/arrivalText.ts';
import { counted } from '../../format/numbers.ts';
import { useActions } from '../../state/useApp.ts';
import { StatusLine } from './StatusLine.tsx';
import { Told } from './Told.tsx';

const repeatKinds = ['first', 'last', 'gap'] as const;

/** Which readings are taken, and what becomes of cells and rows that are none. */
export function ValueLines({ sniffed }: { readonly sniffed: Sniffed }) {
  const actions = useActions();
  const { dialect, columns, tags, timing } = sniffed;
  const change = (settings: Partial<Dialect>) => void actions.changeDialect(settings);
  const options = columns.map(({ index }) => [String(index), columnName(columns, index)] as const);
  const value = columns.find(({ index }) => index === dialect.valueColumn);
  const unit = value === undefined || value.unit === '' ? 'no unit named' : `unit ${value.unit}`;
  const repeats = timing?.repeats ?? 0;
  return (
    <ul className="plain">
      <Told
        sentence={`Readings from “${columnName(columns, dialect.valueColumn)}”: ${counted(value?.numbers ?? 0, 'number')}, ${unit}.`}
      >
        <Choice
          label="Readings from"
          value={String(dialect.valueColumn)}
          options={options}
          onChange={(column) => change({ valueColumn: Number(column) })}
        />
        {tags !== undefined && tags.length > 0 && (
          <Choice
            label="Tag"
            value={dialect.tag ?? ''}
            options={tags.map((tag) => [tag, tag] as const)}
            onChange={(tag) => change({ tag })}
          />
        )}
      </Told>
      <StatusLine sniffed={sniffed} />
      <Told sentence={gapSentence(sniffed)}>
        <CommitField
          label="Words for a gap, parted by ;"
          value={wordsText(dialect.gapWords)}
          onCommit={(text) => change({ gapWords: wordsOf(text) })}
        />
      </Told>
      <Told sentence="Below a detection limit: cells such as <0.05 and these words; marked, and never taken for numbers.">
        <CommitField
          label="Words for below the limit, parted by ;"
          value={wordsText(dialect.limitWords)}
          onCommit={(text) => change({ limitWords: wordsOf(text) })}
        />
      </Told>
      {dialect.timeColumn !== null && (
        <Told
          sentence={`${repeats === 0 ? 'No time repeats' : counted(repeats, 'row repeats', 'rows repeat') + ' a time'}; where it does with another reading, ${repeatsName(dialect.repeats)}.`}
        >
          <Choice
            label="Of repeated times"
            value={dialect.repeats}
            options={repeatKinds.map((kind) => [kind, repeatsName(kind)] as const)}
            onChange={(kind) => change({ repeats: kind as Dialect['repeats'] })}
          />
        </Told>
      )}
    </ul>
  );
}
