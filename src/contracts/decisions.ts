import { z } from 'zod/v4';
import { decisionActions, type DecisionAction, type DecisionState } from '../screening/decisions';

export type { DecisionAction, DecisionState };

/** A decision: what, why, and the version of the candidate that the person was looking at. */
export const decideRequestSchema = z.strictObject({
  action: z.enum(decisionActions),
  /** Why; kept in the history. */
  reason: z.string().trim().min(3, 'Say why in at least 3 characters').max(2000),
  /** The candidate's `version` as shown; a stale one is refused with 409. */
  version: z.number().int().min(0),
});
export type DecideRequest = z.infer<typeof decideRequestSchema>;

/** The full set of a candidate's tags; replaces what was there. */
export const tagsRequestSchema = z.strictObject({
  tags: z
    .array(z.string().trim().min(1, 'A tag is empty').max(40, 'A tag has more than 40 characters'))
    .max(20, 'At most 20 tags'),
});
export type TagsRequest = z.infer<typeof tagsRequestSchema>;

/** One entry of a candidate's history. */
export interface DecisionRecord {
  action: DecisionAction;
  from: DecisionState;
  to: DecisionState;
  reason: string;
  by: string;
  /** ISO 8601, UTC. */
  at: string;
  analysisId: string | null;
}
