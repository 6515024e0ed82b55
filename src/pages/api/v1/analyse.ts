import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { answerBatch } from '@/services/answerBatch';
import { getServices } from '@/services/runtime';

/** The batch endpoint: series in, rate laws and activation energies out; stores nothing. */
export const POST: APIRoute = async ({ request, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const bytes = new Uint8Array(await request.arrayBuffer());
  const answer = await answerBatch(getServices(), viewer, bytes);
  return new Response(new Uint8Array(answer.body), {
    status: answer.status,
    headers: { 'content-type': answer.contentType, 'cache-control': 'no-store' },
  });
};
