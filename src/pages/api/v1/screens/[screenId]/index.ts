import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { json } from '@/http/respond';
import { getServices } from '@/services/runtime';
import { viewScreen } from '@/services/screens';

export const GET: APIRoute = async ({ params, locals }) =>
  json(await viewScreen(getServices().db, requireViewer(locals.viewer), params.screenId ?? ''));
