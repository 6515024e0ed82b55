import { useVirtualizer } from '@tanstack/react-virtual';
import { useRef } from 'react';

/** Up to so many lines all are in the page, where the browser's search finds them. */
const virtualFrom = 80;

/**
 * Which lines of a long table are in the page.
 *
 * @param height px of every line
 * @param printing draws all of them
 * @returns the scroller's ref, the first and last line (inclusive), and the px left out around them
 */
export function useVirtualLines(count: number, height: number, printing: boolean) {
  const scroller = useRef<HTMLDivElement>(null);
  const all = count <= virtualFrom || printing;
  const virtual = useVirtualizer({
    count,
    getScrollElement: () => scroller.current,
    estimateSize: () => height,
    overscan: 10,
    initialRect: { width: 1200, height: 900 },
    enabled: !all,
  });
  const shown = all ? [] : virtual.getVirtualItems();
  const first = all ? 0 : (shown[0]?.index ?? 0);
  const last = all ? count - 1 : (shown.at(-1)?.index ?? -1);
  return {
    scroller,
    first,
    last,
    before: first * height,
    after: Math.max(0, (count - 1 - last) * height),
  };
}
