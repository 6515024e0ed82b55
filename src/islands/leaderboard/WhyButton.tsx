import { useId, useRef, useState } from 'react';
import type { LeaderboardRow } from '../../contracts/leaderboard';
import { verdictWord } from '../../screening/decayMarks';
import { DecayMark } from '../DecayMark';

const gap = 6;
const panelWidth = 340;

/** A row's verdict; pressed, it says why it is so and what to beware of. */
export function WhyButton({ row }: { row: LeaderboardRow }) {
  const id = useId();
  const panel = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const [open, setOpen] = useState(false);
  const { verdict, order, warnings, code } = row;

  /** The panel lies in the top layer, above what scrolls; so it is placed by hand. */
  const place = () => {
    const from = button.current?.getBoundingClientRect();
    const own = panel.current;
    if (!from || !own) return;
    const below = from.bottom + gap + own.offsetHeight < innerHeight;
    own.style.top = `${below ? from.bottom + gap : Math.max(8, from.top - gap - own.offsetHeight)}px`;
    own.style.left = `${Math.max(8, Math.min(from.left, innerWidth - panelWidth - 16))}px`;
  };

  return (
    <>
      <button
        ref={button}
        type="button"
        popoverTarget={id}
        aria-expanded={open}
        className="why"
        title="Why, and what to beware of"
      >
        <span className="flex items-center gap-2 whitespace-nowrap">
          <DecayMark verdict={verdict} order={order} silent />
          <span className="word">{verdictWord(verdict, order)}</span>
        </span>
        {warnings.length > 0 && (
          <span className="text-warning block pl-7 text-left text-[12.5px]">
            {warnings.length === 1 ? '1 warning' : `${warnings.length} warnings`}
          </span>
        )}
      </button>
      <div
        ref={panel}
        id={id}
        popover="auto"
        role="note"
        aria-label={`${code}: why this verdict`}
        onToggle={(event) => {
          setOpen(event.newState === 'open');
          if (event.newState === 'open') place();
        }}
        style={{ width: panelWidth }}
        className="bg-sheet text-ink border-quiet shadow-float fixed m-0 rounded-[3px] border p-4 text-[13.5px] leading-5 whitespace-normal"
      >
        <p className="font-semibold">
          {code}, {verdictWord(verdict, order)}
        </p>
        <p>{row.explanation}</p>
        {warnings.length > 0 && (
          <ul className="border-warning mt-3 list-none space-y-2 border-l-2 pl-3">
            {warnings.map((warning) => (
              <li key={warning.code}>{warning.sentence}</li>
            ))}
          </ul>
        )}
      </div>
    </>
  );
}
