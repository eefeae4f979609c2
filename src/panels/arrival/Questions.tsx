import type { ColumnProfile, Question } from '../../../workers/contract/reading.ts';
import type { Dialect } from '../../../workers/contract/dialect.ts';
import { stampName } from '../../format/dialectText.ts';
import { useActions } from '../../state/useApp.ts';

const asks: Record<Question['about'], string> = {
  dateOrder: 'The dates can be read two ways. Which is it?',
  decimal: 'Is this mark the decimal sign?',
  valueColumn: 'Which column holds the readings?',
  timeColumn: 'Which column holds the time?',
  tag: 'Which tag?',
};

/** The setting that an answer changes. */
function settingOf(about: Question['about'], option: string): Partial<Dialect> {
  switch (about) {
    case 'dateOrder':
      return { stamp: option as NonNullable<Dialect['stamp']> };
    case 'decimal':
      return { decimal: option as Dialect['decimal'] };
    case 'valueColumn':
      return { valueColumn: Number(option) };
    case 'timeColumn':
      return { timeColumn: Number(option), stampColumns: null };
    case 'tag':
      return { tag: option };
  }
}

function optionName(about: Question['about'], option: string, columns: readonly ColumnProfile[]): string {
  if (about === 'dateOrder') return stampName(option as NonNullable<Dialect['stamp']>);
  if (about === 'valueColumn' || about === 'timeColumn')
    return columns.find(({ index }) => index === Number(option))?.name ?? `column ${Number(option) + 1}`;
  if (about === 'decimal') return option === ',' ? 'comma' : 'point';
  return option;
}

/** What was not certain, asked; the first option is the one in use. */
export function Questions({
  questions,
  columns,
}: {
  readonly questions: readonly Question[];
  readonly columns: readonly ColumnProfile[];
}) {
  const actions = useActions();
  return (
    <>
      {questions.map(({ about, options }) => (
        <fieldset key={about} className="question-row">
          <legend>{asks[about]}</legend>
          {options.map((option, i) => (
            <button
              key={option}
              type="button"
              aria-pressed={i === 0}
              onClick={() => void actions.changeDialect(settingOf(about, option))}
            >
              {optionName(about, option, columns)}
            </button>
          ))}
        </fieldset>
      ))}
    </>
  );
}
