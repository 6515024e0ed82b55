/** One fault of a batch: where (JSON pointer, RFC 6901) and what is wrong there. */
export interface BatchFault {
  path: string;
  message: string;
}

/** A refusal of a whole batch (RFC 9457). */
export interface BatchProblem {
  type: string;
  title: string;
  status: 400 | 413 | 422;
  detail: string;
  errors: BatchFault[];
}

/** Faults beyond this number are counted, not listed. */
export const MOST_FAULTS_LISTED = 1000;

/** JSON pointer of a path of keys and indices. */
export function pointerOf(path: readonly PropertyKey[]): string {
  return path.map((key) => `/${String(key).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');
}

const typeOf = (code: string) => `urn:ratewell:problem:${code}`;

/** The body is no JSON text. */
export function notJsonProblem(reason: string): BatchProblem {
  return {
    type: typeOf('not-json'),
    title: 'The body is not JSON',
    status: 400,
    detail: `${reason} Send a JSON document in UTF-8.`,
    errors: [{ path: '', message: reason }],
  };
}

/** More series or readings than one batch takes. */
export function tooLargeProblem(fault: BatchFault): BatchProblem {
  return {
    type: typeOf('too-large'),
    title: 'Too large',
    status: 413,
    detail: `${fault.message} Send the batch in parts.`,
    errors: [fault],
  };
}

/** Values that are not as they must be. */
export function invalidBatchProblem(faults: readonly BatchFault[]): BatchProblem {
  const listed = faults.slice(0, MOST_FAULTS_LISTED);
  const rest =
    faults.length > listed.length
      ? ` The first ${listed.length} of ${faults.length} are listed.`
      : '';
  return {
    type: typeOf('invalid'),
    title: 'The request does not fit',
    status: 422,
    detail:
      (faults.length === 1
        ? 'One value is not as it must be; it is named in errors.'
        : `${faults.length} values are not as they must be; each is named in errors.`) + rest,
    errors: listed,
  };
}
