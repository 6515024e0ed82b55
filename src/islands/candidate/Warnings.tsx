import type { CandidateView } from '../../contracts/candidate';

export interface WarningsProps {
  warnings: CandidateView['warnings'];
  /** The sentence that stands beside it already. */
  except: string;
  className?: string;
}

/** What to beware of; what the explanation says already is not said twice. */
export function Warnings({ warnings, except, className = '' }: WarningsProps) {
  const left = warnings.filter(({ sentence }) => sentence !== except);
  if (left.length === 0) return null;
  return (
    <ul
      aria-label="Warnings"
      className={`border-warning list-none space-y-2 border-l-2 p-0 pl-4 ${className}`}
    >
      {left.map(({ code, sentence }) => (
        <li key={`${code}-${sentence}`} className="max-w-[72ch]">
          {sentence}
        </li>
      ))}
    </ul>
  );
}
