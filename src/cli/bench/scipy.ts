import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { createInterface } from 'node:readline';
import type { BenchSeries } from './benchSeries';

/** SciPy in a process of its own, on one core. */
export interface Scipy {
  /** Milliseconds that the fits take there. */
  timeOf(series: readonly BenchSeries[], laws: 3 | 4): Promise<number>;
  end(): void;
}

/** Starts Python with SciPy; null where it is not installed. */
export async function startScipy(script: string): Promise<Scipy | null> {
  // Debian's own Python knows Debian's packages.
  const python = existsSync('/usr/bin/python3') ? '/usr/bin/python3' : 'python3';
  const child = spawn(python, [script], {
    stdio: ['pipe', 'pipe', 'ignore'],
    env: { ...process.env, OMP_NUM_THREADS: '1', OPENBLAS_NUM_THREADS: '1' },
  });
  const lines = createInterface({ input: child.stdout })[Symbol.asyncIterator]();
  const failed = new Promise<null>((resolve) => child.on('error', () => resolve(null)));
  const next = async () => {
    const answer = await Promise.race([lines.next(), failed]);
    return answer === null || answer.done ? null : answer.value;
  };
  if ((await next()) !== 'ready') return null;
  return {
    async timeOf(series, laws) {
      child.stdin.write(`${JSON.stringify({ laws, series })}\n`);
      const seconds = Number(await next());
      if (!Number.isFinite(seconds)) throw new Error('SciPy stopped before it had answered.');
      return seconds * 1000;
    },
    end: () => child.stdin.end(),
  };
}
