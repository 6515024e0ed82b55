import { spawn } from 'node:child_process';
import { appendFileSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { onStop } from './lifecycle.mjs';

/**
 * Runs a program to its end, without input.
 *
 * @param options `log`: a file that takes its output; `show`: print the output as it comes
 * @returns {Promise<{code: number, output: string}>} code 127 when the program is not there
 */
export function run(command, args, { log, show = false, ...options } = {}) {
  return new Promise((resolve) => {
    if (log) {
      mkdirSync(dirname(log), { recursive: true });
      writeFileSync(log, '');
    }
    const child = spawn(command, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options });
    const forget = onStop(() => stopChild(child, 10_000));
    let output = '';
    const take = (chunk) => {
      output = (output + chunk).slice(-1_000_000);
      if (log) appendFileSync(log, chunk);
      if (show) process.stdout.write(chunk);
    };
    child.stdout.on('data', take);
    child.stderr.on('data', take);
    child.on('error', (error) => {
      forget();
      resolve({ code: 127, output: `${output}${error.message}` });
    });
    child.on('close', (code) => {
      forget();
      resolve({ code: code ?? 1, output });
    });
  });
}

/** Asks a child to end, waits, and insists after `patienceMs`. */
export async function stopChild(child, patienceMs) {
  if (child.exitCode !== null || child.signalCode !== null || !child.pid) return;
  const ended = new Promise((resolve) => child.once('exit', resolve));
  child.kill('SIGTERM');
  const insist = setTimeout(() => child.kill('SIGKILL'), patienceMs);
  await ended;
  clearTimeout(insist);
}

/** Asks a process that is no child of ours to end, waits, and insists after `patienceMs`. */
export async function stopProcess(pid, patienceMs) {
  const startedAt = startOf(pid);
  const alive = () => startedAt !== null && startOf(pid) === startedAt;
  for (const [signal, patience] of [
    ['SIGTERM', patienceMs],
    ['SIGKILL', 5_000],
  ]) {
    if (!alive()) return;
    process.kill(pid, signal);
    const until = Date.now() + patience;
    while (alive() && Date.now() < until) await wait(50);
  }
}

/** When a process began, in ticks since the machine did; null when there is none. */
export function startOf(pid) {
  try {
    const fields = readFileSync(`/proc/${pid}/stat`, 'utf8')
      .replace(/^.*\) /s, '')
      .split(' ');
    return fields[0] === 'Z' ? null : Number(fields[19]);
  } catch {
    return null;
  }
}

/** The processes that were started with exactly this argument. */
export function processesWith(argument) {
  let names = [];
  try {
    names = readdirSync('/proc').filter((name) => /^\d+$/.test(name));
  } catch {
    return [];
  }
  return names.map(Number).filter((pid) => argumentsOf(pid).includes(argument));
}

function argumentsOf(pid) {
  try {
    return readFileSync(join('/proc', String(pid), 'cmdline'), 'utf8').split('\0');
  } catch {
    return [];
  }
}

/** The last line that names an error, or else the last line at all. */
export function lastReason(output) {
  const lines = output
    .split('\n')
    .map((line) => line.trim())
    .filter(Boolean);
  return (
    lines.findLast((line) => /error|fatal|^E:/i.test(line)) ?? lines.at(-1) ?? 'no reason given'
  );
}
