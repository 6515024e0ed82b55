import { describe, expect, it } from 'vitest';
import { hashPassword, passwordFits } from '../../../src/auth/passwords';

describe('passwords', () => {
  it('are kept as argon2id with at least 19 MiB and two passes', async () => {
    const stored = await hashPassword('a long enough password');
    expect(stored).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(await passwordFits(stored, 'a long enough password')).toBe(true);
    expect(await passwordFits(stored, 'a long enough passworD')).toBe(false);
  });

  it('fit nobody where there is no stored hash or a broken one', async () => {
    expect(await passwordFits(null, '')).toBe(false);
    expect(await passwordFits(null, 'anything at all')).toBe(false);
    expect(await passwordFits('not a hash', 'anything at all')).toBe(false);
  });
});
