import type { z } from 'zod/v4';
import { invalidBatchProblem, pointerOf, tooLargeProblem } from './batchProblem';
import type { BatchFault, BatchProblem } from './batchProblem';
import {
  batchReferenceSchema,
  batchSeriesSchema,
  type BatchRequest,
  type BatchSeries,
} from './batchSchema';
import { findSeriesFaults, fieldOf, isRecord, kelvinOf } from './batchSeriesFaults';
import { decaySeriesOf } from './batchToEngine';
import { resultDimension } from '../kinetics/fitting/readings';

/** Most of each that one batch takes. */
export const MOST_SERIES = 20_000;
export const MOST_READINGS = 2_000_000;

export type ParsedBatch =
  { ok: true; request: BatchRequest } | { ok: false; problem: BatchProblem };

/**
 * Checks a parsed JSON document against the batch contract and names every fault, one by one.
 * Readings that cannot be fitted are no fault: they become a verdict.
 */
export function parseBatchRequest(document: unknown): ParsedBatch {
  if (!isRecord(document)) {
    return refuse([{ path: '', message: 'The batch must be an object with series' }]);
  }
  const list = document.series;
  const tooLarge = Array.isArray(list) ? findExcess(list) : null;
  if (tooLarge !== null) return { ok: false, problem: tooLargeProblem(tooLarge) };

  const faults: BatchFault[] = [];
  for (const key of Object.keys(document)) {
    if (key !== 'reference' && key !== 'series') {
      faults.push({ path: pointerOf([key]), message: 'This key is not known here' });
    }
  }
  const reference = batchReferenceSchema.safeParse(document.reference ?? {});
  if ('reference' in document && document.reference === null) {
    faults.push({ path: '/reference', message: 'Must be an object' });
  }
  if (!reference.success) faults.push(...faultsOf(reference.error, ['reference']));
  faults.push(...belowZeroKelvin(fieldOf(document, 'reference', 'temperature'), ['reference']));
  if (!Array.isArray(list)) {
    faults.push({ path: '/series', message: 'Must be a list of series' });
    return refuse(faults);
  }
  const series = list.map((entry: unknown, i) => parseSeries(entry, i, faults));
  faults.push(...repeatedIds(list), ...mixedDimensions(series));
  if (faults.length > 0 || !reference.success) return refuse(faults);
  return {
    ok: true,
    request: { reference: reference.data, series: series.filter((one) => one !== null) },
  };
}

const refuse = (faults: BatchFault[]): ParsedBatch => ({
  ok: false,
  problem: invalidBatchProblem(faults),
});

function parseSeries(entry: unknown, index: number, faults: BatchFault[]): BatchSeries | null {
  const parsed = batchSeriesSchema.safeParse(entry);
  if (!parsed.success) faults.push(...faultsOf(parsed.error, ['series', index]));
  const further = findSeriesFaults(entry, index);
  further.push(...belowZeroKelvin(fieldOf(entry, 'temperature'), ['series', index]));
  faults.push(...further);
  return parsed.success && further.length === 0 ? parsed.data : null;
}

/** One fault for each issue; an unknown key is named at its own place. */
function faultsOf(error: z.ZodError, at: readonly PropertyKey[]): BatchFault[] {
  return error.issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({
          path: pointerOf([...at, ...issue.path, key]),
          message: 'This key is not known here',
        }))
      : [{ path: pointerOf([...at, ...issue.path]), message: issue.message }],
  );
}

function findExcess(list: readonly unknown[]): BatchFault | null {
  if (list.length > MOST_SERIES) {
    const message = `At most 20,000 series are taken at once, got ${list.length}.`;
    return { path: '/series', message };
  }
  let readings = 0;
  for (const entry of list) {
    const values = fieldOf(entry, 'reading', 'values');
    const times = fieldOf(entry, 'time', 'values');
    readings += Math.max(
      Array.isArray(values) ? values.length : 0,
      Array.isArray(times) ? times.length : 0,
    );
  }
  if (readings <= MOST_READINGS) return null;
  const message = `At most 2,000,000 readings are taken at once, got ${readings}.`;
  return { path: '/series', message };
}

function belowZeroKelvin(temperature: unknown, at: readonly PropertyKey[]): BatchFault[] {
  const kelvin = kelvinOf(temperature);
  if (kelvin === null || kelvin > 0) return [];
  return [
    {
      path: pointerOf([...at, 'temperature', 'value']),
      message: `Must be above 0 K (−273.15 °C), got ${Number(kelvin.toPrecision(6))} K`,
    },
  ];
}

function repeatedIds(list: readonly unknown[]): BatchFault[] {
  const first = new Map<string, number>();
  const faults: BatchFault[] = [];
  list.forEach((entry, i) => {
    const id = fieldOf(entry, 'id');
    if (typeof id !== 'string') return;
    const earlier = first.get(id);
    if (earlier === undefined) first.set(id, i);
    else {
      faults.push({
        path: pointerOf(['series', i, 'id']),
        message: `"${id}" is taken by /series/${earlier} already; give every series its own id`,
      });
    }
  });
  return faults;
}

/** Dimensions do not hang on the readings themselves. */
const noTimes = { values: [], unit: 's' as const };

function mixedDimensions(series: readonly (BatchSeries | null)[]): BatchFault[] {
  const first = new Map<string, { dimension: string; index: number }>();
  const faults: BatchFault[] = [];
  series.forEach((one, i) => {
    if (one?.catalyst === undefined) return;
    const dimension = resultDimension(
      decaySeriesOf({ ...one, time: noTimes, reading: { ...one.reading, values: [] } }),
    );
    const earlier = first.get(one.catalyst);
    if (earlier === undefined) first.set(one.catalyst, { dimension, index: i });
    else if (earlier.dimension !== dimension) {
      faults.push({
        path: pointerOf(['series', i, 'reading', 'unit']),
        message: `Catalyst "${one.catalyst}" gives ${earlier.dimension} in /series/${earlier.index} and ${dimension} here; use one dimension for all its series`,
      });
    }
  });
  return faults;
}
