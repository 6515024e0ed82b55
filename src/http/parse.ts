import type { z } from 'zod/v4';
import { problems, type FaultAtPath } from '../errors';

/** JSON pointer (RFC 6901) of a zod path. */
export function jsonPointer(path: readonly PropertyKey[]): string {
  return path.map((key) => `/${String(key).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');
}

/** One fault for each issue; an unknown key is named at its own place. */
export function faultsOf(error: z.ZodError): FaultAtPath[] {
  return error.issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({
          path: jsonPointer([...issue.path, key]),
          message: 'This key is not known here.',
        }))
      : [{ path: jsonPointer(issue.path), message: issue.message }],
  );
}

/** Checks a value. @throws Problem 422 with every fault. */
export function check<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const result = schema.safeParse(value);
  if (!result.success) throw problems.invalid(faultsOf(result.error));
  return result.data;
}

/** Reads and checks a JSON body. @throws Problem 400 when it is not JSON, 422 when it does not fit. */
export async function parseBody<Schema extends z.ZodType>(
  request: Request,
  schema: Schema,
): Promise<z.output<Schema>> {
  let value: unknown;
  try {
    value = JSON.parse(await request.text());
  } catch (error) {
    throw problems.notJson(
      error instanceof Error ? `${error.message}.` : 'It could not be parsed.',
    );
  }
  return check(schema, value);
}
