import { describe, expect, it } from 'vitest';
import accounts from '@/demo/accounts.json';
import { buildDemo } from '@/demo/buildDemo';
import { simulateDecay } from '@/demo/decay';
import { DEMO_TRUTHS, MARLBECK_TRUTHS } from '@/demo/truths';
import type { CatalystTruth } from '@/demo/types';
import { screenOf } from '../../fixtures/workbooks';

const demo = buildDemo();

describe('the demo scenario', () => {
  it('is the same for the same seed and another for another', () => {
    const bytes = (seed: number) =>
      buildDemo(seed).groups.flatMap(({ campaigns }) =>
        campaigns.flatMap(({ screens }) =>
          screens.map((screen) => Buffer.from(screen.bytes).toString('base64')),
        ),
      );
    expect(bytes(1)).toEqual(bytes(1));
    expect(bytes(1)).not.toEqual(bytes(2));
  });

  it('has 24 candidates at four temperatures in two replicates, with blanks and a benchmark', async () => {
    const [campaign] = demo.groups[0]!.campaigns;
    const screens = await Promise.all(campaign!.screens.map((screen) => screenOf(screen.bytes)));
    const wells = screens.flatMap((screen) => screen.wells);
    for (const { code } of MARLBECK_TRUTHS) {
      const own = wells.filter((well) => well.catalyst === code);
      expect(own).toHaveLength(8);
      expect(new Set(own.map((well) => well.temperatureK)).size).toBe(4);
    }
    for (const screen of screens) {
      for (const plate of screen.plates) {
        const roles = screen.wells
          .filter((well) => well.plate === plate.name)
          .map((well) => well.role);
        expect(roles).toEqual(expect.arrayContaining(['blank', 'support-blank', 'benchmark']));
        expect(plate.format).toBe(96);
      }
      expect(screen.cautions.map((caution) => caution.code)).toEqual(['negative-kept']);
    }
  });

  it('has a card and a truth for every catalyst of every screen', async () => {
    for (const campaign of demo.groups.flatMap((group) => group.campaigns)) {
      const cards = new Set(campaign.catalysts.map((card) => card.code));
      for (const screen of campaign.screens) {
        const { wells } = await screenOf(screen.bytes);
        const codes = wells.filter((well) => well.role === 'sample' || well.role === 'benchmark');
        for (const { catalyst } of codes) {
          expect(cards.has(catalyst!)).toBe(true);
          expect(DEMO_TRUTHS.has(catalyst!)).toBe(true);
        }
      }
    }
  });

  it('signs in every role of both groups with a password of its own', () => {
    expect(accounts).toHaveLength(8);
    expect(new Set(accounts.map((account) => account.email)).size).toBe(8);
    expect(new Set(accounts.map((account) => account.password)).size).toBe(8);
    for (const account of accounts) {
      expect(account.password.length).toBeGreaterThanOrEqual(12);
      expect(account.email).toMatch(/@(?:marlbeck|tarnside)\.example$/u);
      expect(demo.groups.map((group) => group.name)).toContain(account.group);
    }
  });
});

describe('simulated decays follow the integrated rate laws', () => {
  const conditions = {
    temperatureK: 333.15,
    referenceTemperatureK: 333.15,
    relativeLoading: 1,
    initialConcentration: 0.004,
    blankRate: 0,
  };
  const truth = (change: Partial<CatalystTruth>): CatalystTruth => ({
    ...MARLBECK_TRUTHS[0]!,
    ...change,
  });
  const at = 1800;
  const after = (change: Partial<CatalystTruth>) =>
    simulateDecay(truth(change), conditions, [0, at])[1]!;

  // Closed forms as in any textbook of kinetics; the simulation steps −dC/dt and uses none of them.
  it.each([
    ['zero', 1e-6, 0.004 - 1e-6 * at],
    ['first', 4e-4, 0.004 * Math.exp(-4e-4 * at)],
    ['second', 0.2, 0.004 / (1 + 0.2 * 0.004 * at)],
  ] as const)('%s', (law, k, expected) => {
    expect(after({ law, k })).toBeCloseTo(expected, 9);
  });

  it('saturating: ln(C0/C) + K (C0 − C) = k K t', () => {
    const k = 1.5e-6;
    const adsorptionConstant = 1500;
    const c = after({ law: 'saturating', k, adsorptionConstant });
    const left = Math.log(0.004 / c) + adsorptionConstant * (0.004 - c);
    expect(left).toBeCloseTo(k * adsorptionConstant * at, 7);
  });

  it('deactivating: C0 exp(−(k/kd)(1 − e^(−kd t)))', () => {
    const expected = 0.004 * Math.exp(-(6e-4 / 5e-4) * (1 - Math.exp(-5e-4 * at)));
    expect(after({ law: 'deactivating', k: 6e-4, deactivationRate: 5e-4 })).toBeCloseTo(
      expected,
      9,
    );
  });

  it('stops at zero when the reactant is used up', () => {
    expect(simulateDecay(truth({ law: 'zero', k: 1e-5 }), conditions, [0, 1800, 7200])).toEqual([
      0.004, 0, 0,
    ]);
  });
});
