import type { OneStep } from '../../kinetics/types';
import { oneStepFigures } from './oneStepFigures';

/** The energy of all readings at once, beside that of the single wells. */
export function OneStepNote({ oneStep }: { oneStep: OneStep | null }) {
  if (oneStep === null) return null;
  return (
    <p className="text-quiet mt-1 max-w-[72ch]">
      {oneStepFigures(oneStep).map(({ name, text, interval }, i) => (
        <span key={name}>
          {i > 0 && '; '}
          {name}: <span className="tabular-nums">{text}</span>
          {interval && ` (95 %: ${interval})`}
        </span>
      ))}
      .{oneStep.disagreesWithTwoStep && ' The two answers differ beyond their intervals.'}
    </p>
  );
}
