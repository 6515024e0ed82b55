import { describe, expect, it } from 'vitest';
import { analyseScreen, explainCatalyst, GAS_CONSTANT, rateLaws } from '../../../src/kinetics';
import type {
  CatalystAnalysis,
  DecaySeries,
  ReferenceConditions,
} from '../../../src/kinetics/types';
import { decaySeries, seededNormal, seededRandom, times } from '../../fixtures/decaySeries';

const EA = 55_000;
const T_REF = 333.15;
const reference: ReferenceConditions = {
  temperatureK: T_REF,
  concentration: 0.01,
  loadingGPerL: 2.5,
  targetConversion: 0.8,
};

interface Screen {
  order: number;
  temperaturesK?: number[];
  replicates?: number;
  /** Conversion at 333.15 K. */
  conversion?: number;
  noise?: number;
  energy?: number;
  with?: Partial<DecaySeries>;
}

/** Wells of one catalyst; k at the reference temperature from the conversion reached there. */
function wells(screen: Screen, seed = 1): DecaySeries[] {
  const { order, replicates = 2, noise = 0.01, energy = EA, conversion = 0.85 } = screen;
  const law = rateLaws.find((one) => one.order === order)!;
  const t = times(24, 3600);
  const normal = seededNormal(seed);
  return (screen.temperaturesK ?? [313.15, 323.15, 333.15, 343.15]).flatMap((temperatureK) =>
    Array.from({ length: replicates }, (_, r) => {
      const factor = Math.exp((-energy / GAS_CONSTANT) * (1 / temperatureK - 1 / T_REF));
      const kRel = (law.reach(conversion) / 3600) * factor;
      return decaySeries({
        id: `${temperatureK}-${r}`,
        temperatureK,
        timesS: t,
        values: t.map((time) => 0.01 * (law.relative(kRel * time) + noise * normal())),
        loadingGPerL: 2.5,
        ...screen.with,
      });
    }),
  );
}

const analyse = (
  series: DecaySeries[],
  given: Partial<ReferenceConditions> = {},
): CatalystAnalysis => analyseScreen(series, { ...reference, ...given }).catalysts[0]!;

describe('a catalyst with a clear order', () => {
  it.each(rateLaws.map((law) => [law.name, law] as const))(
    '%s: k, Ea, rate and time',
    (name, law) => {
      const result = analyse(wells({ order: law.order }));
      const kRel = law.reach(0.85) / 3600;
      expect(result.verdict).toBe(name);
      expect(result.basis).toBe('law');
      expect(result.bracket).toBe(false);
      expect(
        Math.abs(result.activationEnergy!.value - EA) / result.activationEnergy!.se!,
      ).toBeLessThan(4);
      expect(result.kRef!.value / law.kOf(kRel, 0.01)).toBeCloseTo(1, 1);
      expect(result.kRefTemperatureK).toBe(T_REF);
      expect(result.rateRef!.value / (kRel * 0.01)).toBeCloseTo(1, 1);
      expect(result.timeToTarget!.value / (law.reach(0.8) / kRel)).toBeCloseTo(1, 1);
      expect(result.timeToTarget!.low).toBeGreaterThan(0);
      const { value, low, high } = result.kRef!;
      expect(high! / value).toBeCloseTo(value / low!, 10);
      expect(result.temperatures).toBe(4);
      expect(result.wells).toBe(8);
      expect(result.warnings).toEqual([]);
    },
  );

  it('A and k at the reference belong to one line', () => {
    const result = analyse(wells({ order: 1 }));
    const lnK = result.lnA!.value - result.activationEnergy!.value / (GAS_CONSTANT * T_REF);
    expect(Math.exp(lnK) / result.kRef!.value).toBeCloseTo(1, 10);
  });

  it('rates per mass and per site follow from the rate per volume', () => {
    const result = analyse(wells({ order: 1, with: { siteDensityMolPerKg: 0.1, nu: 2 } }));
    expect(result.rateRefPerMass!.value / (result.rateRef!.value * 400)).toBeCloseTo(1, 12);
    expect(result.turnoverFrequency!.value / (result.rateRefPerMass!.value / 0.2)).toBeCloseTo(
      1,
      12,
    );
  });

  it('k scales with the reference loading', () => {
    const one = analyse(wells({ order: 1 }));
    const two = analyse(wells({ order: 1 }), { loadingGPerL: 5 });
    expect(two.kRef!.value / one.kRef!.value).toBeCloseTo(2, 12);
    expect(two.activationEnergy!.value).toBeCloseTo(one.activationEnergy!.value, 6);
  });

  it('without a reference k stands at the harmonic mean temperature', () => {
    const none = {
      temperatureK: null,
      concentration: null,
      loadingGPerL: null,
      targetConversion: null,
    };
    const result = analyse(wells({ order: 1 }), none);
    expect(result.kRefTemperatureK).toBeGreaterThan(313.15);
    expect(result.kRefTemperatureK).toBeLessThan(343.15);
    expect(result.rateRef).toBeNull();
    expect(result.timeToTarget).toBeNull();
    expect(result.warnings).toContain('loading-unknown');
  });
});

