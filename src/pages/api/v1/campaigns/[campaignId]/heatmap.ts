import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { json } from '@/http/respond';
import { viewHeatmap } from '@/services/heatmap';
import { getServices } from '@/services/runtime';

export const GET: APIRoute = async ({ params, locals }) =>
  json(await viewHeatmap(getServices().db, requireViewer(locals.viewer), params.campaignId ?? ''));
