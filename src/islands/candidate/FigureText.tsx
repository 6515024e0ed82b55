import type { Figure } from './figures';

/** A number with its unit; the interval stands quieter below it. */
export function FigureText({ figure }: { figure: Figure }) {
  return (
    <>
      <span className="text-[17px] leading-6 font-semibold tabular-nums">{figure.text}</span>{' '}
      <span className="whitespace-nowrap">{figure.unit}</span>
      {figure.interval && (
        <span className="text-quiet block text-[13px] leading-5 tabular-nums">
          95 %: {figure.interval}
        </span>
      )}
    </>
  );
}
