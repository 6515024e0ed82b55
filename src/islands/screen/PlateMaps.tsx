import { useMemo, useRef, useState, type KeyboardEvent } from 'react';
import { candidateHref } from '../../contracts/links';
import type { ScreenWellRow } from '../../contracts/screens';
import { percent } from '../candidate/figures';
import { celsius } from '../charts/buildArrheniusOption';
import { temperatureTints } from '../temperatureTints';
import { WellDisc } from '../WellDisc';
import { plateMaps, wellBeside, type PlateMap } from './plates';
import { wellVerdictWord } from './wellFilter';

export interface PlateMapsProps {
  wells: readonly ScreenWellRow[];
  /** The wells that the filter lets through; the others stay, but fade. */
  found: readonly ScreenWellRow[];
  groupId: string;
  campaignId: string;
}

/** The plates as they lay, each well a disc: edge effects and drift are seen here. */
export function PlateMaps({ wells, found, groupId, campaignId }: PlateMapsProps) {
  const maps = useMemo(() => plateMaps(wells), [wells]);
  const tintOf = useMemo(
    () => temperatureTints(wells.map(({ temperatureK }) => temperatureK)),
    [wells],
  );
  const lit = useMemo(() => new Set(found.map(({ wellId }) => wellId)), [found]);
  const hrefOf = ({ catalystId, wellId }: ScreenWellRow) =>
    catalystId === null ? null : candidateHref(groupId, campaignId, catalystId, { wellId });
  if (maps.length === 0) return null;
  return (
    <div className="mb-8">
      <div className="flex flex-wrap gap-x-10 gap-y-6">
        {maps.map((map) => (
          <Plate key={map.plate} map={map} lit={lit} tintOf={tintOf} hrefOf={hrefOf} />
        ))}
      </div>
      <p className="text-quiet mt-3 text-[13px] leading-5">
        Seen from above: the filled part of a disc is the conversion reached, its colour the
        temperature. Hatched: no conversion could be read.
      </p>
    </div>
  );
}

function Plate(props: {
  map: PlateMap;
  lit: ReadonlySet<string>;
  tintOf: (temperatureK: number) => string;
  hrefOf: (well: ScreenWellRow) => string | null;
}) {
  const { map, lit, tintOf, hrefOf } = props;
  const box = useRef<HTMLTableElement>(null);
  const [stop, setStop] = useState<string | null>(null);
  const all = map.wells.flat().filter((well) => well !== null);
  const tabStop = stop ?? all[0]?.wellId ?? null;
  const onKeyDown = (event: KeyboardEvent) => {
    const next = tabStop === null ? null : wellBeside(map, tabStop, event.key);
    if (!next) return;
    event.preventDefault();
    setStop(next.wellId);
    box.current?.querySelector<HTMLElement>(`[data-well="${CSS.escape(next.wellId)}"]`)?.focus();
  };
  return (
    <div className="min-w-0">
      <p className="mb-1 text-[13.5px]">
        <span className="font-semibold">{map.plate}</span>
        {map.temperatureK !== null && (
          <span className="text-quiet">, {celsius(map.temperatureK)}</span>
        )}
      </p>
      <div className="overflow-x-auto">
        <table
          ref={box}
          className="plate"
          aria-label={`${map.plate} as it lay`}
          onKeyDown={onKeyDown}
        >
          <thead>
            <tr>
              <td />
              {Array.from({ length: map.columns }, (_, column) => (
                <th key={column} scope="col">
                  {column + 1}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {map.wells.map((line, row) => (
              <tr key={row}>
                <th scope="row">{String.fromCharCode(65 + row)}</th>
                {line.map((well, column) => (
                  <td key={column}>
                    {well && (
                      <PlateWell
                        well={well}
                        tint={tintOf(well.temperatureK)}
                        href={hrefOf(well)}
                        faded={!lit.has(well.wellId)}
                        stop={well.wellId === tabStop}
                        onFocus={() => setStop(well.wellId)}
                      />
                    )}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </div>
  );
}

function PlateWell(props: {
  well: ScreenWellRow;
  tint: string;
  href: string | null;
  faded: boolean;
  stop: boolean;
  onFocus: () => void;
}) {
  const { well, tint, href, faded, stop, onFocus } = props;
  const name = [
    well.position,
    well.catalyst ?? well.role.replace('-', ' '),
    celsius(well.temperatureK),
    well.conversion === null ? 'no conversion' : `${percent(well.conversion)} converted`,
    wellVerdictWord(well.verdict),
  ].join(', ');
  const shared = {
    'data-well': well.wellId,
    'aria-label': name,
    title: name,
    tabIndex: stop ? 0 : -1,
    onFocus,
    className: `plate-well ${faded ? 'faded' : ''}`,
  };
  const disc = <WellDisc conversion={well.conversion} tint={tint} size={24} />;
  return href === null ? (
    <span role="img" {...shared}>
      {disc}
    </span>
  ) : (
    <a href={href} {...shared}>
      {disc}
    </a>
  );
}
