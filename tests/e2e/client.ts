import { inject } from 'vitest';
import accounts from '../../src/demo/accounts.json';

export const baseUrl = inject('baseUrl');

/** The demo account of a role in the group whose name begins with `group`. */
export function demoAccount(group: 'Marlbeck' | 'Tarnside', role: string) {
  const account = accounts.find((one) => one.group.startsWith(group) && one.role === role);
  if (!account) throw new Error(`no demo account for ${role} in ${group}`);
  return account;
}

/** A signed-in caller that follows no redirects and keeps its cookie. */
export interface Caller {
  cookie: string;
  fetch(path: string, init?: RequestInit): Promise<Response>;
}

export function callerWith(headers: Record<string, string>): Caller {
  return {
    cookie: headers.cookie ?? '',
    fetch: (path, init = {}) =>
      fetch(new URL(path, baseUrl), {
        redirect: 'manual',
        ...init,
        headers: { origin: new URL(baseUrl).origin, ...headers, ...init.headers },
      }),
  };
}

/** Signs in as the form does. @throws Error when no session comes back */
export async function signInAs(email: string, password: string): Promise<Caller> {
  const response = await callerWith({}).fetch('/api/auth/callback/credentials', {
    method: 'POST',
    body: new URLSearchParams({ email, password, callbackUrl: '/' }),
  });
  const cookie = response.headers
    .getSetCookie()
    .map((line) => line.split(';')[0])
    .find((pair) => pair?.includes('session-token='));
  if (!cookie) throw new Error(`${email} was not signed in: ${response.status}`);
  return callerWith({ cookie });
}
