import { newScreenHref, screensHref } from '../../contracts/links';
import type { Leaderboard } from '../../contracts/leaderboard';
import { buttonLook } from '../Button';

/** What to do when there is no candidate yet. */
export function EmptyLeaderboard(props: { leaderboard: Leaderboard; mayUpload: boolean }) {
  const { leaderboard, mayUpload } = props;
  const { groupId, id } = leaderboard.campaign;
  if (leaderboard.pendingScreens.length > 0) {
    return (
      <div>
        <p>
          The first candidates appear here as soon as an analysis is done. Nothing needs to be
          reloaded.
        </p>
        <Skeleton />
      </div>
    );
  }
  return (
    <div className="max-w-[60ch]">
      <p className="font-semibold">No candidate has been measured yet.</p>
      <p className="mt-1">
        Upload the workbook of a screen and analyse it. Each catalyst in it then becomes a line
        here, with its rate, its order and what remains uncertain.
      </p>
      <p className="mt-4">
        {mayUpload ? (
          <a className={buttonLook('main')} href={newScreenHref(groupId, id)}>
            Upload workbook
          </a>
        ) : (
          'An analyst of your group can do that.'
        )}
      </p>
    </div>
  );
}

/** Screens whose candidates are not in the table yet. */
export function PendingScreens({ leaderboard }: { leaderboard: Leaderboard }) {
  const { pendingScreens, campaign } = leaderboard;
  if (pendingScreens.length === 0) return null;
  const running = pendingScreens.filter((screen) => screen.analysisId !== null);
  const waiting = pendingScreens.filter((screen) => screen.analysisId === null);
  const names = (screens: typeof pendingScreens) => screens.map(({ name }) => name).join(', ');
  const screens = screensHref(campaign.groupId, campaign.id);
  return (
    <p className="pending">
      {running.length > 0 && <>Being analysed: {names(running)}. </>}
      {waiting.length > 0 && (
        <>
          Not analysed yet, so not in this table: {names(waiting)}.{' '}
          <a href={screens}>Go to the screens</a>
        </>
      )}
    </p>
  );
}

/** The place of rows that are on their way. */
export function Skeleton() {
  return (
    <div aria-hidden="true" className="skeleton">
      {Array.from({ length: 8 }, (_, index) => (
        <div key={index} style={{ opacity: 1 - index * 0.11 }}>
          <span style={{ width: 90 }} />
          <span style={{ width: 120 }} />
          <span style={{ width: 180 + ((index * 47) % 90) }} />
        </div>
      ))}
    </div>
  );
}
