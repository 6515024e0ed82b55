import { useMemo, useState } from 'react';
import type { ScreenWellRow } from '../../contracts/screens';
import { Button } from '../Button';
import { PlateMaps } from './PlateMaps';
import { inPlateOrder } from './plates';
import { countVerdicts, filterWells } from './wellFilter';
import { cell, narrowHidden, numeric, WellRow, WellVerdict } from './WellRow';

const shownAtFirst = 96;
const columns: [name: string, look: string][] = [
  ['Plate', cell],
  ['Well', cell],
  ['Catalyst', cell],
  ['Role', `${cell} ${narrowHidden}`],
  ['Temperature', `${numeric} ${narrowHidden}`],
  ['Readings', `${numeric} ${narrowHidden}`],
  ['Conversion', numeric],
  ['Verdict', cell],
];

export interface WellsTableProps {
  wells: readonly ScreenWellRow[];
  groupId: string;
  campaignId: string;
}

/** A screen's wells with their verdicts; a catalyst leads to its candidate page. */
export function WellsTable({ wells, groupId, campaignId }: WellsTableProps) {
  const [verdict, setVerdict] = useState('');
  const [search, setSearch] = useState('');
  const [all, setAll] = useState(false);
  const counts = useMemo(() => countVerdicts(wells), [wells]);
  const ordered = useMemo(() => inPlateOrder(wells), [wells]);
  const found = useMemo(
    () => filterWells(ordered, { verdict, search }),
    [ordered, verdict, search],
  );
  const shown = all ? found : found.slice(0, shownAtFirst);
  return (
    <section aria-labelledby="wells">
      <h2 id="wells" className="mb-3 text-[18px] font-semibold">
        Wells
      </h2>
      <div className="mb-3 flex flex-wrap items-center gap-x-2 gap-y-2">
        {counts.length > 1 &&
          counts.map(([name, count]) => (
            <button
              key={name}
              type="button"
              aria-pressed={verdict === name}
              onClick={() => setVerdict(verdict === name ? '' : name)}
              className={`focus-visible:outline-accent inline-flex min-h-8 cursor-pointer items-center gap-1.5 rounded-[3px] border px-2 text-[13.5px] focus-visible:outline-2 ${
                verdict === name ? 'border-accent bg-sheet' : 'border-rule hover:border-quiet'
              }`}
            >
              <WellVerdict verdict={name === 'not analysed' ? null : name} />
              <span className="text-quiet tabular-nums">{count}</span>
            </button>
          ))}
        <label className="max-sm:w-full sm:ml-auto">
          <span className="sr-only">Search wells</span>
          <input
            type="search"
            value={search}
            placeholder="Plate, well or catalyst"
            onChange={(event) => setSearch(event.target.value)}
            className="border-rule bg-sheet focus-visible:outline-accent min-h-9 rounded-[3px] border px-2 focus-visible:outline-2 max-sm:w-full"
          />
        </label>
      </div>
      <PlateMaps wells={wells} found={found} groupId={groupId} campaignId={campaignId} />
      <p aria-live="polite" className="text-quiet text-[13px]">
        {found.length === wells.length
          ? `${wells.length} wells`
          : `${found.length} of ${wells.length} wells`}
      </p>
      <div className="overflow-x-auto">
        <table className="w-full border-collapse text-[13.5px] leading-5">
          <caption className="sr-only">Wells of this screen</caption>
          <thead>
            <tr className="text-quiet border-rule border-b text-left text-[13px]">
              {columns.map(([name, look]) => (
                <th key={name} scope="col" className={`${look} font-normal`}>
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {shown.map((well) => (
              <WellRow key={well.wellId} well={well} groupId={groupId} campaignId={campaignId} />
            ))}
          </tbody>
        </table>
      </div>
      {shown.length < found.length && (
        <Button className="mt-3" onClick={() => setAll(true)}>
          Show all {found.length}
        </Button>
      )}
    </section>
  );
}
