import { z } from 'zod/v4';
import { HIGHEST_ORDER, LOWEST_ORDER } from '../kinetics/rateLaws/apparentOrder';
import {
  concentrationUnits,
  loadingUnits,
  massUnits,
  pressureUnits,
  readingUnits,
  siteDensityUnits,
  temperatureUnits,
  timeUnits,
  volumeUnits,
} from '../kinetics/units';

const known = (name: string, units: readonly string[]) =>
  `${name} is not known here; use one of ${units.join(', ')}`;

const unitOf = <const U extends readonly [string, ...string[]] | readonly string[]>(units: U) =>
  z.enum(units as unknown as readonly [U[number], ...U[number][]], {
    error: known('The unit', units),
  });

const finite = z.number({ error: 'Must be a finite number' });
const positive = finite.positive('Must be above 0');
const notNegative = finite.nonnegative('Must not be below 0');

const text = z
  .string({ error: 'Must be a text' })
  .min(1, 'Must not be empty')
  .max(200, 'Must have at most 200 characters');

/** A number with its unit. */
const quantity = <const U extends readonly string[]>(units: U, value: z.ZodType<number> = finite) =>
  z.strictObject({ value, unit: unitOf(units) }, { error: 'Must be an object of value and unit' });

const temperature = quantity(temperatureUnits);
const concentration = quantity([...concentrationUnits, ...pressureUnits], positive);

const lawNames = ['auto', 'zero', 'first', 'second', 'saturating'] as const;

/** The law asked for. */
const law = z.union(
  [z.enum(lawNames), z.strictObject({ order: z.number().min(LOWEST_ORDER).max(HIGHEST_ORDER) })],
  {
    error: `Must be auto, zero, first, second, saturating or {"order": n} with n from ${LOWEST_ORDER} to ${HIGHEST_ORDER}`,
  },
);

const flag = z.boolean({ error: 'Must be true or false' });

/** What readings of one kind need besides; taken beside the reading or inside it. */
const kindOptions = {
  /** mol product per mol reactant; `product` only. */
  productPerReactant: positive.optional(),
  /** C0 of `conversion` readings. */
  initialConcentration: concentration.optional(),
  /** Fits a baseline under a `signal`. */
  baseline: flag.optional(),
};

/** One well of a batch. */
export const batchSeriesSchema = z.strictObject(
  {
    id: text,
    /** Required for samples. */
    catalyst: text.optional(),
    role: z
      .enum(['sample', 'blank', 'support-blank', 'control', 'benchmark'], {
        error: 'Must be sample, blank, support-blank, control or benchmark',
      })
      .optional(),
    /** What shares one temperature error. */
    block: text.optional(),
    temperature,
    time: z.strictObject(
      {
        values: z.array(finite, { error: 'Must be a list of numbers' }),
        unit: unitOf(timeUnits),
      },
      { error: 'Must be an object of values and unit' },
    ),
    reading: z.strictObject(
      {
        /** null: excluded or missing. */
        values: z.array(z.number({ error: 'Must be a finite number or null' }).nullable(), {
          error: 'Must be a list of numbers or null',
        }),
        unit: unitOf(readingUnits),
        kind: z
          .enum(['reactant', 'product', 'conversion', 'signal'], {
            error: 'Must be reactant, product, conversion or signal',
          })
          .optional(),
        ...kindOptions,
      },
      { error: 'Must be an object of values, unit and kind' },
    ),
    catalystMass: quantity(massUnits, notNegative).optional(),
    volume: quantity(volumeUnits, positive).optional(),
    siteDensity: quantity(siteDensityUnits, positive).optional(),
    /** Stoichiometric coefficient of the reactant. */
    nu: positive.optional(),
    law: law.optional(),
    /** Fits a level that stays. */
    residual: flag.optional(),
    ...kindOptions,
  },
  { error: 'Must be an object' },
);

/** Conditions at which catalysts are compared. */
export const batchReferenceSchema = z.strictObject(
  {
    temperature: temperature.optional(),
    concentration: concentration.optional(),
    catalystLoading: quantity(loadingUnits, positive).optional(),
    targetConversion: z
      .number({ error: 'Must be a number' })
      .gt(0, 'Must lie above 0 and below 1')
      .lt(1, 'Must lie above 0 and below 1')
      .optional(),
  },
  { error: 'Must be an object' },
);

export type BatchSeries = z.infer<typeof batchSeriesSchema>;
export type BatchReference = z.infer<typeof batchReferenceSchema>;

/** A batch whose every part has passed. */
export interface BatchRequest {
  reference: BatchReference;
  series: BatchSeries[];
}
