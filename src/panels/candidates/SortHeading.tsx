import { useActions, useAppState } from '../../state/useApp.ts';

interface SortHeadingProps {
  readonly name: string;
  readonly heading: string;
  readonly says: string;
  readonly number?: boolean;
}

/** A column heading that sorts: once upwards, again downwards. */
export function SortHeading({ name, heading, says, number = false }: SortHeadingProps) {
  const actions = useActions();
  const sort = useAppState((state) => state.view.sort);
  const own = sort.column === name;
  const direction = own ? (sort.descending ? 'descending' : 'ascending') : 'none';
  return (
    <th scope="col" aria-sort={direction} className={number ? 'number' : undefined}>
      <button
        type="button"
        className="sort"
        title={says}
        onClick={() => actions.changeView({ sort: { column: name, descending: own && !sort.descending } })}
      >
        {heading}
        <span className="sort-mark" aria-hidden="true">
          {own ? (sort.descending ? '▾' : '▴') : ''}
        </span>
      </button>
    </th>
  );
}
