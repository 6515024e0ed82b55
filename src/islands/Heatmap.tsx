import { useMemo, useState } from 'react';
import { campaignHref } from '../contracts/links';
import type { Heatmap as HeatmapView } from '../contracts/leaderboard';
import { useAddressState } from './addressState';
import { heatmapSortedBy, readHeatmapLook, writeHeatmapLook } from './heatmap/address';
import { HeatControls } from './heatmap/HeatControls';
import { HeatLegend } from './heatmap/HeatLegend';
import { HeatReadout } from './heatmap/HeatReadout';
import { HeatTable } from './heatmap/HeatTable';
import { comparedRows, lawsWithK, metricNotes, metricScale } from './heatmap/metrics';
import { sortHeatmapRows } from './heatmap/sortRows';
import { heatmapSummary } from './heatmap/summary';
import { verdicts } from './leaderboard/address';
import { usePrinting } from './media';

export interface HeatmapProps {
  initial: HeatmapView;
  /** Query string of the request, so that the server draws what the address asks for. */
  search?: string;
}

/** Catalyst against temperature by any metric; a cell opens its wells. */
export function Heatmap({ initial, search = '' }: HeatmapProps) {
  if (initial.rows.length === 0) {
    const { groupId, id } = initial.campaign;
    return (
      <div className="max-w-[60ch]">
        <h1 className="display">Heatmap</h1>
        <p className="mt-3">
          Nothing has been analysed yet. As soon as a screen is, its catalysts stand here, one line
          each, with a cell for every temperature.{' '}
          <a href={campaignHref(groupId, id)}>See where to begin</a>.
        </p>
      </div>
    );
  }
  return <FilledHeatmap heatmap={initial} search={search} />;
}

function FilledHeatmap({ heatmap, search }: { heatmap: HeatmapView; search: string }) {
  const { temperaturesK, campaign } = heatmap;
  const [look, change] = useAddressState(readHeatmapLook, writeHeatmapLook, search);
  const [place, setPlace] = useState<{ catalystId: string; column: number } | null>(null);
  const printing = usePrinting();

  const laws = useMemo(() => lawsWithK(heatmap.rows), [heatmap]);
  const law = look.law !== null && laws.includes(look.law) ? look.law : (laws[0] ?? null);
  const metric = look.metric === 'k' && law === null ? 'rate' : look.metric;
  const compared = useMemo(() => comparedRows(heatmap.rows, metric, law), [heatmap, metric, law]);
  const scale = useMemo(
    () => metricScale(metric, compared, campaign.dimension),
    [metric, compared, campaign.dimension],
  );
  const { sort, direction } = look;
  const rows = useMemo(
    () => sortHeatmapRows(compared, temperaturesK, { sort, direction }, scale),
    [compared, temperaturesK, sort, direction, scale],
  );
  const summary = useMemo(
    () => heatmapSummary(compared, temperaturesK, scale),
    [compared, temperaturesK, scale],
  );
  const leftOut = heatmap.rows.length - compared.length;
  const used = verdicts.filter((verdict) =>
    heatmap.rows.some((row) => row.cells.some((cell) => cell?.verdict === verdict)),
  );
  const pointed = rows.find((row) => row.catalystId === place?.catalystId) ?? null;
  return (
    <>
      <div className="heading-row">
        <h1 className="display">Heatmap</h1>
      </div>
      <HeatControls look={{ ...look, metric }} laws={laws} law={law} onChange={change} />
      <div className="heat-page">
        <HeatTable
          heatmap={heatmap}
          rows={rows}
          scale={scale}
          look={look}
          onSort={(next) => change(heatmapSortedBy(look, next))}
          onPlace={setPlace}
          printing={printing}
        />
        <aside aria-label="Legend and reading" className="heat-aside">
          <HeatLegend scale={scale} verdicts={used} />
          <p role="status">{summary}</p>
          <p className="text-quiet">{metricNotes[metric]}</p>
          {leftOut > 0 && (
            <p className="text-quiet">
              {leftOut} candidates of other orders have a k in another unit, or none, and are left
              out here.
            </p>
          )}
          {look.cells === 'discs' && metric !== 'verdict' && (
            <p className="text-quiet">The filled part of a disc is the conversion reached.</p>
          )}
          <div className="heat-readout">
            <HeatReadout
              row={pointed}
              column={place?.column ?? -1}
              temperaturesK={temperaturesK}
              scale={scale}
            />
          </div>
        </aside>
      </div>
    </>
  );
}
