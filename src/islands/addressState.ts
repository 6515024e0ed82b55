import { useCallback, useEffect, useRef, useState } from 'react';

const writeAfterMs = 150;

/**
 * State that lives in the query string, so that a view can be sent to a colleague.
 *
 * @param read from a query string; stable
 * @param write into a query string, whose other parameters stay; stable
 * @param search the query string that the server was asked with, where it is known
 */
export function useAddressState<T>(
  read: (query: string) => T,
  write: (state: T, query: string) => string,
  search: string,
): [state: T, change: (next: T) => void] {
  const [state, setState] = useState(() => read(search));
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => {
    const readAgain = () => setState(read(location.search));
    if (location.search !== search) readAgain();
    addEventListener('popstate', readAgain);
    return () => removeEventListener('popstate', readAgain);
  }, [read, search]);

  const change = useCallback(
    (next: T) => {
      setState(next);
      clearTimeout(timer.current);
      // A browser refuses many changes of the address in a row, as typing would make.
      timer.current = setTimeout(() => {
        const query = write(next, location.search);
        history.replaceState(history.state, '', `${location.pathname}${query}${location.hash}`);
      }, writeAfterMs);
    },
    [write],
  );
  return [state, change];
}
