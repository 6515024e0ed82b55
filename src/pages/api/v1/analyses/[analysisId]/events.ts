import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { eventStream } from '@/http/eventStream';
import { followAnalysis } from '@/services/analyses';
import { getServices } from '@/services/runtime';

/** Server-sent events: `progress` with the analysis' state until it has ended. */
export const GET: APIRoute = async ({ params, locals, request }) => {
  const viewer = requireViewer(locals.viewer);
  const steps = await followAnalysis(
    getServices(),
    viewer,
    params.analysisId ?? '',
    request.signal,
  );
  return eventStream('progress', steps);
};
