import type { DecisionRecord } from '../../contracts/decisions';
import { formatInstant } from '../dates';
import { actionsDone } from './decisionWords';

/** Who decided what, when and why; newest first. */
export function DecisionHistory({ history }: { history: readonly DecisionRecord[] }) {
  if (history.length === 0) {
    return <p className="text-quiet text-[13.5px]">Nothing has been decided yet.</p>;
  }
  return (
    <ol className="border-rule m-0 list-none space-y-3 border-l p-0 pl-3 text-[13.5px] leading-5">
      {history.map(({ action, by, at, reason }) => (
        <li key={`${at}-${action}`}>
          <p>
            <strong className="font-semibold">{by}</strong> {actionsDone[action]}
          </p>
          <p className="wrap-anywhere">{reason}</p>
          <p className="text-quiet">
            <time dateTime={at}>{formatInstant(at)}</time>
          </p>
        </li>
      ))}
    </ol>
  );
}
