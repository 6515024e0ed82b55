import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { createCampaignRequestSchema } from '@/contracts/campaigns';
import { campaignHref } from '@/contracts/links';
import { parseBody } from '@/http/parse';
import { created, json } from '@/http/respond';
import { createCampaign, listOwnCampaigns } from '@/services/campaigns';
import { getServices } from '@/services/runtime';

/** The campaigns of all the caller's groups. */
export const GET: APIRoute = async ({ locals }) =>
  json({ campaigns: await listOwnCampaigns(getServices().db, requireViewer(locals.viewer)) });

export const POST: APIRoute = async ({ request, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const input = await parseBody(request, createCampaignRequestSchema);
  const campaign = await createCampaign(getServices(), viewer, input);
  const href = campaignHref(campaign.groupId, campaign.id);
  return created({ campaign, href }, href);
};
