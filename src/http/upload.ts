import { Readable } from 'node:stream';
import type { ReadableStream } from 'node:stream/web';
import busboy from 'busboy';
import { z } from 'zod/v4';
import { problems } from '../errors';
import type { ScreenUpload } from '../services/importScreen';
import { check } from './parse';

/** Bytes of a workbook; one of 400,000 readings has about 30 MB. */
const fileLimit = 32 * 1024 * 1024;

const fieldsSchema = z.strictObject({
  campaignId: z.uuid('Name the campaign by its id'),
  name: z.string().trim().max(160, 'A screen name has at most 160 characters').optional(),
});

interface Form {
  fields: Record<string, string>;
  file: { name: string; bytes: Buffer } | null;
}

function readForm(request: Request): Promise<Form> {
  return new Promise((resolve, reject) => {
    const form: Form = { fields: {}, file: null };
    const parser = busboy({
      headers: Object.fromEntries(request.headers),
      defParamCharset: 'utf8',
      limits: { fileSize: fileLimit, files: 1, fields: 10, fieldSize: 4096, parts: 12 },
    });
    parser.on('field', (name, value) => {
      form.fields[name] = value;
    });
    parser.on('file', (_field, stream, info) => {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('limit', () => {
        reject(problems.tooLarge('32 MB of workbook'));
      });
      stream.on('end', () => {
        form.file = { name: info.filename ?? '', bytes: Buffer.concat(chunks) };
      });
    });
    parser.on('error', (error) => {
      reject(problems.notMultipart(error instanceof Error ? `${error.message}.` : ''));
    });
    parser.on('close', () => {
      resolve(form);
    });
    Readable.fromWeb(request.body as ReadableStream<Uint8Array>)
      .on('error', reject)
      .pipe(parser);
  });
}

/** The last part of a path, so that a name never is one, without control characters. */
const plainFileName = (name: string) =>
  name
    .replace(/^.*[\\/]/, '')
    .replace(/\p{Cc}/gu, '')
    .slice(0, 255) || 'workbook';

/**
 * Reads the multipart form of an upload: campaignId, name (else the file's) and file.
 *
 * @throws Problem 400 when it is not such a form, 413 above 32 MB, 422 when a field does not fit.
 */
export async function readUpload(request: Request): Promise<ScreenUpload> {
  const type = request.headers.get('content-type') ?? '';
  if (!type.startsWith('multipart/form-data') || !request.body) {
    throw problems.notMultipart('It is not multipart/form-data.');
  }
  const form = await readForm(request).catch((error: unknown) => {
    throw error instanceof Error && error.name !== 'Problem'
      ? problems.notMultipart(`${error.message}.`)
      : error;
  });
  const fields = check(fieldsSchema, form.fields);
  if (!form.file)
    throw problems.invalid([{ path: '/file', message: 'Choose a workbook to upload' }]);
  const fileName = plainFileName(form.file.name);
  return {
    campaignId: fields.campaignId,
    name: fields.name || fileName.replace(/\.[^.]+$/, '').slice(0, 160),
    fileName,
    bytes: form.file.bytes,
  };
}
