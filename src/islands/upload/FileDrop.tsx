import { useId, useState, type DragEvent } from 'react';
import { acceptedEndings, formatBytes } from './chosenFile';

export interface FileDropProps {
  file: File | null;
  disabled: boolean;
  fault: string | null;
  onFile: (file: File) => void;
}

/** A place to drop a workbook on, which is also a plain file field. */
export function FileDrop({ file, disabled, fault, onFile }: FileDropProps) {
  const [over, setOver] = useState(false);
  const id = useId();
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    const [dropped] = event.dataTransfer.files;
    if (dropped && !disabled) onFile(dropped);
  };
  return (
    <div>
      <label
        htmlFor={id}
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={drop}
        className={`focus-within:outline-accent flex min-h-36 cursor-pointer flex-col items-center justify-center rounded-[3px] border border-dashed px-4 py-6 text-center focus-within:outline-2 focus-within:outline-offset-2 ${
          over ? 'border-accent bg-sheet' : 'border-quiet'
        }`}
      >
        {file ? (
          <>
            <span className="font-semibold wrap-anywhere">{file.name}</span>
            <span className="text-quiet text-[13px]">
              {formatBytes(file.size)} · choose another
            </span>
          </>
        ) : (
          <>
            <span className="font-semibold">Drop a workbook here, or choose one</span>
            <span className="text-quiet text-[13px]">
              {acceptedEndings.join(', ')}; at most 32 MB
            </span>
          </>
        )}
        <input
          id={id}
          type="file"
          className="sr-only"
          accept={acceptedEndings.join(',')}
          disabled={disabled}
          aria-describedby={fault ? `${id}-fault` : undefined}
          onChange={(event) => {
            const [chosen] = event.target.files ?? [];
            if (chosen) onFile(chosen);
          }}
        />
      </label>
      {fault && (
        <p id={`${id}-fault`} role="alert" className="text-refusal mt-1">
          {fault}
        </p>
      )}
    </div>
  );
}
