import { skipCSRFCheck } from '@auth/core';
import Credentials from '@auth/core/providers/credentials';
import { defineConfig } from 'auth-astro';
import { z } from 'zod/v4';
import { deleteSession } from '../db/repositories/sessions';
import { getServices } from '../services/runtime';
import { openSession, sessionMs, signIn, userOfSession } from '../services/signIn';
import { longestPassword } from './passwords';

const credentialsSchema = z.object({
  email: z.string().trim().min(3).max(254),
  password: z.string().min(1).max(longestPassword),
});

export default defineConfig({
  // Read at run time: a secret must never be part of a build.
  secret: process.env.AUTH_SECRET,
  // src/server has put the public address of APP_URL into the request.
  trustHost: true,
  // src/middleware.ts refuses unsafe requests from other origins, these included.
  skipCSRFCheck,
  session: { strategy: 'jwt', maxAge: sessionMs / 1000 },
  pages: { signIn: '/sign-in', signOut: '/sign-in', error: '/sign-in' },
  providers: [
    Credentials({
      credentials: { email: {}, password: {} },
      async authorize(input, request) {
        const credentials = credentialsSchema.safeParse(input);
        if (!credentials.success) return null;
        const { db, now } = getServices();
        const address = request.headers.get('x-forwarded-for') ?? 'unknown';
        const outcome = await signIn(db, { ...credentials.data, address }, now());
        return outcome.ok ? { id: outcome.userId, name: outcome.name, email: outcome.email } : null;
      },
    }),
  ],
  callbacks: {
    // Runs at every request: a session that was ended in the database is no session.
    async jwt({ token, user }) {
      const { db, now } = getServices();
      if (user?.id) return { sid: await openSession(db, user.id, now()), sub: user.id };
      const sid = typeof token.sid === 'string' ? token.sid : null;
      const userId = sid && (await userOfSession(db, sid, now()));
      return userId && userId === token.sub ? token : null;
    },
    session({ session, token }) {
      return { expires: session.expires, user: { id: token.sub ?? '' } };
    },
  },
  events: {
    async signOut(message) {
      const sid = 'token' in message ? message.token?.sid : null;
      if (typeof sid === 'string') await deleteSession(getServices().db, sid);
    },
  },
  logger: {
    error: (error) => {
      if (error.name !== 'CredentialsSignin') console.error(`sign-in: ${error.name}`);
    },
    warn: () => undefined,
    debug: () => undefined,
  },
});
