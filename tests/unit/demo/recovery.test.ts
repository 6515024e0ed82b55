import { beforeAll, describe, expect, it } from 'vitest';
import { buildDemo, DEMO_SEED } from '@/demo/buildDemo';
import { DEMO_TRUTHS } from '@/demo/truths';
import type { CatalystTruth, DemoCampaign } from '@/demo/types';
import { analyseScreen, type CatalystAnalysis, type Estimate } from '@/kinetics/index';
import type { ParsedScreen } from '@/workbooks/types';
import { screenOf } from '../../fixtures/workbooks';

const SEEDS = [DEMO_SEED, 11, 12];
const SIMPLE = ['zero', 'first', 'second'];

interface Found {
  truth: CatalystTruth;
  analysis: CatalystAnalysis;
}

function analyse(screen: ParsedScreen, campaign: DemoCampaign): Found[] {
  const series = screen.wells.map((well, index) => ({
    id: String(index),
    catalyst: well.catalyst,
    role: well.role,
    block: `${well.plate} at ${well.temperatureK} K`,
    temperatureK: well.measuredTemperatureK ?? well.temperatureK,
    timesS: well.readings.timesS,
    values: well.readings.values,
    dimension: screen.dimension,
    kind: screen.kind,
    initialConcentration: null,
    productPerReactant: 1,
    loadingGPerL: well.massG === null || well.volumeL === null ? null : well.massG / well.volumeL,
    siteDensityMolPerKg: null,
    nu: campaign.nu,
    law: 'auto' as const,
  }));
  const { catalysts } = analyseScreen(series, {
    temperatureK: campaign.referenceTemperatureK,
    concentration: campaign.referenceConcentration,
    loadingGPerL: campaign.referenceLoadingGPerL,
    targetConversion: campaign.targetConversion,
  });
  return catalysts.map((analysis) => ({ analysis, truth: DEMO_TRUTHS.get(analysis.catalyst)! }));
}

const holds = (estimate: Estimate | null, value: number) =>
  estimate?.low != null && estimate.high != null && estimate.low <= value && value <= estimate.high;

/** The truths come from a step-by-step simulation (`decay.ts`), not from the engine's formulas. */
describe('the engine finds what the demo catalysts really do', () => {
  const found: Found[] = [];
  beforeAll(async () => {
    for (const seed of SEEDS) {
      for (const campaign of buildDemo(seed).groups.flatMap((group) => group.campaigns)) {
        for (const { bytes } of campaign.screens) {
          found.push(...analyse(await screenOf(bytes), campaign));
        }
      }
    }
  });
  const clear = () =>
    found.filter(({ truth }) => truth.story === 'clear' && SIMPLE.includes(truth.law));

  it('never asserts a different simple order', () => {
    for (const { truth, analysis } of found) {
      if (SIMPLE.includes(analysis.verdict)) expect(analysis.verdict, truth.code).toBe(truth.law);
    }
  });

  it('asserts the right order for nearly all clear candidates', () => {
    const right = clear().filter(({ truth, analysis }) => analysis.verdict === truth.law);
    expect(right.length / clear().length).toBeGreaterThan(0.8);
  });

  it('asserts no order where the readings cannot tell, and none for dead catalysts', () => {
    for (const { truth, analysis } of found) {
      if (truth.story !== 'undecidable' && truth.story !== 'dead') continue;
      expect(['undetermined', 'no-reaction'], truth.code).toContain(analysis.verdict);
      expect(analysis.kRef, truth.code).toBeNull();
    }
  });

  it('gives a deactivating catalyst no simple order', () => {
    const dying = found.filter(({ truth }) => truth.law === 'deactivating');
    for (const { truth, analysis } of dying) {
      expect([...SIMPLE, 'saturating'], truth.code).not.toContain(analysis.verdict);
    }
  });

  it('finds the saturating ones, their k and K mostly within their 95 % intervals', () => {
    const saturating = found.filter(({ truth }) => truth.law === 'saturating');
    for (const { truth, analysis } of saturating) {
      expect(analysis.verdict, truth.code).toBe('saturating');
    }
    const k = saturating.filter(({ truth, analysis }) => holds(analysis.kRef, truth.k));
    const adsorption = saturating.filter(({ truth, analysis }) =>
      holds(analysis.adsorption?.K ?? null, truth.adsorptionConstant!),
    );
    expect(k.length / saturating.length).toBeGreaterThanOrEqual(0.85);
    expect(adsorption.length / saturating.length).toBeGreaterThanOrEqual(0.85);
  });

  it('covers the true k and Ea with at least nine in ten of its 95 % intervals', () => {
    const asserted = clear().filter(({ truth, analysis }) => analysis.verdict === truth.law);
    const k = asserted.filter(({ truth, analysis }) => holds(analysis.kRef, truth.k));
    const ea = asserted.filter(({ truth, analysis }) =>
      holds(analysis.activationEnergy, truth.activationEnergy),
    );
    expect(asserted.length).toBeGreaterThan(40);
    expect(k.length / asserted.length).toBeGreaterThanOrEqual(0.9);
    expect(ea.length / asserted.length).toBeGreaterThanOrEqual(0.9);
  });

  it('warns of the transport-limited one by its low activation energy', () => {
    const limited = found.filter(({ truth }) => truth.story === 'transport-limited');
    expect(limited.length).toBe(SEEDS.length);
    for (const { analysis } of limited) {
      if (analysis.verdict === 'first')
        expect(analysis.warnings).toContain('low-activation-energy');
    }
    expect(limited.some(({ analysis }) => analysis.verdict === 'first')).toBe(true);
  });
});
