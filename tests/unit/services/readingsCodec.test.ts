import { describe, expect, it } from 'vitest';
import {
  packFloats,
  packIntegers,
  unpackFloats,
  unpackIntegers,
} from '../../../src/services/readingsCodec';

describe('packed readings', () => {
  it('come back to the last bit, with missing ones missing', () => {
    const values = [0.1, 1 / 3, -2e-17, 5e-324, 1.7976931348623157e308, 0, null];
    expect(unpackFloats(packFloats(values))).toEqual(values);
    expect(packFloats(values)).toHaveLength(8 * values.length);
  });

  it('keep the rows that they came from', () => {
    const rows = [2, 3, 1_048_576];
    expect(unpackIntegers(packIntegers(rows))).toEqual(rows);
    expect(unpackFloats(packFloats([]))).toEqual([]);
  });
});
