import { candidateHref } from '../../contracts/links';
import type { CampaignSummary, HeatmapCell, HeatmapRow } from '../../contracts/leaderboard';
import { verdictWord } from '../../screening/decayMarks';
import { inkOn } from '../../screening/ramps';
import { DecayMark } from '../DecayMark';
import { formatKelvinAsCelsius } from '../numbers';
import { WellDisc } from '../WellDisc';
import type { HeatmapLook } from './address';
import { tintOf, type MetricScale } from './metrics';
import { cellValue } from './summary';

export interface HeatCellProps {
  row: HeatmapRow;
  cell: HeatmapCell | null;
  campaign: CampaignSummary;
  scale: MetricScale;
  cells: HeatmapLook['cells'];
}

/** One place of the heatmap: a link to the candidate, opened at this temperature. */
export function HeatCell({ row, cell, campaign, scale, cells }: HeatCellProps) {
  if (!cell) {
    return (
      <span className="heat-missing">
        <span className="sr-only">not measured</span>
      </span>
    );
  }
  const words = cellValue(cell, scale);
  const value = scale.valueOf(cell);
  const tint = value === null ? null : tintOf(scale, value);
  const discs = cells === 'discs' && scale.id !== 'verdict';
  const wellId = cell.wellIds[0];
  const said =
    scale.id === 'verdict' ? verdictWord(cell.verdict, cell.order) : (words ?? 'no value');
  return (
    <a
      href={candidateHref(campaign.groupId, campaign.id, row.catalystId, wellId ? { wellId } : {})}
      aria-label={`${row.code} at ${formatKelvinAsCelsius(cell.temperatureK)}: ${said}`}
      className={`heat-cell ${tint && !discs ? '' : 'bare'}`}
      style={tint && !discs ? { background: tint, color: inkOn(tint) } : undefined}
    >
      {scale.id === 'verdict' ? (
        <DecayMark verdict={cell.verdict} order={cell.order} silent />
      ) : discs ? (
        <WellDisc
          conversion={value === null ? null : cell.conversion}
          tint={tint ?? 'currentColor'}
          size={32}
        />
      ) : value === null ? (
        <span aria-hidden="true">–</span>
      ) : (
        <HeatNumber text={scale.format(value)} />
      )}
    </a>
  );
}

/** A power of ten takes the room of two numbers; set smaller, it stays in its cell. */
function HeatNumber({ text }: { text: string }) {
  return text.includes('×') ? <span className="heat-power">{text}</span> : text;
}
