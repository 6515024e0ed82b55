import { z } from 'zod/v4';
import type { UploadAnswer } from '../../contracts/screens';
import type { WorkbookIssue } from './workbookIssue';
import { errorFromAnswer, noAnswer, type ApiError } from '../api';

export interface WorkbookUpload {
  campaignId: string;
  name: string;
  file: File;
}

/**
 * Sends a workbook and reports how much of it has left.
 *
 * @param onProgress share of the bytes sent, 0 to 1
 * @throws ApiError for every refusal, and with status 0 when no answer came
 */
export function sendWorkbook(
  { campaignId, name, file }: WorkbookUpload,
  onProgress: (share: number) => void,
  signal: AbortSignal,
): Promise<UploadAnswer> {
  const form = new FormData();
  form.set('campaignId', campaignId);
  form.set('name', name);
  form.set('file', file);
  return new Promise((resolve, reject) => {
    // fetch cannot say how much of a request has been sent.
    const request = new XMLHttpRequest();
    request.open('POST', '/api/v1/screens');
    request.setRequestHeader('accept', 'application/json');
    request.upload.addEventListener('progress', ({ loaded, total }) => {
      if (total > 0) onProgress(loaded / total);
    });
    request.addEventListener('load', () => {
      if (request.status < 200 || request.status > 299) {
        reject(errorFromAnswer(request.status, request.responseText));
        return;
      }
      try {
        resolve(JSON.parse(request.responseText) as UploadAnswer);
      } catch (error) {
        reject(noAnswer(error));
      }
    });
    for (const failed of ['error', 'abort', 'timeout']) {
      request.addEventListener(failed, () => reject(noAnswer(failed)));
    }
    signal.addEventListener('abort', () => request.abort());
    request.send(form);
  });
}

const issueSchema: z.ZodType<WorkbookIssue> = z.object({
  severity: z.enum(['stop', 'caution']),
  code: z.string(),
  sheet: z.string(),
  cell: z.string().nullable(),
  found: z.string().nullable(),
  expected: z.string(),
  message: z.string(),
});

/** The workbook's faults that a refusal lists; empty when it is about something else. */
export function faultsIn(error: ApiError): WorkbookIssue[] {
  const issues = z.array(issueSchema).safeParse(error.body['issues']);
  return issues.success ? issues.data : [];
}
