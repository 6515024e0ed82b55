import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { json } from '@/http/respond';
import { viewAnalysis } from '@/services/analyses';
import { getServices } from '@/services/runtime';

/** Progress of a stored analysis and, once it is done, its results as the batch endpoint gives them. */
export const GET: APIRoute = async ({ params, locals }) =>
  json(await viewAnalysis(getServices().db, requireViewer(locals.viewer), params.analysisId ?? ''));
