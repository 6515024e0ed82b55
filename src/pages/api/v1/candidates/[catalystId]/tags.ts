import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { tagsRequestSchema } from '@/contracts/decisions';
import { parseBody } from '@/http/parse';
import { json } from '@/http/respond';
import { tagCandidate } from '@/services/candidates';
import { getServices } from '@/services/runtime';

/** Puts the candidate's tags in the place of those it had. */
export const PUT: APIRoute = async ({ request, params, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const input = await parseBody(request, tagsRequestSchema);
  return json({
    tags: await tagCandidate(getServices(), viewer, params.catalystId ?? '', input),
  });
};
