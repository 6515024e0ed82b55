import { describe, expect, it } from 'vitest';
import type { BatchResponse } from '../../../src/contracts/batchResponse';
import { answerBatch } from '../../../src/workers/analyseBatch';
import { batchSeries } from '../../fixtures/batch';
import { seededNormal, times } from '../../fixtures/decaySeries';

const encode = (text: string) => new TextEncoder().encode(text);
const ask = (document: unknown) => {
  const { status, contentType, body } = answerBatch(encode(JSON.stringify(document)));
  return { status, contentType, text: new TextDecoder().decode(body) };
};
const answered = (document: unknown) => {
  const { status, text } = ask(document);
  expect(status).toBe(200);
  return JSON.parse(text) as BatchResponse;
};

const reference = {
  temperature: { value: 60, unit: 'degC' },
  concentration: { value: 0.01, unit: 'mol/L' },
  catalystLoading: { value: 2.5, unit: 'g/L' },
  targetConversion: 0.8,
};

/** 96 wells: 12 catalysts at 4 temperatures, two of each. */
function plate(conversion: number) {
  const normal = seededNormal(17);
  const t = times(20, 60);
  return Array.from({ length: 96 }, (_, i) => {
    const celsius = 40 + 10 * (i % 4);
    const factor = Math.exp((-50_000 / 8.314) * (1 / (celsius + 273.15) - 1 / 333.15));
    const u = -Math.log(1 - conversion) * factor;
    return {
      ...batchSeries(),
      id: `W${i}`,
      catalyst: `MB-${Math.floor(i / 8)}`,
      block: `plate 1 / ${celsius} degC`,
      temperature: { value: celsius, unit: 'degC' },
      time: { values: t, unit: 'min' },
      reading: {
        values: t.map((x) => 10 * Math.exp((-u * x) / 60) + 0.08 * normal()),
        unit: 'mmol/L',
      },
      catalystMass: { value: 5, unit: 'mg' },
      volume: { value: 2, unit: 'mL' },
    };
  });
}

describe('a batch of 96 series', () => {
  const result = answered({ reference, series: plate(0.85) });

  it('answers every series and catalyst with the keys of the contract, all of them', () => {
    expect(result.series).toHaveLength(96);
    expect(result.catalysts).toHaveLength(12);
    expect(Object.keys(result)).toEqual(['engine', 'series', 'catalysts']);
    for (const series of result.series) {
      expect(Object.keys(series)).toEqual(
        'id verdict order law k kRel K c0 net conversion initialRate apparentOrder fits points warnings'.split(
          ' ',
        ),
      );
      for (const [law, fit] of Object.entries(series.fits)) {
        const keys = 'k kSe kRel kRelSe c0 c0Se rss aicc weight'.split(' ');
        expect(Object.keys(fit)).toEqual(law === 'saturating' ? [...keys, 'K', 'KSe'] : keys);
      }
    }
    for (const catalyst of result.catalysts) {
      expect(Object.keys(catalyst)).toEqual(
        'catalyst verdict order basis activationEnergy initialRateActivationEnergy lnA kRef rateRef timeToTarget temperatures wells warnings'.split(
          ' ',
        ),
      );
    }
  });

  it('gives values with the units of the contract', () => {
    const series = result.series.find((one) => one.verdict === 'first')!;
    expect(Object.keys(series.k!)).toEqual(['value', 'unit', 'se', 'low', 'high']);
    expect(series.k!.unit).toBe('s^-1');
    expect(series.kRel!.unit).toBe('s^-1');
    expect(series.c0!.unit).toBe('mol/L');
    expect(series.initialRate!.unit).toBe('mol L^-1 s^-1');
    expect(series.points).toEqual({ used: 20, excluded: 0 });
    const catalyst = result.catalysts.find((one) => one.verdict === 'first')!;
    expect(catalyst.activationEnergy!.unit).toBe('kJ/mol');
    expect(catalyst.activationEnergy!.value).toBeCloseTo(50, -1);
    expect(catalyst.lnA!.unit).toBe('s^-1');
    expect(catalyst.kRef!.temperature).toEqual({ value: 333.15, unit: 'K' });
    expect(catalyst.kRef!.value).toBeCloseTo(-Math.log(0.15) / 3600, 4);
    expect(catalyst.rateRef!.unit).toBe('mol L^-1 s^-1');
    expect(catalyst.timeToTarget!.unit).toBe('s');
    expect(catalyst.wells).toBe(8);
    expect(catalyst.temperatures).toBe(4);
  });

  it('undetermined wells have no k, and their catalysts stand on initial rates', () => {
    const low = answered({ reference, series: plate(0.1) });
    const catalyst = low.catalysts.find((one) => one.verdict === 'undetermined')!;
    expect(catalyst.basis).toBe('initial-rate');
    expect([catalyst.activationEnergy, catalyst.lnA, catalyst.kRef]).toEqual([null, null, null]);
    expect(catalyst.initialRateActivationEnergy!.unit).toBe('kJ/mol');
    expect(catalyst.rateRef!.low).toBeLessThan(catalyst.rateRef!.high!);
    for (const series of low.series.filter((one) => one.verdict === 'undetermined')) {
      expect([series.k, series.kRel]).toEqual([null, null]);
      expect(series.initialRate).not.toBeNull();
    }
  });
});

