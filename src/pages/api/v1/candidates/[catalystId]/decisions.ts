import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { decideRequestSchema } from '@/contracts/decisions';
import { parseBody } from '@/http/parse';
import { created } from '@/http/respond';
import { decideCandidate } from '@/services/candidates';
import { getServices } from '@/services/runtime';

/** Nominate, take to scale-up, wait, set aside or reopen, with a reason. */
export const POST: APIRoute = async ({ request, params, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const input = await parseBody(request, decideRequestSchema);
  const catalystId = params.catalystId ?? '';
  const decision = await decideCandidate(getServices(), viewer, catalystId, input);
  return created(decision, `/api/v1/candidates/${catalystId}`);
};
