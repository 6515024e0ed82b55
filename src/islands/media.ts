import { useEffect, useState, useSyncExternalStore } from 'react';
import { flushSync } from 'react-dom';

/** Whether a media query holds; null on the server and in the first paint. */
export function useMedia(query: string): boolean | null {
  return useSyncExternalStore<boolean | null>(
    (changed) => {
      const list = matchMedia(query);
      list.addEventListener('change', changed);
      return () => list.removeEventListener('change', changed);
    },
    () => matchMedia(query).matches,
    () => null,
  );
}

/** True from the moment that the page is being printed, before the printer takes its picture. */
export function usePrinting(): boolean {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    const begin = () => flushSync(() => setPrinting(true));
    const end = () => setPrinting(false);
    addEventListener('beforeprint', begin);
    addEventListener('afterprint', end);
    return () => {
      removeEventListener('beforeprint', begin);
      removeEventListener('afterprint', end);
    };
  }, []);
  return printing;
}
