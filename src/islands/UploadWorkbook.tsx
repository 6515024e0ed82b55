import { useId, useRef, useState, type SubmitEvent } from 'react';
import { screensHref } from '../contracts/links';
import type { UploadAnswer } from '../contracts/screens';
import { asApiError, type ApiError } from './api';
import { Button } from './Button';
import { ProgressBar } from './screen/ProgressBar';
import { faultOfFile, screenNameFrom } from './upload/chosenFile';
import { FileDrop } from './upload/FileDrop';
import { sendWorkbook } from './upload/sendWorkbook';
import { UploadDone, UploadRefused } from './upload/UploadOutcome';

export interface UploadWorkbookProps {
  groupId: string;
  campaignId: string;
}

/** Uploads one screening workbook; it is stored whole or not at all. */
export function UploadWorkbook({ groupId, campaignId }: UploadWorkbookProps) {
  const [file, setFile] = useState<File | null>(null);
  const [name, setName] = useState('');
  const [fault, setFault] = useState<string | null>(null);
  const [sent, setSent] = useState<number | null>(null);
  const [error, setError] = useState<ApiError | null>(null);
  const [answer, setAnswer] = useState<UploadAnswer | null>(null);
  const named = useRef(false);
  const stop = useRef<AbortController | null>(null);
  const nameId = useId();
  const sending = sent !== null;

  const choose = (chosen: File) => {
    setFile(chosen);
    setFault(faultOfFile(chosen));
    setError(null);
    if (!named.current) setName(screenNameFrom(chosen.name));
  };

  const submit = async (event: SubmitEvent) => {
    event.preventDefault();
    const problem = file ? faultOfFile(file) : 'Choose a workbook first.';
    setFault(problem);
    if (!file || problem) return;
    setSent(0);
    setError(null);
    stop.current = new AbortController();
    const { signal } = stop.current;
    try {
      const stored = await sendWorkbook({ campaignId, name: name.trim(), file }, setSent, signal);
      setAnswer(stored);
      if (stored.cautions.length === 0 && !stored.alreadyImported) location.assign(stored.href);
    } catch (thrown) {
      if (!signal.aborted) setError(asApiError(thrown));
    } finally {
      setSent(null);
    }
  };

  if (answer) return <UploadDone answer={answer} />;
  return (
    <div className="space-y-8">
      <form onSubmit={(event) => void submit(event)} className="max-w-2xl space-y-5">
        <FileDrop file={file} disabled={sending} fault={fault} onFile={choose} />
        <div>
          <label htmlFor={nameId} className="font-semibold">
            Name of the screen
          </label>
          <input
            id={nameId}
            value={name}
            maxLength={160}
            disabled={sending}
            autoComplete="off"
            onChange={(event) => {
              named.current = event.target.value !== '';
              setName(event.target.value);
            }}
            className="border-rule bg-sheet focus-visible:outline-accent mt-1 block min-h-9 w-full rounded-[3px] border px-2 focus-visible:outline-2"
          />
        </div>
        {sending ? (
          <div className="space-y-3">
            <ProgressBar
              label="Upload"
              share={sent}
              words={sent < 1 ? `${Math.round(sent * 100)} % sent` : 'Reading the workbook…'}
            />
            <Button onClick={() => stop.current?.abort()}>Stop</Button>
          </div>
        ) : (
          <div className="flex flex-wrap items-center gap-4">
            <Button kind="main" type="submit">
              Upload workbook
            </Button>
            <a href={screensHref(groupId, campaignId)} className="min-h-6">
              Back to the screens
            </a>
          </div>
        )}
      </form>
      <div aria-live="polite">
        {error && <UploadRefused error={error} fileName={file?.name ?? 'the workbook'} />}
      </div>
    </div>
  );
}
