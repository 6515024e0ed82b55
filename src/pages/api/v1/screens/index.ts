import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { readUpload } from '@/http/upload';
import { created, json } from '@/http/respond';
import { importScreen } from '@/services/importScreen';
import { getServices } from '@/services/runtime';

/** Stores a screening workbook, whole or not at all. */
export const POST: APIRoute = async ({ request, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const answer = await importScreen(getServices(), viewer, await readUpload(request));
  return answer.alreadyImported
    ? json(answer)
    : created(answer, `/api/v1/screens/${answer.screen.id}`);
};
