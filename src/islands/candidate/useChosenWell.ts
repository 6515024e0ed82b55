import { useCallback, useEffect, useState } from 'react';
import type { CandidateWell } from '../../contracts/candidate';
import { wellInAddress, withWell } from './wellAddress';
import { firstWell } from './wellGroups';

/** The well that is open, kept in the address so that it can be sent to a colleague. */
export function useChosenWell(wells: readonly CandidateWell[], askedFor: string | null) {
  const [chosen, setChosen] = useState(() => firstWell(wells, askedFor));
  useEffect(() => {
    const follow = () => setChosen(firstWell(wells, wellInAddress(location.search)));
    follow();
    addEventListener('popstate', follow);
    return () => removeEventListener('popstate', follow);
  }, [wells]);
  const choose = useCallback(
    (wellId: string) => {
      const well = wells.find((one) => one.wellId === wellId);
      if (!well) return;
      setChosen(well);
      history.replaceState(history.state, '', withWell(location.search, wellId) + location.hash);
    },
    [wells],
  );
  return { chosen, choose };
}
