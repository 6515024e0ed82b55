import { lazy, Suspense, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import type { ChartOption } from './chartOption';
import type { ChartFrame, ChartTheme } from './chartTheme';
import { useChartTheme } from './useChartTheme';

const ChartCanvas = lazy(async () => ({ default: (await import('./ChartCanvas')).ChartCanvas }));

export interface ChartProps {
  /** A pure builder with its data bound; keep its identity between renders (`useCallback`). */
  build: (theme: ChartTheme, frame: ChartFrame) => ChartOption;
  /** px; reserved before the chart is there, so that nothing jumps. */
  height: number;
  /** What the chart shows, in words, for those who do not see it. */
  label: string;
  /** Written under the chart. */
  caption?: ReactNode;
  /** Called with the name of a clicked point. */
  onPick?: (name: string) => void;
}

function useWidth() {
  const ref = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(0);
  useEffect(() => {
    const box = ref.current;
    if (!box) return;
    const observer = new ResizeObserver(() => setWidth(Math.round(box.clientWidth)));
    setWidth(Math.round(box.clientWidth));
    observer.observe(box);
    return () => observer.disconnect();
  }, []);
  return { ref, width };
}

/** The one chart of the product: drawn in the browser as SVG, in the page's own colours. */
export function Chart({ build, height, label, caption, onPick }: ChartProps) {
  const theme = useChartTheme();
  const { ref, width } = useWidth();
  const option = useMemo(
    () => (theme && width > 0 ? build(theme, { width, height }) : null),
    [build, theme, width, height],
  );
  return (
    <figure className="m-0">
      <div ref={ref} role="img" aria-label={label} style={{ height }} className="overflow-hidden">
        {option && (
          <Suspense fallback={<p className="text-quiet pt-8 text-center">Drawing…</p>}>
            <ChartCanvas option={option} height={height} onPick={onPick} />
          </Suspense>
        )}
      </div>
      {caption && <figcaption className="text-quiet mt-1 text-[13px]">{caption}</figcaption>}
    </figure>
  );
}
