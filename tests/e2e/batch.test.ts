import { execFileSync } from 'node:child_process';
import { beforeAll, describe, expect, inject, it } from 'vitest';
import { baseUrl, callerWith, demoAccount, signInAs, type Caller } from './client';

interface Series {
  id: string;
  catalyst: string;
  temperature: { value: number; unit: string };
  time: { values: number[]; unit: string };
  reading: { values: (number | null)[]; unit: string };
  catalystMass: { value: number; unit: string };
  volume: { value: number; unit: string };
}

const gasConstant = 8.31446261815324;
const activationEnergy = 52_000;
const kAt333 = 4e-4;

/** 96 first-order decays: 12 catalysts, 4 temperatures, 2 replicates; noise without chance. */
function plate(): Series[] {
  return Array.from({ length: 96 }, (_, index) => {
    const celsius = 40 + 10 * Math.floor((index % 8) / 2);
    const kelvin = celsius + 273.15;
    const faster = 1 + Math.floor(index / 8) / 6;
    const k =
      faster * kAt333 * Math.exp((-activationEnergy / gasConstant) * (1 / kelvin - 1 / 333.15));
    const minutes = Array.from({ length: 25 }, (_unused, step) => step * 5);
    return {
      id: `well-${index}`,
      catalyst: `X-${Math.floor(index / 8)}`,
      temperature: { value: celsius, unit: 'degC' },
      time: { values: minutes, unit: 'min' },
      reading: {
        values: minutes.map(
          (minute) => 10 * Math.exp(-k * minute * 60) + 0.03 * Math.sin(minute * 9.1 + index * 2.3),
        ),
        unit: 'mmol/L',
      },
      catalystMass: { value: 5, unit: 'mg' },
      volume: { value: 2, unit: 'mL' },
    };
  });
}

const reference = {
  temperature: { value: 60, unit: 'degC' },
  concentration: { value: 0.01, unit: 'mol/L' },
  catalystLoading: { value: 2.5, unit: 'g/L' },
  targetConversion: 0.8,
};

interface Answer {
  series: Record<string, unknown>[];
  catalysts: Record<string, { value: number; unit: string; low: number; high: number }>[];
  errors: { path: string; message: string }[];
}

let caller: Caller;
beforeAll(async () => {
  const { email, password } = demoAccount('Tarnside', 'viewer');
  caller = await signInAs(email, password);
});

async function send(body: unknown, by = caller) {
  const response = await by.fetch('/api/v1/analyse', {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: typeof body === 'string' ? body : JSON.stringify(body),
  });
  return {
    status: response.status,
    type: response.headers.get('content-type') ?? '',
    body: (await response.json()) as Answer,
  };
}

describe('the batch endpoint', () => {
  it('finds order, k and activation energy of a whole plate again', async () => {
    const { status, body } = await send({ reference, series: plate() });
    expect(status).toBe(200);
    expect(body.series).toHaveLength(96);
    expect(body.series.every((one) => one.verdict === 'first')).toBe(true);
    expect(body.catalysts).toHaveLength(12);
    body.catalysts.forEach((catalyst, index) => {
      const { activationEnergy: ea, kRef, timeToTarget, rateRef } = catalyst;
      const k = kAt333 * (1 + index / 6);
      expect(ea?.unit).toBe('kJ/mol');
      expect(ea?.value).toBeCloseTo(activationEnergy / 1000, 0);
      expect(kRef?.unit).toBe('s^-1');
      expect((kRef?.value ?? 0) / k).toBeCloseTo(1, 1);
      expect((rateRef?.value ?? 0) / (k * 0.01)).toBeCloseTo(1, 1);
      // −ln(1 − X)/k for first order.
      expect((timeToTarget?.value ?? 0) / (-Math.log(0.2) / k)).toBeCloseTo(1, 1);
    });
  });

  it('answers 400 to what is not JSON', async () => {
    const { status, type } = await send('{"series": [');
    expect([status, type]).toEqual([400, 'application/problem+json']);
  });

  it('names a wrong unit, lengths that differ and a double id, each at its place', async () => {
    const series = plate().slice(0, 4);
    const [first, second, third] = series as [Series, Series, Series];
    first.time.unit = 'minutes';
    second.reading.values.pop();
    third.id = first.id;
    const { status, body } = await send({ series });
    expect(status).toBe(422);
    const paths = body.errors.map((error) => error.path);
    expect(paths).toContain('/series/0/time/unit');
    expect(paths.some((path) => path.startsWith('/series/1/reading'))).toBe(true);
    expect(paths).toContain('/series/2/id');
  });

  it('takes a series without readings as unusable, with the reason, beside a good one', async () => {
    const [good, empty] = plate() as [Series, Series];
    empty.time.values = [];
    empty.reading.values = [];
    const { status, body } = await send({ series: [good, empty] });
    expect(status).toBe(200);
    expect(body.series[0]?.verdict).toBe('first');
    expect(body.series[1]).toMatchObject({ verdict: 'unusable', k: null });
    expect(body.series[1]?.warnings).toContain('too-few-readings');
  });

  it('leaves the server free for others while a large batch is worked on', async () => {
    const series = Array.from({ length: 30 }, (_, copy) =>
      plate().map((one) => ({ ...one, id: `${one.id}-${copy}` })),
    ).flat();
    const batch = send({ series });
    const light = fetch(new URL('/healthz', baseUrl));
    const first = await Promise.race([batch.then(() => 'batch'), light.then(() => 'light')]);
    expect(first).toBe('light');
    expect((await light).status).toBe(200);
    expect((await batch).status).toBe(200);
  });

  it('takes a token made on the command line, printed alone on the last line', async () => {
    const { email } = demoAccount('Tarnside', 'analyst');
    const printed = execFileSync('npx', ['tsx', 'src/cli/token.ts', '--email', email], {
      encoding: 'utf8',
      env: { ...process.env, DATABASE_URL: inject('databaseUrl') },
    });
    const token = printed.trimEnd().split('\n').at(-1) ?? '';
    const script = callerWith({ authorization: `Bearer ${token}`, origin: '' });
    expect((await send({ series: plate().slice(0, 2) }, script)).status).toBe(200);
    const wrong = callerWith({ authorization: `Bearer ${token}0`, origin: '' });
    expect((await send({ series: [] }, wrong)).status).toBe(401);
    expect((await send({ series: [] }, callerWith({}))).status).toBe(401);
    const bare = await fetch(new URL('/api/v1/analyse', baseUrl), { method: 'POST', body: '{}' });
    expect(bare.status).toBe(401);
  });
});
