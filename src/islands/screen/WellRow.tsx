import { candidateHref } from '../../contracts/links';
import type { ScreenWellRow } from '../../contracts/screens';
import type { Verdict } from '../../kinetics/types';
import { percent } from '../candidate/figures';
import { celsius } from '../charts/buildArrheniusOption';
import { VerdictText } from '../DecayMark';
import { WellDisc } from '../WellDisc';

export const cell = 'py-1 pr-3 sm:pr-6';
export const numeric = `${cell} text-right tabular-nums`;
/** Columns that give way on a telephone. */
export const narrowHidden = 'max-sm:hidden';

/** One well of a screen: what is in it and what came of it. */
export function WellRow(props: { well: ScreenWellRow; groupId: string; campaignId: string }) {
  const { well, groupId, campaignId } = props;
  const { catalystId, wellId } = well;
  const role = well.role.replace('-', ' ');
  return (
    <tr className="border-rule border-b">
      <td className={`${cell} whitespace-nowrap`}>{well.plate}</td>
      <th scope="row" className={`${cell} text-left font-semibold tabular-nums`}>
        {well.position}
      </th>
      <td className={cell}>
        {catalystId ? (
          <a href={candidateHref(groupId, campaignId, catalystId, { wellId })}>{well.catalyst}</a>
        ) : (
          <span className="text-quiet">{well.catalyst ?? 'none'}</span>
        )}
      </td>
      <td className={`${cell} ${narrowHidden}`}>{role}</td>
      <td className={`${numeric} ${narrowHidden}`}>{celsius(well.temperatureK)}</td>
      <td className={`${numeric} ${narrowHidden}`}>{well.readings}</td>
      <td className={numeric}>
        <span className="flex items-center justify-end gap-2">
          {well.conversion === null ? 'none' : percent(well.conversion)}
          <WellDisc conversion={well.conversion} tint="var(--accent)" size={18} />
        </span>
      </td>
      <td className={`${cell} whitespace-nowrap`}>
        <WellVerdict verdict={well.verdict} />
      </td>
    </tr>
  );
}

/** A verdict, or that there is none yet. */
export function WellVerdict({ verdict }: { verdict: string | null }) {
  if (verdict === null) return <span className="text-quiet">not analysed</span>;
  return <VerdictText verdict={verdict as Verdict} />;
}
