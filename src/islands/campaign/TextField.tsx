import { useId } from 'react';

export interface TextFieldProps {
  label: string;
  value: string;
  onChange: (value: string) => void;
  fault?: string | undefined;
  /** Written after the field. */
  unit?: string;
  hint?: string;
  name: string;
  /** Shows a numeric keyboard and narrows the field. */
  numeric?: boolean;
  rows?: number;
}

const box =
  'border-rule bg-sheet focus-visible:outline-accent aria-invalid:border-refusal min-h-9 rounded-[3px] border px-2 focus-visible:outline-2';

/** One field with its label, unit, hint and fault. */
export function TextField(props: TextFieldProps) {
  const { label, value, onChange, fault, unit = '', hint, name, numeric = false, rows } = props;
  const id = useId();
  const described = [hint && `${id}-hint`, fault && `${id}-fault`].filter(Boolean).join(' ');
  const shared = {
    id,
    name,
    value,
    autoComplete: 'off',
    'aria-invalid': fault !== undefined,
    'aria-describedby': described || undefined,
  };
  return (
    <div>
      <label htmlFor={id} className="font-semibold">
        {label}
      </label>
      <div className="mt-1 flex items-center gap-2">
        {rows ? (
          <textarea
            {...shared}
            rows={rows}
            onChange={(event) => onChange(event.target.value)}
            className={`${box} w-full py-1.5`}
          />
        ) : (
          <input
            {...shared}
            {...(numeric ? { inputMode: 'decimal' as const } : {})}
            onChange={(event) => onChange(event.target.value)}
            className={`${box} ${numeric ? 'w-32 text-right tabular-nums' : 'w-full'}`}
          />
        )}
        {unit && <span className="text-quiet whitespace-nowrap">{unit}</span>}
      </div>
      {hint && (
        <p id={`${id}-hint`} className="text-quiet mt-0.5 text-[13px]">
          {hint}
        </p>
      )}
      {fault && (
        <p id={`${id}-fault`} className="text-refusal mt-0.5 text-[13px]">
          {fault}
        </p>
      )}
    </div>
  );
}
