/** One fault inside a request: a JSON pointer and what is wrong there. */
export interface FaultAtPath {
  path: string;
  message: string;
}

/**
 * A refusal that the caller can understand and act on. It carries what happened (`title`), why and
 * what to do (`detail`), and becomes an RFC 9457 problem body or an error page.
 */
export class Problem extends Error {
  override readonly name = 'Problem';
  readonly status: number;
  /** Stable, kebab-case; the last part of the problem's type. */
  readonly code: string;
  readonly title: string;
  readonly detail: string;
  readonly errors: FaultAtPath[] | undefined;
  /** Further members of the problem body. */
  readonly extra: Record<string, unknown>;
  readonly retryAfterS: number | undefined;

  constructor(
    status: number,
    code: string,
    title: string,
    detail: string,
    more: {
      errors?: FaultAtPath[];
      extra?: Record<string, unknown>;
      retryAfterS?: number;
      cause?: unknown;
    } = {},
  ) {
    super(`${title}: ${detail}`, { cause: more.cause });
    this.status = status;
    this.code = code;
    this.title = title;
    this.detail = detail;
    this.errors = more.errors;
    this.extra = more.extra ?? {};
    this.retryAfterS = more.retryAfterS;
  }
}

/** The catalogue of refusals. A name here never changes; the words may get better. */
export const problems = {
  notJson: (reason: string) =>
    new Problem(400, 'not-json', 'The body is not JSON', `${reason} Send a JSON document.`),
  notMultipart: (reason: string) =>
    new Problem(
      400,
      'not-multipart',
      'The upload could not be read',
      `${reason} Send a multipart form with campaignId, name and file.`,
    ),
  invalid: (errors: FaultAtPath[]) =>
    new Problem(
      422,
      'invalid',
      'The request does not fit',
      errors.length === 1
        ? 'One value is not as it must be; it is named in errors.'
        : `${errors.length} values are not as they must be; each is named in errors.`,
      { errors },
    ),
  notSignedIn: () =>
    new Problem(401, 'not-signed-in', 'Not signed in', 'Sign in, or send a valid Bearer token.'),
  badToken: () =>
    new Problem(
      401,
      'bad-token',
      'The token is not accepted',
      'It is unknown, revoked or past its date. Make a new one.',
    ),
  notAllowed: (needs: string) =>
    new Problem(
      403,
      'not-allowed',
      'Your role does not allow this',
      `It takes the role ${needs} or above in this group. Ask an admin of the group.`,
    ),
  foreignOrigin: () =>
    new Problem(
      403,
      'foreign-origin',
      'The request came from another site',
      'Open the page at its own address and try again.',
    ),
  notFound: () =>
    new Problem(
      404,
      'not-found',
      'Nothing is here',
      'The address is wrong, the thing is gone, or it belongs to a group that you are not in.',
    ),
  staleVersion: (current: Record<string, unknown>, who: string) =>
    new Problem(
      409,
      'stale-version',
      'Somebody decided in the meantime',
      `${who} Look at the current state and decide again.`,
      { extra: { current } },
    ),
  notFromHere: (detail: string) => new Problem(409, 'not-from-here', 'Not possible now', detail),
  nameTaken: (what: string, name: string) =>
    new Problem(
      409,
      'name-taken',
      'The name is taken',
      `A ${what} named “${name}” exists already. Choose another name.`,
    ),
  workbookFaults: (issues: unknown[], count: number) =>
    new Problem(
      422,
      'workbook-faults',
      'The workbook was not stored',
      count === 1
        ? 'One fault was found; it is named with its sheet and cell. Mend it and upload again.'
        : `${count} faults were found; each is named with its sheet and cell. Mend them and upload again.`,
      { extra: { issues } },
    ),
  tooLarge: (limit: string) =>
    new Problem(413, 'too-large', 'Too large', `At most ${limit} are taken at once. Send less.`),
  tooMany: (retryAfterS: number) =>
    new Problem(429, 'too-many', 'Too many requests', `Wait ${retryAfterS} s and try again.`, {
      retryAfterS,
    }),
  busy: () =>
    new Problem(503, 'busy', 'Too much at once', 'The server is at its limit. Try again shortly.', {
      retryAfterS: 5,
    }),
  databaseAway: (cause: unknown) =>
    new Problem(
      503,
      'database-away',
      'The database does not answer',
      'Nothing was changed. Try again shortly.',
      { retryAfterS: 5, cause },
    ),
};
