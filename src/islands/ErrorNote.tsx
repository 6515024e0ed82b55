import type { ReactNode } from 'react';
import type { ApiError } from './api';

export interface ErrorNoteProps {
  error: ApiError;
  /** A way on, such as a button to try again. */
  children?: ReactNode;
}

/** What went wrong, why, and what to do; read out when it appears. */
export function ErrorNote({ error, children }: ErrorNoteProps) {
  return (
    <div role="alert" className="border-refusal border-l-2 py-1 pl-4">
      <p className="text-refusal font-semibold">{error.title}</p>
      <p>{error.detail}</p>
      {error.requestId && <p className="text-quiet text-[13px]">Noted as {error.requestId}.</p>}
      {children && <div className="mt-2">{children}</div>}
    </div>
  );
}
