import { randomUUID } from 'node:crypto';
import { getSession } from 'auth-astro/server';
import type { APIContext, MiddlewareHandler } from 'astro';
import type { Viewer } from './auth/viewer';
import { Problem, problems } from './errors';
import { mayChange } from './http/origin';
import { problemResponse } from './http/respond';
import { loadViewer, viewerOfToken } from './services/identify';
import { getServices } from './services/runtime';

/** Pages that anybody may open; everything else takes a sign-in. */
const openPages = new Set(['/sign-in', '/refused', '/404', '/500']);

const isApi = (path: string) => path.startsWith('/api/');
const isSignInMachinery = (path: string) => path.startsWith('/api/auth/');

async function identify(context: APIContext): Promise<Viewer | null> {
  const { db, now } = getServices();
  const byToken = isApi(context.url.pathname)
    ? await viewerOfToken(db, context.request.headers, now())
    : null;
  if (byToken) return byToken;
  const session = await getSession(context.request);
  const userId = session?.user?.id;
  return userId ? loadViewer(db, userId, 'session') : null;
}

function errorCode(error: unknown): string {
  const withCause = error instanceof Error ? (error.cause ?? error) : error;
  return withCause instanceof Error && 'code' in withCause ? String(withCause.code) : '';
}

/** A known refusal as it is; a database that is away as 503; anything else as null. */
function asProblem(error: unknown): Problem | null {
  if (error instanceof Problem) return error;
  const away = ['ECONNREFUSED', 'ECONNRESET', 'ETIMEDOUT', 'PROTOCOL_CONNECTION_LOST'];
  return away.includes(errorCode(error)) ? problems.databaseAway(error) : null;
}

function answerProblem(context: APIContext, problem: Problem): Response | Promise<Response> {
  if (isApi(context.url.pathname)) return problemResponse(problem, context.locals.requestId);
  context.locals.problem = problem;
  return context.rewrite('/refused');
}

function unexpected(context: APIContext, error: unknown): Problem {
  const { requestId } = context.locals;
  console.error(
    JSON.stringify({
      level: 'error',
      requestId,
      method: context.request.method,
      path: context.url.pathname,
      message: error instanceof Error ? error.message : String(error),
      stack: error instanceof Error ? error.stack : undefined,
    }),
  );
  return new Problem(
    500,
    'unexpected',
    'Something went wrong here',
    `It was noted as ${requestId}. Nothing that you had saved is lost; try again.`,
    { cause: error },
  );
}

function withPageHeaders(response: Response): Response {
  response.headers.set('cache-control', 'no-store');
  const policy = response.headers.get('content-security-policy');
  if (policy && !policy.includes('style-src-attr')) {
    // React and the charts set style attributes; scripts stay under their hashes.
    response.headers.set('content-security-policy', `${policy}; style-src-attr 'unsafe-inline'`);
  }
  return response;
}

const isProblem = (response: Response) =>
  (response.headers.get('content-type') ?? '').startsWith('application/problem+json');

function toSignIn(context: APIContext): Response {
  const { pathname, search } = context.url;
  const next = pathname === '/' ? '' : `?next=${encodeURIComponent(pathname + search)}`;
  return context.redirect(`/sign-in${next}`);
}

/** Knows who asks, refuses what comes from elsewhere, and turns every error into an answer. */
export const onRequest: MiddlewareHandler = async (context, next) => {
  const { pathname, origin } = context.url;
  // The page that shows a refusal was rewritten to: who asks is known already.
  if (context.locals.problem) return withPageHeaders(await next());
  context.locals.requestId = randomUUID();
  context.locals.viewer = null;
  try {
    if (!mayChange(context.request.method, context.request.headers, origin)) {
      // A script that forgot its token is told so; a sign-in form has to come from our own page.
      const nobody = isApi(pathname) && !context.request.headers.has('cookie');
      throw nobody && !isSignInMachinery(pathname)
        ? problems.notSignedIn()
        : problems.foreignOrigin();
    }
    if (isSignInMachinery(pathname)) return await next();
    context.locals.viewer = await identify(context);
    if (!context.locals.viewer && !openPages.has(pathname)) {
      if (isApi(pathname)) throw problems.notSignedIn();
      return toSignIn(context);
    }
    const response = await next();
    if (response.status === 404 && isApi(pathname) && !isProblem(response))
      throw problems.notFound();
    return withPageHeaders(response);
  } catch (error) {
    const problem = asProblem(error) ?? unexpected(context, error);
    return withPageHeaders(await answerProblem(context, problem));
  }
};
