import { mkdirSync, mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { claimHome } from '../../../src/cli/homeLock.mjs';
import { nodeVersionFault } from '../../../src/cli/nodeVersion.mjs';
import { packagesMatch } from '../../../src/cli/packages.mjs';
import { portFault } from '../../../src/cli/ports.mjs';
import { keptSecret, readSettings } from '../../../src/cli/settings.mjs';
import { hashSources, isBuiltFrom, markBuilt } from '../../../src/cli/sources.mjs';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'launcher-test-'));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

describe('nodeVersionFault', () => {
  it('takes Node 20.19 and everything newer', () => {
    for (const version of ['20.19.0', '20.20.2', '22.0.0']) {
      expect(nodeVersionFault(version)).toBeNull();
    }
  });

  it('says in one line what is there and what is needed', () => {
    for (const version of ['20.18.9', '18.20.0']) {
      const fault = nodeVersionFault(version);
      expect(fault).toContain(version);
      expect(fault).toContain('20.19.0');
      expect(fault).not.toContain('\n');
    }
  });
});

describe('readSettings', () => {
  it('stays on this machine unless told otherwise', () => {
    expect(readSettings({})).toMatchObject({
      host: '127.0.0.1',
      port: 4321,
      appUrl: 'http://127.0.0.1:4321',
      demo: true,
    });
  });

  it('reaches a server on all interfaces, or on IPv6, through the loopback', () => {
    expect(readSettings({ HOST: '0.0.0.0', PORT: '80' }).localUrl).toBe('http://127.0.0.1:80');
    expect(readSettings({ HOST: '::1' }).localUrl).toBe('http://[::1]:4321');
  });

  it('refuses a port that is none', () => {
    for (const PORT of ['web', '0', '70000', '1.5']) {
      expect(() => readSettings({ PORT })).toThrow(/PORT must be a whole number/);
    }
  });
});

describe('keptSecret', () => {
  it('makes a secret once, for its owner only, and keeps it', () => {
    const secret = keptSecret(folder, 'secret');
    expect(secret.length).toBeGreaterThanOrEqual(43);
    expect(keptSecret(folder, 'secret')).toBe(secret);
    expect(statSync(join(folder, 'secret')).mode & 0o777).toBe(0o600);
  });

  it('does not go on with a damaged one', () => {
    writeFileSync(join(folder, 'secret'), '');
    expect(() => keptSecret(folder, 'secret')).toThrow(/Remove the file/);
  });
});

describe('claimHome', () => {
  it('lets one launcher in at a time', () => {
    const release = claimHome(folder);
    expect(() => claimHome(folder)).toThrow(/runs from .* already/);
    release();
    claimHome(folder)();
  });

  it('takes over from one that was killed', () => {
    const dead = { pid: 999_999_999, startedAt: 1 };
    writeFileSync(join(folder, 'launcher.json'), JSON.stringify(dead));
    claimHome(folder)();
  });

  it('takes over where the number of a killed one was given to another process', () => {
    const other = { pid: process.pid, startedAt: 1 };
    writeFileSync(join(folder, 'launcher.json'), JSON.stringify(other));
    claimHome(folder)();
  });
});

describe('packagesMatch', () => {
  const lock = {
    packages: {
      '': { version: '0.1.0' },
      'node_modules/a': { version: '1.0.0', integrity: 'x' },
      'node_modules/b': { version: '2.0.0', integrity: 'y', optional: true },
    },
  };

  it('takes an installation without the packages of other platforms', () => {
    const packages = { 'node_modules/a': { version: '1.0.0', integrity: 'x' } };
    expect(packagesMatch(lock, { packages })).toBe(true);
  });

  it('notices another version, other bytes and a missing package', () => {
    for (const packages of [
      { 'node_modules/a': { version: '1.0.1', integrity: 'x' } },
      { 'node_modules/a': { version: '1.0.0', integrity: 'z' } },
      {},
    ]) {
      expect(packagesMatch(lock, { packages })).toBe(false);
    }
  });
});

describe('a build', () => {
  it('is stale as soon as a source changes, comes or goes', () => {
    mkdirSync(join(folder, 'src'));
    writeFileSync(join(folder, 'src/page.ts'), 'one');
    const first = hashSources(folder);
    markBuilt(folder, first);
    expect(isBuiltFrom(folder, hashSources(folder))).toBe(true);
    writeFileSync(join(folder, 'src/page.ts'), 'two');
    expect(isBuiltFrom(folder, hashSources(folder))).toBe(false);
    writeFileSync(join(folder, 'src/page.ts'), 'one');
    writeFileSync(join(folder, 'src/other.ts'), '');
    expect(isBuiltFrom(folder, hashSources(folder))).toBe(false);
    rmSync(join(folder, 'src/other.ts'));
    expect(isBuiltFrom(folder, hashSources(folder))).toBe(true);
  });
});

describe('portFault', () => {
  it('names what to change', () => {
    expect(portFault({ code: 'EADDRINUSE' }, '127.0.0.1', 4321)).toMatch(/4321 is in use.*PORT/);
    expect(portFault({ code: 'EACCES' }, '127.0.0.1', 80)).toMatch(/PORT to one above 1023/);
    expect(portFault({ code: 'EADDRNOTAVAIL' }, '192.0.2.1', 4321)).toMatch(/HOST/);
  });
});
