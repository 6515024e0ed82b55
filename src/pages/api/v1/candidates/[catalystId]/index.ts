import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { json } from '@/http/respond';
import { viewCandidate } from '@/services/candidateView';
import { getServices } from '@/services/runtime';

export const GET: APIRoute = async ({ params, locals }) =>
  json(
    await viewCandidate(getServices().db, requireViewer(locals.viewer), params.catalystId ?? ''),
  );