describe('few temperatures', () => {
  it('one measured reference temperature has k and rate but no Ea', () => {
    const result = analyse(wells({ order: 1, temperaturesK: [T_REF], replicates: 3 }));
    expect(result.kRef!.low).toBeGreaterThan(0);
    expect(result.rateRef).not.toBeNull();
    expect(result.activationEnergy).toBeNull();
    expect(result.lnA).toBeNull();
    expect(result.warnings).toContain('one-temperature');
  });
  it('one temperature elsewhere has no k at the reference', () => {
    const result = analyse(wells({ order: 1, temperaturesK: [313.15] }));
    expect(result.verdict).toBe('undetermined');
    expect(analyse(wells({ order: 1, temperaturesK: [343.15] })).kRef).toBeNull();
  });
  it('two temperatures have Ea without an interval', () => {
    const result = analyse(wells({ order: 1, temperaturesK: [T_REF, 343.15] }));
    expect(result.activationEnergy).toMatchObject({ se: null, low: null, high: null });
    expect(result.activationEnergy!.value / EA).toBeCloseTo(1, 0);
    expect(result.kRef!.low).not.toBeNull();
    expect(result.warnings).toContain('two-temperatures');
  });
  it('a single well decides by itself, with a warning', () => {
    const result = analyse(wells({ order: 1, temperaturesK: [T_REF], replicates: 1 }));
    expect(result.verdict).toBe('first');
    expect(result.kRef!.low).toBeLessThan(result.kRef!.value);
    expect(result.warnings).toContain('few-wells');
  });
});

describe('a catalyst that the wells do not decide', () => {
  const result = analyse(
    wells({ order: 1, conversion: 0.12, temperaturesK: [313.15, 323.15, 333.15] }),
  );

  it('is undetermined and stands on initial rates', () => {
    expect(result.verdict).toBe('undetermined');
    expect(result.basis).toBe('initial-rate');
    expect(result.activationEnergy).toBeNull();
    expect(result.kRef).toBeNull();
    expect(result.lnA).toBeNull();
    const energy = result.initialRateActivationEnergy!;
    expect(energy.low).toBeLessThan(EA);
    expect(energy.high).toBeGreaterThan(EA);
  });
  it('brackets rate and time between orders 0 and 2', () => {
    expect(result.bracket).toBe(true);
    const kRel = -Math.log(0.88) / 3600;
    expect(result.timeToTarget!.low).toBeLessThan(0.8 / kRel);
    expect(result.timeToTarget!.high).toBeGreaterThan(4 / kRel);
    const half = analyse(wells({ order: 1, conversion: 0.12 }), { concentration: 0.005 });
    expect(half.rateRef!.low).toBeLessThan(kRel * 0.01 * 0.3);
    expect(half.rateRef!.high).toBeGreaterThan(kRel * 0.01 * 0.9);
    expect(half.warnings).toContain('extrapolated-concentration');
  });
  it('says why in words', () => {
    expect(explainCatalyst(result)).toMatch(/cannot be told apart: only \d+ % was converted/);
  });
});

describe('catalysts of no simple order', () => {
  const shapes: [string, (u: number) => number][] = [
    ['a level that stays', (u) => 0.3 + 0.7 * Math.exp(-1.6 * u)],
    ['a catalyst that dies', (u) => Math.exp(-1.2 * (1 - Math.exp(-1.6 * u)))],
  ];
  it.each(shapes)('%s is not called an order over 8 wells at 2 %% noise', (_, shape) => {
    let asserted = 0;
    for (let run = 0; run < 20; run += 1) {
      const normal = seededNormal(run + 1);
      const series = wells({ order: 1 }, run).map((well) => {
        const factor = Math.exp((-EA / GAS_CONSTANT) * (1 / well.temperatureK - 1 / T_REF));
        const values = well.timesS.map(
          (time) => 0.01 * (shape((factor * time) / 3600) + 0.02 * normal()),
        );
        return { ...well, values };
      });
      if (analyse(series).order !== null) asserted += 1;
    }
    expect(asserted).toBeLessThanOrEqual(4);
  });

  it('simple orders are rarely called something else', () => {
    const verdicts = Array.from({ length: 30 }, (_, run) =>
      analyse(wells({ order: run % 3, noise: 0.02 }, run + 1)),
    );
    const right = verdicts.filter((result, run) => result.order === run % 3).length;
    const wrong = verdicts.filter(
      (result, run) => result.order !== null && result.order !== run % 3,
    );
    expect(right).toBeGreaterThan(20);
    expect(wrong).toHaveLength(0);
  });
});

