import { createServer } from 'node:net';
import { Stop } from './say.mjs';

/** @returns {Promise<number>} the port that was listened on for a moment */
function listenOnce(port, host) {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen({ port, host, exclusive: true }, () => {
      const address = server.address();
      server.close(() => resolve(address.port));
    });
  });
}

/** A port on the loopback interface that nothing listens on now. */
export const freePort = () => listenOnce(0, '127.0.0.1');

/** @throws Stop that names what to change when nothing can listen on host and port */
export async function requireFreePort(host, port) {
  try {
    await listenOnce(port, host);
  } catch (error) {
    throw new Stop(portFault(error, host, port));
  }
}

export function portFault(error, host, port) {
  switch (error.code) {
    case 'EADDRINUSE':
      return `Port ${port} is in use on ${host}. Stop what listens there, or set PORT to another one.`;
    case 'EACCES':
      return `Port ${port} may not be used by this user. Set PORT to one above 1023.`;
    case 'EADDRNOTAVAIL':
    case 'ENOTFOUND':
      return `HOST is ${host}, which is no address of this machine. Set HOST to one, or leave it out.`;
    default:
      return `Nothing can listen on ${host}:${port}: ${error.message}.`;
  }
}
