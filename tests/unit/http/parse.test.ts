import { describe, expect, it } from 'vitest';
import { z } from 'zod/v4';
import { check, jsonPointer, parseBody } from '../../../src/http/parse';

const schema = z.strictObject({ wells: z.array(z.strictObject({ mass: z.number() })) });
const request = (body: string) => new Request('http://x.example', { method: 'POST', body });

describe('reading a body', () => {
  it('escapes JSON pointers as RFC 6901 says', () => {
    expect(jsonPointer(['a/b', 'm~n', 0])).toBe('/a~1b/m~0n/0');
    expect(jsonPointer([])).toBe('');
  });

  it('names every fault at its own place, unknown keys included', () => {
    let errors: unknown;
    try {
      check(schema, { wells: [{ mass: 'x' }, { mass: 1, role: 'admin' }], groupId: 'g' });
    } catch (error) {
      errors = (error as { errors: unknown }).errors;
    }
    expect(errors).toEqual(
      expect.arrayContaining([
        expect.objectContaining({ path: '/wells/0/mass' }),
        expect.objectContaining({ path: '/wells/1/role' }),
        expect.objectContaining({ path: '/groupId' }),
      ]),
    );
    expect(errors).toHaveLength(3);
  });

  it('answers 400 to what is not JSON and 422 to what does not fit', async () => {
    await expect(parseBody(request('{'), schema)).rejects.toMatchObject({ status: 400 });
    await expect(parseBody(request('null'), schema)).rejects.toMatchObject({ status: 422 });
    await expect(parseBody(request('{"wells":[]}'), schema)).resolves.toEqual({ wells: [] });
  });
});
