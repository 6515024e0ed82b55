import { describe, expect, it } from 'vitest';
import {
  analyseSeries,
  explainCatalyst,
  explainSeries,
  explainWarning,
} from '../../../src/kinetics';
import { analyseScreen } from '../../../src/kinetics/analyseScreen';
import type { CatalystAnalysis, SeriesAnalysis, WarningCode } from '../../../src/kinetics/types';
import { decaySeries, seededNormal, times } from '../../fixtures/decaySeries';

const t = times(20, 3600);
const values = (conversion: number) => {
  const normal = seededNormal(4);
  return t.map((time) => 0.01 * ((1 - conversion) ** (time / 3600) + 0.01 * normal()));
};
const well = analyseSeries(decaySeries({ timesS: t, values: values(0.9) }));
const catalyst = analyseScreen([decaySeries({ timesS: t, values: values(0.9) })], {
  temperatureK: null,
  concentration: null,
  loadingGPerL: null,
  targetConversion: null,
}).catalysts[0]!;
const said = (given: Partial<SeriesAnalysis>) => explainSeries({ ...well, ...given });
const saidOf = (given: Partial<CatalystAnalysis>) => explainCatalyst({ ...catalyst, ...given });

describe('sentences', () => {
  it('each warning tells what to do, and ends', () => {
    const codes: WarningCode[] = ['outlier', 'blank-reacts', 'few-wells', 'arrhenius-curved'];
    for (const code of codes) expect(explainWarning(code)).toMatch(/^[A-Z].{30,}\.$/);
  });

  it('an asserted order names its support', () => {
    expect(explainSeries(well)).toMatch(/^First order: its curve has .* times the support/);
  });

  it('low conversion names the rivals and the way out', () => {
    const low = analyseSeries(decaySeries({ timesS: t, values: values(0.31) }));
    expect(explainSeries(low)).toMatch(
      /^(Zero and first|First and second) order cannot be told apart: only 3\d % was converted\. Run to 70 % or more\.$/,
    );
  });

  it('every verdict has words', () => {
    expect(said({ verdict: 'forced', order: 1.5 })).toBe(
      'Order 1.5 by choice: the law was set by hand, not found.',
    );
    expect(said({ verdict: 'saturating' })).toContain('full surface');
    expect(said({ verdict: 'other' })).toContain('no simple order');
    expect(said({ verdict: 'no-reaction' })).toContain('do not fall beyond their noise');
    expect(said({ verdict: 'no-reaction', warnings: ['rising'] })).toContain('wrong way');
    expect(said({ verdict: 'unusable', warnings: ['too-few-distinct-times'] })).toContain(
      'different times',
    );
    expect(said({ verdict: 'unusable' })).toContain('Fewer than 3 usable');
    expect(said({ verdict: 'undetermined', warnings: ['too-few-for-order'] })).toContain(
      'Fewer than 5',
    );
    expect(said({ verdict: 'undetermined', warnings: ['order-uncertain'] })).toContain('tied down');
    expect(said({ verdict: 'undetermined', warnings: ['no-simple-order'] })).toContain(
      'bent curve',
    );
  });

  it('every verdict on a catalyst has words', () => {
    expect(explainCatalyst(catalyst)).toBe(
      'First order, decided by its one well at 1 temperature.',
    );
    expect(saidOf({ verdict: 'saturating' })).toContain('Saturating');
    expect(saidOf({ verdict: 'forced', order: 0 })).toContain('Zero order by choice');
    expect(saidOf({ verdict: 'other', warnings: [] })).toContain('no simple order');
    expect(saidOf({ verdict: 'no-reaction' })).toContain('wells taken together');
    expect(saidOf({ verdict: 'unusable' })).toContain('None of its wells');
  });
});
