import { createServer } from 'node:http';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { EventStreams } from './eventStreams';
import { openProbe } from './health';
import { createListener, type AppHandler } from './listener';
import { readServerSettings, type ServerSettings } from './serverSettings';
import { stopOnSignals } from './shutdown';
import { StaticFiles } from './staticFiles';

/** The folder of the build; this file, bundled, is in it. */
const buildFolder = dirname(fileURLToPath(import.meta.url));

/** Loads the application that the build made, without its own server. */
async function loadApp(): Promise<AppHandler> {
  process.env.ASTRO_NODE_AUTOSTART = 'disabled';
  const entry = pathToFileURL(join(buildFolder, 'server/entry.mjs')).href;
  const built = (await import(entry)) as { handler: AppHandler };
  return built.handler;
}

async function serve(settings: ServerSettings): Promise<void> {
  const probe = openProbe(settings.databaseUrl);
  const streams = new EventStreams();
  const listener = createListener({
    settings,
    app: await loadApp(),
    files: new StaticFiles(join(buildFolder, 'client')),
    probe,
    streams,
  });
  const server = createServer(
    // A slow upload of the largest workbook gets five minutes, a header half a minute.
    { requestTimeout: 300_000, headersTimeout: 30_000, keepAliveTimeout: 15_000 },
    listener,
  );
  server.on('checkContinue', listener);
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(settings.port, settings.host, resolve);
  });
  stopOnSignals(server, streams, probe);
}

try {
  await serve(readServerSettings(process.env));
} catch (error) {
  const { code, message } = error as NodeJS.ErrnoException;
  console.error(
    code === 'EADDRINUSE'
      ? `Port ${process.env.PORT ?? 4321} is in use. Stop what listens there, or set PORT to another one.`
      : message,
  );
  process.exit(1);
}
