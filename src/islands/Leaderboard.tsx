import { QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { Leaderboard as LeaderboardView } from '../contracts/leaderboard';
import { asApiError, requestJson } from './api';
import { Button } from './Button';
import { conditionsOf } from './campaign/conditions';
import { ErrorNote } from './ErrorNote';
import { useAddressState } from './addressState';
import { readLook, sortedBy, writeLook } from './leaderboard/address';
import { announcement } from './leaderboard/announce';
import { arrange } from './leaderboard/arrange';
import { ColumnChoice } from './leaderboard/ColumnChoice';
import { leaderboardColumns } from './leaderboard/columns';
import { FilterBar } from './leaderboard/FilterBar';
import { buildForestSetting, ForestProvider } from './leaderboard/forestSetting';
import { LeaderboardList } from './leaderboard/LeaderboardList';
import { EmptyLeaderboard, PendingScreens } from './leaderboard/LeaderboardStates';
import { LeaderboardTable } from './leaderboard/LeaderboardTable';
import { useMedia, usePrinting } from './media';
import { formatPercent } from './numbers';

export interface LeaderboardProps {
  initial: LeaderboardView;
  mayUpload: boolean;
  /** Query string of the request, so that the server draws what the address asks for. */
  search?: string;
}

const whileRunningMs = 5_000;

/** The campaign's candidates as a forest plot that can be sorted, narrowed and sent on. */
export function Leaderboard(props: LeaderboardProps) {
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <LiveLeaderboard {...props} />
    </QueryClientProvider>
  );
}

function LiveLeaderboard({ initial, mayUpload, search = '' }: LeaderboardProps) {
  const { id } = initial.campaign;
  const query = useQuery({
    queryKey: ['leaderboard', id],
    queryFn: ({ signal }) =>
      requestJson<LeaderboardView>(`/api/v1/campaigns/${id}/leaderboard`, { signal }),
    initialData: initial,
    staleTime: 30_000,
    retry: 1,
    refetchInterval: ({ state }) =>
      state.data?.pendingScreens.some((screen) => screen.analysisId !== null)
        ? whileRunningMs
        : false,
  });
  const leaderboard = query.data;
  return (
    <>
      <div className="heading-row">
        <h1 className="display">Leaderboard</h1>
        <Conditions leaderboard={leaderboard} />
      </div>
      {query.isError && (
        <div className="mb-4">
          <ErrorNote error={asApiError(query.error)}>
            <p className="mb-2">What is shown is from before.</p>
            <Button onClick={() => void query.refetch()} disabled={query.isFetching}>
              Try again
            </Button>
          </ErrorNote>
        </div>
      )}
      <PendingScreens leaderboard={leaderboard} />
      {leaderboard.rows.length === 0 ? (
        <EmptyLeaderboard leaderboard={leaderboard} mayUpload={mayUpload} />
      ) : (
        <Candidates leaderboard={leaderboard} search={search} />
      )}
    </>
  );
}

function Conditions({ leaderboard: { campaign } }: { leaderboard: LeaderboardView }) {
  return (
    <p className="text-quiet text-[13.5px]">
      Compared {conditionsOf(campaign)}, to {formatPercent(campaign.targetConversion)} conversion
    </p>
  );
}

function Candidates({ leaderboard, search }: { leaderboard: LeaderboardView; search: string }) {
  const { campaign, rows } = leaderboard;
  const [look, change] = useAddressState(readLook, writeLook, search);
  const narrow = useMedia('(max-width: 767px)');
  const printing = usePrinting();
  const setting = useMemo(
    () => buildForestSetting(campaign, rows, look.sort),
    [campaign, rows, look.sort],
  );
  const columns = useMemo(() => leaderboardColumns(campaign, look.sort), [campaign, look.sort]);
  const lines = useMemo(() => arrange(rows, look), [rows, look]);
  const shown = lines.filter((line) => line.kind === 'row').length;
  const asTable = narrow !== true || printing;
  return (
    <ForestProvider value={setting}>
      <FilterBar rows={rows} look={look} onChange={change} />
      <div className="key-row">
        <p id="leaderboard-key" className="text-quiet text-[13px]">
          <span className="max-md:hidden">
            Dot and whisker: value and 95 % interval; ± is one standard error.{' '}
          </span>
          <span className="text-accent font-semibold">= 1</span> cannot be told from the best.
          Dashed bar: between zero and second order.
        </p>
        <ColumnChoice columns={columns} look={look} onChange={change} />
      </div>
      <p role="status" className="sr-only">
        {announcement(look, columns, shown, rows.length)}
      </p>
      {shown === 0 ? (
        <p className="py-8">
          No candidate fits all of this. Take a filter away, or{' '}
          <button
            type="button"
            className="text-accent min-h-6 cursor-pointer underline"
            onClick={() => change({ ...look, search: '', verdicts: [], states: [], tags: [] })}
          >
            show all {rows.length}
          </button>
          .
        </p>
      ) : (
        <>
          {asTable && (
            <div className={narrow === null ? 'max-md:hidden' : ''}>
              <LeaderboardTable
                rows={rows}
                lines={lines}
                columns={columns}
                look={look}
                onSort={(sort) => change(sortedBy(look, sort))}
                printing={printing}
              />
            </div>
          )}
          {(narrow !== false || !asTable) && !printing && (
            <div className={narrow === null ? 'md:hidden' : ''}>
              <LeaderboardList
                lines={lines}
                columns={columns}
                campaign={campaign}
                look={look}
                onChange={change}
              />
            </div>
          )}
        </>
      )}
    </ForestProvider>
  );
}
