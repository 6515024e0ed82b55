import { z } from 'zod/v4';

const positive = (what: string) =>
  z.number(`${what} must be a number`).positive(`${what} must be above 0`);

/** A campaign: one reaction and the conditions at which its candidates are compared. */
export const createCampaignRequestSchema = z.strictObject({
  groupId: z.uuid(),
  name: z.string().trim().min(3, 'Give a name of at least 3 characters').max(160),
  /** The species whose decay is followed. */
  reactant: z.string().trim().min(1, 'Name the reactant that is followed').max(120),
  /** Stoichiometric coefficient of the reactant. */
  nu: positive('The stoichiometric coefficient').default(1),
  dimension: z.enum(['concentration', 'pressure', 'ratio']),
  referenceTemperatureC: z
    .number('The reference temperature must be a number')
    .gt(-273.15, 'The reference temperature must be above −273.15 °C')
    .max(1500, 'The reference temperature must be 1500 °C or less'),
  /** Base unit: mol/L, Pa or 1. */
  referenceConcentration: positive('The reference concentration'),
  referenceLoadingGPerL: positive('The reference loading'),
  targetConversion: z
    .number('The target conversion must be a number')
    .gt(0, 'The target conversion must be above 0')
    .lt(1, 'The target conversion must be below 1'),
  conditions: z.string().trim().max(2000).default(''),
});
export type CreateCampaignRequest = z.infer<typeof createCampaignRequestSchema>;
