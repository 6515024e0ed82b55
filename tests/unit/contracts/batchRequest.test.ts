import { describe, expect, it } from 'vitest';
import { MOST_FAULTS_LISTED } from '../../../src/contracts/batchProblem';
import { MOST_READINGS, MOST_SERIES, parseBatchRequest } from '../../../src/contracts/batchRequest';
import { decaySeriesOf, referenceOf } from '../../../src/contracts/batchToEngine';
import { batchSeries } from '../../fixtures/batch';

const problemOf = (document: unknown) => {
  const parsed = parseBatchRequest(document);
  if (parsed.ok) throw new Error('the batch was accepted');
  return parsed.problem;
};
const pathsOf = (document: unknown) => problemOf(document).errors.map((fault) => fault.path);
const seriesPaths = (given: object) => pathsOf({ series: [{ ...batchSeries(), ...given }] });
const reading = (given: object) => ({ ...batchSeries().reading, ...given });

describe('a batch that fits', () => {
  it('is read into base units', () => {
    const parsed = parseBatchRequest({
      reference: {
        temperature: { value: 60, unit: 'degC' },
        concentration: { value: 10, unit: 'mmol/L' },
        catalystLoading: { value: 2.5, unit: 'g/L' },
        targetConversion: 0.8,
      },
      series: [
        {
          ...batchSeries(),
          catalystMass: { value: 5, unit: 'mg' },
          volume: { value: 2, unit: 'mL' },
          siteDensity: { value: 120, unit: 'umol/g' },
          nu: 2,
          law: { order: 1.5 },
          block: 'plate 1',
        },
      ],
    });
    if (!parsed.ok) throw new Error(JSON.stringify(parsed.problem));
    expect(referenceOf(parsed.request.reference)).toEqual({
      temperatureK: 333.15,
      concentration: 0.01,
      concentrationDimension: 'concentration',
      loadingGPerL: 2.5,
      targetConversion: 0.8,
    });
    const series = decaySeriesOf(parsed.request.series[0]!);
    expect(series).toMatchObject({
      role: 'sample',
      temperatureK: 313.15,
      kind: 'reactant',
      dimension: 'concentration',
      loadingGPerL: 2.5,
      siteDensityMolPerKg: 0.12,
      nu: 2,
      law: { order: 1.5 },
      block: 'plate 1',
    });
    expect(series.timesS[1]).toBe(600);
    expect(series.values.slice(0, 3)).toEqual([0.01, null, 0.0067]);
  });

  it('takes what a kind needs beside the reading or inside it', () => {
    const initialConcentration = { value: 20, unit: 'mmol/L' };
    for (const given of [
      { reading: reading({ unit: '%', kind: 'conversion', initialConcentration }) },
      { reading: reading({ unit: '%', kind: 'conversion' }), initialConcentration },
    ]) {
      const parsed = parseBatchRequest({ series: [{ ...batchSeries(), ...given }] });
      if (!parsed.ok) throw new Error(JSON.stringify(parsed.problem));
      const series = decaySeriesOf(parsed.request.series[0]!);
      expect(series.initialConcentration).toBe(0.02);
      expect(series.dimension).toBe('concentration');
    }
  });

  it('accepts empty readings, blanks without a catalyst, and no series at all', () => {
    const { catalyst: _, ...blank } = batchSeries();
    const empty = {
      ...batchSeries(),
      id: 'e',
      time: { values: [], unit: 's' },
      reading: { values: [], unit: 'mol/L' },
    };
    expect(parseBatchRequest({ series: [{ ...blank, role: 'blank' }, empty] }).ok).toBe(true);
    expect(parseBatchRequest({ series: [] }).ok).toBe(true);
  });
});

