import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { accepted, json } from '@/http/respond';
import { analyseScreen } from '@/services/analyseScreen';
import { getServices } from '@/services/runtime';
import { viewScreen } from '@/services/screens';

export const GET: APIRoute = async ({ params, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const { analyses } = await viewScreen(getServices().db, viewer, params.screenId ?? '');
  return json({ analyses });
};

/** Starts a new analysis of the screen; earlier ones stay. */
export const POST: APIRoute = async ({ params, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const analysis = await analyseScreen(getServices(), viewer, params.screenId ?? '');
  const href = `/api/v1/analyses/${analysis.id}`;
  return accepted({ analysis, href }, href);
};