describe('warnings', () => {
  it('an order that changes with temperature is a finding', () => {
    const low = wells({ order: 0, temperaturesK: [323.15, T_REF], conversion: 0.9, energy: 0 });
    const high = wells(
      { order: 1, temperaturesK: [343.15, 353.15], conversion: 0.9, energy: 0 },
      2,
    );
    const result = analyse([...low, ...high]);
    expect(result.verdict).toBe('other');
    expect(result.warnings).toContain('order-changes-with-temperature');
    expect(explainCatalyst(result)).toContain('Different temperatures');
  });
  it('low and negative activation energies', () => {
    expect(analyse(wells({ order: 1, energy: 12_000 })).warnings).toContain(
      'low-activation-energy',
    );
    const falling = analyse(wells({ order: 1, energy: -20_000 }));
    expect(falling.warnings).toContain('negative-activation-energy');
  });
  it('a reference outside the measured temperatures and concentrations', () => {
    const far = analyse(wells({ order: 1 }), { temperatureK: 373.15, concentration: 0.1 });
    expect(far.warnings).toContain('extrapolated-temperature');
    expect(far.warnings).toContain('extrapolated-concentration');
  });
  it('a reacting blank at a nearby temperature', () => {
    const blank = wells({
      order: 1,
      temperaturesK: [T_REF],
      replicates: 1,
      with: { id: 'b', role: 'blank', catalyst: null },
    });
    expect(analyse([...wells({ order: 1 }), ...blank]).warnings).toContain('blank-reacts');
  });
  it('but neither a blank far slower than the catalyst, nor blanks that do not react', () => {
    const blanks = (conversion: number, seed: number) =>
      wells({ order: 1, conversion, with: { role: 'blank', catalyst: null } }, seed).map(
        (well, i) => ({ ...well, id: `b${i}` }),
      );
    const slow = analyse([...wells({ order: 1 }), ...blanks(0.05, 5)]);
    expect(slow.warnings.filter((code) => code.startsWith('blank-'))).toEqual([]);
    const alarms = Array.from({ length: 200 }, (_, i) =>
      analyse([...wells({ order: 1, conversion: 0.3 }), ...blanks(1e-9, 100 + i)]),
    ).filter((one) => one.warnings.some((code) => code.startsWith('blank-'))).length;
    expect(alarms).toBeLessThanOrEqual(8);
  });
  it('a reacting blank of another signal scale counts by its relative rate', () => {
    const asSignal = (series: DecaySeries[], scale: number) =>
      series.map((well) => ({
        ...well,
        id: `${well.role} ${well.id}`,
        kind: 'signal' as const,
        dimension: 'ratio' as const,
        values: well.values.map((value) => scale * value!),
      }));
    const blanks = (conversion: number) =>
      wells({ order: 1, conversion, with: { role: 'blank', catalyst: null } }, 5);
    const own = asSignal(wells({ order: 1 }), 100);
    const fast = analyse([...own, ...asSignal(blanks(0.3), 1)]);
    expect(fast.warnings).toContain('blank-subtracted');
    const slow = analyse([...own, ...asSignal(blanks(0.05), 1e5)]);
    expect(slow.warnings).not.toContain('blank-subtracted');
  });
  it('loadings unknown, or known for some wells only', () => {
    expect(analyse(wells({ order: 1, with: { loadingGPerL: null } })).warnings).toContain(
      'loading-unknown',
    );
    const mixed = wells({ order: 1 });
    mixed[0]!.loadingGPerL = null;
    const result = analyse(mixed);
    expect(result.warnings).toContain('loading-mixed');
    expect(result.arrhenius!.points).toHaveLength(7);
  });
  it('wells that force different laws', () => {
    const mixed = wells({ order: 1 });
    mixed[0]!.law = 'second';
    const result = analyse(mixed);
    expect(result.warnings).toContain('mixed-forced-laws');
    expect(result.verdict).toBe('first');
  });
});

