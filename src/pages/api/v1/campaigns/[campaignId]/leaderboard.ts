import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { json } from '@/http/respond';
import { viewLeaderboard } from '@/services/leaderboard';
import { getServices } from '@/services/runtime';

export const GET: APIRoute = async ({ params, locals }) =>
  json(
    await viewLeaderboard(getServices().db, requireViewer(locals.viewer), params.campaignId ?? ''),
  );
