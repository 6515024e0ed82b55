import { createCampaignRequestSchema, type CreateCampaignRequest } from '../../contracts/campaigns';
import type { ReadingDimension } from '../../kinetics/types';
import type { ApiFault } from '../api';

/** What a person types, as text. */
export interface CampaignFields {
  name: string;
  reactant: string;
  dimension: ReadingDimension;
  referenceTemperatureC: string;
  /** In the unit of `concentrationUnits`. */
  referenceConcentration: string;
  referenceLoadingGPerL: string;
  /** %. */
  targetConversion: string;
  conditions: string;
}

export type CampaignField = keyof CampaignFields;
/** What is wrong, by field; `form` is what belongs to none. */
export type CampaignFaults = Partial<Record<CampaignField | 'form', string>>;

export const emptyCampaign: CampaignFields = {
  name: '',
  reactant: '',
  dimension: 'concentration',
  referenceTemperatureC: '',
  referenceConcentration: '',
  referenceLoadingGPerL: '',
  targetConversion: '90',
  conditions: '',
};

/** The unit in which the reference concentration is typed, and what brings it to the base unit. */
export const concentrationUnits: Record<ReadingDimension, { unit: string; toBase: number }> = {
  concentration: { unit: 'mmol/L', toBase: 1e-3 },
  pressure: { unit: 'kPa', toBase: 1e3 },
  ratio: { unit: '', toBase: 1 },
};

/** A typed number; NaN for anything else. A decimal comma is not guessed at. */
export function typedNumber(text: string): number {
  const plain = text.trim().replace('−', '-');
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain) ? Number(plain) : NaN;
}

/** A typed number times a power of ten, without the rounding of the multiplication showing. */
function scaled(text: string, factor: number): number {
  return Number((typedNumber(text) * factor).toPrecision(15));
}

/** The request that the fields stand for, or what is wrong with them. */
export function campaignRequest(
  fields: CampaignFields,
  groupId: string,
): { request: CreateCampaignRequest } | { faults: CampaignFaults } {
  const { dimension } = fields;
  const result = createCampaignRequestSchema.safeParse({
    groupId,
    name: fields.name,
    reactant: fields.reactant,
    dimension,
    referenceTemperatureC: typedNumber(fields.referenceTemperatureC),
    referenceConcentration: scaled(
      fields.referenceConcentration,
      concentrationUnits[dimension].toBase,
    ),
    referenceLoadingGPerL: typedNumber(fields.referenceLoadingGPerL),
    targetConversion: scaled(fields.targetConversion, 0.01),
    conditions: fields.conditions,
  });
  if (result.success) return { request: result.data };
  return {
    faults: faultsByField(
      result.error.issues.map(({ path, message }) => ({
        path: `/${path.map(String).join('/')}`,
        message,
      })),
    ),
  };
}

/** Faults at JSON pointers, put beside the fields that they belong to. */
export function faultsByField(errors: readonly ApiFault[]): CampaignFaults {
  const faults: CampaignFaults = {};
  for (const { path, message } of errors) {
    const key = path.split('/')[1] ?? '';
    const field = key in emptyCampaign ? (key as CampaignField) : 'form';
    faults[field] ??= message;
  }
  return faults;
}
