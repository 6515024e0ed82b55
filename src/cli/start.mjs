import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { startServer } from './appServer.mjs';
import { ensureBuilt } from './build.mjs';
import { isStopping, stopAll, stopOnSignals } from './lifecycle.mjs';
import { prepare, seedDemo } from './prepare.mjs';
import { root } from './settings.mjs';
import { say, sayWhy, table } from './say.mjs';

/** `npm start`: brings everything up from nothing, serves, and prints where. */
async function start() {
  const { settings, env } = await prepare();
  const build = join(root, 'dist');
  await ensureBuilt(build, join(settings.home, 'logs/build.log'));
  await seedDemo(settings, env, build);
  const { ended } = await startServer({ build, home: settings.home, url: settings.localUrl, env });
  sayWelcome(settings);
  const code = await ended;
  if (isStopping()) return;
  sayWhy(`The server ended by itself (exit code ${code}).`);
  await stopAll();
  process.exit(1);
}

function sayWelcome({ appUrl, demo }) {
  say(`\nRatewell is at ${appUrl}\n`);
  if (demo) {
    const accounts = JSON.parse(readFileSync(join(root, 'src/demo/accounts.json'), 'utf8'));
    say('Demo sign-ins (DEMO=0 leaves them out of a new database)');
    say(table(accounts.map(({ role, email, password, group }) => [role, email, password, group])));
    say();
  } else {
    say('The first admin is made with: npm run admin -- --email … --name "…" --group "…"\n');
  }
  say('Ctrl-C stops it.');
}

stopOnSignals();
await start().catch(async (error) => {
  // A step that was cut short by Ctrl-C is no fault.
  if (isStopping()) return;
  sayWhy(error);
  await stopAll();
  process.exit(1);
});
