import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { analyseSeries, GAS_CONSTANT } from '../../../src/kinetics';
import { harmonicMeanK } from '../../../src/kinetics/catalyst/compensation';
import { testCurvature } from '../../../src/kinetics/catalyst/curvature';
import { lineThrough } from '../../../src/kinetics/catalyst/weightedLine';
import { decaySeries, sharedDigits } from '../../fixtures/decaySeries';

interface Curve {
  name: string;
  source: string;
  kind: 'level' | 'product';
  times: number[];
  values: number[];
  level: number | null;
  levelSe: number | null;
  c0: number | null;
  k: number;
  kSe: number;
  rss: number;
  aicc: number;
}

interface Line {
  name: string;
  source: string;
  temperaturesK: number[];
  k: number[];
  activationEnergy: number;
  activationEnergySe: number;
  lnA: number;
  chi2: number;
  dof: number;
  harmonicMeanK: number;
}

const published = JSON.parse(
  readFileSync(new URL('../../reference/publishedCurves.json', import.meta.url), 'utf8'),
) as { curves: Curve[]; lines: Line[] };

describe('published first-order curves', () => {
  it.each(published.curves.map((curve) => [curve.name, curve] as const))('%s', (_, curve) => {
    const leveled = curve.kind === 'level';
    const analysis = analyseSeries(
      decaySeries({
        law: 'first',
        level: leveled,
        kind: leveled ? 'reactant' : 'product',
        timesS: curve.times,
        values: curve.values,
      }),
    );
    const fit = analysis.fits.first!;
    expect(sharedDigits(fit.k, curve.k)).toBeGreaterThan(8);
    expect(sharedDigits(fit.kSe, curve.kSe)).toBeGreaterThan(7);
    expect(sharedDigits(fit.rss, curve.rss)).toBeGreaterThan(8);
    expect(sharedDigits(fit.aicc, curve.aicc)).toBeGreaterThan(7);
    if (curve.level !== null) {
      expect(sharedDigits(analysis.level!.value, curve.level)).toBeGreaterThan(8);
      expect(sharedDigits(analysis.level!.se, curve.levelSe!)).toBeGreaterThan(7);
    } else {
      expect(sharedDigits(fit.c0, curve.c0!)).toBeGreaterThan(8);
    }
  });
});

describe('published lines against 1/T', () => {
  it.each(published.lines.map((line) => [line.name, line] as const))('%s', (_, given) => {
    const x = given.temperaturesK.map((t) => 1 / t);
    const y = given.k.map(Math.log);
    const line = lineThrough(
      x,
      y,
      x.map(() => 1),
    );
    expect(sharedDigits(-GAS_CONSTANT * line.slope, given.activationEnergy)).toBeGreaterThan(9);
    expect(sharedDigits(line.level - line.slope * line.centre, given.lnA)).toBeGreaterThan(9);
    expect(sharedDigits(line.chi2, given.chi2)).toBeGreaterThan(7);
    const se = GAS_CONSTANT * Math.sqrt((line.slopeVariance * line.chi2) / given.dof);
    expect(sharedDigits(se, given.activationEnergySe)).toBeGreaterThan(7);
    expect(sharedDigits(harmonicMeanK(given.temperaturesK), given.harmonicMeanK)).toBeGreaterThan(
      11,
    );
  });

  it('steam bends, as its heat of evaporation falls: the quadratic has p = 0.0099', () => {
    const steam = published.lines.find(({ name }) => name.includes('steam'))!;
    const points = steam.temperaturesK.map((temperatureK, i) => ({
      seriesId: `${i}`,
      temperatureK,
      lnK: Math.log(steam.k[i]!),
      se: 0.01,
      block: `${i}`,
    }));
    expect(testCurvature(points)!.p).toBeCloseTo(0.0099, 4);
  });
});
