import { z } from 'zod/v4';

const appUrl = z.url({
  protocol: /^https?$/,
  error: 'APP_URL must be a http or https address',
  abort: true,
});

const schema = z.object({
  PORT: z.coerce.number('PORT must be a number').int().min(1).max(65535).default(4321),
  HOST: z.string().min(1).default('127.0.0.1'),
  APP_URL: z
    .string({ error: 'APP_URL is not set: give the public address, such as http://127.0.0.1:4321' })
    .pipe(appUrl)
    .transform((text) => new URL(text))
    .refine((url) => url.pathname === '/' && !url.search && !url.username, {
      error: 'APP_URL must be an address without a path, a query and a user',
    })
    .refine((url) => !url.hostname.startsWith('['), {
      error: 'APP_URL must name the host, or give an IPv4 address: use localhost for [::1]',
    }),
  AUTH_SECRET: z
    .string({ error: 'AUTH_SECRET is not set' })
    .min(32, 'AUTH_SECRET must have at least 32 characters'),
  DATABASE_URL: z
    .string({ error: 'DATABASE_URL is not set' })
    .regex(/^(mysql|mariadb):\/\//, 'DATABASE_URL must begin with mysql://'),
  TRUST_PROXY_HOPS: z.coerce
    .number('TRUST_PROXY_HOPS must be a number')
    .int('TRUST_PROXY_HOPS must be a whole number')
    .min(0, 'TRUST_PROXY_HOPS must be 0 or more')
    .max(10, 'TRUST_PROXY_HOPS must be 10 or less')
    .default(0),
  LOG_REQUESTS: z.string().optional(),
});

export interface ServerSettings {
  port: number;
  host: string;
  /** The public address; it has no path. */
  appUrl: URL;
  databaseUrl: string;
  /** How many proxies before this server are ours. */
  trustedHops: number;
  logRequests: boolean;
}

/** Reads the environment. @throws Error whose message is one line with every fault. */
export function readServerSettings(env: NodeJS.ProcessEnv): ServerSettings {
  const given = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== ''));
  const result = schema.safeParse(given);
  if (!result.success) {
    const faults = result.error.issues.map((issue) => issue.message);
    throw new Error(`${faults.join('; ')}. The server was not started.`);
  }
  const { data } = result;
  return {
    port: data.PORT,
    host: data.HOST.replace(/^\[(.*)\]$/, '$1'),
    appUrl: data.APP_URL,
    databaseUrl: data.DATABASE_URL,
    trustedHops: data.TRUST_PROXY_HOPS,
    logRequests: data.LOG_REQUESTS === '1',
  };
}
