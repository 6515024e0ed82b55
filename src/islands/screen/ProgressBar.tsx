export interface ProgressBarProps {
  label: string;
  /** 0 to 1; null while it is not known. */
  share: number | null;
  /** The same in words, such as `Wells 34 of 192`. */
  words: string;
}

/** How far something has come, as a line and in words. */
export function ProgressBar({ label, share, words }: ProgressBarProps) {
  const percent = share === null ? null : Math.round(Math.min(1, Math.max(0, share)) * 100);
  return (
    <div>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        {...(percent === null ? {} : { 'aria-valuenow': percent })}
        aria-valuetext={words}
        className="bg-rule h-1.5 overflow-hidden rounded-[3px]"
      >
        <div
          className="bg-accent h-full motion-safe:transition-[width] motion-safe:duration-150"
          style={{ width: `${percent ?? 0}%` }}
        />
      </div>
      <p className="text-quiet mt-1 text-[13.5px] tabular-nums">{words}</p>
    </div>
  );
}
