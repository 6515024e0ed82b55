import { randomUUID } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';
import { bodyLimit, countedBody, isDeclaredTooLarge } from './bodyLimit';
import { compressAnswers } from './compression';
import type { EventStreams } from './eventStreams';
import { callerAddress, setForwarded } from './forwarded';
import { answerHealth, type DatabaseProbe } from './health';
import { judgeHost } from './hostGuard';
import { refusals, refuse, type Refusal } from './refusal';
import { logRequest } from './requestLog';
import { setSecurityHeaders } from './securityHeaders';
import type { ServerSettings } from './serverSettings';
import type { StaticFiles } from './staticFiles';

/** The application's own handler, as the build makes it. */
export type AppHandler = (request: IncomingMessage, response: ServerResponse) => unknown;

export interface ListenerParts {
  settings: Pick<ServerSettings, 'appUrl' | 'trustedHops' | 'logRequests'>;
  app: AppHandler;
  files: Pick<StaticFiles, 'serve'>;
  probe: DatabaseProbe;
  streams: EventStreams;
}

/** Routes that the framework brings and this product does not use. */
const closedPaths = /^\/(_server-islands|_image|_actions)(\/|$)/;

/**
 * Answers every request: looks after hosts, sizes and headers, and hands what is left to the
 * application, which then sees the public address and a caller that can be believed.
 */
export function createListener(parts: ListenerParts) {
  const { settings, app, files, probe, streams } = parts;
  const { appUrl } = settings;

  return (request: IncomingMessage, response: ServerResponse): void => {
    const requestId = randomUUID();
    logRequest(request, response, requestId, settings.logRequests);
    setSecurityHeaders(response, appUrl);
    response.setHeader('x-request-id', requestId);
    const say = (refusal: Refusal) => {
      refuse(request, response, refusal, requestId);
    };

    const path = readPath(request.url);
    if (path === null) return say(refusals.badTarget);
    if (path === '/healthz') return void answerHealth(response, probe);
    const host = judgeHost(request.headers.host, appUrl);
    if (host === 'loopback' && isRead(request)) {
      response.writeHead(307, { location: appUrl.origin + (request.url ?? '/') }).end();
      return;
    }
    if (host !== 'ours') return say(refusals.foreignHost(appUrl));
    if (closedPaths.test(path)) return say(refusals.notFound);
    const limit = bodyLimit(request.method ?? 'GET', path);
    if (isDeclaredTooLarge(request.headers['content-length'], limit)) {
      return say(refusals.tooLarge(limit));
    }
    if (request.headers.expect === '100-continue') response.writeContinue();
    if (files.serve(path, request, response)) return;

    const caller = callerAddress(
      request.headers['x-forwarded-for']?.toString(),
      request.socket.remoteAddress,
      settings.trustedHops,
    );
    setForwarded(request.headers, appUrl, caller);
    request.headers['x-request-id'] = requestId;
    if (!isRead(request)) {
      const onExceeded = () => {
        if (response.headersSent) return void response.destroy();
        say(refusals.tooLarge(limit));
        ignoreAnswers(response);
      };
      // Astro reads `body` where there is one.
      Object.assign(request, { body: countedBody(request, limit, onExceeded) });
    }
    compressAnswers(request, response);
    streams.watch(response);
    Promise.resolve(app(request, response)).catch((error: unknown) => {
      console.error(JSON.stringify({ level: 'error', requestId, message: String(error) }));
      if (response.headersSent) response.destroy();
      else say(refusals.unexpected);
    });
  };
}

const isRead = (request: IncomingMessage) => request.method === 'GET' || request.method === 'HEAD';

/** The path asked for; null for what is no path of one server, or is not properly encoded. */
function readPath(url: string | undefined): string | null {
  const path = (url ?? '').split(/[?#]/)[0] ?? '';
  if (!path.startsWith('/') || path.startsWith('//') || path.includes('\\')) return null;
  try {
    return decodeURI(path);
  } catch {
    return null;
  }
}

/** The answer is given: what the application still says about the cut-off body goes nowhere. */
function ignoreAnswers(response: ServerResponse): void {
  response.writeHead = () => response;
  response.write = () => true;
  response.end = () => response;
}
