import { useMemo, useState } from 'react';
import { candidateHref } from '../../contracts/links';
import type { ScreenWellRow } from '../../contracts/screens';
import type { Verdict } from '../../kinetics/types';
import { Button } from '../Button';
import { VerdictText } from '../DecayMark';
import { WellDisc } from '../WellDisc';
import { percent } from '../candidate/figures';
import { celsius } from '../charts/buildArrheniusOption';
import { countVerdicts, filterWells } from './wellFilter';

const shownAtFirst = 96;
const cell = 'py-1 pr-6';
const numeric = 'py-1 pr-6 text-right tabular-nums';
const columns: [name: string, numeric: boolean][] = [
  ['Plate', false],
  ['Well', false],
  ['Catalyst', false],
  ['Role', false],
  ['Temperature', true],
  ['Readings', true],
  ['Conversion', true],
  ['Verdict', false],
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
  const found = useMemo(() => filterWells(wells, { verdict, search }), [wells, verdict, search]);
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
        <label className="ml-auto">
          <span className="sr-only">Search wells</span>
          <input
            type="search"
            value={search}
            placeholder="Plate, well or catalyst"
            onChange={(event) => setSearch(event.target.value)}
            className="border-rule bg-sheet focus-visible:outline-accent min-h-9 rounded-[3px] border px-2 focus-visible:outline-2"
          />
        </label>
      </div>
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
              {columns.map(([name, right]) => (
                <th key={name} scope="col" className={`${right ? numeric : cell} font-normal`}>
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {shown.map((well) => (
              <tr key={well.wellId} className="border-rule border-b">
                <td className={`${cell} whitespace-nowrap`}>{well.plate}</td>
                <th scope="row" className={`${cell} text-left font-semibold tabular-nums`}>
                  {well.position}
                </th>
                <td className={cell}>
                  {well.catalystId ? (
                    <a
                      href={`${candidateHref(groupId, campaignId, well.catalystId)}?well=${well.wellId}`}
                    >
                      {well.catalyst}
                    </a>
                  ) : (
                    <span className="text-quiet">{well.catalyst ?? 'none'}</span>
                  )}
                </td>
                <td className={cell}>{well.role.replace('-', ' ')}</td>
                <td className={numeric}>{celsius(well.temperatureK)}</td>
                <td className={numeric}>{well.readings}</td>
                <td className={numeric}>
                  <span className="inline-flex items-center gap-2">
                    {well.conversion === null ? '–' : percent(well.conversion)}
                    <WellDisc conversion={well.conversion} tint="var(--accent)" size={18} />
                  </span>
                </td>
                <td className={`${cell} whitespace-nowrap`}>
                  <WellVerdict verdict={well.verdict} />
                </td>
              </tr>
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

function WellVerdict({ verdict }: { verdict: string | null }) {
  if (verdict === null) return <span className="text-quiet">not analysed</span>;
  return <VerdictText verdict={verdict as Verdict} />;
}
