import { useCallback, useSyncExternalStore } from 'react';
import type { CandidateWell } from '../../contracts/candidate';
import { wellInAddress, withWell } from './wellAddress';
import { firstWell } from './wellGroups';

const listeners = new Set<() => void>();

function subscribe(listener: () => void) {
  listeners.add(listener);
  addEventListener('popstate', listener);
  return () => {
    listeners.delete(listener);
    removeEventListener('popstate', listener);
  };
}

const fromAddress = () => wellInAddress(location.search);

/** The well that is open, kept in the address so that it can be sent to a colleague. */
export function useChosenWell(wells: readonly CandidateWell[], askedFor: string | null) {
  const wellId = useSyncExternalStore(subscribe, fromAddress, () => askedFor);
  const choose = useCallback(
    (next: string) => {
      if (!wells.some((well) => well.wellId === next)) return;
      history.replaceState(history.state, '', withWell(location.search, next) + location.hash);
      for (const listener of listeners) listener();
    },
    [wells],
  );
  return { chosen: firstWell(wells, wellId), choose };
}
