import { describe, expect, it } from 'vitest';
import {
  analyseScreen,
  explainProposal,
  proposals,
  type DecaySeries,
  type PlanningOptions,
  type ReadingKind,
} from '../../../../src/kinetics';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

const R = 8.31446261815324;
const forms = {
  zero: (u: number) => Math.max(1 - u, 0),
  first: (u: number) => Math.exp(-u),
  second: (u: number) => 1 / (1 + u),
};

interface Screen {
  law?: keyof typeof forms;
  kind?: ReadingKind;
  celsius?: number[];
  /** u reached at 60 °C. */
  reach?: number;
  noise?: number;
  readings?: number;
  wells?: number;
  seed?: number;
  /** A blank that reacts at the hottest temperature. */
  blanks?: boolean;
}

/** One catalyst, 52 kJ/mol, one hour per run; with what is proposed for it. */
function screened(given: Screen, options: PlanningOptions = {}) {
  const { law = 'first', kind = 'reactant', celsius = [40, 50, 60, 70], reach = 2.6 } = given;
  const { noise = 0.01, readings = 12, wells = 3, seed = 1, blanks = false } = given;
  const normal = seededNormal(seed);
  const timesS = times(readings, 3600);
  const unit = kind === 'conversion' ? 1 : 0.01;
  const well = (id: string, c: number, factor: number): DecaySeries => {
    const inverse = 1 / (c + 273.15) - 1 / 333.15;
    const kRel = ((factor * reach) / 3600) * Math.exp((-52_000 / R) * inverse);
    return decaySeries({
      id,
      temperatureK: c + 273.15,
      block: `run ${c}`,
      timesS,
      kind,
      dimension: kind === 'conversion' ? 'ratio' : 'concentration',
      values: timesS.map((t) => {
        const g = forms[law](kRel * t);
        return unit * ((kind === 'reactant' ? g : 1 - g) + noise * normal());
      }),
    });
  };
  const series = celsius.flatMap((c) =>
    Array.from({ length: wells }, (_, i) => well(`${c}-${i}`, c, 1)),
  );
  const dead = blanks
    ? celsius
        .slice(-1)
        .map((c) => ({ ...well('blank', c, 0.3), catalyst: null, role: 'blank' as const }))
    : [];
  const { series: analyses, catalysts } = analyseScreen([...series, ...dead], {
    temperatureK: 333.15,
    concentration: null,
    loadingGPerL: null,
    targetConversion: null,
  });
  const planned = analyses.map((analysis) => ({ analysis, timesS }));
  return { catalyst: catalysts[0]!, next: proposals(catalysts[0]!, planned, options) };
}

const codes = (screen: Screen) => screened(screen).next.map(({ code }) => code);

