import type { ColumnId, LeaderboardLook } from './address';
import type { LeaderboardColumn } from './columns';

/** Which columns are shown. */
export function ColumnChoice(props: {
  columns: readonly LeaderboardColumn[];
  look: LeaderboardLook;
  onChange: (look: LeaderboardLook) => void;
}) {
  const { columns, look, onChange } = props;
  const toggle = (id: ColumnId) => {
    const hidden = look.hidden.includes(id)
      ? look.hidden.filter((one) => one !== id)
      : [...look.hidden, id];
    onChange({ ...look, hidden });
  };
  return (
    <details className="column-choice">
      <summary>Columns</summary>
      <fieldset>
        <legend className="sr-only">Columns to show</legend>
        {columns
          .filter(({ id }) => id !== 'candidate')
          .map(({ id, header }) => (
            <label key={id}>
              <input
                type="checkbox"
                checked={!look.hidden.includes(id)}
                onChange={() => toggle(id)}
              />
              {header}
            </label>
          ))}
      </fieldset>
    </details>
  );
}