describe('single answers', () => {
  it('a series that cannot be fitted does not fail the batch', () => {
    const empty = {
      ...batchSeries(),
      time: { values: [], unit: 's' },
      reading: { values: [], unit: 'mol/L' },
    };
    const { series, catalysts } = answered({ series: [empty] });
    expect(series[0]).toMatchObject({
      verdict: 'unusable',
      fits: {},
      warnings: ['too-few-readings'],
    });
    expect(catalysts[0]!.verdict).toBe('unusable');
  });

  it('forced laws repeat the request', () => {
    const { series, catalysts } = answered({ series: [{ ...batchSeries(), law: { order: 1.5 } }] });
    expect(series[0]).toMatchObject({ verdict: 'forced', order: 1.5, law: { order: 1.5 } });
    expect(series[0]!.k!.unit).toBe('(mol/L)^(-0.5) s^-1');
    expect(catalysts[0]!.verdict).toBe('forced');
  });

  it('pressures answer in Pa, blanks appear in no catalyst', () => {
    const pressure = {
      ...batchSeries(),
      role: 'blank',
      reading: { values: [10, 9, 8.1, 7.3, 6.5, 5.3], unit: 'kPa' },
      law: 'second',
    };
    const { series, catalysts } = answered({ series: [pressure] });
    expect(series[0]!.k!.unit).toBe('Pa^-1 s^-1');
    expect(series[0]!.c0!.value).toBeCloseTo(10_000, -3);
    expect(catalysts).toEqual([]);
  });

  it('percent is answered as 1', () => {
    const reading = { values: [0, 18, 33, 45, 55, 70], unit: '%', kind: 'conversion' };
    const { series } = answered({ series: [{ ...batchSeries(), reading, law: 'first' }] });
    expect(series[0]!.k!.value).toBeCloseTo(3.33e-4, 5);
    expect(series[0]!.initialRate!.unit).toBe('s^-1');
    expect(series[0]!.c0).toBeNull();
  });
});

describe('refusals', () => {
  it.each([
    ['broken JSON', encode('{"series":'), 400],
    ['an empty body', encode(''), 400],
    ['bytes that are not UTF-8', new Uint8Array([0x22, 0xff, 0x22]), 400],
    ['a number', encode('5'), 422],
    ['faults', encode('{"series":[{}]}'), 422],
  ])('%s', (_, bytes, status) => {
    const answer = answerBatch(bytes);
    expect(answer.status).toBe(status);
    expect(answer.contentType).toBe('application/problem+json');
    const problem = JSON.parse(new TextDecoder().decode(answer.body)) as Record<string, unknown>;
    expect(Object.keys(problem)).toEqual(['type', 'title', 'status', 'detail', 'errors']);
    expect(problem.status).toBe(status);
    for (const fault of problem.errors as object[])
      expect(Object.keys(fault)).toEqual(['path', 'message']);
  });
});