describe('refusals', () => {
  it.each([
    ['no object', [], ['']],
    ['no series', {}, ['/series']],
    ['unknown key', { series: [], extra: 1 }, ['/extra']],
    ['reference null', { series: [], reference: null }, ['/reference']],
    [
      'conversion of 1',
      { series: [], reference: { targetConversion: 1 } },
      ['/reference/targetConversion'],
    ],
    [
      'reference below 0 K',
      { series: [], reference: { temperature: { value: -300, unit: 'degC' } } },
      ['/reference/temperature/value'],
    ],
    ['series no object', { series: [5] }, ['/series/0']],
  ])('%s', (_, document, paths) => {
    expect(pathsOf(document)).toEqual(paths);
  });

  it.each([
    ['id is a number', { id: 5 }, ['/series/0/id']],
    ['id is empty', { id: '' }, ['/series/0/id']],
    ['unknown key', { 'a/b~c': 1 }, ['/series/0/a~1b~0c']],
    [
      'unknown temperature unit',
      { temperature: { value: 40, unit: 'F' } },
      ['/series/0/temperature/unit'],
    ],
    ['0 K', { temperature: { value: 0, unit: 'K' } }, ['/series/0/temperature/value']],
    ['below 0 K', { temperature: { value: -280, unit: 'degC' } }, ['/series/0/temperature/value']],
    ['unknown time unit', { time: { ...batchSeries().time, unit: 'y' } }, ['/series/0/time/unit']],
    ['unknown reading unit', { reading: reading({ unit: 'g' }) }, ['/series/0/reading/unit']],
    ['% with kind reactant', { reading: reading({ unit: '%' }) }, ['/series/0/reading/unit']],
    [
      'mol/L with kind conversion',
      { reading: reading({ kind: 'conversion' }) },
      ['/series/0/reading/unit'],
    ],
    [
      '% with kind signal',
      { reading: reading({ kind: 'signal', unit: '%' }) },
      ['/series/0/reading/unit'],
    ],
    [
      'fewer readings than times',
      { reading: reading({ values: [1] }) },
      ['/series/0/reading/values'],
    ],
    [
      'a reading that is text',
      { reading: reading({ values: [1, 'x', 3, 4, 5, 6] }) },
      ['/series/0/reading/values/1'],
    ],
    ['unknown role', { role: 'standard' }, ['/series/0/role']],
    ['volume 0', { volume: { value: 0, unit: 'mL' } }, ['/series/0/volume/value']],
    ['nu 0', { nu: 0 }, ['/series/0/nu']],
    ['unknown law', { law: 'third' }, ['/series/0/law']],
    ['order beyond 4', { law: { order: 4.5 } }, ['/series/0/law']],
    [
      'the same option twice',
      { productPerReactant: 1, reading: reading({ productPerReactant: 1 }) },
      ['/series/0/productPerReactant'],
    ],
  ])('%s', (_, given, paths) => {
    expect(seriesPaths(given)).toEqual(paths);
  });

  it.each([
    ['residual', { residual: true, law: 'saturating' }, 'not beside saturation'],
    ['baseline', { baseline: true }, 'Only a signal'],
  ])('%s where it cannot be says so', (key, given, message) => {
    const [fault] = problemOf({ series: [{ ...batchSeries(), ...given }] }).errors;
    expect(fault!.path).toBe(`/series/0/${key}`);
    expect(fault!.message).toContain(message);
  });

  it('a sample without its catalyst', () => {
    const { catalyst: _, ...rest } = batchSeries();
    expect(pathsOf({ series: [rest] })).toEqual(['/series/0/catalyst']);
  });

  it('an id taken twice names both places', () => {
    const problem = problemOf({ series: [batchSeries(), batchSeries()] });
    expect(problem.errors).toHaveLength(1);
    expect(problem.errors[0]!.path).toBe('/series/1/id');
    expect(problem.errors[0]!.message).toContain('/series/0');
  });

  it('two dimensions within one catalyst', () => {
    const pressure = { ...batchSeries(), id: 'b', reading: reading({ unit: 'kPa' }) };
    expect(pathsOf({ series: [batchSeries(), pressure] })).toEqual(['/series/1/reading/unit']);
    expect(parseBatchRequest({ series: [batchSeries(), { ...pressure, catalyst: 'Q' }] }).ok).toBe(
      true,
    );
  });

  it('all faults at once, each at its place', () => {
    const paths = pathsOf({
      series: [
        { ...batchSeries(), law: 'third' },
        { ...batchSeries(), id: 'b', nu: -1, foo: 2 },
      ],
      extra: 0,
    });
    expect(paths.sort()).toEqual(['/extra', '/series/0/law', '/series/1/foo', '/series/1/nu']);
  });

  it('very many faults are counted, not all listed', () => {
    const problem = problemOf({ series: Array.from({ length: 3000 }, () => 5) });
    expect(problem.errors).toHaveLength(MOST_FAULTS_LISTED);
    expect(problem.detail).toContain('of 3000');
  });
});

describe('sizes', () => {
  it('more series than 20,000 are too large', () => {
    const problem = problemOf({ series: new Array(MOST_SERIES + 1).fill(null) });
    expect(problem.status).toBe(413);
    expect(problem.errors).toEqual([
      { path: '/series', message: expect.stringContaining('20,000') as string },
    ]);
  });
  it('20,000 series and 2,000,000 readings are not', () => {
    expect(problemOf({ series: new Array(MOST_SERIES).fill(null) }).status).toBe(422);
    const values = new Array(MOST_READINGS / 2).fill(1);
    const half = { reading: { values }, time: { values } };
    expect(problemOf({ series: [half, half] }).status).toBe(422);
  });
  it('more readings than 2,000,000 are too large', () => {
    const values = new Array(MOST_READINGS / 2 + 1).fill(1);
    const half = { reading: { values }, time: { values } };
    expect(problemOf({ series: [half, half] }).status).toBe(413);
  });
});