describe('forced, dead and unusable catalysts', () => {
  it('all wells forced to one law force the catalyst', () => {
    const result = analyse(wells({ order: 1, with: { law: { order: 1.5 } } }));
    expect(result.verdict).toBe('forced');
    expect(result.order).toBe(1.5);
    expect(result.kUnit).toBe('(mol/L)^(-0.5) s^-1');
  });
  it('one law asked for in two ways is one law', () => {
    const same = wells({ order: 1, with: { law: 'first' } });
    same[0]!.law = { order: 1 };
    const result = analyse(same);
    expect(result.verdict).toBe('forced');
    expect(result.warnings).not.toContain('mixed-forced-laws');
  });
  it('no reacting well leaves nothing to compare', () => {
    const result = analyse(wells({ order: 1, conversion: 1e-6 }));
    expect(result.verdict).toBe('no-reaction');
    expect(result.kRef).toBeNull();
    expect(result.warnings).toContain('no-reacting-wells');
  });
  it('no usable well is unusable', () => {
    const result = analyse(wells({ order: 1, with: { timesS: [], values: [] } }));
    expect(result.verdict).toBe('unusable');
    expect(explainCatalyst(result)).toContain('enough usable readings');
    expect(result.warnings).toEqual(['too-few-readings']);
    const still = { timesS: [0, 0, 60], values: [1, 1, 0.5] };
    expect(analyse(wells({ order: 1, with: still })).warnings).toEqual(['too-few-distinct-times']);
  });
  it('relative readings keep Ea by kRel where k needs a concentration', () => {
    const series = wells({ order: 2 }).map((well) => ({
      ...well,
      kind: 'signal' as const,
      dimension: 'ratio' as const,
    }));
    const result = analyse(series);
    expect(result.verdict).toBe('second');
    expect(result.kRef).toBeNull();
    expect(result.activationEnergy!.value / EA).toBeCloseTo(1, 1);
  });
});

describe('a whole screen', () => {
  it('reports progress and keeps the order of wells and catalysts', () => {
    const first = wells({ order: 1, with: { catalyst: 'Z' } }).map((well, i) => ({
      ...well,
      id: `z${i}`,
    }));
    const second = wells({ order: 2, with: { catalyst: 'A', role: 'benchmark' } });
    const control = decaySeries({
      id: 'c',
      role: 'control',
      catalyst: 'A',
      timesS: [],
      values: [],
    });
    const seen: number[] = [];
    const result = analyseScreen([...first, ...second, control], reference, (done, total) => {
      expect(total).toBe(17);
      seen.push(done);
    });
    expect(seen).toEqual(Array.from({ length: 17 }, (_, i) => i + 1));
    expect(result.catalysts.map((one) => [one.catalyst, one.wells])).toEqual([
      ['Z', 8],
      ['A', 8],
    ]);
    expect(result.series).toHaveLength(17);
  });
});

describe('odd screens', () => {
  it('never fail and never answer NaN', () => {
    const random = seededRandom(5);
    const normal = seededNormal(6);
    const pick = <T>(all: readonly T[]) => all[Math.floor(random() * all.length)]!;
    for (let run = 0; run < 300; run += 1) {
      const scale = 10 ** (random() * 18 - 12);
      const series = Array.from({ length: 1 + Math.floor(random() * 8) }, (_, i) => {
        const t = times(3 + Math.floor(random() * 10), pick([1, 1e5]));
        const kRel = pick([0, 1, 5, 50]) / t[t.length - 1]!;
        return decaySeries({
          id: `${i}`,
          role: pick(['sample', 'benchmark', 'blank'] as const),
          temperatureK: pick([1, 300, 301, 320, 1500]),
          timesS: t,
          values: t.map((x) => pick([scale * (Math.exp(-kRel * x) + pick([0, 0.02]) * normal())])),
          kind: pick(['reactant', 'product', 'signal'] as const),
          loadingGPerL: pick([null, 0, 1, 5]),
          siteDensityMolPerKg: pick([null, 0.1]),
          law: pick(['auto', 'auto', 'zero', { order: 2.5 }] as const),
        });
      });
      const given = {
        temperatureK: pick([null, 1, 300, 5000]),
        concentration: pick([null, 1e-12, 1e6]),
        loadingGPerL: pick([null, 2]),
        targetConversion: pick([null, 0.999]),
      };
      const text = JSON.stringify(analyseScreen(series, given), (_, value: unknown) => {
        if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
        expect(value).not.toBeUndefined();
        return value;
      });
      expect(text.length).toBeGreaterThan(0);
    }
  });
});
