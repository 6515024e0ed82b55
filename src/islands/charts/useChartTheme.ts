import { useEffect, useState } from 'react';
import { flushSync } from 'react-dom';
import { chartFont, printTheme, type ChartTheme } from './chartTheme';

const tokens = ['sheet', 'ink', 'quiet', 'rule', 'accent', 'warning', 'refusal'] as const;

/** Paints a CSS colour of any notation on one pixel and reads it back as hex. */
function hexOf(brush: CanvasRenderingContext2D, colour: string): string {
  brush.clearRect(0, 0, 1, 1);
  brush.fillStyle = colour;
  brush.fillRect(0, 0, 1, 1);
  const [r = 0, g = 0, b = 0] = brush.getImageData(0, 0, 1, 1).data;
  return `#${[r, g, b].map((part) => part.toString(16).padStart(2, '0')).join('')}`;
}

/** The page's tokens as the renderer can paint them. */
function readTheme(): ChartTheme {
  if (matchMedia('print').matches) return printTheme;
  const brush = document.createElement('canvas').getContext('2d', { willReadFrequently: true });
  if (!brush) return printTheme;
  const style = getComputedStyle(document.documentElement);
  const colours = tokens.map((token) => [
    token,
    hexOf(brush, style.getPropertyValue(`--${token}`).trim() || printTheme[token]),
  ]);
  return {
    ...(Object.fromEntries(colours) as Omit<ChartTheme, 'fontFamily'>),
    fontFamily: chartFont,
  };
}

/**
 * The chart's colours, kept in step with light, dark and print. Null on the server and in the first
 * paint, so that both agree.
 */
export function useChartTheme(): ChartTheme | null {
  const [theme, setTheme] = useState<ChartTheme | null>(null);
  useEffect(() => {
    const read = () => setTheme(readTheme());
    // A printer does not wait for the next frame.
    const readAtOnce = () => flushSync(read);
    read();
    const dark = matchMedia('(prefers-color-scheme: dark)');
    const print = matchMedia('print');
    const marked = new MutationObserver(read);
    dark.addEventListener('change', read);
    print.addEventListener('change', readAtOnce);
    marked.observe(document.documentElement, { attributeFilter: ['data-theme', 'class'] });
    return () => {
      dark.removeEventListener('change', read);
      print.removeEventListener('change', readAtOnce);
      marked.disconnect();
    };
  }, []);
  return theme;
}
