import { describe, expect, it } from 'vitest';
import type { BatchResponse } from '../../../src/contracts/batchResponse';
import { answerBatch } from '../../../src/workers/analyseBatch';
import { seededNormal, seededRandom } from '../../fixtures/decaySeries';

const BATCHES = 400;
const random = seededRandom(1);
const normal = seededNormal(9);
const pick = <T>(all: readonly T[]) => all[Math.floor(random() * all.length)]!;
const finite = (value: number) => (Number.isFinite(value) ? value : 0);

/** A well-formed series whose numbers are anything that JSON can hold. */
function oddSeries(id: string) {
  const n = Math.floor(random() * 12);
  const [timeScale, scale] = [1e-320, 1e-300, 1e-160, 1e-12, 1, 1e3, 1e12, 1e160, 1e307]
    .sort(() => random() - 0.5)
    .slice(0, 2) as [number, number];
  const start = pick([0, 0, 1, -1, -4, 1e9]);
  const decay = pick([0, 0.1, 1, 5, 100]);
  const kind = pick(['reactant', 'product', 'conversion', 'signal']);
  const c0 = { value: pick([1e-300, 1, 1e300]), unit: pick(['mol/L', 'kPa']) };
  return {
    id,
    catalyst: id,
    role: pick(['sample', 'benchmark', 'blank']),
    temperature: { value: pick([1e-300, 300, 310, 1e300]), unit: 'K' },
    time: {
      values: Array.from({ length: n }, (_, i) =>
        finite(timeScale * (start + pick([i, i, i, 0, random() * i]))),
      ),
      unit: pick(['ms', 's', 'd']),
    },
    reading: {
      values: Array.from({ length: n }, (_, i) => {
        const share = pick([1, 1, 1, -1, 0, 1e3]) * Math.exp((-decay * i) / n);
        return pick([null, ...Array<number>(5).fill(finite(scale * (share + 0.01 * normal())))]);
      }),
      unit: kind === 'conversion' ? '%' : kind === 'signal' ? '1' : pick(['umol/L', 'bar']),
      kind,
    },
    ...(kind === 'conversion' && random() < 0.5 ? { initialConcentration: c0 } : {}),
    ...(kind === 'product' ? { productPerReactant: pick([1e-300, 1, 1e300]) } : {}),
    catalystMass: { value: pick([0, 1e-320, 5, 1e300]), unit: 'mg' },
    volume: { value: pick([1e-320, 2, 1e300]), unit: 'mL' },
    law: pick(['auto', 'auto', 'zero', 'first', 'second', { order: -1 }, { order: 4 }]),
  };
}

/** Null belongs where a quantity is not known, never inside one: there it was NaN or infinite. */
function expectWholeQuantities(result: object): void {
  for (const [key, field] of Object.entries(result) as [string, unknown][]) {
    if (typeof field !== 'object' || field === null || !('value' in field)) continue;
    expect(typeof field.value, key).toBe('number');
  }
}

describe('batches of numbers that no laboratory has', () => {
  it('are answered, series by series, without an error', () => {
    for (let batch = 0; batch < BATCHES; batch += 1) {
      const series = Array.from({ length: 1 + Math.floor(random() * 5) }, (_, i) =>
        oddSeries(`${i}`),
      );
      const reference = {
        temperature: { value: pick([1e-300, 300, 1e300]), unit: 'K' },
        concentration: { value: pick([1e-320, 0.01, 1e300]), unit: pick(['mol/L', 'Pa']) },
        catalystLoading: { value: pick([1e-320, 2, 1e300]), unit: 'g/L' },
        targetConversion: pick([1e-320, 0.8, 1 - 2 ** -53]),
      };
      const text = JSON.stringify({ reference, series });
      const { status, body } = answerBatch(new TextEncoder().encode(text));
      expect(status, text).toBe(200);
      const answer = JSON.parse(new TextDecoder().decode(body)) as BatchResponse;
      expect(answer.series.map((one) => one.id)).toEqual(series.map((one) => one.id));
      for (const one of [...answer.series, ...answer.catalysts]) expectWholeQuantities(one);
      for (const one of answer.series) {
        for (const fit of Object.values(one.fits)) expect(typeof fit.rss).toBe('number');
        if (!['zero', 'first', 'second', 'saturating', 'forced'].includes(one.verdict)) {
          expect([one.k, one.kRel, one.order]).toEqual([null, null, null]);
        }
      }
    }
  });
});

describe('a single very long series', () => {
  it('is answered as any other', () => {
    const n = 130_000;
    const time = Array.from({ length: n }, (_, i) => i);
    const values = time.map((i) => 10 * Math.exp((-2 * i) / n) + 0.1 * Math.sin(9.7 * i));
    const series = {
      id: 'long',
      catalyst: 'X',
      temperature: { value: 40, unit: 'degC' },
      time: { values: time, unit: 's' },
      reading: { values, unit: 'mmol/L' },
    };
    const { status, body } = answerBatch(
      new TextEncoder().encode(JSON.stringify({ series: [series] })),
    );
    expect(status).toBe(200);
    const answer = JSON.parse(new TextDecoder().decode(body)) as BatchResponse;
    expect(answer.series[0]!.verdict).toBe('first');
    expect(answer.series[0]!.points.used).toBe(n);
  });
});
