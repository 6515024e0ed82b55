import { createElement } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { NextRuns } from '@/islands/candidate/NextRuns';

describe('the list of what to run next', () => {
  it('has a heading that names it and a sentence for each proposal', () => {
    const html = renderToStaticMarkup(
      createElement(NextRuns, {
        proposals: [
          { code: 'sample-to', sentence: 'Sample 60 °C to 2.1 h.' },
          { code: 'three-temperatures', sentence: 'Add 75 °C.' },
        ],
      }),
    );
    expect(html).toContain('aria-labelledby="next-runs"');
    expect(html).toContain('What to run next</h2>');
    expect(html.match(/<li/g)).toHaveLength(2);
    expect(html).toContain('Sample 60 °C to 2.1 h.');
  });

  it('is not there when nothing is open', () => {
    expect(renderToStaticMarkup(createElement(NextRuns, { proposals: [] }))).toBe('');
  });
});
