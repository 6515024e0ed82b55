import { z } from 'zod/v4';
import type { DecisionRecord } from '../../contracts/decisions';
import {
  actionsFrom,
  decisionActions,
  decisionStates,
  type DecisionAction,
  type DecisionState,
} from '../../screening/decisions';
import type { ApiError } from '../api';

export const actionLabels: Record<DecisionAction, string> = {
  nominate: 'Nominate',
  'take-to-scale-up': 'Take to scale-up',
  wait: 'Wait',
  'set-aside': 'Set aside',
  reopen: 'Reopen',
};

export const stateLabels: Record<DecisionState, string> = {
  open: 'open',
  nominated: 'nominated',
  'scale-up': 'to scale-up',
  waiting: 'waiting',
  'set-aside': 'set aside',
};

/** What was done, as it stands in the history after the person's name. */
export const actionsDone: Record<DecisionAction, string> = {
  nominate: 'nominated it',
  'take-to-scale-up': 'took it to scale-up',
  wait: 'let it wait',
  'set-aside': 'set it aside',
  reopen: 'reopened it',
};

/** The steps that a person may take from here: an analyst nominates, a lead decides. */
export function offeredActions(
  state: DecisionState,
  may: { nominate: boolean; decide: boolean },
): DecisionAction[] {
  return actionsFrom(state).filter((action) => (action === 'nominate' ? may.nominate : may.decide));
}

const recordSchema = z.object({
  action: z.enum(decisionActions),
  from: z.enum(decisionStates),
  to: z.enum(decisionStates),
  reason: z.string(),
  by: z.string(),
  at: z.string(),
  analysisId: z.string().nullable(),
});

const currentSchema = z.object({
  state: z.enum(decisionStates),
  version: z.number().int(),
  last: recordSchema.nullable().default(null),
});

/** Where the candidate stands by now, as a 409 tells it; null when it does not. */
export function currentOf(
  error: ApiError,
): { state: DecisionState; version: number; last: DecisionRecord | null } | null {
  if (error.status !== 409) return null;
  const current = currentSchema.safeParse(error.body['current']);
  return current.success ? current.data : null;
}
