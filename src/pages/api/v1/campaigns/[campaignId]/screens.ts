import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { json } from '@/http/respond';
import { requireCampaign } from '@/services/campaigns';
import { getServices } from '@/services/runtime';
import { listScreenSummaries } from '@/services/screens';

/** The campaign's screens, newest first, each with its latest analysis. */
export const GET: APIRoute = async ({ params, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const { db } = getServices();
  const campaign = await requireCampaign(db, viewer, params.campaignId ?? '');
  return json({ screens: await listScreenSummaries(db, campaign.groupId, campaign.id) });
};