describe('what to run next', () => {
  it('is nothing for a catalyst whose order, k and Ea are settled', () => {
    const { catalyst, next } = screened({});
    expect(catalyst.verdict).toBe('first');
    expect(next).toEqual([]);
  });

  it('is a longer run, or a hotter one, for an open order', () => {
    const { catalyst, next } = screened({ celsius: [40, 44, 48, 52], reach: 0.7, seed: 3 });
    expect(catalyst.verdict).toBe('undetermined');
    const [first] = next;
    expect(first).toMatchObject({ code: 'sample-to', readings: 12 });
    expect(explainProposal(first!)).toMatch(
      /^Sample \d\d °C to [\d.]+ (min|h) \(12 readings, about \d\d % conversion\).* to tell \w+ from \w+ order\./,
    );
  });

  it('names the temperature at which the present time would do', () => {
    const options = { temperatureRangeK: [303.15, 373.15] as const };
    const { next } = screened({ celsius: [40, 44, 48, 52], reach: 0.7, seed: 3 }, options);
    const [first] = next;
    if (first?.code !== 'sample-to') throw new Error(`not expected: ${first?.code}`);
    expect(first.instead).toBeGreaterThan(first.temperatureK);
    expect(explainProposal(first)).toMatch(/, or add \d\d °C at the present run time,/);
  });

  it('is a third temperature where Ea has no interval', () => {
    const { next } = screened({ celsius: [50, 60] });
    expect(next).toEqual([
      {
        code: 'three-temperatures',
        measuredK: [323.15, 333.15],
        temperaturesK: [343.15],
      },
    ]);
    expect(explainProposal(next[0]!)).toBe(
      'Add 70 °C: the activation energy needs three temperatures for its interval.',
    );
  });

  it('is two temperatures where only one was measured', () => {
    const { next } = screened({ celsius: [60] });
    expect(next[0]).toMatchObject({ temperaturesK: [323.15, 343.15] });
  });

  it('is a longer or hotter run where nothing reacts', () => {
    const { next } = screened({ reach: 0, noise: 0.02 });
    expect(next.map(({ code }) => code)).toEqual(['detect-reaction']);
    const [plan] = next;
    if (plan?.code !== 'detect-reaction') throw new Error('not expected');
    expect(plan).toMatchObject({ temperatureK: 343.15, hotterK: 353.15, lastS: 14_400 });
    expect(plan.detectableNow / plan.detectableRate).toBeCloseTo(4, 10);
    expect(explainProposal(plan)).toMatch(
      /^Run 70 °C to 4 h, where rates above [\d.]+ × 10⁻⁸ mol L⁻¹ s⁻¹ would show, or go to 80 °C/,
    );
  });

  it('is earlier sampling where the reaction is over at once', () => {
    expect(codes({ reach: 200, celsius: [60] })).toContain('sample-earlier');
  });

  it('is more readings where there are too few for an order', () => {
    expect(codes({ readings: 4 })).toContain('more-readings-per-well');
    expect(codes({ readings: 2 })).toContain('more-readings-per-well');
  });

  it('is a second well where one decides', () => {
    expect(codes({ wells: 1, celsius: [60] })).toContain('repeat-only-well');
  });

  it('is blanks where they react and were not run at the temperature of the wells', () => {
    const { next } = screened({ blanks: true });
    expect(next).toContainEqual({
      code: 'run-blanks',
      temperaturesK: [313.15, 323.15, 333.15],
    });
  });

  it('is plate runs at the ends of the range for a wide activation energy', () => {
    const { next } = screened({ celsius: [58, 60, 62], seed: 5 });
    const plan = next.find(({ code }) => code === 'tighten-activation-energy');
    if (plan?.code !== 'tighten-activation-energy') throw new Error('not expected');
    expect(plan.halfWidth).toBeGreaterThan(5000);
    expect(plan.expectedHalfWidth).toBeLessThan(plan.halfWidth);
    for (const t of plan.temperaturesK) expect([321.15, 345.15]).toContain(t);
  });
});

/** Every number in a value is finite, and nothing is undefined. */
function faults(value: unknown, at = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [at];
  if (value === undefined) return [at];
  if (value === null || typeof value !== 'object') return [];
  return Object.entries(value).flatMap(([key, one]) => faults(one, `${at}.${key}`));
}

describe('proposals of any screen', () => {
  const cases = (['zero', 'first', 'second'] as const).flatMap((law) =>
    (['reactant', 'product', 'conversion'] as const).flatMap((kind) =>
      [
        { reach: 0.4 },
        { reach: 3, noise: 0.05, readings: 6 },
        { reach: 80 },
        { reach: 0 },
        { noise: 0 },
      ].map((more, i) => ({ law, kind, celsius: [50, 60, 70], wells: 2, seed: 7 + i, ...more })),
    ),
  );

  it.each(cases)('are plain numbers and sentences: %o', (screen) => {
    const { next } = screened(screen);
    expect(faults(next)).toEqual([]);
    expect(JSON.parse(JSON.stringify(next))).toEqual(next);
    for (const proposal of next) {
      expect(explainProposal(proposal)).toMatch(/^[A-Z].*\.$/);
      expect(explainProposal(proposal)).not.toMatch(/NaN|undefined|Infinity|null|e[+-]\d/);
    }
    expect(next.length).toBeLessThanOrEqual(5);
  });
});
