import { useRef, type KeyboardEvent } from 'react';
import type { CandidateWell } from '../../contracts/candidate';
import { celsius } from '../charts/buildArrheniusOption';
import { temperatureTints } from '../temperatureTints';
import { WellDisc } from '../WellDisc';
import { percent } from './figures';
import { wellBeside, type WellGroup } from './wellGroups';

export interface WellChooserProps {
  groups: readonly WellGroup[];
  chosen: string;
  onChoose: (wellId: string) => void;
}

/** Temperatures side by side, their replicates below each other; one stop for the Tab key. */
export function WellChooser({ groups, chosen, onChoose }: WellChooserProps) {
  const box = useRef<HTMLDivElement>(null);
  const tintOf = temperatureTints(groups.map(({ temperatureK }) => temperatureK));
  const onKeyDown = (event: KeyboardEvent) => {
    const next = wellBeside(groups, chosen, event.key);
    if (next === null) return;
    event.preventDefault();
    onChoose(next);
    box.current?.querySelector<HTMLElement>(`[data-well="${CSS.escape(next)}"]`)?.focus();
  };
  return (
    <div
      ref={box}
      role="radiogroup"
      aria-label="Wells by temperature"
      onKeyDown={onKeyDown}
      className="flex flex-wrap gap-x-6 gap-y-3"
    >
      {groups.map(({ temperatureK, wells }) => (
        <div key={temperatureK} role="presentation" className="shrink-0">
          <p className="text-quiet mb-1 text-[13px] tabular-nums">{celsius(temperatureK)}</p>
          <div role="presentation" className="flex gap-1">
            {wells.map((well) => (
              <WellRadio
                key={well.wellId}
                well={well}
                tint={tintOf(temperatureK)}
                checked={well.wellId === chosen}
                onChoose={onChoose}
              />
            ))}
          </div>
        </div>
      ))}
    </div>
  );
}

function WellRadio({
  well,
  tint,
  checked,
  onChoose,
}: {
  well: CandidateWell;
  tint: string;
  checked: boolean;
  onChoose: (wellId: string) => void;
}) {
  const { analysis } = well;
  const conversion = analysis.verdict === 'unusable' ? null : analysis.conversion;
  const name =
    `${well.plate}, ${well.position}, ${celsius(well.temperatureK)}` +
    (well.replicate === null ? '' : `, replicate ${well.replicate}`) +
    (conversion === null ? ', no conversion' : `, ${percent(conversion)} converted`);
  return (
    <button
      type="button"
      role="radio"
      aria-checked={checked}
      aria-label={name}
      title={name}
      tabIndex={checked ? 0 : -1}
      data-well={well.wellId}
      onClick={() => onChoose(well.wellId)}
      className={`focus-visible:outline-accent flex min-h-12 min-w-11 cursor-pointer flex-col items-center rounded-[3px] border-b-2 px-1 pt-1 text-[12px] leading-4 focus-visible:outline-2 ${
        checked
          ? 'border-accent text-ink font-semibold'
          : 'text-quiet hover:text-ink border-transparent'
      }`}
    >
      <WellDisc
        conversion={conversion}
        tint={tint}
        ringed={analysis.verdict === 'forced'}
        size={24}
      />
      {well.position}
    </button>
  );
}
