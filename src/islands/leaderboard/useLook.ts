import { useEffect, useState } from 'react';
import { readLook, writeLook, type LeaderboardLook } from './address';

const writeAfterMs = 150;

/**
 * The look of the leaderboard, kept in the address.
 *
 * @param search the query string that the server was asked with, where it is known
 */
export function useLook(search: string) {
  const [look, setLook] = useState<LeaderboardLook>(() => readLook(search));
  useEffect(() => {
    const read = () => setLook(readLook(location.search));
    if (location.search !== search) read();
    addEventListener('popstate', read);
    return () => removeEventListener('popstate', read);
  }, [search]);

  const change = (next: LeaderboardLook) => setLook(next);

  useEffect(() => {
    // A browser refuses many changes of the address in a row, as typing would make.
    const timer = setTimeout(() => {
      const query = writeLook(look, location.search);
      if (query !== location.search)
        history.replaceState(history.state, '', location.pathname + query + location.hash);
    }, writeAfterMs);
    return () => clearTimeout(timer);
  }, [look]);

  return { look, change };
}
