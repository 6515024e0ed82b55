import { spawn } from 'node:child_process';
import { existsSync, readdirSync, readFileSync, renameSync, rmSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { onStop } from './lifecycle.mjs';
import { lastReason, stopChild } from './processes.mjs';
import { makePrivateFolder } from './settings.mjs';
import { say, Stop } from './say.mjs';

/** What mariadb-install-db feeds the server; that script itself needs MariaDB's client package. */
const systemTables = [
  ['mysql_system_tables.sql', 'mariadb_system_tables.sql'],
  ['mysql_performance_tables.sql', 'mariadb_performance_tables.sql'],
  ['mysql_system_tables_data.sql', 'mariadb_system_tables_data.sql'],
  ['maria_add_gis_sp_bootstrap.sql'],
  ['mysql_sys_schema.sql', 'mariadb_sys_schema.sql'],
];

/** What every run of the server on `folder` is started with. */
export function commonArguments(server, folder) {
  return [
    '--no-defaults',
    `--datadir=${folder}`,
    `--lc-messages-dir=${server.shareFolder}`,
    `--character-sets-dir=${join(server.shareFolder, 'charsets')}`,
    // MariaDB refuses root unless it is told that root is meant.
    ...(process.getuid?.() === 0 ? ['--user=root'] : []),
    '--innodb-buffer-pool-size=128M',
  ];
}

/**
 * Makes the database folder when there is none.
 *
 * @throws Stop when there is one that is no database, or none can be made
 */
export async function ensureDatabaseFolder(server, folder) {
  if (existsSync(join(folder, 'mysql')) && existsSync(join(folder, 'ibdata1'))) return;
  if (existsSync(folder) && !isEmptyFolder(folder)) throw new Stop(brokenFolder(folder));
  say(`Making the database in ${folder} …`);
  // Made beside and moved when complete: a half-made one is never taken for a database.
  const draft = `${folder}.new`;
  rmSync(draft, { recursive: true, force: true });
  makePrivateFolder(draft);
  const { code, output } = await bootstrap(server, draft);
  if (code !== 0) {
    rmSync(draft, { recursive: true, force: true });
    throw new Stop(`MariaDB could not make a database in ${folder}: ${lastReason(output)}`);
  }
  rmSync(folder, { recursive: true, force: true });
  renameSync(draft, folder);
}

const isEmptyFolder = (path) => statSync(path).isDirectory() && readdirSync(path).length === 0;

/** One line for a folder that MariaDB cannot open. */
export function brokenFolder(folder, reason) {
  return `The database folder ${folder} is damaged or incomplete${reason ? ` (${reason})` : ''}. Put a backup in its place, or move it away to begin with an empty database.`;
}

function bootstrap(server, folder) {
  const sql = systemTables.map((names) => {
    const path = names.map((name) => join(server.shareFolder, name)).find((one) => existsSync(one));
    if (!path) throw new Stop(`MariaDB's own SQL is missing: ${server.shareFolder}/${names[0]}.`);
    return readFileSync(path, 'utf8');
  });
  const script = [
    'create database if not exists mysql;\nuse mysql;\nset @auth_root_socket=NULL;\n',
    ...sql,
  ]
    .join('\n')
    // Accounts for the machine's name, which may not resolve.
    .replace(/^.*@current_hostname.*$/gm, '');
  return new Promise((resolve) => {
    const args = [...commonArguments(server, folder), '--bootstrap', '--max-allowed-packet=8M'];
    const child = spawn(server.program, [...args, '--log-warnings=0'], {
      env: server.env,
      stdio: ['pipe', 'ignore', 'pipe'],
    });
    const forget = onStop(() => stopChild(child, 5_000));
    let output = '';
    child.stderr.on('data', (chunk) => {
      output += chunk;
    });
    child.on('error', (error) => resolve({ code: 127, output: error.message }));
    child.on('close', (code) => {
      forget();
      resolve({ code: code ?? 1, output });
    });
    // A server that gives up early closes its input; its exit code tells.
    child.stdin.on('error', () => undefined);
    child.stdin.end(script);
  });
}
