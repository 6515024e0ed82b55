import { useState } from 'react';
import { campaignHref } from '../contracts/links';
import type { AnalysisSummary, ScreenView } from '../contracts/screens';
import { AnalysisProgress } from './AnalysisProgress';
import { asApiError, requestJson, type ApiError } from './api';
import { Button, buttonLook } from './Button';
import { formatInstant } from './dates';
import { ErrorNote } from './ErrorNote';
import { AnalysesList } from './screen/AnalysesList';
import { WellsTable } from './screen/WellsTable';
import { formatBytes } from './upload/chosenFile';
import { FaultTable } from './upload/FaultTable';

export interface ScreenPageProps {
  view: ScreenView;
  groupId: string;
}

/** One screen: its workbook, its analyses, and what was found in each well. */
export function ScreenPage({ view, groupId }: ScreenPageProps) {
  const { screen, cautions, analyses, wells, may } = view;
  const [current, setCurrent] = useState<AnalysisSummary | null>(analyses[0] ?? null);
  const [running, setRunning] = useState(
    current?.status === 'queued' || current?.status === 'running',
  );
  const [starting, setStarting] = useState(false);
  const [error, setError] = useState<ApiError | null>(null);
  const leaderboardHref = campaignHref(groupId, screen.campaignId);

  const analyse = async () => {
    setStarting(true);
    setError(null);
    try {
      const path = `/api/v1/screens/${encodeURIComponent(screen.id)}/analyses`;
      const { analysis } = await requestJson<{ analysis: AnalysisSummary }>(path, {
        method: 'POST',
      });
      setCurrent(analysis);
      setRunning(true);
    } catch (thrown) {
      setError(asApiError(thrown));
    } finally {
      setStarting(false);
    }
  };
  const began = current !== null && current.id !== analyses[0]?.id;
  const followed = current !== null && (running || began || current.status === 'failed');

  return (
    <div className="space-y-10">
      <header>
        <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-2">
          <h1 className="display">{screen.name}</h1>
          <div className="flex flex-wrap gap-2 print:hidden">
            {current?.status === 'done' && !began && !running && (
              <a href={leaderboardHref} className={buttonLook('plain')}>
                See the leaderboard
              </a>
            )}
            {may.analyse && !running && (
              <Button
                kind={analyses.length === 0 ? 'main' : 'plain'}
                disabled={starting}
                onClick={() => void analyse()}
              >
                {starting
                  ? 'Starting…'
                  : analyses.length === 0
                    ? 'Analyse screen'
                    : 'Analyse screen again'}
              </Button>
            )}
          </div>
        </div>
        <p className="mt-2">
          {screen.plates} {screen.plates === 1 ? 'plate' : 'plates'}, {screen.wells} wells,{' '}
          {screen.readings} readings. Uploaded by {screen.uploadedBy} on{' '}
          {formatInstant(screen.uploadedAt)}.
        </p>
        <p className="text-quiet text-[13px] leading-5 wrap-anywhere">
          <a href={`/api/v1/screens/${encodeURIComponent(screen.id)}/original`} download>
            {screen.fileName}
          </a>
          , {formatBytes(screen.size)}, as it was uploaded. SHA-256 {screen.sha256}
        </p>
      </header>

      {error && <ErrorNote error={error} />}
      {followed && current && (
        <AnalysisProgress
          key={current.id}
          analysis={current}
          leaderboardHref={leaderboardHref}
          onRetry={may.analyse ? () => void analyse() : undefined}
          onEnd={() => setRunning(false)}
        />
      )}
      {current === null && (
        <p>
          This screen has not been analysed yet.{' '}
          {may.analyse
            ? 'One step fits every well, judges its order and brings it to the leaderboard.'
            : 'An analyst of the group can start that.'}
        </p>
      )}

      {cautions.length > 0 && (
        <details className="border-warning border-l-2 pl-4">
          <summary className="text-warning min-h-6 w-fit cursor-pointer font-semibold">
            {cautions.length === 1 ? 'One thing' : `${cautions.length} things`} to look at in the
            workbook
          </summary>
          <div className="mt-2">
            <FaultTable
              issues={cautions}
              caption="Cautions"
              saveAs={`cautions-in-${screen.name}.csv`}
            />
          </div>
        </details>
      )}
      <WellsTable wells={wells} groupId={groupId} campaignId={screen.campaignId} />
      <AnalysesList analyses={analyses} />
    </div>
  );
}
