import { hash, verify, type Options } from '@node-rs/argon2';

/** argon2id with 19 MiB, two passes: the least that OWASP's password storage sheet advises. */
const argon2id: Options = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** A PHC string that no password fits; keeps the time of a sign-in the same for unknown addresses. */
const nobody =
  '$argon2id$v=19$m=19456,t=2,p=1$c29tZXNhbHRzb21lc2FsdA$C1Jxg2TI1FhUiPp3NGJ5CqNXqHVVBBt8F7v2wWnSU+8';

export const shortestPassword = 12;
export const longestPassword = 128;

export async function hashPassword(password: string): Promise<string> {
  return hash(password, argon2id);
}

/** True when the password fits. Without a stored hash it takes as long and is false. */
export async function passwordFits(stored: string | null, password: string): Promise<boolean> {
  const fits = await verify(stored ?? nobody, password).catch(() => false);
  return stored !== null && fits;
}
