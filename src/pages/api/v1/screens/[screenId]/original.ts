import type { APIRoute } from 'astro';
import { requireViewer } from '@/auth/permissions';
import { download } from '@/http/respond';
import { getServices } from '@/services/runtime';
import { downloadOriginal } from '@/services/screens';

/** The workbook as it was uploaded, byte for byte. */
export const GET: APIRoute = async ({ params, locals }) => {
  const viewer = requireViewer(locals.viewer);
  const file = await downloadOriginal(getServices().db, viewer, params.screenId ?? '');
  return download(file.bytes, file.fileName, 'application/octet-stream');
};
