import { expect, it } from 'vitest';
import { temperatureTints } from '@/islands/temperatureTints';
import { temperatureRamp } from '@/screening/ramps';

it('spreads the temperatures of a screen over the whole ramp, evenly', () => {
  const tintOf = temperatureTints([313.15, 323.15, 333.15]);
  expect(tintOf(313.15)).toBe(temperatureRamp(0));
  expect(tintOf(323.15)).toBe(temperatureRamp(0.5));
  expect(tintOf(333.15)).toBe(temperatureRamp(1));
});

it('gives a single temperature the middle of the ramp', () => {
  expect(temperatureTints([300])(300)).toBe(temperatureRamp(0.5));
});
